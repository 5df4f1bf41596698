package org.edgefield.field.bem.validation;

import java.util.List;
import org.assertj.core.api.SoftAssertions;
import org.edgefield.field.bem.solve.SolveSettings;
import org.edgefield.importer.mesh.MeshSettings;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * What is predicted for an edge drawn sharp against direct solves of copies of the body that have
 * that edge rounded. Tolerances: 2 % up to r/t = 0.05, 4 % at 0.1.
 */
@Tag("slow")
class SharpAgainstRoundedTest {
  private static final SolveSettings SETTINGS = new SolveSettings(0.005, 30, 4L << 30, 2);

  /** Slim elements along the small roundings, where the field hardly changes. */
  private static final MeshSettings LONG =
      new MeshSettings(6, 20, Double.POSITIVE_INFINITY, 0.08, 1, 0.4);

  /**
   * A body.
   *
   * @param sharp model drawn sharp
   * @param rounded model with the edge rounded, %s for the radius
   * @param live part at 1 V
   * @param thickness_mm distance to the next edge
   * @param box_mm where to look: the middle of the edge
   */
  private record Body(
      String sharp, String rounded, String live, double thickness_mm, double[] box_mm) {}

  private static final List<Body> BODIES =
      List.of(
          new Body(
              "cube-100.step",
              "cube-100-rounded-%s.step",
              "*",
              100,
              new double[] {-60, -60, -8, 60, 60, 8}),
          new Body(
              "bar-in-box-sharp.step",
              "bar-in-box-r%s.step",
              "Bar",
              20,
              new double[] {-12, -32, -20, 12, 32, 20}),
          new Body(
              "disc-sharp.step",
              "disc-rim-r%s.step",
              "Disc",
              40,
              new double[] {-120, -120, -50, 120, 120, 50}),
          new Body(
              "wedge-60-sharp.step",
              "wedge-60-r%s.step",
              "Wedge",
              60,
              new double[] {-12, -5, -20, 1, 5, 20}),
          new Body(
              "wedge-120-sharp.step",
              "wedge-120-r%s.step",
              "Wedge",
              60,
              new double[] {-8, -5, -20, 1, 5, 20}));

  @Test
  void predictedPeaksMatchRoundedCopies() {
    SoftAssertions soft = new SoftAssertions();
    System.out.printf(
        "| body | r/t | r mm | rounded V/m | claim %% | predicted V/m | claim %% | error %% | time s"
            + " |%n|---|---|---|---|---|---|---|---|---|%n");
    for (Body body : BODIES) {
      for (double share : new double[] {0.01, 0.02, 0.05, 0.1}) {
        double radius_mm = share * body.thickness_mm;
        String name = body.live.equals("*") ? Double.toString(share) : shortest(radius_mm);
        double[] box = new double[6];
        for (int k = 0; k < 6; k++) {
          box[k] = 1e-3 * body.box_mm[k];
        }
        SolvedModel rounded =
            SolvedModel.of(String.format(body.rounded, name), body.live, 3e-4, LONG, SETTINGS);
        SolvedModel sharp =
            SolvedModel.of(
                body.sharp, body.live, 1e-3 * radius_mm, MeshSettings.defaults(), SETTINGS);
        double direct = rounded.peakIn(box);
        double predicted = sharp.peakIn(box);
        double error = predicted / direct - 1;
        System.out.printf(
            "| %s | %.2f | %.1f | %.5g | %.2f | %.5g | %.2f | %.2f | %.1f + %.1f |%n",
            body.sharp,
            share,
            radius_mm,
            direct,
            100 * rounded.result().errorEstimate(),
            predicted,
            100 * sharp.result().errorEstimate(),
            100 * error,
            rounded.time_s(),
            sharp.time_s());
        soft.assertThat(Math.abs(error))
            .as("%s, r/t = %s", body.sharp, share)
            .isLessThan(share > 0.05 ? 0.04 : 0.02);
      }
    }
    soft.assertAll();
  }

  private static String shortest(double mm) {
    return mm == Math.rint(mm) ? Integer.toString((int) mm) : Double.toString(mm);
  }
}
