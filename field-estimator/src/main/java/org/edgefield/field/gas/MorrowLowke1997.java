package org.edgefield.field.gas;

/**
 * Effective ionisation of air by R. Morrow and J. J. Lowke (J. Phys. D: Appl. Phys. 30, 1997, p.
 * 614, appendix; seen). With z = E/N in V cm^2:
 *
 * <pre>
 * alpha/N  = 2e-16 exp(-7.248e-15/z)      for z > 1.5e-15, else 6.619e-17 exp(-5.593e-15/z)   cm^2
 * eta2/N   = 8.889e-5 z + 2.567e-19       for z > 1.05e-15, else 6.089e-4 z - 2.893e-19       cm^2
 * eta3/N^2 = 4.7778e-59 z^-1.2749                                                             cm^5
 * </pre>
 *
 * N is the number density. The three-body term depends on pressure: it is taken at {@code
 * densityAt_Pa}, the pressure of the case referred to 20 degC. K = 9.15 as for {@link
 * ZaenglPetcharaks1994}. Good to high fields: given up to z = 1e-13 V cm^2 (40 times critical).
 */
public final class MorrowLowke1997 implements Ionisation {
  private static final double BOLTZMANN = 1.380649e-23;
  private static final double REFERENCE_K = 293.15;

  /** Number density per pressure at 20 degC, 1/(cm^3 Pa). */
  private static final double DENSITY_PER_PA = 1e-6 / (BOLTZMANN * REFERENCE_K);

  private static final double LARGEST_Z = 1e-13;

  private final double density;
  private final double critical;

  /**
   * At a pressure.
   *
   * @param densityAt_Pa pressure of the same density at 20 degC
   */
  public MorrowLowke1997(double densityAt_Pa) {
    density = densityAt_Pa * DENSITY_PER_PA;
    double low = 10;
    double high = 60;
    for (int i = 0; i < 80; i++) {
      double middle = 0.5 * (low + high);
      if (perPressure(middle) > 0) {
        high = middle;
      } else {
        low = middle;
      }
    }
    critical = high;
  }

  @Override
  public String name() {
    return "air, Morrow and Lowke 1997, K = 9.15";
  }

  @Override
  public double perPressure(double reducedField_V_per_mPa) {
    // V/(m Pa) to V cm^2: one hundredth per cm, over the density per Pa.
    double z = Math.max(reducedField_V_per_mPa / 100 / DENSITY_PER_PA, 1e-17);
    double alpha =
        z > 1.5e-15 ? 2e-16 * Math.exp(-7.248e-15 / z) : 6.619e-17 * Math.exp(-5.593e-15 / z);
    double two = z > 1.05e-15 ? 8.889e-5 * z + 2.567e-19 : 6.089e-4 * z - 2.893e-19;
    double three = density * 4.7778e-59 * Math.pow(z, -1.2749);
    return (alpha - two - three) * DENSITY_PER_PA * 100;
  }

  @Override
  public double critical_V_per_mPa() {
    return critical;
  }

  @Override
  public double largest_V_per_mPa() {
    return LARGEST_Z * DENSITY_PER_PA * 100;
  }

  @Override
  public double streamerConstant() {
    return 9.15;
  }
}
