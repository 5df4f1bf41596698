package org.edgefield.cli.casefile;

import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.edgefield.cli.casefile.units.Dimension;
import org.edgefield.cli.casefile.units.Phasor;
import org.edgefield.cli.casefile.units.Quantities;
import org.edgefield.cli.casefile.units.QuantityException;
import org.edgefield.cli.casefile.yaml.Problems;
import org.edgefield.cli.casefile.yaml.Text;
import org.edgefield.cli.casefile.yaml.YamlMap;
import org.edgefield.field.gas.StandardAtmosphere;
import org.edgefield.field.job.Surroundings;

/** Reads the {@code surroundings} of a case file. */
final class SurroundingsReader {
  /** Temperature where none is given: 20 degC, the reference of IEC 60060-1. */
  static final double REFERENCE_K = 293.15;

  private static final Pattern PLANE = Pattern.compile("([xyz])\\s*=\\s*(.+)");
  private static final Pattern ALONG = Pattern.compile("(.+?)\\s+along\\s+([+-]?)([xyz])");

  private final Problems problems;

  SurroundingsReader(Problems problems) {
    this.problems = problems;
  }

  /** Dry air at sea level and 20 degC, nothing else around. */
  static Surroundings standard() {
    return new Surroundings(
        "air", StandardAtmosphere.SEA_LEVEL_PA, REFERENCE_K, Double.NaN, Double.NaN, null, null);
  }

  Surroundings read(YamlMap map) {
    String gas = map.text("gas").map(Text::value).orElse("air");
    double altitude_m =
        map.quantity(
            "altitude", Dimension.LENGTH, -500, 9000, "between -500 m and 9000 m", Double.NaN);
    double pressure_Pa =
        map.quantity(
            "pressure", Dimension.PRESSURE, 1e3, 1e6, "between 1 kPa and 10 bar", Double.NaN);
    if (map.has("altitude") && map.has("pressure")) {
      problems.add(
          map.placeOf("pressure"),
          "\"altitude\" and \"pressure\" say the same thing twice: keep one of them");
    }
    if (Double.isNaN(pressure_Pa)) {
      pressure_Pa =
          Double.isNaN(altitude_m)
              ? StandardAtmosphere.SEA_LEVEL_PA
              : StandardAtmosphere.pressure_Pa(altitude_m);
    }
    double temperature_K =
        map.quantity(
            "temperature",
            Dimension.TEMPERATURE,
            200,
            500,
            "between -73 degC and 227 degC",
            REFERENCE_K);
    double humidity =
        map.quantity(
            "humidity", Dimension.HUMIDITY, 0, 0.1, "between 0 g/m3 and 100 g/m3", Double.NaN);
    Surroundings.EarthPlane plane = map.text("earth plane").map(this::plane).orElse(null);
    double[] ambient = map.text("ambient field").map(this::ambient).orElse(null);
    map.refuseOthers();
    return new Surroundings(gas, pressure_Pa, temperature_K, humidity, altitude_m, plane, ambient);
  }

  private Surroundings.EarthPlane plane(Text text) {
    Matcher m = PLANE.matcher(text.value());
    if (!m.matches()) {
      problems.add(
          text.place(),
          "\"earth plane\" must name an axis and a position like  z = 0 mm, not " + text.value());
      return null;
    }
    return length(text, m.group(2))
        .map(offset -> new Surroundings.EarthPlane(axis(m.group(1)), offset))
        .orElse(null);
  }

  private Optional<Double> length(Text text, String length) {
    try {
      return Optional.of(Quantities.parse(length, Dimension.LENGTH));
    } catch (QuantityException e) {
      problems.add(text.place(), "\"earth plane\": " + e.getMessage());
      return Optional.empty();
    }
  }

  private double[] ambient(Text text) {
    Matcher m = ALONG.matcher(text.value());
    if (!m.matches()) {
      problems.add(
          text.place(),
          "\"ambient field\" must be a field strength and an axis like  20 kV/m along z, not "
              + text.value());
      return null;
    }
    try {
      double strength = Phasor.amplitude(m.group(1), Dimension.FIELD);
      double[] vector = new double[3];
      vector[axis(m.group(3))] = m.group(2).equals("-") ? -strength : strength;
      return vector;
    } catch (QuantityException e) {
      problems.add(text.place(), "\"ambient field\": " + e.getMessage());
      return null;
    }
  }

  private static int axis(String letter) {
    return letter.charAt(0) - 'x';
  }
}
