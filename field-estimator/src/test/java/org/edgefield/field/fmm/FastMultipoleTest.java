package org.edgefield.field.fmm;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.edgefield.field.parallel.Workers;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Measured errors against direct sums stay below the requested accuracy. */
class FastMultipoleTest {
  private static final int N = 10_000;
  private static final int CHECKED = 200;

  @ParameterizedTest
  @CsvSource({
    "sphere, 1e-2",
    "sphere, 1e-4",
    "sphere, 1e-6",
    "cube, 1e-3",
    "needle, 1e-5",
    "graded, 1e-4",
    "graded, 1e-9"
  })
  void errorIsBelowTheRequest(String shape, double tolerance) {
    check(shape, tolerance);
  }

  @Tag("slow")
  @ParameterizedTest
  @CsvSource({
    "sphere, 1e-3", "sphere, 1e-5", "sphere, 1e-7", "sphere, 1e-8", "sphere, 1e-9", "cube, 1e-2",
    "cube, 1e-4", "cube, 1e-6", "cube, 1e-9", "needle, 1e-2", "needle, 1e-4", "needle, 1e-6",
    "needle, 1e-9", "graded, 1e-2", "graded, 1e-6"
  })
  void errorIsBelowTheRequestEverywhere(String shape, double tolerance) {
    check(shape, tolerance);
  }

  private static void check(String shape, double tolerance) {
    double[] sources = points(shape, N, 1);
    double[] targets = points(shape, N, 2);
    double[][] q = {strengths(N, 3, true), strengths(N, 4, false)};
    double[][] phi = new double[2][N];
    double[][] grad = new double[2][3 * N];
    try (Workers workers = new Workers(2)) {
      new FastMultipole(sources, targets, tolerance, workers).sum(q, phi, grad);
    }
    for (int k = 0; k < 2; k++) {
      double[] error = errors(sources, targets, q[k], phi[k], grad[k]);
      assertThat(error[0]).as("potential").isLessThan(tolerance);
      assertThat(error[1]).as("gradient").isLessThan(tolerance);
    }
  }

  @Test
  void sourcesDoNotActOnThemselves() {
    double[] points = points("sphere", 5000, 5);
    double[][] q = {strengths(5000, 6, true)};
    double[][] phi = new double[1][5000];
    try (Workers workers = new Workers(1)) {
      new FastMultipole(points, points, 1e-6, workers).sum(q, phi, null);
    }
    assertThat(errors(points, points, q[0], phi[0], null)[0]).isLessThan(1e-6);
  }

  @ParameterizedTest
  @ValueSource(strings = {"sphere", "graded"})
  void resultIsTheSameBitForBitWithOneAndTwoThreads(String shape) {
    double[] points = points(shape, N, 7);
    double[][] q = {strengths(N, 8, true)};
    double[][][] phi = new double[2][1][N];
    for (int threads = 1; threads <= 2; threads++) {
      try (Workers workers = new Workers(threads)) {
        FastMultipole sum = new FastMultipole(points, points, 1e-5, workers);
        sum.sum(q, phi[threads - 1], null);
        sum.sum(q, phi[threads - 1], null);
      }
    }
    assertThat(phi[0][0]).isEqualTo(phi[1][0]);
  }

  @Test
  void tinyAndDegenerateInputs() {
    try (Workers workers = new Workers(1)) {
      double[][] phi = {{Double.NaN}};
      new FastMultipole(new double[0], new double[] {1, 2, 3}, 1e-4, workers)
          .sum(new double[][] {{}}, phi, null);
      assertThat(phi[0][0]).isZero();
      new FastMultipole(new double[] {1, 2, 3}, new double[] {1, 2, 3}, 1e-4, workers)
          .sum(new double[][] {{5}}, phi, null);
      assertThat(phi[0][0]).isZero();
      new FastMultipole(new double[] {0, 0, 0}, new double[] {0, 3, 4}, 1e-4, workers)
          .sum(new double[][] {{5}}, phi, null);
      assertThat(phi[0][0]).isCloseTo(1.0, within(1e-4));
      // Many points in one place: the deepest box holds them all.
      double[] heap = new double[3 * 500];
      double[] ones = new double[500];
      Arrays.fill(ones, 1);
      heap[0] = 1;
      new FastMultipole(heap, new double[] {0, 0, 0}, 1e-4, workers)
          .sum(new double[][] {ones}, phi, null);
      assertThat(phi[0][0]).isCloseTo(1.0, within(1e-4));
    }
  }

  static double[] errors(
      double[] sources, double[] targets, double[] q, double[] phi, double[] grad) {
    double[] error = new double[2];
    double[] size = new double[2];
    int step = Math.max(1, phi.length / CHECKED);
    for (int t = 0; t < phi.length; t += step) {
      double[] exact = new double[4];
      for (int s = 0; s < q.length; s++) {
        double dx = targets[3 * t] - sources[3 * s];
        double dy = targets[3 * t + 1] - sources[3 * s + 1];
        double dz = targets[3 * t + 2] - sources[3 * s + 2];
        double r2 = dx * dx + dy * dy + dz * dz;
        if (r2 > 0) {
          double f = q[s] / Math.sqrt(r2);
          exact[3] += f;
          exact[0] -= f / r2 * dx;
          exact[1] -= f / r2 * dy;
          exact[2] -= f / r2 * dz;
        }
      }
      error[0] += (phi[t] - exact[3]) * (phi[t] - exact[3]);
      size[0] += exact[3] * exact[3];
      for (int d = 0; grad != null && d < 3; d++) {
        error[1] += (grad[3 * t + d] - exact[d]) * (grad[3 * t + d] - exact[d]);
        size[1] += exact[d] * exact[d];
      }
    }
    return new double[] {Math.sqrt(error[0] / size[0]), Math.sqrt(error[1] / size[1])};
  }

  private static double[] strengths(int n, long seed, boolean signed) {
    Random random = new Random(seed);
    double[] q = new double[n];
    for (int i = 0; i < n; i++) {
      q[i] = signed ? random.nextDouble() - 0.5 : random.nextDouble();
    }
    return q;
  }

  static double[] points(String shape, int n, long seed) {
    Random random = new Random(seed);
    double[] p = new double[3 * n];
    for (int i = 0; i < n; i++) {
      double x = random.nextGaussian();
      double y = random.nextGaussian();
      double z = random.nextGaussian();
      double r = Math.sqrt(x * x + y * y + z * z);
      switch (shape) {
        case "sphere" -> set(p, i, x / r, y / r, z / r);
        case "cube" -> set(p, i, random.nextDouble(), random.nextDouble(), random.nextDouble());
        case "needle" -> set(p, i, 0.01 * x / r, 0.01 * y / r, 10 * random.nextDouble());
        // Sheet whose density grows without bound towards one edge, as on a graded mesh.
        case "graded" -> set(p, i, Math.pow(random.nextDouble(), 6), random.nextDouble(), 0);
        default -> throw new IllegalArgumentException(shape);
      }
    }
    return p;
  }

  private static void set(double[] p, int i, double x, double y, double z) {
    p[3 * i] = x;
    p[3 * i + 1] = y;
    p[3 * i + 2] = z;
  }
}
