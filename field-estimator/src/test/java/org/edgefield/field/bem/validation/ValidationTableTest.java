package org.edgefield.field.bem.validation;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.assertj.core.api.SoftAssertions;
import org.edgefield.models.cases.CapacitanceCases;
import org.edgefield.models.cases.FieldCases;
import org.edgefield.models.cases.ValidationCase;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/** Prints the table of every exact case and holds each to what was asked and claimed. */
@Tag("slow")
class ValidationTableTest {

  @Test
  void peakFieldsAtOnePercent() {
    fields(0.01);
  }

  @Test
  void peakFieldsAtAThird() {
    fields(0.003);
  }

  private static void fields(double accuracy) {
    List<ValidationCase> cases = FieldCases.all();
    assertThat(cases).isNotEmpty();
    SoftAssertions soft = new SoftAssertions();
    System.out.printf("peak fields, asked %.1f %%%n%s%n", 100 * accuracy, ValidationRun.HEADING);
    for (ValidationCase c : cases) {
      ValidationRun run = ValidationRun.of(c, accuracy);
      System.out.println(run.row(c));
      double error = Math.abs(run.error(c));
      soft.assertThat(error).as("%s: error covered by the claim", c).isLessThan(run.claimed());
      soft.assertThat(run.converged()).as("%s: converged", c).isTrue();
      soft.assertThat(error).as("%s: error within what was asked", c).isLessThan(accuracy);
    }
    soft.assertAll();
  }

  @Test
  void capacitances() {
    SoftAssertions soft = new SoftAssertions();
    System.out.printf("capacitances%n%s%n", ValidationRun.HEADING);
    for (ValidationCase c : CapacitanceCases.all()) {
      ValidationRun run = ValidationRun.of(c, 0.001);
      System.out.println(run.row(c));
      soft.assertThat(Math.abs(run.error(c))).as("%s", c).isLessThan(c.tolerance());
    }
    soft.assertAll();
  }
}
