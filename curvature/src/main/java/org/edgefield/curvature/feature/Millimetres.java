package org.edgefield.curvature.feature;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/** Prints lengths for people: millimetres, four significant digits, no trailing zeros. */
final class Millimetres {
  private static final MathContext DIGITS = new MathContext(4, RoundingMode.HALF_EVEN);

  private Millimetres() {}

  /** A radius with its letter: "R2", "R0.3", "R19.05". */
  static String radius(double metres) {
    return "R" + of(metres);
  }

  /** A length without its unit. */
  static String of(double metres) {
    if (Double.isInfinite(metres) || Double.isNaN(metres)) {
      return Double.isNaN(metres) ? "unknown" : "infinite";
    }
    BigDecimal mm = BigDecimal.valueOf(metres).movePointRight(3);
    BigDecimal rounded =
        mm.precision() - mm.scale() > DIGITS.getPrecision()
            ? mm.setScale(0, RoundingMode.HALF_EVEN)
            : mm.round(DIGITS);
    return rounded.signum() == 0 ? "0" : rounded.stripTrailingZeros().toPlainString();
  }
}
