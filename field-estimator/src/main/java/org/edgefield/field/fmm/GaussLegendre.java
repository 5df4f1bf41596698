package org.edgefield.field.fmm;

/** Gauss-Legendre rule on [-1, 1] by Newton's method on the three-term recurrence. */
final class GaussLegendre {
  private GaussLegendre() {}

  /**
   * Rule with n points, exact to degree 2n - 1.
   *
   * @return {nodes rising, weights}
   */
  static double[][] rule(int n) {
    double[] node = new double[n];
    double[] weight = new double[n];
    for (int i = 0; i < n; i++) {
      double x = -Math.cos(Math.PI * (i + 0.75) / (n + 0.5));
      double slope = 1;
      for (int step = 0; step < 8; step++) {
        double p0 = 1;
        double p1 = x;
        for (int k = 2; k <= n; k++) {
          double p2 = ((2 * k - 1) * x * p1 - (k - 1) * p0) / k;
          p0 = p1;
          p1 = p2;
        }
        slope = n * (x * p1 - p0) / (x * x - 1);
        x -= p1 / slope;
      }
      node[i] = x;
      weight[i] = 2 / ((1 - x * x) * slope * slope);
    }
    return new double[][] {node, weight};
  }
}
