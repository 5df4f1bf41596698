package org.edgefield.field.gas;

/**
 * Atmospheric correction of disruptive voltages, IEC 60060-1:2010, 4.3 (seen; humidity terms
 * memory):
 *
 * <pre>
 * Kt = delta^m k^w,  g = U50 / (500 L delta k)  (kV, m)
 * k  = 1 + 0.014 (h/delta - 11) - 0.00022 (h/delta - 11)^2   DC
 *      1 + 0.012 (h/delta - 11)                              AC
 *      1 + 0.010 (h/delta - 11)                              impulse
 * </pre>
 *
 * with h the absolute humidity in g/m3 and m, w by g. Range: h/delta from 1 to 15 g/m3.
 */
public final class Iec60060Correction {
  /** Kind of voltage. */
  public enum Voltage {
    DC,
    AC,
    IMPULSE
  }

  private Iec60060Correction() {}

  /**
   * Humidity parameter k.
   *
   * @param humidity_g_per_m3 absolute humidity
   * @param delta relative air density, 20 degC and 101.3 kPa
   * @throws GasException outside the range
   */
  public static double humidity(Voltage voltage, double humidity_g_per_m3, double delta) {
    double ratio = humidity_g_per_m3 / delta;
    if (!(ratio >= 1 && ratio <= 15)) {
      throw new GasException(
          "humidity over density of "
              + ratio
              + " g/m3 is outside the 1 to 15 g/m3 of IEC 60060-1: leave the humidity out");
    }
    double x = ratio - 11;
    return switch (voltage) {
      case DC -> 1 + 0.014 * x - 0.00022 * x * x;
      case AC -> 1 + 0.012 * x;
      case IMPULSE -> 1 + 0.010 * x;
    };
  }

  /**
   * Correction factor of the disruptive voltage.
   *
   * @param u50_kV 50 % disruptive voltage at the actual conditions
   * @param path_m shortest discharge path
   * @param delta relative air density
   * @param humidityFactor k by {@link #humidity}
   */
  public static double factor(double u50_kV, double path_m, double delta, double humidityFactor) {
    double g = u50_kV / (500 * path_m * delta * humidityFactor);
    return Math.pow(delta, densityExponent(g)) * Math.pow(humidityFactor, humidityExponent(g));
  }

  static double densityExponent(double g) {
    return g < 0.2 ? 0 : g < 1 ? g * (g - 0.2) / 0.8 : 1;
  }

  static double humidityExponent(double g) {
    if (g < 1) {
      return densityExponent(g);
    }
    return g < 1.2 ? 1 : g < 2 ? (2.2 - g) * (2 - g) / 0.8 : 0;
  }
}
