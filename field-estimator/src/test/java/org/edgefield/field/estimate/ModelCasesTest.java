package org.edgefield.field.estimate;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.edgefield.models.cases.FieldCases;
import org.edgefield.models.cases.ValidationCase;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The estimate from STEP to field, over the exact field, for every model with a known answer. */
@Tag("slow")
class ModelCasesTest {
  private static final List<String> REPORT = new ArrayList<>();

  static Stream<ValidationCase> cases() {
    return FieldCases.all().stream();
  }

  @AfterAll
  static void table() {
    System.out.println(String.join(System.lineSeparator(), REPORT));
  }

  @ParameterizedTest
  @MethodSource("cases")
  void withinTheRangeOfAScreen(ValidationCase c) {
    double ratio = CaseEstimate.of(c) / c.exact();
    REPORT.add(String.format(Locale.ROOT, "%-46s estimate/exact %.3f", c.name(), ratio));
    assertThat(ratio).isBetween(0.95, 1.5);
  }
}
