package org.edgefield.field.bem.krylov;

import java.util.Arrays;
import org.edgefield.importer.Progress;

/**
 * GMRES (Saad and Schultz, SIAM J. Sci. Stat. Comput. 7 (1986) 856, memory) for several right-hand
 * sides in step: each has its own Krylov space, all share one sweep of the operator per iteration.
 * Preconditioned from the right, so that residuals are those of the system itself; modified
 * Gram-Schmidt, Givens rotations.
 */
public final class Gmres {
  private Gmres() {}

  /** The matrix, applied to several vectors at once. */
  @FunctionalInterface
  public interface Operator {
    /** out[k] = A in[k]; both have as many rows as there are vectors. */
    void apply(double[][] in, double[][] out);
  }

  /**
   * Outcome.
   *
   * @param solution one vector per right-hand side
   * @param iterations iterations of the slowest
   * @param residual largest relative residual reached
   */
  public record Outcome(double[][] solution, int iterations, double residual) {}

  /**
   * Solves A x = b.
   *
   * @param operator the matrix
   * @param preconditioner approximate inverse of the matrix
   * @param rightSides right-hand sides
   * @param guess start vectors, or null for zero
   * @param tolerance relative residual asked for
   * @param limit largest number of iterations
   * @param progress told after each iteration
   */
  public static Outcome solve(
      Operator operator,
      Operator preconditioner,
      double[][] rightSides,
      double[][] guess,
      double tolerance,
      int limit,
      Progress progress) {
    int sets = rightSides.length;
    int n = rightSides[0].length;
    double[][] start = new double[sets][];
    double[][] residual = new double[sets][n];
    for (int k = 0; k < sets; k++) {
      start[k] = guess == null ? new double[n] : guess[k].clone();
    }
    if (guess != null) {
      operator.apply(start, residual);
    }
    Space[] space = new Space[sets];
    for (int k = 0; k < sets; k++) {
      double norm = 0;
      for (int i = 0; i < n; i++) {
        residual[k][i] = rightSides[k][i] - residual[k][i];
        double b = rightSides[k][i];
        norm += b * b;
      }
      space[k] = new Space(residual[k], Math.sqrt(norm), tolerance, limit);
    }
    int step = 0;
    while (step < limit) {
      int open = 0;
      double[][] in = new double[sets][];
      for (Space s : space) {
        if (!s.done()) {
          in[open++] = s.last();
        }
      }
      if (open == 0) {
        break;
      }
      double[][] turned = new double[open][n];
      preconditioner.apply(Arrays.copyOf(in, open), turned);
      double[][] out = new double[open][n];
      operator.apply(turned, out);
      int taken = 0;
      double worst = 0;
      for (Space s : space) {
        if (!s.done()) {
          s.extend(out[taken++]);
        }
        worst = Math.max(worst, s.relative());
      }
      step++;
      progress.report(
          "solve",
          Double.NaN,
          String.format(java.util.Locale.ROOT, "iteration %d, residual %.1e", step, worst));
    }
    double worst = 0;
    for (int k = 0; k < sets; k++) {
      double[][] correction = new double[1][n];
      preconditioner.apply(new double[][] {space[k].combination(n)}, correction);
      for (int i = 0; i < n; i++) {
        start[k][i] += correction[0][i];
      }
      worst = Math.max(worst, space[k].relative());
    }
    return new Outcome(start, step, worst);
  }

  /** Krylov space of one right-hand side. */
  private static final class Space {
    private final double scale;
    private final double tolerance;
    private final double[][] basis;
    private final double[][] hessenberg;
    private final double[] cosine;
    private final double[] sine;
    private final double[] g;
    private int size;
    private boolean broken;

    Space(double[] residual, double scale, double tolerance, int limit) {
      this.scale = scale;
      this.tolerance = tolerance;
      basis = new double[limit + 1][];
      hessenberg = new double[limit][];
      cosine = new double[limit];
      sine = new double[limit];
      g = new double[limit + 1];
      double norm = norm(residual);
      g[0] = norm;
      basis[0] = residual;
      if (norm > 0) {
        for (int i = 0; i < residual.length; i++) {
          residual[i] /= norm;
        }
      }
    }

    double relative() {
      return scale > 0 ? Math.abs(g[size]) / scale : 0;
    }

    boolean done() {
      return broken || relative() <= tolerance || size == hessenberg.length;
    }

    double[] last() {
      return basis[size];
    }

    void extend(double[] w) {
      double[] h = new double[size + 2];
      for (int j = 0; j <= size; j++) {
        double dot = 0;
        double[] v = basis[j];
        for (int i = 0; i < w.length; i++) {
          dot += v[i] * w[i];
        }
        h[j] = dot;
        for (int i = 0; i < w.length; i++) {
          w[i] -= dot * v[i];
        }
      }
      double norm = norm(w);
      h[size + 1] = norm;
      for (int j = 0; j < size; j++) {
        double a = cosine[j] * h[j] + sine[j] * h[j + 1];
        h[j + 1] = cosine[j] * h[j + 1] - sine[j] * h[j];
        h[j] = a;
      }
      double r = Math.hypot(h[size], norm);
      cosine[size] = r > 0 ? h[size] / r : 1;
      sine[size] = r > 0 ? norm / r : 0;
      h[size] = r;
      g[size + 1] = -sine[size] * g[size];
      g[size] *= cosine[size];
      hessenberg[size] = h;
      if (norm > 0) {
        for (int i = 0; i < w.length; i++) {
          w[i] /= norm;
        }
        basis[size + 1] = w;
      } else {
        broken = true;
      }
      size++;
    }

    /** Best combination of the basis. */
    double[] combination(int n) {
      double[] x = new double[n];
      double[] y = new double[size];
      for (int i = size - 1; i >= 0; i--) {
        double sum = g[i];
        for (int j = i + 1; j < size; j++) {
          sum -= hessenberg[j][i] * y[j];
        }
        y[i] = hessenberg[i][i] != 0 ? sum / hessenberg[i][i] : 0;
      }
      for (int j = 0; j < size; j++) {
        double[] v = basis[j];
        for (int i = 0; i < x.length; i++) {
          x[i] += y[j] * v[i];
        }
      }
      return x;
    }

    private static double norm(double[] v) {
      double sum = 0;
      for (double a : v) {
        sum += a * a;
      }
      return Math.sqrt(sum);
    }
  }
}
