package org.edgefield.cli.gate;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.MissingNode;
import java.util.ArrayList;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.edgefield.cli.UserException;
import org.edgefield.cli.gate.GateFinding.Change;

/**
 * Compares a result with the accepted one. Hot spots match by part and position: the accepted one
 * whose peak lies within the tolerance (of several, the one of the same feature, at one place the
 * one of the nearest utilisation), or else those whose region holds the peak, or whose peak the
 * region holds, give or take the tolerance; of these the highest utilisation counts, so that a
 * region may split or merge. Face numbers play no role: a renumbered model compares equal.
 *
 * <p>Limit: a region is known by at most 32 points, so beside a large accepted region of the same
 * part a new hot spot nearer than their spacing counts as part of it; it still fails as worse where
 * its utilisation is above the accepted one.
 *
 * <p>Utilisations compare only under the same limits, surroundings, edges and voltages: a lower
 * voltage or a raised limit would hide a worse shape. Where one of them changed the gate fails and
 * says so, until the new result is looked at and accepted; the findings are shown all the same.
 *
 * @param findings by duty, in case order
 * @param changedConditions what differs in limits, surroundings, edges and voltages, one line each
 */
record Comparison(Map<String, List<GateFinding>> findings, List<String> changedConditions) {

  /** Peaks nearer than this share their place: edges that meet at a corner. */
  private static final double SAME_PLACE_M = 1e-9;

  /**
   * Compares.
   *
   * @param tolerance_m how far a peak may lie outside a region and still belong to it
   * @param worseBy relative rise of utilisation that counts as worse
   * @throws UserException where method or duties differ, so that nothing can be said
   */
  static Comparison of(GateSide now, GateSide accepted, double tolerance_m, double worseBy) {
    refuseStrangers(now, accepted);
    Map<String, List<GateFinding>> findings = new LinkedHashMap<>();
    now.duties()
        .forEach(
            (duty, spots) ->
                findings.put(duty, duty(spots, accepted.duties().get(duty), tolerance_m, worseBy)));
    return new Comparison(findings, changes(now, accepted));
  }

  /** Whether the conditions are the accepted ones and nothing red is new or worse. */
  boolean passes() {
    return changedConditions.isEmpty() && nothingWorse();
  }

  private boolean nothingWorse() {
    return findings.values().stream().flatMap(List::stream).noneMatch(GateFinding::fails);
  }

  /** The verdict in words, with the cure where conditions changed. */
  String verdict() {
    if (changedConditions.isEmpty()) {
      return passes() ? "pass" : "fail";
    }
    return "fail: judged under other conditions than the accepted result; restore them, or look at"
        + " the new result and accept it with --accept"
        + (nothingWorse() ? "" : "; red regions are new or worse as well");
  }

  private static void refuseStrangers(GateSide now, GateSide accepted) {
    String cure = "; look at the new result and accept it with --accept";
    if (!now.method().equals(accepted.method())) {
      throw new UserException(
          "the accepted result comes from "
              + accepted.method()
              + ", this one from "
              + now.method()
              + ": compare like with like (--method "
              + accepted.method()
              + ")"
              + cure);
    }
    Set<String> missing = new LinkedHashSet<>(accepted.duties().keySet());
    missing.removeAll(now.duties().keySet());
    Set<String> added = new LinkedHashSet<>(now.duties().keySet());
    added.removeAll(accepted.duties().keySet());
    if (!missing.isEmpty() || !added.isEmpty()) {
      throw new UserException(
          "the duties differ from the accepted ones:"
              + (missing.isEmpty() ? "" : " missing now: " + String.join(", ", missing))
              + (missing.isEmpty() || added.isEmpty() ? "" : ";")
              + (added.isEmpty() ? "" : " not accepted yet: " + String.join(", ", added))
              + cure);
    }
  }

  private static List<GateFinding> duty(
      List<GateSpot> now, List<GateSpot> accepted, double tolerance_m, double worseBy) {
    List<GateFinding> findings = new ArrayList<>();
    Set<GateSpot> found = new LinkedHashSet<>();
    for (GateSpot spot : now) {
      GateSpot partner = null;
      for (GateSpot old : accepted) {
        if (match(spot, old, tolerance_m)) {
          found.add(old);
          partner = partner == null ? old : nearer(spot, old, partner, tolerance_m);
        }
      }
      double before = partner == null ? Double.NaN : partner.utilisation();
      findings.add(
          new GateFinding(
              change(spot.utilisation(), before, worseBy), spot, before, spot.utilisation()));
    }
    for (GateSpot old : accepted) {
      if (!found.contains(old)) {
        findings.add(new GateFinding(Change.GONE, old, old.utilisation(), Double.NaN));
      }
    }
    findings.sort(
        java.util.Comparator.comparing((GateFinding f) -> !f.fails())
            .thenComparing(GateFinding::change));
    return findings;
  }

