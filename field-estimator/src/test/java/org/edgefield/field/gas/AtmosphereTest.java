package org.edgefield.field.gas;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class AtmosphereTest {
  @ParameterizedTest
  @CsvSource({
    "0, 101.325, 288.15",
    "1000, 89.875, 281.65",
    "2000, 79.495, 275.15",
    "5000, 54.02, 255.65",
    "10000, 26.436, 223.15"
  })
  void standardAtmosphere(double altitude, double kPa, double kelvin) {
    // ISO 2533:1975 (memory), kPa to three decimals.
    assertThat(StandardAtmosphere.pressure_Pa(altitude) / 1000).isCloseTo(kPa, within(6e-4));
    assertThat(StandardAtmosphere.temperature_K(altitude)).isCloseTo(kelvin, within(1e-9));
  }

  @Test
  void refusesSpace() {
    assertThatThrownBy(() -> StandardAtmosphere.pressure_Pa(12_000))
        .isInstanceOf(GasException.class);
  }

  @ParameterizedTest
  @CsvSource({"0.1, 12.648", "1, 6.1193", "10, 4.0548"})
  void peeksCoaxialField(double r_mm, double kV_per_mm) {
    // Peek's coaxial constants at delta = 1 (recomputed).
    assertThat(PeekLaw.cylinder_V_per_m(r_mm / 1000, 1, 1) * 1e-6)
        .isCloseTo(kV_per_mm, within(6e-4));
  }

  @Test
  void peekBetweenCylinderAndSphereAndNeverAboveTheSphere() {
    double cylinder = PeekLaw.cylinder_V_per_m(1e-3, 1, 1);
    double sphere = PeekLaw.sphere_V_per_m(1e-3, 1, 1);
    assertThat(PeekLaw.surface_V_per_m(1000, 0, 1, 1)).isEqualTo(cylinder);
    assertThat(PeekLaw.surface_V_per_m(1000, 1000, 1, 1)).isCloseTo(sphere, within(1.0));
    assertThat(PeekLaw.surface_V_per_m(1000, 500, 1, 1))
        .isCloseTo((cylinder + sphere) / 2, within(1.0));
    for (double r = 1e-4; r < 10; r *= 1.5) {
      assertThat(PeekLaw.surface_V_per_m(1 / r, 0, 1, 1))
          .isLessThanOrEqualTo(PeekLaw.sphere_V_per_m(1 / (1 / r), 1, 1));
    }
    assertThat(PeekLaw.surface_V_per_m(-5, -9, 1, 1)).isPositive().isFinite();
  }

  @Test
  void atPeeksReferenceTheDensityIsOne() {
    assertThat(AirDensity.peek(76 * 1333.22, 298.15)).isCloseTo(1, within(5e-4));
    assertThat(AirDensity.relative(101_300, 293.15)).isEqualTo(1);
  }

  @Test
  void correctionOfIec60060() {
    // g = 1: m = w = 1, Kt = delta k; g < 0.2: 1.
    assertThat(Iec60060Correction.factor(450, 1, 0.9, 1)).isCloseTo(0.9, within(1e-12));
    assertThat(Iec60060Correction.factor(1, 1, 0.9, 1.05)).isEqualTo(1);
    assertThat(Iec60060Correction.humidityExponent(1.5)).isCloseTo(0.4375, within(1e-12));
    assertThat(Iec60060Correction.humidity(Iec60060Correction.Voltage.AC, 11, 1)).isEqualTo(1);
    assertThatThrownBy(() -> Iec60060Correction.humidity(Iec60060Correction.Voltage.DC, 30, 1))
        .isInstanceOf(GasException.class);
    assertThat(SphereGapHumidity.factor(8.5, 1)).isEqualTo(1);
  }
}
