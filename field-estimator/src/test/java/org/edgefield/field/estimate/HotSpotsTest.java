package org.edgefield.field.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.edgefield.field.job.Surroundings.EarthPlane;
import org.edgefield.field.result.DutyResult;
import org.edgefield.field.result.FieldResult;
import org.edgefield.field.result.HotSpot;
import org.edgefield.field.result.Law;
import org.edgefield.importer.Progress;
import org.junit.jupiter.api.Test;

/** Hot spots and cures of estimates; each cure is applied and estimated again. */
class HotSpotsTest {
  /** Permitted field of the cases. */
  private static final double PERMITTED = 3e6;

  private static DutyResult sphereOverPlane(double radius, double gap, double volts) {
    RevolvedBodies b = new RevolvedBodies().sphere(radius + gap, radius);
    return run(b, new double[] {volts}, new boolean[] {false}, new EarthPlane(2, 0));
  }

  private static DutyResult run(
      RevolvedBodies b, double[] volts, boolean[] earth, EarthPlane plane) {
    FieldResult r =
        QuickEstimate.run(
            b.assembly(),
            b.mesh(),
            b.nodes(),
            b.features(),
            RevolvedBodies.fieldCase(volts, earth, plane, null),
            Progress.NONE);
    assertThat(r.method()).isEqualTo(FieldResult.Method.SCREEN);
    return r.duties().get(0);
  }

  @Test
  void oneRegionAtThePoleWithItsCause() {
    HotSpot spot = sphereOverPlane(0.01, 0.02, 60e3).peak();
    // E = U (r + s) / (r s) = 9 kV/mm.
    assertThat(spot.field_V_per_m()).isCloseTo(9e6, within(1e3));
    assertThat(spot.utilisation()).isCloseTo(3, within(1e-3));
    assertThat(spot.at_m()[2]).isCloseTo(0.02, within(1e-12));
    assertThat(spot.radius_m()).isCloseTo(0.01, within(1e-12));
    assertThat(spot.gap_m()).isCloseTo(0.02, within(1e-12));
    assertThat(spot.opposing()).isEqualTo(-1);
    assertThat(spot.law()).isEqualTo(Law.PARALLEL_SURFACES);
    assertThat(spot.area_m2()).isBetween(1e-4, 4 * Math.PI * 1e-4);
    assertThat(spot.length_m()).isNaN();
    assertThat(spot.cure().voltage_V()).isCloseTo(20e3, within(10.0));
    assertThat(spot.cure().voltageFactor()).isCloseTo(1.0 / 3, within(1e-3));
  }

  @Test
  void eachCureAppliedGivesUtilisationOne() {
    double u = 45e3;
    HotSpot spot = sphereOverPlane(0.01, 0.02, u).peak();
    assertThat(spot.utilisation()).isGreaterThan(1.5);
    assertThat(sphereOverPlane(0.01, 0.02, spot.cure().voltage_V()).peak().utilisation())
        .isCloseTo(1, within(0.001));
    assertThat(sphereOverPlane(spot.cure().radius_m(), 0.02, u).peak().utilisation())
        .isCloseTo(1, within(0.03));
    HotSpot wider = sphereOverPlane(0.018, 0.02, u).peak();
    assertThat(sphereOverPlane(0.018, wider.cure().gap_m(), u).peak().utilisation())
        .isCloseTo(1, within(0.03));
  }

  @Test
  void noGapHelpsWhereTheIsolatedBodyIsTooHot() {
    // V / r = 4.5 kV/mm at any gap.
    assertThat(sphereOverPlane(0.01, 0.02, 45e3).peak().cure().gap_m()).isNaN();
  }

  @Test
  void regionsKeepToTheirPartsAndAreRanked() {
    RevolvedBodies pair = new RevolvedBodies().sphere(0, 0.01).sphere(0.04, 0.008);
    DutyResult r = run(pair, new double[] {60e3, -60e3}, new boolean[2], null);
    List<HotSpot> spots = r.hotSpots();
    assertThat(spots).hasSize(2);
    assertThat(spots.get(0).part()).isEqualTo(1);
    assertThat(spots.get(0).opposing()).isEqualTo(0);
    assertThat(spots.get(1).part()).isEqualTo(0);
    assertThat(spots.get(0).utilisation()).isGreaterThan(spots.get(1).utilisation());
    assertThat(spots).extracting(HotSpot::id).containsExactly(1, 2);
    for (HotSpot s : spots) {
      assertThat(s.nodes()).isSorted();
      for (int n : s.nodes()) {
        double e = r.field().field_V_per_m()[n];
        assertThat(e)
            .isGreaterThanOrEqualTo(0.8 * PERMITTED)
            .isLessThanOrEqualTo(s.field_V_per_m());
      }
    }
  }

  @Test
  void aCalmCaseStillNamesItsPeak() {
    DutyResult r = sphereOverPlane(0.1, 0.2, 1000);
    assertThat(r.hotSpots()).isEmpty();
    assertThat(r.peak().utilisation()).isBetween(1e-3, 0.1);
    assertThat(r.peak().nodes()).isNotEmpty();
  }

  @Test
  void noVoltageGivesNoFieldAndNoNan() {
    DutyResult r = sphereOverPlane(0.1, 0.2, 0);
    assertThat(r.peak().field_V_per_m()).isZero();
    assertThat(r.field().field_V_per_m()).doesNotContain(Double.NaN);
  }

  @Test
  void opposedVoltagesAdd() {
    // f = E gap / U of the pair at opposed voltages, image series (recomputed).
    RevolvedBodies pair = new RevolvedBodies().sphere(0, 1).sphere(2.05, 1);
    double single =
        run(pair, new double[] {Math.sqrt(3) / 2, -Math.sqrt(3) / 2}, new boolean[2], null)
            .peak()
            .field_V_per_m();
    assertThat(single * 0.05 / Math.sqrt(3)).isCloseTo(1.0167224946, within(0.02));
  }
}
