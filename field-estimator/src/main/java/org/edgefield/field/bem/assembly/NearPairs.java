package org.edgefield.field.bem.assembly;

import java.util.function.IntConsumer;
import org.edgefield.field.bem.quadrature.TriangleIntegrals;
import org.edgefield.field.bem.surface.CurvedTriangles;
import org.edgefield.field.parallel.Workers;

/**
 * Integrals of every triangle at the points near it, triangle by triangle so that its quadrature
 * nodes are made once, then listed by point.
 */
final class NearPairs {
  private static final int BLOCK = 128;

  /** First pair of each point, plus the end. */
  final int[] start;

  /** Triangle per pair. */
  final int[] triangle;

  /** Per pair three accurate integrals. */
  final double[] accurate;

  /** Per pair three accurate integrals less the three-point rule's. */
  final double[] correction;

  NearPairs(CurvedTriangles triangles, double[] points, Workers workers) {
    PointTree tree = new PointTree(points);
    int nt = triangles.count();
    int n = points.length / 3;
    int[][] near = new int[nt][];
    workers.run(
        (nt + BLOCK - 1) / BLOCK,
        w -> {
          Found found = new Found();
          return b -> {
            for (int t = b * BLOCK; t < Math.min(nt, (b + 1) * BLOCK); t++) {
              near[t] = found.around(tree, triangles, t);
            }
          };
        });
    start = new int[n + 1];
    for (int[] list : near) {
      for (int p : list) {
        start[p + 1]++;
      }
    }
    for (int p = 0; p < n; p++) {
      start[p + 1] = Math.addExact(start[p], start[p + 1]);
    }
    int pairs = start[n];
    triangle = new int[pairs];
    accurate = new double[Math.multiplyExact(3, pairs)];
    correction = new double[3 * pairs];
    // Places are given out in triangle order, so a point's list is sorted by triangle.
    int[] next = start.clone();
    int[][] slot = new int[nt][];
    for (int t = 0; t < nt; t++) {
      slot[t] = new int[near[t].length];
      for (int i = 0; i < slot[t].length; i++) {
        int place = next[near[t][i]]++;
        slot[t][i] = place;
        triangle[place] = t;
      }
    }
    workers.run(
        (nt + BLOCK - 1) / BLOCK,
        w -> {
          TriangleIntegrals integrals = new TriangleIntegrals(triangles);
          double[] whole = new double[3];
          double[] rough = new double[3];
          return b -> {
            for (int t = b * BLOCK; t < Math.min(nt, (b + 1) * BLOCK); t++) {
              integrals.open(t);
              for (int i = 0; i < near[t].length; i++) {
                int p = 3 * near[t][i];
                integrals.potential(points[p], points[p + 1], points[p + 2], whole);
                integrals.far(points[p], points[p + 1], points[p + 2], rough);
                int at = 3 * slot[t][i];
                for (int c = 0; c < 3; c++) {
                  accurate[at + c] = whole[c];
                  correction[at + c] = whole[c] - rough[c];
                }
              }
            }
          };
        });
  }

  /** Collects the points around a triangle. */
  private static final class Found implements IntConsumer {
    private int[] points = new int[256];
    private int size;

    int[] around(PointTree tree, CurvedTriangles triangles, int t) {
      size = 0;
      tree.within(
          triangles.centre(t, 0),
          triangles.centre(t, 1),
          triangles.centre(t, 2),
          TriangleIntegrals.FAR * triangles.diameter(t),
          this);
      return java.util.Arrays.copyOf(points, size);
    }

    @Override
    public void accept(int point) {
      if (size == points.length) {
        points = java.util.Arrays.copyOf(points, 2 * size);
      }
      points[size++] = point;
    }
  }
}
