package org.edgefield.field.bem.solve;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.feature.FeatureRecogniser;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.EdgesAsMade;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;
import org.edgefield.field.result.FieldResult;
import org.edgefield.importer.Progress;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.importer.mesh.MeshSettings;
import org.edgefield.importer.step.ReadLimits;
import org.edgefield.importer.step.StepReader;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** From STEP file to solved peak field against closed forms. */
class SolveModelsTest {

  @ParameterizedTest
  @CsvSource({
    "sphere-r50.step, , 0.01, 20.0, E = V/R (exact)",
    "prolate-5.step, , 0.01, 106.8503, 'tip Q/(4 pi eps b^2), C = 4 pi eps c/acosh(a/b), a = 100 mm b = 20 mm (recomputed)'",
    "sphere-over-plane-0.1.step, 0, 0.01, 213.51497, 'image series, 10.6757486676 / R (recomputed)'",
  })
  void peakField(String file, Double plane, double accuracy, double exact_per_m, String source) {
    Path path = models().resolve(file);
    try (KernelAssembly assembly = StepReader.read(path, ReadLimits.defaults(), Progress.NONE)) {
      FieldCase fieldCase = oneElectrode(plane);
      long begin = System.nanoTime();
      Features features = FeatureRecogniser.of(assembly.geometry(), assembly.triangulation());
      FieldResult result =
          FieldSolver.solve(
              assembly,
              assembly.triangulation(),
              features,
              fieldCase,
              MeshSettings.defaults(),
              new SolveSettings(accuracy, 60, 4L << 30, 2),
              (p, f, d) -> {
                if (d.contains("done")) {
                  System.out.println("   " + d);
                }
              });
      double peak = result.duties().get(0).peak().field_V_per_m() / 1000;
      double error = peak / exact_per_m - 1;
      System.out.printf(
          Locale.ROOT,
          "%s: %d nodes, %.1f s, exact %.6g, computed %.6g, error %.3f %%, claimed %.3f %%%n",
          file,
          result.nodes().count(),
          (System.nanoTime() - begin) * 1e-9,
          exact_per_m,
          peak,
          100 * error,
          100 * result.errorEstimate());
      assertThat(Math.abs(error)).as(source).isLessThan(accuracy);
      assertThat(Math.abs(error)).isLessThan(result.errorEstimate());
    }
  }

  private static FieldCase oneElectrode(Double plane) {
    return new FieldCase(
        List.of(new Electrode("live", new int[] {0}, Electrode.Kind.LIVE)),
        List.of(),
        new Surroundings(
            "air",
            101_325,
            293.15,
            Double.NaN,
            Double.NaN,
            plane == null ? null : new Surroundings.EarthPlane(2, plane),
            null),
        new EdgesAsMade(3e-4, Map.of()),
        List.of(new Duty("test", new double[] {1000}, new double[] {0})),
        new Permitted(Permitted.Criterion.FIXED, 3e6, 1, 0.8, 1));
  }

  private static Path models() {
    Path folder = Path.of("").toAbsolutePath();
    while (!Files.isDirectory(folder.resolve("test-models/step"))) {
      folder = folder.getParent();
    }
    return folder.resolve("test-models/step");
  }
}
