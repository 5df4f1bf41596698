package org.edgefield.models.exact.isolated;

import org.edgefield.models.exact.Vacuum;

/**
 * Isolated sphere at potential V, earth at infinity: E = V/R, C = 4 pi eps0 R (textbook).
 *
 * @param radius_m radius, positive
 */
public record Sphere(double radius_m) {
  /** Capacitance to infinity in farads. */
  public double capacitance_F() {
    return Vacuum.FOUR_PI_EPSILON_0 * radius_m;
  }

  /** Surface field at a potential. */
  public double field_V_per_m(double potential_V) {
    return potential_V / radius_m;
  }

  /** Potential that brings the surface to a field: the most voltage a terminal holds. */
  public double potentialAt_V(double field_V_per_m) {
    return field_V_per_m * radius_m;
  }

  /** Charge that brings the surface to a field: Q = 4 pi eps0 R^2 E. */
  public double chargeAt_C(double field_V_per_m) {
    return capacitance_F() * potentialAt_V(field_V_per_m);
  }
}
