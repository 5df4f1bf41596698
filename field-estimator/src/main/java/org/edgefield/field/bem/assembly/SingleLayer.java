package org.edgefield.field.bem.assembly;

import java.util.Arrays;
import org.edgefield.field.bem.krylov.Gmres;
import org.edgefield.field.bem.surface.CurvedTriangles;
import org.edgefield.field.parallel.Workers;

/**
 * Single-layer potential of a continuous, piecewise linear density on curved triangles, at the rows
 * of a collocation:
 *
 * <pre>  (A s)_i = sum_k w_ik Int s(y) / |x_k - y| dS(y)      (V = A s, surface field E = 4 pi s)
 * </pre>
 *
 * All pairs are summed with the three-point rule, in large models by the fast multipole method;
 * near pairs carry a sparse correction to the accurate integral. With a mirror the image of every
 * charge acts too.
 */
public final class SingleLayer {
  private static final int BLOCK = 256;

  /** Most unknowns for which the far field is kept as a full matrix (256 MB). */
  private static final int DENSE = 8000;

  private final int[] cornerNode;
  private final Collocation collocation;
  private final boolean mirrored;
  private final Workers workers;
  private final FarSources sources;
  private final double[] targets;
  private final FarField far;
  private final int[] start;
  private final int[] column;
  private final double[] value;

  /**
   * Prepares the operator.
   *
   * @param triangles geometry
   * @param cornerNode unknown per triangle corner, 3 per triangle
   * @param collocation rows, as many as unknowns
   * @param mirror earth plane or null
   * @param tolerance relative accuracy of the far field
   * @param workers threads; must stay open while the operator is used
   */
  public SingleLayer(
      CurvedTriangles triangles,
      int[] cornerNode,
      Collocation collocation,
      Mirror mirror,
      double tolerance,
      Workers workers) {
    this.cornerNode = cornerNode;
    this.collocation = collocation;
    this.mirrored = mirror != null;
    this.workers = workers;
    double[] points = collocation.points();
    targets = Arrays.copyOf(points, mirrored ? 2 * points.length : points.length);
    if (mirrored) {
      System.arraycopy(mirror.image(points), 0, targets, points.length, points.length);
    }
    sources = FarSources.of(triangles, cornerNode);
    far =
        collocation.rows() <= DENSE
            ? new DenseFarField(sources, collocation, targets, workers)
            : new MultipoleFarField(sources, collocation, targets, tolerance, workers);

    int rows = collocation.rows();
    NearPairs near = new NearPairs(triangles, targets, workers);
    int[][] columns = new int[rows][];
    double[][] values = new double[rows][];
    workers.run(
        (rows + BLOCK - 1) / BLOCK,
        w -> {
          RowBuilder builder = new RowBuilder(near, rows);
          return b -> {
            for (int i = b * BLOCK; i < Math.min(rows, (b + 1) * BLOCK); i++) {
              builder.row(i);
              columns[i] = builder.columns();
              values[i] = builder.values();
            }
          };
        });
    start = new int[rows + 1];
    for (int i = 0; i < rows; i++) {
      start[i + 1] = Math.addExact(start[i], columns[i].length);
    }
    column = new int[start[rows]];
    value = new double[start[rows]];
    for (int i = 0; i < rows; i++) {
      System.arraycopy(columns[i], 0, column, start[i], columns[i].length);
      System.arraycopy(values[i], 0, value, start[i], values[i].length);
      columns[i] = null;
      values[i] = null;
    }
  }

  /** One row of the sparse correction at a time. */
  private final class RowBuilder {
    private final NearPairs near;
    private final int[] slot;
    private int[] touched = new int[256];
    private double[] sum = new double[256];
    private int size;

    RowBuilder(NearPairs near, int rows) {
      this.near = near;
      this.slot = new int[rows];
      Arrays.fill(slot, -1);
    }

    void row(int i) {
      for (int k = 0; k < size; k++) {
        slot[touched[k]] = -1;
      }
      size = 0;
      for (int e = collocation.rowStart()[i]; e < collocation.rowStart()[i + 1]; e++) {
        int p = collocation.rowPoint()[e];
        point(p, collocation.rowWeight()[e]);
        if (mirrored) {
          point(p + collocation.points().length / 3, -collocation.rowWeight()[e]);
        }
      }
    }

    private void point(int p, double weight) {
      for (int pair = near.start[p]; pair < near.start[p + 1]; pair++) {
        int t = near.triangle[pair];
        for (int c = 0; c < 3; c++) {
          int j = cornerNode[3 * t + c];
          int k = slot[j];
          if (k < 0) {
            if (size == touched.length) {
              touched = Arrays.copyOf(touched, 2 * size);
              sum = Arrays.copyOf(sum, 2 * size);
            }
            k = size++;
            slot[j] = k;
            touched[k] = j;
            sum[k] = 0;
          }
          sum[k] += weight * near.correction[3 * pair + c];
        }
      }
    }

    int[] columns() {
      return Arrays.copyOf(touched, size);
    }

    double[] values() {
      return Arrays.copyOf(sum, size);
    }
  }

  /** Number of unknowns. */
  public int size() {
    return collocation.rows();
  }

  /** Approximate inverse to precondition with. */
  public Gmres.Operator approximateInverse() {
    return new ClusterInverse(
        new PotentialEntries(sources, collocation, targets, start, column, value), workers);
  }

  /** Number of stored corrections. */
  public int corrections() {
    return value.length;
  }

  /**
   * Applies the operator to one or more densities at once.
   *
   * @param density per set, one value per unknown
   * @param potential out: per set, one value per row
   */
  public void apply(double[][] density, double[][] potential) {
    far.apply(density, potential);
    workers.run(
        (size() + BLOCK - 1) / BLOCK,
        w ->
            b -> {
              for (int k = 0; k < density.length; k++) {
                int end = Math.min(size(), (b + 1) * BLOCK);
                for (int i = b * BLOCK; i < end; i++) {
                  potential[k][i] += correction(i, density[k]);
                }
              }
            });
  }

  private double correction(int i, double[] density) {
    double sum = 0;
    for (int e = start[i]; e < start[i + 1]; e++) {
      sum += value[e] * density[column[e]];
    }
    return sum;
  }
}
