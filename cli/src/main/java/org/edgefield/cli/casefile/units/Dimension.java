package org.edgefield.cli.casefile.units;

/** Kind of a physical quantity in the case file. */
public enum Dimension {
  VOLTAGE("a voltage", "10 kV"),
  FIELD("a field strength", "3 kV/mm"),
  LENGTH("a length", "0.3 mm"),
  TEMPERATURE("a temperature", "40 degC"),
  PRESSURE("a pressure", "95 kPa"),
  HUMIDITY("an absolute humidity", "11 g/m3"),
  ANGLE("an angle", "120 deg"),
  RATIO("a plain number", "0.8");

  private final String text;
  private final String example;

  Dimension(String text, String example) {
    this.text = text;
    this.example = example;
  }

  /** With its article, for messages: "a voltage". */
  public String text() {
    return text;
  }

  /** How it is written: "10 kV". */
  public String example() {
    return example;
  }
}
