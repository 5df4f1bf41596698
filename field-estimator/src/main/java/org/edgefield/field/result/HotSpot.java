package org.edgefield.field.result;

/**
 * A contiguous region of utilisation above the amber limit.
 *
 * @param id rank within the duty, from 1, by utilisation
 * @param part index of the part
 * @param feature place without the part, "rounded edge R2"
 * @param at_m peak point (3)
 * @param field_V_per_m peak field
 * @param permitted_V_per_m permitted field at the peak
 * @param utilisation field / permitted
 * @param uncertainty relative uncertainty of the field
 * @param area_m2 area of the region, NaN where it is a line
 * @param length_m length where the region is a sharp edge, NaN otherwise
 * @param radius_m radius at the peak, infinite where flat
 * @param gap_m distance to the opposing body, infinite where none
 * @param opposing index of the opposing part, -1 where none
 * @param law which law gave the value
 * @param nodes mesh nodes of the region, rising; reports and the gate take its extent from them
 * @param cure what would mend it
 */
public record HotSpot(
    int id,
    int part,
    String feature,
    double[] at_m,
    double field_V_per_m,
    double permitted_V_per_m,
    double utilisation,
    double uncertainty,
    double area_m2,
    double length_m,
    double radius_m,
    double gap_m,
    int opposing,
    Law law,
    int[] nodes,
    Cure cure) {

  /**
   * What would bring a hot spot to utilisation 1 / margin, each alone.
   *
   * @param radius_m smallest radius that passes, NaN where no radius does
   * @param voltage_V largest permitted voltage difference, peak
   * @param voltageFactor permitted share of the duty's voltages
   * @param gap_m gap that the same radius would need, NaN where no gap does
   */
  public record Cure(double radius_m, double voltage_V, double voltageFactor, double gap_m) {}

  /** The same with another rank. */
  public HotSpot withId(int rank) {
    return new HotSpot(
        rank,
        part,
        feature,
        at_m,
        field_V_per_m,
        permitted_V_per_m,
        utilisation,
        uncertainty,
        area_m2,
        length_m,
        radius_m,
        gap_m,
        opposing,
        law,
        nodes,
        cure);
  }
}
