package org.edgefield.field.bem.edge;

import org.edgefield.field.bem.evaluate.FieldEvaluator;

/**
 * Edge coefficients K along sharp convex edges from a solved potential.
 *
 * <p>At a distance rho from an edge, far below its reach, the field is that of the wedge between
 * the two faces, with the angle beta of the gas around it:
 *
 * <pre>V - phi = K (beta / pi) rho^(pi/beta) sin(pi theta / beta),   E on the faces = K rho^(-s),
 * s = 1 - pi / beta</pre>
 *
 * K is projected from the potential on an arc around the edge,
 *
 * <pre>K(rho) = (pi/beta) (2/n) Sum_{j=1}^{n-1} (V - phi_j) sin(pi j/n) rho^(-pi/beta),
 * theta_j = j beta / n,  n = 4</pre>
 *
 * at the reach and at half of it, and extrapolated linearly to the edge where the faces are curved;
 * between plane faces the higher terms are orthogonal to the projection. Limit: the mesh must hold
 * rows of elements finer than the arcs, see {@link SharpEdges#gradings}.
 *
 * @param k per set, K per station, V/m times m^s
 * @param correction per set, what the extrapolation added
 */
record EdgeCoefficients(double[][] k, double[][] correction) {
  private static final int ARC = 4;

  /** Points per station in {@link #arcs}. */
  private static final int POINTS = 2 * (ARC - 1);

  /** Points at which the potential is needed, 3 coordinates each. */
  static double[] arcs(EdgeStations stations) {
    double[] out = new double[3 * POINTS * stations.count()];
    int at = 0;
    for (int i = 0; i < stations.count(); i++) {
      double beta = 2 * Math.PI - stations.interiorAngle_rad()[i];
      for (int half = 1; half <= 2; half++) {
        double rho = 0.5 * half * stations.reach_m()[i];
        for (int j = 1; j < ARC; j++) {
          double x = rho * Math.cos(beta * j / ARC);
          double y = rho * Math.sin(beta * j / ARC);
          for (int c = 0; c < 3; c++) {
            double[] f = stations.frame();
            out[at++] = f[9 * i + c] + x * f[9 * i + 3 + c] + y * f[9 * i + 6 + c];
          }
        }
      }
    }
    return out;
  }

  /**
   * Projects the coefficients.
   *
   * @param values potentials at the points of {@link #arcs}, from {@code first} on
   * @param conductor_V potential of each station's conductor, per set
   */
  static EdgeCoefficients of(
      EdgeStations stations, FieldEvaluator.Values values, double[][] conductor_V) {
    int sets = conductor_V.length;
    double[][] k = new double[sets][stations.count()];
    double[][] correction = new double[sets][stations.count()];
    for (int set = 0; set < sets; set++) {
      double[] phi = values.potential_V()[set];
      for (int i = 0; i < stations.count(); i++) {
        double power = Math.PI / (2 * Math.PI - stations.interiorAngle_rad()[i]);
        double v = conductor_V[set][i];
        double rho = stations.reach_m()[i];
        double near = project(phi, POINTS * i, v, power, 0.5 * rho);
        double far = project(phi, POINTS * i + ARC - 1, v, power, rho);
        // Between plane faces the projection is exact and nothing is left to extrapolate.
        k[set][i] = stations.plain()[i] ? far : 2 * near - far;
        correction[set][i] = near - far;
      }
    }
    return new EdgeCoefficients(k, correction);
  }

  private static double project(double[] phi, int first, double v, double power, double rho) {
    double sum = 0;
    for (int j = 1; j < ARC; j++) {
      sum += (v - phi[first + j - 1]) * Math.sin(Math.PI * j / ARC);
    }
    return power * 2 / ARC * sum * Math.pow(rho, -power);
  }
}
