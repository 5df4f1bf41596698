package org.edgefield.models.cases;

import static org.edgefield.models.cases.CaseBuilder.peak;

import java.util.List;
import org.edgefield.models.exact.ambient.SphereInField;
import org.edgefield.models.exact.ambient.SpheroidInField;
import org.edgefield.models.exact.cylinders.CoaxialCylinders;
import org.edgefield.models.exact.isolated.Sphere;
import org.edgefield.models.exact.isolated.Spheroid;
import org.edgefield.models.exact.isolated.Torus;
import org.edgefield.models.exact.plane.ParallelPlates;
import org.edgefield.models.exact.plane.SphereOverPlane;
import org.edgefield.models.exact.spheres.ConcentricSpheres;
import org.edgefield.models.exact.spheres.TwoSpheres;

/** Field strengths that a solve must meet, every body at 1 kV or in 1 kV/m. */
public final class FieldCases {
  private static final double KV = 1000;
  private static final double MM = 1e-3;
  private static final double TOLERANCE = 0.01;
  private static final String IMAGES = "Kelvin's image series; Smythe ch. 5 (memory, recomputed)";
  private static final String ELLIPSOID =
      "ellipsoid at a potential; Smythe ch. 5 (memory, recomputed)";
  private static final String IN_FIELD =
      "ellipsoid in a uniform field; Landau-Lifshitz sec. 4 (memory, recomputed)";
  private static final String TEXTBOOK = "textbook closed form (recomputed)";

  private FieldCases() {}

  /** All of them. */
  public static List<ValidationCase> all() {
    CaseBuilder to = new CaseBuilder(TOLERANCE);
    isolated(to);
    enclosed(to);
    pairs(to);
    overPlane(to);
    ambient(to);
    barInBox(to, 5, 39, 60.698);
    barInBox(to, 2, 42, 81.70);
    barInBox(to, 1, 44, 102.82);
    return to.cases();
  }

  private static void isolated(CaseBuilder to) {
    for (String model : List.of("sphere-r50", "sphere-r50-askew", "sphere-r50-nurbs")) {
      alone(to, model, "Sphere", new Sphere(50 * MM).field_V_per_m(KV), TEXTBOOK);
    }
    alone(to, "sphere-r2in", "Sphere", new Sphere(50.8 * MM).field_V_per_m(KV), TEXTBOOK);
    for (int n : new int[] {5, 10}) {
      Spheroid body = new Spheroid(100 * MM, 100 * MM / n);
      String part = "Prolate spheroid " + n + ":1";
      alone(to, "prolate-" + n, part, body.poleField_V_per_m(KV), ELLIPSOID);
      if (n == 5) {
        for (String copy : List.of("askew", "nurbs", "inch")) {
          alone(to, "prolate-5-" + copy, part, body.poleField_V_per_m(KV), ELLIPSOID);
        }
      }
    }
    double rim = new Spheroid(20 * MM, 100 * MM).equatorField_V_per_m(KV);
    alone(to, "oblate-5", "Oblate spheroid 5:1", rim, ELLIPSOID);
    String series = "toroidal harmonics (memory, recomputed)";
    for (int n : new int[] {2, 3, 5, 10}) {
      double exact = new Torus(10 * MM * n, 10 * MM).peakField_V_per_m(KV);
      alone(to, "torus-" + n, "Torus", exact, series);
      if (n == 3) {
        for (String copy : List.of("askew", "nurbs", "inch")) {
          alone(to, "torus-3-" + copy, "Torus", exact, series);
        }
      }
    }
  }

  private static void alone(CaseBuilder to, String stem, String part, double exact, String source) {
    to.free(stem + ".step", List.of(Terminal.of(part, KV)), peak(part), exact, source);
  }

  private static void enclosed(CaseBuilder to) {
    double inner = new ConcentricSpheres(50 * MM, 100 * MM).field_V_per_m(50 * MM, KV);
    to.free(
        "concentric-spheres.step",
        List.of(Terminal.of("Inner sphere", KV), Terminal.of("Outer shell", 0)),
        peak("Inner sphere"),
        inner,
        TEXTBOOK);
    CoaxialCylinders coaxial = new CoaxialCylinders(10 * MM, 50 * MM);
    List<Terminal> rodAndTube = List.of(Terminal.of("Rod", KV), Terminal.of("Tube", 0));
    String tube = "coaxial-cylinders.step";
    double onRod = coaxial.field_V_per_m(10 * MM, KV);
    double onTube = coaxial.field_V_per_m(50 * MM, KV);
    to.free(tube, rodAndTube, new Quantity.FieldAt("Rod", 10 * MM, 0, 0), onRod, TEXTBOOK);
    to.free(tube, rodAndTube, new Quantity.FieldAt("Tube", 50 * MM, 0, 0), onTube, TEXTBOOK);
    List<Terminal> plates = List.of(Terminal.of("Upper plate", KV), Terminal.of("Lower plate", 0));
    double between = new ParallelPlates(40 * MM).field_V_per_m(KV);
    Quantity middle = new Quantity.FieldAt("Upper plate", 0, 0, 20 * MM);
    to.free("parallel-plates.step", plates, middle, between, TEXTBOOK);
  }

