package org.edgefield.field.gas;

/** What a point of a surface may bear: the criterion's field divided by the margin. */
@FunctionalInterface
public interface PermittedField {
  /**
   * Permitted field strength, peak.
   *
   * @param k1 larger principal curvature, 1/m, positive = convex towards the gas
   * @param k2 smaller one
   * @return V/m, above 0
   */
  double at_V_per_m(double k1, double k2);
}
