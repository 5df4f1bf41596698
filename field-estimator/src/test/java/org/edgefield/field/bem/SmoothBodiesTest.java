package org.edgefield.field.bem;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import org.edgefield.field.bem.assembly.Collocation;
import org.edgefield.field.bem.assembly.Mirror;
import org.edgefield.field.bem.assembly.SingleLayer;
import org.edgefield.field.bem.krylov.Gmres;
import org.edgefield.field.bem.surface.CurvedTriangles;
import org.edgefield.field.parallel.Workers;
import org.edgefield.importer.Progress;
import org.junit.jupiter.api.Test;

/** Densities on smooth bodies with closed forms. */
class SmoothBodiesTest {

  private record Solved(
      double[] density, double charge, int iterations, double seconds, double[] position) {}

  private static Solved solve(AnalyticMesh mesh, Mirror mirror) {
    long begin = System.nanoTime();
    double[] g = mesh.geometry();
    int[] corners = mesh.corners();
    CurvedTriangles triangles = new CurvedTriangles(g);
    double[] position = mesh.positions(g, corners);
    int n = position.length / 3;
    try (Workers workers = new Workers(2)) {
      Collocation rows = Collocation.of(triangles, corners, position, new boolean[n]);
      SingleLayer layer = new SingleLayer(triangles, corners, rows, mirror, 1e-5, workers);
      System.out.printf(
          "  setup %.2f s corrections %d per row%n",
          (System.nanoTime() - begin) * 1e-9, layer.corrections() / n);
      double[] one = new double[n];
      Arrays.fill(one, 1);
      Gmres.Outcome out =
          Gmres.solve(
              layer::apply, layer.diagonal(), new double[][] {one}, null, 1e-6, 80, Progress.NONE);
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
      return new Solved(
          out.solution()[0],
          charge,
          out.iterations(),
          (System.nanoTime() - begin) * 1e-9,
          position);
    }
  }

  private static double peak(double[] s) {
    return 4 * Math.PI * Arrays.stream(s).max().orElse(0);
  }

  @Test
  void sphere() {
    for (int n : new int[] {2, 4, 8, 16}) {
      AnalyticMesh mesh = new AnalyticMesh();
      mesh.ball(n, p -> p);
      Solved s = solve(mesh, null);
      System.out.printf(
          "sphere n=%d unknowns %d it %d t %.2f  C err %.2e  peak err %.2e%n",
          n, s.density.length, s.iterations, s.seconds, s.charge - 1, peak(s.density) - 1);
    }
  }

  @Test
  void prolate() {
    for (double a : new double[] {5, 10}) {
      for (int n : new int[] {8, 16, 32}) {
        AnalyticMesh mesh = new AnalyticMesh();
        mesh.ball(n, p -> new double[] {p[0], p[1], a * p[2]});
        Solved s = solve(mesh, null);
        double c = Math.sqrt(a * a - 1);
        double cap = c / Math.log(a + c);
        System.out.printf(
            "prolate %.0f n=%d unknowns %d it %d t %.2f  C err %.2e  peak err %.2e%n",
            a,
            n,
            s.density.length,
            s.iterations,
            s.seconds,
            s.charge / cap - 1,
            peak(s.density) / cap - 1);
      }
    }
    assertThat(peak(new double[] {1})).isPositive();
  }

  @Test
  void sphereOverPlane() {
    for (int n : new int[] {8, 16, 32}) {
      AnalyticMesh mesh = new AnalyticMesh();
      mesh.ball(n, p -> new double[] {p[0], p[1], p[2] + 1.1});
      Solved s = solve(mesh, new Mirror(2, 0));
      System.out.printf(
          "sphere-plane n=%d unknowns %d it %d t %.2f  peak err %.2e%n",
          n, s.density.length, s.iterations, s.seconds, peak(s.density) / 10.6757486676 - 1);
    }
  }
}
