package org.edgefield.field.estimate;

/**
 * Field concentration at the tip of a conducting ellipsoid in a uniform field along one axis.
 *
 * <pre>gamma = 1/L,  L = (a b c / 2) Int_0^inf du / ((a^2 + u) sqrt((a^2 + u)(b^2 + u)(c^2 + u)))
 * </pre>
 *
 * L. D. Landau, E. M. Lifshitz, Electrodynamics of Continuous Media, section 4 (memory; digits
 * recomputed for spheroids). Range: any positive semi-axes with ratios up to 1e6; c may be infinite
 * (elliptic cylinder, gamma = 1 + a/b). Also holds for half of it standing on an earthed plane.
 */
public final class EllipsoidInField {
  /** Half-width and step of the double-exponential rule. */
  private static final double STEP = 0.05;

  private static final int STEPS = 90;

  private EllipsoidInField() {}

  /**
   * Field at the tip over the uniform field.
   *
   * @param a semi-axis along the field
   * @param b another semi-axis
   * @param c the third one, may be infinite
   */
  public static double concentration(double a, double b, double c) {
    // u = a^2 (1/t^2 - 1), t = 0..1: L = b/a c/a Int t^2 dt / sqrt((1 + p t^2)(1 + q t^2)).
    // With p = b^2/a^2 - 1, q = c^2/a^2 - 1; 1 + p t^2 is written by 1 - t^2, free of cancellation.
    double b2 = b / a * (b / a);
    double c2 = c / a * (c / a);
    boolean cylinder = !(c2 < 1e24);
    double sum = 0;
    for (int i = -STEPS; i <= STEPS; i++) {
      double x = i * STEP;
      double sinh = Math.PI / 2 * Math.sinh(x);
      double t = 1 / (1 + Math.exp(-2 * sinh));
      double weight = Math.PI / 2 * Math.cosh(x) * 2 * t / (1 + Math.exp(2 * sinh));
      double rest = 1 / (1 + Math.exp(2 * sinh));
      double tt = rest * (2 - rest);
      double fb = b2 + (1 - b2) * tt;
      double value;
      if (cylinder) {
        value = t / Math.sqrt(fb);
      } else {
        double fc = c2 + (1 - c2) * tt;
        value = t * t / Math.sqrt(fb * fc);
      }
      sum += value * weight;
    }
    double depolarisation = sum * STEP * (b / a) * (cylinder ? 1 : c / a);
    return 1 / depolarisation;
  }
}
