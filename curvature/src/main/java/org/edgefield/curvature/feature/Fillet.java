package org.edgefield.curvature.feature;

/**
 * A surface that rounds an edge: it joins its neighbours tangentially along two sides, and its
 * cross-section between them is an arc.
 *
 * @param smallest_m smallest radius of the arc along the edge
 * @param largest_m largest radius of the arc along the edge
 * @param turning_rad angle of the arc, median along the edge
 * @param length_m mean length of the two sides
 * @param convex whether it rounds an outer edge
 */
record Fillet(
    double smallest_m, double largest_m, double turning_rad, double length_m, boolean convex) {

  /** Length of the arc. */
  double arc_m() {
    return 0.5 * (smallest_m + largest_m) * turning_rad;
  }

  /** Whether it is at least half as long as its arc is wide: an edge, not an end or a corner. */
  boolean isLong() {
    return length_m >= 0.5 * arc_m();
  }
}
