package org.edgefield.cli.gltf.scene;

import java.util.ArrayList;
import java.util.List;
import org.edgefield.cli.gltf.text.Canvas;

/** A page of text blocks, drawn from the top down; wraps and shortens to its width. */
final class Board {
  static final int WIDTH = 1024;
  static final int MARGIN = 44;
  static final int PAPER = 0xfbfaf6;
  static final int INK = 0x1e2529;
  static final int FAINT = 0x55636b;

  /** Rows of the picture; a power of two, as viewers like it. */
  static final int TALLEST = 2048;

  private static final int FRAME = 6;
  private final Canvas canvas = new Canvas(WIDTH, TALLEST, PAPER);
  private int y = MARGIN;

  /** Row at which the next block starts. */
  int y() {
    return y;
  }

  Canvas canvas() {
    return canvas;
  }

  /** Leaves room. */
  void skip(int rows) {
    y += rows;
  }

  /** Writes one line; what does not fit is cut off with dots. */
  void line(String text, double capital, int colour) {
    y += (int) Math.ceil(capital);
    canvas.text(fitted(text, capital, WIDTH - 2 * MARGIN), MARGIN, y, capital, colour);
    y += (int) Math.ceil(0.75 * capital);
  }

  /** Writes a paragraph on as many lines as it takes, at most {@code most}. */
  void paragraph(String text, double capital, int colour, int most) {
    List<String> lines = wrapped(text, capital, WIDTH - 2 * MARGIN);
    for (int i = 0; i < Math.min(most, lines.size()); i++) {
      boolean cut = i == most - 1 && lines.size() > most;
      line(cut ? lines.get(i) + " ..." : lines.get(i), capital, colour);
    }
  }

  /** Writes two lines' worth of a numbered entry: mark at the margin, text beside it. */
  void entry(String mark, String text, double capital, int colour) {
    int indent = (int) (2.6 * capital);
    List<String> lines = wrapped(text, capital, WIDTH - 2.0 * MARGIN - indent);
    for (int i = 0; i < Math.min(2, lines.size()); i++) {
      y += (int) Math.ceil(capital);
      if (i == 0) {
        canvas.text(mark, MARGIN, y, capital, colour);
      }
      String shown = i == 1 && lines.size() > 2 ? lines.get(i) + " ..." : lines.get(i);
      canvas.text(
          fitted(shown, capital, WIDTH - 2.0 * MARGIN - indent),
          (double) MARGIN + indent,
          y,
          capital,
          colour);
      y += (int) Math.ceil(0.65 * capital);
    }
    y += (int) Math.ceil(0.2 * capital);
  }

  /** Rows in use, with the margin at the foot. */
  int rows() {
    return Math.min(TALLEST, y + MARGIN - 14);
  }

  /** The page as PNG, framed; rows below {@link #rows} are blank. */
  byte[] png() {
    int rows = rows();
    canvas.fill(0, 0, WIDTH, FRAME, INK);
    canvas.fill(0, rows - FRAME, WIDTH, FRAME, INK);
    canvas.fill(0, 0, FRAME, rows, INK);
    canvas.fill(WIDTH - FRAME, 0, FRAME, rows, INK);
    return canvas.png();
  }

  private static String fitted(String text, double capital, double width) {
    if (Canvas.textWidth(text, capital) <= width) {
      return text;
    }
    int end = text.length();
    while (end > 0 && Canvas.textWidth(text.substring(0, end) + "...", capital) > width) {
      end = text.offsetByCodePoints(end, -1);
    }
    return text.substring(0, end) + "...";
  }

  private static List<String> wrapped(String text, double capital, double width) {
    List<String> lines = new ArrayList<>();
    StringBuilder line = new StringBuilder();
    for (String word : text.split(" ", -1)) {
      String longer = line.isEmpty() ? word : line + " " + word;
      if (!line.isEmpty() && Canvas.textWidth(longer, capital) > width) {
        lines.add(line.toString());
        line.setLength(0);
        longer = word;
      }
      line.setLength(0);
      line.append(longer);
    }
    lines.add(line.toString());
    return lines;
  }
}
