package org.edgefield.models.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import org.edgefield.models.exact.isolated.Cube;
import org.edgefield.models.exact.isolated.Disc;
import org.edgefield.models.exact.isolated.OrthogonalSpheres;
import org.edgefield.models.exact.isolated.Sphere;
import org.edgefield.models.exact.isolated.Spheroid;
import org.edgefield.models.exact.isolated.Torus;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Closed forms against 30-digit evaluations of the same formulas by other means (recomputed). */
class IsolatedBodiesTest {
  private static final double DIGITS = 1e-11;

  @ParameterizedTest
  @CsvSource({
    // polar, equatorial, C/(eps0 smaller semi-axis): exact formula (recomputed)
    "2, 1, 16.5271740437828",
    "5, 1, 26.8546245740681",
    "1, 2, 20.7846096908265",
    "1, 5, 44.9544803021716",
  })
  void spheroidCapacitance(double polar, double equatorial, double expected) {
    double ratio = new Spheroid(polar, equatorial).capacitance_F() / Vacuum.EPSILON_0;
    assertThat(ratio).isCloseTo(expected, withinPercentage(100 * DIGITS));
  }

  @ParameterizedTest
  @CsvSource({
    // polar, equatorial, largest field times smaller semi-axis over V (recomputed)
    "2, 1, 1.31519072220405",
    "5, 1, 2.13702312292001",
    "10, 1, 3.3241341799668",
    "1, 2, 0.826993343132688",
    "1, 5, 0.715472775421784",
    "1, 10, 0.676572746051201",
  })
  void spheroidPeak(double polar, double equatorial, double expected) {
    Spheroid body = new Spheroid(polar, equatorial);
    double peak = polar > equatorial ? body.poleField_V_per_m(1) : body.equatorField_V_per_m(1);
    assertThat(peak).isCloseTo(expected, withinPercentage(100 * DIGITS));
  }

  @ParameterizedTest
  @CsvSource({"1, 1", "1.0000001, 1", "1, 1.0000001", "1.00001, 1"})
  void spheroidTendsToSphere(double polar, double equatorial) {
    double mean = (polar + 2 * equatorial) / 3;
    double sphere = new Sphere(mean).capacitance_F();
    assertThat(new Spheroid(polar, equatorial).capacitance_F() / sphere).isCloseTo(1, within(1e-9));
  }

  @Test
  void verySlenderSpheroidTendsToDisc() {
    double disc = new Disc(1).capacitance_F();
    assertThat(disc / Vacuum.EPSILON_0).isEqualTo(8);
    assertThat(new Spheroid(1e-8, 1).capacitance_F() / disc).isCloseTo(1, within(1e-8));
    // Both sides of the disc carry the charge that the two sides of the flat spheroid carry.
    double flat = new Spheroid(1e-8, 1).field_V_per_m(1e-8 * Math.sqrt(1 - 0.36), 1);
    assertThat(new Disc(1).field_V_per_m(0.6, 1) / flat).isCloseTo(1, within(1e-7));
  }

  @ParameterizedTest
  @CsvSource({
    // R/r, C/(eps0 r): series of Legendre functions, 30 digits (recomputed)
    "2, 30.5572716148619",
    "3, 38.8523825595533",
    "5, 54.5826810664077",
    "10, 90.6902250647649",
  })
  void torusCapacitance(double ratio, double expected) {
    double c = new Torus(ratio, 1).capacitance_F() / Vacuum.EPSILON_0;
    assertThat(c).isCloseTo(expected, withinPercentage(100 * DIGITS));
  }

  @ParameterizedTest
  @CsvSource({"1.05, 1", "2, 1", "3, 1", "10, 1", "0.3, 0.01"})
  void torusFieldCarriesItsCharge(double ring, double tube) {
    Torus torus = new Torus(ring, tube);
    double charge = 0;
    int n = 2000;
    for (int i = 0; i < n; i++) {
      // Toroidal angle t on the surface: rho = w sinh / (cosh - cos t), arc = w dt / (cosh - cos
      // t).
      double t = 2 * Math.PI * i / n;
      double w = Math.sqrt((ring - tube) * (ring + tube));
      double x = ring / tube;
      double rho = w * w / tube / (x - Math.cos(t));
      double arc = w / (x - Math.cos(t)) * 2 * Math.PI / n;
      charge += Vacuum.EPSILON_0 * torus.field_V_per_m(t, 1) * 2 * Math.PI * rho * arc;
    }
    assertThat(charge / torus.capacitance_F()).isCloseTo(1, within(1e-9));
    assertThat(torus.peakField_V_per_m(1)).isGreaterThan(torus.field_V_per_m(Math.PI, 1));
  }

  @Test
  void thinRingTendsToWire() {
    // E -> V / (r ln(8R/r)) on a thin ring (textbook; memory).
    double thin = new Torus(1000, 1).peakField_V_per_m(1);
    assertThat(thin * Math.log(8000)).isCloseTo(1, within(0.01));
  }

  @Test
  void orthogonalSpheresAreOneEquipotential() {
    OrthogonalSpheres body = new OrthogonalSpheres(40, 30);
    for (double angle = 0.01; angle < Math.PI; angle += 0.1) {
      double za = -40 * Math.cos(angle);
      double zb = body.distance_m() + 30 * Math.cos(angle);
      if (Math.hypot(za - body.distance_m(), 40 * Math.sin(angle)) > 30) {
        assertThat(body.potentialRatio(za, 40 * Math.sin(angle))).isCloseTo(1, within(1e-13));
      }
      if (Math.hypot(zb, 30 * Math.sin(angle)) > 40) {
        assertThat(body.potentialRatio(zb, 30 * Math.sin(angle))).isCloseTo(1, within(1e-13));
      }
    }
    double step = 1e-4;
    double slope = (1 - body.potentialRatio(-40 - step, 0)) / step;
    assertThat(body.farPoleFieldA_V_per_m(1) / slope).isCloseTo(1, within(1e-5));
    assertThat(body.capacitance_F() / Vacuum.FOUR_PI_EPSILON_0).isCloseTo(46, within(1e-12));
  }

  @Test
  void sphereTerminalAtThreeMegavoltsPerMetre() {
    // V = E R and Q = 4 pi eps0 R^2 E (textbook): R = 0.1, 0.25, 1 m hold 300 kV, 750 kV, 3 MV.
    assertThat(new Sphere(0.1).potentialAt_V(3e6)).isCloseTo(300e3, within(1e-6));
    assertThat(new Sphere(0.25).potentialAt_V(3e6)).isCloseTo(750e3, within(1e-6));
    assertThat(new Sphere(1).chargeAt_C(3e6)).isCloseTo(333.795e-6, within(0.001e-6));
    assertThat(new Sphere(1).field_V_per_m(3e6)).isEqualTo(3e6);
  }

  @Test
  void cube() {
    // 0.66067815 (seen), further digits Helsing and Perfekt 2013 (memory).
    assertThat(new Cube(2).capacitance_F() / Vacuum.FOUR_PI_EPSILON_0)
        .isCloseTo(2 * 0.66067815, within(2e-8));
    // The coefficient of side a is K a^(-2/3) with K of the unit cube.
    assertThat(new Cube(8).midEdgeCoefficient(1)).isCloseTo(0.540 / 4, within(1e-12));
  }
}
