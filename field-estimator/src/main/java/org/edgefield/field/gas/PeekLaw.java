package org.edgefield.field.gas;

/**
 * Field at which corona starts in air, by F. W. Peek (Dielectric Phenomena in High-Voltage
 * Engineering, 3rd ed., 1929; constants seen):
 *
 * <pre>E = E0 m delta (1 + C / sqrt(delta r_cm))  kV/cm, peak</pre>
 *
 * with 31 and 0.308 for a cylinder (coaxial), 27.2 and 0.54 for a sphere, delta referred to 25 degC
 * and 76 cm of mercury. Range: r from 0.1 to some 10 mm on wires; the sphere's constants come from
 * sphere gaps, so that on an isolated sphere the law lies 7 to 15 % low (safe side). A surface
 * curved in both directions lies between cylinder and sphere by the ratio of its curvatures and is
 * never given more than the sphere. The radius is held between {@value #LEAST_RADIUS_M} m, below
 * which models part ways, and {@value #LARGEST_RADIUS_M} m.
 */
public final class PeekLaw {
  /** Radius below which the law gives no more. */
  public static final double LEAST_RADIUS_M = 1e-4;

  /** Radius from which a surface counts as flat. */
  public static final double LARGEST_RADIUS_M = 1;

  private static final double KV_PER_CM = 1e5;

  private PeekLaw() {}

  /**
   * Inception field of a cylinder.
   *
   * @param radius_m radius
   * @param delta relative air density by {@link AirDensity#peek}
   * @param roughness surface factor m, 1 = polished
   * @return V/m, peak
   */
  public static double cylinder_V_per_m(double radius_m, double delta, double roughness) {
    return law(31.0, 0.308, radius_m, delta, roughness);
  }

  /** As {@link #cylinder_V_per_m}, of a sphere. */
  public static double sphere_V_per_m(double radius_m, double delta, double roughness) {
    return law(27.2, 0.54, radius_m, delta, roughness);
  }

  /**
   * Inception field of a surface with two principal curvatures; concave directions count as flat.
   *
   * @param k1 larger curvature, 1/m
   * @param k2 smaller curvature, 1/m
   * @param delta relative air density by {@link AirDensity#peek}
   * @param roughness surface factor m
   * @return V/m, peak
   */
  public static double surface_V_per_m(double k1, double k2, double delta, double roughness) {
    double radius = k1 > 0 ? 1 / k1 : Double.POSITIVE_INFINITY;
    double cylinder = cylinder_V_per_m(radius, delta, roughness);
    double sphere = sphere_V_per_m(radius, delta, roughness);
    double ratio = k1 > 0 ? Math.min(1, Math.max(0, k2 / k1)) : 0;
    return Math.min(sphere, cylinder + ratio * (sphere - cylinder));
  }

  private static double law(double e0, double c, double radius_m, double delta, double roughness) {
    double held = Math.min(Math.max(radius_m, LEAST_RADIUS_M), LARGEST_RADIUS_M);
    return e0 * roughness * delta * (1 + c / Math.sqrt(delta * held * 100)) * KV_PER_CM;
  }
}
