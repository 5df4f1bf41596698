package org.edgefield.field.bem.solve;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.edgefield.field.job.FieldCase;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleCursor.Side;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * Looks at how parts touch: surfaces of one electrode hidden inside or pressed against another of
 * its parts carry no charge; parts of two electrodes must not touch or intersect.
 */
final class ContactCheck {
  /** Closer than this share of the part's size counts as touching. */
  private static final double TOUCHING = 1e-6;

  /** How far above a triangle its test point lies, in diameters. */
  private static final double LIFT = 1e-3;

  private ContactCheck() {}

  /**
   * Finds hidden triangles.
   *
   * @return mark per triangle: it lies inside or against another part of its own electrode
   */
  static boolean[] hidden(Assembly assembly, SurfaceMesh mesh, int[] electrodeOfPart) {
    int[] part = parts(assembly, mesh);
    boolean[] hidden = new boolean[part.length];
    TriangleTree tree = TriangleTree.build(mesh.xyz(), mesh.triangles(), part);
    InsideTest test = new InsideTest(tree);
    List<Part> parts = assembly.parts();
    double[] g = new double[7];
    for (int t = 0; t < part.length; t++) {
      int e = electrodeOfPart[part[t]];
      if (e < 0) {
        continue;
      }
      boolean ready = false;
      for (Part other : parts) {
        if (other.index() == part[t] || electrodeOfPart[other.index()] != e) {
          continue;
        }
        if (!ready) {
          lifted(mesh, t, g);
          ready = true;
        }
        if (within(other, g) && test.inside(other.index(), g[0], g[1], g[2])) {
          hidden[t] = true;
          break;
        }
      }
    }
    return hidden;
  }

  private static boolean within(Part part, double[] p) {
    double[] b = part.bounds_m();
    for (int k = 0; k < 3; k++) {
      if (p[k] < b[k] || p[k] > b[3 + k]) {
        return false;
      }
    }
    return true;
  }

  // Centroid lifted a little along the normal.
  private static void lifted(SurfaceMesh mesh, int t, double[] out) {
    double[] x = mesh.xyz();
    int a = 3 * mesh.triangles()[3 * t];
    int b = 3 * mesh.triangles()[3 * t + 1];
    int c = 3 * mesh.triangles()[3 * t + 2];
    double ux = x[b] - x[a];
    double uy = x[b + 1] - x[a + 1];
    double uz = x[b + 2] - x[a + 2];
    double vx = x[c] - x[a];
    double vy = x[c + 1] - x[a + 1];
    double vz = x[c + 2] - x[a + 2];
    double nx = uy * vz - uz * vy;
    double ny = uz * vx - ux * vz;
    double nz = ux * vy - uy * vx;
    double n = Math.sqrt(nx * nx + ny * ny + nz * nz);
    double lift =
        n > 0
            ? LIFT
                * Math.sqrt(Math.max(ux * ux + uy * uy + uz * uz, vx * vx + vy * vy + vz * vz))
                / n
            : 0;
    out[0] = (x[a] + x[b] + x[c]) / 3 + lift * nx;
    out[1] = (x[a + 1] + x[b + 1] + x[c + 1]) / 3 + lift * ny;
    out[2] = (x[a + 2] + x[b + 2] + x[c + 2]) / 3 + lift * nz;
  }

  /**
   * Refuses parts of different electrodes that touch or intersect.
   *
   * @throws SolveException naming both parts and the place
   */
  static void refuseShorts(Assembly assembly, SurfaceMesh mesh, FieldCase fieldCase) {
    List<Part> parts = assembly.parts();
    int[] electrodeOfPart = fieldCase.electrodeOfPart(parts.size());
    int[] part = parts(assembly, mesh);
    TriangleTree tree = TriangleTree.build(mesh.xyz(), mesh.triangles(), part);
    InsideTest test = new InsideTest(tree);
    TriangleCursor cursor = tree.cursor();
    boolean[] seen = new boolean[mesh.vertexCount()];
    boolean[][] others = new boolean[fieldCase.electrodes().size()][parts.size()];
    for (int e = 0; e < others.length; e++) {
      for (int p = 0; p < parts.size(); p++) {
        others[e][p] = electrodeOfPart[p] >= 0 && electrodeOfPart[p] != e;
      }
    }
    refuseCrossings(assembly, mesh, electrodeOfPart, part, others, tree.cursor());
    int allowed = -1;
    for (int c = 0; c < mesh.triangles().length; c++) {
      int v = mesh.triangles()[c];
      int own = part[c / 3];
      int e = electrodeOfPart[own];
      if (seen[v] || e < 0) {
        continue;
      }
      seen[v] = true;
      if (allowed != e) {
        cursor.allow(others[e]);
        allowed = e;
      }
      double[] p = Arrays.copyOfRange(mesh.xyz(), 3 * v, 3 * v + 3);
      if (!cursor.nearest(p[0], p[1], p[2], Double.POSITIVE_INFINITY)) {
        continue;
      }
      int near = cursor.group();
      if (cursor.distance() < TOUCHING * parts.get(own).size_m()) {
        throw shorted(parts.get(own), parts.get(near), "touch", p);
      }
      for (Part other : parts) {
        if (others[e][other.index()]
            && within(other, p)
            && test.inside(other.index(), p[0], p[1], p[2])) {
          throw shorted(parts.get(own), other, "intersect", p);
        }
      }
    }
  }

  // Bodies may cross without a vertex of one inside the other: look along the sides of triangles.
  private static void refuseCrossings(
      Assembly assembly,
      SurfaceMesh mesh,
      int[] electrodeOfPart,
      int[] part,
      boolean[][] others,
      TriangleCursor cursor) {
    int allowed = -1;
    double[] x = mesh.xyz();
    for (int c = 0; c < mesh.triangles().length; c++) {
      int e = electrodeOfPart[part[c / 3]];
      int a = 3 * mesh.triangles()[c];
      int b = 3 * mesh.triangles()[c % 3 == 2 ? c - 2 : c + 1];
      // Each side belongs to two triangles, one of which runs it upwards.
      if (e < 0 || a > b) {
        continue;
      }
      if (allowed != e) {
        cursor.allow(others[e]);
        allowed = e;
      }
      double dx = x[b] - x[a];
      double dy = x[b + 1] - x[a + 1];
      double dz = x[b + 2] - x[a + 2];
      double length = Math.sqrt(dx * dx + dy * dy + dz * dz);
      if (length > 0
          && cursor.ray(x[a], x[a + 1], x[a + 2], dx, dy, dz, 0, length, Side.ENTERING)) {
        double[] at = new double[3];
        cursor.point(at, 0);
        throw shorted(
            assembly.parts().get(part[c / 3]),
            assembly.parts().get(cursor.group()),
            "intersect",
            at);
      }
    }
  }

  private static SolveException shorted(Part a, Part b, String how, double[] p) {
    return new SolveException(
        String.format(
            Locale.ROOT,
            "parts %s and %s of different electrodes %s at (%.3f, %.3f, %.3f) mm; move one of them,"
                + " put both in one electrode, or list one under ignore",
            a.name(),
            b.name(),
            how,
            1e3 * p[0],
            1e3 * p[1],
            1e3 * p[2]));
  }

  private static int[] parts(Assembly assembly, SurfaceMesh mesh) {
    int[] part = new int[mesh.triangleCount()];
    for (int t = 0; t < part.length; t++) {
      part[t] = assembly.geometry().facePart(mesh.triangleFace()[t]);
    }
    return part;
  }
}
