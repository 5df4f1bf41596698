package org.edgefield.models.cases;

/** What a case compares. */
public sealed interface Quantity {
  /**
   * Largest field strength on an electrode, V/m.
   *
   * @param electrode name of the electrode
   */
  record PeakField(String electrode) implements Quantity {}

  /**
   * Field strength on the surface at the node nearest to a point, V/m.
   *
   * @param electrode name of the electrode
   * @param x_m place
   * @param y_m place
   * @param z_m place
   */
  record FieldAt(String electrode, double x_m, double y_m, double z_m) implements Quantity {}

  /**
   * Charge on one electrode with another at 1 V and the rest at 0 V, F.
   *
   * @param row electrode that carries the charge
   * @param column electrode at 1 V
   */
  record Capacitance(String row, String column) implements Quantity {}
}
