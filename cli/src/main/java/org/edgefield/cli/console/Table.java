package org.edgefield.cli.console;

import java.io.PrintStream;
import java.util.List;

/**
 * Plain columns that fit a width: the first column gives way, its entries are cut in the middle.
 */
public final class Table {
  private static final String GAP = "  ";
  private static final int LEAST = 8;

  private final String[] heads;

  /** A table with these column heads. */
  public Table(String... heads) {
    this.heads = heads.clone();
  }

  /** Prints head and rows. */
  public void print(List<String[]> rows, int width, PrintStream out) {
    int[] room = new int[heads.length];
    for (int c = 0; c < heads.length; c++) {
      room[c] = length(heads[c]);
      for (String[] row : rows) {
        room[c] = Math.max(room[c], length(row[c]));
      }
    }
    int others = 0;
    for (int c = 1; c < room.length; c++) {
      others += room[c] + GAP.length();
    }
    room[0] = Math.max(LEAST, Math.min(room[0], width - others));
    line(heads, room, out);
    for (String[] row : rows) {
      line(row, room, out);
    }
  }

  private static void line(String[] cells, int[] room, PrintStream out) {
    StringBuilder text = new StringBuilder();
    for (int c = 0; c < cells.length; c++) {
      String cell = c == 0 ? cut(cells[c], room[c]) : cells[c];
      text.append(cell);
      if (c + 1 < cells.length) {
        text.append(" ".repeat(room[c] - length(cell))).append(GAP);
      }
    }
    out.println(text);
  }

  /** Text of at most n characters, the middle replaced by "..." where it is longer. */
  public static String cut(String text, int n) {
    if (length(text) <= n) {
      return text;
    }
    int[] points = text.codePoints().toArray();
    int head = (n - 2) / 2;
    int tail = n - 3 - head;
    return new String(points, 0, head) + "..." + new String(points, points.length - tail, tail);
  }

  private static int length(String text) {
    return text.codePointCount(0, text.length());
  }
}
