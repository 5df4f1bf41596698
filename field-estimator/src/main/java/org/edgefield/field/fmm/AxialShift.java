package org.edgefield.field.fmm;

/**
 * Translations along z of a batch of expansions, in which only coefficients of equal m mix. With
 * N_lm = sqrt((l-m)! (l+m)!) and lengths in units of the box side:
 *
 * <pre>
 *   multipole to multipole  M'_lm = sum_k (N_lm/N_km) d^(l-k)/(l-k)! (1/2)^k M_km        k = m .. l
 *   local to local          L'_km = sum_l (N_lm/N_km) d^(l-k)/(l-k)! (1/2)^(k+1) L_lm    l = k .. p
 *   multipole to local      L_jm  = sum_l (-1)^(j+m) (l+j)! / (N_lm N_jm d^(l+j+1)) M_lm  l = m .. p
 * </pre>
 *
 * The powers of one half rescale between a box and its child. Reference: addition theorems of the
 * solid harmonics, Hobson 1931 (memory; checked against direct sums in the tests); turning the axis
 * first makes the cost p^3 instead of p^4 (White and Head-Gordon, J. Chem. Phys. 105 (1996) 5061,
 * memory).
 */
final class AxialShift {
  private final int order;
  // Per m a square matrix of (order + 1 - m)^2, rows = output degree.
  private final double[][] matrix;

  private AxialShift(int order, double[][] matrix) {
    this.order = order;
    this.matrix = matrix;
  }

  /** One entry of a translation matrix: output degree, input degree, m. */
  private interface Entry {
    double at(int out, int in, int m);
  }

  private static AxialShift of(int order, Entry entry) {
    double[][] matrix = new double[order + 1][];
    for (int m = 0; m <= order; m++) {
      int n = order + 1 - m;
      matrix[m] = new double[n * n];
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          matrix[m][i * n + j] = entry.at(m + i, m + j, m);
        }
      }
    }
    return new AxialShift(order, matrix);
  }

  /** Multipole of a child, whose centre lies d (in parent sides) away, into its parent. */
  static AxialShift multipoleToParent(int order, double d) {
    return of(order, (l, k, m) -> k > l ? 0 : climb(l, k, m, d) * Math.scalb(1.0, -k));
  }

  /** Local expansion of a parent into a child, whose centre lies d (in parent sides) away. */
  static AxialShift localToChild(int order, double d) {
    return of(order, (k, l, m) -> k > l ? 0 : climb(l, k, m, d) * Math.scalb(1.0, -k - 1));
  }

  /** Multipole into the local expansion of a box of the same size, d sides away. */
  static AxialShift multipoleToLocal(int order, double d) {
    return of(
        order,
        (j, l, m) ->
            ((j + m & 1) == 0 ? 1 : -1)
                * Factorial.of(l + j)
                / (Factorial.norm(l, m) * Factorial.norm(j, m))
                * Math.pow(d, -(l + j + 1)));
  }

  private static double climb(int l, int k, int m, double d) {
    return Factorial.norm(l, m) / Factorial.norm(k, m) * Math.pow(d, l - k) / Factorial.of(l - k);
  }

  /**
   * Shifts a batch.
   *
   * @param lanes number of expansions in the batch
   * @param stride distance between coefficients
   * @param a in: coefficients a[k * stride + lane]
   * @param b out
   */
  void apply(int lanes, int stride, double[] a, double[] b) {
    for (int m = 0; m <= order; m++) {
      column(m, false, lanes, stride, a, b);
      if (m > 0) {
        column(m, true, lanes, stride, a, b);
      }
    }
  }

  private void column(int m, boolean sine, int lanes, int stride, double[] a, double[] b) {
    int n = order + 1 - m;
    double[] t = matrix[m];
    for (int i = 0; i < n; i++) {
      int to = index(m + i, m, sine) * stride;
      int at = i * n;
      int j = 0;
      for (int k = 0; k < lanes; k++) {
        b[to + k] = 0;
      }
      for (; j + 3 < n; j += 4) {
        double f0 = t[at + j];
        double f1 = t[at + j + 1];
        double f2 = t[at + j + 2];
        double f3 = t[at + j + 3];
        int p0 = index(m + j, m, sine) * stride;
        int p1 = index(m + j + 1, m, sine) * stride;
        int p2 = index(m + j + 2, m, sine) * stride;
        int p3 = index(m + j + 3, m, sine) * stride;
        for (int k = 0; k < lanes; k++) {
          b[to + k] += f0 * a[p0 + k] + f1 * a[p1 + k] + (f2 * a[p2 + k] + f3 * a[p3 + k]);
        }
      }
      for (; j < n; j++) {
        double f = t[at + j];
        int p = index(m + j, m, sine) * stride;
        for (int k = 0; k < lanes; k++) {
          b[to + k] += f * a[p + k];
        }
      }
    }
  }

  private static int index(int l, int m, boolean sine) {
    return sine ? SolidHarmonics.sine(l, m) : SolidHarmonics.cosine(l, m);
  }
}
