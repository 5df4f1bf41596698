package org.edgefield.cli.casefile.units;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Units the case file knows; SI value = value * factor + offset. */
enum Unit {
  VOLT(Dimension.VOLTAGE, 1, "V"),
  KILOVOLT(Dimension.VOLTAGE, 1e3, "kV"),
  MEGAVOLT(Dimension.VOLTAGE, 1e6, "MV"),
  KILOVOLT_PER_MILLIMETRE(Dimension.FIELD, 1e6, "kV/mm"),
  KILOVOLT_PER_CENTIMETRE(Dimension.FIELD, 1e5, "kV/cm"),
  KILOVOLT_PER_METRE(Dimension.FIELD, 1e3, "kV/m"),
  MEGAVOLT_PER_METRE(Dimension.FIELD, 1e6, "MV/m"),
  VOLT_PER_MILLIMETRE(Dimension.FIELD, 1e3, "V/mm"),
  VOLT_PER_METRE(Dimension.FIELD, 1, "V/m"),
  MICROMETRE(Dimension.LENGTH, 1e-6, "um", "\u00b5m", "\u03bcm"),
  MILLIMETRE(Dimension.LENGTH, 1e-3, "mm"),
  CENTIMETRE(Dimension.LENGTH, 1e-2, "cm"),
  METRE(Dimension.LENGTH, 1, "m"),
  KILOMETRE(Dimension.LENGTH, 1e3, "km"),
  INCH(Dimension.LENGTH, 0.0254, "in", "inch"),
  FOOT(Dimension.LENGTH, 0.3048, "ft"),
  CELSIUS(Dimension.TEMPERATURE, 1, 273.15, "degC", "\u00b0C"),
  KELVIN(Dimension.TEMPERATURE, 1, "K"),
  FAHRENHEIT(Dimension.TEMPERATURE, 5.0 / 9.0, 273.15 - 32 * 5.0 / 9.0, "degF", "\u00b0F"),
  PASCAL(Dimension.PRESSURE, 1, "Pa"),
  HECTOPASCAL(Dimension.PRESSURE, 1e2, "hPa"),
  KILOPASCAL(Dimension.PRESSURE, 1e3, "kPa"),
  MEGAPASCAL(Dimension.PRESSURE, 1e6, "MPa"),
  MILLIBAR(Dimension.PRESSURE, 1e2, "mbar"),
  BAR(Dimension.PRESSURE, 1e5, "bar"),
  GRAM_PER_CUBIC_METRE(Dimension.HUMIDITY, 1e-3, "g/m3", "g/m\u00b3", "g/m^3"),
  DEGREE(Dimension.ANGLE, Math.PI / 180, "deg", "\u00b0"),
  RADIAN(Dimension.ANGLE, 1, "rad"),
  PERCENT(Dimension.RATIO, 0.01, "%");

  private final Dimension dimension;
  private final double factor;
  private final double offset;

  // Made by List.of, so it never changes.
  @SuppressWarnings("ImmutableEnumChecker")
  private final List<String> symbols;

  Unit(Dimension dimension, double factor, String... symbols) {
    this(dimension, factor, 0, symbols);
  }

  Unit(Dimension dimension, double factor, double offset, String... symbols) {
    this.dimension = dimension;
    this.factor = factor;
    this.offset = offset;
    this.symbols = List.of(symbols);
  }

  static Optional<Unit> of(String symbol) {
    return Arrays.stream(values()).filter(u -> u.symbols.contains(symbol)).findFirst();
  }

  /** Symbols of one kind of quantity, the first spelling of each unit. */
  static List<String> symbols(Dimension dimension) {
    return Arrays.stream(values())
        .filter(u -> u.dimension == dimension)
        .map(u -> u.symbols.get(0))
        .toList();
  }

  Dimension dimension() {
    return dimension;
  }

  double toSi(double value) {
    return value * factor + offset;
  }
}
