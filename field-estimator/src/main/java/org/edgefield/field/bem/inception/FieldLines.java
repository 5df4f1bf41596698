package org.edgefield.field.bem.inception;

import org.edgefield.field.bem.evaluate.FieldEvaluator;

/**
 * Field lines that leave conductors, traced together in a solved field.
 *
 * <p>A line begins along the normal. Its points are then moved three times so that each step runs
 * along the mean direction of the field at its two ends (Picard's iteration), which takes one
 * evaluation of all points of all lines each time. The field at the surface is the caller's.
 *
 * @param distance_m per line, distances along it, from 0 on
 * @param field_V_per_m per line, field strength there; shorter where the line met another conductor
 */
record FieldLines(double[][] distance_m, double[][] field_V_per_m) {
  private static final int POINTS = 40;
  private static final int SWEEPS = 3;

  /** Field over that at the first point below which a point lies within metal. */
  private static final double INSIDE = 1e-3;

  /**
   * A line to trace.
   *
   * @param start point on the surface
   * @param normal outward unit normal
   * @param weight weight of each solved set at the moment of the highest field
   * @param surface_V_per_m field strength at the start
   * @param first_m distance of the first point
   * @param length_m length of the line
   */
  record Line(
      double[] start,
      double[] normal,
      double[] weight,
      double surface_V_per_m,
      double first_m,
      double length_m) {}

  static FieldLines trace(FieldEvaluator evaluator, Line[] lines) {
    int n = lines.length;
    double[][] s = new double[n][POINTS + 1];
    double[] points = new double[3 * n * POINTS];
    double[][] strength = new double[n][POINTS + 1];
    for (int i = 0; i < n; i++) {
      s[i] = distances(lines[i]);
      for (int j = 0; j < POINTS; j++) {
        for (int k = 0; k < 3; k++) {
          points[3 * (i * POINTS + j) + k] = lines[i].start[k] + s[i][j + 1] * lines[i].normal[k];
        }
      }
    }
    for (int sweep = 0; ; sweep++) {
      double[][] sets = evaluator.at(points).field_V_per_m();
      for (int i = 0; i < n; i++) {
        follow(lines[i], s[i], sets, i * POINTS, sweep < SWEEPS ? points : null, strength[i]);
      }
      if (sweep == SWEEPS) {
        break;
      }
    }
    for (int i = 0; i < n; i++) {
      int end = 2;
      while (end <= POINTS && strength[i][end] > INSIDE * strength[i][1]) {
        end++;
      }
      s[i] = java.util.Arrays.copyOf(s[i], end);
      strength[i] = java.util.Arrays.copyOf(strength[i], end);
    }
    return new FieldLines(s, strength);
  }

  /** Distances that grow by a constant factor from the first to the whole length. */
  private static double[] distances(Line line) {
    double[] s = new double[POINTS + 1];
    double low = 1;
    double high = 4;
    // Sum of the first POINTS terms of the geometric series.
    for (int i = 0; i < 60; i++) {
      double q = 0.5 * (low + high);
      double sum = q == 1 ? POINTS : (Math.pow(q, POINTS) - 1) / (q - 1);
      if (line.first_m * sum < line.length_m) {
        low = q;
      } else {
        high = q;
      }
    }
    double step = Math.min(line.first_m, line.length_m / POINTS);
    for (int j = 1; j <= POINTS; j++) {
      s[j] = s[j - 1] + step;
      step *= low;
    }
    return s;
  }

  private static void follow(
      Line line, double[] s, double[][] sets, int first, double[] points, double[] strength) {
    double[] direction = line.normal.clone();
    double[] at = line.start.clone();
    strength[0] = line.surface_V_per_m;
    double[] here = new double[3];
    for (int j = 0; j < s.length - 1; j++) {
      int p = 3 * (first + j);
      double along = 0;
      double square = 0;
      for (int k = 0; k < 3; k++) {
        here[k] = 0;
        for (int set = 0; set < sets.length; set++) {
          here[k] += line.weight[set] * sets[set][p + k];
        }
        along += here[k] * direction[k];
        square += here[k] * here[k];
      }
      double length = Math.sqrt(square);
      strength[j + 1] = length;
      if (points == null) {
        continue;
      }
      double mean = 0;
      double[] step = new double[3];
      for (int k = 0; k < 3; k++) {
        // A line is followed from the metal outwards, whichever way the field points.
        double next = length > 0 ? (along < 0 ? -here[k] : here[k]) / length : direction[k];
        step[k] = direction[k] + next;
        direction[k] = next;
        mean += step[k] * step[k];
      }
      mean = Math.sqrt(mean);
      for (int k = 0; k < 3; k++) {
        at[k] += mean > 0 ? (s[j + 1] - s[j]) * step[k] / mean : 0;
        points[p + k] = at[k];
      }
    }
  }
}
