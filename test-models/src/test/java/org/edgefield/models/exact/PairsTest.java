package org.edgefield.models.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import org.edgefield.models.exact.cylinders.CoaxialCylinders;
import org.edgefield.models.exact.cylinders.EccentricCylinders;
import org.edgefield.models.exact.cylinders.ParallelCylinders;
import org.edgefield.models.exact.plane.CylinderOverPlane;
import org.edgefield.models.exact.plane.HyperboloidNeedle;
import org.edgefield.models.exact.plane.ParallelPlates;
import org.edgefield.models.exact.plane.SphereOverPlane;
import org.edgefield.models.exact.spheres.ConcentricSpheres;
import org.edgefield.models.exact.spheres.TwoSpheres;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Closed forms and series of two electrodes against 30-digit evaluations (recomputed). */
class PairsTest {
  private static final double PERCENT = 1e-9;

  @ParameterizedTest
  @CsvSource({
    // gap/R; E s/U: one earthed, HV pole; earthed pole; symmetric; sphere-plane at gap s. Image
    // series (Kelvin; Smythe ch. 5), mpmath (formula memory, digits recomputed).
    "0.05, 1.01672251692, 1.01672247228, 1.0167224946, 1.03355780337",
    "0.1, 1.03356790381, 1.03354770293, 1.03355780337, 1.06757486676",
    "0.2, 1.06826906554, 1.06688066798, 1.06757486676, 1.13707393975",
    "0.5, 1.19906231816, 1.14616633431, 1.17261432623, 1.35899632802",
    "1.0, 1.51698007701, 1.20101257903, 1.35899632802, 1.77028119466",
    "1.5, 1.90898435587, 1.20932017879, 1.55915226733, 2.21481811172",
    "2.0, 2.3384417656, 1.20212062371, 1.77028119466, 2.67770528732",
    "3.0, 3.25198640679, 1.17764981666, 2.21481811172, 3.63167956163",
    "5.0, 5.1671518229, 1.1355028666, 3.15132734475, 5.58648773803",
    "10.0, 10.0909616919, 1.08201378418, 5.58648773803, 10.5464383089",
    "20.0, 20.0476235197, 1.04525309805, 10.5464383089, 20.5240860533",
  })
  void equalSpheres(double s, double hot, double earthed, double symmetric, double plane) {
    TwoSpheres pair = new TwoSpheres(1, 1, s);
    assertThat(s * pair.facingPoleA_V_per_m(1, 0)).isCloseTo(hot, withinPercentage(PERCENT));
    assertThat(s * pair.facingPoleB_V_per_m(1, 0)).isCloseTo(earthed, withinPercentage(PERCENT));
    assertThat(s * pair.facingPoleA_V_per_m(0.5, -0.5))
        .isCloseTo(symmetric, withinPercentage(PERCENT));
    assertThat(s * new SphereOverPlane(1, s).peakField_V_per_m(1))
        .isCloseTo(plane, withinPercentage(PERCENT));
  }

  @ParameterizedTest
  @CsvSource({
    // d/R, c11 and c12 over 4 pi eps0 R (series, recomputed)
    "2.2, 1.4313082772564, -0.723777839756837",
    "3, 1.14628744194113, -0.389083066895123",
    "4, 1.07182145194097, -0.269238361137458",
  })
  void equalSphereCapacitances(double d, double c11, double c12) {
    TwoSpheres pair = new TwoSpheres(1, 1, d - 2);
    assertThat(pair.c11_F() / Vacuum.FOUR_PI_EPSILON_0).isCloseTo(c11, within(1e-12));
    assertThat(pair.c12_F() / Vacuum.FOUR_PI_EPSILON_0).isCloseTo(c12, within(1e-12));
    assertThat(pair.c22_F()).isCloseTo(pair.c11_F(), within(1e-24));
  }

  @ParameterizedTest
  @CsvSource({"10, 40, 10", "10, 40, 400", "1, 100, 0.01", "50, 50, 0.05"})
  void unequalSpheresAreReciprocal(double a, double b, double gap) {
    TwoSpheres ab = new TwoSpheres(a, b, gap);
    TwoSpheres ba = new TwoSpheres(b, a, gap);
    assertThat(ab.c12_F() / ba.c12_F()).isCloseTo(1, within(1e-10));
    assertThat(ab.c11_F() / ba.c22_F()).isCloseTo(1, within(1e-10));
    assertThat(ab.farPoleA_V_per_m(3, -7)).isCloseTo(ba.farPoleB_V_per_m(-7, 3), within(1e-9));
  }

  @ParameterizedTest
  @CsvSource({"10, 40, 10", "1, 3, 0.2", "50, 50, 5"})
  void potentialDifferenceAlongTheGap(double a, double b, double gap) {
    // Gauss-Legendre would be overkill: midpoint rule on a smooth field.
    TwoSpheres pair = new TwoSpheres(a, b, gap);
    int n = 20_000;
    double sum = 0;
    for (int i = 0; i < n; i++) {
      sum += pair.axialField_V_per_m(a + gap * (i + 0.5) / n, 5, -2) * gap / n;
    }
    assertThat(sum).isCloseTo(7, within(1e-6));
  }

  @Test
  void smallSphereInFrontOfHugeOneIsSphereOverPlane() {
    double huge = new TwoSpheres(1, 1e7, 1).facingPoleA_V_per_m(1, 0);
    assertThat(huge).isCloseTo(new SphereOverPlane(1, 1).peakField_V_per_m(1), within(1e-6));
  }

