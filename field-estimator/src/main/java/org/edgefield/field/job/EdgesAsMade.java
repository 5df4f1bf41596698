package org.edgefield.field.job;

import java.util.Map;

/**
 * Edge radius that the shop really makes where the model is drawn sharp.
 *
 * @param radius_m radius for all parts, the worst (smallest) of a tolerance band
 * @param partRadius_m radius per part index where it differs
 */
public record EdgesAsMade(double radius_m, Map<Integer, Double> partRadius_m) {

  /** Radius that holds on a part, metres. */
  public double radius_m(int part) {
    return partRadius_m.getOrDefault(part, radius_m);
  }
}
