package org.edgefield.models.exact;

/** Constants of the exact solutions. */
public final class Vacuum {
  /** Permittivity of free space, F/m. CODATA 2018 (memory). */
  public static final double EPSILON_0 = 8.8541878128e-12;

  /** 4 pi epsilon_0, F/m: capacitance of an isolated sphere over its radius. */
  public static final double FOUR_PI_EPSILON_0 = 4 * Math.PI * EPSILON_0;

  private Vacuum() {}
}
