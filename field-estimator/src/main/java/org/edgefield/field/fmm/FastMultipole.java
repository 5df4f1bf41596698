package org.edgefield.field.fmm;

import java.util.Arrays;
import org.edgefield.field.parallel.Workers;

/**
 * Sums phi(x_t) = sum_s q_s / |x_t - y_s| over many sources and targets, and their gradients, by
 * the fast multipole method (Greengard and Rokhlin, J. Comput. Phys. 73 (1987) 325, memory) on an
 * adaptive octree. A source that coincides with a target does not act on it. No factor 1/(4 pi
 * eps0) is included.
 *
 * <p>Guarantee: the relative root mean square error of potentials and of gradients over all targets
 * stays below the requested accuracy (measured for strengths of random sign, the hardest common
 * case). Limit: single potentials that are much smaller than the root mean square carry a larger
 * relative error of their own. Poor case: points that coincide in their thousands cannot be told
 * apart by the tree and are summed directly.
 *
 * <p>The geometry is prepared once; strengths may change from call to call. The result does not
 * depend on the number of threads. One object serves one caller at a time.
 */
public final class FastMultipole {
  private static final int LANES = 64;

  private final int order;
  private final int coefficients;
  private final Workers workers;
  private final Octree tree;
  private final InteractionLists lists;
  private final Translations translations;
  private final NearField.Points targets;
  private final double[] sx;
  private final double[] sy;
  private final double[] sz;

  private int rights;
  private double[] multipole = new double[0];
  private double[] local = new double[0];

  /**
   * Prepares tree, lists and tables.
   *
   * @param sources source points, 3 each, metres
   * @param targets target points, 3 each, metres
   * @param tolerance relative accuracy asked for, 1e-12 to below 1
   * @param workers threads to use; must stay open as long as this object is used
   */
  public FastMultipole(double[] sources, double[] targets, double tolerance, Workers workers) {
    this.order = ExpansionOrder.of(tolerance);
    this.coefficients = SolidHarmonics.count(order);
    this.workers = workers;
    this.tree = new Octree(sources, targets, capacity(order));
    this.lists = new InteractionLists(tree, order, workers);
    this.translations = new Translations(order);
    this.sx = sorted(sources, tree.sourceOrder, 0);
    this.sy = sorted(sources, tree.sourceOrder, 1);
    this.sz = sorted(sources, tree.sourceOrder, 2);
    this.targets =
        new NearField.Points(
            sorted(targets, tree.targetOrder, 0),
            sorted(targets, tree.targetOrder, 1),
            sorted(targets, tree.targetOrder, 2),
            null);
  }

  // Leaves grow with the order so that direct sums and expansions cost about the same.
  private static int capacity(int order) {
    return 20 + 7 * order;
  }

  private static double[] sorted(double[] points, int[] index, int axis) {
    double[] out = new double[index.length];
    for (int i = 0; i < out.length; i++) {
      out[i] = points[3 * index[i] + axis];
    }
    return out;
  }

  /**
   * Sums for one or more sets of strengths in one sweep.
   *
   * @param strengths per set, one strength per source
   * @param potential out: per set, one value per target
   * @param gradient out: per set, 3 values per target; null where not wanted
   */
  public void sum(double[][] strengths, double[][] potential, double[][] gradient) {
    rights = strengths.length;
    int need = Math.multiplyExact(Math.multiplyExact(tree.size(), rights), coefficients);
    if (multipole.length < need) {
      multipole = new double[need];
      local = new double[need];
    } else {
      Arrays.fill(multipole, 0, need, 0);
      Arrays.fill(local, 0, need, 0);
    }
    double[][] q = new double[rights][];
    for (int k = 0; k < rights; k++) {
      q[k] = new double[sx.length];
      for (int i = 0; i < sx.length; i++) {
        q[k][i] = strengths[k][tree.sourceOrder[i]];
      }
    }
    NearField.Points sources = new NearField.Points(sx, sy, sz, q);
    int nt = targets.x().length;
    double[][] phi = new double[rights][nt];
    double[][] grad = gradient == null ? null : new double[rights][3 * nt];

    for (int l = tree.levels() - 1; l >= 2; l--) {
      level(l, w -> new Upward(sources)::block);
    }
    for (int l = 2; l < tree.levels(); l++) {
      level(l, w -> new Downward(sources)::block);
    }
    workers.run(
        lists.blockLevel.length, w -> new AtTargets(sources, phi, grad, gradient != null)::block);

    for (int k = 0; k < rights; k++) {
      for (int i = 0; i < nt; i++) {
        potential[k][tree.targetOrder[i]] = phi[k][i];
      }
      if (gradient != null) {
        for (int i = 0; i < nt; i++) {
          System.arraycopy(grad[k], 3 * i, gradient[k], 3 * tree.targetOrder[i], 3);
        }
      }
    }
  }

