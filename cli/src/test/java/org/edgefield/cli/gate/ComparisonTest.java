package org.edgefield.cli.gate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.dataformat.yaml.YAMLMapper;
import java.util.List;
import java.util.Map;
import org.edgefield.cli.UserException;
import org.edgefield.cli.gate.GateFinding.Change;
import org.junit.jupiter.api.Test;

class ComparisonTest {
  private static final double TOLERANCE_M = 1e-3;

  private static GateSpot spot(String part, String feature, double x_m, double utilisation) {
    double[] at = {x_m, 0, 0};
    return new GateSpot(part, "top/" + part, feature, at, utilisation, utilisation >= 1, at, 0);
  }

  private static GateSide side(String duty, GateSpot... spots) {
    var empty = JsonNodeFactory.instance.objectNode();
    return new GateSide("screen", empty, Map.of(duty, empty), Map.of(duty, List.of(spots)));
  }

  private static GateFinding only(GateSpot now, GateSpot accepted) {
    Comparison c = Comparison.of(side("d", now), side("d", accepted), TOLERANCE_M, 0.02);
    return c.findings().get("d").get(0);
  }

  @Test
  void renamedFaceAndSmallMoveStayTheSame() {
    GateFinding f = only(spot("bar", "face 7", 0.0009, 1.5), spot("bar", "face 3", 0, 1.5));
    assertThat(f.change()).isEqualTo(Change.SAME);
    assertThat(f.fails()).isFalse();
  }

  @Test
  void moveBeyondTheToleranceIsNewAndGone() {
    Comparison c =
        Comparison.of(
            side("d", spot("bar", "e", 0.0011, 1.5)),
            side("d", spot("bar", "e", 0, 1.5)),
            TOLERANCE_M,
            0.02);
    assertThat(c.findings().get("d"))
        .extracting(GateFinding::change)
        .containsExactly(Change.NEW, Change.GONE);
    assertThat(c.passes()).isFalse();
  }

  @Test
  void anotherPartAtTheSamePlaceIsNew() {
    assertThat(only(spot("a", "e", 0, 1.5), spot("b", "e", 0, 1.5)).change()).isEqualTo(Change.NEW);
  }

  @Test
  void worseBeginsBeyondTheStatedRise() {
    assertThat(only(spot("a", "e", 0, 1.52), spot("a", "e", 0, 1.5)).change())
        .isEqualTo(Change.SAME);
    assertThat(only(spot("a", "e", 0, 1.54), spot("a", "e", 0, 1.5)).fails()).isTrue();
    assertThat(only(spot("a", "e", 0, 1.4), spot("a", "e", 0, 1.5)).change())
        .isEqualTo(Change.BETTER);
  }

  @Test
  void newAmberDoesNotFailButAmberTurnedRedDoes() {
    assertThat(only(spot("a", "e", 0.5, 0.9), spot("a", "e", 0, 1.5)).fails()).isFalse();
    assertThat(only(spot("a", "e", 0, 1.0), spot("a", "e", 0, 0.9)).fails()).isTrue();
  }

  @Test
  void peakMayWanderAlongItsRegion() {
    double[] ends = {0, 0, 0, 0.1, 0, 0, 0.2, 0, 0};
    GateSpot edge =
        new GateSpot("a", "top/a", "edge", new double[] {0, 0, 0}, 1.5, true, ends, 0.05);
    assertThat(only(spot("a", "edge", 0.16, 1.5), edge).change()).isEqualTo(Change.SAME);
    assertThat(only(spot("a", "edge", 0.26, 1.5), edge).change()).isEqualTo(Change.NEW);
  }

  @Test
  void differentDutiesAreRefusedWithTheCure() {
    GateSpot s = spot("a", "e", 0, 1.5);
    assertThatThrownBy(() -> Comparison.of(side("x", s), side("y", s), TOLERANCE_M, 0.02))
        .isInstanceOf(UserException.class)
        .hasMessageContaining("missing now: y; not accepted yet: x")
        .hasMessageContaining("--accept");
  }

  @Test
  void changedLimitsAndVoltagesFailWithTheirNames() {
    GateSpot s = spot("a", "e", 0, 1.5);
    Comparison c =
        Comparison.of(
            side(
                "{permitted: {margin: 1.1, amber: 0.8}}",
                "[{electrode: L1, peak_V: 5, phase_deg: 0}]",
                s),
            side(
                "{permitted: {margin: 1, amber: 0.80}}",
                "[{electrode: L1, peak_V: 10.0, phase_deg: 0}]",
                s),
            TOLERANCE_M,
            0.02);
    assertThat(c.changedConditions())
        .containsExactly(
            "permitted.margin: accepted with 1, now 1.1",
            "duty d, L1: accepted with 10.0 V peak at 0 deg, now 5 V peak at 0 deg");
    assertThat(c.findings().get("d")).noneMatch(GateFinding::fails);
    assertThat(c.passes()).isFalse();
    assertThat(c.verdict()).startsWith("fail").contains("other conditions", "--accept");
    assertThat(JunitXml.text(c)).contains("name=\"conditions\" tests=\"2\" failures=\"2\"");
  }

  private static GateSide side(String conditions, String voltages, GateSpot spot) {
    YAMLMapper yaml = new YAMLMapper();
    try {
      return new GateSide(
          "screen",
          yaml.readTree(conditions),
          Map.of("d", yaml.readTree(voltages)),
          Map.of("d", List.of(spot)));
    } catch (JsonProcessingException e) {
      throw new AssertionError(e);
    }
  }
}
