package org.edgefield.field.bem.assembly;

import java.util.Arrays;
import org.edgefield.field.bem.krylov.Gmres;
import org.edgefield.field.parallel.Workers;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;

/**
 * Approximate inverse on two levels.
 *
 * <p>Fine level: the rows are split into compact clusters; each is solved with its strongest
 * neighbours around it, and its own part of the solution is kept (restricted additive Schwarz, Cai
 * and Sarkis 1999, memory). Coarse level: every cluster has one density, that which holds its rows
 * at 1 V by the fine level; the potentials of these densities on one another make a small full
 * system for the net charges. What the fine level gives a cluster in net charge is taken out again,
 * since net charges act far beyond a cluster and are the coarse level's.
 */
final class ClusterInverse implements Gmres.Operator {
  private static final int CORE = 64;
  private static final int WITH_NEIGHBOURS = 160;
  private static final int MOST_CLUSTERS = 2000;
  private static final int SAMPLES = 16;

  /** Distance in radii from which a cluster acts as its net charge. */
  private static final double POINT_LIKE = 4;

  private final PotentialEntries entries;
  private final Workers workers;
  private final int[] order;
  private final int[] first;
  private final int[][] members;
  private final float[][] inverse;
  private final double[] equilibrium;
  private final double[] charge;
  private final double[] centre;
  private final double[] radius;
  private final LinearSolverDense<DMatrixRMaj> coarse;

  ClusterInverse(PotentialEntries entries, Workers workers) {
    this.entries = entries;
    this.workers = workers;
    int n = entries.charge.length;
    order = new int[n];
    for (int i = 0; i < n; i++) {
      order[i] = i;
    }
    int size = Math.max(CORE, (n + MOST_CLUSTERS - 1) / MOST_CLUSTERS);
    first = new Clusters(entries.place, order).split(size);
    int clusters = first.length - 1;
    members = new int[clusters][];
    inverse = new float[clusters][];
    equilibrium = new double[n];
    charge = new double[clusters];
    centre = new double[3 * clusters];
    radius = new double[clusters];
    workers.run(
        clusters,
        w -> {
          Block block = new Block(n);
          return block::build;
        });
    coarse = coarse(clusters);
  }

  /** Builds and inverts the system of one cluster; owned by one thread. */
  private final class Block {
    private final int[] slot;
    private final double[] score;

    Block(int n) {
      slot = new int[n];
      score = new double[n];
      Arrays.fill(slot, -1);
    }

    void build(int c) {
      int core = first[c + 1] - first[c];
      int[] nodes = withNeighbours(c, core);
      int m = nodes.length;
      for (int i = 0; i < m; i++) {
        slot[nodes[i]] = i;
      }
      DMatrixRMaj a = new DMatrixRMaj(m, m);
      for (int i = 0; i < m; i++) {
        int row = nodes[i];
        for (int j = 0; j < m; j++) {
          a.data[i * m + j] = i == j ? 0 : entries.far(row, nodes[j]);
        }
        for (int e = entries.first(row); e < entries.end(row); e++) {
          int j = slot[entries.node(e)];
          if (j >= 0) {
            a.data[i * m + j] = entries.near(row, e);
          }
        }
      }
      for (int node : nodes) {
        slot[node] = -1;
      }
      DMatrixRMaj inverted = new DMatrixRMaj(m, m);
      float[] kept = new float[core * m];
      if (CommonOps_DDRM.invert(a, inverted)) {
        for (int k = 0; k < kept.length; k++) {
          kept[k] = (float) inverted.data[k];
        }
      } else {
        for (int i = 0; i < core; i++) {
          kept[i * m + i] = (float) (1 / a.data[i * m + i]);
        }
      }
      members[c] = nodes;
      inverse[c] = kept;
      measure(c, core, m, kept);
    }

    private int[] withNeighbours(int c, int core) {
      int[] found = new int[256];
      int n = 0;
      for (int i = first[c]; i < first[c + 1]; i++) {
        slot[order[i]] = 0;
      }
      for (int i = first[c]; i < first[c + 1]; i++) {
        int row = order[i];
        for (int e = entries.first(row); e < entries.end(row); e++) {
          int j = entries.node(e);
          if (slot[j] < 0) {
            if (score[j] == 0) {
              if (n == found.length) {
                found = Arrays.copyOf(found, 2 * n);
              }
              found[n++] = j;
            }
            score[j] += entries.far(row, j) / entries.charge[j];
          }
        }
      }
      int most = Math.min(n, Math.max(WITH_NEIGHBOURS - core, core));
      int[] best =
          Arrays.stream(found, 0, n)
              .boxed()
              .sorted(
                  (a, b) -> {
                    int byScore = Double.compare(score[b], score[a]);
                    return byScore != 0 ? byScore : Integer.compare(a, b);
                  })
              .limit(most)
              .mapToInt(Integer::intValue)
              .toArray();
      for (int k = 0; k < n; k++) {
        score[found[k]] = 0;
      }
      int[] nodes = new int[core + best.length];
      for (int i = 0; i < core; i++) {
        nodes[i] = order[first[c] + i];
        slot[nodes[i]] = -1;
      }
      System.arraycopy(best, 0, nodes, core, best.length);
      return nodes;
    }

