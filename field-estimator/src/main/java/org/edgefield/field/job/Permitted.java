package org.edgefield.field.job;

/**
 * Rule for the permitted field.
 *
 * @param criterion fixed, Peek's law or streamer inception
 * @param field_V_per_m permitted field of the fixed criterion
 * @param margin permitted = inception / margin, at least 1 in sound practice
 * @param amber utilisation from which a region counts as amber, 0.8 by default
 * @param roughness surface factor m of Peek's law, 1 = polished
 */
public record Permitted(
    Criterion criterion, double field_V_per_m, double margin, double amber, double roughness) {
  /** Which law gives the permitted field. */
  public enum Criterion {
    FIXED,
    PEEK,
    STREAMER
  }
}
