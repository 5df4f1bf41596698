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

  /** Smallest interior angle along the edge, radians. */
  public double sharpest_rad() {
    double least = Double.POSITIVE_INFINITY;
    for (double a : interiorAngle_rad) {
      least = Math.min(least, a);
    }
    return least;
  }
}