  private static boolean match(GateSpot a, GateSpot b, double tolerance_m) {
    return a.samePart(b)
        && (b.distance_m(a.at_m()) <= tolerance_m || a.distance_m(b.at_m()) <= tolerance_m);
  }

  private static GateSpot nearer(GateSpot spot, GateSpot a, GateSpot b, double tolerance_m) {
    double toA = spot.peakDistance_m(a);
    double toB = spot.peakDistance_m(b);
    if (toA > tolerance_m && toB > tolerance_m) {
      return a.utilisation() > b.utilisation() ? a : b;
    }
    if (toA <= tolerance_m && toB <= tolerance_m) {
      boolean sameA = a.feature().equals(spot.feature());
      boolean sameB = b.feature().equals(spot.feature());
      if (sameA != sameB) {
        return sameA ? a : b;
      }
    }
    if (Math.abs(toA - toB) < SAME_PLACE_M) {
      double now = spot.utilisation();
      return Math.abs(a.utilisation() - now) < Math.abs(b.utilisation() - now) ? a : b;
    }
    return toA < toB ? a : b;
  }

  private static Change change(double now, double accepted, double worseBy) {
    if (Double.isNaN(accepted)) {
      return Change.NEW;
    }
    if (now > accepted * (1 + worseBy)) {
      return Change.WORSE;
    }
    return now < accepted * (1 - worseBy) ? Change.BETTER : Change.SAME;
  }

  private static List<String> changes(GateSide now, GateSide accepted) {
    List<String> changes = new ArrayList<>();
    differences("", accepted.conditions(), now.conditions(), changes);
    accepted
        .voltages()
        .forEach(
            (duty, volts) -> {
              JsonNode fresh = now.voltages().get(duty);
              if (!sameNumbers(volts, fresh)) {
                voltages("duty " + duty + ", ", volts, fresh, changes);
              }
            });
    return changes;
  }

  private static void voltages(String duty, JsonNode old, JsonNode fresh, List<String> changes) {
    Map<String, JsonNode> before = byElectrode(old);
    Map<String, JsonNode> after = byElectrode(fresh);
    Set<String> electrodes = new LinkedHashSet<>(before.keySet());
    electrodes.addAll(after.keySet());
    for (String electrode : electrodes) {
      JsonNode a = before.getOrDefault(electrode, MissingNode.getInstance());
      JsonNode b = after.getOrDefault(electrode, MissingNode.getInstance());
      if (!sameNumbers(a, b)) {
        changes.add(duty + electrode + ": accepted with " + voltage(a) + ", now " + voltage(b));
      }
    }
  }

  private static Map<String, JsonNode> byElectrode(JsonNode voltages) {
    Map<String, JsonNode> map = new LinkedHashMap<>();
    voltages.forEach(v -> map.put(v.path("electrode").asText(), v));
    return map;
  }

  private static String voltage(JsonNode node) {
    return node.isMissingNode()
        ? "no voltage"
        : node.path("peak_V") + " V peak at " + node.path("phase_deg") + " deg";
  }

  private static void differences(String path, JsonNode old, JsonNode fresh, List<String> changes) {
    Set<String> keys = new LinkedHashSet<>();
    for (Iterator<String> it = old.fieldNames(); it.hasNext(); ) {
      keys.add(it.next());
    }
    for (Iterator<String> it = fresh.fieldNames(); it.hasNext(); ) {
      keys.add(it.next());
    }
    for (String key : keys) {
      JsonNode a = old.path(key);
      JsonNode b = fresh.path(key);
      String name = path.isEmpty() ? key : path + "." + key;
      if (a.isObject() && b.isObject()) {
        differences(name, a, b, changes);
      } else if (!sameNumbers(a, b)) {
        changes.add(name + ": accepted with " + words(a) + ", now " + words(b));
      }
    }
  }

  private static String words(JsonNode node) {
    return node.isMissingNode() ? "nothing" : node.isTextual() ? node.textValue() : node.toString();
  }

  // Numbers are equal by value: 3 and 3.0 are the same limit.
  private static boolean sameNumbers(JsonNode a, JsonNode b) {
    return a.equals(
        (x, y) ->
            x.isNumber() && y.isNumber()
                ? Double.compare(x.doubleValue(), y.doubleValue())
                : x.equals(y) ? 0 : 1,
        b);
  }
}
