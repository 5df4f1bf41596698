package org.edgefield.importer.mesh.remesh;

import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;

/**
 * Brings the surface parameters of corners on CAD edges to the points of their faces that are
 * nearest to the vertex. A first triangulation takes them from the model's curves in parameter
 * space, which follow the edge only within the model's tolerance.
 */
final class EdgeCorners {
  private static final int STEPS = 4;

  private final Workspace w;

  EdgeCorners(Workspace w) {
    this.w = w;
  }

  /** Settles all of them, the mesh as it stands. */
  void settle() {
    HalfEdgeMesh mesh = w.mesh;
    FacePoints points = w.points;
    int n = 0;
    int[] sector = new int[3 * mesh.triangles];
    for (int h = 0; h < sector.length; h++) {
      if (mesh.face[h / 3] >= 0
          && mesh.cad[h] >= 0
          && mesh.pole[h] == 0
          && mesh.kind[mesh.org[h]] != SurfaceMesh.ON_FACE) {
        sector[n++] = h;
      }
    }
    points.ensure(n);
    for (int i = 0; i < n; i++) {
      int h = sector[i];
      points.face[i] = mesh.face[h / 3];
      System.arraycopy(mesh.uv, 2 * h, points.uv, 2 * i, 2);
      System.arraycopy(mesh.xyz, 3 * mesh.org[h], points.target, 3 * i, 3);
    }
    points.settle(n, STEPS);
    double[] corner = new double[5];
    for (int i = 0; i < n; i++) {
      int h = sector[i];
      System.arraycopy(points.uv, 2 * i, corner, 0, 2);
      System.arraycopy(mesh.normal, 3 * h, corner, 2, 3);
      mesh.setSector(h, corner, 0);
    }
  }
}
