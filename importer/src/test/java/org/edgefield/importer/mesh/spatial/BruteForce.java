package org.edgefield.importer.mesh.spatial;

/** Independent answers for one triangle, by other formulas than the tree's. */
final class BruteForce {
  private BruteForce() {}

  static double length(double[] a, double[] b) {
    return Math.sqrt(
        (a[0] - b[0]) * (a[0] - b[0])
            + (a[1] - b[1]) * (a[1] - b[1])
            + (a[2] - b[2]) * (a[2] - b[2]));
  }

  /** Distance by a ternary search over segments parallel to BC, the distance being convex. */
  static double distance(double[] xyz, int at, double[] p) {
    // Minimise over s in [0, 1] (along AB, AC scaled) of the distance to the segment A+s.AB,
    // A+s.AC.
    double low = 0;
    double high = 1;
    for (int i = 0; i < 120; i++) {
      double a = low + (high - low) / 3;
      double b = high - (high - low) / 3;
      if (toSegment(xyz, at, p, a) <= toSegment(xyz, at, p, b)) {
        high = b;
      } else {
        low = a;
      }
    }
    return toSegment(xyz, at, p, 0.5 * (low + high));
  }

  private static double toSegment(double[] xyz, int at, double[] p, double s) {
    double[] a = new double[3];
    double[] e = new double[3];
    double dot = 0;
    double e2 = 0;
    for (int c = 0; c < 3; c++) {
      a[c] = xyz[at + c] + s * (xyz[at + 3 + c] - xyz[at + c]);
      e[c] = xyz[at + c] + s * (xyz[at + 6 + c] - xyz[at + c]) - a[c];
      dot += e[c] * (p[c] - a[c]);
      e2 += e[c] * e[c];
    }
    double t = e2 > 0 ? Math.max(0, Math.min(1, dot / e2)) : 0;
    double[] q = {a[0] + t * e[0], a[1] + t * e[1], a[2] + t * e[2]};
    return length(p, q);
  }

  /** First hit by solving the 3 x 3 system with Cramer's rule; infinite for a miss. */
  static double hit(double[] xyz, int at, double[] o, double[] d) {
    double[] e1 = new double[3];
    double[] e2 = new double[3];
    double[] s = new double[3];
    for (int c = 0; c < 3; c++) {
      e1[c] = xyz[at + 3 + c] - xyz[at + c];
      e2[c] = xyz[at + 6 + c] - xyz[at + c];
      s[c] = o[c] - xyz[at + c];
    }
    double det = triple(e1, e2, d);
    if (det == 0) {
      return Double.POSITIVE_INFINITY;
    }
    double u = triple(s, e2, d) / det;
    double v = triple(e1, s, d) / det;
    double t = -triple(e1, e2, s) / det;
    if (u < 0 || v < 0 || u + v > 1 || t < 0) {
      return Double.POSITIVE_INFINITY;
    }
    return t * Math.sqrt(d[0] * d[0] + d[1] * d[1] + d[2] * d[2]);
  }

  private static double triple(double[] a, double[] b, double[] c) {
    return a[0] * (b[1] * c[2] - b[2] * c[1])
        + a[1] * (b[2] * c[0] - b[0] * c[2])
        + a[2] * (b[0] * c[1] - b[1] * c[0]);
  }
}
