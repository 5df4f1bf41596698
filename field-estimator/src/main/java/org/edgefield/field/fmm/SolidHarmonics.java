package org.edgefield.field.fmm;

import java.util.Arrays;

/**
 * Real solid harmonics in Schmidt semi-normalisation, evaluated for a batch of points at once.
 *
 * <p>Regular rho_lm(x) = |x|^l Y_lm, irregular sigma_lm(x) = Y_lm / |x|^(l+1), with sum_m Y_lm(x)
 * Y_lm(y) = P_l(cos angle), so that for |y| &lt; |x|
 *
 * <pre>  1 / |x - y| = sum_lm rho_lm(y) sigma_lm(x)</pre>
 *
 * <p>Coefficients are numbered l^2 for m = 0, l^2 + 2m - 1 for cos(m phi), l^2 + 2m for sin(m phi).
 * Recurrences: sectoral rho_mm = sqrt((2m-1)/(2m)) (x + i y) rho_(m-1)(m-1), then upwards in l;
 * they involve no angles and are stable for any direction. Reference: Hobson, The Theory of
 * Spherical and Ellipsoidal Harmonics, 1931, chapter 4 (memory; checked against 1/|x - y| in the
 * tests).
 */
final class SolidHarmonics {
  private final int order;
  private final double[] up;
  private final double[] down;

  /** Prepares recurrences up to degree {@code order}. */
  SolidHarmonics(int order) {
    this.order = order;
    up = new double[(order + 1) * (order + 1)];
    down = new double[(order + 1) * (order + 1)];
    for (int l = 1; l <= order; l++) {
      for (int m = 0; m < l; m++) {
        double norm = 1 / Math.sqrt((double) (l - m) * (l + m));
        up[l * (order + 1) + m] = (2 * l - 1) * norm;
        down[l * (order + 1) + m] = Math.sqrt((double) (l - 1 - m) * (l - 1 + m)) * norm;
      }
    }
  }

  /** Number of coefficients up to a degree. */
  static int count(int order) {
    return (order + 1) * (order + 1);
  }

  /** Index of the cosine coefficient (l, m), m &gt;= 0. */
  static int cosine(int l, int m) {
    return m == 0 ? l * l : l * l + 2 * m - 1;
  }

  /** Index of the sine coefficient (l, m), m &gt;= 1. */
  static int sine(int l, int m) {
    return l * l + 2 * m;
  }

  /**
   * Regular harmonics of a batch.
   *
   * @param n number of points, at most {@code stride}
   * @param x coordinates, length n
   * @param y coordinates, length n
   * @param z coordinates, length n
   * @param stride distance between coefficients in {@code out}
   * @param out out[coefficient * stride + point], all degrees up to the order
   */
  void regular(int n, double[] x, double[] y, double[] z, int stride, double[] out) {
    for (int i = 0; i < n; i++) {
      out[i] = 1;
    }
    for (int m = 0; m <= order; m++) {
      if (m >= 1) {
        sectoral(m, n, x, y, stride, out);
      }
      for (int l = m + 1; l <= order; l++) {
        double a = up[l * (order + 1) + m];
        double b = down[l * (order + 1) + m];
        climb(l, m, false, a, b, n, x, y, z, stride, out);
        if (m >= 1) {
          climb(l, m, true, a, b, n, x, y, z, stride, out);
        }
      }
    }
  }

  private static void sectoral(int m, int n, double[] x, double[] y, int stride, double[] out) {
    double f = m == 1 ? 1 : Math.sqrt((2 * m - 1) / (2.0 * m));
    int c = cosine(m, m) * stride;
    int s = sine(m, m) * stride;
    int c0 = cosine(m - 1, m - 1) * stride;
    if (m == 1) {
      for (int i = 0; i < n; i++) {
        out[c + i] = x[i];
        out[s + i] = y[i];
      }
      return;
    }
    int s0 = sine(m - 1, m - 1) * stride;
    for (int i = 0; i < n; i++) {
      out[c + i] = f * (x[i] * out[c0 + i] - y[i] * out[s0 + i]);
    }
    for (int i = 0; i < n; i++) {
      out[s + i] = f * (x[i] * out[s0 + i] + y[i] * out[c0 + i]);
    }
  }

  private static void climb(
      int l,
      int m,
      boolean sine,
      double a,
      double b,
      int n,
      double[] x,
      double[] y,
      double[] z,
      int stride,
      double[] out) {
    int at = (sine ? sine(l, m) : cosine(l, m)) * stride;
    int one = (sine ? sine(l - 1, m) : cosine(l - 1, m)) * stride;
    if (l == m + 1) {
      for (int i = 0; i < n; i++) {
        out[at + i] = a * z[i] * out[one + i];
      }
      return;
    }
    int two = (sine ? sine(l - 2, m) : cosine(l - 2, m)) * stride;
    for (int i = 0; i < n; i++) {
      double r2 = x[i] * x[i] + y[i] * y[i] + z[i] * z[i];
      out[at + i] = a * z[i] * out[one + i] - b * r2 * out[two + i];
    }
  }

