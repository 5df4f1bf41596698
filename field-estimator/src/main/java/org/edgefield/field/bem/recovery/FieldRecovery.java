package org.edgefield.field.bem.recovery;

import java.util.Arrays;

/**
 * Smoothed nodal values: a quadratic fitted over the two rings of nodes around each, in
 * tangent-plane coordinates scaled to arc length, with weights exp(-0.7 rho^2) in the patch's own
 * anisotropic metric. Removes the wobble of the linear density; near a border, or where a patch is
 * too small for the fit, the raw value stays.
 */
public final class FieldRecovery {
  private static final int LEAST_POINTS = 9;
  private static final double RIDGE = 1e-10;

  private final int[] start;
  private final int[] neighbour;
  private final double[] position;
  private final double[] normal;
  private final boolean[] border;

  /**
   * Prepares the rings.
   *
   * @param corner unknown per triangle corner
   * @param position position per unknown
   * @param normal outward unit normal per unknown
   * @param border unknowns that keep their raw value
   */
  public FieldRecovery(int[] corner, double[] position, double[] normal, boolean[] border) {
    this.position = position;
    this.normal = normal;
    this.border = border;
    int n = border.length;
    int[] count = new int[n + 1];
    for (int c : corner) {
      count[c + 1] += 2;
    }
    for (int i = 0; i < n; i++) {
      count[i + 1] += count[i];
    }
    int[] list = new int[count[n]];
    int[] fill = count.clone();
    for (int c = 0; c < corner.length; c++) {
      int t = 3 * (c / 3);
      list[fill[corner[c]]++] = corner[t + (c + 1) % 3];
      list[fill[corner[c]]++] = corner[t + (c + 2) % 3];
    }
    start = new int[n + 1];
    neighbour = new int[list.length];
    int size = 0;
    for (int i = 0; i < n; i++) {
      start[i] = size;
      Arrays.sort(list, count[i], count[i + 1]);
      for (int k = count[i]; k < count[i + 1]; k++) {
        if (k == count[i] || list[k] != list[k - 1]) {
          neighbour[size++] = list[k];
        }
      }
    }
    start[n] = size;
  }

  /**
   * Recovers all values.
   *
   * @param raw one value per unknown
   * @return one value per unknown
   */
  public double[] recover(double[] raw) {
    double[] out = raw.clone();
    Patch patch = new Patch();
    for (int i = 0; i < raw.length; i++) {
      if (!border[i]) {
        out[i] = patch.fit(i, raw);
      }
    }
    return out;
  }

  /** Scratch of one fit. */
  private final class Patch {
    private int[] members = new int[64];
    private double[] x = new double[64];
    private double[] y = new double[64];
    private final double[][] a = new double[6][7];
    private final double[] row = new double[6];
    private int size;

    double fit(int centre, double[] raw) {
      gather(centre);
      if (size < LEAST_POINTS) {
        return raw[centre];
      }
      project(centre);
      whiten(start[centre + 1] - start[centre]);
      for (double[] r : a) {
        Arrays.fill(r, 0);
      }
      for (int k = 0; k < size; k++) {
        double rho2 = x[k] * x[k] + y[k] * y[k];
        double w = Math.exp(-0.7 * rho2);
        row[0] = 1;
        row[1] = x[k];
        row[2] = y[k];
        row[3] = x[k] * x[k];
        row[4] = x[k] * y[k];
        row[5] = y[k] * y[k];
        for (int r = 0; r < 6; r++) {
          for (int c = 0; c < 6; c++) {
            a[r][c] += w * row[r] * row[c];
          }
          a[r][6] += w * row[r] * raw[members[k]];
        }
      }
      double value = constant();
      return Double.isFinite(value) ? value : raw[centre];
    }

    private void gather(int centre) {
      size = 0;
      add(centre);
      for (int k = start[centre]; k < start[centre + 1]; k++) {
        add(neighbour[k]);
      }
      int ring = size;
      for (int m = 1; m < ring; m++) {
        for (int k = start[members[m]]; k < start[members[m] + 1]; k++) {
          add(neighbour[k]);
        }
      }
    }

    private void add(int node) {
      for (int k = 0; k < size; k++) {
        if (members[k] == node) {
          return;
        }
      }
      // Values on a border are not of the smooth field.
      if (border[node]) {
        return;
      }
      if (size == members.length) {
        members = Arrays.copyOf(members, 2 * size);
        x = Arrays.copyOf(x, 2 * size);
        y = Arrays.copyOf(y, 2 * size);
      }
      members[size++] = node;
    }

    private void project(int centre) {
      double nx = normal[3 * centre];
      double ny = normal[3 * centre + 1];
      double nz = normal[3 * centre + 2];
      double s = nz >= 0 ? 1 : -1;
      double b = nx * ny * (-1 / (s + nz));
      double c = -1 / (s + nz);
      double[] u = {1 + s * nx * nx * c, s * b, -s * nx};
      double[] v = {b, s + ny * ny * c, -ny};
      for (int k = 0; k < size; k++) {
        int m = members[k];
        double dx = position[3 * m] - position[3 * centre];
        double dy = position[3 * m + 1] - position[3 * centre + 1];
        double dz = position[3 * m + 2] - position[3 * centre + 2];
        double chord = Math.sqrt(dx * dx + dy * dy + dz * dz);
        double p = dx * u[0] + dy * u[1] + dz * u[2];
        double q = dx * v[0] + dy * v[1] + dz * v[2];
        double flat = Math.hypot(p, q);
        double dot = nx * normal[3 * m] + ny * normal[3 * m + 1] + nz * normal[3 * m + 2];
        double half = 0.5 * Math.acos(Math.max(-1, Math.min(1, dot)));
        double arc = half > 1e-6 ? chord * half / Math.sin(half) : chord;
        double scale = flat > 0 ? arc / flat : 0;
        x[k] = p * scale;
        y[k] = q * scale;
      }
    }

    // Coordinates in which the first ring is round with unit mean square radius.
    private void whiten(int ring) {
      double xx = 0;
      double xy = 0;
      double yy = 0;
      int n = Math.min(ring, size - 1);
      for (int k = 1; k <= n; k++) {
        xx += x[k] * x[k];
        xy += x[k] * y[k];
        yy += y[k] * y[k];
      }
      double trace = xx + yy + 1e-300;
      xx = 2 * xx / n + RIDGE * trace;
      yy = 2 * yy / n + RIDGE * trace;
      xy = 2 * xy / n;
      double l11 = Math.sqrt(xx);
      double l21 = xy / l11;
      double l22 = Math.sqrt(Math.max(yy - l21 * l21, RIDGE * trace));
      for (int k = 0; k < size; k++) {
        x[k] /= l11;
        y[k] = (y[k] - l21 * x[k]) / l22;
      }
    }

    private double constant() {
      double scale = a[0][0];
      for (int r = 0; r < 6; r++) {
        a[r][r] += RIDGE * scale;
      }
      for (int p = 0; p < 6; p++) {
        int best = p;
        for (int r = p + 1; r < 6; r++) {
          if (Math.abs(a[r][p]) > Math.abs(a[best][p])) {
            best = r;
          }
        }
        double[] swap = a[p];
        a[p] = a[best];
        a[best] = swap;
        for (int r = 0; r < 6; r++) {
          if (r != p) {
            double f = a[r][p] / a[p][p];
            for (int c = p; c < 7; c++) {
              a[r][c] -= f * a[p][c];
            }
          }
        }
      }
      return a[0][6] / a[0][0];
    }
  }
}
