package org.edgefield.importer.mesh.remesh;

import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;
import org.edgefield.importer.mesh.size.Metric;
import org.edgefield.importer.mesh.size.VertexField;

/**
 * Shape of triangles in the mean of the size tensors of their corners: 4 sqrt(3) area / sum of
 * squared sides, 1 for an equilateral triangle, 0 for a flat one. A triangle that does not face
 * along the outward normals of its corners, or is folded over in the parameters of its face, gets a
 * negative value instead, the lower the worse, so that every operation that raises the least value
 * also turns triangles the right way.
 */
final class Shape {
  /** Least cosine between a triangle's normal and the surface normals at its corners. */
  static final double LEAST_FACING = 0.25;

  private static final double FOUR_ROOT_THREE = 4 * Math.sqrt(3);

  private static final double UNIT_AREA = Math.sqrt(3) / 4;

  private Shape() {}

  /**
   * Shape of a triangle of vertices a, b, c whose corner normals are those of the half-edges ha,
   * hb, hc.
   */
  static double of(
      HalfEdgeMesh mesh, VertexField field, int a, int b, int c, int ha, int hb, int hc) {
    double facing = facing(mesh, a, b, c, ha, hb, hc);
    if (!unfolded(mesh, ha, hb, hc)) {
      return Math.min(facing, 0) - 1 - LEAST_FACING;
    }
    return facing < LEAST_FACING ? facing - LEAST_FACING : inMetric(mesh, field, a, b, c);
  }

  /** Shape of triangle t. */
  static double ofTriangle(HalfEdgeMesh mesh, VertexField field, int t) {
    int h = 3 * t;
    return of(mesh, field, mesh.org[h], mesh.org[h + 1], mesh.org[h + 2], h, h + 1, h + 2);
  }

  /**
   * Whether a triangle runs the right way round in the parameters of its face. A first mesh whose
   * chords are longer than a fillet is wide may face anywhere in space, yet is sound there.
   */
  static boolean unfolded(HalfEdgeMesh mesh, int ha, int hb, int hc) {
    return mesh.pole[ha] != 0
        || mesh.pole[hb] != 0
        || mesh.pole[hc] != 0
        || turn(mesh, ha, mesh.uv, 2 * ha, 2 * hb, 2 * hc) >= 0;
  }

  /** Twice the area in parameters of the corners at three places, positive the right way round. */
  static double turn(HalfEdgeMesh mesh, int h, double[] mid, int a, int b, int c) {
    double area =
        (mid[b] - mid[a]) * (mid[c + 1] - mid[a + 1])
            - (mid[b + 1] - mid[a + 1]) * (mid[c] - mid[a]);
    return area * mesh.faceSign[mesh.face[h / 3] - mesh.firstFace];
  }

  /** Least cosine between the triangle's normal and the corner normals; -1 where it has no area. */
  static double facing(HalfEdgeMesh mesh, int a, int b, int c, int ha, int hb, int hc) {
    double[] x = mesh.xyz;
    double ux = x[3 * b] - x[3 * a];
    double uy = x[3 * b + 1] - x[3 * a + 1];
    double uz = x[3 * b + 2] - x[3 * a + 2];
    double vx = x[3 * c] - x[3 * a];
    double vy = x[3 * c + 1] - x[3 * a + 1];
    double vz = x[3 * c + 2] - x[3 * a + 2];
    double nx = uy * vz - uz * vy;
    double ny = uz * vx - ux * vz;
    double nz = ux * vy - uy * vx;
    double area2 = nx * nx + ny * ny + nz * nz;
    double scale = ux * ux + uy * uy + uz * uz + vx * vx + vy * vy + vz * vz;
    if (!(area2 > 1e-20 * scale * scale)) {
      return -1;
    }
    double least = Math.min(dot(mesh, ha, nx, ny, nz), dot(mesh, hb, nx, ny, nz));
    return Math.min(least, dot(mesh, hc, nx, ny, nz)) / Math.sqrt(area2);
  }

