package org.edgefield.curvature.feature;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.edgefield.curvature.Models;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.kernel.KernelAssembly;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * How many faces of each name the first part of a model has. Expected from the measures that the
 * models were built with.
 */
class NamesOfModelsTest {
  static Stream<Arguments> models() {
    return Stream.of(
        Arguments.of("sphere-r50-nurbs.step", Map.of("sphere R50", 1)),
        Arguments.of("sphere-r2in.step", Map.of("sphere R50.8", 1)),
        Arguments.of("torus-3.step", Map.of("torus, section R10", 1)),
        Arguments.of("torus-3-nurbs.step", Map.of("round section R10", 1)),
        Arguments.of("cylinder-nurbs.step", Map.of("cylinder R20", 1, "flat face", 2)),
        Arguments.of("cone.step", Map.of("cone, half-angle 27 deg", 1, "flat face", 1)),
        Arguments.of("cone-nurbs.step", Map.of("cone, half-angle 27 deg", 1, "flat face", 2)),
        Arguments.of("cube-100.step", Map.of("flat face", 6)),
        Arguments.of(
            "cube-100-rounded-0.02.step",
            Map.of("flat face", 6, "rounded edge R2", 12, "rounded corner R2", 8)),
        Arguments.of("disc-rounded.step", Map.of("flat face", 2, "rounded edge R5", 1)),
        Arguments.of(
            "disc-rim-r0.4.step",
            Map.of("flat face", 2, "rounded edge R0.4", 2, "cylinder R100", 1)),
        Arguments.of("bore.step", Map.of("flat face", 6, "bore R12", 1)),
        Arguments.of("wedge-60-r0.6.step", Map.of("flat face", 5, "rounded edge R0.6", 1)),
        Arguments.of(
            "l-bracket.step",
            Map.of(
                "flat face", 8,
                "rounded edge R5", 2,
                "rounded edge R1", 2,
                "rounded edge R3", 1,
                "inside fillet R8", 1)));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("models")
  void facesAreNamedAsBuilt(String file, Map<String, Integer> names) {
    try (KernelAssembly assembly = Models.open(file)) {
      FeatureRecogniser features =
          FeatureRecogniser.of(assembly.geometry(), assembly.triangulation());
      Part part = assembly.parts().get(0);
      Map<String, Integer> found = new TreeMap<>();
      for (int f = part.firstFace(); f < part.firstFace() + part.faceCount(); f++) {
        found.merge(features.faceName(f), 1, Integer::sum);
      }
      assertThat(found).isEqualTo(new TreeMap<>(names));
    }
  }
}
