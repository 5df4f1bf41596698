package org.edgefield.cli.gate;

import java.util.Locale;

/**
 * How one hot spot compares with what was accepted.
 *
 * @param change what became of it
 * @param spot the hot spot now, or as accepted where it is gone
 * @param accepted utilisation as accepted, NaN where it is new
 * @param now utilisation now, NaN where it is gone
 */
record GateFinding(Change change, GateSpot spot, double accepted, double now) {
  /** What became of a hot spot. */
  enum Change {
    NEW,
    WORSE,
    SAME,
    BETTER,
    GONE;

    String key() {
      return name().toLowerCase(Locale.ROOT);
    }
  }

  /** Whether it fails the gate: red, and new or worse. */
  boolean fails() {
    return spot.red() && (change == Change.NEW || change == Change.WORSE);
  }
}
