package org.edgefield.field.estimate;

/**
 * Field on a conductor from its curvatures and the gap, if the equipotentials are parallel
 * surfaces.
 *
 * <p>Flux through surfaces parallel to the conductor is conserved, so with principal curvatures k1,
 * k2 (positive = convex towards the gas) and the opposing electrode at the distance d along the
 * normal and the potential difference U
 *
 * <pre>E = U / R,  R = Int_0^d ds / ((1 + k1 s)(1 + k2 s)) = ln((1 + k1 d)/(1 + k2 d)) / (k1 - k2)
 * </pre>
 *
 * <p>Exact for parallel plates, coaxial cylinders, concentric spheres (both electrodes of each) and
 * the isolated sphere. The differential form dE/dn = -(k1 + k2) E is G. Green's (An Essay on the
 * Application of Mathematical Analysis to the Theories of Electricity and Magnetism, 1828; memory).
 * Range: any curvatures and any gap; where a concave surface would close up within the gap its
 * curvature is held at -{@value #LEAST_CLOSURE} / d. Poor on a small fillet of a thick body, which
 * is no wire: the law may then give several times the true field.
 */
public final class ParallelSurfacesLaw {
  /** Largest part of a concave surface's radius that the gap may take. */
  static final double LEAST_CLOSURE = 0.999;

  private static final double LARGEST = 1e150;

  private ParallelSurfacesLaw() {}

  /**
   * Field strength at the conductor.
   *
   * @param voltage_V potential difference to the opposing electrode
   * @param k1 a principal curvature, 1/m
   * @param k2 the other one, 1/m
   * @param gap_m distance of the opposing electrode along the normal, above 0, may be infinite
   * @return V/m, of the sign of the voltage; never NaN; 0 where the other electrode is at infinity
   *     and the surface is not convex in both directions
   */
  public static double field_V_per_m(double voltage_V, double k1, double k2, double gap_m) {
    return voltage_V / resistance_m(k1, k2, gap_m);
  }

  /**
   * The integral R: potential difference per field strength at the conductor.
   *
   * @param k1 a principal curvature, 1/m
   * @param k2 the other one, 1/m
   * @param gap_m above 0, may be infinite
   * @return metres, above 0, infinite where the field vanishes
   */
  public static double resistance_m(double k1, double k2, double gap_m) {
    double upper = Math.max(k1, k2);
    double lower = Math.min(k1, k2);
    if (gap_m == Double.POSITIVE_INFINITY) {
      return lower > 0 ? logRatio((upper - lower) / lower) / lower : Double.POSITIVE_INFINITY;
    }
    double a = clamp(upper * gap_m);
    double b = clamp(lower * gap_m);
    return gap_m * logRatio((a - b) / (1 + b)) / (1 + b);
  }

  /** Curvature that the law uses for a gap: concave ones are held open. */
  static double held(double k, double gap_m) {
    return Math.max(k, -LEAST_CLOSURE / gap_m);
  }

  private static double clamp(double u) {
    return Math.min(Math.max(u, -LEAST_CLOSURE), LARGEST);
  }

  /** ln(1 + z) / z, continued to 1 at z = 0. */
  private static double logRatio(double z) {
    return z == 0 ? 1 : Math.log1p(z) / z;
  }
}
