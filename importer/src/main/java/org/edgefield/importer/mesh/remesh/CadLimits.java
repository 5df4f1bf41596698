package org.edgefield.importer.mesh.remesh;

import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;
import org.edgefield.importer.mesh.size.Metric;
import org.edgefield.importer.mesh.size.VertexField;

/**
 * Lowers sizes where CAD edges stand closer together than the size field wants elements: between
 * two vertices on CAD edges an edge cannot be collapsed, and a triangle with all three corners on
 * CAD edges cannot become higher. The size in that direction then has to follow the distance, and
 * the size along is limited by the largest aspect ratio.
 */
final class CadLimits {
  /** Length in elements below which a distance between CAD edges limits the size. */
  private static final double TOO_SHORT = 0.6;

  /** Smallest share to which a size is lowered; thinner slivers of the model stay slivers. */
  private static final double LEAST_SHARE = 1.0 / 128;

  private final HalfEdgeMesh mesh;
  private final VertexField field;
  private final double maxAspect;
  private final double[] wide = new double[Metric.STRIDE];
  private final double[] work = new double[15];

  CadLimits(HalfEdgeMesh mesh, VertexField field, double maxAspect) {
    this.mesh = mesh;
    this.field = field;
    this.maxAspect = maxAspect;
  }

  /**
   * Lowers sizes of constrained vertices.
   *
   * @return number of places where a size was lowered
   */
  int apply() {
    int count = 0;
    for (int t = 0; t < mesh.triangles; t++) {
      if (mesh.face[t] < 0) {
        continue;
      }
      for (int h = 3 * t; h < 3 * t + 3; h++) {
        count += h < mesh.opp[h] ? limitEdge(h) : 0;
        count += limitHeight(h);
      }
    }
    return count;
  }

  private boolean fixed(int v) {
    return mesh.kind[v] != SurfaceMesh.ON_FACE;
  }

  private int limitEdge(int h) {
    int a = mesh.org[h];
    int b = mesh.dest(h);
    if (!fixed(a) || !fixed(b)) {
      return 0;
    }
    boolean bothEnds =
        mesh.kind[a] == SurfaceMesh.ON_VERTEX && mesh.kind[b] == SurfaceMesh.ON_VERTEX;
    if (mesh.cad[h] >= 0 && !bothEnds) {
      return 0;
    }
    double[] x = mesh.xyz;
    return lower(
        x[3 * b] - x[3 * a], x[3 * b + 1] - x[3 * a + 1], x[3 * b + 2] - x[3 * a + 2], a, b, -1);
  }

  /** Height of the triangle over its CAD edge h. */
  private int limitHeight(int h) {
    int a = mesh.org[h];
    int b = mesh.dest(h);
    int c = mesh.org[HalfEdgeMesh.prev(h)];
    if (mesh.cad[h] < 0 || !fixed(c)) {
      return 0;
    }
    double[] x = mesh.xyz;
    double ex = x[3 * b] - x[3 * a];
    double ey = x[3 * b + 1] - x[3 * a + 1];
    double ez = x[3 * b + 2] - x[3 * a + 2];
    double cx = x[3 * c] - x[3 * a];
    double cy = x[3 * c + 1] - x[3 * a + 1];
    double cz = x[3 * c + 2] - x[3 * a + 2];
    double f = (ex * cx + ey * cy + ez * cz) / (ex * ex + ey * ey + ez * ez);
    if (!(f > -0.1 && f < 1.1)) {
      return 0;
    }
    boolean corner = mesh.cad[HalfEdgeMesh.next(h)] >= 0 || mesh.cad[HalfEdgeMesh.prev(h)] >= 0;
    return corner ? 0 : lower(cx - f * ex, cy - f * ey, cz - f * ez, a, b, c);
  }

  private int lower(double dx, double dy, double dz, int a, int b, int c) {
    double d2 = dx * dx + dy * dy + dz * dz;
    if (!(d2 > 0)) {
      return 0;
    }
    int count = 0;
    for (int k = 0; k < 3; k++) {
      int v = k == 0 ? a : k == 1 ? b : c;
      if (v < 0) {
        continue;
      }
      int at = Metric.STRIDE * v;
      double square = Metric.square(field.metric, at, dx, dy, dz);
      // Against the ungraded size, which does not follow the mesh into a cusp.
      double ungraded = Metric.square(field.raw, at, dx, dy, dz);
      if (square < TOO_SHORT * TOO_SHORT && ungraded > LEAST_SHARE * LEAST_SHARE) {
        double d = Math.sqrt(d2);
        Metric.addOuter(field.metric, at, (1 - square) / d2, dx / d, dy / d, dz / d);
        Metric.setIsotropic(wide, 0, maxAspect * d);
        Metric.intersect(field.metric, at, wide, work);
        count++;
      }
    }
    return count;
  }
}
