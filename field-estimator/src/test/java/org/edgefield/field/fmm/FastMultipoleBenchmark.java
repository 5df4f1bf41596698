package org.edgefield.field.fmm;

import java.lang.management.ManagementFactory;
import java.util.Locale;
import java.util.Random;
import org.edgefield.field.parallel.Workers;

/**
 * Whole-process benchmark of the fast multipole method: random points on a unit sphere, potential
 * at all of them, tree and lists included. Prints wall and CPU seconds, measured error and the
 * exponent of growth. Run: {@code mvn -q -pl field-estimator -am test-compile exec:java} as
 * described in the module's docs.
 */
public final class FastMultipoleBenchmark {
  private FastMultipoleBenchmark() {}

  /** Arguments: accuracy, then point counts; 1e-4 and 1e4, 1e5, 1e6 by default. */
  public static void main(String[] args) {
    double tolerance = args.length > 0 ? Double.parseDouble(args[0]) : 1e-4;
    int[] counts = {10_000, 100_000, 1_000_000};
    if (args.length > 1) {
      counts = new int[args.length - 1];
      for (int i = 1; i < args.length; i++) {
        counts[i - 1] = (int) Double.parseDouble(args[i]);
      }
    }
    try (Workers workers = new Workers(Runtime.getRuntime().availableProcessors())) {
      run(100_000, tolerance, workers, false);
      run(100_000, tolerance, workers, false);
      double last = Double.NaN;
      int lastCount = 0;
      for (int n : counts) {
        double seconds = run(n, tolerance, workers, true);
        if (lastCount > 0) {
          System.out.printf(
              Locale.ROOT,
              "  growth exponent %.2f%n",
              Math.log(seconds / last) / Math.log((double) n / lastCount));
        }
        last = seconds;
        lastCount = n;
      }
    }
  }

  private static double run(int n, double tolerance, Workers workers, boolean print) {
    double[] points = FastMultipoleTest.points("sphere", n, 1);
    Random random = new Random(2);
    double[][] q = new double[1][n];
    for (int i = 0; i < n; i++) {
      q[0][i] = random.nextDouble() - 0.5;
    }
    double[][] phi = new double[1][n];
    long cpu = cpuNanos();
    long wall = System.nanoTime();
    FastMultipole sum = new FastMultipole(points, points, tolerance, workers);
    long prepared = System.nanoTime();
    sum.sum(q, phi, null);
    long end = System.nanoTime();
    double cpuSeconds = (cpuNanos() - cpu) * 1e-9;
    if (print) {
      System.out.printf(
          Locale.ROOT,
          "%,d points, accuracy %.0e: wall %.2f s (preparation %.2f s, sum %.2f s), CPU %.2f s, error %.1e%n",
          n,
          tolerance,
          (end - wall) * 1e-9,
          (prepared - wall) * 1e-9,
          (end - prepared) * 1e-9,
          cpuSeconds,
          FastMultipoleTest.errors(points, points, q[0], phi[0], null)[0]);
    }
    return cpuSeconds;
  }

  private static long cpuNanos() {
    return ((com.sun.management.OperatingSystemMXBean) ManagementFactory.getOperatingSystemMXBean())
        .getProcessCpuTime();
  }
}