  private void level(int l, java.util.function.IntFunction<Workers.Task> tasks) {
    int first = Arrays.binarySearch(lists.blockStart, tree.levelStart[l]);
    int last = first;
    while (last < lists.blockLevel.length && lists.blockLevel[last] == l) {
      last++;
    }
    workers.run(
        last - first,
        w -> {
          Workers.Task task = tasks.apply(w);
          return b -> task.run(first + b);
        });
  }

  private int at(int box, int right) {
    return (box * rights + right) * coefficients;
  }

  /** Scratch of one worker: a batch of expansions, coefficient-major. */
  private class Batch {
    final double[] a = new double[coefficients * LANES];
    final double[] b = new double[coefficients * LANES];
    final int[] from = new int[LANES];
    final int[] to = new int[LANES];
    int lanes;

    void load(double[] store) {
      for (int i = 0; i < lanes; i++) {
        int p = from[i];
        for (int k = 0, q = i; k < coefficients; k++, q += LANES) {
          a[q] = store[p + k];
        }
      }
    }

    void addTo(double[] store) {
      for (int i = 0; i < lanes; i++) {
        int p = to[i];
        for (int k = 0, q = i; k < coefficients; k++, q += LANES) {
          store[p + k] += b[q];
        }
      }
    }

    void put(int boxFrom, int boxTo, int right) {
      from[lanes] = at(boxFrom, right);
      to[lanes] = at(boxTo, right);
      lanes++;
    }
  }

  /** Points of one box relative to a centre, in box sides, a lane each. */
  private class Cloud {
    final SolidHarmonics harmonics;
    final double[] x = new double[LANES];
    final double[] y = new double[LANES];
    final double[] z = new double[LANES];
    final double[] value;

    Cloud(int degree) {
      harmonics = new SolidHarmonics(degree);
      value = new double[SolidHarmonics.count(degree) * LANES];
    }

    void relative(double[] px, double[] py, double[] pz, int first, int n, int box) {
      double scale = 1 / tree.side(tree.level[box]);
      double cx = tree.centre(box, 0);
      double cy = tree.centre(box, 1);
      double cz = tree.centre(box, 2);
      for (int i = 0; i < n; i++) {
        x[i] = (px[first + i] - cx) * scale;
        y[i] = (py[first + i] - cy) * scale;
        z[i] = (pz[first + i] - cz) * scale;
      }
    }

    /** Adds sum_i q_i value_k(i) to the coefficients at {@code to}. */
    void gather(int n, double[] q, int first, double[] store, int to) {
      for (int k = 0; k < coefficients; k++) {
        double sum = 0;
        for (int i = 0, v = k * LANES; i < n; i++, v++) {
          sum += q[first + i] * value[v];
        }
        store[to + k] += sum;
      }
    }

    /** Adds factor sum_k c_k value_k(i) to the points' {@code out}. */
    void spread(int n, double[] c, int at, int count, double factor, double[] sum) {
      Arrays.fill(sum, 0, n, 0);
      for (int k = 0; k < count; k++) {
        double f = c[at + k];
        int v = k * LANES;
        for (int i = 0; i < n; i++) {
          sum[i] += f * value[v + i];
        }
      }
      for (int i = 0; i < n; i++) {
        sum[i] *= factor;
      }
    }
  }