  /**
   * Irregular harmonics of a batch: the regular ones divided by |x|^(2l+1). Arguments as in {@link
   * #regular}; no point may lie in the origin.
   */
  void irregular(int n, double[] x, double[] y, double[] z, int stride, double[] out) {
    double[] inverse = new double[n];
    double[] factor = new double[n];
    for (int i = 0; i < n; i++) {
      inverse[i] = 1 / (x[i] * x[i] + y[i] * y[i] + z[i] * z[i]);
      factor[i] = Math.sqrt(inverse[i]);
    }
    regular(n, x, y, z, stride, out);
    for (int l = 0; l <= order; l++) {
      for (int k = l * l; k < (l + 1) * (l + 1); k++) {
        int at = k * stride;
        for (int i = 0; i < n; i++) {
          out[at + i] *= factor[i];
        }
      }
      for (int i = 0; i < n; i++) {
        factor[i] *= inverse[i];
      }
    }
  }

  /**
   * Coefficients of the partial derivatives of a local expansion sum L_lm rho_lm of degree up to
   * the order; the derivatives have one degree less.
   *
   * @param local coefficients
   * @param at start in {@code local}
   * @param dx out: coefficients of d/dx, zeroed here
   * @param dy out: coefficients of d/dy
   * @param dz out: coefficients of d/dz
   */
  void localGradient(double[] local, int at, double[] dx, double[] dy, double[] dz) {
    int n = count(order);
    Arrays.fill(dx, 0, n, 0);
    Arrays.fill(dy, 0, n, 0);
    Arrays.fill(dz, 0, n, 0);
    for (int l = 1; l <= order; l++) {
      for (int m = 0; m <= l; m++) {
        double c = local[at + cosine(l, m)];
        double s = m == 0 ? 0 : local[at + sine(l, m)];
        if (m < l) {
          along(l - 1, m, Math.sqrt((double) (l - m) * (l + m)), c, s, dz);
        }
        double lower = Math.sqrt((double) (l + m) * (l + m - 1));
        double raise = m + 1 > l - 1 ? 0 : Math.sqrt((double) (l - m) * (l - m - 1));
        across(l - 1, m, lower, raise, c, s, dx, dy);
      }
    }
  }

  /**
   * Coefficients of the partial derivatives of a multipole expansion sum M_lm sigma_lm of degree up
   * to one less than the order; the derivatives reach the order.
   *
   * @param multipole coefficients up to degree order - 1
   * @param at start in {@code multipole}
   * @param dx out: coefficients of d/dx up to the order, zeroed here
   * @param dy out: coefficients of d/dy
   * @param dz out: coefficients of d/dz
   */
  void multipoleGradient(double[] multipole, int at, double[] dx, double[] dy, double[] dz) {
    int n = count(order);
    Arrays.fill(dx, 0, n, 0);
    Arrays.fill(dy, 0, n, 0);
    Arrays.fill(dz, 0, n, 0);
    for (int l = 0; l < order; l++) {
      for (int m = 0; m <= l; m++) {
        double c = multipole[at + cosine(l, m)];
        double s = m == 0 ? 0 : multipole[at + sine(l, m)];
        along(l + 1, m, -Math.sqrt((double) (l + 1 - m) * (l + 1 + m)), c, s, dz);
        double lower = Math.sqrt((double) (l - m + 2) * (l - m + 1));
        double raise = Math.sqrt((double) (l + m + 2) * (l + m + 1));
        across(l + 1, m, lower, raise, c, s, dx, dy);
      }
    }
  }

  private static void along(int l, int m, double f, double c, double s, double[] dz) {
    dz[cosine(l, m)] += f * c;
    if (m > 0) {
      dz[sine(l, m)] += f * s;
    }
  }

  // With complex harmonics H of either kind: d/dx H_m = (H_(m-1) - H_(m+1)) / 2 and
  // d/dy H_m = i (H_(m-1) + H_(m+1)) / 2 in degree l; H_(-1) = -conj(H_1).
  private static void across(
      int l, int m, double lower, double raise, double c, double s, double[] dx, double[] dy) {
    if (m == 0) {
      double f = raise * Math.sqrt(0.5);
      if (f != 0) {
        dx[cosine(l, 1)] -= f * c;
        dy[sine(l, 1)] -= f * c;
      }
      return;
    }
    if (raise != 0) {
      double f = 0.5 * raise;
      dx[cosine(l, m + 1)] -= f * c;
      dx[sine(l, m + 1)] -= f * s;
      dy[sine(l, m + 1)] -= f * c;
      dy[cosine(l, m + 1)] += f * s;
    }
    if (m == 1) {
      double f = lower * Math.sqrt(0.5);
      dx[cosine(l, 0)] += f * c;
      dy[cosine(l, 0)] += f * s;
      return;
    }
    double f = 0.5 * lower;
    dx[cosine(l, m - 1)] += f * c;
    dx[sine(l, m - 1)] += f * s;
    dy[sine(l, m - 1)] -= f * c;
    dy[cosine(l, m - 1)] += f * s;
  }
}
