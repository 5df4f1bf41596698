package org.edgefield.cli.gltf.scene;

import org.edgefield.importer.mesh.SurfaceMesh;

/** Plane geometry of mesh triangles, in model axes. */
final class Triangles {
  private Triangles() {}

  /** Outward normal of a triangle with twice its area as length; zero for a collapsed one. */
  static double[] areaVector(SurfaceMesh mesh, int t) {
    double[] x = mesh.xyz();
    int a = 3 * mesh.triangles()[3 * t];
    int b = 3 * mesh.triangles()[3 * t + 1];
    int c = 3 * mesh.triangles()[3 * t + 2];
    double ux = x[b] - x[a];
    double uy = x[b + 1] - x[a + 1];
    double uz = x[b + 2] - x[a + 2];
    double vx = x[c] - x[a];
    double vy = x[c + 1] - x[a + 1];
    double vz = x[c + 2] - x[a + 2];
    return new double[] {uy * vz - uz * vy, uz * vx - ux * vz, ux * vy - uy * vx};
  }

  /** Scales a vector to length 1; a zero vector stays. */
  static double[] unit(double[] v) {
    double length = Math.sqrt(v[0] * v[0] + v[1] * v[1] + v[2] * v[2]);
    return length == 0 ? v.clone() : new double[] {v[0] / length, v[1] / length, v[2] / length};
  }
}
