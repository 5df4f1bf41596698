package org.edgefield.cli.colour;

/** Conversions between sRGB code values and linear light (IEC 61966-2-1 transfer function). */
public final class Srgb {
  private Srgb() {}

  /** Linear light 0 to 1 of an sRGB code value 0 to 255. */
  public static double linear(int code) {
    double c = code / 255.0;
    return c <= 0.04045 ? c / 12.92 : Math.pow((c + 0.055) / 1.055, 2.4);
  }

  /** Nearest sRGB code value 0 to 255 of linear light, clamped to 0 to 1. */
  public static int code(double linear) {
    double c = Math.max(0, Math.min(1, linear));
    double s = c <= 0.0031308 ? 12.92 * c : 1.055 * Math.pow(c, 1 / 2.4) - 0.055;
    return (int) Math.round(255 * s);
  }

  /** Red, green or blue (shift 16, 8 or 0) of a packed 0xRRGGBB colour. */
  public static int channel(int rgb, int shift) {
    return (rgb >> shift) & 0xff;
  }

  /** Mix of two packed colours in code values, {@code t} = 0 gives {@code a}. */
  public static int mix(int a, int b, double t) {
    int out = 0;
    for (int shift = 16; shift >= 0; shift -= 8) {
      double c = channel(a, shift) * (1 - t) + channel(b, shift) * t;
      out |= (int) Math.round(c) << shift;
    }
    return out;
  }
}
