package org.edgefield.field.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ParallelSurfacesLawTest {
  private static final double FAR = Double.POSITIVE_INFINITY;

  @ParameterizedTest
  @CsvSource({"1000, 0.001", "1, 1e-9", "5e6, 100"})
  void parallelPlatesGiveVoltageOverGap(double u, double d) {
    // E = U/d, exact.
    assertThat(ParallelSurfacesLaw.field_V_per_m(u, 0, 0, d) * d / u).isCloseTo(1, within(1e-15));
  }

  @ParameterizedTest
  @CsvSource({"0.001, 0.1", "0.01, 0.011", "0.05, 0.050000001", "1, 1e6"})
  void coaxialCylinders(double r, double outer) {
    // E = U / (r ln(R/r)) inside and U / (R ln(R/r)) outside, exact (textbook).
    double d = outer - r;
    double inner = ParallelSurfacesLaw.field_V_per_m(1, 1 / r, 0, d);
    assertThat(inner * r * Math.log1p(d / r)).isCloseTo(1, within(1e-9));
    if (outer / r < 1 / (1 - ParallelSurfacesLaw.LEAST_CLOSURE)) {
      double shell = ParallelSurfacesLaw.field_V_per_m(1, 0, -1 / outer, d);
      assertThat(shell * outer * Math.log1p(d / r)).isCloseTo(1, within(1e-9));
    }
  }

  @ParameterizedTest
  @CsvSource({"0.001, 0.1", "0.01, 0.011", "0.05, 0.050000001", "1, 1e6"})
  void concentricSpheres(double r, double outer) {
    // E = U R / (r (R - r)) inside and U r / (R (R - r)) outside, exact (textbook).
    double d = outer - r;
    double inner = ParallelSurfacesLaw.field_V_per_m(1, 1 / r, 1 / r, d);
    assertThat(inner * r * d / (r + d)).isCloseTo(1, within(1e-9));
    if (outer / r < 1 / (1 - ParallelSurfacesLaw.LEAST_CLOSURE)) {
      double shell = ParallelSurfacesLaw.field_V_per_m(1, -1 / outer, -1 / outer, d);
      assertThat(shell * outer * d / r).isCloseTo(1, within(1e-9));
    }
  }

  @ParameterizedTest
  @CsvSource({"0.1, 0.3e6, 3e6", "0.25, 0.75e6, 3e6", "1, 3e6, 3e6"})
  void mostVoltageOfAnIsolatedSphereTerminal(double radius, double voltage, double field) {
    // V = E R at 3 MV/m, exact; charge Q = 4 pi eps0 E R^2.
    assertThat(ParallelSurfacesLaw.field_V_per_m(voltage, 1 / radius, 1 / radius, FAR))
        .isCloseTo(field, within(1e-9 * field));
  }

  @Property(seed = "20260101")
  void neverNanNeverInfiniteAndOfTheVoltagesSign(
      @ForAll @DoubleRange(min = -1e7, max = 1e7) double u,
      @ForAll @DoubleRange(min = -1e9, max = 1e9) double k1,
      @ForAll @DoubleRange(min = -1e9, max = 1e9) double k2,
      @ForAll @DoubleRange(min = -9, max = 9) double exponent) {
    for (double d : new double[] {Math.pow(10, exponent), FAR}) {
      double e = ParallelSurfacesLaw.field_V_per_m(u, k1, k2, d);
      assertThat(e).isFinite();
      assertThat(e * u).isGreaterThanOrEqualTo(0);
    }
  }

  @Property(seed = "20260101")
  void proportionalToTheVoltage(
      @ForAll @DoubleRange(min = 1, max = 1e7) double u,
      @ForAll @DoubleRange(min = -1e4, max = 1e4) double k1,
      @ForAll @DoubleRange(min = -1e4, max = 1e4) double k2,
      @ForAll @DoubleRange(min = -6, max = 3) double exponent) {
    double d = Math.pow(10, exponent);
    double one = ParallelSurfacesLaw.field_V_per_m(u, k1, k2, d);
    double more = ParallelSurfacesLaw.field_V_per_m(1.5 * u, k1, k2, d);
    assertThat(more / one).isCloseTo(1.5, within(1e-12));
  }

  @Property(seed = "20260101")
  void fallsWithTheGap(
      @ForAll @DoubleRange(min = -1e5, max = 1e5) double k1,
      @ForAll @DoubleRange(min = -1e5, max = 1e5) double k2,
      @ForAll @DoubleRange(min = -6, max = 3) double exponent,
      @ForAll @DoubleRange(min = 1.01, max = 100) double factor) {
    double d = Math.pow(10, exponent);
    assertThat(ParallelSurfacesLaw.resistance_m(k1, k2, d * factor))
        .isGreaterThan(ParallelSurfacesLaw.resistance_m(k1, k2, d) * (1 - 1e-12));
  }

  @Property(seed = "20260101")
  void continuousWhereTheCurvaturesMeetOrVanish(
      @ForAll @DoubleRange(min = -0.9, max = 1e4) double u,
      @ForAll @DoubleRange(min = -12, max = -9) double smallness) {
    // k1 = k2 and k -> 0 against their neighbours, gap 1.
    double step = Math.pow(10, smallness);
    double at = ParallelSurfacesLaw.resistance_m(u, u, 1);
    double beside = ParallelSurfacesLaw.resistance_m(u + step, u, 1);
    assertThat(beside / at).isCloseTo(1, within(20 * step));
    assertThat(ParallelSurfacesLaw.resistance_m(step, 0, 1)).isCloseTo(1, within(step));
    assertThat(ParallelSurfacesLaw.resistance_m(u, step, 1))
        .isCloseTo(ParallelSurfacesLaw.resistance_m(u, 0, 1), within(20 * step));
  }
}
