package org.edgefield.field.bem.validation;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.function.Predicate;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.feature.FeatureRecogniser;
import org.edgefield.field.bem.solve.FieldSolver;
import org.edgefield.field.bem.solve.SolveSettings;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.EdgesAsMade;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;
import org.edgefield.field.result.FieldResult;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.importer.mesh.MeshSettings;
import org.edgefield.importer.step.ReadLimits;
import org.edgefield.importer.step.StepReader;

/**
 * A committed STEP model, one part of it at a voltage (1 V where none is given) and all others
 * earthed, solved.
 *
 * @param result outcome
 * @param time_s wall time from reading the file on
 */
record SolvedModel(FieldResult result, double time_s) {
  static final Permitted FIXED = new Permitted(Permitted.Criterion.FIXED, 3e6, 1, 0.8, 1);

  static SolvedModel of(
      String model, String live, double edgeRadius_m, MeshSettings mesh, SolveSettings settings) {
    return of(model, live, edgeRadius_m, mesh, settings, FIXED, 1);
  }

  static SolvedModel of(
      String model,
      String live,
      double edgeRadius_m,
      MeshSettings mesh,
      SolveSettings settings,
      Permitted permitted,
      double volts_V) {
    long begin = System.nanoTime();
    Path path = ValidationRun.models().resolve(model);
    try (KernelAssembly assembly = StepReader.read(path, ReadLimits.defaults(), Progress.NONE)) {
      Features features = FeatureRecogniser.of(assembly.geometry(), assembly.triangulation());
      int[] on = parts(assembly.parts(), p -> ValidationRun.matches(live, p.name()));
      int[] off = parts(assembly.parts(), p -> !ValidationRun.matches(live, p.name()));
      Electrode one = new Electrode("live", on, Electrode.Kind.LIVE);
      Electrode other = new Electrode("earth", off, Electrode.Kind.EARTH);
      List<Electrode> electrodes = off.length == 0 ? List.of(one) : List.of(one, other);
      double[] volts = new double[electrodes.size()];
      volts[0] = volts_V;
      FieldCase fieldCase =
          new FieldCase(
              electrodes,
              List.of(),
              new Surroundings("air", 101_300, 293.15, Double.NaN, Double.NaN, null, null),
              new EdgesAsMade(edgeRadius_m, Map.of()),
              List.of(new Duty("duty", volts, new double[volts.length])),
              permitted);
      FieldResult result =
          FieldSolver.solve(
              assembly,
              assembly.triangulation(),
              features,
              fieldCase,
              mesh,
              settings,
              Progress.NONE);
      return new SolvedModel(result, (System.nanoTime() - begin) * 1e-9);
    }
  }

  private static int[] parts(List<Part> parts, Predicate<Part> which) {
    return parts.stream().filter(which).mapToInt(Part::index).toArray();
  }

  /** Highest field in a box {x0, y0, z0, x1, y1, z1}, metres. */
  double peakIn(double[] box) {
    double most = 0;
    double[] field = result.duties().get(0).field().field_V_per_m();
    for (int n = 0; n < field.length; n++) {
      int v = 3 * result.nodes().nodeVertex()[n];
      boolean inside = true;
      for (int k = 0; k < 3; k++) {
        double x = result.mesh().xyz()[v + k];
        inside &= x >= box[k] && x <= box[k + 3];
      }
      if (inside) {
        most = Math.max(most, field[n]);
      }
    }
    return most;
  }
}
