package org.edgefield.field.gas;

/**
 * Pressure and temperature of the standard atmosphere up to 11 km (ISO 2533:1975; memory):
 *
 * <pre>p = 101 325 Pa (1 - 2.25577e-5 H)^5.25588,  T = 288.15 K - 0.0065 K/m H</pre>
 *
 * Range: H = -2000 to 11 000 m.
 */
public final class StandardAtmosphere {
  /** Pressure at sea level, Pa. */
  public static final double SEA_LEVEL_PA = 101_325;

  private static final double LOWEST_M = -2000;
  private static final double HIGHEST_M = 11_000;

  private StandardAtmosphere() {}

  /**
   * Pressure at an altitude.
   *
   * @param altitude_m height above sea level
   * @return Pa
   * @throws GasException outside the range
   */
  public static double pressure_Pa(double altitude_m) {
    check(altitude_m);
    return SEA_LEVEL_PA * Math.pow(1 - 2.25577e-5 * altitude_m, 5.25588);
  }

  /**
   * Temperature at an altitude.
   *
   * @param altitude_m height above sea level
   * @return K
   * @throws GasException outside the range
   */
  public static double temperature_K(double altitude_m) {
    check(altitude_m);
    return 288.15 - 0.0065 * altitude_m;
  }

  private static void check(double altitude_m) {
    if (!(altitude_m >= LOWEST_M && altitude_m <= HIGHEST_M)) {
      throw new GasException(
          "altitude "
              + altitude_m
              + " m is outside the standard atmosphere's -2000 to 11000 m: give the pressure");
    }
  }
}
