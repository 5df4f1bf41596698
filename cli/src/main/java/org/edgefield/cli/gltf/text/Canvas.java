package org.edgefield.cli.gltf.text;

import java.util.Arrays;
import org.edgefield.cli.colour.Srgb;

/** A small image to draw rectangles and stroke text on; pixels from the top left. */
public final class Canvas {
  private static final double PEN = 0.15;

  /** Shades of a rim; few, so that the picture packs well. */
  private static final double SHADES = 10;

  private final int width;
  private final int height;
  private final int[] rgb;

  /** An image filled with one colour (0xRRGGBB). */
  public Canvas(int width, int height, int background) {
    this.width = width;
    this.height = height;
    this.rgb = new int[width * height];
    Arrays.fill(rgb, background);
  }

  /** Fills a rectangle; parts outside the image are cut off. */
  public void fill(int left, int top, int wide, int high, int colour) {
    for (int y = Math.max(0, top); y < Math.min(height, top + high); y++) {
      int from = Math.max(0, left);
      int to = Math.min(width, left + wide);
      if (from < to) {
        Arrays.fill(rgb, y * width + from, y * width + to, colour);
      }
    }
  }

  /** Width in pixels of a text whose capitals are {@code capital} pixels high. */
  public static double textWidth(String text, double capital) {
    return StrokeFont.line(text).width() * capital;
  }

  /**
   * Draws one line of text.
   *
   * @param text any text; unknown characters become boxes
   * @param left first pixel
   * @param baseLine pixel row of the base line
   * @param capital height of capitals in pixels
   * @param colour 0xRRGGBB
   */
  public void text(String text, double left, double baseLine, double capital, int colour) {
    double radius = Math.max(0.75, PEN * capital / 2);
    for (float[][] glyph : StrokeFont.line(text).strokes()) {
      glyph(glyph, left, baseLine, capital, radius, colour);
    }
  }

  private void glyph(
      float[][] strokes, double left, double base, double scale, double radius, int colour) {
    double x0 = Double.POSITIVE_INFINITY;
    double y0 = Double.POSITIVE_INFINITY;
    double x1 = Double.NEGATIVE_INFINITY;
    double y1 = Double.NEGATIVE_INFINITY;
    double[][] lines = new double[strokes.length][];
    for (int s = 0; s < strokes.length; s++) {
      lines[s] = new double[strokes[s].length];
      for (int i = 0; i < strokes[s].length; i += 2) {
        double x = left + strokes[s][i] * scale;
        double y = base - strokes[s][i + 1] * scale;
        lines[s][i] = x;
        lines[s][i + 1] = y;
        x0 = Math.min(x0, x);
        x1 = Math.max(x1, x);
        y0 = Math.min(y0, y);
        y1 = Math.max(y1, y);
      }
    }
    int fromX = Math.max(0, (int) Math.floor(x0 - radius - 1));
    int toX = Math.min(width - 1, (int) Math.ceil(x1 + radius + 1));
    int fromY = Math.max(0, (int) Math.floor(y0 - radius - 1));
    int toY = Math.min(height - 1, (int) Math.ceil(y1 + radius + 1));
    for (int y = fromY; y <= toY; y++) {
      for (int x = fromX; x <= toX; x++) {
        double cover = 0.5 + radius - distance(lines, x + 0.5, y + 0.5);
        if (cover > 0) {
          int at = y * width + x;
          rgb[at] = Srgb.mix(rgb[at], colour, Math.min(1, Math.rint(SHADES * cover) / SHADES));
        }
      }
    }
  }

  private static double distance(double[][] lines, double x, double y) {
    double least = Double.POSITIVE_INFINITY;
    for (double[] p : lines) {
      for (int i = 0; i + 3 < p.length; i += 2) {
        double dx = p[i + 2] - p[i];
        double dy = p[i + 3] - p[i + 1];
        double length2 = dx * dx + dy * dy;
        double t = length2 == 0 ? 0 : ((x - p[i]) * dx + (y - p[i + 1]) * dy) / length2;
        double clamped = Math.max(0, Math.min(1, t));
        double ex = x - p[i] - clamped * dx;
        double ey = y - p[i + 1] - clamped * dy;
        least = Math.min(least, ex * ex + ey * ey);
      }
    }
    return Math.sqrt(least);
  }

  /** The image as PNG. */
  public byte[] png() {
    return PngEncoder.encode(width, height, rgb);
  }
}
