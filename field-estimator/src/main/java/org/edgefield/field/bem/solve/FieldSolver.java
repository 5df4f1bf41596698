package org.edgefield.field.bem.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.edgefield.curvature.Features;
import org.edgefield.field.bem.edge.SharpEdges;
import org.edgefield.field.bem.evaluate.FieldEvaluator;
import org.edgefield.field.estimate.EstimateModel;
import org.edgefield.field.gas.PermittedField;
import org.edgefield.field.gas.PermittedFields;
import org.edgefield.field.hotspot.HotSpots;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.parallel.Workers;
import org.edgefield.field.result.DutyField;
import org.edgefield.field.result.DutyResult;
import org.edgefield.field.result.FieldResult;
import org.edgefield.field.result.Law;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.mesh.MeshRequest;
import org.edgefield.importer.mesh.MeshSettings;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.SurfaceMesher;

/**
 * Solves the field of a case by boundary elements, refining until the peak of every electrode and
 * duty is as accurate as asked, or the budget is spent.
 *
 * <p>The claimed uncertainty of a peak is the largest of the error that its change since the level
 * before lets expect, a quarter of the change before that (a change can be small by chance), the
 * distance of raw and recovered value, and a floor of 0.1 %, half as much again. Sharp edges drawn
 * without a radius have no finite field; there the estimate's value for the edge as made stands.
 */
public final class FieldSolver {
  private static final int LEVELS = 6;
  private static final double FLOOR = 1e-3;

  /** On every claim, from the exact cases: convergence is not smooth. */
  private static final double SAFETY = 1.5;

  /** Relative uncertainty claimed beside sharp edges, where no mesh resolves the field. */
  private static final double IN_EDGE_ZONE = 0.4;

  /**
   * Share of the highest field on an electrode's sharp edges below which its faces do not count.
   */
  private static final double BESIDE_EDGES = 0.5;

  /** Ratio of element widths above which a mesh counts as unchanged. */
  private static final double UNCHANGED = 0.9;

  /** Bytes per triangle of a level with four right-hand sides, on the safe side. */
  private static final double BYTES_PER_TRIANGLE = 12_000;

  /** A level takes about this many times the one before. */
  private static final double GROWTH = 3;

  private FieldSolver() {}

