package org.edgefield.field.edge;

/**
 * Logarithm of the gamma function for positive arguments: recurrence up to 12, then Stirling's
 * series (Abramowitz and Stegun, Handbook of Mathematical Functions, 6.1.41; memory). Relative
 * error below 1e-14.
 */
final class LogGamma {
  private LogGamma() {}

  static double of(double x) {
    if (!(x > 0)) {
      throw new IllegalArgumentException("argument " + x);
    }
    double product = 1;
    double z = x;
    while (z < 12) {
      product *= z;
      z += 1;
    }
    double r = 1 / (z * z);
    double series =
        (1.0 / 12
                - r
                    * (1.0 / 360
                        - r
                            * (1.0 / 1260
                                - r * (1.0 / 1680 - r * (1.0 / 1188 - r * 691 / 360360)))))
            / z;
    return (z - 0.5) * Math.log(z) - z + 0.5 * Math.log(2 * Math.PI) + series - Math.log(product);
  }
}
