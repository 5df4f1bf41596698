package org.edgefield.models.exact.ambient;

import org.edgefield.models.exact.isolated.Spheroid;

/**
 * Conducting ellipsoid of revolution with no net charge in a uniform field E0 along its axis, and
 * the half of it that stands on an earthed plane (the boss: height h = p, base radius b = q).
 *
 * <pre>
 * E_n = E0 n_z / L,  tip: E0 / L
 * p > q: e = sqrt(1 - (q/p)^2),  L = (1 - e^2)/e^3 (atanh e - e)
 * p < q: k = sqrt((q/p)^2 - 1),  L = (1 + k^2)/k^3 (k - atan k)
 * on the axis: E/E0 = 1 - (Q(x) + x Q'(x)) / Q(x0),  Q = atanh(1/x) - 1/x,  x = z/c, c = sqrt(p^2 - q^2)
 * </pre>
 *
 * L. D. Landau, E. M. Lifshitz, Electrodynamics of Continuous Media, section 4; for the boss H. G.
 * Kosmahl, IEEE Trans. ED 38 (1991) 1534 (memory; digits recomputed). Any positive semi-axes.
 *
 * @param along_m semi-axis p along the field: height of the boss
 * @param across_m semi-axis q across it: base radius of the boss
 */
public record SpheroidInField(double along_m, double across_m) {
  /** Within this of a sphere the series in the eccentricity replaces the cancelling closed form. */
  private static final double NEARLY_ROUND = 0.03;

  /** Radius of curvature of the tip. */
  public double tipRadius_m() {
    return across_m * across_m / along_m;
  }

  /** Field at the tip over the uniform field, 1/L. */
  public double concentration() {
    return 1 / depolarisation();
  }

  /** Normal field on the surface at a height above the equatorial plane. */
  public double surfaceField_V_per_m(double z_m, double ambient_V_per_m) {
    double h = new Spheroid(along_m, across_m).tangentPlaneDistance_m(z_m);
    double normalZ = z_m * h / (along_m * along_m);
    return ambient_V_per_m * concentration() * normalZ;
  }

  /** Ambient field at which the tip reaches a field. */
  public double ambientAt_V_per_m(double tipField_V_per_m) {
    return tipField_V_per_m * depolarisation();
  }

  /** Field on the axis above the tip of a prolate body. */
  public double axialField_V_per_m(double z_m, double ambient_V_per_m) {
    if (!(along_m > across_m)) {
      throw new IllegalArgumentException("the axial field is given for prolate bodies");
    }
    double c = Math.sqrt((along_m - across_m) * (along_m + across_m));
    double x = z_m / c;
    double slope = -1 / (x * x * (x * x - 1));
    return ambient_V_per_m * (1 - (q(x) + x * slope) / q(along_m / c));
  }

  private static double q(double x) {
    return 0.5 * Math.log((x + 1) / (x - 1)) - 1 / x;
  }

  private double depolarisation() {
    // With m = 1 - (q/p)^2: L = (1 - m) Sum_j m^j / (2j + 3), which both closed forms continue.
    double ratio = across_m / along_m;
    double m = (1 - ratio) * (1 + ratio);
    if (Math.abs(m) < NEARLY_ROUND) {
      double sum = 0;
      for (int j = 11; j >= 0; j--) {
        sum = sum * m + 1.0 / (2 * j + 3);
      }
      return (1 - m) * sum;
    }
    if (m > 0) {
      double e = Math.sqrt(m);
      double atanh = Math.log1p(e) - 0.5 * Math.log(ratio * ratio);
      return ratio * ratio / (e * m) * (atanh - e);
    }
    double k = Math.sqrt(-m);
    return ratio * ratio / (k * -m) * (k - Math.atan(k));
  }
}
