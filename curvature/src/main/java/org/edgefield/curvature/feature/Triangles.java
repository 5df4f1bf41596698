package org.edgefield.curvature.feature;

import org.edgefield.importer.mesh.SurfaceMesh;

/** Measures of single triangles. */
final class Triangles {
  private Triangles() {}

  /** Normal of a triangle, as long as twice its area. */
  static double[] normal(SurfaceMesh mesh, int t) {
    double[] x = mesh.xyz();
    int o = 3 * mesh.triangles()[3 * t];
    int p = 3 * mesh.triangles()[3 * t + 1];
    int q = 3 * mesh.triangles()[3 * t + 2];
    double ax = x[p] - x[o];
    double ay = x[p + 1] - x[o + 1];
    double az = x[p + 2] - x[o + 2];
    double bx = x[q] - x[o];
    double by = x[q + 1] - x[o + 1];
    double bz = x[q + 2] - x[o + 2];
    return new double[] {ay * bz - az * by, az * bx - ax * bz, ax * by - ay * bx};
  }
}
