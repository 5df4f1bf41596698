package org.edgefield.field.gas;

/**
 * Streamer inception field of a surface by its two principal curvatures, the other electrode far
 * away: the field falls as 1 / ((1 + k1 s)(1 + k2 s)). Tabulated once over the radius and the ratio
 * of the curvatures, within 0.3 % of the direct value. Radii are held between {@value
 * #LEAST_RADIUS_M} m, below which models part ways, and {@value #LARGEST_RADIUS_M} m; concave
 * directions count as flat.
 */
public final class SurfaceInception {
  static final double LEAST_RADIUS_M = 1e-4;
  static final double LARGEST_RADIUS_M = 3;

  private static final int RADII = 46;
  private static final int RATIOS = 5;
  private static final double FAR_M = 3;

  private final double[] table = new double[RADII * RATIOS];

  /** Tabulates a criterion. */
  public SurfaceInception(StreamerCriterion criterion) {
    for (int i = 0; i < RADII; i++) {
      double k = 1 / radius(i);
      for (int j = 0; j < RATIOS; j++) {
        double k2 = k * j / (RATIOS - 1);
        table[i * RATIOS + j] =
            Math.log(
                criterion.inceptionField_V_per_m(s -> 1 / ((1 + k * s) * (1 + k2 * s)), FAR_M));
      }
    }
  }

  private static double radius(int i) {
    return LEAST_RADIUS_M * Math.pow(LARGEST_RADIUS_M / LEAST_RADIUS_M, i / (RADII - 1.0));
  }

  /**
   * Inception field.
   *
   * @param k1 larger curvature, 1/m
   * @param k2 smaller curvature, 1/m
   * @return V/m
   */
  public double at_V_per_m(double k1, double k2) {
    double r = k1 > 0 ? 1 / k1 : LARGEST_RADIUS_M;
    double held = Math.min(Math.max(r, LEAST_RADIUS_M), LARGEST_RADIUS_M);
    double x =
        Math.log(held / LEAST_RADIUS_M) / Math.log(LARGEST_RADIUS_M / LEAST_RADIUS_M) * (RADII - 1);
    double y = (k1 > 0 ? Math.min(1, Math.max(0, k2 / k1)) : 0) * (RATIOS - 1);
    int i = Math.min((int) x, RADII - 2);
    int j = Math.min((int) y, RATIOS - 2);
    double u = x - i;
    double v = y - j;
    int at = i * RATIOS + j;
    return Math.exp(
        (1 - u) * ((1 - v) * table[at] + v * table[at + 1])
            + u * ((1 - v) * table[at + RATIOS] + v * table[at + RATIOS + 1]));
  }
}
