package org.edgefield.curvature.feature;

import org.edgefield.curvature.incidence.MeshIncidence;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Which side of a CAD edge has its face on the left of rising t, seen from the gas. Read off the
 * mesh: the triangle on the left runs along the segment forwards.
 */
final class EdgeSides {
  private EdgeSides() {}

  /**
   * Left side per edge.
   *
   * @return 0 or 1 as in {@link ExactGeometry#edgeFaces}, -1 where the mesh has no segment of the
   *     edge
   */
  static byte[] leftSides(ExactGeometry geometry, SurfaceMesh mesh, MeshIncidence incidence) {
    byte[] left = new byte[geometry.edgeCount()];
    java.util.Arrays.fill(left, (byte) -1);
    for (int s = 0; s < mesh.segmentCount(); s++) {
      int edge = mesh.segmentEdge()[s];
      if (left[edge] < 0) {
        left[edge] = leftSide(geometry, mesh, incidence, s);
      }
    }
    return left;
  }

  private static byte leftSide(
      ExactGeometry geometry, SurfaceMesh mesh, MeshIncidence incidence, int segment) {
    int edge = mesh.segmentEdge()[segment];
    int[] faces = geometry.edgeFaces(edge);
    int v = mesh.segmentVertices()[2 * segment];
    int w = mesh.segmentVertices()[2 * segment + 1];
    for (int i = incidence.cornerStart(v); i < incidence.cornerStart(v + 1); i++) {
      int corner = incidence.corner(i);
      int face = mesh.triangleFace()[corner / 3];
      boolean forward = incidence.next(corner) == w;
      boolean backward = incidence.previous(corner) == w;
      if (forward == backward || (face != faces[0] && face != faces[1])) {
        continue;
      }
      int side;
      if (faces[0] == faces[1]) {
        side = sideByParameters(geometry, mesh, edge, segment, corner);
      } else {
        side = face == faces[0] ? 0 : 1;
      }
      return (byte) (forward ? side : 1 - side);
    }
    return -1;
  }

  /** Side of a seam that a triangle lies on: the one whose parameters its corner has. */
  private static int sideByParameters(
      ExactGeometry geometry, SurfaceMesh mesh, int edge, int segment, int corner) {
    double[] t = {mesh.segmentT()[2 * segment]};
    double[] uv = new double[2];
    double[] miss = new double[2];
    for (int k = 0; k < 2; k++) {
      geometry.edgeUv(edge, k, 1, t, uv);
      miss[k] =
          Math.hypot(uv[0] - mesh.cornerUv()[2 * corner], uv[1] - mesh.cornerUv()[2 * corner + 1]);
    }
    return miss[0] <= miss[1] ? 0 : 1;
  }
}
