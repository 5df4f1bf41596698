package org.edgefield.field.bem.surface;

/**
 * Six-node triangles: corners and side mid-points on the exact surface, quadratic in between.
 *
 * <pre>  x(l) = sum_i l_i (2 l_i - 1) c_i + 4 (l0 l1 m01 + l1 l2 m12 + l2 l0 m20)</pre>
 *
 * with barycentric coordinates l. Positions in metres.
 */
public final class CurvedTriangles {
  /** Doubles per triangle: three corners, then mid-points of sides 01, 12, 20. */
  public static final int STRIDE = 18;

  /** Bulge of a side over the longest side up to which a triangle counts as plane. */
  private static final double FLAT = 1e-9;

  private final double[] geometry;
  private final double[] centre;
  private final double[] diameter;
  private final double[] aspect;
  private final boolean[] flat;

  /**
   * Takes the geometry over.
   *
   * @param geometry {@link #STRIDE} doubles per triangle
   */
  public CurvedTriangles(double[] geometry) {
    this.geometry = geometry;
    int n = geometry.length / STRIDE;
    centre = new double[3 * n];
    diameter = new double[n];
    aspect = new double[n];
    flat = new boolean[n];
    for (int t = 0; t < n; t++) {
      measure(t);
    }
  }

  private void measure(int t) {
    int g = STRIDE * t;
    double longest = 0;
    for (int i = 0; i < 3; i++) {
      int a = g + 3 * i;
      int b = g + 3 * ((i + 1) % 3);
      double dx = geometry[a] - geometry[b];
      double dy = geometry[a + 1] - geometry[b + 1];
      double dz = geometry[a + 2] - geometry[b + 2];
      longest = Math.max(longest, Math.sqrt(dx * dx + dy * dy + dz * dz));
    }
    double[] p = new double[9];
    evaluate(t, 1 / 3.0, 1 / 3.0, p);
    System.arraycopy(p, 0, centre, 3 * t, 3);
    double area = 0.5 * cross(p);
    diameter[t] = longest;
    double bulge = 0;
    for (int i = 0; i < 9; i++) {
      double middle = (geometry[g + i] + geometry[g + (i + 3) % 9]) / 2;
      bulge = Math.max(bulge, Math.abs(geometry[g + 9 + i] - middle));
    }
    flat[t] = bulge < FLAT * longest;
    aspect[t] = Math.max(1, 0.433 * longest * longest / Math.max(area, 1e-300));
  }

  /** Number of triangles. */
  public int count() {
    return diameter.length;
  }

  /** Coordinate of a triangle's middle. */
  public double centre(int t, int axis) {
    return centre[3 * t + axis];
  }

  /** Longest side, metres. */
  public double diameter(int t) {
    return diameter[t];
  }

  /** Longest side against the height over it, 1 for an equilateral triangle. */
  public double aspect(int t) {
    return aspect[t];
  }

  /** Whether the triangle is plane with side mid-points half-way: its closed form is exact. */
  public boolean flat(int t) {
    return flat[t];
  }

  /** The raw geometry, {@link #STRIDE} doubles per triangle; read only. */
  public double[] geometry() {
    return geometry;
  }

  /**
   * Position and derivatives.
   *
   * @param t triangle
   * @param u barycentric coordinate of corner 1
   * @param v barycentric coordinate of corner 2
   * @param out position, dx/du, dx/dv: 9 doubles
   */
  public void evaluate(int t, double u, double v, double[] out) {
    double w = 1 - u - v;
    int g = STRIDE * t;
    double n0 = w * (2 * w - 1);
    double n1 = u * (2 * u - 1);
    double n2 = v * (2 * v - 1);
    double n3 = 4 * w * u;
    double n4 = 4 * u * v;
    double n5 = 4 * v * w;
    double a0 = 1 - 4 * w;
    double a1 = 4 * u - 1;
    double a3 = 4 * (w - u);
    double b2 = 4 * v - 1;
    double b5 = 4 * (w - v);
    for (int d = 0; d < 3; d++) {
      double c0 = geometry[g + d];
      double c1 = geometry[g + 3 + d];
      double c2 = geometry[g + 6 + d];
      double m0 = geometry[g + 9 + d];
      double m1 = geometry[g + 12 + d];
      double m2 = geometry[g + 15 + d];
      out[d] = n0 * c0 + n1 * c1 + n2 * c2 + n3 * m0 + n4 * m1 + n5 * m2;
      out[3 + d] = a0 * c0 + a1 * c1 + a3 * m0 + 4 * v * m1 - 4 * v * m2;
      out[6 + d] = a0 * c0 + b2 * c2 - 4 * u * m0 + 4 * u * m1 + b5 * m2;
    }
  }

  /** Length of dx/du x dx/dv in an {@link #evaluate} result: twice the area per unit of (u, v). */
  public static double cross(double[] p) {
    double x = p[4] * p[8] - p[5] * p[7];
    double y = p[5] * p[6] - p[3] * p[8];
    double z = p[3] * p[7] - p[4] * p[6];
    return Math.sqrt(x * x + y * y + z * z);
  }
}
