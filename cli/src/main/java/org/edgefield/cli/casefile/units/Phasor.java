package org.edgefield.cli.casefile.units;

import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A voltage as a peak phasor, volts: "10 kV" is a peak or DC value, "24 kV rms" is multiplied by
 * sqrt 2, "24 kV rms @ -120 deg" is turned by the angle.
 *
 * @param real_V in-phase peak
 * @param imaginary_V quadrature peak
 */
public record Phasor(double real_V, double imaginary_V) {
  private static final Pattern SUFFIX = Pattern.compile("(.*?)(?:\\s+(rms|peak|dc|DC))?");

  /**
   * Reads a voltage.
   *
   * @throws QuantityException where the text is no voltage
   */
  public static Phasor parse(String text) throws QuantityException {
    int at = text.indexOf('@');
    double amplitude =
        amplitude((at < 0 ? text : text.substring(0, at)).strip(), Dimension.VOLTAGE);
    if (at < 0) {
      return new Phasor(amplitude, 0);
    }
    double angle = Quantities.parse(text.substring(at + 1), Dimension.ANGLE);
    return new Phasor(amplitude * exactCos(angle), amplitude * exactCos(angle - Math.PI / 2));
  }

  /**
   * Peak value of a text that may end in "rms" or "peak".
   *
   * @throws QuantityException where the text is not of that kind
   */
  public static double amplitude(String text, Dimension expected) throws QuantityException {
    Matcher m = SUFFIX.matcher(text);
    if (!m.matches()) {
      throw new QuantityException('"' + text + "\" is not " + expected.text());
    }
    double value = Quantities.parse(m.group(1), expected);
    return "rms".equals(m.group(2)) ? value * Math.sqrt(2) : value;
  }

  /** Peak value, volts. */
  public double peak_V() {
    return Math.hypot(real_V, imaginary_V);
  }

  // A quarter turn must give a clean zero, so that 0, 90 and 180 degrees leave no dust behind.
  private static double exactCos(double angle) {
    double c = Math.cos(angle);
    return Math.abs(c) < 1e-15 ? 0 : c;
  }
}
