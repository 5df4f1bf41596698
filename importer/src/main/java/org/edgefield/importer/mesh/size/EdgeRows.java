package org.edgefield.importer.mesh.size;

import java.util.Arrays;
import java.util.List;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.EdgeGrading;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * Sizes around CAD edges with graded rows: at a distance d from the edge the size across it is
 * first row + (growth - 1) d, which gives rows that each are {@code growth} times as high as the
 * one before; along the edge nothing is asked.
 */
final class EdgeRows {
  private static final int CHORDS = 256;
  private static final int NEWTON_STEPS = 3;

  /** Edges that may shape one point: where more meet, grading carries the others over. */
  private static final int NEAREST = 2;

  private final ExactGeometry geometry;
  private final List<EdgeGrading> gradings;
  private final TriangleCursor cursor;
  private final double[][] ranges;
  private final boolean[] allowed;
  private final double leastGrowth;
  private final double[] t = new double[1];
  private final int[] edge = new int[1];
  private final double[] c = new double[6];

  EdgeRows(ExactGeometry geometry, List<EdgeGrading> gradings) {
    this.geometry = geometry;
    this.gradings = gradings;
    int n = gradings.size();
    double least = Double.POSITIVE_INFINITY;
    for (EdgeGrading g : gradings) {
      least = Math.min(least, g.growth() - 1);
    }
    leastGrowth = least;
    ranges = new double[n][];
    allowed = new boolean[n];
    double[] xyz = new double[3 * n * (CHORDS + 1)];
    int[] triangles = new int[3 * n * CHORDS];
    int[] group = new int[n * CHORDS];
    double[] out = new double[6 * (CHORDS + 1)];
    double[] ts = new double[CHORDS + 1];
    int[] ids = new int[CHORDS + 1];
    for (int g = 0; g < n; g++) {
      ranges[g] = geometry.edgeRange(gradings.get(g).edge());
      for (int i = 0; i <= CHORDS; i++) {
        ids[i] = gradings.get(g).edge();
        ts[i] = ranges[g][0] + (ranges[g][1] - ranges[g][0]) * i / CHORDS;
      }
      geometry.curve(CHORDS + 1, ids, ts, out);
      for (int i = 0; i <= CHORDS; i++) {
        System.arraycopy(out, 6 * i, xyz, 3 * (g * (CHORDS + 1) + i), 3);
      }
      for (int i = 0; i < CHORDS; i++) {
        int at = g * CHORDS + i;
        triangles[3 * at] = g * (CHORDS + 1) + i;
        triangles[3 * at + 1] = triangles[3 * at] + 1;
        triangles[3 * at + 2] = triangles[3 * at] + 1;
        group[at] = g;
      }
    }
    cursor = TriangleTree.build(xyz, triangles, group).cursor();
  }

  /**
   * Intersects a tensor with what the nearest edges ask for.
   *
   * @param m tensors
   * @param at first index
   * @param along size along the edge that asks for nothing
   * @param work at least 21 doubles
   * @return growth rate here, 0 where no edge is near
   */
  double shape(double x, double y, double z, double[] m, int at, double along, double[] work) {
    double rate = 0;
    double reach = along / leastGrowth;
    Arrays.fill(allowed, true);
    for (int k = 0; k < Math.min(NEAREST, gradings.size()); k++) {
      cursor.allow(allowed);
      if (!cursor.nearest(x, y, z, reach)) {
        break;
      }
      int g = cursor.group();
      allowed[g] = false;
      EdgeGrading grading = gradings.get(g);
      double distance = foot(g, cursor.triangle() % CHORDS, cursor.weight(0), x, y, z);
      double across = grading.firstRow_m() + (grading.growth() - 1) * distance;
      if (across >= along) {
        continue;
      }
      double length = Math.sqrt(c[3] * c[3] + c[4] * c[4] + c[5] * c[5]);
      double w = 1 / (across * across);
      double[] tube = new double[Metric.STRIDE];
      Metric.addIdentity(tube, 0, w);
      Metric.addOuter(
          tube, 0, 1 / (along * along) - w, c[3] / length, c[4] / length, c[5] / length);
      Metric.intersect(m, at, tube, work);
      rate = Math.max(rate, grading.growth() - 1);
    }
    return rate;
  }

  /** Distance to the exact curve from the chord found; leaves point and tangent in c. */
  private double foot(int g, int chord, double weight, double x, double y, double z) {
    double t0 = ranges[g][0];
    double span = ranges[g][1] - t0;
    edge[0] = gradings.get(g).edge();
    t[0] = t0 + span * (chord + 1 - weight) / CHORDS;
    for (int i = 0; ; i++) {
      geometry.curve(1, edge, t, c);
      if (i == NEWTON_STEPS) {
        break;
      }
      double dot = (x - c[0]) * c[3] + (y - c[1]) * c[4] + (z - c[2]) * c[5];
      double speed2 = c[3] * c[3] + c[4] * c[4] + c[5] * c[5];
      t[0] = Math.max(t0, Math.min(t0 + span, t[0] + dot / speed2));
    }
    double dx = x - c[0];
    double dy = y - c[1];
    double dz = z - c[2];
    return Math.sqrt(dx * dx + dy * dy + dz * dz);
  }
}
