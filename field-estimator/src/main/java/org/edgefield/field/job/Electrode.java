package org.edgefield.field.job;

/**
 * Parts at one potential.
 *
 * @param name as the case file gives it
 * @param parts indices of its parts in the assembly
 * @param kind live, earth or floating
 */
public record Electrode(String name, int[] parts, Kind kind) {
  /** How the potential is set. */
  public enum Kind {
    /** Voltage given per duty. */
    LIVE,
    /** Zero volts in every duty. */
    EARTH,
    /** Insulated: no net charge, potential follows. */
    FLOATING
  }
}
