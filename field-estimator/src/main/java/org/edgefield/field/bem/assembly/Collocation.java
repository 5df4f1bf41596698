package org.edgefield.field.bem.assembly;

import org.edgefield.field.bem.surface.CurvedTriangles;

/**
 * Where the potential is prescribed. Most rows take it at their node; a row on a sharp edge, an
 * open edge or a crack takes the area-weighted mean over one point of each incident triangle of its
 * patch, at barycentric (0.6, 0.2, 0.2) towards the node, where the density is not singular.
 *
 * @param points collocation points, 3 each, metres
 * @param rowStart first entry of each row, plus the end
 * @param rowPoint point per entry
 * @param rowWeight weight per entry, summing to 1 in a row
 */
public record Collocation(double[] points, int[] rowStart, int[] rowPoint, double[] rowWeight) {

  /**
   * Lays out the rows.
   *
   * @param triangles geometry
   * @param cornerNode unknown per triangle corner, 3 per triangle
   * @param nodePosition position per unknown, 3 each
   * @param seam whether the row of an unknown is a seam row
   */
  public static Collocation of(
      CurvedTriangles triangles, int[] cornerNode, double[] nodePosition, boolean[] seam) {
    int n = seam.length;
    int[] count = new int[n];
    for (int c = 0; c < cornerNode.length; c++) {
      if (seam[cornerNode[c]]) {
        count[cornerNode[c]]++;
      }
    }
    int[] rowStart = new int[n + 1];
    for (int i = 0; i < n; i++) {
      rowStart[i + 1] = rowStart[i] + (seam[i] ? count[i] : 1);
    }
    int entries = rowStart[n];
    double[] points = new double[3 * entries];
    int[] rowPoint = new int[entries];
    double[] rowWeight = new double[entries];
    for (int e = 0; e < entries; e++) {
      rowPoint[e] = e;
    }
    int[] fill = rowStart.clone();
    double[] p = new double[9];
    for (int i = 0; i < n; i++) {
      if (!seam[i]) {
        System.arraycopy(nodePosition, 3 * i, points, 3 * rowStart[i], 3);
        rowWeight[rowStart[i]] = 1;
      }
    }
    for (int t = 0; t < triangles.count(); t++) {
      for (int c = 0; c < 3; c++) {
        int i = cornerNode[3 * t + c];
        if (seam[i]) {
          triangles.evaluate(t, c == 1 ? 0.6 : 0.2, c == 2 ? 0.6 : 0.2, p);
          int e = fill[i]++;
          System.arraycopy(p, 0, points, 3 * e, 3);
          rowWeight[e] = CurvedTriangles.cross(p);
        }
      }
    }
    for (int i = 0; i < n; i++) {
      double sum = 0;
      for (int e = rowStart[i]; e < rowStart[i + 1]; e++) {
        sum += rowWeight[e];
      }
      for (int e = rowStart[i]; e < rowStart[i + 1]; e++) {
        rowWeight[e] /= sum;
      }
    }
    return new Collocation(points, rowStart, rowPoint, rowWeight);
  }

  /** Number of rows. */
  public int rows() {
    return rowStart.length - 1;
  }
}