  /** Multipoles of the boxes of a block: from sources at leaves, from children elsewhere. */
  private final class Upward extends Batch {
    private final NearField.Points sources;
    private final Cloud cloud = new Cloud(order);

    Upward(NearField.Points sources) {
      this.sources = sources;
    }

    void block(int block) {
      int begin = lists.blockStart[block];
      int end = lists.blockStart[block + 1];
      for (int b = begin; b < end; b++) {
        if (tree.isLeaf(b)) {
          leaf(b);
        }
      }
      for (int octant = 0; octant < 8; octant++) {
        lanes = 0;
        for (int b = begin; b < end; b++) {
          int child = child(b, octant);
          if (child < 0 || tree.sources(child) == 0) {
            continue;
          }
          for (int k = 0; k < rights; k++) {
            put(child, b, k);
            if (lanes == LANES) {
              flush(octant);
            }
          }
        }
        flush(octant);
      }
    }

    private void leaf(int b) {
      for (int s = tree.sourceStart[b]; s < tree.sourceEnd[b]; s += LANES) {
        int n = Math.min(LANES, tree.sourceEnd[b] - s);
        cloud.relative(sources.x(), sources.y(), sources.z(), s, n, b);
        cloud.harmonics.regular(n, cloud.x, cloud.y, cloud.z, LANES, cloud.value);
        for (int k = 0; k < rights; k++) {
          cloud.gather(n, sources.strength()[k], s, multipole, at(b, k));
        }
      }
    }

    private void flush(int octant) {
      if (lanes > 0) {
        load(multipole);
        translations.toParent(octant, lanes, LANES, a, b);
        addTo(multipole);
        lanes = 0;
      }
    }
  }

  private int child(int box, int octant) {
    for (int c = tree.firstChild[box];
        c >= 0 && c < tree.firstChild[box] + tree.childCount[box];
        c++) {
      if (octant(c) == octant) {
        return c;
      }
    }
    return -1;
  }

  private int octant(int box) {
    return (tree.cell[3 * box] & 1)
        | (tree.cell[3 * box + 1] & 1) << 1
        | (tree.cell[3 * box + 2] & 1) << 2;
  }

  /** Local expansions of the boxes of a block: from the parent, from afar, from large leaves. */
  private final class Downward extends Batch {
    private final NearField.Points sources;
    private final Cloud cloud = new Cloud(order);

    Downward(NearField.Points sources) {
      this.sources = sources;
    }

    void block(int block) {
      int begin = lists.blockStart[block];
      int end = lists.blockStart[block + 1];
      for (int octant = 0; octant < 8; octant++) {
        lanes = 0;
        for (int b = begin; b < end; b++) {
          if (tree.level[b] <= 2 || tree.targets(b) == 0 || octant(b) != octant) {
            continue;
          }
          for (int k = 0; k < rights; k++) {
            put(tree.parent[b], b, k);
            if (lanes == LANES) {
              fromParent(octant);
            }
          }
        }
        fromParent(octant);
      }
      across(lists.pairs[block]);
      for (int b = begin; b < end; b++) {
        if (lists.sourcesIntoLocal[b] != null) {
          for (int s : lists.sourcesIntoLocal[b]) {
            direct(s, b);
          }
        }
      }
    }

    private void fromParent(int octant) {
      if (lanes > 0) {
        load(local);
        translations.toChild(octant, lanes, LANES, a, b);
        addTo(local);
        lanes = 0;
      }
    }

    private void across(int[] pairs) {
      lanes = 0;
      int direction = -1;
      for (int p = 0; p < pairs.length; p += 3) {
        if (pairs[p + 2] != direction) {
          fromAfar(direction);
          direction = pairs[p + 2];
        }
        for (int k = 0; k < rights; k++) {
          put(pairs[p + 1], pairs[p], k);
          if (lanes == LANES) {
            fromAfar(direction);
          }
        }
      }
      fromAfar(direction);
    }

    private void fromAfar(int direction) {
      if (lanes > 0) {
        load(multipole);
        translations.across(direction, lanes, LANES, a, b);
        addTo(local);
        lanes = 0;
      }
    }

