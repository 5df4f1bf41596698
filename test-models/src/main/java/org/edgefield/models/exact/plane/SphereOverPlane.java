package org.edgefield.models.exact.plane;

import org.edgefield.models.exact.spheres.TwoSpheres;

/**
 * Sphere at voltage U over an earthed plane: half of the antisymmetric pair of equal spheres at
 * twice the gap and twice the voltage (Kelvin; memory; digits recomputed).
 *
 * @param radius_m radius of the sphere
 * @param gap_m shortest distance to the plane, at least 1e-6 of the radius
 */
public record SphereOverPlane(double radius_m, double gap_m) {
  /** Field at the pole that faces the plane, the largest. */
  public double peakField_V_per_m(double voltage_V) {
    return pair().facingPoleA_V_per_m(voltage_V, -voltage_V);
  }

  /** Field at the pole that faces away. */
  public double farPoleField_V_per_m(double voltage_V) {
    return pair().farPoleA_V_per_m(voltage_V, -voltage_V);
  }

  /** Field on the plane under the sphere. */
  public double planeField_V_per_m(double voltage_V) {
    return Math.abs(pair().axialField_V_per_m(radius_m + gap_m, voltage_V, -voltage_V));
  }

  /** Capacitance between sphere and plane in farads. */
  public double capacitance_F() {
    TwoSpheres pair = pair();
    return pair.c11_F() - pair.c12_F();
  }

  private TwoSpheres pair() {
    return new TwoSpheres(radius_m, radius_m, 2 * gap_m);
  }
}
