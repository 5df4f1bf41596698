package org.edgefield.field.estimate;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Surroundings.EarthPlane;
import org.edgefield.field.result.DutyField;
import org.edgefield.importer.Progress;
import org.edgefield.models.exact.spheres.TwoSpheres;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Peak of the estimate over the exact peak, for bodies with closed solutions. */
class SmoothBodiesTest {
  private static final List<String> REPORT = new ArrayList<>();

  @AfterAll
  static void table() {
    System.out.println(String.join(System.lineSeparator(), REPORT));
  }

  private static final EarthPlane FLOOR = new EarthPlane(2, 0);

  private static double peak(RevolvedBodies bodies, FieldCase fieldCase, int body) {
    EstimateModel model =
        EstimateModel.build(
            bodies.assembly(),
            bodies.mesh(),
            bodies.nodes(),
            bodies.features(),
            fieldCase,
            Progress.NONE);
    DutyField field = model.field(0, (k1, k2) -> 3e6);
    return Arrays.stream(bodies.nodesOf(body))
        .mapToDouble(n -> field.field_V_per_m()[n])
        .max()
        .orElseThrow();
  }

  private static void within(String name, double estimate, double exact, double low, double high) {
    double ratio = estimate / exact;
    REPORT.add(String.format(Locale.ROOT, "%-42s estimate/exact %.3f", name, ratio));
    assertThat(ratio).as(name).isBetween(low, high);
  }

  @ParameterizedTest
  @CsvSource({
    "1, 1, 1",
    "2, 1, 1.31519072220405",
    "5, 1, 2.13702312292001",
    "10, 1, 3.3241341799668",
    "1, 2, 0.826993343132688",
    "1, 5, 0.715472775421784",
    "1, 10, 0.676572746051201"
  })
  void isolatedSpheroid(double a, double b, double fieldTimesPolar) {
    // E b / V at the tip of a prolate (b equatorial), E b_polar / V at the rim of an oblate one;
    // closed form, recomputed.
    double e =
        peak(
            new RevolvedBodies().ellipsoid(0, a, b, false),
            RevolvedBodies.fieldCase(new double[] {1}, new boolean[] {false}, null, null),
            0);
    within("isolated spheroid " + a + ":" + b, e, fieldTimesPolar, 0.99, 1.2);
  }

  @ParameterizedTest
  @CsvSource({
    "0.05, 20.6711560674",
    "0.1, 10.6757486676",
    "0.2, 5.68536970",
    "0.5, 2.71799266",
    "1, 1.77028119",
    "2, 1.33885264",
    "5, 1.11729755",
    "10, 1.05464383",
    "20, 1.02620430"
  })
  void sphereOverEarthPlane(double gap, double exact) {
    // Image series, recomputed; sphere of radius 1.
    double e =
        peak(
            new RevolvedBodies().sphere(1 + gap, 1),
            RevolvedBodies.fieldCase(new double[] {1}, new boolean[] {false}, FLOOR, null),
            0);
    within("sphere over plane, gap/R " + gap, e, exact, 1.0, 1.15);
  }

  @ParameterizedTest
  @CsvSource({
    "0.05, 1.01672251692, 1.01672247228, 1.0167224946",
    "0.2, 1.06826906554, 1.06688066798, 1.06757486676",
    "0.5, 1.19906231816, 1.14616633431, 1.17261432623",
    "1, 1.51698007701, 1.20101257903, 1.35899632802",
    "2, 2.3384417656, 1.20212062371, 1.77028119466",
    "5, 5.1671518229, 1.1355028666, 3.15132734475",
    "10, 10.0909616919, 1.08201378418, 5.58648773803",
    "20, 20.0476235197, 1.04525309805, 10.5464383089"
  })
  void twoSpheres(double gap, double live, double earthed, double symmetric) {
    // f = E gap / U at the facing poles, image series, recomputed; spheres of radius 1.
    RevolvedBodies pair = new RevolvedBodies().sphere(0, 1).sphere(2 + gap, 1);
    FieldCase one =
        RevolvedBodies.fieldCase(new double[] {1, 0}, new boolean[] {false, true}, null, null);
    FieldCase both =
        RevolvedBodies.fieldCase(new double[] {.5, -.5}, new boolean[] {false, false}, null, null);
    within("two spheres, live, gap/R " + gap, peak(pair, one, 0) * gap, live, 1.0, 1.2);
    within("two spheres, earthed, gap/R " + gap, peak(pair, one, 1) * gap, earthed, 1.0, 1.45);
    within("two spheres, +-U/2, gap/R " + gap, peak(pair, both, 0) * gap, symmetric, 1.0, 1.15);
  }

  @ParameterizedTest
  @CsvSource({
    "0.5, 2.71469",
    "1, 1.74948",
    "2, 1.27335",
    "5, .96782",
    "10, .841978",
    "20, .758994",
    "50, .687494",
    "100, .653207"
  })
  void rodOverEarthPlane(double gap, double exact) {
    // Hemispherically ended rod of radius 1, length 200; charge simulation, 0.5 %.
    double e =
        peak(
            new RevolvedBodies().rod(gap, 1, 200),
            RevolvedBodies.fieldCase(new double[] {1}, new boolean[] {false}, FLOOR, null),
            0);
    within("rod over plane, gap/r " + gap, e, exact, 1.0, 1.15);
  }

  @ParameterizedTest
  @CsvSource({
    "0.2, 1.33247359929513",
    "0.5, 1.89681233693443",
    "1, 3",
    "2, 5.7615635397215",
    "5, 17.9144146642185",
    "10, 49.2953712204893",
    "30, 290.342506070792"
  })
  void halfEllipsoidOnEarthPlaneInAnAmbientField(double slenderness, double gamma) {
    // Tip field over ambient field, closed form, recomputed. The whole ellipsoid stands for the
    // half: the plane through its middle is the earth plane.
    double e =
        peak(
            new RevolvedBodies().ellipsoid(0, slenderness, 1, false),
            RevolvedBodies.fieldCase(
                new double[] {0}, new boolean[] {true}, FLOOR, new double[] {0, 0, 1}),
            0);
    within("boss h/b " + slenderness + " in ambient field", e, gamma, 0.999, 1.06);
  }

  @ParameterizedTest
  @CsvSource({"1, 1.5", "1, 2", "1, 10"})
  void concentricSpheres(double inner, double outer) {
    // E = U R / (r (R - r)) and U r / (R (R - r)), exact.
    RevolvedBodies shells = new RevolvedBodies().sphere(0, inner).ellipsoid(0, outer, outer, true);
    FieldCase c =
        RevolvedBodies.fieldCase(new double[] {1, 0}, new boolean[] {false, true}, null, null);
    within(
        "concentric, inner, R/r " + outer,
        peak(shells, c, 0),
        outer / (inner * (outer - inner)),
        0.995,
        1.005);
    within(
        "concentric, outer, R/r " + outer,
        peak(shells, c, 1),
        inner / (outer * (outer - inner)),
        0.995,
        1.005);
  }

  @Test
  void aSmallSphereIsShelteredByALargeOneAtItsVoltage() {
    // Image series; far pole of the sphere of radius 1 at the gap 1 from one of radius 4.
    double exact = new TwoSpheres(1, 4, 1).farPoleA_V_per_m(1, 1);
    RevolvedBodies pair = new RevolvedBodies().sphere(0, 1).sphere(6, 4);
    FieldCase c =
        RevolvedBodies.fieldCase(new double[] {1, 1}, new boolean[] {false, false}, null, null);
    within("small sphere by a large one, alike", peak(pair, c, 0), exact, 1.0, 1.3);
  }
}
