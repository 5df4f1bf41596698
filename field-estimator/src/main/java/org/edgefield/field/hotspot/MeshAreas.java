package org.edgefield.field.hotspot;

import org.edgefield.importer.mesh.SurfaceMesh;

/** Areas of the triangles of a mesh. */
public final class MeshAreas {
  private MeshAreas() {}

  /** Area of every triangle, m^2. */
  public static double[] triangles(SurfaceMesh mesh) {
    double[] area = new double[mesh.triangleCount()];
    double[] e = new double[6];
    for (int t = 0; t < area.length; t++) {
      for (int k = 0; k < 3; k++) {
        double a = mesh.xyz()[3 * mesh.triangles()[3 * t] + k];
        e[k] = mesh.xyz()[3 * mesh.triangles()[3 * t + 1] + k] - a;
        e[3 + k] = mesh.xyz()[3 * mesh.triangles()[3 * t + 2] + k] - a;
      }
      double x = e[1] * e[5] - e[2] * e[4];
      double y = e[2] * e[3] - e[0] * e[5];
      double z = e[0] * e[4] - e[1] * e[3];
      area[t] = 0.5 * Math.sqrt(x * x + y * y + z * z);
    }
    return area;
  }
}
