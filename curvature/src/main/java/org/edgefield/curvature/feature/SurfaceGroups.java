package org.edgefield.curvature.feature;

import org.edgefield.curvature.incidence.DisjointSets;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.SurfaceKind;

/**
 * Groups of faces that are pieces of one surface: they join tangentially, have the same kind, and
 * the same curvatures and directions on both sides of the join. A cylinder that a modeller split in
 * two halves is one group.
 */
final class SurfaceGroups {
  /** Relative difference up to which curvatures are the same; NURBS fits need more. */
  private static final double SAME = 1e-4;

  private static final double SAME_NURBS = 0.02;

  private SurfaceGroups() {}

  /**
   * Group per face: the smallest face number in it.
   *
   * @param tangent samples of all tangent edges
   */
  static int[] find(ExactGeometry geometry, EdgeSamples tangent) {
    int n = geometry.faceCount();
    DisjointSets sets = new DisjointSets(n);
    for (int i = 0; i < tangent.edges.length; i++) {
      int[] faces = geometry.edgeFaces(tangent.edges[i]);
      SurfaceKind kind = geometry.faceKind(faces[0]);
      if (kind != geometry.faceKind(faces[1])) {
        continue;
      }
      boolean analytic = kind != SurfaceKind.NURBS && kind != SurfaceKind.OTHER;
      boolean same = true;
      for (int j = tangent.start[i]; same && j < tangent.start[i + 1]; j++) {
        same =
            sameCurvature(
                tangent.side[0],
                tangent.side[1],
                EdgeSamples.STRIDE * j,
                analytic ? SAME : SAME_NURBS);
      }
      if (same) {
        sets.unite(faces[0], faces[1]);
      }
    }
    int[] group = new int[n];
    for (int f = 0; f < n; f++) {
      group[f] = sets.find(f);
    }
    return group;
  }

  private static boolean sameCurvature(double[] a, double[] b, int at, double tolerance) {
    double scale =
        Math.max(
            Math.max(Math.abs(a[at + 3]), Math.abs(a[at + 4])),
            Math.max(Math.abs(b[at + 3]), Math.abs(b[at + 4])));
    if (Math.abs(a[at + 3] - b[at + 3]) > tolerance * scale
        || Math.abs(a[at + 4] - b[at + 4]) > tolerance * scale) {
      return false;
    }
    if (a[at + 3] - a[at + 4] <= 2 * tolerance * scale) {
      return true; // umbilic: any direction is as good as another
    }
    double dot = a[at + 5] * b[at + 5] + a[at + 6] * b[at + 6] + a[at + 7] * b[at + 7];
    return dot * dot > 0.99;
  }
}
