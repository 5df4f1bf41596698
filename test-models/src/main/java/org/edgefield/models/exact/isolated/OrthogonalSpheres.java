package org.edgefield.models.exact.isolated;

import org.edgefield.models.exact.Vacuum;

/**
 * One body of two spheres that cut each other at right angles (centre distance d, d^2 = a^2 + b^2),
 * at potential V. Three charges make both surfaces equipotential, in units of 4 pi eps0 V: a at the
 * first centre, b at the second, -a b / d at a^2 / d from the first.
 *
 * <pre>C = 4 pi eps0 (a + b - a b / d)</pre>
 *
 * J. C. Maxwell, A Treatise on Electricity and Magnetism, art. 168 (memory; recomputed).
 *
 * @param a_m radius of the first sphere
 * @param b_m radius of the second sphere
 */
public record OrthogonalSpheres(double a_m, double b_m) {
  /** Distance of the centres. */
  public double distance_m() {
    return Math.hypot(a_m, b_m);
  }

  /** Capacitance to infinity in farads. */
  public double capacitance_F() {
    return Vacuum.FOUR_PI_EPSILON_0 * (a_m + b_m - a_m * b_m / distance_m());
  }

  /** Potential over V at a point on or outside the body. */
  public double potentialRatio(double alongAxis_m, double offAxis_m) {
    double d = distance_m();
    return a_m / Math.hypot(alongAxis_m, offAxis_m)
        + b_m / Math.hypot(alongAxis_m - d, offAxis_m)
        - a_m * b_m / d / Math.hypot(alongAxis_m - a_m * a_m / d, offAxis_m);
  }

  /** Field at the first sphere's pole that faces away from the second. */
  public double farPoleFieldA_V_per_m(double potential_V) {
    double d = distance_m();
    double toB = d + a_m;
    double toImage = a_m + a_m * a_m / d;
    return potential_V * (1 / a_m + b_m / (toB * toB) - a_m * b_m / d / (toImage * toImage));
  }

  /** Field at the second sphere's pole that faces away from the first. */
  public double farPoleFieldB_V_per_m(double potential_V) {
    return new OrthogonalSpheres(b_m, a_m).farPoleFieldA_V_per_m(potential_V);
  }
}
