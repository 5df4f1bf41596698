package org.edgefield.curvature.feature;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class MillimetresTest {
  @ParameterizedTest
  @CsvSource({
    "NaN, Runknown",
    "Infinity, Rinfinite",
    "0, R0",
    "1e-9, R0.000001",
    "0.002, R2",
    "0.0019999999996, R2",
    "0.0003, R0.3",
    "0.01905, R19.05",
    "0.0015875, R1.588",
    "0.1016, R101.6",
    "0.254, R254",
    "1.2346, R1235",
    "12.3456, R12346",
    "0.1, R100",
  })
  void radiiReadAsOnADrawing(double metres, String text) {
    assertThat(Millimetres.radius(metres)).isEqualTo(text);
  }
}
