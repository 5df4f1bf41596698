package org.edgefield.field.edge;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class RoundedWedgeTest {
  @ParameterizedTest
  @CsvSource({
    "30, .45455, 1.86791",
    "45, .42857, 1.84612",
    "60, .40000, 1.81954",
    "90, .33333, 1.74609",
    "120, .25000, 1.62923",
    "135, .20000, 1.54389",
    "150, .14286, 1.43000"
  })
  void coefficient(double interior, double s, double c) {
    // Conformal map of two half-planes joined by a tangent arc; digits recomputed.
    RoundedWedge wedge = RoundedWedge.ofInteriorAngle(Math.toRadians(interior));
    assertThat(wedge.exponent()).isCloseTo(s, within(6e-6));
    assertThat(wedge.coefficient()).isCloseTo(c, within(6e-6));
  }

  @ParameterizedTest
  @CsvSource({".1, .912", ".5, .704", "1, .580", "2, .463", "5, .339", "10, .268"})
  void decayOfTheRightAngle(double x, double share) {
    // The same map, recomputed.
    RoundedWedge wedge = RoundedWedge.ofInteriorAngle(Math.PI / 2);
    assertThat(wedge.decay(x)).isCloseTo(share, within(6e-4));
  }

  @ParameterizedTest
  @CsvSource({"0", "10", "90", "170", "179.9"})
  void farAwayTheWedgeIsSharp(double interior) {
    // E_peak decay(x) -> s-fold law K rho^(-s), rho = x r, for x -> infinity.
    RoundedWedge wedge = RoundedWedge.ofInteriorAngle(Math.toRadians(interior));
    double x = 1e9;
    assertThat(wedge.coefficient() * wedge.decay(x) * Math.pow(x, wedge.exponent()))
        .isCloseTo(1, within(1e-6));
    assertThat(wedge.decay(0)).isEqualTo(1);
  }
}
