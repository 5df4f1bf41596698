package org.edgefield.field.edge;

/**
 * Field on an edge of a thick conductor that is rounded by an arc tangent to both faces.
 *
 * <p>Far from the edge (against its radius r) the field falls as on a sharp wedge, E = K rho^(-s),
 * s = 1 - pi/beta, beta the angle of the gas around the edge. At the arc it peaks at
 *
 * <pre>E_peak = C(beta) K r^(-s)</pre>
 *
 * with, for mu = beta/pi and nu = (mu - 1)/2,
 *
 * <pre>
 * q   = sqrt(pi) Gamma(nu+1) / (2^(nu+1) Gamma(nu+3/2))
 * G   = pi [Gamma(nu/2+1)/Gamma(nu/2+1/2)]^2 / ((nu+1)^2 q^2)
 * rho = mu (nu+1) q^2 / (pi nu)
 * C   = G rho^s
 * </pre>
 *
 * and falls along the normal from the peak, x = distance / r, as
 *
 * <pre>E / E_peak = (1 + (x/s) g)^(-s),  g = (1 + g_inf k x^p) / (1 + k x^p),  g_inf = s C^(1/s)
 * </pre>
 *
 * <p>C is the closed form of the conformal map (recomputed); k and p are fitted to the map, worst
 * error of the decay 0.12 % for x below 100, interior angles 30 to 150 degrees; between the fitted
 * angles k s and p are interpolated, beyond them extended.
 */
public final class RoundedWedge {
  /** Interior angles of the fits, degrees. */
  private static final double[] ANGLE = {30, 45, 60, 90, 120, 135, 150};

  private static final double[] FIT_K = {.5278, .5944, .6801, .9511, 1.5393, 2.1705, 3.5197};
  private static final double[] FIT_P = {.9448, .9607, .9771, 1.0113, 1.0475, 1.0664, 1.0857};

  private final double exponent;
  private final double coefficient;
  private final double farSlope;
  private final double k;
  private final double p;

  private RoundedWedge(double exponent, double coefficient, double k, double p) {
    this.exponent = exponent;
    this.coefficient = coefficient;
    this.farSlope = exponent * Math.pow(coefficient, 1 / exponent);
    this.k = k;
    this.p = p;
  }

  /**
   * The law for an interior angle of the solid.
   *
   * @param interiorAngle_rad 0 (a plate's full round) to below pi
   * @throws IllegalArgumentException where the edge is not convex
   */
  public static RoundedWedge ofInteriorAngle(double interiorAngle_rad) {
    if (!(interiorAngle_rad >= 0 && interiorAngle_rad < Math.PI)) {
      throw new IllegalArgumentException("not a convex edge: " + interiorAngle_rad + " rad");
    }
    double turning = Math.max(Math.PI - interiorAngle_rad, 1e-6);
    double mu = 1 + turning / Math.PI;
    double nu = (mu - 1) / 2;
    double s = 1 - 1 / mu;
    double q =
        Math.exp(
            0.5 * Math.log(Math.PI)
                + LogGamma.of(nu + 1)
                - (nu + 1) * Math.log(2)
                - LogGamma.of(nu + 1.5));
    double gammas = Math.exp(2 * (LogGamma.of(nu / 2 + 1) - LogGamma.of(nu / 2 + 0.5)));
    double g = Math.PI * gammas / ((nu + 1) * (nu + 1) * q * q);
    double rho = mu * (nu + 1) * q * q / (Math.PI * nu);
    double degrees = Math.toDegrees(interiorAngle_rad);
    int i = 0;
    while (i < ANGLE.length - 2 && degrees > ANGLE[i + 1]) {
      i++;
    }
    double t = (degrees - ANGLE[i]) / (ANGLE[i + 1] - ANGLE[i]);
    double ks = mix(FIT_K[i] * exponentAt(ANGLE[i]), FIT_K[i + 1] * exponentAt(ANGLE[i + 1]), t);
    return new RoundedWedge(s, g * Math.pow(rho, s), ks / s, mix(FIT_P[i], FIT_P[i + 1], t));
  }

  private static double exponentAt(double interiorDegrees) {
    return 1 - 180 / (360 - interiorDegrees);
  }

  private static double mix(double a, double b, double t) {
    return a + (b - a) * t;
  }

  /** The exponent s. */
  public double exponent() {
    return exponent;
  }

  /** The coefficient C. */
  public double coefficient() {
    return coefficient;
  }

  /**
   * Peak field on the rounded edge.
   *
   * @param edgeCoefficient K in V/m times m^s
   * @param radius_m radius of the arc
   * @return V/m
   */
  public double peak_V_per_m(double edgeCoefficient, double radius_m) {
    return coefficient * edgeCoefficient * Math.pow(radius_m, -exponent);
  }

  /**
   * Field along the normal from the peak, as a share of the peak.
   *
   * @param x distance from the surface over the radius of the arc, 0 or more
   */
  public double decay(double x) {
    return 1 / spread(x);
  }

  /** The reciprocal of {@link #decay}: how a flux tube from the peak widens. */
  public double spread(double x) {
    double y = k * (p == 1 ? x : Math.pow(x, p));
    double g = (1 + farSlope * y) / (1 + y);
    return Math.pow(1 + x / exponent * g, exponent);
  }
}
