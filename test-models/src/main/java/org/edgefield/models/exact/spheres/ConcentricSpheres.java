package org.edgefield.models.exact.spheres;

import org.edgefield.models.exact.Vacuum;

/**
 * Sphere inside a concentric hollow sphere, voltage U between them: E(r) = U a b / (r^2 (b - a)), C
 * = 4 pi eps0 a b / (b - a). Textbook (recomputed).
 *
 * @param inner_m radius a of the inner sphere
 * @param outer_m inner radius b of the hollow one
 */
public record ConcentricSpheres(double inner_m, double outer_m) {
  /** Field at a distance from the centre, between the two radii. */
  public double field_V_per_m(double r_m, double voltage_V) {
    return voltage_V * inner_m * outer_m / (r_m * r_m * (outer_m - inner_m));
  }

  /** Capacitance between the two in farads. */
  public double capacitance_F() {
    return Vacuum.FOUR_PI_EPSILON_0 * inner_m * outer_m / (outer_m - inner_m);
  }
}
