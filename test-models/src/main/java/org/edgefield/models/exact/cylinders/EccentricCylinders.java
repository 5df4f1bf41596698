package org.edgefield.models.exact.cylinders;

import org.edgefield.models.exact.Vacuum;

/**
 * Long cylinder inside a parallel hollow one, axes e apart, voltage U between them; equipotentials
 * of two line charges at -+w:
 *
 * <pre>
 * u = acosh((a^2 + b^2 - e^2) / (2 a b)),  C' = 2 pi eps0 / u
 * x1 = (b^2 - a^2 - e^2) / (2 e),  w^2 = x1^2 - a^2
 * E(x) = (U/u) |1/(x - w) - 1/(x + w)|
 * </pre>
 *
 * x along the line through both axes, the inner axis at x1, the outer at x1 + e (the narrow side
 * towards smaller x). Textbook, bipolar coordinates (memory; digits recomputed).
 *
 * @param inner_m outer radius a of the inner one
 * @param outer_m inner radius b of the outer one
 * @param offset_m distance e of the axes, positive and less than b - a
 */
public record EccentricCylinders(double inner_m, double outer_m, double offset_m) {
  /** Capacitance per length. */
  public double capacitancePerLength_F_per_m() {
    return 2 * Math.PI * Vacuum.EPSILON_0 / u();
  }

  /** Field on the inner cylinder where the gap is narrowest, the largest. */
  public double innerNarrow_V_per_m(double voltage_V) {
    return axialField_V_per_m(x1() - inner_m, voltage_V);
  }

  /** Field on the inner cylinder where the gap is widest. */
  public double innerWide_V_per_m(double voltage_V) {
    return axialField_V_per_m(x1() + inner_m, voltage_V);
  }

  /** Field on the outer cylinder where the gap is narrowest. */
  public double outerNarrow_V_per_m(double voltage_V) {
    return axialField_V_per_m(x1() + offset_m - outer_m, voltage_V);
  }

  private double axialField_V_per_m(double x, double voltage_V) {
    double w = Math.sqrt((x1() - inner_m) * (x1() + inner_m));
    return voltage_V / u() * Math.abs(1 / (x - w) - 1 / (x + w));
  }

  private double x1() {
    return (outer_m * outer_m - inner_m * inner_m - offset_m * offset_m) / (2 * offset_m);
  }

  private double u() {
    double cosh =
        (inner_m * inner_m + outer_m * outer_m - offset_m * offset_m) / (2 * inner_m * outer_m);
    return Math.log(cosh + Math.sqrt((cosh - 1) * (cosh + 1)));
  }
}
