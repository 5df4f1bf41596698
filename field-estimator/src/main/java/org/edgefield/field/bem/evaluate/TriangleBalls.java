package org.edgefield.field.bem.evaluate;

import org.edgefield.field.bem.surface.CurvedTriangles;

/**
 * Finds the triangles whose near zone holds a point: a ball of a few diameters about the middle.
 * Bounding boxes of the balls in a binary tree. Answers come in the same order on every run.
 */
final class TriangleBalls {
  private static final int LEAF = 8;

  private final double[] ball;
  private final int[] order;
  private final double[] bounds;
  private final int[] begin;
  private final int[] end;
  private final int[] second;
  private int nodes;

  /**
   * Builds the tree.
   *
   * @param triangles geometry
   * @param reach radius of the near zone over a triangle's diameter
   */
  TriangleBalls(CurvedTriangles triangles, double reach) {
    int n = triangles.count();
    ball = new double[4 * n];
    order = new int[n];
    for (int e = 0; e < n; e++) {
      for (int d = 0; d < 3; d++) {
        ball[4 * e + d] = triangles.centre(e, d);
      }
      ball[4 * e + 3] = reach * triangles.diameter(e);
      order[e] = e;
    }
    int room = Math.max(1, 4 * n / LEAF + 4);
    bounds = new double[6 * room];
    begin = new int[room];
    end = new int[room];
    second = new int[room];
    if (n > 0) {
      build(0, n);
    }
  }

  private int build(int from, int to) {
    int node = nodes++;
    begin[node] = from;
    end[node] = to;
    int at = 6 * node;
    double[] low = {1e300, 1e300, 1e300};
    double[] high = {-1e300, -1e300, -1e300};
    for (int d = 0; d < 3; d++) {
      bounds[at + d] = 1e300;
      bounds[at + 3 + d] = -1e300;
    }
    for (int i = from; i < to; i++) {
      int e = 4 * order[i];
      for (int d = 0; d < 3; d++) {
        double c = ball[e + d];
        low[d] = Math.min(low[d], c);
        high[d] = Math.max(high[d], c);
        bounds[at + d] = Math.min(bounds[at + d], c - ball[e + 3]);
        bounds[at + 3 + d] = Math.max(bounds[at + 3 + d], c + ball[e + 3]);
      }
    }
    if (to - from <= LEAF) {
      return node;
    }
    int axis = 0;
    for (int d = 1; d < 3; d++) {
      if (high[d] - low[d] > high[axis] - low[axis]) {
        axis = d;
      }
    }
    int middle = (from + to) >>> 1;
    select(from, to - 1, middle, axis);
    build(from, middle);
    second[node] = build(middle, to);
    return node;
  }

  /** Partial sort that brings the k-th centroid along an axis to its place. */
  private void select(int from, int to, int k, int axis) {
    int lo = from;
    int hi = to;
    while (lo < hi) {
      int pivot = order[(lo + hi) >>> 1];
      int i = lo;
      int j = hi;
      while (i <= j) {
        while (less(order[i], pivot, axis)) {
          i++;
        }
        while (less(pivot, order[j], axis)) {
          j--;
        }
        if (i <= j) {
          int swap = order[i];
          order[i++] = order[j];
          order[j--] = swap;
        }
      }
      if (k <= j) {
        hi = j;
      } else if (k >= i) {
        lo = i;
      } else {
        return;
      }
    }
  }

  private boolean less(int e, int f, int axis) {
    double a = ball[4 * e + axis];
    double b = ball[4 * f + axis];
    return a < b || (a == b && e < f);
  }

  /** Query storage of one thread: the triangles found last. */
  final class Query {
    private int[] found = new int[256];
    private final int[] stack = new int[64];
    private int count;

    /** Number found. */
    int count() {
      return count;
    }

    /** A triangle found. */
    int triangle(int i) {
      return found[i];
    }

    /** Looks for all triangles whose near zone holds the point. */
    void at(double x, double y, double z) {
      count = 0;
      if (nodes == 0) {
        return;
      }
      int top = 0;
      stack[top++] = 0;
      while (top > 0) {
        int node = stack[--top];
        int b = 6 * node;
        if (x < bounds[b]
            || y < bounds[b + 1]
            || z < bounds[b + 2]
            || x > bounds[b + 3]
            || y > bounds[b + 4]
            || z > bounds[b + 5]) {
          continue;
        }
        if (second[node] > 0) {
          stack[top++] = second[node];
          stack[top++] = node + 1;
          continue;
        }
        for (int i = begin[node]; i < end[node]; i++) {
          int e = 4 * order[i];
          double dx = x - ball[e];
          double dy = y - ball[e + 1];
          double dz = z - ball[e + 2];
          if (dx * dx + dy * dy + dz * dz < ball[e + 3] * ball[e + 3]) {
            if (count == found.length) {
              found = java.util.Arrays.copyOf(found, 2 * count);
            }
            found[count++] = order[i];
          }
        }
      }
    }
  }
}
