package org.edgefield.field.bem.quadrature;

/**
 * Symmetric Gauss rules on the triangle, weights summing to 1/2 (the area in (u, v)).
 *
 * <p>Three points, degree 2, and seven points, degree 5: Strang and Fix 1973; Radon 1948 (memory;
 * exactness is tested).
 *
 * @param u barycentric coordinate of corner 1 per point
 * @param v barycentric coordinate of corner 2 per point
 * @param weight weight per point
 */
public record TriangleRule(double[] u, double[] v, double[] weight) {
  /** Three interior points, exact to degree 2. */
  public static final TriangleRule THREE =
      new TriangleRule(
          new double[] {1 / 6.0, 2 / 3.0, 1 / 6.0},
          new double[] {1 / 6.0, 1 / 6.0, 2 / 3.0},
          new double[] {1 / 6.0, 1 / 6.0, 1 / 6.0});

  /** Seven points, exact to degree 5. */
  public static final TriangleRule SEVEN = seven();

  /** Seven points on each of 4 similar triangles. */
  public static final TriangleRule SEVEN_BY_4 = SEVEN.split();

  /** Seven points on each of 16 similar triangles. */
  public static final TriangleRule SEVEN_BY_16 = SEVEN_BY_4.split();

  private static TriangleRule seven() {
    double s = Math.sqrt(15);
    double a = (6 - s) / 21;
    double b = (6 + s) / 21;
    double wa = (155 - s) / 2400;
    double wb = (155 + s) / 2400;
    return new TriangleRule(
        new double[] {1 / 3.0, a, 1 - 2 * a, a, b, 1 - 2 * b, b},
        new double[] {1 / 3.0, a, a, 1 - 2 * a, b, b, 1 - 2 * b},
        new double[] {9 / 80.0, wa, wa, wa, wb, wb, wb});
  }

  /** Number of points. */
  public int count() {
    return weight.length;
  }

  /** The same rule on the four triangles between corners and mid-points. */
  private TriangleRule split() {
    int n = count();
    double[] uu = new double[4 * n];
    double[] vv = new double[4 * n];
    double[] ww = new double[4 * n];
    double[][] origin = {{0, 0}, {0.5, 0}, {0, 0.5}, {0.5, 0.5}};
    for (int k = 0; k < 4; k++) {
      double h = k == 3 ? -0.5 : 0.5;
      for (int i = 0; i < n; i++) {
        uu[k * n + i] = origin[k][0] + h * u[i];
        vv[k * n + i] = origin[k][1] + h * v[i];
        ww[k * n + i] = weight[i] / 4;
      }
    }
    return new TriangleRule(uu, vv, ww);
  }
}
