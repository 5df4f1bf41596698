package org.edgefield.field.bem.edge;

import org.edgefield.field.bem.evaluate.FieldEvaluator;
import org.edgefield.field.edge.RoundedCorner;

/**
 * Corner coefficients from a solved potential: outward along the mean normal the potential
 * difference to the conductor grows as
 *
 * <pre>V - phi = kappa rho^lambda</pre>
 *
 * with lambda = 0.4542 at a right-angled corner of three edges. There kappa is taken at the reach
 * and at half of it and extrapolated linearly. Elsewhere lambda is unknown and comes from the two
 * differences themselves.
 *
 * @param kappa per set and corner, V / m^0.4542; for right-angled corners
 * @param correction per set and corner, what the extrapolation added
 * @param near_V per set and corner, potential difference at half the reach
 * @param far_V the same at the reach
 */
record CornerCoefficients(
    double[][] kappa, double[][] correction, double[][] near_V, double[][] far_V) {

  /** Points at which the potential is needed, 3 coordinates each, two per corner. */
  static double[] points(CornerStations corners) {
    double[] out = new double[6 * corners.count()];
    for (int i = 0; i < corners.count(); i++) {
      for (int half = 0; half < 2; half++) {
        for (int k = 0; k < 3; k++) {
          out[6 * i + 3 * half + k] =
              corners.position()[3 * i + k]
                  + 0.5 * (half + 1) * corners.reach_m()[i] * corners.direction()[3 * i + k];
        }
      }
    }
    return out;
  }

  /**
   * Reads the coefficients off potentials.
   *
   * @param values potentials at the points of {@link #points} from point {@code first} on
   * @param conductor_V potential of each corner's conductor, per set
   */
  static CornerCoefficients of(
      CornerStations corners, FieldEvaluator.Values values, int first, double[][] conductor_V) {
    int sets = conductor_V.length;
    int n = corners.count();
    CornerCoefficients out =
        new CornerCoefficients(
            new double[sets][n], new double[sets][n], new double[sets][n], new double[sets][n]);
    double power = 1 - RoundedCorner.EXPONENT;
    for (int set = 0; set < sets; set++) {
      double[] phi = values.potential_V()[set];
      for (int i = 0; i < n; i++) {
        double near = conductor_V[set][i] - phi[first + 2 * i];
        double far = conductor_V[set][i] - phi[first + 2 * i + 1];
        double rho = corners.reach_m()[i];
        double inner = near * Math.pow(0.5 * rho, -power);
        double outer = far * Math.pow(rho, -power);
        out.near_V[set][i] = near;
        out.far_V[set][i] = far;
        out.kappa[set][i] = 2 * inner - outer;
        out.correction[set][i] = inner - outer;
      }
    }
    return out;
  }
}
