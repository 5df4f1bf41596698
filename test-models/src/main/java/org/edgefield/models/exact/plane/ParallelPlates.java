package org.edgefield.models.exact.plane;

import org.edgefield.models.exact.Vacuum;

/**
 * Parallel plates far from their rims: E = U/d, C = eps0 A/d (textbook).
 *
 * @param gap_m distance d of the plates
 */
public record ParallelPlates(double gap_m) {
  /** Field between the plates. */
  public double field_V_per_m(double voltage_V) {
    return voltage_V / gap_m;
  }

  /** Capacitance in F per square metre of plate. */
  public double capacitancePerArea_F_per_m2() {
    return Vacuum.EPSILON_0 / gap_m;
  }
}
