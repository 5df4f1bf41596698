package org.edgefield.field.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.feature.FeatureRecogniser;
import org.edgefield.field.hotspot.HotSpots;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.EdgesAsMade;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Surroundings;
import org.edgefield.field.result.HotSpot;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.models.cases.ScreenCases;
import org.edgefield.models.cases.ScreenCases.Irregular;
import org.edgefield.models.cases.ValidationCase;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Situations every designer meets, from the STEP file to the estimate. */
class ScreenCasesTest {
  /** What triangles between curved electrodes cost; connected spheres: the images. */
  private static final double MESH = 2e-3;

  private static final double IMAGES = 0.02;

  static Stream<ValidationCase> cases() {
    return ScreenCases.all().stream();
  }

  @ParameterizedTest
  @MethodSource("cases")
  void estimateIsExactOrOnTheSafeSide(ValidationCase c) {
    double ratio = CaseEstimate.of(c) / c.exact();
    double high = c.model().startsWith("spheres-connected") ? IMAGES : MESH;
    assertThat(ratio - 1).as(c.name()).isBetween(-MESH, high);
  }

  @Test
  void fieldsOfConnectedSpheresAreInTheInverseRatioOfTheirRadii() {
    double[] field =
        ScreenCases.all().stream()
            .filter(c -> c.model().startsWith("spheres-connected"))
            .mapToDouble(CaseEstimate::of)
            .sorted()
            .toArray();
    assertThat(field).hasSize(2);
    assertThat(field[1] / field[0]).isCloseTo(ScreenCases.CONNECTED_RATIO, within(0.04));
  }

  static List<Irregular> irregular() {
    return ScreenCases.IRREGULAR;
  }

  @ParameterizedTest
  @MethodSource("irregular")
  void theSmallestRadiusLeadsOnAnIrregularBody(Irregular body) {
    try (KernelAssembly assembly = ScreenedModel.read(body.model())) {
      FieldCase alone =
          new FieldCase(
              List.of(new Electrode("body", new int[] {0}, Electrode.Kind.LIVE)),
              List.of(),
              new Surroundings("air", 101_325, 293.15, Double.NaN, Double.NaN, null, null),
              new EdgesAsMade(3e-4, Map.of()),
              List.of(new Duty("duty", new double[] {1000}, new double[1])),
              ScreenedModel.FIXED);
      ScreenedModel s = ScreenedModel.of(assembly, alone);
      Features features = FeatureRecogniser.of(assembly.geometry(), s.mesh());
      // A low limit, so that every feature has its region.
      HotSpots spots =
          new HotSpots(assembly, s.mesh(), s.nodes(), features, s.estimate(), (a, b) -> 1e3, 1);
      Map<String, Double> highest = new TreeMap<>();
      List<HotSpot> all = spots.of(0, s.estimate().field(0, (k1, k2) -> 1e3)).hotSpots();
      for (HotSpot h : all) {
        highest.merge(h.feature(), h.field_V_per_m(), Math::max);
      }
      double[] falling =
          body.byField().stream().mapToDouble(f -> -highest.getOrDefault(f, Double.NaN)).toArray();
      assertThat(falling).as(highest.toString()).doesNotContain(Double.NaN).isSorted();
      assertThat(-falling[0])
          .isEqualTo(Arrays.stream(highest.values().toArray(Double[]::new)).reduce(0.0, Math::max));
    }
  }
}
