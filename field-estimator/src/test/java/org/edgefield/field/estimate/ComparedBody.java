package org.edgefield.field.estimate;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.feature.FeatureRecogniser;
import org.edgefield.field.bem.solve.FieldSolver;
import org.edgefield.field.bem.solve.SolveSettings;
import org.edgefield.field.hotspot.HotSpots;
import org.edgefield.field.hotspot.NodeFaces;
import org.edgefield.field.hotspot.SharpVertices;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.result.DutyField;
import org.edgefield.field.result.DutyResult;
import org.edgefield.field.result.FieldResult;
import org.edgefield.field.result.HotSpot;
import org.edgefield.field.result.Law;
import org.edgefield.importer.Progress;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.importer.mesh.MeshSettings;

/**
 * The hot spots of a solve with the estimate's values at the same features, on the solve's mesh.
 *
 * <p>A hot spot is a region above half of the duty's peak. The estimate's value is its highest over
 * the nodes of the region that belong to the spot's feature. Of several spots of one name on one
 * part and duty the highest and those with the extreme ratios stand for all.
 */
record ComparedBody(String name, FieldResult solved, List<Row> rows) {
  private static final double SHARE = 0.5;

  /**
   * One hot spot.
   *
   * @param claim relative uncertainty that the solve claims there
   * @param law law of the estimate
   */
  record Row(
      String body,
      String duty,
      String place,
      double solved_V_per_m,
      double claim,
      double ratio,
      Law law) {
    String text() {
      return String.format(
          Locale.ROOT,
          "| %s | %s | %s | %.4g | %.1f | %s | %.2f |",
          body,
          duty,
          place,
          solved_V_per_m,
          100 * claim,
          law.text(),
          ratio);
    }

    boolean roundedEdge() {
      return place.startsWith("rounded");
    }
  }

  static ComparedBody of(
      String name, KernelAssembly assembly, FieldCase fieldCase, SolveSettings settings) {
    Features features = FeatureRecogniser.of(assembly.geometry(), assembly.triangulation());
    FieldResult solved =
        FieldSolver.solve(
            assembly,
            assembly.triangulation(),
            features,
            fieldCase,
            MeshSettings.defaults(),
            settings,
            Progress.NONE);
    ScreenedModel screen = ScreenedModel.of(assembly, fieldCase, solved.mesh());
    List<Row> rows = new ArrayList<>();
    for (int d = 0; d < fieldCase.duties().size(); d++) {
      rows.addAll(duty(name, assembly, features, solved, screen, d));
    }
    return new ComparedBody(name, solved, rows);
  }

  /** The law that a {@link DutyField} keeps by its code. */
  @SuppressWarnings("EnumOrdinal")
  private static Law lawOf(byte code) {
    return Law.values()[code];
  }

  private static List<Row> duty(
      String body,
      KernelAssembly assembly,
      Features features,
      FieldResult solved,
      ScreenedModel screen,
      int duty) {
    DutyField field = solved.duties().get(duty).field();
    double peak = 0;
    for (double e : field.field_V_per_m()) {
      peak = Math.max(peak, e);
    }
    double limit = Math.max(SHARE * peak, Double.MIN_NORMAL);
    double[] flat = new double[field.field_V_per_m().length];
    java.util.Arrays.fill(flat, limit);
    EstimateModel onSolve =
        EstimateModel.build(
            assembly, solved.mesh(), solved.nodes(), features, screen.fieldCase(), Progress.NONE);
    HotSpots finder =
        new HotSpots(
            assembly, solved.mesh(), solved.nodes(), features, onSolve, (a, b) -> limit, 1);
    DutyResult spots =
        finder.of(
            duty,
            new DutyField(
                field.duty(),
                field.field_V_per_m(),
                flat,
                field.gap_m(),
                field.radius_m(),
                field.law(),
                field.uncertainty()));
    DutyField estimate = screen.estimate().field(duty, (a, b) -> limit);
    Map<String, List<Row>> byPlace = new TreeMap<>();
    for (HotSpot h : spots.hotSpots()) {
      Set<Integer> region = new HashSet<>();
      for (int n : h.nodes()) {
        region.add(solved.nodes().nodeVertex()[n]);
      }
      int best = highest(assembly, features, screen, estimate, h, region);
      if (best >= 0) {
        String place = h.feature() + " of " + assembly.parts().get(h.part()).name();
        byPlace
            .computeIfAbsent(place, p -> new ArrayList<>())
            .add(
                new Row(
                    body,
                    field.duty(),
                    place,
                    h.field_V_per_m(),
                    h.uncertainty(),
                    estimate.field_V_per_m()[best] / h.field_V_per_m(),
                    lawOf(estimate.law()[best])));
      }
    }
    List<Row> rows = new ArrayList<>();
    for (List<Row> alike : byPlace.values()) {
      Set<Row> kept = new java.util.LinkedHashSet<>();
      kept.add(alike.get(0));
      kept.add(alike.stream().min(java.util.Comparator.comparingDouble(Row::ratio)).orElseThrow());
      kept.add(alike.stream().max(java.util.Comparator.comparingDouble(Row::ratio)).orElseThrow());
      rows.addAll(kept);
    }
    rows.sort(java.util.Comparator.comparingDouble((Row r) -> -r.solved_V_per_m()));
    return rows;
  }

  /** Node of the highest estimate in a region on the spot's feature, -1 where it has none. */
  private static int highest(
      KernelAssembly assembly,
      Features features,
      ScreenedModel screen,
      DutyField estimate,
      HotSpot spot,
      Set<Integer> region) {
    SharpVertices sharp = screen.estimate().sharp();
    int[] face =
        NodeFaces.of(
            screen.mesh(),
            screen.nodes(),
            NodeFaces.rounded(features, assembly.geometry().faceCount()));
    int best = -1;
    for (int n = 0; n < screen.nodes().count(); n++) {
      int v = screen.nodes().nodeVertex()[n];
      if (!region.contains(v)) {
        continue;
      }
      String feature =
          sharp.isCorner(v)
              ? features.vertexName(screen.mesh().vertexEntity()[v])
              : sharp.isSharp(v)
                  ? features.edgeName(screen.mesh().segmentEdge()[sharp.segment(v)])
                  : features.faceName(face[n]);
      if (feature.equals(spot.feature())
          && (best < 0 || estimate.field_V_per_m()[n] > estimate.field_V_per_m()[best])) {
        best = n;
      }
    }
    return best;
  }
}
