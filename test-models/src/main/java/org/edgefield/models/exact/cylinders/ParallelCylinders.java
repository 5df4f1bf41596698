package org.edgefield.models.exact.cylinders;

import org.edgefield.models.exact.plane.CylinderOverPlane;

/**
 * Two long equal parallel cylinders at +U/2 and -U/2: a cylinder over a plane at half the gap and
 * half the voltage (textbook; recomputed).
 *
 * @param radius_m radius
 * @param gap_m shortest distance between the surfaces
 */
public record ParallelCylinders(double radius_m, double gap_m) {
  /** Field on the lines that face each other, the largest. */
  public double peakField_V_per_m(double voltage_V) {
    return new CylinderOverPlane(radius_m, gap_m / 2).peakField_V_per_m(voltage_V / 2);
  }
}
