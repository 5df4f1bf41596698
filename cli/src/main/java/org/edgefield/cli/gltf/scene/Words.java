package org.edgefield.cli.gltf.scene;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.edgefield.field.result.HotSpot;
import org.edgefield.importer.brep.Part;

/** Numbers and names as the scene writes them. */
final class Words {
  private Words() {}

  /** A number with so many significant digits, never in powers of ten. */
  static String digits(double value, int significant) {
    if (value == 0 || !Double.isFinite(value)) {
      return value == 0 ? "0" : "-";
    }
    int decimals = significant - 1 - (int) Math.floor(Math.log10(Math.abs(value)));
    return String.format(Locale.ROOT, "%." + Math.max(0, Math.min(9, decimals)) + "f", value);
  }

  /** A field strength: "4.2 kV/mm". */
  static String field(double field_V_per_m) {
    return digits(field_V_per_m / 1e6, 2) + " kV/mm";
  }

  /** A length in millimetres: "R0.3" wants "0.3". */
  static String millimetres(double length_m) {
    String text = digits(length_m * 1e3, 3);
    return text.contains(".") ? text.replaceAll("0+$", "").replaceAll("\\.$", "") : text;
  }

  /** A voltage: "70.7 kV". */
  static String voltage(double voltage_V) {
    String text = digits(voltage_V / 1e3, 3);
    return (text.contains(".") ? text.replaceAll("0+$", "").replaceAll("\\.$", "") : text) + " kV";
  }

  /** A utilisation: two decimals below ten, cut and not rounded below 1 so that it stays below. */
  static String utilisation(double utilisation) {
    if (utilisation >= 10) {
      return digits(utilisation, 3);
    }
    double hundredths = 100 * utilisation;
    double rounded = utilisation < 1 ? Math.floor(hundredths) : Math.rint(hundredths);
    return String.format(Locale.ROOT, "%.2f", rounded / 100);
  }

  /**
   * What would mend a hot spot, each alone: "radius 12 mm, 62 % of the voltage, or gap 80 mm". Ways
   * that do not exist are left out.
   */
  static String cure(HotSpot.Cure cure) {
    List<String> ways = new ArrayList<>();
    if (Double.isFinite(cure.radius_m())) {
      ways.add("radius " + millimetres(cure.radius_m()) + " mm");
    }
    if (Double.isFinite(cure.voltageFactor())) {
      ways.add(digits(100 * cure.voltageFactor(), 2) + " % of the voltage");
    }
    if (Double.isFinite(cure.gap_m())) {
      ways.add("gap " + millimetres(cure.gap_m()) + " mm");
    }
    return String.join(" or ", ways);
  }

  /** A file's name without its folders: a heatmap that is passed on tells nothing of them. */
  static String fileName(String path) {
    return path.substring(Math.max(path.lastIndexOf('/'), path.lastIndexOf('\\')) + 1);
  }

  /** Where a hot spot is: "rounded edge R2 of Busbar L1". */
  static String place(HotSpot spot, Part part) {
    return spot.feature() + " of " + part.name();
  }
}
