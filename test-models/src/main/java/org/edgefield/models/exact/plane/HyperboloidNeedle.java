package org.edgefield.models.exact.plane;

/**
 * Hyperboloid needle of tip radius r at voltage U over an earthed plane at distance d:
 *
 * <pre>eta = 1/sqrt(1 + r/d), a = d/eta, E_tip = U / (a (1 - eta^2) atanh(eta))</pre>
 *
 * Prolate spheroidal coordinates; J. H. Mason, Proc. IEE 102C (1955) 254 gives the approximation
 * 2U/(r ln(1 + 4d/r)) (memory; digits recomputed).
 *
 * @param tip_m radius r of the tip
 * @param gap_m distance d
 */
public record HyperboloidNeedle(double tip_m, double gap_m) {
  /** Field at the tip. */
  public double tipField_V_per_m(double voltage_V) {
    double ratio = tip_m / gap_m;
    double eta = 1 / Math.sqrt(1 + ratio);
    // 1 - eta^2 = ratio / (1 + ratio) and 1 - eta are small for sharp needles.
    double oneMinusSquare = ratio / (1 + ratio);
    double oneMinus = oneMinusSquare / (1 + eta);
    double atanh = 0.5 * Math.log((1 + eta) / oneMinus);
    return voltage_V * eta / (gap_m * oneMinusSquare * atanh);
  }
}
