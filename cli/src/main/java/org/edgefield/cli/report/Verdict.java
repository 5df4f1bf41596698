package org.edgefield.cli.report;

import java.util.Locale;

/** State of a region, a duty or a whole result by its utilisation. */
public enum Verdict {
  PASS,
  AMBER,
  RED;

  /** Red from 1, amber from the amber limit. */
  public static Verdict of(double utilisation, double amberLimit) {
    if (utilisation >= 1) {
      return RED;
    }
    return utilisation >= amberLimit ? AMBER : PASS;
  }

  /** As results carry it: pass, amber, red. */
  public String key() {
    return name().toLowerCase(Locale.ROOT);
  }
}
