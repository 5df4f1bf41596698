package org.edgefield.curvature.feature;

/**
 * A surface that rounds an edge: it joins its neighbours tangentially along two sides, and its
 * cross-section between them is an arc.
 *
 * @param smallest_m smallest radius of the arc along the edge
 * @param largest_m largest radius of the arc along the edge
 * @param median_m median radius of the arc along the edge
 * @param turning_rad angle of the arc, median along the edge
 * @param length_m mean length of the two sides
 * @param convex whether it rounds an outer edge
 */
record Fillet(
    double smallest_m,
    double largest_m,
    double median_m,
    double turning_rad,
    double length_m,
    boolean convex) {

  /** Whether the radius changes along the edge, beyond what a fitted surface scatters. */
  boolean varies() {
    return largest_m > 1.05 * smallest_m;
  }

  /** The radius to count with: the smallest where it changes along the edge. */
  double radius_m() {
    return varies() ? smallest_m : median_m;
  }

  /** Length of the arc. */
  double arc_m() {
    return median_m * turning_rad;
  }

  /** Whether it is at least half as long as its arc is wide: an edge, not an end or a corner. */
  boolean isLong() {
    return length_m >= 0.5 * arc_m();
  }
}
