package org.edgefield.field.fmm;

import java.util.Arrays;

/**
 * Adaptive octree over sources and targets. Boxes are numbered level by level, children of a box
 * one after another; points are sorted so that every box owns contiguous ranges of sources and
 * targets. A box is split while it holds more than the capacity of either kind.
 */
final class Octree {
  /** Deepest level: 20 bits a coordinate fit one sorting key. */
  static final int DEEPEST = 20;

  /** First box of each level; the last entry is the number of boxes. */
  final int[] levelStart;

  /** Level per box. */
  final int[] level;

  /** Integer coordinates within the level, 3 per box. */
  final int[] cell;

  /** Parent per box, -1 at the root. */
  final int[] parent;

  /** First child per box, -1 at a leaf. */
  final int[] firstChild;

  /** Number of children per box. */
  final byte[] childCount;

  /** Source range of a box: {@code sourceStart[b] .. sourceEnd[b] - 1} in sorted order. */
  final int[] sourceStart;

  final int[] sourceEnd;

  /** Target range of a box in sorted order. */
  final int[] targetStart;

  final int[] targetEnd;

  /** Original index of the sorted sources. */
  final int[] sourceOrder;

  /** Original index of the sorted targets. */
  final int[] targetOrder;

  /** Lowest corner of the root box. */
  final double[] origin;

  /** Side of the root box, metres. */
  final double side;

  /**
   * Builds the tree.
   *
   * @param sources source points, 3 each, metres
   * @param targets target points, 3 each, metres
   * @param capacity largest number of sources or targets in a leaf above the deepest level
   */
  Octree(double[] sources, double[] targets, int capacity) {
    double[] low = {Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY};
    double[] high = {Double.NEGATIVE_INFINITY, Double.NEGATIVE_INFINITY, Double.NEGATIVE_INFINITY};
    bound(sources, low, high);
    bound(targets, low, high);
    double extent = 0;
    for (int d = 0; d < 3; d++) {
      extent = Math.max(extent, high[d] - low[d]);
    }
    // A little larger than the points, so that none lies on the far wall.
    side = extent > 0 ? extent * (1 + 1e-9) : 1;
    origin = new double[3];
    for (int d = 0; d < 3; d++) {
      origin[d] = 0.5 * (low[d] + high[d]) - 0.5 * side;
    }
    long[] sourceKey = keys(sources);
    long[] targetKey = keys(targets);
    sourceOrder = MortonSort.sort(sourceKey);
    targetOrder = MortonSort.sort(targetKey);

    Growth g = new Growth(1024);
    g.add(0, 0, 0, 0, -1, 0, sourceKey.length, 0, targetKey.length);
    int[] starts = new int[DEEPEST + 3];
    int levels = 1;
    starts[1] = 1;
    for (int l = 0; l < DEEPEST; l++) {
      for (int b = starts[l]; b < starts[l + 1]; b++) {
        int ns = g.sourceEnd[b] - g.sourceStart[b];
        int nt = g.targetEnd[b] - g.targetStart[b];
        if (ns > capacity || nt > capacity) {
          g.split(b, l, sourceKey, targetKey);
        }
      }
      if (g.size == starts[l + 1]) {
        break;
      }
      levels++;
      starts[l + 2] = g.size;
    }
    levelStart = Arrays.copyOf(starts, levels + 1);
    level = Arrays.copyOf(g.level, g.size);
    cell = Arrays.copyOf(g.cell, 3 * g.size);
    parent = Arrays.copyOf(g.parent, g.size);
    firstChild = Arrays.copyOf(g.firstChild, g.size);
    childCount = Arrays.copyOf(g.childCount, g.size);
    sourceStart = Arrays.copyOf(g.sourceStart, g.size);
    sourceEnd = Arrays.copyOf(g.sourceEnd, g.size);
    targetStart = Arrays.copyOf(g.targetStart, g.size);
    targetEnd = Arrays.copyOf(g.targetEnd, g.size);
  }

  /** Number of boxes. */
  int size() {
    return level.length;
  }

  /** Number of levels, the root's included. */
  int levels() {
    return levelStart.length - 1;
  }

  boolean isLeaf(int box) {
    return firstChild[box] < 0;
  }

  int sources(int box) {
    return sourceEnd[box] - sourceStart[box];
  }

  int targets(int box) {
    return targetEnd[box] - targetStart[box];
  }

  /** Side of the boxes of a level, metres. */
  double side(int ofLevel) {
    return Math.scalb(side, -ofLevel);
  }