    private void measure(int c, int core, int m, float[] kept) {
      double q = 0;
      for (int i = 0; i < core; i++) {
        double sum = 0;
        for (int j = 0; j < m; j++) {
          sum += kept[i * m + j];
        }
        int node = order[first[c] + i];
        equilibrium[node] = sum;
        double own = sum * entries.charge[node];
        q += own;
        for (int k = 0; k < 3; k++) {
          centre[3 * c + k] += own * entries.centre[3 * node + k];
        }
      }
      charge[c] = q;
      for (int k = 0; k < 3; k++) {
        centre[3 * c + k] /= q;
      }
      for (int i = first[c]; i < first[c + 1]; i++) {
        radius[c] = Math.max(radius[c], distance(c, order[i]));
      }
    }
  }

  private double distance(int c, int row) {
    double dx = entries.place[3 * row] - centre[3 * c];
    double dy = entries.place[3 * row + 1] - centre[3 * c + 1];
    double dz = entries.place[3 * row + 2] - centre[3 * c + 2];
    return Math.sqrt(dx * dx + dy * dy + dz * dz);
  }

  private LinearSolverDense<DMatrixRMaj> coarse(int clusters) {
    DMatrixRMaj a = new DMatrixRMaj(clusters, clusters);
    int[] clusterOf = new int[order.length];
    for (int c = 0; c < clusters; c++) {
      for (int i = first[c]; i < first[c + 1]; i++) {
        clusterOf[order[i]] = c;
      }
    }
    workers.run(
        clusters,
        w -> {
          boolean[] near = new boolean[clusters];
          return c -> coarseRow(c, clusterOf, near, a.data);
        });
    LinearSolverDense<DMatrixRMaj> solver = LinearSolverFactory_DDRM.lu(clusters);
    return solver.setA(a) ? solver : null;
  }

  private void coarseRow(int c, int[] clusterOf, boolean[] near, double[] a) {
    int clusters = near.length;
    int core = first[c + 1] - first[c];
    int samples = Math.min(SAMPLES, core);
    for (int s = 0; s < samples; s++) {
      int row = order[first[c] + (int) ((s + 0.5) * core / samples)];
      for (int d = 0; d < clusters; d++) {
        near[d] = distance(d, row) < POINT_LIKE * radius[d];
        double sum = 0;
        if (near[d]) {
          for (int i = first[d]; i < first[d + 1]; i++) {
            int j = order[i];
            sum += j == row ? 0 : equilibrium[j] * entries.far(row, j);
          }
        } else {
          sum = entries.far(row, centre[3 * d], centre[3 * d + 1], centre[3 * d + 2], charge[d]);
        }
        a[c * clusters + d] += sum / samples;
      }
      for (int e = entries.first(row); e < entries.end(row); e++) {
        int j = entries.node(e);
        if (near[clusterOf[j]]) {
          double rough = j == row ? 0 : entries.far(row, j);
          a[c * clusters + clusterOf[j]] +=
              equilibrium[j] * (entries.near(row, e) - rough) / samples;
        }
      }
    }
  }

  @Override
  public void apply(double[][] x, double[][] y) {
    int clusters = first.length - 1;
    for (int k = 0; k < x.length; k++) {
      double[] in = x[k];
      double[] out = y[k];
      DMatrixRMaj mean = new DMatrixRMaj(clusters, 1);
      DMatrixRMaj net = new DMatrixRMaj(clusters, 1);
      double[] excess = new double[clusters];
      workers.run(
          clusters,
          w ->
              c -> {
                local(c, in, out);
                double sum = 0;
                double q = 0;
                for (int i = first[c]; i < first[c + 1]; i++) {
                  sum += in[order[i]];
                  q += out[order[i]] * entries.charge[order[i]];
                }
                mean.data[c] = sum / (first[c + 1] - first[c]);
                excess[c] = q / charge[c];
              });
      if (coarse == null) {
        continue;
      }
      coarse.solve(mean, net);
      for (int c = 0; c < clusters; c++) {
        double share = net.data[c] - excess[c];
        for (int i = first[c]; i < first[c + 1]; i++) {
          out[order[i]] += share * equilibrium[order[i]];
        }
      }
    }
  }

  private void local(int c, double[] in, double[] out) {
    int[] nodes = members[c];
    float[] a = inverse[c];
    int m = nodes.length;
    double[] gathered = new double[m];
    for (int j = 0; j < m; j++) {
      gathered[j] = in[nodes[j]];
    }
    int core = first[c + 1] - first[c];
    for (int i = 0; i < core; i++) {
      double sum = 0;
      for (int j = 0; j < m; j++) {
        sum += a[i * m + j] * gathered[j];
      }
      out[nodes[i]] = sum;
    }
  }
}
