package org.edgefield.importer.step;

import java.io.ByteArrayOutputStream;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;

/**
 * One line of the reader process: a word and its fields, parted by tabs, control characters and
 * percent signs written as %XX.
 */
record ReaderLine(String word, List<String> fields) {
  static ReaderLine parse(String line) {
    List<String> fields = new ArrayList<>();
    for (String field : line.split("\t", -1)) {
      fields.add(unescaped(field));
    }
    return new ReaderLine(fields.get(0), List.copyOf(fields.subList(1, fields.size())));
  }

  /** The field, or "" where the line is shorter. */
  String field(int i) {
    return i < fields.size() ? fields.get(i) : "";
  }

  double number(int i) {
    return Double.parseDouble(field(i));
  }

  private static String unescaped(String field) {
    if (field.indexOf('%') < 0) {
      return field;
    }
    byte[] bytes = field.getBytes(StandardCharsets.UTF_8);
    ByteArrayOutputStream out = new ByteArrayOutputStream(bytes.length);
    for (int i = 0; i < bytes.length; i++) {
      if (bytes[i] == '%' && i + 2 < bytes.length) {
        out.write(Character.digit(bytes[i + 1], 16) << 4 | Character.digit(bytes[i + 2], 16));
        i += 2;
      } else {
        out.write(bytes[i]);
      }
    }
    return out.toString(StandardCharsets.UTF_8);
  }
}