  private static void pairs(CaseBuilder to) {
    pair(to, "pair-gap-0.1", 50, 50, 5);
    pair(to, "pair-gap-0.05", 50, 50, 2.5);
    pair(to, "pair-gap-0.1-metre", 50, 50, 5);
    alike(to, "pair-1-4-far", 10, 40, 400);
    alike(to, "pair-1-4-near", 10, 40, 10);
  }

  /** +V against -V, and one sphere earthed. */
  private static void pair(CaseBuilder to, String stem, double a_mm, double b_mm, double gap_mm) {
    TwoSpheres exact = new TwoSpheres(a_mm * MM, b_mm * MM, gap_mm * MM);
    double opposed = exact.facingPoleA_V_per_m(KV, -KV);
    double hot = exact.facingPoleA_V_per_m(KV, 0);
    double earthed = exact.facingPoleB_V_per_m(KV, 0);
    to.free(stem + ".step", spheres(-KV), peak("Sphere A"), opposed, IMAGES);
    to.free(stem + ".step", spheres(0), peak("Sphere A"), hot, IMAGES);
    to.free(stem + ".step", spheres(0), peak("Sphere B"), earthed, IMAGES);
  }

  /** Both at +V: the far poles carry the largest fields. */
  private static void alike(CaseBuilder to, String stem, double a_mm, double b_mm, double gap_mm) {
    TwoSpheres exact = new TwoSpheres(a_mm * MM, b_mm * MM, gap_mm * MM);
    double small = exact.farPoleA_V_per_m(KV, KV);
    double large = exact.farPoleB_V_per_m(KV, KV);
    to.free(stem + ".step", spheres(KV), peak("Sphere A"), small, IMAGES);
    to.free(stem + ".step", spheres(KV), peak("Sphere B"), large, IMAGES);
  }

  private static List<Terminal> spheres(double other_V) {
    return List.of(Terminal.of("Sphere A", KV), Terminal.of("Sphere B", other_V));
  }

  private static void overPlane(CaseBuilder to) {
    List<Terminal> sphere = List.of(Terminal.of("Sphere", KV));
    for (String ratio : List.of("0.1", "1", "10")) {
      double gap = 50 * MM * Double.parseDouble(ratio);
      double exact = new SphereOverPlane(50 * MM, gap).peakField_V_per_m(KV);
      String model = "sphere-over-plane-" + ratio + ".step";
      to.overPlane(model, sphere, peak("Sphere"), exact, IMAGES);
    }
  }

  private static void ambient(CaseBuilder to) {
    double ball = SphereInField.CONCENTRATION * KV;
    to.ambient("sphere-r50.step", "Sphere", false, KV, ball, TEXTBOOK);
    to.ambient("boss-1.step", "Boss", true, KV, ball, TEXTBOOK);
    for (int n : new int[] {2, 5, 10}) {
      double exact = KV * new SpheroidInField(n, 1).concentration();
      to.ambient("boss-" + n + ".step", "Boss", true, KV, exact, IN_FIELD);
      String part = "Prolate spheroid " + n + ":1";
      to.ambient("prolate-" + n + ".step", part, false, KV, exact, IN_FIELD);
    }
    for (String tip : List.of("0.5", "2", "10", "50", "250")) {
      double base = Math.sqrt(Double.parseDouble(tip) * MM);
      double exact = KV * new SpheroidInField(1, base).concentration();
      to.ambient("rod-1m-tip-r" + tip + ".step", "Rod", true, KV, exact, IN_FIELD);
    }
  }

  /**
   * Long edge of a bar in a box, half way along: no closed form, finite elements on the section.
   *
   * @param radius_mm edge radius
   * @param degrees place of the peak on the arc, from the bar's broad direction
   * @param exact_V_per_m peak at 1 V, to about 0.1 %
   */
  private static void barInBox(
      CaseBuilder to, int radius_mm, double degrees, double exact_V_per_m) {
    double angle = Math.toRadians(degrees);
    double x_mm = 10 - radius_mm + radius_mm * Math.sin(angle);
    double y_mm = 30 - radius_mm + radius_mm * Math.cos(angle);
    to.free(
        "bar-in-box-r" + radius_mm + ".step",
        List.of(Terminal.of("Bar", KV), Terminal.of("Box", 0)),
        new Quantity.FieldAt("Bar", x_mm * MM, y_mm * MM, 0),
        KV * exact_V_per_m,
        "finite elements on the cross-section, independent/bar_in_box_section.csv (recomputed)");
  }
}
