package org.edgefield.curvature;

/**
 * Class and interior angle of one CAD edge.
 *
 * @param edge edge id
 * @param edgeClass class over the whole edge
 * @param t curve parameters of the samples, rising
 * @param interiorAngle_rad solid's interior dihedral angle at each sample (pi = flat, pi/2 = outer
 *     edge of a box, above pi = concave)
 */
public record EdgeFeature(int edge, EdgeClass edgeClass, double[] t, double[] interiorAngle_rad) {

  /** Departure from pi below which faces count as tangent: one degree (common practice). */
  public static final double TANGENT_RAD = Math.toRadians(1);

  /** Smallest interior angle along the edge, radians. */
  public double sharpest_rad() {
    double least = Double.POSITIVE_INFINITY;
    for (double a : interiorAngle_rad) {
      least = Math.min(least, a);
    }
    return least;
  }

  /** Largest interior angle along the edge, radians. */
  public double bluntest_rad() {
    double most = Double.NEGATIVE_INFINITY;
    for (double a : interiorAngle_rad) {
      most = Math.max(most, a);
    }
    return most;
  }

  /** Interior angle at a curve parameter, linear between the samples and constant beyond them. */
  public double interiorAngle_rad(double at) {
    int n = t.length;
    int i = 1;
    while (i < n - 1 && t[i] < at) {
      i++;
    }
    double span = t[i] - t[i - 1];
    double f = span > 0 ? Math.max(0, Math.min(1, (at - t[i - 1]) / span)) : 0;
    return interiorAngle_rad[i - 1] + f * (interiorAngle_rad[i] - interiorAngle_rad[i - 1]);
  }

  /**
   * Whether the faces join smoothly at a curve parameter: along the whole of a tangent edge or
   * seam, and where a mixed edge is within a degree of flat.
   */
  public boolean smoothAt(double at) {
    return switch (edgeClass) {
      case TANGENT, SEAM, DEGENERATE -> true;
      case SHARP_CONVEX, SHARP_CONCAVE -> false;
      case MIXED -> Math.abs(interiorAngle_rad(at) - Math.PI) <= TANGENT_RAD;
    };
  }
}
