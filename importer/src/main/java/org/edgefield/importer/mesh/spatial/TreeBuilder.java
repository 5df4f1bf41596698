package org.edgefield.importer.mesh.spatial;

import java.util.Arrays;

/**
 * Builds a {@link TriangleTree} from the top with the surface-area heuristic over bins of the
 * centroids.
 *
 * <p>Reference: I. Wald, "On fast construction of SAH-based bounding volume hierarchies", IEEE
 * Symposium on Interactive Ray Tracing 2007 (from memory). Where the heuristic finds no split (all
 * centroids in one place) or the tree has grown deep, the range is halved, so the depth is bounded.
 */
final class TreeBuilder {
  private static final int BINS = 16;
  private static final int LEAF_SIZE = 4;

  /** Beyond this depth ranges are halved; at most 31 more levels follow. */
  private static final int HEURISTIC_DEPTH = 40;

  private final double[] xyz;
  private final int[] triangles;
  private final int[] triangleGroup;

  /** Bounds per kept triangle, 6 each, and its centre, 3 each (the middle of the bounds). */
  private final double[] box;

  private final int[] kept;
  private final int[] order;

  private double[] bounds;
  private int[] link;
  private byte[] leafCount;
  private long[] groupBits;
  private int nodes;
  private int deepest;

  private final int[] binCount = new int[BINS];
  private final double[] binBox = new double[6 * BINS];
  private final double[] rightArea = new double[BINS];
  private final double[] scratch = new double[6];

  TreeBuilder(double[] xyz, int[] triangles, int[] triangleGroup) {
    if (triangles.length != 3 * triangleGroup.length) {
      throw new IllegalArgumentException(
          "one group per triangle expected: "
              + triangles.length / 3
              + " triangles, "
              + triangleGroup.length
              + " groups");
    }
    this.xyz = xyz;
    this.triangles = triangles;
    this.triangleGroup = triangleGroup;
    int n = 0;
    for (int g : triangleGroup) {
      if (g >= 0) {
        n++;
      }
    }
    kept = new int[n];
    order = new int[n];
    box = new double[6 * n];
    n = 0;
    for (int t = 0; t < triangleGroup.length; t++) {
      if (triangleGroup[t] >= 0) {
        order[n] = n;
        kept[n] = t;
        boxOf(t, n++);
      }
    }
  }

  private void boxOf(int t, int slot) {
    for (int c = 0; c < 3; c++) {
      double a = xyz[3 * triangles[3 * t] + c];
      double b = xyz[3 * triangles[3 * t + 1] + c];
      double d = xyz[3 * triangles[3 * t + 2] + c];
      double low = Math.min(a, Math.min(b, d));
      double high = Math.max(a, Math.max(b, d));
      // Math.min and max hand on NaN, and infinities stay.
      if (!Double.isFinite(low) || !Double.isFinite(high)) {
        throw new IllegalArgumentException(
            "triangle " + t + " has a coordinate that is not finite");
      }
      box[6 * slot + c] = low;
      box[6 * slot + 3 + c] = high;
    }
  }

  TriangleTree build() {
    int n = order.length;
    int capacity = Math.max(1, 2 * n);
    bounds = new double[6 * capacity];
    link = new int[capacity];
    leafCount = new byte[capacity];
    groupBits = new long[capacity];
    if (n > 0) {
      node(0, n, 0);
    }
    double[] corners = new double[9 * n];
    int[] group = new int[n];
    int[] triangle = new int[n];
    int groups = 0;
    for (int i = 0; i < n; i++) {
      int t = kept[order[i]];
      triangle[i] = t;
      group[i] = triangleGroup[t];
      groups = Math.max(groups, group[i] + 1);
      for (int k = 0; k < 3; k++) {
        System.arraycopy(xyz, 3 * triangles[3 * t + k], corners, 9 * i + 3 * k, 3);
      }
    }
    return new TriangleTree(
        Arrays.copyOf(bounds, 6 * nodes),
        Arrays.copyOf(link, nodes),
        Arrays.copyOf(leafCount, nodes),
        Arrays.copyOf(groupBits, nodes),
        corners,
        group,
        triangle,
        groups,
        deepest);
  }

