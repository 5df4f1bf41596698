package org.edgefield.field.bem.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.edgefield.field.bem.evaluate.FieldEvaluator;
import org.edgefield.field.bem.inception.TracedInception;
import org.edgefield.field.gas.AirDensity;
import org.edgefield.field.gas.Ionisations;
import org.edgefield.field.gas.StreamerCriterion;
import org.edgefield.field.hotspot.LocalLaw;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;
import org.edgefield.field.result.DutyField;
import org.edgefield.field.result.DutyResult;
import org.edgefield.field.result.HotSpot;

/** Permitted fields at hot spots by the streamer criterion along the field lines of the solve. */
final class Inceptions {
  /** Hot spots per duty whose field lines are traced, by rank. */
  private static final int MOST = 12;

  private final Level level;
  private final FieldEvaluator evaluator;
  private final FieldCase fieldCase;
  private final LocalLaw model;
  private final StreamerCriterion criterion;
  private final Set<String> remarks = new LinkedHashSet<>();

  Inceptions(Level level, FieldEvaluator evaluator, FieldCase fieldCase, LocalLaw model) {
    this.level = level;
    this.evaluator = evaluator;
    this.fieldCase = fieldCase;
    this.model = model;
    Surroundings around = fieldCase.surroundings();
    criterion =
        new StreamerCriterion(
            Ionisations.of(around.gas()),
            AirDensity.pressureAt20_Pa(around.pressure_Pa(), around.temperature_K()));
  }

  /** Whether a case asks for them. */
  static boolean wanted(FieldCase fieldCase) {
    return fieldCase.permitted().criterion() == Permitted.Criterion.STREAMER;
  }

  /**
   * Permitted fields by peak node.
   *
   * @param duty index in the case
   * @param result hot spots by the criterion on the surface's own curvatures
   */
  Map<Integer, Double> of(int duty, DutyResult result) {
    Superposition weights =
        Superposition.of(fieldCase, fieldCase.duties().get(duty), level.units().charge_C());
    DutyField field = result.field();
    Set<Integer> peaks = new LinkedHashSet<>();
    peaks.add(peak(result.peak(), field));
    result.hotSpots().stream().limit(MOST).forEach(h -> peaks.add(peak(h, field)));
    List<Integer> nodes = new ArrayList<>();
    List<TracedInception.Place> places = new ArrayList<>();
    for (int node : peaks) {
      int unknown = level.surface().nodeUnknown()[node];
      if (unknown >= 0 && field.field_V_per_m()[node] > 0) {
        nodes.add(node);
        places.add(place(duty, node, unknown, weights, field));
      }
    }
    Map<Integer, Double> out = new LinkedHashMap<>();
    if (places.isEmpty()) {
      return out;
    }
    List<TracedInception.Inception> found = TracedInception.of(evaluator, criterion, places);
    Permitted permitted = fieldCase.permitted();
    for (int i = 0; i < nodes.size(); i++) {
      out.put(
          nodes.get(i), found.get(i).field_V_per_m() * permitted.roughness() / permitted.margin());
      remarks.addAll(found.get(i).remarks());
    }
    return out;
  }

  /** What limits the answers so far. */
  Set<String> remarks() {
    return remarks;
  }

  private static int peak(HotSpot spot, DutyField field) {
    int best = spot.nodes()[0];
    for (int n : spot.nodes()) {
      if (field.field_V_per_m()[n] / field.permitted_V_per_m()[n]
          > field.field_V_per_m()[best] / field.permitted_V_per_m()[best]) {
        best = n;
      }
    }
    return best;
  }

  private TracedInception.Place place(
      int duty, int node, int unknown, Superposition weights, DutyField field) {
    double[][] density = level.units().density();
    double re = weights.real(density, unknown);
    double im = weights.imaginary(density, unknown);
    double size = Math.hypot(re, im);
    double[] weight = new double[density.length];
    for (int k = 0; k < weight.length; k++) {
      double cos = size > 0 ? re / size : 1;
      double sin = size > 0 ? im / size : 0;
      weight[k] = cos * weights.real(k) + sin * weights.imaginary(k);
    }
    int v = level.nodes().nodeVertex()[node];
    return new TracedInception.Place(
        Arrays.copyOfRange(level.mesh().xyz(), 3 * v, 3 * v + 3),
        outward(v),
        weight,
        field.field_V_per_m()[node],
        field.radius_m()[node],
        model.gap_m(duty, node),
        model.asMade(node));
  }

  /** Mean of the normals at a vertex. */
  private double[] outward(int vertex) {
    double[] sum = new double[3];
    for (int n = 0; n < level.nodes().count(); n++) {
      if (level.nodes().nodeVertex()[n] == vertex) {
        for (int k = 0; k < 3; k++) {
          sum[k] += level.nodes().normal()[3 * n + k];
        }
      }
    }
    double length = Math.hypot(Math.hypot(sum[0], sum[1]), sum[2]);
    for (int k = 0; k < 3; k++) {
      sum[k] /= length;
    }
    return sum;
  }
}
