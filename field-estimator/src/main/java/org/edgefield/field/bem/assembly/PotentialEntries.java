package org.edgefield.field.bem.assembly;

import org.edgefield.field.bem.quadrature.TriangleRule;

/**
 * Single entries of the matrix: accurate for near pairs, with the charge of a node's whole hat in
 * its centre elsewhere.
 */
final class PotentialEntries {
  private final FarSources sources;
  private final Collocation rows;
  private final double[] targets;
  private final int images;
  private final int[] start;
  private final int[] column;
  private final double[] correction;
  private final int[] firstCorner;
  private final int[] corners;

  /** Charge of a node's hat at unit density, m^2. */
  final double[] charge;

  /** Centre of that charge, 3 each. */
  final double[] centre;

  /** Mean of a row's points, 3 each. */
  final double[] place;

  PotentialEntries(
      FarSources sources,
      Collocation rows,
      double[] targets,
      int[] start,
      int[] column,
      double[] correction) {
    this.sources = sources;
    this.rows = rows;
    this.targets = targets;
    this.start = start;
    this.column = column;
    this.correction = correction;
    images = targets.length > rows.points().length ? rows.points().length / 3 : 0;
    int n = rows.rows();
    charge = new double[n];
    centre = new double[3 * n];
    place = new double[3 * n];
    firstCorner = new int[n + 1];
    int[] node = sources.cornerNode();
    for (int j : node) {
      firstCorner[j + 1]++;
    }
    for (int i = 0; i < n; i++) {
      firstCorner[i + 1] += firstCorner[i];
    }
    corners = new int[node.length];
    int[] fill = firstCorner.clone();
    for (int c = 0; c < node.length; c++) {
      corners[fill[node[c]]++] = c;
    }
    for (int c = 0; c < node.length; c++) {
      for (int g = 0; g < 3; g++) {
        int s = c - c % 3 + g;
        double q = sources.weight()[s] * share(c % 3, g);
        charge[node[c]] += q;
        for (int k = 0; k < 3; k++) {
          centre[3 * node[c] + k] += q * sources.xyz()[3 * s + k];
        }
      }
    }
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < 3; k++) {
        centre[3 * i + k] /= charge[i];
      }
      for (int e = rows.rowStart()[i]; e < rows.rowStart()[i + 1]; e++) {
        for (int k = 0; k < 3; k++) {
          place[3 * i + k] += rows.rowWeight()[e] * rows.points()[3 * rows.rowPoint()[e] + k];
        }
      }
    }
  }

  /** Share of a corner's hat at a point of the three-point rule. */
  private static double share(int corner, int point) {
    double u = TriangleRule.THREE.u()[point];
    double v = TriangleRule.THREE.v()[point];
    return corner == 0 ? 1 - u - v : corner == 1 ? u : v;
  }

  /** First near entry of a row. */
  int first(int row) {
    return start[row];
  }

  /** End of the near entries of a row. */
  int end(int row) {
    return start[row + 1];
  }

  /** Node of a near entry. */
  int node(int entry) {
    return column[entry];
  }

  /** Accurate value of a near entry. */
  double near(int row, int entry) {
    int j = column[entry];
    double sum = correction[entry];
    for (int e = rows.rowStart()[row]; e < rows.rowStart()[row + 1]; e++) {
      int p = rows.rowPoint()[e];
      sum += rows.rowWeight()[e] * rough(p, j);
      if (images > 0) {
        sum -= rows.rowWeight()[e] * rough(p + images, j);
      }
    }
    return sum;
  }

  private double rough(int p, int j) {
    double sum = 0;
    for (int k = firstCorner[j]; k < firstCorner[j + 1]; k++) {
      int c = corners[k];
      for (int g = 0; g < 3; g++) {
        int s = c - c % 3 + g;
        double dx = sources.xyz()[3 * s] - targets[3 * p];
        double dy = sources.xyz()[3 * s + 1] - targets[3 * p + 1];
        double dz = sources.xyz()[3 * s + 2] - targets[3 * p + 2];
        double r2 = dx * dx + dy * dy + dz * dz;
        sum += r2 > 0 ? sources.weight()[s] * share(c % 3, g) / Math.sqrt(r2) : 0;
      }
    }
    return sum;
  }

  /** Value of a far entry: the hat's charge in its centre, less its image's. */
  double far(int row, int j) {
    return far(row, centre[3 * j], centre[3 * j + 1], centre[3 * j + 2], charge[j]);
  }

  /** Potential at a row of a charge anywhere, less its image's. */
  double far(int row, double x, double y, double z, double q) {
    double sum = q / distance(rows.rowPoint()[rows.rowStart()[row]], x, y, z);
    if (images > 0) {
      sum -= q / distance(rows.rowPoint()[rows.rowStart()[row]] + images, x, y, z);
    }
    return sum;
  }

  private double distance(int p, double x, double y, double z) {
    double dx = targets[3 * p] - x;
    double dy = targets[3 * p + 1] - y;
    double dz = targets[3 * p + 2] - z;
    return Math.sqrt(dx * dx + dy * dy + dz * dz);
  }
}
