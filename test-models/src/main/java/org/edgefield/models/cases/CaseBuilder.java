package org.edgefield.models.cases;

import java.util.ArrayList;
import java.util.List;

/** Collects the cases of one group with what they have in common. */
final class CaseBuilder {
  private final List<ValidationCase> cases = new ArrayList<>();
  private final double tolerance;

  CaseBuilder(double tolerance) {
    this.tolerance = tolerance;
  }

  /** A case in free space. */
  void free(
      String model, List<Terminal> electrodes, Quantity quantity, double exact, String source) {
    add(model, electrodes, false, 0, quantity, exact, source);
  }

  /** A case over the earthed plane z = 0. */
  void overPlane(
      String model, List<Terminal> electrodes, Quantity quantity, double exact, String source) {
    add(model, electrodes, true, 0, quantity, exact, source);
  }

  /** An earthed body of one part in an ambient field along z, with or without the earthed plane. */
  void ambient(
      String model, String part, boolean plane, double field_V_per_m, double exact, String source) {
    Terminal body = Terminal.of(part, 0);
    add(model, List.of(body), plane, field_V_per_m, peak(part), exact, source);
  }

  List<ValidationCase> cases() {
    return List.copyOf(cases);
  }

  static Quantity peak(String electrode) {
    return new Quantity.PeakField(electrode);
  }

  private void add(
      String model,
      List<Terminal> electrodes,
      boolean plane,
      double ambient,
      Quantity quantity,
      double exact,
      String source) {
    String stem = model.substring(0, model.lastIndexOf('.'));
    String name = stem + setting(electrodes, ambient) + ": " + describe(quantity);
    cases.add(
        new ValidationCase(
            name, model, electrodes, plane, ambient, quantity, exact, tolerance, source));
  }

  private static String setting(List<Terminal> electrodes, double ambient) {
    if (ambient != 0) {
      return " in a uniform field";
    }
    double second_V = electrodes.size() > 1 ? electrodes.get(1).voltage_V() : 0;
    return second_V > 0 ? " at equal voltages" : second_V < 0 ? " at opposed voltages" : "";
  }

  private static String describe(Quantity quantity) {
    if (quantity instanceof Quantity.PeakField p) {
      return "peak field of " + p.electrode();
    }
    if (quantity instanceof Quantity.FieldAt f) {
      return "field in the middle of " + f.electrode();
    }
    Quantity.Capacitance c = (Quantity.Capacitance) quantity;
    return "capacitance of " + c.row() + " with " + c.column();
  }
}
