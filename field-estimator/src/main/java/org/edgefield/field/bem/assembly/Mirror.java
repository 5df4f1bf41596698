package org.edgefield.field.bem.assembly;

/**
 * Earth plane as a mirror: a charge at y acts at x as itself and, with opposite sign, from its
 * image; the image's action at x equals the charge's own action at the image of x.
 *
 * @param axis 0 = x, 1 = y, 2 = z
 * @param offset_m position of the plane along the axis
 */
public record Mirror(int axis, double offset_m) {
  /** Images of points, 3 coordinates each. */
  public double[] image(double[] points) {
    double[] out = points.clone();
    for (int i = axis; i < out.length; i += 3) {
      out[i] = 2 * offset_m - out[i];
    }
    return out;
  }
}
