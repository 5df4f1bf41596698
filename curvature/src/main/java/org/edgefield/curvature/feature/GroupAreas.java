package org.edgefield.curvature.feature;

import org.edgefield.importer.mesh.SurfaceMesh;

/** Area of each surface group by its triangles. */
final class GroupAreas {
  private GroupAreas() {}

  /**
   * Area per group, square metres.
   *
   * @param group group per face, the smallest face in it
   */
  static double[] find(SurfaceMesh mesh, int[] group) {
    double[] area = new double[group.length];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double[] n = Triangles.normal(mesh, t);
      area[group[mesh.triangleFace()[t]]] +=
          0.5 * Math.sqrt(n[0] * n[0] + n[1] * n[1] + n[2] * n[2]);
    }
    return area;
  }
}
