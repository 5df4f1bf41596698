package org.edgefield.field.bem.assembly;

import java.util.Arrays;
import org.edgefield.field.parallel.Workers;

/**
 * Far field as a full matrix over the unknowns: for small models, where its products cost least.
 */
final class DenseFarField implements FarField {
  private static final int BLOCK = 32;

  private final float[][] matrix;
  private final Workers workers;

  /**
   * Fills the matrix.
   *
   * @param targets the rows' points, followed by their images where there is a mirror
   */
  DenseFarField(FarSources sources, Collocation rows, double[] targets, Workers workers) {
    this.workers = workers;
    int n = rows.rows();
    int images = targets.length > rows.points().length ? rows.points().length / 3 : 0;
    matrix = new float[n][];
    workers.run(
        (n + BLOCK - 1) / BLOCK,
        w -> {
          double[] share = new double[sources.count()];
          double[] sum = new double[n];
          return b -> {
            for (int i = b * BLOCK; i < Math.min(n, (b + 1) * BLOCK); i++) {
              Arrays.fill(sum, 0);
              for (int e = rows.rowStart()[i]; e < rows.rowStart()[i + 1]; e++) {
                int p = rows.rowPoint()[e];
                addPoint(sources, targets, p, rows.rowWeight()[e], share, sum);
                if (images > 0) {
                  addPoint(sources, targets, p + images, -rows.rowWeight()[e], share, sum);
                }
              }
              matrix[i] = new float[n];
              for (int j = 0; j < n; j++) {
                matrix[i][j] = (float) sum[j];
              }
            }
          };
        });
  }

  private static void addPoint(
      FarSources sources, double[] targets, int p, double factor, double[] share, double[] row) {
    double x = targets[3 * p];
    double y = targets[3 * p + 1];
    double z = targets[3 * p + 2];
    double[] xyz = sources.xyz();
    double[] weight = sources.weight();
    for (int s = 0; s < share.length; s++) {
      double dx = xyz[3 * s] - x;
      double dy = xyz[3 * s + 1] - y;
      double dz = xyz[3 * s + 2] - z;
      double r2 = dx * dx + dy * dy + dz * dz;
      share[s] = r2 > 0 ? factor * weight[s] / Math.sqrt(r2) : 0;
    }
    // The three-point rule lies at barycentric 2/3, 1/6, 1/6 towards each corner in turn.
    int[] node = sources.cornerNode();
    for (int c = 0; c < node.length; c += 3) {
      double sixth = (share[c] + share[c + 1] + share[c + 2]) / 6;
      row[node[c]] += sixth + 0.5 * share[c];
      row[node[c + 1]] += sixth + 0.5 * share[c + 1];
      row[node[c + 2]] += sixth + 0.5 * share[c + 2];
    }
  }

  @Override
  public void apply(double[][] density, double[][] potential) {
    int n = matrix.length;
    workers.run(
        (n + BLOCK - 1) / BLOCK,
        w ->
            b -> {
              for (int i = b * BLOCK; i < Math.min(n, (b + 1) * BLOCK); i++) {
                for (int k = 0; k < density.length; k++) {
                  potential[k][i] = dot(matrix[i], density[k]);
                }
              }
            });
  }

  /** Four sums in turn: the order is fixed, and the additions do not wait for each other. */
  private static double dot(float[] a, double[] b) {
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double s3 = 0;
    int i = 0;
    for (; i + 3 < a.length; i += 4) {
      s0 += a[i] * b[i];
      s1 += a[i + 1] * b[i + 1];
      s2 += a[i + 2] * b[i + 2];
      s3 += a[i + 3] * b[i + 3];
    }
    for (; i < a.length; i++) {
      s0 += a[i] * b[i];
    }
    return s0 + s1 + (s2 + s3);
  }
}
