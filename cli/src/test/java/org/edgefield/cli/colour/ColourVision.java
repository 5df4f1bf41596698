package org.edgefield.cli.colour;

import java.util.Arrays;
import java.util.List;

/**
 * How a colour looks to readers with and without colour-blindness. Matrices on linear sRGB for full
 * severity: G. M. Machado, M. M. Oliveira, L. A. F. Fernandes, "A physiologically-based model for
 * simulation of color vision deficiency", IEEE TVCG 15(6), 2009 (from memory; rows sum to 1, so
 * greys stay grey).
 */
@SuppressWarnings("ImmutableEnumChecker") // the list is
enum ColourVision {
  TYPICAL(1, 0, 0, 0, 1, 0, 0, 0, 1),
  PROTANOPIA(
      0.152286, 1.052583, -0.204868, 0.114503, 0.786281, 0.099216, -0.003882, -0.048116, 1.051998),
  DEUTERANOPIA(
      0.367322, 0.860646, -0.227968, 0.280085, 0.672501, 0.047413, -0.011820, 0.042940, 0.968881),
  TRITANOPIA(
      1.255528, -0.076749, -0.178779, -0.078411, 0.930809, 0.147602, 0.004733, 0.691367, 0.303900),
  /** No colour at all: a grey print. Luminance weights of ITU-R BT.709. */
  GREY(0.2126, 0.7152, 0.0722, 0.2126, 0.7152, 0.0722, 0.2126, 0.7152, 0.0722);

  private final List<Double> matrix;

  ColourVision(double... matrix) {
    this.matrix = Arrays.stream(matrix).boxed().toList();
  }

  /** Entry of the matrix. */
  double entry(int row, int column) {
    return matrix.get(3 * row + column);
  }

  /**
   * CIELAB (D65) of a colour as seen with this vision.
   *
   * @param rgb packed sRGB
   * @param brightness factor on linear light
   */
  double[] lab(int rgb, double brightness) {
    double[] in = new double[3];
    for (int c = 0; c < 3; c++) {
      in[c] = brightness * Srgb.linear(Srgb.channel(rgb, 16 - 8 * c));
    }
    double[] seen = new double[3];
    for (int r = 0; r < 3; r++) {
      for (int c = 0; c < 3; c++) {
        seen[r] += entry(r, c) * in[c];
      }
      seen[r] = Math.max(0, Math.min(1, seen[r]));
    }
    double x = (0.4124 * seen[0] + 0.3576 * seen[1] + 0.1805 * seen[2]) / 0.9505;
    double y = 0.2126 * seen[0] + 0.7152 * seen[1] + 0.0722 * seen[2];
    double z = (0.0193 * seen[0] + 0.1192 * seen[1] + 0.9505 * seen[2]) / 1.089;
    return new double[] {116 * f(y) - 16, 500 * (f(x) - f(y)), 200 * (f(y) - f(z))};
  }

  private static double f(double t) {
    return t > 216.0 / 24389 ? Math.cbrt(t) : (24389.0 / 27 * t + 16) / 116;
  }

  /** Colour difference CIE 1976. */
  static double difference(double[] a, double[] b) {
    return Math.sqrt(
        (a[0] - b[0]) * (a[0] - b[0])
            + (a[1] - b[1]) * (a[1] - b[1])
            + (a[2] - b[2]) * (a[2] - b[2]));
  }
}
