package org.edgefield.field.fmm;

/**
 * Degree of the expansions for a requested accuracy. Measured on strengths of random sign on a
 * sphere, in a cube and on a needle (the accuracy test repeats it): smallest degree whose relative
 * root mean square error of potential and gradient stays below the request.
 */
final class ExpansionOrder {
  private ExpansionOrder() {}

  /**
   * Degree for a relative accuracy.
   *
   * @param tolerance 1e-12 to 1
   */
  static int of(double tolerance) {
    if (!(tolerance >= 1e-12 && tolerance < 1)) {
      throw new IllegalArgumentException("accuracy must lie between 1e-12 and 1, got " + tolerance);
    }
    double digits = -Math.log10(tolerance);
    return (int) Math.max(2, Math.ceil(digits <= 4 ? 2 * digits - 1 : 7 + 5 * (digits - 4)));
  }
}
