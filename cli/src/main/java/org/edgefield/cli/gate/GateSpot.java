package org.edgefield.cli.gate;

/**
 * What the gate knows of a hot spot.
 *
 * @param part label of the part
 * @param partPath instance path of the part
 * @param feature place for people; not used to match
 * @param at_m peak point (3)
 * @param utilisation field over permitted field
 * @param red whether it is red
 * @param points_m points spread over the region, 3 per point, the peak first
 * @param spacing_m every point of the region lies within this of one of them
 */
record GateSpot(
    String part,
    String partPath,
    String feature,
    double[] at_m,
    double utilisation,
    boolean red,
    double[] points_m,
    double spacing_m) {

  /**
   * Whether both lie on the same part: by instance path, by path below the top of the assembly (a
   * new revision often renames the top), or by label.
   */
  boolean samePart(GateSpot other) {
    return partPath.equals(other.partPath)
        || part.equals(other.part)
        || belowTop(partPath).equals(belowTop(other.partPath));
  }

  private static String belowTop(String path) {
    return path.substring(path.indexOf('/') + 1);
  }

  /** Distance between the peaks, metres. */
  double peakDistance_m(GateSpot other) {
    return distance(at_m, other.at_m, 0);
  }

  /** Distance from a point to the region, metres: 0 within the spacing of its points. */
  double distance_m(double[] point_m) {
    double least = Double.POSITIVE_INFINITY;
    for (int i = 0; i < points_m.length; i += 3) {
      least = Math.min(least, distance(point_m, points_m, i));
    }
    return Math.max(0, least - spacing_m);
  }

  private static double distance(double[] a, double[] b, int at) {
    double dx = a[0] - b[at];
    double dy = a[1] - b[at + 1];
    double dz = a[2] - b[at + 2];
    return Math.sqrt(dx * dx + dy * dy + dz * dz);
  }
}