  @Test
  void connectedSpheresFarApartHaveFieldsAsInverseRadii() {
    // Two connected spheres: E1/E2 = R2/R1 (textbook), here 4, off by about R/d.
    TwoSpheres pair = new TwoSpheres(0.1, 0.025, 5 - 0.125);
    double ratio = pair.farPoleB_V_per_m(1, 1) / pair.farPoleA_V_per_m(1, 1);
    assertThat(ratio).isCloseTo(4, withinPercentage(2));
    assertThat(new TwoSpheres(1, 0.25, 1e6).farPoleB_V_per_m(1, 1)).isCloseTo(4, within(1e-4));
  }

  @Test
  void touchingSpheresAreRefused() {
    assertThatThrownBy(() -> new TwoSpheres(1, 1, 0)).isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void planeUnderSphere() {
    SphereOverPlane far = new SphereOverPlane(1, 1000);
    assertThat(far.farPoleField_V_per_m(1)).isCloseTo(1, within(1e-3));
    assertThat(far.capacitance_F() / Vacuum.FOUR_PI_EPSILON_0).isCloseTo(1, within(1e-3));
    SphereOverPlane near = new SphereOverPlane(1, 0.01);
    assertThat(near.planeField_V_per_m(1) * 0.01).isCloseTo(1, within(0.01));
    assertThat(near.planeField_V_per_m(1)).isLessThan(near.peakField_V_per_m(1));
  }

  @ParameterizedTest
  @CsvSource({
    // d/r, E_tip r/U (exact form from memory, digits recomputed)
    "1, 1.60455632345",
    "2, 1.06851156146",
    "5, 0.709262407052",
    "10, 0.561295239037",
    "20, 0.465075994225",
    "50, 0.380521561601",
    "100, 0.335194406411",
    "1000, 0.241242729522",
  })
  void hyperboloidNeedle(double gap, double expected) {
    assertThat(new HyperboloidNeedle(1, gap).tipField_V_per_m(1))
        .isCloseTo(expected, withinPercentage(PERCENT));
  }

  @Test
  void eccentricCylinders() {
    // R1 = 1, R2 = 3, e = 1 (recomputed).
    EccentricCylinders pair = new EccentricCylinders(1, 3, 1);
    assertThat(pair.capacitancePerLength_F_per_m() / (2 * Math.PI * Vacuum.EPSILON_0))
        .isCloseTo(1.0390434606175138, within(1e-13));
    assertThat(pair.innerNarrow_V_per_m(1)).isCloseTo(1.39402308571043, within(1e-13));
    assertThat(pair.innerWide_V_per_m(1)).isCloseTo(0.774457269839129, within(1e-13));
    assertThat(pair.outerNarrow_V_per_m(1)).isCloseTo(0.774457269839129, within(1e-13));
    // A vanishing offset leaves coaxial cylinders.
    CoaxialCylinders coaxial = new CoaxialCylinders(1, 3);
    EccentricCylinders nearly = new EccentricCylinders(1, 3, 1e-6);
    assertThat(nearly.innerNarrow_V_per_m(1)).isCloseTo(coaxial.field_V_per_m(1, 1), within(1e-5));
    assertThat(nearly.capacitancePerLength_F_per_m())
        .isCloseTo(coaxial.capacitancePerLength_F_per_m(), withinPercentage(1e-8));
  }

  @Test
  void cylinderOverPlane() {
    // Small gap: E -> U/s. Large gap: E -> U/(r ln(2h/r)).
    assertThat(new CylinderOverPlane(1, 1e-6).peakField_V_per_m(1) * 1e-6)
        .isCloseTo(1, within(1e-6));
    assertThat(new CylinderOverPlane(1, 1e6).peakField_V_per_m(1) * Math.log(2e6))
        .isCloseTo(1, within(1e-5));
    // The plane is the symmetry plane of two cylinders, and touches an eccentric pair of huge bore.
    assertThat(new ParallelCylinders(1, 4).peakField_V_per_m(2))
        .isEqualTo(new CylinderOverPlane(1, 2).peakField_V_per_m(1));
    double bore = 1e6;
    assertThat(new EccentricCylinders(1, bore, bore - 3).innerNarrow_V_per_m(1))
        .isCloseTo(new CylinderOverPlane(1, 2).peakField_V_per_m(1), within(1e-5));
  }

  @Test
  void concentricAndCoaxial() {
    // Least field on the inner electrode at given outer radius: b = 2a and b = e a (textbook).
    ConcentricSpheres best = new ConcentricSpheres(1, 2);
    assertThat(best.field_V_per_m(1, 1)).isEqualTo(2);
    assertThat(new ConcentricSpheres(1.01, 2).field_V_per_m(1.01, 1)).isGreaterThan(2);
    assertThat(new ConcentricSpheres(0.99, 2).field_V_per_m(0.99, 1)).isGreaterThan(2);
    assertThat(best.capacitance_F()).isCloseTo(2 * Vacuum.FOUR_PI_EPSILON_0, within(1e-24));
    double e = Math.E;
    assertThat(new CoaxialCylinders(1, e).field_V_per_m(1, 1)).isCloseTo(1, within(1e-15));
    assertThat(new CoaxialCylinders(1.01, e).field_V_per_m(1.01, 1)).isGreaterThan(1);
    assertThat(new ParallelPlates(0.04).field_V_per_m(1000)).isEqualTo(25_000);
    assertThat(new ParallelPlates(1).capacitancePerArea_F_per_m2()).isEqualTo(Vacuum.EPSILON_0);
  }
}
