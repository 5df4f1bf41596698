package org.edgefield.field.bem.inception;

import java.util.ArrayList;
import java.util.List;
import org.edgefield.field.bem.evaluate.FieldEvaluator;
import org.edgefield.field.gas.FieldProfile;
import org.edgefield.field.gas.StreamerCriterion;

/**
 * Inception fields by the streamer criterion along field lines traced in the solved field.
 *
 * <p>Limit: the field is that without space charge, and inception is not breakdown where the field
 * is strongly non-uniform.
 */
public final class TracedInception {
  private static final double FIRST = 0.02;
  private static final double LARGEST_IN_RADII = 60;
  private static final double FARTHEST_M = 3;

  /** At an edge drawn sharp the traced field begins this many radii as made away from it. */
  private static final double BEYOND_ROUNDING = 5;

  /** Points keep this share of the gap away from the far electrode. */
  private static final double WITHIN_GAP = 0.98;

  private TracedInception() {}

  /**
   * A place on a conductor.
   *
   * @param start point on the surface
   * @param normal outward unit normal
   * @param weight weight of each solved set at the moment of the highest field
   * @param field_V_per_m field strength there
   * @param radius_m radius there, infinite where flat
   * @param gap_m distance to the body across, infinite where none
   * @param law share of the peak near an edge as made, null elsewhere
   */
  public record Place(
      double[] start,
      double[] normal,
      double[] weight,
      double field_V_per_m,
      double radius_m,
      double gap_m,
      FieldProfile law) {}

  /**
   * What was found at a place.
   *
   * @param field_V_per_m inception field at the surface
   * @param remarks what limits the answer
   */
  public record Inception(double field_V_per_m, List<String> remarks) {}

  /** Inception fields of places. */
  public static List<Inception> of(
      FieldEvaluator evaluator, StreamerCriterion criterion, List<Place> places) {
    FieldLines.Line[] lines = new FieldLines.Line[places.size()];
    for (int i = 0; i < lines.length; i++) {
      Place p = places.get(i);
      double length =
          Math.min(
              Math.min(WITHIN_GAP * p.gap_m, FARTHEST_M),
              LARGEST_IN_RADII * Math.max(p.radius_m, 1e-3));
      double first =
          p.law == null
              ? FIRST * Math.min(p.radius_m, length)
              : Math.min(BEYOND_ROUNDING * p.radius_m, 0.2 * length);
      lines[i] = new FieldLines.Line(p.start, p.normal, p.weight, p.field_V_per_m, first, length);
    }
    FieldLines traced = FieldLines.trace(evaluator, lines);
    List<Inception> out = new ArrayList<>();
    for (int i = 0; i < lines.length; i++) {
      Place p = places.get(i);
      double[] s = traced.distance_m()[i];
      double[] e = traced.field_V_per_m()[i];
      LineProfile profile = p.law == null ? LineProfile.of(s, e) : LineProfile.of(s, e, p.law);
      double gap = Math.min(p.gap_m, Math.max(lines[i].length_m(), FARTHEST_M));
      double field = criterion.inceptionField_V_per_m(profile, gap);
      out.add(new Inception(field, criterion.remarks(field, p.radius_m, p.gap_m)));
    }
    return out;
  }
}
