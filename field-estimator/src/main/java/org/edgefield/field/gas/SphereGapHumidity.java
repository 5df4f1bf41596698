package org.edgefield.field.gas;

/**
 * Humidity factor of sphere gaps, IEC 60052:2002 (memory): k = 1 + 0.002 (h/delta - 8.5), h in
 * g/m3; the tables hold at 8.5 g/m3.
 */
public final class SphereGapHumidity {
  private SphereGapHumidity() {}

  /** The factor on the disruptive voltage. */
  public static double factor(double humidity_g_per_m3, double delta) {
    return 1 + 0.002 * (humidity_g_per_m3 / delta - 8.5);
  }
}
