package org.edgefield.field.gas;

/**
 * Relative air density: the factor that scales most of what air withstands.
 *
 * <pre>delta = (p / p0) (T0 / T)</pre>
 *
 * referred to 20 degC and 101.3 kPa (IEC 60060-1:2010, 4.3; seen), or for Peek's law to 25 degC and
 * 76 cm of mercury (delta = 3.92 b / (273 + t), b in cm Hg; seen).
 */
public final class AirDensity {
  private static final double REFERENCE_PA = 101_300;
  private static final double REFERENCE_K = 293.15;
  private static final double CM_MERCURY_PA = 1333.22;

  private AirDensity() {}

  /** Relative density referred to 20 degC and 101.3 kPa. */
  public static double relative(double pressure_Pa, double temperature_K) {
    return pressure_Pa / REFERENCE_PA * (REFERENCE_K / temperature_K);
  }

  /** Relative density as Peek refers it, to 25 degC and 76 cm of mercury. */
  public static double peek(double pressure_Pa, double temperature_K) {
    return 3.92 * (pressure_Pa / CM_MERCURY_PA) / (temperature_K - 0.15);
  }

  /** Pressure of the same density at 20 degC, Pa: what the fits of the ionisation refer to. */
  public static double pressureAt20_Pa(double pressure_Pa, double temperature_K) {
    return pressure_Pa * (REFERENCE_K / temperature_K);
  }
}