    private void direct(int sourceLeaf, int box) {
      for (int s = tree.sourceStart[sourceLeaf]; s < tree.sourceEnd[sourceLeaf]; s += LANES) {
        int n = Math.min(LANES, tree.sourceEnd[sourceLeaf] - s);
        cloud.relative(sources.x(), sources.y(), sources.z(), s, n, box);
        cloud.harmonics.irregular(n, cloud.x, cloud.y, cloud.z, LANES, cloud.value);
        for (int k = 0; k < rights; k++) {
          cloud.gather(n, sources.strength()[k], s, local, at(box, k));
        }
      }
    }
  }

  /** Values at the targets of the leaves of a block. */
  private final class AtTargets {
    private final NearField.Points sources;
    private final double[][] phi;
    private final double[][] grad;
    private final NearField near = new NearField(rights);
    private final Cloud regular = new Cloud(order);
    private final Cloud irregular;
    private final double[][] slope;
    private final double[] sum = new double[LANES];

    AtTargets(NearField.Points sources, double[][] phi, double[][] grad, boolean wantsGradient) {
      this.sources = sources;
      this.phi = phi;
      this.grad = grad;
      this.irregular = new Cloud(wantsGradient ? order + 1 : order);
      this.slope = wantsGradient ? new double[3][SolidHarmonics.count(order + 1)] : null;
    }

    void block(int block) {
      for (int b = lists.blockStart[block]; b < lists.blockStart[block + 1]; b++) {
        if (lists.near[b] == null || tree.targets(b) == 0) {
          continue;
        }
        near.add(
            lists.near[b], sources, targets, tree.targetStart[b], tree.targetEnd[b], phi, grad);
        for (int t = tree.targetStart[b]; t < tree.targetEnd[b]; t += LANES) {
          int n = Math.min(LANES, tree.targetEnd[b] - t);
          if (tree.level[b] >= 2) {
            fromLocal(b, t, n);
          }
          if (lists.multipoleAtTargets[b] != null) {
            for (int s : lists.multipoleAtTargets[b]) {
              fromMultipole(s, t, n);
            }
          }
        }
      }
    }

    private void fromLocal(int b, int t, int n) {
      double scale = 1 / tree.side(tree.level[b]);
      regular.relative(targets.x(), targets.y(), targets.z(), t, n, b);
      regular.harmonics.regular(n, regular.x, regular.y, regular.z, LANES, regular.value);
      for (int k = 0; k < rights; k++) {
        regular.spread(n, local, at(b, k), coefficients, scale, sum);
        addPotential(k, t, n);
        if (grad != null) {
          regular.harmonics.localGradient(local, at(b, k), slope[0], slope[1], slope[2]);
          addGradient(regular, k, t, n, SolidHarmonics.count(order - 1), scale * scale);
        }
      }
    }

    private void fromMultipole(int s, int t, int n) {
      double scale = 1 / tree.side(tree.level[s]);
      irregular.relative(targets.x(), targets.y(), targets.z(), t, n, s);
      irregular.harmonics.irregular(
          n, irregular.x, irregular.y, irregular.z, LANES, irregular.value);
      for (int k = 0; k < rights; k++) {
        irregular.spread(n, multipole, at(s, k), coefficients, scale, sum);
        addPotential(k, t, n);
        if (grad != null) {
          irregular.harmonics.multipoleGradient(multipole, at(s, k), slope[0], slope[1], slope[2]);
          addGradient(irregular, k, t, n, SolidHarmonics.count(order + 1), scale * scale);
        }
      }
    }

    private void addPotential(int k, int t, int n) {
      for (int i = 0; i < n; i++) {
        phi[k][t + i] += sum[i];
      }
    }

    private void addGradient(Cloud cloud, int k, int t, int n, int count, double factor) {
      for (int d = 0; d < 3; d++) {
        cloud.spread(n, slope[d], 0, count, factor, sum);
        for (int i = 0; i < n; i++) {
          grad[k][3 * (t + i) + d] += sum[i];
        }
      }
    }
  }
}
