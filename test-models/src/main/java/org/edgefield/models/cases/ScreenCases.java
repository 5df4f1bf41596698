package org.edgefield.models.cases;

import static org.edgefield.models.cases.CaseBuilder.peak;

import java.util.List;
import org.edgefield.models.exact.cylinders.CoaxialCylinders;
import org.edgefield.models.exact.isolated.Sphere;
import org.edgefield.models.exact.plane.ParallelPlates;
import org.edgefield.models.exact.spheres.ConcentricSpheres;
import org.edgefield.models.exact.spheres.TwoSpheres;

/**
 * Situations every designer meets, which the quick estimate must reproduce: the most voltage an
 * isolated sphere terminal holds at 3 MV/m, parallel plates, concentric spheres, coaxial cylinders;
 * two connected spheres far apart, whose fields are in the inverse ratio of their radii, and
 * irregular bodies, whose smallest radius leads. All of them are solved as well: the comparison of
 * estimate and solve holds their models.
 */
public final class ScreenCases {
  private static final double MM = 1e-3;
  private static final double KV = 1000;
  private static final double TOLERANCE = 1e-6;
  private static final double AIR_V_PER_M = 3e6;
  private static final String IMAGES = "Kelvin's image series; Smythe ch. 5 (memory, recomputed)";
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
    connectedSpheres(to);
    return to.cases();
  }

  /**
   * Field of the small sphere of {@link #connectedSpheres} over that of the large one: 100 / 25.
   */
  public static final double CONNECTED_RATIO = 4;

  /**
   * Irregular bodies at one potential and the feature that leads on each: a pear of R40 and R10,
   * and an angle bracket with fillets R1 to R8 whose flat sides have edges left sharp.
   */
  public static final List<Irregular> IRREGULAR =
      List.of(
          new Irregular("pear.step", List.of("rounded end R10", "sphere R40")),
          new Irregular(
              "l-bracket.step",
              List.of(
                  "sharp edge 90 deg", "rounded edge R1", "rounded edge R3", "rounded edge R5")));

  /**
   * An irregular body of one part.
   *
   * @param model file name in the step folder
   * @param byField its features by falling field, which is by rising radius
   */
  public record Irregular(String model, List<String> byField) {}

  /** Large and small sphere at one voltage, 4.9 m apart; the far poles lead by the images. */
  private static void connectedSpheres(CaseBuilder to) {
    List<Terminal> spheres =
        List.of(Terminal.of("Large sphere", KV), Terminal.of("Small sphere", KV));
    TwoSpheres exact = new TwoSpheres(100 * MM, 25 * MM, 4875 * MM);
    String model = "spheres-connected.step";
    to.free(model, spheres, peak("Large sphere"), exact.farPoleA_V_per_m(KV, KV), IMAGES);
    to.free(model, spheres, peak("Small sphere"), exact.farPoleB_V_per_m(KV, KV), IMAGES);
  }

  /** At the most voltage the terminal holds, its field is that of the air's strength. */
  private static void terminal(CaseBuilder to, String model, String part, double radius_m) {
    double most_V = new Sphere(radius_m).potentialAt_V(AIR_V_PER_M);
    List<Terminal> body = List.of(Terminal.of(part, most_V));
    to.free(model, body, peak(part), AIR_V_PER_M, TEXTBOOK);
  }
}
