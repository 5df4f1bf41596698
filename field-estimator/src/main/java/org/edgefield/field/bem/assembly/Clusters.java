package org.edgefield.field.bem.assembly;

import java.util.Arrays;

/** Splits points into compact clusters of like size, by halves along the longest extent. */
final class Clusters {
  private final double[] points;
  private final int[] order;

  /**
   * Prepares the split.
   *
   * @param points 3 coordinates each
   * @param order numbers of the points; put in order of their clusters
   */
  Clusters(double[] points, int[] order) {
    this.points = points;
    this.order = order;
  }

  /**
   * Splits.
   *
   * @param most largest number of points in a cluster
   * @return first entry of each cluster in the order, plus the end
   */
  int[] split(int most) {
    int n = order.length;
    int parts = Math.max(1, (n + most - 1) / most);
    int[] first = new int[parts + 1];
    split(0, n, 0, parts, first);
    first[parts] = n;
    return first;
  }

  private void split(int from, int to, int part, int parts, int[] first) {
    if (parts == 1) {
      first[part] = from;
      return;
    }
    double[] low = new double[3];
    double[] high = new double[3];
    Arrays.fill(low, Double.POSITIVE_INFINITY);
    Arrays.fill(high, Double.NEGATIVE_INFINITY);
    for (int i = from; i < to; i++) {
      for (int k = 0; k < 3; k++) {
        low[k] = Math.min(low[k], points[3 * order[i] + k]);
        high[k] = Math.max(high[k], points[3 * order[i] + k]);
      }
    }
    int axis = 0;
    for (int k = 1; k < 3; k++) {
      if (high[k] - low[k] > high[axis] - low[axis]) {
        axis = k;
      }
    }
    int along = axis;
    Integer[] sorted = new Integer[to - from];
    for (int i = from; i < to; i++) {
      sorted[i - from] = order[i];
    }
    Arrays.sort(
        sorted,
        (a, b) -> {
          int byPlace = Double.compare(points[3 * a + along], points[3 * b + along]);
          return byPlace != 0 ? byPlace : Integer.compare(a, b);
        });
    for (int i = from; i < to; i++) {
      order[i] = sorted[i - from];
    }
    int left = parts / 2;
    int middle = from + (int) ((long) (to - from) * left / parts);
    split(from, middle, part, left, first);
    split(middle, to, part + left, parts - left, first);
  }
}
