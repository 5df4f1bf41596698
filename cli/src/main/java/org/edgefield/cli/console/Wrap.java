package org.edgefield.cli.console;

import java.util.regex.Pattern;

/** Breaks a sentence into lines that fit a width, at spaces; what has none stays whole. */
public final class Wrap {
  private static final Pattern COLOUR = Pattern.compile("\u001b\\[[0-9;]*m");
  private static final String INDENT = "  ";

  private Wrap() {}

  /** The lines, joined by line breaks; all but the first are indented. Colours take no room. */
  public static String text(String sentence, int width) {
    StringBuilder lines = new StringBuilder();
    String line = "";
    for (String word : sentence.split("(?<=[^ ]) (?=[^ ])", -1)) {
      String longer = line.isEmpty() ? word : line + " " + word;
      if (line.isBlank() || length(longer) <= width) {
        line = longer;
      } else {
        lines.append(line).append('\n');
        line = INDENT + word;
      }
    }
    return lines.append(line).toString();
  }

  private static int length(String text) {
    String plain = COLOUR.matcher(text).replaceAll("");
    return plain.codePointCount(0, plain.length());
  }
}
