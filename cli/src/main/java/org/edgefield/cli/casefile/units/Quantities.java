package org.edgefield.cli.casefile.units;

import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.edgefield.cli.casefile.Nearest;

/** Reads quantities with units, such as "0.3 mm", into SI values. */
public final class Quantities {
  private static final Pattern NUMBER_AND_UNIT =
      Pattern.compile("([+-]?(?:[0-9]+\\.?[0-9]*|\\.[0-9]+)(?:[eE][+-]?[0-9]+)?)\\s*(.*)");
  private static final Pattern DECIMAL_COMMA = Pattern.compile("[+-]?[0-9]+,[0-9]+.*");

  private Quantities() {}

  /**
   * SI value of a text.
   *
   * @param text for example "0.3 mm"
   * @param expected what it must be
   * @throws QuantityException where it is something else; the message names what is expected
   */
  public static double parse(String text, Dimension expected) throws QuantityException {
    String trimmed = text.strip();
    if (DECIMAL_COMMA.matcher(trimmed).matches()) {
      throw new QuantityException(
          quoted(text) + " has a decimal comma; write " + trimmed.replaceFirst(",", "."));
    }
    Matcher m = NUMBER_AND_UNIT.matcher(trimmed);
    if (!m.matches()) {
      throw new QuantityException(quoted(text) + " is not " + wanted(expected));
    }
    double value = Double.parseDouble(m.group(1));
    String symbol = m.group(2);
    double si;
    if (symbol.isEmpty()) {
      if (expected != Dimension.RATIO) {
        throw new QuantityException(quoted(text) + " has no unit; expected " + wanted(expected));
      }
      si = value;
    } else {
      si = unit(text, symbol, expected).toSi(value);
    }
    if (!Double.isFinite(si)) {
      throw new QuantityException(quoted(text) + " is too large to be " + expected.text());
    }
    return si;
  }

  private static Unit unit(String text, String symbol, Dimension expected)
      throws QuantityException {
    Optional<Unit> unit = Unit.of(symbol);
    if (unit.isEmpty()) {
      List<String> known = Unit.symbols(expected);
      String hint =
          Nearest.to(symbol, known).map(near -> "; did you mean " + near + "?").orElse("");
      throw new QuantityException(
          "unknown unit in "
              + quoted(text)
              + hint
              + (hint.isEmpty() ? "; expected " + wanted(expected) : "")
              + (known.isEmpty() ? "" : " (units: " + String.join(", ", known) + ")"));
    }
    if (unit.get().dimension() != expected) {
      throw new QuantityException(
          quoted(text) + " is " + unit.get().dimension().text() + "; expected " + wanted(expected));
    }
    return unit.get();
  }

  private static String wanted(Dimension expected) {
    return expected.text() + " like " + expected.example();
  }

  private static String quoted(String text) {
    return '"' + text + '"';
  }
}
