package org.edgefield.field.fmm;

/**
 * Direct sums over near sources. Distances to a run of sources go into a buffer first (a loop
 * without carried sums, which the compiler turns into vector code), then each right-hand side is a
 * dot product with it.
 */
final class NearField {
  private static final int RUN = 1024;

  private final int rights;
  private final double[] x = new double[RUN];
  private final double[] y = new double[RUN];
  private final double[] z = new double[RUN];
  private final double[][] q;
  private final double[] inverse = new double[RUN];
  private final double[] weighted = new double[RUN];

  NearField(int rights) {
    this.rights = rights;
    this.q = new double[rights][RUN];
  }

  /** Sorted points and strengths a sum runs over. */
  record Points(double[] x, double[] y, double[] z, double[][] strength) {}

  /**
   * Adds the sums over source ranges to targets.
   *
   * @param ranges {begin, end} pairs of sorted sources
   * @param sources sources in sorted order
   * @param targets targets in sorted order; strengths unused
   * @param from first target
   * @param to past the last target
   * @param potential per right-hand side, sorted targets; added to
   * @param gradient per right-hand side 3 per sorted target, added to; null if not wanted
   */
  void add(
      int[] ranges,
      Points sources,
      Points targets,
      int from,
      int to,
      double[][] potential,
      double[][] gradient) {
    int filled = 0;
    for (int r = 0; r < ranges.length; r += 2) {
      for (int begin = ranges[r]; begin < ranges[r + 1]; ) {
        int n = Math.min(ranges[r + 1] - begin, RUN - filled);
        System.arraycopy(sources.x, begin, x, filled, n);
        System.arraycopy(sources.y, begin, y, filled, n);
        System.arraycopy(sources.z, begin, z, filled, n);
        for (int k = 0; k < rights; k++) {
          System.arraycopy(sources.strength[k], begin, q[k], filled, n);
        }
        filled += n;
        begin += n;
        if (filled == RUN) {
          run(filled, targets, from, to, potential, gradient);
          filled = 0;
        }
      }
    }
    if (filled > 0) {
      run(filled, targets, from, to, potential, gradient);
    }
  }

  private void run(
      int n, Points targets, int from, int to, double[][] potential, double[][] gradient) {
    for (int t = from; t < to; t++) {
      double tx = targets.x[t];
      double ty = targets.y[t];
      double tz = targets.z[t];
      distances(n, tx, ty, tz);
      for (int k = 0; k < rights; k++) {
        double sum = dot(n, q[k], inverse);
        if (!(Math.abs(sum) <= Double.MAX_VALUE)) {
          // A source coincides with the target: it does not act on itself.
          for (int i = 0; i < n; i++) {
            if (inverse[i] > Double.MAX_VALUE) {
              inverse[i] = 0;
            }
          }
          sum = dot(n, q[k], inverse);
        }
        potential[k][t] += sum;
        if (gradient != null) {
          gradient(n, q[k], tx, ty, tz, gradient[k], 3 * t);
        }
      }
    }
  }

  private void distances(int n, double tx, double ty, double tz) {
    for (int i = 0; i < n; i++) {
      double dx = tx - x[i];
      double dy = ty - y[i];
      double dz = tz - z[i];
      inverse[i] = 1 / Math.sqrt(dx * dx + dy * dy + dz * dz);
    }
  }

  private void gradient(
      int n, double[] strength, double tx, double ty, double tz, double[] out, int at) {
    for (int i = 0; i < n; i++) {
      weighted[i] = strength[i] * inverse[i] * inverse[i] * inverse[i];
    }
    double gx = 0;
    double gy = 0;
    double gz = 0;
    for (int i = 0; i < n; i++) {
      gx += weighted[i] * (x[i] - tx);
      gy += weighted[i] * (y[i] - ty);
      gz += weighted[i] * (z[i] - tz);
    }
    out[at] += gx;
    out[at + 1] += gy;
    out[at + 2] += gz;
  }

  private static double dot(int n, double[] a, double[] b) {
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double s3 = 0;
    int i = 0;
    for (; i + 3 < n; i += 4) {
      s0 += a[i] * b[i];
      s1 += a[i + 1] * b[i + 1];
      s2 += a[i + 2] * b[i + 2];
      s3 += a[i + 3] * b[i + 3];
    }
    for (; i < n; i++) {
      s0 += a[i] * b[i];
    }
    return (s0 + s1) + (s2 + s3);
  }
}
