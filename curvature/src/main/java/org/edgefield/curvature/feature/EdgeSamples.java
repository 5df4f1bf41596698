package org.edgefield.curvature.feature;

import org.edgefield.importer.brep.ExactGeometry;

/**
 * Exact points along CAD edges with normals and curvatures of the faces on both sides, evaluated in
 * one batch.
 */
final class EdgeSamples {
  static final int STRIDE = ExactGeometry.CURVATURE_STRIDE;

  /**
   * The end samples stand this share of the parameter range inside: a normal at a vertex may be the
   * limit at a pole.
   */
  private static final double END_INSET = 1e-3;

  /** Edges sampled. */
  final int[] edges;

  /** First sample per entry of {@link #edges}, with one more at the end. */
  final int[] start;

  /** Curve parameter per sample, rising within an edge. */
  final double[] t;

  /** Position and unit tangent (along rising t) per sample, 6 each. */
  final double[] curve;

  /** Normal, curvatures and directions per side and sample, {@link #STRIDE} each. */
  final double[][] side;

  private EdgeSamples(int[] edges, int[] start) {
    this.edges = edges;
    this.start = start;
    int n = start[edges.length];
    t = new double[n];
    curve = new double[6 * n];
    side = new double[][] {new double[STRIDE * n], new double[STRIDE * n]};
  }

  /**
   * Samples edges.
   *
   * @param edges edges with a face on both sides and a length
   * @param counts samples per edge, at least 2
   */
  static EdgeSamples take(ExactGeometry geometry, int[] edges, int[] counts) {
    int[] start = new int[edges.length + 1];
    for (int i = 0; i < edges.length; i++) {
      start[i + 1] = start[i] + counts[i];
    }
    EdgeSamples s = new EdgeSamples(edges, start);
    for (int i = 0; i < edges.length; i++) {
      double[] range = geometry.edgeRange(edges[i]);
      int n = counts[i];
      for (int j = 0; j < n; j++) {
        double f = END_INSET + (1 - 2 * END_INSET) * j / (n - 1);
        s.t[start[i] + j] = range[0] + f * (range[1] - range[0]);
      }
    }
    s.evaluate(geometry);
    return s;
  }

  /**
   * Samples edges at given parameters, one each.
   *
   * @param edges edge per sample
   * @param t parameter per sample
   */
  static EdgeSamples at(ExactGeometry geometry, int[] edges, double[] t) {
    int[] start = new int[edges.length + 1];
    for (int i = 0; i < edges.length; i++) {
      start[i + 1] = i + 1;
    }
    EdgeSamples s = new EdgeSamples(edges, start);
    System.arraycopy(t, 0, s.t, 0, t.length);
    s.evaluate(geometry);
    return s;
  }

  private void evaluate(ExactGeometry geometry) {
    int n = t.length;
    int[] edgeOf = new int[n];
    int[][] face = {new int[n], new int[n]};
    double[][] uv = {new double[2 * n], new double[2 * n]};
    for (int i = 0; i < edges.length; i++) {
      int from = start[i];
      int m = start[i + 1] - from;
      double[] part = new double[m];
      double[] partUv = new double[2 * m];
      System.arraycopy(t, from, part, 0, m);
      int[] faces = geometry.edgeFaces(edges[i]);
      for (int k = 0; k < 2; k++) {
        geometry.edgeUv(edges[i], k, m, part, partUv);
        System.arraycopy(partUv, 0, uv[k], 2 * from, 2 * m);
        java.util.Arrays.fill(face[k], from, from + m, faces[k]);
      }
      java.util.Arrays.fill(edgeOf, from, from + m, edges[i]);
    }
    geometry.curve(n, edgeOf, t, curve);
    for (int k = 0; k < 2; k++) {
      geometry.curvature(n, face[k], uv[k], side[k]);
    }
    for (int i = 0; i < edges.length; i++) {
      unitTangents(start[i], start[i + 1]);
    }
  }

  /**
   * Makes the derivatives unit tangents; where one vanishes, the chord to a neighbour stands in.
   */
  private void unitTangents(int from, int to) {
    for (int j = from; j < to; j++) {
      int a = 6 * j;
      if (!normalise(curve, a + 3)) {
        int low = 6 * (j > from ? j - 1 : j);
        int high = 6 * (j + 1 < to ? j + 1 : j);
        for (int c = 0; c < 3; c++) {
          curve[a + 3 + c] = curve[high + c] - curve[low + c];
        }
        normalise(curve, a + 3);
      }
    }
  }

  private static boolean normalise(double[] x, int at) {
    double l = Math.sqrt(x[at] * x[at] + x[at + 1] * x[at + 1] + x[at + 2] * x[at + 2]);
    if (!(l > 0)) {
      return false;
    }
    x[at] /= l;
    x[at + 1] /= l;
    x[at + 2] /= l;
    return true;
  }
}
