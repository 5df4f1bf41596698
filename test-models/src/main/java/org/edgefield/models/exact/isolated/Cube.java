package org.edgefield.models.exact.isolated;

import org.edgefield.models.exact.Vacuum;

/**
 * Isolated cube at potential V. No closed form; converged numerical constants.
 *
 * @param side_m length of a side
 */
public record Cube(double side_m) {
  /** C / (4 pi eps0 a). J. Helsing, K.-M. Perfekt 2013 (8 digits seen, the rest memory). */
  public static final double CAPACITANCE_RATIO = 0.66067815409957;

  /**
   * Edge coefficient in the middle of an edge of the unit cube at 1 V: E = K rho^(-1/3), rho the
   * distance from the edge (recomputed by boundary elements, three digits).
   */
  public static final double MID_EDGE_COEFFICIENT = 0.540;

  /**
   * Corner coefficient of the unit cube at 1 V: V - phi = kappa rho^0.4542 on the outward diagonal
   * (recomputed by boundary elements, four digits).
   */
  public static final double CORNER_COEFFICIENT = 0.7489;

  /** Capacitance to infinity in farads. */
  public double capacitance_F() {
    return Vacuum.FOUR_PI_EPSILON_0 * side_m * CAPACITANCE_RATIO;
  }

  /** Coefficient K of E = K rho^(-1/3) in the middle of an edge, V m^(-2/3). */
  public double midEdgeCoefficient(double potential_V) {
    return MID_EDGE_COEFFICIENT * potential_V * Math.pow(side_m, -2.0 / 3);
  }
}
