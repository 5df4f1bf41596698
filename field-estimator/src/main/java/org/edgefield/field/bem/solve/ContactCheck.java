package org.edgefield.field.bem.solve;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.edgefield.field.contact.HiddenTriangles;
import org.edgefield.field.contact.InsideTest;
import org.edgefield.field.job.FieldCase;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleCursor.Side;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/** Parts of two electrodes must not touch or intersect. */
final class ContactCheck {
  /** Closer than this share of the part's size counts as touching. */
  private static final double TOUCHING = 1e-6;

  private ContactCheck() {}

  /**
   * Refuses parts of different electrodes that touch or intersect.
   *
   * @throws SolveException naming both parts and the place
   */
  static void refuseShorts(Assembly assembly, SurfaceMesh mesh, FieldCase fieldCase) {
    List<Part> parts = assembly.parts();
    int[] electrodeOfPart = fieldCase.electrodeOfPart(parts.size());
    int[] part = HiddenTriangles.parts(assembly, mesh);
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
            && HiddenTriangles.within(other, p)
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
}
