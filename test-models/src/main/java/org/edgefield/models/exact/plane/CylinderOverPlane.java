package org.edgefield.models.exact.plane;

/**
 * Long cylinder at voltage U parallel to an earthed plane; h = r + s height of its axis, w =
 * sqrt(h^2 - r^2):
 *
 * <pre>E_peak = U sqrt((h + r)/(h - r)) / (r ln((h + w)/r))</pre>
 *
 * Textbook, bipolar coordinates (memory; recomputed).
 *
 * @param radius_m radius r
 * @param gap_m shortest distance s to the plane
 */
public record CylinderOverPlane(double radius_m, double gap_m) {
  /** Field on the line that faces the plane, the largest. */
  public double peakField_V_per_m(double voltage_V) {
    double h = radius_m + gap_m;
    double w = Math.sqrt(gap_m * (gap_m + 2 * radius_m));
    return voltage_V
        * Math.sqrt((h + radius_m) / gap_m)
        / (radius_m * Math.log((h + w) / radius_m));
  }
}
