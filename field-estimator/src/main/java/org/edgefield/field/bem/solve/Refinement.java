package org.edgefield.field.bem.solve;

import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Where the next mesh should be finer: element widths are cut where the field of some duty comes
 * near the peak of its electrode, and where raw and recovered values part by more than the
 * accuracy.
 */
final class Refinement {
  private static final double NEAR_PEAK = 0.6;
  private static final double CUT_AT_PEAK = 0.55;
  private static final double CUT_AT_ERROR = 0.7;

  private Refinement() {}

  /**
   * Wanted size per vertex of the level's mesh, metres, infinite where nothing is asked.
   *
   * @param width element width per vertex, from {@link #widths}
   * @param gaps wanted sizes in narrow gaps
   */
  static double[] targets(Level level, double[] width, GapCheck gaps, double accuracy) {
    ChargedSurface surface = level.surface();
    double[] target = gaps.target_m().clone();
    int electrodes = level.units().charge_C().length;
    for (int d = 0; d < level.raw().size(); d++) {
      double[] raw = level.raw().get(d);
      double[] smooth = level.recovered().get(d);
      double[] peak = new double[electrodes];
      for (int e = 0; e < electrodes; e++) {
        int p = level.peak(d, e);
        peak[e] = p < 0 ? Double.POSITIVE_INFINITY : smooth[p];
      }
      for (int i = 0; i < raw.length; i++) {
        if (surface.seam()[i]) {
          continue;
        }
        double top = peak[surface.electrode()[i]];
        int v = level.nodes().nodeVertex()[surface.unknownNode()[i]];
        if (smooth[i] > NEAR_PEAK * top) {
          target[v] = Math.min(target[v], CUT_AT_PEAK * width[v]);
        } else if (Math.abs(raw[i] - smooth[i]) > 2 * accuracy * top) {
          target[v] = Math.min(target[v], CUT_AT_ERROR * width[v]);
        }
      }
    }
    return target;
  }

  // Mean height of the triangles around a vertex, brought to the side of an equilateral one.
  static double[] widths(SurfaceMesh mesh) {
    double[] sum = new double[mesh.vertexCount()];
    int[] count = new int[sum.length];
    double[] x = mesh.xyz();
    double[] e = new double[9];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double longest = 0;
      for (int c = 0; c < 3; c++) {
        int a = 3 * mesh.triangles()[3 * t + c];
        int b = 3 * mesh.triangles()[3 * t + (c + 1) % 3];
        double square = 0;
        for (int k = 0; k < 3; k++) {
          e[3 * c + k] = x[b + k] - x[a + k];
          square += e[3 * c + k] * e[3 * c + k];
        }
        longest = Math.max(longest, square);
      }
      double nx = e[1] * e[5] - e[2] * e[4];
      double ny = e[2] * e[3] - e[0] * e[5];
      double nz = e[0] * e[4] - e[1] * e[3];
      double height = Math.sqrt((nx * nx + ny * ny + nz * nz) / longest);
      for (int c = 0; c < 3; c++) {
        int v = mesh.triangles()[3 * t + c];
        sum[v] += height;
        count[v]++;
      }
    }
    for (int v = 0; v < sum.length; v++) {
      sum[v] = count[v] == 0 ? Double.POSITIVE_INFINITY : 1.155 * sum[v] / count[v];
    }
    return sum;
  }
}
