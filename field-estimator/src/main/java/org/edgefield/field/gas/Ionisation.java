package org.edgefield.field.gas;

/**
 * Effective ionisation (ionisation less attachment) of a gas against the reduced field, as one
 * published fit, with the constant K of the streamer criterion that belongs to it.
 */
public interface Ionisation {
  /** Name of the fit as results carry it. */
  String name();

  /**
   * Effective ionisation over pressure.
   *
   * @param reducedField_V_per_mPa field over the pressure of the same density at 20 degC, 0 or more
   * @return 1/(m Pa), negative where attachment wins
   */
  double perPressure(double reducedField_V_per_mPa);

  /** Reduced field where the effective ionisation is zero, V/(m Pa). */
  double critical_V_per_mPa();

  /** Largest reduced field for which the fit is given, V/(m Pa). */
  double largest_V_per_mPa();

  /** Constant K of the criterion Int alpha ds = K. */
  double streamerConstant();
}
