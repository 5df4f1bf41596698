package org.edgefield.field.bem.assembly;

import java.util.Arrays;
import org.edgefield.field.fmm.FastMultipole;
import org.edgefield.field.parallel.Workers;

/** Far field by the fast multipole method: for large models. */
final class MultipoleFarField implements FarField {
  private final FarSources sources;
  private final Collocation rows;
  private final boolean mirrored;
  private final FastMultipole multipole;
  private double[][] strength = new double[0][];
  private double[][] at = new double[0][];

  /**
   * Prepares the multipole tree.
   *
   * @param targets the rows' points, followed by their images where there is a mirror
   * @param tolerance relative accuracy
   */
  MultipoleFarField(
      FarSources sources, Collocation rows, double[] targets, double tolerance, Workers workers) {
    this.sources = sources;
    this.rows = rows;
    mirrored = targets.length > rows.points().length;
    multipole = new FastMultipole(sources.xyz(), targets, tolerance, workers);
  }

  @Override
  public void apply(double[][] density, double[][] potential) {
    int n = rows.points().length / 3;
    if (strength.length < density.length) {
      strength = new double[density.length][sources.count()];
      at = new double[density.length][mirrored ? 2 * n : n];
    }
    for (int k = 0; k < density.length; k++) {
      sources.strengths(density[k], strength[k]);
    }
    multipole.sum(Arrays.copyOf(strength, density.length), Arrays.copyOf(at, density.length), null);
    for (int k = 0; k < density.length; k++) {
      for (int i = 0; i < rows.rows(); i++) {
        double sum = 0;
        for (int e = rows.rowStart()[i]; e < rows.rowStart()[i + 1]; e++) {
          int p = rows.rowPoint()[e];
          sum += rows.rowWeight()[e] * (mirrored ? at[k][p] - at[k][p + n] : at[k][p]);
        }
        potential[k][i] = sum;
      }
    }
  }
}
