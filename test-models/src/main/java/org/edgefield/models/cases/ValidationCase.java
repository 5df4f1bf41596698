package org.edgefield.models.cases;

import java.util.List;

/**
 * One comparison with an exact value.
 *
 * @param name unique name
 * @param model file name in the step folder
 * @param electrodes electrodes and their potentials
 * @param earthPlane whether the plane z = 0 is earthed
 * @param ambientAlongZ_V_per_m uniform ambient field along z, 0 for none
 * @param quantity what is compared
 * @param exact its exact value in SI units
 * @param tolerance relative deviation that a correct solve stays within when nothing else is asked
 * @param source where the exact value comes from
 */
public record ValidationCase(
    String name,
    String model,
    List<Terminal> electrodes,
    boolean earthPlane,
    double ambientAlongZ_V_per_m,
    Quantity quantity,
    double exact,
    double tolerance,
    String source) {
  @Override
  public String toString() {
    return name;
  }
}
