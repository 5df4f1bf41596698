package org.edgefield.cli.colour;

/**
 * Colours of utilisation. Below the amber limit everything is a neutral grey that darkens as the
 * limit nears, so that nothing calm attracts the eye; from the amber limit on it is amber, from 1
 * on red. The three families are apart in lightness as well as in hue, and each starts with a step.
 *
 * <p>Colours are packed sRGB, 0xRRGGBB.
 */
public final class ColourScale {
  /** Utilisation at which the scale ends; beyond it the last colour holds. */
  public static final double END = 2.0;

  /** Utilisation up to which a place is calm in everybody's eyes. */
  public static final double CALM = 0.5;

  /** Colour of parts that take no part in the field. */
  public static final int NOT_ASSESSED = 0xece9e2;

  private static final int IDLE = 0xd3d9db;
  private static final int HALF = 0x9fafb7;
  private static final int NEARLY = 0x637985;
  private static final int AMBER_FIRST = 0xffbb1a;
  private static final int AMBER_LAST = 0xf79a00;
  private static final int RED_FIRST = 0xca1024;
  private static final int RED_LAST = 0x63001c;

  private final double amberLimit;

  /**
   * A scale for one amber limit.
   *
   * @param amberLimit utilisation from which a place counts as amber, above 0, at most 1
   * @throws IllegalArgumentException outside that range
   */
  public ColourScale(double amberLimit) {
    if (!(amberLimit > 0 && amberLimit <= 1)) {
      throw new IllegalArgumentException(
          "amber limit must be above 0 and at most 1: " + amberLimit);
    }
    this.amberLimit = amberLimit;
  }

  /** Utilisation from which a place counts as amber. */
  public double amberLimit() {
    return amberLimit;
  }

  /** Colour of a utilisation; negative counts as 0. */
  public int rgb(double utilisation) {
    if (utilisation >= 1) {
      return Srgb.mix(RED_FIRST, RED_LAST, Math.min(1, (utilisation - 1) / (END - 1)));
    }
    if (utilisation >= amberLimit) {
      return Srgb.mix(AMBER_FIRST, AMBER_LAST, (utilisation - amberLimit) / (1 - amberLimit));
    }
    double u = Math.max(0, utilisation);
    return u < CALM
        ? Srgb.mix(IDLE, HALF, u / CALM)
        : Srgb.mix(HALF, NEARLY, (u - CALM) / (1 - CALM));
  }

  /**
   * The scale as {@code count} equal steps from 0 to {@link #END}. A step that a limit falls into
   * takes the colour above the limit, so that a limit never shows late.
   */
  public int[] steps(int count) {
    int[] rgb = new int[count];
    double width = END / count;
    for (int i = 0; i < count; i++) {
      double from = i * width;
      double to = from + width;
      double u = from + width / 2;
      if (from < 1 && to > 1) {
        u = 1;
      } else if (from < amberLimit && to > amberLimit) {
        u = amberLimit;
      }
      rgb[i] = rgb(u);
    }
    return rgb;
  }
}
