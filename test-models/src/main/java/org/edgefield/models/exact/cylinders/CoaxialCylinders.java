package org.edgefield.models.exact.cylinders;

import org.edgefield.models.exact.Vacuum;

/**
 * Long coaxial cylinders, voltage U between them: E(r) = U / (r ln(b/a)), C' = 2 pi eps0 / ln(b/a).
 * Textbook (recomputed).
 *
 * @param inner_m outer radius a of the inner one
 * @param outer_m inner radius b of the outer one
 */
public record CoaxialCylinders(double inner_m, double outer_m) {
  /** Field at a distance from the axis, between the two radii. */
  public double field_V_per_m(double r_m, double voltage_V) {
    return voltage_V / (r_m * Math.log(outer_m / inner_m));
  }

  /** Capacitance per length. */
  public double capacitancePerLength_F_per_m() {
    return 2 * Math.PI * Vacuum.EPSILON_0 / Math.log(outer_m / inner_m);
  }
}
