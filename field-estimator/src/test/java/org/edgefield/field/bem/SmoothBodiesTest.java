package org.edgefield.field.bem;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.edgefield.field.bem.assembly.Collocation;
import org.edgefield.field.bem.assembly.Mirror;
import org.edgefield.field.bem.assembly.SingleLayer;
import org.edgefield.field.bem.krylov.Gmres;
import org.edgefield.field.bem.surface.CurvedTriangles;
import org.edgefield.field.parallel.Workers;
import org.edgefield.importer.Progress;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Densities on smooth bodies with closed forms. */
class SmoothBodiesTest {

  private record Solved(double[] density, double charge) {}

  private static Solved solve(AnalyticMesh mesh, Mirror mirror) {
    double[] g = mesh.geometry();
    int[] corners = mesh.corners();
    CurvedTriangles triangles = new CurvedTriangles(g);
    double[] position = mesh.positions(g, corners);
    int n = position.length / 3;
    try (Workers workers = new Workers(2)) {
      Collocation rows = Collocation.of(triangles, corners, position, new boolean[n]);
      SingleLayer layer = new SingleLayer(triangles, corners, rows, mirror, 1e-5, workers);
      double[] one = new double[n];
      Arrays.fill(one, 1);
      Gmres.Outcome out =
          Gmres.solve(
              layer::apply,
              layer.approximateInverse(),
              new double[][] {one},
              null,
              1e-6,
              80,
              Progress.NONE);
      double charge = 0;
      double[] p = new double[9];
      for (int t = 0; t < triangles.count(); t++) {
        for (int k = 0; k < 3; k++) {
          triangles.evaluate(t, k == 1 ? 2 / 3.0 : 1 / 6.0, k == 2 ? 2 / 3.0 : 1 / 6.0, p);
          double w = CurvedTriangles.cross(p) / 6;
          for (int c = 0; c < 3; c++) {
            charge += w * (c == k ? 2 / 3.0 : 1 / 6.0) * out.solution()[0][corners[3 * t + c]];
          }
        }
      }
      return new Solved(out.solution()[0], charge);
    }
  }

  private static double peak(double[] s) {
    return 4 * Math.PI * Arrays.stream(s).max().orElse(0);
  }

  @ParameterizedTest
  @CsvSource({
    // segments per icosahedron side, capacitance tolerance, peak tolerance
    "2, 3e-4, 2e-3",
    "4, 1e-5, 1e-3",
    "8, 1e-5, 1e-3"
  })
  void sphere(int n, double charge, double peak) {
    AnalyticMesh mesh = new AnalyticMesh();
    mesh.ball(n, p -> p);
    Solved s = solve(mesh, null);
    assertThat(s.charge).isCloseTo(1, within(charge));
    assertThat(peak(s.density)).isCloseTo(1, within(peak));
  }

  // C = 4 pi eps c / acosh(a/b), E_tip = Q / (4 pi eps b^2), b = 1 (formula, recomputed).
  @ParameterizedTest
  @CsvSource({"5, 8, 1e-4, 0.06", "5, 16, 2e-5, 0.02", "10, 16, 2e-5, 0.06"})
  void prolateSpheroid(double a, int n, double charge, double peak) {
    AnalyticMesh mesh = new AnalyticMesh();
    mesh.ball(n, p -> new double[] {p[0], p[1], a * p[2]});
    Solved s = solve(mesh, null);
    double c = Math.sqrt(a * a - 1);
    double exact = c / Math.log(a + c);
    assertThat(s.charge / exact).isCloseTo(1, within(charge));
    assertThat(peak(s.density) / exact).isCloseTo(1, within(peak));
  }

  @Test
  void rawPeaksConvergeWithSecondOrder() {
    // Sphere at gap 0.1 R over the earth plane, 10.6757486676 V/R (image series, recomputed).
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      AnalyticMesh mesh = new AnalyticMesh();
      mesh.ball(8 << k, p -> new double[] {p[0], p[1], p[2] + 1.1});
      error[k] = peak(solve(mesh, new Mirror(2, 0)).density) / 10.6757486676 - 1;
    }
    assertThat(Math.abs(error[1])).isLessThan(0.01);
    assertThat(Math.log(error[0] / error[1]) / Math.log(2)).isGreaterThan(1.7);
  }
}
