package org.edgefield.cli.pipeline;

import java.util.LinkedHashMap;
import java.util.Map;

/** Wall-clock seconds by phase. */
final class Phases {
  private final Map<String, Double> seconds = new LinkedHashMap<>();
  private long begin = System.nanoTime();

  /** Ends the running phase under this name; the next begins. */
  void end(String name) {
    long now = System.nanoTime();
    seconds.put(name, Math.round((now - begin) * 1e-6) * 1e-3);
    begin = now;
  }

  Map<String, Double> seconds() {
    return new LinkedHashMap<>(seconds);
  }
}
