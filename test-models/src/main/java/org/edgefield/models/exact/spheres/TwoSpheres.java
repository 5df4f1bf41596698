package org.edgefield.models.exact.spheres;

import java.util.Arrays;
import org.edgefield.models.exact.Vacuum;

/**
 * Two separate spheres of any radii at any potentials, earth at infinity, by Kelvin's series of
 * image charges (W. R. Smythe, Static and Dynamic Electricity, chapter 5; memory; digits
 * recomputed). Sphere A has its centre at z = 0, sphere B at z = a + gap + b.
 *
 * <p>The charges of the unit problem "A at 1 V, B at 0 V" start with a at A's centre; each is
 * mirrored in turn, q' = -q R/s at R^2/s from the centre of the mirroring sphere, s its distance
 * from there. They fall like exp(-n mu), cosh mu = (d^2 - a^2 - b^2) / (2 a b): gaps down to 1e-6
 * of the smaller radius take some 20,000 terms.
 */
public final class TwoSpheres {
  private static final double NEGLIGIBLE = 1e-17;
  private static final int MOST_TERMS = 1_000_000;

  private final double a_m;
  private final double b_m;
  private final double distance_m;
  private final Images fromA;
  private final Images fromB;

  /**
   * Sets up the series.
   *
   * @param a_m radius of sphere A
   * @param b_m radius of sphere B
   * @param gap_m shortest distance between the surfaces, at least 1e-6 of the smaller radius
   */
  public TwoSpheres(double a_m, double b_m, double gap_m) {
    if (!(gap_m >= 1e-6 * Math.min(a_m, b_m))) {
      throw new IllegalArgumentException("gap must be at least 1e-6 of the smaller radius");
    }
    this.a_m = a_m;
    this.b_m = b_m;
    this.distance_m = a_m + gap_m + b_m;
    this.fromA = Images.of(a_m, b_m, distance_m);
    this.fromB = Images.of(b_m, a_m, distance_m);
  }

  /** Charge of A with A at 1 V and B at 0 V. */
  public double c11_F() {
    return Vacuum.FOUR_PI_EPSILON_0 * fromA.ownCharge();
  }

  /** Charge of B with A at 1 V and B at 0 V, negative. */
  public double c12_F() {
    return Vacuum.FOUR_PI_EPSILON_0 * fromA.otherCharge();
  }

  /** Charge of B with B at 1 V and A at 0 V. */
  public double c22_F() {
    return Vacuum.FOUR_PI_EPSILON_0 * fromB.ownCharge();
  }

  /** Magnitude of the field at A's pole that faces B. */
  public double facingPoleA_V_per_m(double potentialA_V, double potentialB_V) {
    return Math.abs(axialField_V_per_m(a_m, potentialA_V, potentialB_V));
  }

  /** Magnitude of the field at B's pole that faces A. */
  public double facingPoleB_V_per_m(double potentialA_V, double potentialB_V) {
    return Math.abs(axialField_V_per_m(distance_m - b_m, potentialA_V, potentialB_V));
  }

  /** Magnitude of the field at A's pole that faces away from B. */
  public double farPoleA_V_per_m(double potentialA_V, double potentialB_V) {
    return Math.abs(axialField_V_per_m(-a_m, potentialA_V, potentialB_V));
  }

  /** Magnitude of the field at B's pole that faces away from A. */
  public double farPoleB_V_per_m(double potentialA_V, double potentialB_V) {
    return Math.abs(axialField_V_per_m(distance_m + b_m, potentialA_V, potentialB_V));
  }

  /** Field along +z at a point of the axis on or outside the spheres. */
  public double axialField_V_per_m(double z_m, double potentialA_V, double potentialB_V) {
    return potentialA_V * fromA.axialField(z_m) - potentialB_V * fromB.axialField(distance_m - z_m);
  }

  /**
   * Image charges of one unit problem: the sphere at the origin at 1 V, the other at 0 V.
   *
   * @param charge in units of 4 pi eps0 times one metre, even ones inside the first sphere
   * @param z_m their places
   */
  @SuppressWarnings("ArrayRecordComponent")
  private record Images(double[] charge, double[] z_m) {
    static Images of(double own_m, double other_m, double distance_m) {
      double[] charge = new double[64];
      double[] z = new double[64];
      double q = own_m;
      double s = 0;
      int n = 0;
      while (Math.abs(q) > NEGLIGIBLE * own_m) {
        if (n + 2 > MOST_TERMS) {
          throw new IllegalStateException("image series does not converge");
        }
        if (n + 2 > charge.length) {
          charge = Arrays.copyOf(charge, 2 * charge.length);
          z = Arrays.copyOf(z, 2 * z.length);
        }
        charge[n] = q;
        z[n++] = s;
        double toOther = distance_m - s;
        q = -q * other_m / toOther;
        s = distance_m - other_m * other_m / toOther;
        charge[n] = q;
        z[n++] = s;
        q = -q * own_m / s;
        s = own_m * own_m / s;
      }
      return new Images(Arrays.copyOf(charge, n), Arrays.copyOf(z, n));
    }

    double ownCharge() {
      return sum(0);
    }

    double otherCharge() {
      return sum(1);
    }

    private double sum(int first) {
      int last = charge.length - 2 + first;
      double sum = 0;
      for (int i = last; i >= first; i -= 2) {
        sum += charge[i];
      }
      return sum;
    }

    double axialField(double at_m) {
      double sum = 0;
      for (int i = charge.length - 1; i >= 0; i--) {
        double r = at_m - z_m[i];
        sum += charge[i] / (r * Math.abs(r));
      }
      return sum;
    }
  }
}
