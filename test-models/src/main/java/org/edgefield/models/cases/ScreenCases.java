package org.edgefield.models.cases;

import static org.edgefield.models.cases.CaseBuilder.peak;

import java.util.List;
import org.edgefield.models.exact.cylinders.CoaxialCylinders;
import org.edgefield.models.exact.isolated.Sphere;
import org.edgefield.models.exact.plane.ParallelPlates;
import org.edgefield.models.exact.spheres.ConcentricSpheres;

/**
 * Situations every designer meets, which the quick estimate must reproduce: the most voltage an
 * isolated sphere terminal holds at 3 MV/m, parallel plates, concentric spheres, coaxial cylinders.
 */
public final class ScreenCases {
  private static final double MM = 1e-3;
  private static final double KV = 1000;
  private static final double TOLERANCE = 1e-6;
  private static final double AIR_V_PER_M = 3e6;
  private static final String TEXTBOOK = "textbook closed form (recomputed)";

  private ScreenCases() {}

  /** All of them. */
  public static List<ValidationCase> all() {
    CaseBuilder to = new CaseBuilder(TOLERANCE);
    terminal(to, "sphere-r100.step", "Sphere terminal", 0.1);
    terminal(to, "sphere-r250.step", "Sphere terminal", 0.25);
    terminal(to, "sphere-r1m.step", "Sphere", 1);
    List<Terminal> plates = List.of(Terminal.of("Upper plate", KV), Terminal.of("Lower plate", 0));
    Quantity middle = new Quantity.FieldAt("Upper plate", 0, 0, 20 * MM);
    double plate = new ParallelPlates(40 * MM).field_V_per_m(KV);
    to.free("parallel-plates.step", plates, middle, plate, TEXTBOOK);
    List<Terminal> shells = List.of(Terminal.of("Inner sphere", KV), Terminal.of("Outer shell", 0));
    double inner = new ConcentricSpheres(50 * MM, 100 * MM).field_V_per_m(50 * MM, KV);
    to.free("concentric-spheres.step", shells, peak("Inner sphere"), inner, TEXTBOOK);
    List<Terminal> rod = List.of(Terminal.of("Rod", KV), Terminal.of("Tube", 0));
    double onRod = new CoaxialCylinders(10 * MM, 50 * MM).field_V_per_m(10 * MM, KV);
    Quantity midRod = new Quantity.FieldAt("Rod", 10 * MM, 0, 0);
    to.free("coaxial-cylinders.step", rod, midRod, onRod, TEXTBOOK);
    return to.cases();
  }

  /** At the most voltage the terminal holds, its field is that of the air's strength. */
  private static void terminal(CaseBuilder to, String model, String part, double radius_m) {
    double most_V = new Sphere(radius_m).potentialAt_V(AIR_V_PER_M);
    List<Terminal> body = List.of(Terminal.of(part, most_V));
    to.free(model, body, peak(part), AIR_V_PER_M, TEXTBOOK);
  }
}
