package org.edgefield.field.gas;

/** Field along a field line as a share of the field at the electrode. */
@FunctionalInterface
public interface FieldProfile {
  /**
   * Share of the electrode's field.
   *
   * @param s_m distance from the electrode along the line
   */
  double share(double s_m);
}