  /** Centre coordinate of a box along an axis, metres. */
  double centre(int box, int axis) {
    return origin[axis] + (cell[3 * box + axis] + 0.5) * side(level[box]);
  }

  /** Whether two boxes of any levels share at least a corner. */
  boolean adjacent(int a, int b) {
    int la = level[a];
    int lb = level[b];
    int up = Math.max(la, lb);
    int sa = up - la;
    int sb = up - lb;
    for (int d = 0; d < 3; d++) {
      int a0 = cell[3 * a + d] << sa;
      int b0 = cell[3 * b + d] << sb;
      if (a0 > b0 + (1 << sb) || b0 > a0 + (1 << sa)) {
        return false;
      }
    }
    return true;
  }

  private static void bound(double[] points, double[] low, double[] high) {
    for (int i = 0; i < points.length; i++) {
      int d = i % 3;
      if (!(Math.abs(points[i]) <= Double.MAX_VALUE)) {
        throw new IllegalArgumentException("point " + i / 3 + " is not finite");
      }
      low[d] = Math.min(low[d], points[i]);
      high[d] = Math.max(high[d], points[i]);
    }
  }

  private long[] keys(double[] points) {
    long[] key = new long[points.length / 3];
    double scale = (1 << DEEPEST) / side;
    int top = (1 << DEEPEST) - 1;
    for (int i = 0; i < key.length; i++) {
      long k = 0;
      for (int d = 0; d < 3; d++) {
        int c = (int) ((points[3 * i + d] - origin[d]) * scale);
        k |= MortonSort.spread(Math.max(0, Math.min(top, c))) << d;
      }
      key[i] = k;
    }
    return key;
  }

  /** Box arrays while their number is not known. */
  private static final class Growth {
    private int size;
    private int[] level;
    private int[] cell;
    private int[] parent;
    private int[] firstChild;
    private byte[] childCount;
    private int[] sourceStart;
    private int[] sourceEnd;
    private int[] targetStart;
    private int[] targetEnd;

    Growth(int room) {
      level = new int[room];
      cell = new int[3 * room];
      parent = new int[room];
      firstChild = new int[room];
      childCount = new byte[room];
      sourceStart = new int[room];
      sourceEnd = new int[room];
      targetStart = new int[room];
      targetEnd = new int[room];
    }

    void add(int l, int x, int y, int z, int above, int s0, int s1, int t0, int t1) {
      if (size == level.length) {
        int room = 2 * size;
        level = Arrays.copyOf(level, room);
        cell = Arrays.copyOf(cell, 3 * room);
        parent = Arrays.copyOf(parent, room);
        firstChild = Arrays.copyOf(firstChild, room);
        childCount = Arrays.copyOf(childCount, room);
        sourceStart = Arrays.copyOf(sourceStart, room);
        sourceEnd = Arrays.copyOf(sourceEnd, room);
        targetStart = Arrays.copyOf(targetStart, room);
        targetEnd = Arrays.copyOf(targetEnd, room);
      }
      level[size] = l;
      cell[3 * size] = x;
      cell[3 * size + 1] = y;
      cell[3 * size + 2] = z;
      parent[size] = above;
      firstChild[size] = -1;
      sourceStart[size] = s0;
      sourceEnd[size] = s1;
      targetStart[size] = t0;
      targetEnd[size] = t1;
      size++;
    }

    void split(int b, int l, long[] sourceKey, long[] targetKey) {
      int shift = 3 * (DEEPEST - l - 1);
      firstChild[b] = size;
      int s = sourceStart[b];
      int t = targetStart[b];
      for (int octant = 0; octant < 8; octant++) {
        int s1 = end(sourceKey, s, sourceEnd[b], shift, octant);
        int t1 = end(targetKey, t, targetEnd[b], shift, octant);
        if (s1 > s || t1 > t) {
          int x = 2 * cell[3 * b] + (octant & 1);
          int y = 2 * cell[3 * b + 1] + (octant >> 1 & 1);
          int z = 2 * cell[3 * b + 2] + (octant >> 2);
          add(l + 1, x, y, z, b, s, s1, t, t1);
          childCount[b]++;
        }
        s = s1;
        t = t1;
      }
    }

    // First index past the keys of this octant; keys are sorted.
    private static int end(long[] key, int from, int to, int shift, int octant) {
      int lo = from;
      int hi = to;
      while (lo < hi) {
        int mid = (lo + hi) >>> 1;
        if ((key[mid] >>> shift & 7) <= octant) {
          lo = mid + 1;
        } else {
          hi = mid;
        }
      }
      return lo;
    }
  }
}
