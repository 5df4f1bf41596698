package org.edgefield.cli.casefile;

import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.edgefield.cli.casefile.units.Dimension;
import org.edgefield.cli.casefile.units.Quantities;
import org.edgefield.cli.casefile.units.QuantityException;

/**
 * A length or a tolerance band of lengths, "0.2 mm to 0.5 mm".
 *
 * @param least_m lower end, metres
 * @param most_m upper end, metres
 */
record LengthBand(double least_m, double most_m) {
  private static final Pattern BAND = Pattern.compile("(.+?)\\s+(?:to|\\.\\.)\\s+(.+)");

  /** Reads a positive length or band. */
  static LengthBand parse(String text) throws QuantityException {
    Matcher m = BAND.matcher(text);
    double least = Quantities.parse(m.matches() ? m.group(1) : text, Dimension.LENGTH);
    double most = m.matches() ? Quantities.parse(m.group(2), Dimension.LENGTH) : least;
    if (!(least > 0)) {
      throw new QuantityException('"' + text + "\" must be above 0");
    }
    if (most < least) {
      throw new QuantityException('"' + text + "\" runs backwards: the smaller length comes first");
    }
    return new LengthBand(least, most);
  }
}
