package org.edgefield.field.edge;

/**
 * Field on a right-angled corner of three edges, corner and edges rounded with one radius r.
 *
 * <p>Far from the corner the potential difference to the conductor grows on the outward diagonal as
 * kappa rho^0.4542 (rho from the sharp apex), so E falls as rho^(-0.5458); at the rounding it peaks
 * at
 *
 * <pre>E_peak = 1.470 kappa r^(-0.5458)</pre>
 *
 * (exponent and coefficient recomputed; low by 0.3 / 0.8 / 2 / 5 % for r over the cube's side of
 * .02 / .05 / .1 / .2). The decay in between,
 *
 * <pre>E / E_peak = (1 + (2 x / s) g)^(-s),  g = (1 + g_inf k x) / (1 + k x),  x = distance / r
 * </pre>
 *
 * has the sphere's slope at the surface and the sharp corner's field far away; k = 0.68 places the
 * apex where it is. Other corners: the same form with another exponent.
 */
public final class RoundedCorner {
  /** Exponent s of the field at a right-angled corner. */
  public static final double EXPONENT = 0.5458;

  /** Peak field over kappa r^(-s). */
  public static final double COEFFICIENT = 1.470;

  private static final double K = 0.68;

  private static final double FAR_SLOPE =
      0.5 * EXPONENT * Math.pow(COEFFICIENT / (1 - EXPONENT), 1 / EXPONENT);

  private RoundedCorner() {}

  /**
   * Peak field on the rounded corner.
   *
   * @param kappa corner coefficient, V / m^0.4542
   * @param radius_m radius of corner and edges
   * @return V/m
   */
  public static double peak_V_per_m(double kappa, double radius_m) {
    return COEFFICIENT * kappa * Math.pow(radius_m, -EXPONENT);
  }

  /** How a flux tube from the peak widens: the reciprocal of the decay. */
  public static double spread(double x) {
    return spread(x, EXPONENT);
  }

  /**
   * The same for other corners.
   *
   * @param exponent exponent of the field far from the rounding, see {@link #exponent}
   */
  public static double spread(double x, double exponent) {
    double y = K * x;
    double g = (1 + FAR_SLOPE * y) / (1 + y);
    return Math.pow(1 + 2 * x / exponent * g, exponent);
  }

  /**
   * Exponent at a corner or conical tip by the solid angle through which its rounding turns the
   * normal: a right-angled corner turns through pi/2, a needle through 2 pi and has the exponent 1.
   * Between them it is taken linear, which lies above the exponents of cones (a cone of half-angle
   * 22 degrees: 0.77 for about 0.70, from its Legendre function's degree, recomputed).
   *
   * @param turn_sr solid angle of the normals, 0 to 4 pi
   */
  public static double exponent(double turn_sr) {
    double share = (turn_sr - 0.5 * Math.PI) / (1.5 * Math.PI);
    return EXPONENT + (1 - EXPONENT) * Math.max(0, Math.min(1, share));
  }
}
