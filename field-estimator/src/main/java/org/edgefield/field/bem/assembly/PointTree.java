package org.edgefield.field.bem.assembly;

import java.util.function.IntConsumer;

/** Points in a balanced k-d tree; finds all within a radius. */
final class PointTree {
  private static final int LEAF = 12;

  private final double[] points;
  private final int[] order;

  /**
   * Builds the tree.
   *
   * @param points 3 coordinates each
   */
  PointTree(double[] points) {
    this.points = points;
    order = new int[points.length / 3];
    for (int i = 0; i < order.length; i++) {
      order[i] = i;
    }
    split(0, order.length, 0);
  }

  private void split(int from, int to, int axis) {
    if (to - from <= LEAF) {
      return;
    }
    int mid = (from + to) >>> 1;
    select(from, to - 1, mid, axis);
    split(from, mid, (axis + 1) % 3);
    split(mid + 1, to, (axis + 1) % 3);
  }

  // Quickselect with the middle element as pivot; ties keep their place by index for determinism.
  private void select(int from, int to, int k, int axis) {
    int lo = from;
    int hi = to;
    while (lo < hi) {
      double pivot = points[3 * order[(lo + hi) >>> 1] + axis];
      int i = lo;
      int j = hi;
      while (i <= j) {
        while (points[3 * order[i] + axis] < pivot) {
          i++;
        }
        while (points[3 * order[j] + axis] > pivot) {
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

  /** Hands every point within the radius to the visitor, in an order fixed by the tree. */
  void within(double x, double y, double z, double radius, IntConsumer visitor) {
    visit(0, order.length, 0, x, y, z, radius, visitor);
  }

  private void visit(
      int from, int to, int axis, double x, double y, double z, double r, IntConsumer visitor) {
    if (to - from <= LEAF) {
      for (int i = from; i < to; i++) {
        test(order[i], x, y, z, r, visitor);
      }
      return;
    }
    int mid = (from + to) >>> 1;
    double cut = points[3 * order[mid] + axis];
    double at = axis == 0 ? x : axis == 1 ? y : z;
    if (at - r <= cut) {
      visit(from, mid, (axis + 1) % 3, x, y, z, r, visitor);
    }
    test(order[mid], x, y, z, r, visitor);
    if (at + r >= cut) {
      visit(mid + 1, to, (axis + 1) % 3, x, y, z, r, visitor);
    }
  }

  private void test(int p, double x, double y, double z, double r, IntConsumer visitor) {
    double dx = points[3 * p] - x;
    double dy = points[3 * p + 1] - y;
    double dz = points[3 * p + 2] - z;
    if (dx * dx + dy * dy + dz * dz <= r * r) {
      visitor.accept(p);
    }
  }
}