  /**
   * Runs the solve.
   *
   * @param assembly the model
   * @param start closed mesh of the assembly to begin from, such as the kernel's triangulation
   * @param features edge classes and rounded edges
   * @param fieldCase electrodes, duties, surroundings
   * @param meshSettings sizes of the first mesh
   * @param settings accuracy and budget
   * @param progress receives reports
   * @return result of method SOLVE; not converged where the budget ended the refinement
   * @throws SolveException where parts of different electrodes touch or nothing carries charge
   */
  public static FieldResult solve(
      Assembly assembly,
      SurfaceMesh start,
      Features features,
      FieldCase fieldCase,
      MeshSettings meshSettings,
      SolveSettings settings,
      Progress progress) {
    long begin = System.nanoTime();
    int[] electrodeOfPart = fieldCase.electrodeOfPart(assembly.parts().size());
    MeshRequest request = MeshRequest.NONE.withPartGroup(electrodeOfPart);
    SurfaceMesh mesh = SurfaceMesher.refine(assembly, start, meshSettings, request, progress);
    ContactCheck.refuseShorts(assembly, mesh, fieldCase);
    EdgeRefinement edgeRefinement =
        new EdgeRefinement(SharpEdges.of(assembly, mesh, features, electrodeOfPart));
    double[][] edgeClaims = null;
    double farTolerance = Math.max(1e-7, Math.min(1e-5, 1e-3 * settings.accuracy()));
    Level level = null;
    double[][] uncertainty = null;
    double[][] change = null;
    GapCheck gaps = null;
    boolean converged = false;
    try (Workers workers = new Workers(settings.threads())) {
      for (int number = 1; ; number++) {
        long levelBegin = System.nanoTime();
        String label = "level " + number + ", ";
        Progress labelled = (phase, share, detail) -> progress.report(phase, share, label + detail);
        Level next =
            Level.solve(
                assembly,
                features,
                edgeRefinement.edges(),
                mesh,
                fieldCase,
                farTolerance,
                workers,
                labelled);
        double[][] earlier = change;
        change = changes(level, next, fieldCase);
        uncertainty = uncertainties(next, change, earlier, uncertainty);
        double[] width = Refinement.widths(mesh);
        gaps = GapCheck.of(assembly, next, fieldCase, width);
        edgeClaims = edgeRefinement.claims(next, fieldCase.electrodes().size());
        boolean edgesFine = worst(edgeClaims) <= settings.accuracy();
        converged =
            level != null
                && gaps.resolved()
                && edgesFine
                && worst(uncertainty) <= settings.accuracy();
        level = next;
        edgeRefinement.choose(level, !edgesFine);
        progress.report(
            "solve",
            Double.NaN,
            report(number, level, Math.max(worst(uncertainty), worst(edgeClaims))));
        double spent = (System.nanoTime() - begin) * 1e-9;
        double ahead = GROWTH * (System.nanoTime() - levelBegin) * 1e-9;
        if (converged || number == LEVELS || (number > 1 && spent + ahead > settings.time_s())) {
          break;
        }
        double[] target =
            Refinement.targets(level, width, gaps, uncertainty, settings.accuracy(), number == 1);
        SurfaceMesh finer =
            SurfaceMesher.refine(
                assembly,
                mesh,
                meshSettings,
                edgeRefinement.request(request, mesh, target),
                labelled);
        if (finer.triangleCount() * BYTES_PER_TRIANGLE > settings.memory_bytes()) {
          break;
        }
        mesh = finer;
      }
    }
    List<String> warnings = new ArrayList<>();
    if (!gaps.resolved()) {
      warnings.add(gaps.remark(assembly, level.mesh()));
    }
    double claim = Math.max(worst(uncertainty), worst(edgeClaims));
    if (claim > settings.accuracy()) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "the budget ended the refinement: peak fields are uncertain by %.1f %%, asked were"
                  + " %.1f %%; allow more time or memory, or ask for less",
              100 * claim,
              100 * settings.accuracy()));
    }
    List<DutyResult> duties;
    try (Workers workers = new Workers(settings.threads())) {
      duties =
          duties(
              assembly,
              features,
              fieldCase,
              level,
              uncertainty,
              edgeClaims,
              level.evaluator(fieldCase, farTolerance, workers),
              warnings,
              progress);
    }
    return new FieldResult(
        FieldResult.Method.SOLVE,
        level.mesh(),
        level.nodes(),
        duties,
        level.units().capacitance_F(),
        claim,
        converged,
        List.copyOf(warnings));
  }

  private static double worst(double[][] uncertainty) {
    return Arrays.stream(uncertainty).flatMapToDouble(Arrays::stream).max().orElse(0);
  }

  private static String report(int number, Level level, double uncertainty) {
    return String.format(
        Locale.ROOT,
        "level %d done: %,d unknowns, %d iterations, uncertainty %.2f %%",
        number,
        level.surface().unknowns(),
        level.units().iterations(),
        100 * uncertainty);
  }

  /**
   * Errors that remain, per duty and electrode, from the change of the peaks since the level before
   * and the ratio r of element widths there: with errors that go as the square of the width, r^2/(1
   * - r^2) of the change is left; likewise the distance from where the raw peaks head for. Infinite
   * where an electrode's elements stayed as they were; 0 where there is nothing to compare.
   */
  private static double[][] changes(Level before, Level now, FieldCase fieldCase) {
    double[][] out = new double[fieldCase.duties().size()][fieldCase.electrodes().size()];
    if (before == null) {
      return out;
    }
    double[] widthNow = Refinement.widths(now.mesh());
    double[] widthBefore = Refinement.widths(before.mesh());
    for (int d = 0; d < out.length; d++) {
      for (int e = 0; e < out[d].length; e++) {
        int p = now.peak(d, e);
        int q = before.peak(d, e);
        if (p >= 0 && q >= 0) {
          double value = now.recovered().get(d)[p];
          double change = value > 0 ? Math.abs(before.recovered().get(d)[q] / value - 1) : 0;
          double ratio =
              widthNow[now.nodes().nodeVertex()[now.surface().unknownNode()[p]]]
                  / widthBefore[before.nodes().nodeVertex()[before.surface().unknownNode()[q]]];
          double left = ratio * ratio / (1 - ratio * ratio);
          // Raw peaks come down with the square of the width: where they head for.
          double raw = now.raw().get(d)[p];
          double limit = raw + left * (raw - before.raw().get(d)[q]);
          double off = value > 0 ? Math.abs(limit / value - 1) : 0;
          out[d][e] =
              ratio > UNCHANGED
                  ? Double.POSITIVE_INFINITY
                  : Math.max(off, change * Math.max(1, left));
        }
      }
    }
    return out;
  }

  private static double[][] uncertainties(
      Level now, double[][] change, double[][] earlier, double[][] claimed) {
    double[][] out = new double[change.length][];
    for (int d = 0; d < out.length; d++) {
      double[] raw = now.raw().get(d);
      double[] smooth = now.recovered().get(d);
      out[d] = new double[change[d].length];
      double highest = Arrays.stream(smooth).max().orElse(0);
      for (int e = 0; e < out[d].length; e++) {
        int p = now.peak(d, e);
        out[d][e] = FLOOR;
        // A thousandth of the highest field is no peak anyone asks for, nor is what lies far below
        // the electrode's own sharp edges.
        if (p >= 0 && smooth[p] > Math.max(1e-3 * highest, BESIDE_EDGES * edgePeak(now, d, e))) {
          double noise = Math.max(FLOOR, Math.abs(raw[p] / smooth[p] - 1));
          boolean same = Double.isInfinite(change[d][e]);
          if (same) {
            // The elements at the peak are those of the level before, and so is the claim.
            change[d][e] = earlier[d][e];
          }
          double before = earlier == null ? 0 : 0.25 * earlier[d][e];
          double left = same ? claimed[d][e] : Math.max(change[d][e], before);
          out[d][e] = same ? Math.max(noise, left) : SAFETY * Math.max(noise, left);
        }
      }
    }
    return out;
  }

  /**
   * Highest field on an electrode's sharp edges at their radius as made, 0 where there are none.
   */
  private static double edgePeak(Level level, int duty, int electrode) {
    int v = level.edgePeak(duty, electrode);
    return v < 0 ? 0 : level.asMade().get(duty).field_V_per_m()[v];
  }

  private static List<DutyResult> duties(
      Assembly assembly,
      Features features,
      FieldCase fieldCase,
      Level level,
      double[][] uncertainty,
      double[][] edgeClaims,
      FieldEvaluator evaluator,
      List<String> warnings,
      Progress progress) {
    PermittedField permitted = PermittedFields.of(fieldCase.permitted(), fieldCase.surroundings());
    EstimateModel model =
        EstimateModel.build(assembly, level.mesh(), level.nodes(), features, fieldCase, progress);
    HotSpots hotSpots =
        new HotSpots(
            assembly,
            level.mesh(),
            level.nodes(),
            features,
            model,
            permitted,
            fieldCase.permitted().amber());
    Inceptions inceptions =
        Inceptions.wanted(fieldCase) ? new Inceptions(level, evaluator, fieldCase, model) : null;
    List<DutyResult> duties = new ArrayList<>();
    for (int d = 0; d < fieldCase.duties().size(); d++) {
      DutyField field = onNodes(level, d, uncertainty[d], edgeClaims[d], model.field(d, permitted));
      DutyResult result = hotSpots.of(d, field);
      duties.add(inceptions == null ? result : hotSpots.of(d, field, inceptions.of(d, result)));
    }
    if (inceptions != null) {
      warnings.addAll(inceptions.remarks());
    }
    return List.copyOf(duties);
  }

  private static DutyField onNodes(
      Level level, int duty, double[] uncertainty, double[] edgeClaims, DutyField estimate) {
    int n = level.nodes().count();
    double[] field = new double[n];
    byte[] law = new byte[n];
    double[] relative = new double[n];
    for (int i = 0; i < n; i++) {
      int u = level.surface().nodeUnknown()[i];
      law[i] = code(Law.SOLVED);
      if (u < 0) {
        continue;
      }
      int electrode = level.surface().electrode()[u];
      double asMade = asMade(level, duty, u);
      if (estimate.law()[i] == code(Law.EDGE_AS_MADE)
          || estimate.law()[i] == code(Law.CORNER_AS_MADE)) {
        law[i] = estimate.law()[i];
        field[i] = Double.isNaN(asMade) ? estimate.field_V_per_m()[i] : asMade;
        relative[i] =
            Double.isNaN(asMade)
                ? estimate.uncertainty()[i]
                : Math.max(
                    edgeClaims[electrode],
                    level.asMade().get(duty).uncertainty()[level.nodes().nodeVertex()[i]]);
      } else {
        field[i] = level.recovered().get(duty)[u];
        relative[i] = uncertainty[electrode];
        int edge = level.zoneEdge()[u];
        if (edge >= 0) {
          // The face beside an edge never has a higher field than the edge at its radius as made.
          double most = asMade(level, duty, edge);
          field[i] = Double.isNaN(most) ? field[i] : Math.min(field[i], most);
          relative[i] = IN_EDGE_ZONE;
        }
      }
    }
    return new DutyField(
        estimate.duty(),
        field,
        estimate.permitted_V_per_m(),
        estimate.gap_m(),
        estimate.radius_m(),
        law,
        relative);
  }

  /** Peak field at the radius as made at an unknown on a sharp edge, NaN where there is none. */
  private static double asMade(Level level, int duty, int unknown) {
    int v = level.nodes().nodeVertex()[level.surface().unknownNode()[unknown]];
    return level.asMade().isEmpty() ? Double.NaN : level.asMade().get(duty).field_V_per_m()[v];
  }

  /** The form in which {@link DutyField#law} keeps a law. */
  @SuppressWarnings("EnumOrdinal")
  private static byte code(Law law) {
    return (byte) law.ordinal();
  }
}
