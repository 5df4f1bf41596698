package org.edgefield.models.exact.isolated;

import org.edgefield.models.exact.Vacuum;

/**
 * Isolated infinitely thin disc at potential V: C = 8 eps0 a, and on either side E = 2 V / (pi
 * sqrt(a^2 - r^2)), unbounded at the rim. Textbook (Lord Kelvin; memory; digits recomputed).
 *
 * @param radius_m radius a
 */
public record Disc(double radius_m) {
  /** Capacitance to infinity in farads. */
  public double capacitance_F() {
    return 8 * Vacuum.EPSILON_0 * radius_m;
  }

  /** Field on either side at a distance from the centre, less than the radius. */
  public double field_V_per_m(double r_m, double potential_V) {
    return 2 * potential_V / (Math.PI * Math.sqrt((radius_m - r_m) * (radius_m + r_m)));
  }
}
