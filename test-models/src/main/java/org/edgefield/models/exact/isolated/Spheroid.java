package org.edgefield.models.exact.isolated;

import org.edgefield.models.exact.Vacuum;

/**
 * Isolated ellipsoid of revolution at potential V.
 *
 * <pre>
 * prolate: C = 4 pi eps0 p e / atanh(e),  e = sqrt(1 - (q/p)^2)
 * oblate:  C = 4 pi eps0 q e / asin(e),   e = sqrt(1 - (p/q)^2)
 * E = C V h / (4 pi eps0 p q^2)
 * </pre>
 *
 * p polar, q equatorial semi-axis, h distance from the centre to the tangent plane. W. R. Smythe,
 * Static and Dynamic Electricity, chapter 5 (memory; digits recomputed). Any positive semi-axes.
 *
 * @param polar_m semi-axis along the axis of revolution
 * @param equatorial_m the other semi-axis
 */
public record Spheroid(double polar_m, double equatorial_m) {
  /** Capacitance to infinity in farads. */
  public double capacitance_F() {
    double p = polar_m;
    double q = equatorial_m;
    double longer = Math.max(p, q);
    double e = Math.sqrt(Math.abs(p - q) * (p + q)) / longer;
    double ratio = e == 0 ? 1 : p > q ? e / atanh(e) : e / Math.asin(e);
    return Vacuum.FOUR_PI_EPSILON_0 * longer * ratio;
  }

  /**
   * Surface field at a height.
   *
   * @param z_m height above the equatorial plane, at most the polar semi-axis in magnitude
   * @param potential_V potential of the body
   */
  public double field_V_per_m(double z_m, double potential_V) {
    double charge = capacitance_F() * potential_V;
    return charge
        * tangentPlaneDistance_m(z_m)
        / (Vacuum.FOUR_PI_EPSILON_0 * polar_m * equatorial_m * equatorial_m);
  }

  /** Field at either pole. */
  public double poleField_V_per_m(double potential_V) {
    return field_V_per_m(polar_m, potential_V);
  }

  /** Field round the equator. */
  public double equatorField_V_per_m(double potential_V) {
    return field_V_per_m(0, potential_V);
  }

  /** Distance from the centre to the tangent plane at height z. */
  public double tangentPlaneDistance_m(double z_m) {
    double t = z_m / polar_m;
    double across = (1 - t) * (1 + t) / (equatorial_m * equatorial_m);
    double along = t / polar_m * (t / polar_m);
    return 1 / Math.sqrt(across + along);
  }

  private static double atanh(double e) {
    return 0.5 * (Math.log1p(e) - Math.log1p(-e));
  }
}
