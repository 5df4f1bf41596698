package org.edgefield.field.gas;

/**
 * Field on the axis between two equal spheres, one at voltage, one earthed, by the series of image
 * charges (Kelvin and Maxwell; W. R. Smythe, Static and Dynamic Electricity, ch. 5; memory, digits
 * recomputed). Isolated pair: no floor, no shanks. Range: gaps from 0.01 to 2 radii to 1e-9.
 */
public final class SphereGapField implements FieldProfile {
  private static final int MOST_IMAGES = 4000;

  private final double radius_m;
  private final double[] charge = new double[MOST_IMAGES];
  private final double[] place = new double[MOST_IMAGES];
  private final int images;
  private final double pole;

  /**
   * A sphere gap.
   *
   * @param radius_m of both spheres
   * @param gap_m between them
   */
  public SphereGapField(double radius_m, double gap_m) {
    this.radius_m = radius_m;
    double distance = 2 * radius_m + gap_m;
    double q = radius_m;
    double x = 0;
    boolean first = true;
    int n = 0;
    while (n < MOST_IMAGES && Math.abs(q) > 1e-16 * radius_m) {
      charge[n] = q;
      place[n++] = x;
      double from = first ? distance - x : x;
      q = -q * radius_m / from;
      double image = radius_m * radius_m / from;
      x = first ? distance - image : image;
      first = !first;
    }
    images = n;
    pole = field(0);
  }

  private double field(double s) {
    double sum = 0;
    for (int i = 0; i < images; i++) {
      double d = radius_m + s - place[i];
      sum += charge[i] * Math.signum(d) / (d * d);
    }
    return sum;
  }

  /** Field at the pole of the sphere at voltage, per volt, 1/m. */
  public double poleFieldPerVolt() {
    return pole;
  }

  @Override
  public double share(double s_m) {
    return field(s_m) / pole;
  }
}
