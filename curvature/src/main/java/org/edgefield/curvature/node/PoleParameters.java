package org.edgefield.curvature.node;

import java.util.HashMap;
import java.util.Map;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Surface parameters at which to evaluate a triangle's corner. At a pole or an apex one parameter
 * is free: the corner takes the middle of the triangle's other two corners, so that every triangle
 * around an apex sees the normal of its own side.
 */
final class PoleParameters {
  private final SurfaceMesh mesh;

  /** Free parameter (0 = u, 1 = v) by face and CAD vertex. */
  private final Map<Long, Integer> free = new HashMap<>();

  PoleParameters(ExactGeometry geometry, SurfaceMesh mesh) {
    this.mesh = mesh;
    for (int e = 0; e < geometry.edgeCount(); e++) {
      if (!geometry.edgeDegenerate(e)) {
        continue;
      }
      int[] faces = geometry.edgeFaces(e);
      int side = faces[0] >= 0 ? 0 : 1;
      double[] uv = new double[4];
      geometry.edgeUv(e, side, 2, geometry.edgeRange(e), uv);
      int parameter = Math.abs(uv[2] - uv[0]) >= Math.abs(uv[3] - uv[1]) ? 0 : 1;
      free.put(key(faces[side], geometry.edgeVertices(e)[0]), parameter);
    }
  }

  private static Long key(int face, int cadVertex) {
    return ((long) face << 32) | (cadVertex & 0xffffffffL);
  }

  /** Writes the parameters of a corner (3 t + k) to out[at], out[at + 1]. */
  void parameters(int corner, double[] out, int at) {
    double[] uv = mesh.cornerUv();
    out[at] = uv[2 * corner];
    out[at + 1] = uv[2 * corner + 1];
    int vertex = mesh.triangles()[corner];
    if (free.isEmpty() || mesh.vertexKind()[vertex] != SurfaceMesh.ON_VERTEX) {
      return;
    }
    int t = corner / 3;
    Integer parameter = free.get(key(mesh.triangleFace()[t], mesh.vertexEntity()[vertex]));
    if (parameter != null) {
      int p = parameter;
      double sum = uv[6 * t + p] + uv[6 * t + 2 + p] + uv[6 * t + 4 + p];
      out[at + p] = 0.5 * (sum - uv[2 * corner + p]);
    }
  }
}
