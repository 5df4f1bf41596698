package org.edgefield.cli.report;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.edgefield.cli.report.Report.Spot;

/** Quantities for people: three significant digits and the unit a designer would choose. */
public final class Human {
  private Human() {}

  /** Three significant digits without exponent, trailing zeros kept out. */
  public static String number(double value) {
    if (!Double.isFinite(value)) {
      return "-";
    }
    BigDecimal rounded = new BigDecimal(value).round(new MathContext(3));
    return rounded.signum() == 0 ? "0" : rounded.stripTrailingZeros().toPlainString();
  }

  /** Field strength in kV/mm, "4.21 kV/mm". */
  public static String field(double field_V_per_m) {
    return number(field_V_per_m * 1e-6) + " kV/mm";
  }

  /** Length in mm, "0.3 mm"; "none" where infinite. */
  public static String length(double length_m) {
    return Double.isInfinite(length_m) ? "none" : number(length_m * 1e3) + " mm";
  }

  /** Voltage in V below 1 kV, in kV above. */
  public static String voltage(double voltage_V) {
    return Math.abs(voltage_V) < 1000 ? number(voltage_V) + " V" : number(voltage_V * 1e-3) + " kV";
  }

  /** Utilisation with two decimals, "1.42"; three significant digits from 10. */
  public static String utilisation(double utilisation) {
    return utilisation < 10
        ? String.format(Locale.ROOT, "%.2f", Math.floor(utilisation * 100 + 0.5) / 100)
        : number(utilisation);
  }

  /** Percentage, "8 %". */
  public static String percent(double fraction) {
    return number(fraction * 100) + " %";
  }

  /** Area or length of a region. */
  public static String size(Spot spot) {
    return Double.isNaN(spot.length_m())
        ? number(spot.area_m2() * 1e6) + " mm2"
        : length(spot.length_m());
  }

  /** Point in mm, "(12, 0.5, -3)". */
  public static String point(double[] at_m) {
    return String.format(
        Locale.ROOT, "(%.1f, %.1f, %.1f) mm", at_m[0] * 1e3, at_m[1] * 1e3, at_m[2] * 1e3);
  }

  /**
   * One line on what would mend a red spot, each alone: radius, voltage, gap; for others what
   * voltage they would bear.
   */
  public static String cure(Spot spot) {
    String voltage =
        "voltage to "
            + voltage(spot.cure().voltage_V())
            + " peak (x "
            + number(spot.cure().voltageFactor())
            + ")";
    if (spot.state() != Verdict.RED) {
      return "passes up to " + voltage.substring("voltage to ".length());
    }
    List<String> ways = new ArrayList<>();
    if (Double.isFinite(spot.cure().radius_m())) {
      ways.add("radius to " + length(spot.cure().radius_m()));
    }
    ways.add(voltage);
    if (Double.isFinite(spot.cure().gap_m())) {
      ways.add("gap to " + length(spot.cure().gap_m()));
    }
    return "cure: " + String.join(", or ", ways);
  }
}
