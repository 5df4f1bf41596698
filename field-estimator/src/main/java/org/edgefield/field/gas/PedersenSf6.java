package org.edgefield.field.gas;

/**
 * Effective ionisation of sulphur hexafluoride, linear about its critical field (A. Pedersen; in E.
 * Kuffel, W. S. Zaengl, J. Kuffel, High Voltage Engineering, 2nd ed., ch. 5; memory, consistent
 * with the seen critical 360 Td):
 *
 * <pre>alpha/p = 27.7 / kV (E/p - 8.85 kV/(mm bar)),  7.5 <= E/p <= 20 kV/(mm bar)</pre>
 *
 * K = 10.5 gives the book's uniform gap U = 88.5 p d + 0.38 kV (bar cm). Rough surfaces start far
 * lower once pressure times bump height exceeds some 40 bar um: not in the criterion.
 */
public final class PedersenSf6 implements Ionisation {
  @Override
  public String name() {
    return "SF6, Pedersen, K = 10.5";
  }

  @Override
  public double perPressure(double reducedField_V_per_mPa) {
    // 27.7 1/kV = 0.0277 1/V; 8.85 kV/(mm bar) = 88.5 V/(m Pa).
    return 0.0277 * (reducedField_V_per_mPa - 88.5);
  }

  @Override
  public double critical_V_per_mPa() {
    return 88.5;
  }

  @Override
  public double largest_V_per_mPa() {
    return 200;
  }

  @Override
  public double streamerConstant() {
    return 10.5;
  }
}
