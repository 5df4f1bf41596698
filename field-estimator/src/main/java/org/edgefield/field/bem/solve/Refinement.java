package org.edgefield.field.bem.solve;

import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Where the next mesh should be finer: at the peaks, where the field near them still bends within
 * an element, where raw and recovered values part, and in narrow gaps. Electrodes whose peaks are
 * good already ask for nothing.
 */
final class Refinement {
  /** Share of the peak above which elements are always cut. */
  private static final double AT_PEAK = 0.97;

  /** Share of the peak above which elements are cut where the field bends. */
  private static final double NEAR_PEAK = 0.6;

  /** Departure from the neighbours' mean, over accuracy and peak, that counts as a bend. */
  private static final double BEND = 0.25;

  private static final double CUT_AT_ERROR = 0.7;
  private static final double FIRST_CUT = 0.55;

  private Refinement() {}

  /**
   * Wanted size per vertex of the level's mesh, metres, infinite where nothing is asked.
   *
   * @param width element width per vertex, from {@link #widths}
   * @param gaps wanted sizes in narrow gaps
   * @param uncertainty claimed per duty and electrode
   * @param first whether this is the first level, whose uncertainties are not to be trusted
   */
  static double[] targets(
      Level level,
      double[] width,
      GapCheck gaps,
      double[][] uncertainty,
      double accuracy,
      boolean first) {
    ChargedSurface surface = level.surface();
    double[] target = gaps.target_m().clone();
    for (int d = 0; d < level.raw().size(); d++) {
      double[] raw = level.raw().get(d);
      double[] smooth = level.recovered().get(d);
      double[] bend = bends(surface, smooth);
      for (int e = 0; e < uncertainty[d].length; e++) {
        int p = level.peak(d, e);
        if (p < 0 || (!first && uncertainty[d][e] <= accuracy)) {
          continue;
        }
        double top = smooth[p];
        // Errors go with the square of the size.
        double cut =
            first
                ? FIRST_CUT
                : Math.max(0.5, Math.min(0.7, 0.85 * Math.sqrt(accuracy / uncertainty[d][e])));
        for (int i = 0; i < raw.length; i++) {
          if (surface.electrode()[i] != e || level.zoneEdge()[i] >= 0) {
            continue;
          }
          int v = level.nodes().nodeVertex()[surface.unknownNode()[i]];
          double error = Math.abs(raw[i] - smooth[i]) / (accuracy * top);
          double bent = Math.max(error, bend[i] / (accuracy * top));
          if (smooth[i] > AT_PEAK * top || (smooth[i] > NEAR_PEAK * top && bent > BEND)) {
            target[v] = Math.min(target[v], cut * width[v]);
          } else if (error > 2) {
            target[v] = Math.min(target[v], CUT_AT_ERROR * width[v]);
          }
        }
      }
    }
    return target;
  }

  /** How far each value lies from the mean of its neighbours. */
  private static double[] bends(ChargedSurface surface, double[] value) {
    double[] sum = new double[value.length];
    int[] count = new int[value.length];
    int[] corner = surface.cornerUnknown();
    for (int c = 0; c < corner.length; c++) {
      int base = c - c % 3;
      sum[corner[c]] += value[corner[base + (c + 1) % 3]] + value[corner[base + (c + 2) % 3]];
      count[corner[c]] += 2;
    }
    for (int i = 0; i < sum.length; i++) {
      sum[i] = Math.abs(sum[i] / count[i] - value[i]);
    }
    return sum;
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
