package org.edgefield.models.exact.ambient;

/**
 * Conducting sphere with no net charge in a uniform field E0, and the half ball on an earthed plane
 * (textbook): E = 3 E0 cos(theta) on the surface; on the axis outside E0 (1 + 2 (R/z)^3).
 *
 * @param radius_m radius
 */
public record SphereInField(double radius_m) {
  /** Field at the poles over the uniform field. */
  public static final double CONCENTRATION = 3;

  /** Normal field on the surface at an angle from the direction of the field. */
  public double surfaceField_V_per_m(double theta_rad, double ambient_V_per_m) {
    return CONCENTRATION * ambient_V_per_m * Math.cos(theta_rad);
  }

  /** Field on the axis at a distance from the centre, at least the radius. */
  public double axialField_V_per_m(double z_m, double ambient_V_per_m) {
    double t = radius_m / z_m;
    return ambient_V_per_m * (1 + 2 * t * t * t);
  }
}
