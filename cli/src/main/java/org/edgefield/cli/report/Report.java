package org.edgefield.cli.report;

import java.time.Instant;
import java.util.List;
import java.util.Map;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;
import org.edgefield.importer.brep.Assembly;

/**
 * A result as the outside sees it: what result.json, the summary, the terminal table and the gate
 * are made from. SI units; values that do not apply are NaN, "no limit" is infinite.
 *
 * @param toolVersion version of edgefield
 * @param input the model
 * @param caseFile name of the case file as given
 * @param method "screen" or "solve"
 * @param permitted rule for the permitted field
 * @param surroundings gas, earth plane, ambient field
 * @param edgeRadius_m edge radius as made where no part has its own
 * @param edgeRadiusGiven whether the case file gives it
 * @param partEdgeRadius_m edge radius by part label where it differs
 * @param electrodes in file order
 * @param ignored labels of parts that take no part
 * @param duties in file order
 * @param verdict worst of the duties
 * @param warnings remarks for the user
 * @param vertices mesh vertices
 * @param triangles mesh triangles
 * @param capacitance_F matrix over the electrodes row by row, empty for a screen
 * @param errorEstimate relative error of the peaks, NaN for a screen
 * @param converged whether the asked accuracy was met
 * @param timing the one part that differs from run to run
 */
public record Report(
    String toolVersion,
    Assembly.Source input,
    String caseFile,
    String method,
    Permitted permitted,
    Surroundings surroundings,
    double edgeRadius_m,
    boolean edgeRadiusGiven,
    Map<String, Double> partEdgeRadius_m,
    List<ElectrodeReport> electrodes,
    List<String> ignored,
    List<DutyReport> duties,
    Verdict verdict,
    List<String> warnings,
    int vertices,
    int triangles,
    double[] capacitance_F,
    double errorEstimate,
    boolean converged,
    Timing timing) {

  /** Electrode with the labels of its parts; kind is live, earth or floating. */
  public record ElectrodeReport(String name, String kind, List<String> parts) {}

  /** Voltage of an electrode in a duty. */
  public record VoltageReport(String electrode, double peak_V, double phase_deg) {}

  /** Outcome of a duty; the peak is there even where all is calm. */
  public record DutyReport(
      String name, List<VoltageReport> voltages, Spot peak, List<Spot> hotSpots, Verdict verdict) {}

  /**
   * One hot spot.
   *
   * @param id rank within the duty, from 1
   * @param part label of the part: its name, or its instance path where the name is not unique
   * @param partPath instance path
   * @param feature place on the part
   * @param at_m peak point
   * @param state red, amber or pass
   * @param opposing label of the opposing part, null where there is none
   * @param law which law gave the value
   * @param cure what would mend it, each alone
   * @param extent where the region lies
   */
  public record Spot(
      int id,
      String part,
      String partPath,
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
      Verdict state,
      String opposing,
      String law,
      CureReport cure,
      Extent extent) {}

  /** Smallest radius, largest voltage, its share of the duty's voltage, and gap that would pass. */
  public record CureReport(double radius_m, double voltage_V, double voltageFactor, double gap_m) {}

  /**
   * Where a region lies: points spread over it, every other point of it within {@code spacing_m} of
   * one of them.
   *
   * @param points_m 3 per point
   */
  public record Extent(double[] points_m, double spacing_m) {}

  /**
   * When and how long.
   *
   * @param started start of the run
   * @param seconds wall-clock seconds by phase, in order
   */
  public record Timing(Instant started, Map<String, Double> seconds) {}
}
