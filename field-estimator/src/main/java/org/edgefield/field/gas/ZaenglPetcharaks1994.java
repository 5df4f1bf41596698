package org.edgefield.field.gas;

/**
 * Effective ionisation of air by W. S. Zaengl and K. Petcharaks (Gaseous Dielectrics VII, 1994, p.
 * 153; memory, its zero and its join recomputed). With x = E/p in kV/(mm bar) at 20 degC, alpha/p
 * in 1/(mm bar):
 *
 * <pre>
 * 1.6053 (x - 2.165)^2 - 0.2873   for 2.588 <= x <= 7.943
 * 16.7766 x - 80.006              for 7.943 < x <= 14
 * </pre>
 *
 * K = 9.15 (K. Petcharaks, thesis ETH 11192, 1995; memory). Below 2.588 the parabola falls to its
 * least value at 2.165 and is held there.
 *
 * <p>The default for air: nearest to Peek's coaxial law (-2 to +3 % for r = 0.1 to 10 mm, where
 * {@link MorrowLowke1997} lies 1 to 5 % above) and on the safe side of the sphere gaps of IEC 60052
 * (mean 0.981, where the other has 1.000).
 */
public final class ZaenglPetcharaks1994 implements Ionisation {
  /** kV/(mm bar) in V/(m Pa). */
  private static final double FIELD_UNIT = 10;

  /** 1/(mm bar) in 1/(m Pa). */
  private static final double ALPHA_UNIT = 0.01;

  private static final double VERTEX = 2.165;
  private static final double LINEAR = 7.943;
  private static final double LARGEST = 14;

  @Override
  public String name() {
    return "air, Zaengl and Petcharaks 1994, K = 9.15";
  }

  @Override
  public double perPressure(double reducedField_V_per_mPa) {
    double x = Math.max(reducedField_V_per_mPa / FIELD_UNIT, VERTEX);
    double alpha =
        x <= LINEAR ? 1.6053 * (x - VERTEX) * (x - VERTEX) - 0.2873 : 16.7766 * x - 80.006;
    return alpha * ALPHA_UNIT;
  }

  @Override
  public double critical_V_per_mPa() {
    return FIELD_UNIT * (VERTEX + Math.sqrt(0.2873 / 1.6053));
  }

  @Override
  public double largest_V_per_mPa() {
    return FIELD_UNIT * LARGEST;
  }

  @Override
  public double streamerConstant() {
    return 9.15;
  }
}