  /** Makes the node over a range of the order and everything below it. */
  private void node(int from, int to, int depth) {
    int me = nodes++;
    deepest = Math.max(deepest, depth);
    clear(bounds, 6 * me);
    long bits = 0;
    for (int i = from; i < to; i++) {
      grow(bounds, 6 * me, box, 6 * order[i]);
      bits |= 1L << (triangleGroup[kept[order[i]]] & 63);
    }
    groupBits[me] = bits;
    int middle = to - from <= LEAF_SIZE ? from : split(from, to, depth);
    if (middle == from) {
      link[me] = from;
      leafCount[me] = (byte) (to - from);
      return;
    }
    node(from, middle, depth + 1);
    link[me] = nodes;
    node(middle, to, depth + 1);
  }

  /** Partitions a range and returns the first index of its second half. */
  private int split(int from, int to, int depth) {
    double low = 0;
    double extent = 0;
    int axis = 0;
    for (int c = 0; c < 3; c++) {
      double least = Double.POSITIVE_INFINITY;
      double most = Double.NEGATIVE_INFINITY;
      for (int i = from; i < to; i++) {
        double m = centre(order[i], c);
        least = Math.min(least, m);
        most = Math.max(most, m);
      }
      if (most - least > extent) {
        extent = most - least;
        low = least;
        axis = c;
      }
    }
    double scale = BINS / extent;
    // An overflowing scale means that all centres are as good as one point.
    if (depth >= HEURISTIC_DEPTH || !(scale < Double.MAX_VALUE)) {
      return (from + to) >>> 1;
    }
    int cut = bestCut(from, to, axis, low, scale);
    int i = from;
    int j = to - 1;
    while (i <= j) {
      if (bin(order[i], axis, low, scale) <= cut) {
        i++;
      } else {
        int swap = order[i];
        order[i] = order[j];
        order[j--] = swap;
      }
    }
    return i == from || i == to ? (from + to) >>> 1 : i;
  }

  /** Bin after which to cut so that the sum of area times count over both sides is least. */
  private int bestCut(int from, int to, int axis, double low, double scale) {
    Arrays.fill(binCount, 0);
    for (int b = 0; b < BINS; b++) {
      clear(binBox, 6 * b);
    }
    for (int i = from; i < to; i++) {
      int b = bin(order[i], axis, low, scale);
      binCount[b]++;
      grow(binBox, 6 * b, box, 6 * order[i]);
    }
    clear(scratch, 0);
    for (int b = BINS - 1; b > 0; b--) {
      grow(scratch, 0, binBox, 6 * b);
      rightArea[b] = area(scratch);
    }
    clear(scratch, 0);
    int left = 0;
    int best = 0;
    double least = Double.POSITIVE_INFINITY;
    for (int b = 0; b < BINS - 1; b++) {
      grow(scratch, 0, binBox, 6 * b);
      left += binCount[b];
      int right = to - from - left;
      if (left == 0 || right == 0) {
        continue;
      }
      double cost = left * area(scratch) + right * rightArea[b + 1];
      if (cost < least) {
        least = cost;
        best = b;
      }
    }
    return best;
  }

  private int bin(int slot, int axis, double low, double scale) {
    return Math.min(BINS - 1, (int) ((centre(slot, axis) - low) * scale));
  }

  private double centre(int slot, int axis) {
    return 0.5 * (box[6 * slot + axis] + box[6 * slot + 3 + axis]);
  }

  private static void clear(double[] b, int at) {
    Arrays.fill(b, at, at + 3, Double.POSITIVE_INFINITY);
    Arrays.fill(b, at + 3, at + 6, Double.NEGATIVE_INFINITY);
  }

  private static void grow(double[] b, int at, double[] by, int from) {
    for (int c = 0; c < 3; c++) {
      b[at + c] = Math.min(b[at + c], by[from + c]);
      b[at + 3 + c] = Math.max(b[at + 3 + c], by[from + 3 + c]);
    }
  }

  private static double area(double[] b) {
    double x = b[3] - b[0];
    if (x < 0) {
      return 0;
    }
    double y = b[4] - b[1];
    double z = b[5] - b[2];
    return x * y + y * z + z * x;
  }
}
