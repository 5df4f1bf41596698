package org.edgefield.models.cases;

import java.util.List;
import org.edgefield.models.exact.isolated.Cube;
import org.edgefield.models.exact.isolated.OrthogonalSpheres;
import org.edgefield.models.exact.isolated.Sphere;
import org.edgefield.models.exact.isolated.Spheroid;
import org.edgefield.models.exact.isolated.Torus;
import org.edgefield.models.exact.spheres.TwoSpheres;

/** Capacitances that a solve must meet to 1e-4. */
public final class CapacitanceCases {
  private static final double MM = 1e-3;
  private static final double TOLERANCE = 1e-4;
  private static final String CLOSED = "closed form (memory, recomputed)";
  private static final String IMAGES = "Kelvin's image series; Smythe ch. 5 (memory, recomputed)";
  private static final String CUBE = "Helsing and Perfekt 2013 (8 digits seen)";
  private static final String ORTHOGONAL = "Maxwell's Treatise art. 168 (memory, recomputed)";

  private CapacitanceCases() {}

  /** All of them. */
  public static List<ValidationCase> all() {
    CaseBuilder to = new CaseBuilder(TOLERANCE);
    alone(to, "sphere-r50", new Sphere(50 * MM).capacitance_F(), CLOSED, "Sphere");
    for (int n : new int[] {2, 5, 10}) {
      double c = new Spheroid(100 * MM, 100 * MM / n).capacitance_F();
      alone(to, "prolate-" + n, c, CLOSED, "Prolate spheroid " + n + ":1");
    }
    for (int n : new int[] {5, 20}) {
      double c = new Spheroid(100 * MM / n, 100 * MM).capacitance_F();
      alone(to, "oblate-" + n, c, CLOSED, "Oblate spheroid " + n + ":1");
    }
    for (int n : new int[] {2, 3, 5, 10}) {
      alone(to, "torus-" + n, new Torus(10 * MM * n, 10 * MM).capacitance_F(), CLOSED, "Torus");
    }
    double cube = new Cube(100 * MM).capacitance_F();
    alone(to, "cube-100", cube, CUBE, "Cube");
    alone(to, "cube-100-halves", cube, CUBE, "Lower half", "Upper half");
    double overlapping = new OrthogonalSpheres(40 * MM, 30 * MM).capacitance_F();
    alone(to, "overlapping-spheres", overlapping, ORTHOGONAL, "Sphere A", "Sphere B");
    twoSpheres(to, "pair-gap-0.1", 50, 50, 5);
    twoSpheres(to, "pair-1-4-near", 10, 40, 10);
    return to.cases();
  }

  /** One electrode of one or more parts. */
  private static void alone(
      CaseBuilder to, String stem, double exact, String source, String... parts) {
    Terminal body = new Terminal("body", List.of(parts), 1);
    to.free(stem + ".step", List.of(body), new Quantity.Capacitance("body", "body"), exact, source);
  }

  private static void twoSpheres(
      CaseBuilder to, String stem, double a_mm, double b_mm, double gap_mm) {
    TwoSpheres pair = new TwoSpheres(a_mm * MM, b_mm * MM, gap_mm * MM);
    List<Terminal> spheres = List.of(Terminal.of("Sphere A", 1), Terminal.of("Sphere B", 0));
    String model = stem + ".step";
    capacitance(to, model, spheres, "Sphere A", "Sphere A", pair.c11_F());
    capacitance(to, model, spheres, "Sphere B", "Sphere A", pair.c12_F());
    capacitance(to, model, spheres, "Sphere B", "Sphere B", pair.c22_F());
  }

  private static void capacitance(
      CaseBuilder to,
      String model,
      List<Terminal> electrodes,
      String row,
      String column,
      double exact) {
    to.free(model, electrodes, new Quantity.Capacitance(row, column), exact, IMAGES);
  }
}