  private static double dot(HalfEdgeMesh mesh, int h, double nx, double ny, double nz) {
    if (mesh.pole[h] != 0) {
      return Double.POSITIVE_INFINITY;
    }
    double[] n = mesh.normal;
    return n[3 * h] * nx + n[3 * h + 1] * ny + n[3 * h + 2] * nz;
  }

  /** Area of a triangle in the mean tensor of its corners, in units of an equilateral element. */
  static double elements(HalfEdgeMesh mesh, VertexField field, int t) {
    double[] x = mesh.xyz;
    int a = mesh.org[3 * t];
    int b = mesh.org[3 * t + 1];
    int c = mesh.org[3 * t + 2];
    double[] m = new double[Metric.STRIDE];
    for (int i = 0; i < Metric.STRIDE; i++) {
      m[i] =
          (field.metric[Metric.STRIDE * a + i]
                  + field.metric[Metric.STRIDE * b + i]
                  + field.metric[Metric.STRIDE * c + i])
              / 3;
    }
    double uu = square(m, x, a, b);
    double vv = square(m, x, a, c);
    double uv = 0.5 * (uu + vv - square(m, x, b, c));
    return 0.5 * Math.sqrt(Math.max(0, uu * vv - uv * uv)) / UNIT_AREA;
  }

  private static double square(double[] m, double[] x, int a, int b) {
    return Metric.square(
        m, 0, x[3 * b] - x[3 * a], x[3 * b + 1] - x[3 * a + 1], x[3 * b + 2] - x[3 * a + 2]);
  }

  private static double inMetric(HalfEdgeMesh mesh, VertexField field, int a, int b, int c) {
    double[] m = field.metric;
    double[] x = mesh.xyz;
    int ia = Metric.STRIDE * a;
    int ib = Metric.STRIDE * b;
    int ic = Metric.STRIDE * c;
    double xx = m[ia] + m[ib] + m[ic];
    double xy = m[ia + 1] + m[ib + 1] + m[ic + 1];
    double xz = m[ia + 2] + m[ib + 2] + m[ic + 2];
    double yy = m[ia + 3] + m[ib + 3] + m[ic + 3];
    double yz = m[ia + 4] + m[ib + 4] + m[ic + 4];
    double zz = m[ia + 5] + m[ib + 5] + m[ic + 5];
    double ux = x[3 * b] - x[3 * a];
    double uy = x[3 * b + 1] - x[3 * a + 1];
    double uz = x[3 * b + 2] - x[3 * a + 2];
    double vx = x[3 * c] - x[3 * a];
    double vy = x[3 * c + 1] - x[3 * a + 1];
    double vz = x[3 * c + 2] - x[3 * a + 2];
    double px = xx * ux + xy * uy + xz * uz;
    double py = xy * ux + yy * uy + yz * uz;
    double pz = xz * ux + yz * uy + zz * uz;
    double uu = ux * px + uy * py + uz * pz;
    double uv = vx * px + vy * py + vz * pz;
    double vv =
        xx * vx * vx
            + yy * vy * vy
            + zz * vz * vz
            + 2 * (xy * vx * vy + xz * vx * vz + yz * vy * vz);
    double area = 0.5 * Math.sqrt(Math.max(0, uu * vv - uv * uv));
    double sides = uu + vv + (uu + vv - 2 * uv);
    return FOUR_ROOT_THREE * area / sides;
  }

  /** Length of half-edge h in elements: the mean of what the tensors of its two ends measure. */
  static double length(HalfEdgeMesh mesh, VertexField field, int h) {
    return length(mesh, field, mesh.org[h], mesh.dest(h));
  }

  /** Length from vertex a to vertex b in elements. */
  static double length(HalfEdgeMesh mesh, VertexField field, int a, int b) {
    double[] x = mesh.xyz;
    double ex = x[3 * b] - x[3 * a];
    double ey = x[3 * b + 1] - x[3 * a + 1];
    double ez = x[3 * b + 2] - x[3 * a + 2];
    return 0.5
        * (Math.sqrt(Metric.square(field.metric, Metric.STRIDE * a, ex, ey, ez))
            + Math.sqrt(Metric.square(field.metric, Metric.STRIDE * b, ex, ey, ez)));
  }
}
