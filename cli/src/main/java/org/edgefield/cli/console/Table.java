package org.edgefield.cli.console;

import java.io.PrintStream;
import java.util.List;

/**
 * Plain columns that fit a width: the first column gives way, its entries are cut in the middle.
 * Where too little of it would be left, every row becomes a line with its name and a sentence with
 * the rest.
 */
public final class Table {
  private static final String GAP = "  ";
  private static final int LEAST = 16;

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
    if (width - others < Math.min(LEAST, room[0])) {
      rows.forEach(row -> stack(row, width, out));
      return;
    }
    room[0] = Math.min(room[0], width - others);
    line(heads, room, out);
    for (String[] row : rows) {
      line(row, room, out);
    }
  }

  private void stack(String[] row, int width, PrintStream out) {
    out.println(cut(row[0], width));
    StringBuilder rest = new StringBuilder();
    for (int c = 1; c < row.length; c++) {
      rest.append(c == 1 ? "  " : ", ").append(heads[c]).append(' ').append(row[c]);
    }
    out.println(Wrap.text(rest.toString(), width));
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
