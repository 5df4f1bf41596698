package org.edgefield.curvature.feature;

import java.util.Arrays;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.SurfaceMesh;

/** How far around its axis a cylindrical surface goes, from the normals of its triangles. */
final class NormalCoverage {
  private NormalCoverage() {}

  /**
   * Angle that the normals of each group of cylindrical faces cover, radians: a full turn less the
   * largest gap. 0 for other groups.
   *
   * @param group group per face, the smallest face in it
   */
  static double[] find(ExactGeometry geometry, SurfaceMesh mesh, int[] group, FaceForm[] forms) {
    int n = group.length;
    int[] start = new int[n + 1];
    for (int face : mesh.triangleFace()) {
      if (forms[face].form() == FaceForm.Kind.CYLINDER) {
        start[group[face] + 1]++;
      }
    }
    for (int g = 0; g < n; g++) {
      start[g + 1] += start[g];
    }
    double[] angle = new double[start[n]];
    int[] fill = start.clone();
    double[][] frame = new double[n][];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int face = mesh.triangleFace()[t];
      if (forms[face].form() != FaceForm.Kind.CYLINDER) {
        continue;
      }
      int g = group[face];
      if (frame[g] == null) {
        frame[g] = frame(geometry, face, mesh.cornerUv(), 6 * t);
      }
      double[] c = Triangles.normal(mesh, t);
      double[] f = frame[g];
      angle[fill[g]++] =
          Math.atan2(
              c[0] * f[3] + c[1] * f[4] + c[2] * f[5], c[0] * f[0] + c[1] * f[1] + c[2] * f[2]);
    }
    double[] coverage = new double[n];
    for (int g = 0; g < n; g++) {
      if (start[g + 1] > start[g]) {
        Arrays.sort(angle, start[g], start[g + 1]);
        double gap = angle[start[g]] + 2 * Math.PI - angle[start[g + 1] - 1];
        for (int i = start[g] + 1; i < start[g + 1]; i++) {
          gap = Math.max(gap, angle[i] - angle[i - 1]);
        }
        coverage[g] = 2 * Math.PI - gap;
      }
    }
    return coverage;
  }

  /** Normal and the direction of curvature at one corner: they span the plane across the axis. */
  private static double[] frame(ExactGeometry geometry, int face, double[] uv, int at) {
    double[] c = new double[ExactGeometry.CURVATURE_STRIDE];
    geometry.curvature(1, new int[] {face}, new double[] {uv[at], uv[at + 1]}, c);
    int d = Math.abs(c[3]) > Math.abs(c[4]) ? 5 : 8;
    return new double[] {c[0], c[1], c[2], c[d], c[d + 1], c[d + 2]};
  }
}
