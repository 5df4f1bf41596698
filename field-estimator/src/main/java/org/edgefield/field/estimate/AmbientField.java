package org.edgefield.field.estimate;

import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Surroundings.EarthPlane;

/**
 * Field of bodies in a uniform ambient field, by the conducting ellipsoid that has the body's
 * height along the field and the point's curvatures.
 *
 * <p>An ellipsoid of semi-axes a (along the field), b1, b2 concentrates the field at its tip by
 *
 * <pre>
 * gamma = 1/L,  L = (a b1 b2 / 2) Int_0^inf du / ((a^2 + u) sqrt((a^2 + u)(b1^2 + u)(b2^2 + u)))
 * </pre>
 *
 * (L. D. Landau, E. M. Lifshitz, Electrodynamics of Continuous Media, section 4; memory), exact for
 * half-ellipsoids on a plane and whole ones in space. A point gets a = its height above the earth
 * plane (or, without one, above the middle of its electrode), b_i = sqrt(a / k_i), and of gamma the
 * share of its normal along the field. On edges of thick bodies this is too high, since an
 * ellipsoid of that tip radius is slimmer: there the concentration is scaled by the ratio of the
 * edge's flux tube to the ellipsoid's.
 */
final class AmbientField {
  static final String REMARK =
      "ambient field: the estimate takes each body alone and as an ellipsoid of its height and tip"
          + " radius; solve for bodies that shelter each other";

  private final Sites sites;
  private final double[] field;
  private final double strength;
  private final double[] middle;
  private final int[] electrode;

  AmbientField(Sites sites, FieldCase fieldCase, int[] electrode) {
    this.sites = sites;
    this.electrode = electrode;
    field = fieldCase.surroundings().ambientField_V_per_m();
    strength = Math.sqrt(field[0] * field[0] + field[1] * field[1] + field[2] * field[2]);
    middle = middles(fieldCase);
  }

  /** Level of zero potential along the field per electrode. */
  private double[] middles(FieldCase fieldCase) {
    int n = fieldCase.electrodes().size();
    double[] low = new double[n];
    double[] high = new double[n];
    java.util.Arrays.fill(low, Double.POSITIVE_INFINITY);
    java.util.Arrays.fill(high, Double.NEGATIVE_INFINITY);
    for (int s = 0; s < sites.count(); s++) {
      if (electrode[s] >= 0) {
        double h = along(sites.position, s);
        low[electrode[s]] = Math.min(low[electrode[s]], h);
        high[electrode[s]] = Math.max(high[electrode[s]], h);
      }
    }
    EarthPlane plane = fieldCase.surroundings().earthPlane();
    double[] result = new double[n];
    for (int e = 0; e < n; e++) {
      boolean set = fieldCase.electrodes().get(e).kind() != Electrode.Kind.FLOATING;
      result[e] =
          plane != null && set
              ? plane.offset_m() * field[plane.axis()] / strength
              : 0.5 * (low[e] + high[e]);
    }
    return result;
  }

  private double along(double[] v, int s) {
    return (v[3 * s] * field[0] + v[3 * s + 1] * field[1] + v[3 * s + 2] * field[2]) / strength;
  }

  /** Field strength at a site of a conductor, V/m. */
  double field_V_per_m(int s) {
    if (strength == 0) {
      return 0;
    }
    double height = Math.abs(along(sites.position, s) - middle[electrode[s]]);
    double cos = Math.abs(along(sites.normal, s));
    if (height == 0) {
      return strength * cos;
    }
    double k1 = Math.max(sites.k1[s], 0);
    double k2 = Math.max(sites.k2[s], 0);
    // Flat directions are as long as the body; c = 1/b^2.
    double c1 = Math.max(k1 / height, sites.form[s] == Sites.SMOOTH ? sites.end1[s] : 0);
    double c2 = Math.max(k2 / height, sites.end2[s]);
    double gamma = EllipsoidInField.concentration(height, 1 / Math.sqrt(c1), 1 / Math.sqrt(c2));
    double edge = 1;
    if (sites.form[s] != Sites.SMOOTH) {
      FluxTube tube = new FluxTube();
      double slim = tube.smooth(k1, c1, k2, c2).resistance(height, height);
      edge = Math.min(1, slim / sites.free(s, tube, Double.NaN).resistance(height, height));
    }
    return strength * cos * (1 + (gamma - 1) * edge);
  }
}
