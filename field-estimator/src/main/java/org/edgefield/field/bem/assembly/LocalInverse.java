package org.edgefield.field.bem.assembly;

import java.util.Arrays;
import org.edgefield.field.bem.krylov.Gmres;
import org.edgefield.field.parallel.Workers;

/**
 * Sparse approximate inverse of the near potentials: for each node the small system of the node and
 * its strongest neighbours is solved, and the node's row of that inverse kept. Reference: the
 * truncated Green's function preconditioner of Vavasis 1992 and Nabors, Korsmeyer, Leighton, White
 * 1994 (memory).
 */
final class LocalInverse implements Gmres.Operator {
  private static final int NEIGHBOURS = 24;
  private static final int ROWS = 512;

  private final int[] column;
  private final double[] value;
  private final int[] length;
  private final Workers workers;

  /**
   * Solves the small systems.
   *
   * @param near near potentials, rows in compressed form
   */
  LocalInverse(NearPotentials near, Workers workers) {
    this.workers = workers;
    int n = near.start().length - 1;
    column = new int[NEIGHBOURS * n];
    value = new double[NEIGHBOURS * n];
    length = new int[n];
    workers.run(
        (n + ROWS - 1) / ROWS,
        w -> {
          Scratch scratch = new Scratch(near, n);
          return block -> {
            for (int row = block * ROWS; row < Math.min(n, (block + 1) * ROWS); row++) {
              scratch.row(row);
            }
          };
        });
  }

  private final class Scratch {
    private final NearPotentials near;
    private final int[] place;
    private final double[] matrix = new double[NEIGHBOURS * NEIGHBOURS];
    private final double[] right = new double[NEIGHBOURS];

    Scratch(NearPotentials near, int n) {
      this.near = near;
      place = new int[n];
      Arrays.fill(place, -1);
    }

    void row(int row) {
      int m = strongest(row);
      int base = NEIGHBOURS * row;
      for (int i = 0; i < m; i++) {
        place[column[base + i]] = i;
      }
      // Row of the inverse: solve with the transpose.
      Arrays.fill(matrix, 0, m * m, 0);
      for (int i = 0; i < m; i++) {
        int r = column[base + i];
        for (int k = near.start()[r]; k < near.start()[r + 1]; k++) {
          int j = place[near.column()[k]];
          if (j >= 0) {
            matrix[j * m + i] = near.value()[k];
          }
        }
        right[i] = column[base + i] == row ? 1 : 0;
      }
      for (int i = 0; i < m; i++) {
        place[column[base + i]] = -1;
      }
      if (solve(m)) {
        System.arraycopy(right, 0, value, base, m);
        length[row] = m;
      } else {
        column[base] = row;
        value[base] = 1;
        length[row] = 1;
      }
    }

    /** Columns of the row's largest near potentials, the row itself included. */
    private int strongest(int row) {
      int base = NEIGHBOURS * row;
      column[base] = row;
      int m = 1;
      for (int k = near.start()[row]; k < near.start()[row + 1]; k++) {
        int c = near.column()[k];
        double v = Math.abs(near.value()[k]);
        if (c == row || (m == NEIGHBOURS && v <= value[base + m - 1])) {
          continue;
        }
        int at = m < NEIGHBOURS ? m++ : m - 1;
        while (at > 1 && value[base + at - 1] < v) {
          column[base + at] = column[base + at - 1];
          value[base + at] = value[base + at - 1];
          at--;
        }
        column[base + at] = c;
        value[base + at] = v;
      }
      return m;
    }

    /** Gauss elimination with row pivoting; false where the matrix is singular. */
    private boolean solve(int m) {
      for (int k = 0; k < m; k++) {
        int pivot = k;
        for (int i = k + 1; i < m; i++) {
          if (Math.abs(matrix[i * m + k]) > Math.abs(matrix[pivot * m + k])) {
            pivot = i;
          }
        }
        if (!(Math.abs(matrix[pivot * m + k]) > 1e-30)) {
          return false;
        }
        if (pivot != k) {
          for (int j = k; j < m; j++) {
            double swap = matrix[k * m + j];
            matrix[k * m + j] = matrix[pivot * m + j];
            matrix[pivot * m + j] = swap;
          }
          double swap = right[k];
          right[k] = right[pivot];
          right[pivot] = swap;
        }
        for (int i = k + 1; i < m; i++) {
          double f = matrix[i * m + k] / matrix[k * m + k];
          if (f != 0) {
            for (int j = k + 1; j < m; j++) {
              matrix[i * m + j] -= f * matrix[k * m + j];
            }
            right[i] -= f * right[k];
          }
        }
      }
      for (int i = m - 1; i >= 0; i--) {
        double sum = right[i];
        for (int j = i + 1; j < m; j++) {
          sum -= matrix[i * m + j] * right[j];
        }
        right[i] = sum / matrix[i * m + i];
      }
      return true;
    }
  }

  @Override
  public void apply(double[][] x, double[][] y) {
    int n = length.length;
    workers.run(
        (n + ROWS - 1) / ROWS,
        w ->
            block -> {
              for (int k = 0; k < x.length; k++) {
                for (int row = block * ROWS; row < Math.min(n, (block + 1) * ROWS); row++) {
                  double sum = 0;
                  int base = NEIGHBOURS * row;
                  for (int i = base; i < base + length[row]; i++) {
                    sum += value[i] * x[k][column[i]];
                  }
                  y[k][row] = sum;
                }
              }
            });
  }
}
