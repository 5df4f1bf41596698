package org.edgefield.field.bem;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.edgefield.field.bem.assembly.Mirror;
import org.edgefield.field.bem.evaluate.FieldEvaluator;
import org.edgefield.field.bem.surface.CurvedTriangles;
import org.edgefield.field.parallel.Workers;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Potential and field around a unit sphere whose density is known: 1 V, E_n = 1 V/m. */
class FieldEvaluatorTest {

  private static FieldEvaluator evaluator(double height, Mirror mirror, Workers workers) {
    AnalyticMesh mesh = new AnalyticMesh();
    mesh.ball(8, p -> new double[] {p[0], p[1], p[2] + height});
    double[] g = mesh.geometry();
    int[] corners = mesh.corners();
    double[] density = new double[mesh.positions(g, corners).length / 3];
    Arrays.fill(density, 1 / (4 * Math.PI));
    return new FieldEvaluator(
        new CurvedTriangles(g),
        corners,
        new double[][] {density},
        mirror,
        new double[][] {{0, 0, 0}},
        1e-6,
        workers);
  }

  // Outside a charged sphere V = 1/r and E = 1/r^2 (Coulomb).
  @ParameterizedTest
  @ValueSource(doubles = {1.0001, 1.003, 1.03, 1.2, 2, 10})
  void outside(double r) {
    double[] direction = {0.48, 0.6, 0.64};
    double[] x = new double[3];
    for (int d = 0; d < 3; d++) {
      x[d] = r * direction[d];
    }
    try (Workers workers = new Workers(2)) {
      FieldEvaluator.Values v = evaluator(0, null, workers).at(x);
      assertThat(v.potential_V()[0][0] * r).isCloseTo(1, within(1e-4));
      for (int d = 0; d < 3; d++) {
        assertThat(v.field_V_per_m()[0][d] * r * r).isCloseTo(direction[d], within(5e-3));
      }
    }
  }

  @Test
  void noFieldInside() {
    try (Workers workers = new Workers(1)) {
      FieldEvaluator.Values v = evaluator(0, null, workers).at(new double[] {0.3, -0.4, 0.8});
      assertThat(v.potential_V()[0][0]).isCloseTo(1, within(1e-4));
      for (int d = 0; d < 3; d++) {
        assertThat(v.field_V_per_m()[0][d]).isCloseTo(0, within(5e-3));
      }
    }
  }

  // The earth plane carries no potential; there the image doubles the normal field.
  @Test
  void earthPlane() {
    try (Workers workers = new Workers(1)) {
      FieldEvaluator.Values v =
          evaluator(1.5, new Mirror(2, 0), workers).at(new double[] {0.7, 0.2, 0});
      double r2 = 0.7 * 0.7 + 0.2 * 0.2 + 1.5 * 1.5;
      assertThat(v.potential_V()[0][0]).isCloseTo(0, within(1e-12));
      assertThat(v.field_V_per_m()[0][0]).isCloseTo(0, within(1e-9));
      assertThat(v.field_V_per_m()[0][2]).isCloseTo(-2 * 1.5 / Math.pow(r2, 1.5), within(1e-4));
    }
  }
}
