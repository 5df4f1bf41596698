package org.edgefield.models.exact.isolated;

import org.edgefield.models.exact.Vacuum;

/**
 * Isolated ring torus at potential V. With x = R/r, c = sqrt(R^2 - r^2) and the Legendre functions
 * of half-integer degree P_n = P_{n-1/2}(x), Q_n = Q_{n-1/2}(x):
 *
 * <pre>
 * C    = 8 eps0 c (s_0 + 2 Sum_{n>0} s_n),   s_n = Q_n / P_n
 * E(t) = V sqrt(2) (x - cos t)^{3/2} / (pi c sqrt(x^2 - 1)) (1/P_0 + 2 Sum_{n>0} cos(n t) / P_n)
 * </pre>
 *
 * t is the toroidal angle: 0 on the outer, pi on the inner equator. C: C. Snow, Hypergeometric and
 * Legendre Functions (memory; digits recomputed); E follows from the same series with the Wronskian
 * (recomputed). P_n comes from its integral and the upward recurrence, and s_n, free of
 * cancellation, from s_n - s_{n+1} = 1 / ((n + 1/2) P_n P_{n+1}). Range: R/r from 1.01 up.
 *
 * @param ring_m radius R of the centre line
 * @param tube_m radius r of the tube, less than R
 */
public record Torus(double ring_m, double tube_m) {
  private static final int MOST_TERMS = 2000;
  private static final int INTEGRAL_POINTS = 4096;

  public Torus {
    if (!(ring_m >= 1.01 * tube_m && tube_m > 0)) {
      throw new IllegalArgumentException("ring radius must be at least 1.01 tube radii");
    }
  }

  /** Capacitance to infinity in farads. */
  public double capacitance_F() {
    double[] p = legendre();
    double s = 0;
    double sum = 0;
    for (int n = p.length - 2; n >= 0; n--) {
      s += 1 / ((n + 0.5) * p[n] * p[n + 1]);
      sum += n == 0 ? s : 2 * s;
    }
    return 8 * Vacuum.EPSILON_0 * focus_m() * sum;
  }

  /**
   * Surface field.
   *
   * @param angle_rad toroidal angle, 0 on the outer equator, pi on the inner
   * @param potential_V potential of the body
   */
  public double field_V_per_m(double angle_rad, double potential_V) {
    double[] p = legendre();
    double x = ring_m / tube_m;
    double sum = 0;
    for (int n = p.length - 1; n >= 0; n--) {
      sum += (n == 0 ? 1 : 2) * Math.cos(n * angle_rad) / p[n];
    }
    double root = Math.sqrt((x - 1) * (x + 1));
    double scale = Math.pow(x - Math.cos(angle_rad), 1.5) / (Math.PI * focus_m() * root);
    return potential_V * Math.sqrt(2) * scale * sum;
  }

  /** Field on the outer equator, the largest. */
  public double peakField_V_per_m(double potential_V) {
    return field_V_per_m(0, potential_V);
  }

  private double focus_m() {
    return Math.sqrt((ring_m - tube_m) * (ring_m + tube_m));
  }

  /** P_{n-1/2}(R/r) for n = 0, 1, ... until 1/P_n no longer counts. */
  private double[] legendre() {
    double x = ring_m / tube_m;
    double[] p = new double[MOST_TERMS];
    p[0] = integral(x, -0.5);
    p[1] = integral(x, 0.5);
    int n = 1;
    while (n + 1 < MOST_TERMS && p[n] < 1e20) {
      p[n + 1] = (2 * n * x * p[n] - (n - 0.5) * p[n - 1]) / (n + 0.5);
      n++;
    }
    return java.util.Arrays.copyOf(p, n + 1);
  }

  /** Laplace's integral; the trapezoidal rule converges exponentially on a periodic function. */
  private static double integral(double x, double degree) {
    double root = Math.sqrt((x - 1) * (x + 1));
    double sum = 0;
    for (int i = 0; i < INTEGRAL_POINTS; i++) {
      double phi = Math.PI * (i + 0.5) / INTEGRAL_POINTS;
      sum += Math.pow(x + root * Math.cos(phi), degree);
    }
    return sum / INTEGRAL_POINTS;
  }
}
