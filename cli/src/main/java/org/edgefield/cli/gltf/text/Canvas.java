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

  /**
   * Draws the strokes of one glyph. A pixel takes the most that any stroke covers of it, so that
   * crossing strokes do not darken its rim twice.
   */
  private void glyph(
      float[][] strokes, double left, double base, double scale, double radius, int colour) {
    Cover cover = new Cover(strokes, left, base, scale, radius + 1);
    for (float[] p : strokes) {
      for (int i = 0; i + 3 < p.length; i += 2) {
        cover.add(
            left + p[i] * scale,
            base - p[i + 1] * scale,
            left + p[i + 2] * scale,
            base - p[i + 3] * scale,
            radius);
      }
    }
    for (int row = 0; row < cover.high; row++) {
      for (int column = 0; column < cover.wide; column++) {
        double share = Math.rint(SHADES * cover.share[row * cover.wide + column]) / SHADES;
        int x = cover.left + column;
        int y = cover.top + row;
        if (share > 0 && x >= 0 && x < width && y >= 0 && y < height) {
          rgb[y * width + x] = Srgb.mix(rgb[y * width + x], colour, share);
        }
      }
    }
  }

  /** Share of each pixel that a glyph covers. */
  private static final class Cover {
    final int left;
    final int top;
    final int wide;
    final int high;
    final float[] share;

    Cover(float[][] strokes, double left, double base, double scale, double margin) {
      double x0 = Double.POSITIVE_INFINITY;
      double y0 = Double.POSITIVE_INFINITY;
      double x1 = Double.NEGATIVE_INFINITY;
      double y1 = Double.NEGATIVE_INFINITY;
      for (float[] p : strokes) {
        for (int i = 0; i < p.length; i += 2) {
          x0 = Math.min(x0, left + p[i] * scale);
          x1 = Math.max(x1, left + p[i] * scale);
          y0 = Math.min(y0, base - p[i + 1] * scale);
          y1 = Math.max(y1, base - p[i + 1] * scale);
        }
      }
      this.left = (int) Math.floor(x0 - margin);
      this.top = (int) Math.floor(y0 - margin);
      this.wide = (int) Math.ceil(x1 + margin) - this.left + 1;
      this.high = (int) Math.ceil(y1 + margin) - this.top + 1;
      this.share = new float[wide * high];
    }

    /** Adds a straight stroke with round ends. */
    void add(double ax, double ay, double bx, double by, double radius) {
      double dx = bx - ax;
      double dy = by - ay;
      double length2 = dx * dx + dy * dy;
      double reach = radius + 1;
      int fromX = (int) Math.floor(Math.min(ax, bx) - reach);
      int toX = (int) Math.ceil(Math.max(ax, bx) + reach);
      int fromY = (int) Math.floor(Math.min(ay, by) - reach);
      int toY = (int) Math.ceil(Math.max(ay, by) + reach);
      for (int y = fromY; y <= toY; y++) {
        for (int x = fromX; x <= toX; x++) {
          double px = x + 0.5 - ax;
          double py = y + 0.5 - ay;
          double along = length2 == 0 ? 0 : (px * dx + py * dy) / length2;
          double t = Math.max(0, Math.min(1, along));
          double ex = px - t * dx;
          double ey = py - t * dy;
          double covered = Math.min(1, 0.5 + radius - Math.sqrt(ex * ex + ey * ey));
          int at = (y - top) * wide + x - left;
          share[at] = Math.max(share[at], (float) covered);
        }
      }
    }
  }

  /** The image as PNG. */
  public byte[] png() {
    return PngEncoder.encode(width, height, rgb);
  }
}
