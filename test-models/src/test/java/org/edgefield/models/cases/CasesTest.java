package org.edgefield.models.cases;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.edgefield.models.exact.spheres.TwoSpheres;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The lists of cases are sound: models exist, name their parts, and every value is finite. */
class CasesTest {
  static List<ValidationCase> all() {
    return Stream.of(FieldCases.all(), CapacitanceCases.all(), ScreenCases.all())
        .flatMap(List::stream)
        .toList();
  }

  @ParameterizedTest
  @MethodSource("all")
  void modelHoldsTheParts(ValidationCase c) throws IOException {
    String text = Files.readString(Path.of("step", c.model()));
    for (Terminal t : c.electrodes()) {
      assertThat(t.parts()).allSatisfy(p -> assertThat(text).contains("'" + p + "'"));
    }
    assertThat(c.exact()).isFinite().isNotZero();
    assertThat(c.tolerance()).isPositive();
    assertThat(c.source()).isNotEmpty();
  }

  @Test
  void namesAreUniqueWithinEachList() {
    for (List<ValidationCase> list :
        List.of(FieldCases.all(), CapacitanceCases.all(), ScreenCases.all())) {
      assertThat(list.stream().map(ValidationCase::name)).doesNotHaveDuplicates();
    }
  }

  /** The cases on peaks at facing or far poles hold only while no other pole carries more. */
  @Test
  void comparedPolesCarryTheLargestField() {
    TwoSpheres near = new TwoSpheres(10, 40, 10);
    assertThat(near.farPoleA_V_per_m(1, 1)).isGreaterThan(near.facingPoleA_V_per_m(1, 1));
    assertThat(near.farPoleB_V_per_m(1, 1)).isGreaterThan(near.facingPoleB_V_per_m(1, 1));
    TwoSpheres close = new TwoSpheres(50, 50, 5);
    assertThat(close.facingPoleA_V_per_m(1, -1)).isGreaterThan(close.farPoleA_V_per_m(1, -1));
    assertThat(close.facingPoleB_V_per_m(1, 0)).isGreaterThan(close.farPoleB_V_per_m(1, 0));
  }
}
