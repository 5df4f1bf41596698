package org.edgefield.field.job;

/**
 * Gas around the equipment and what bounds it.
 *
 * @param gas name of the gas, "air" by default
 * @param pressure_Pa absolute pressure
 * @param temperature_K gas temperature
 * @param humidity_kg_per_m3 absolute humidity, NaN where not given
 * @param altitude_m altitude the pressure was derived from, NaN where pressure was given
 * @param earthPlane earth plane, or null
 * @param ambientField_V_per_m uniform ambient field vector (3), or null
 */
public record Surroundings(
    String gas,
    double pressure_Pa,
    double temperature_K,
    double humidity_kg_per_m3,
    double altitude_m,
    EarthPlane earthPlane,
    double[] ambientField_V_per_m) {

  /**
   * An axis-aligned earth plane; the model stands on its positive or negative side.
   *
   * @param axis 0 = x, 1 = y, 2 = z
   * @param offset_m position along the axis
   */
  public record EarthPlane(int axis, double offset_m) {}
}
