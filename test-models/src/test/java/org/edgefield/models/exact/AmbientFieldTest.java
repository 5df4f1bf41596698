package org.edgefield.models.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import org.edgefield.models.exact.ambient.SphereInField;
import org.edgefield.models.exact.ambient.SpheroidInField;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Conductors in a uniform field. */
class AmbientFieldTest {
  @ParameterizedTest
  @CsvSource({
    // h/b, 1/L (Landau-Lifshitz sec. 4; formula memory, digits recomputed with 30 digits)
    "0.1, 1.16170426572887",
    "0.2, 1.33247359929513",
    "0.5, 1.89681233693443",
    "1, 3.0",
    "1.5, 4.29218705745214",
    "2, 5.7615635397215",
    "3, 9.19883102650046",
    "5, 17.9144146642185",
    "7, 28.8945837549168",
    "10, 49.2953712204893",
    "15, 93.036182097613",
    "20, 148.168897180316",
    "30, 290.342506070792",
    "50, 693.013288228691",
    "100, 2326.12928057739",
  })
  void tipOfBoss(double ratio, double expected) {
    assertThat(new SpheroidInField(ratio, 1).concentration())
        .isCloseTo(expected, withinPercentage(1e-10));
  }

  @ParameterizedTest
  @CsvSource({"0.97", "0.9", "1.03", "1.1", "1.0149", "1.0154", "0.9851", "0.9846"})
  void seriesAndClosedFormsJoin(double ratio) {
    // The three axes' factors of an ellipsoid sum to 1; near a sphere 1/L = 3 + (12/5)(h/b - 1).
    SpheroidInField body = new SpheroidInField(ratio, 1);
    double slope = (body.concentration() - 3) / (ratio - 1);
    assertThat(slope).isCloseTo(2.4, within(0.15));
    double left = new SpheroidInField(ratio * (1 - 1e-7), 1).concentration();
    double right = new SpheroidInField(ratio * (1 + 1e-7), 1).concentration();
    assertThat((left + right) / 2 / body.concentration()).isCloseTo(1, within(1e-11));
  }

  @Test
  void surfaceAndAxis() {
    SpheroidInField boss = new SpheroidInField(5, 1);
    assertThat(boss.surfaceField_V_per_m(5, 2)).isCloseTo(2 * boss.concentration(), within(1e-9));
    assertThat(boss.surfaceField_V_per_m(0, 2)).isZero();
    assertThat(boss.axialField_V_per_m(5, 1) / boss.concentration()).isCloseTo(1, within(1e-9));
    assertThat(boss.axialField_V_per_m(1e3, 1)).isCloseTo(1, within(1e-6));
    assertThat(boss.ambientAt_V_per_m(boss.concentration())).isCloseTo(1, within(1e-12));
    assertThat(boss.tipRadius_m()).isEqualTo(0.2);
    assertThatThrownBy(() -> new SpheroidInField(1, 2).axialField_V_per_m(3, 1))
        .isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void sphere() {
    // 3 E0 at the pole, E0 (1 + 2 (R/z)^3) on the axis (textbook).
    SphereInField sphere = new SphereInField(2);
    assertThat(sphere.surfaceField_V_per_m(0, 10)).isEqualTo(30);
    assertThat(sphere.surfaceField_V_per_m(Math.PI / 3, 10)).isCloseTo(15, within(1e-12));
    assertThat(sphere.axialField_V_per_m(2, 10)).isEqualTo(30);
    assertThat(sphere.axialField_V_per_m(4, 10)).isEqualTo(12.5);
    double round = new SpheroidInField(2, 2).surfaceField_V_per_m(1, 10);
    assertThat(round).isCloseTo(sphere.surfaceField_V_per_m(Math.PI / 3, 10), within(1e-12));
  }
}
