package org.edgefield.importer.mesh.halfedge;

import java.util.Arrays;
import java.util.List;
import org.edgefield.importer.mesh.SurfaceMesh;

/** Joins the half-edge meshes of all parts into one surface mesh, part after part. */
public final class MeshAssembler {
  private MeshAssembler() {}

  /**
   * Joins parts.
   *
   * @param parts one mesh per part, in order
   * @return the mesh; living vertices and triangles keep their order
   */
  public static SurfaceMesh join(List<HalfEdgeMesh> parts) {
    int vertices = 0;
    int triangles = 0;
    int segments = 0;
    for (HalfEdgeMesh m : parts) {
      for (int v = 0; v < m.vertices; v++) {
        vertices += m.out[v] >= 0 ? 1 : 0;
      }
      triangles += m.living;
      for (int h = 0; h < 3 * m.triangles; h++) {
        segments += isSegment(m, h) ? 1 : 0;
      }
    }
    SurfaceMesh all =
        new SurfaceMesh(
            new double[3 * vertices],
            new int[3 * triangles],
            new int[triangles],
            new double[6 * triangles],
            new byte[vertices],
            new int[vertices],
            new int[2 * segments],
            new int[segments],
            new double[2 * segments]);
    int v0 = 0;
    int t0 = 0;
    int s0 = 0;
    for (HalfEdgeMesh m : parts) {
      int[] id = new int[m.vertices];
      Arrays.fill(id, -1);
      for (int v = 0; v < m.vertices; v++) {
        if (m.out[v] >= 0) {
          System.arraycopy(m.xyz, 3 * v, all.xyz(), 3 * v0, 3);
          all.vertexKind()[v0] = m.kind[v];
          all.vertexEntity()[v0] = m.entity[v];
          id[v] = v0++;
        }
      }
      for (int t = 0; t < m.triangles; t++) {
        if (m.face[t] < 0) {
          continue;
        }
        all.triangleFace()[t0] = m.face[t];
        for (int k = 0; k < 3; k++) {
          int h = 3 * t + k;
          all.triangles()[3 * t0 + k] = id[m.org[h]];
          all.cornerUv()[6 * t0 + 2 * k] = m.uv[2 * h];
          all.cornerUv()[6 * t0 + 2 * k + 1] = m.uv[2 * h + 1];
          if (isSegment(m, h)) {
            all.segmentVertices()[2 * s0] = id[m.org[h]];
            all.segmentVertices()[2 * s0 + 1] = id[m.dest(h)];
            all.segmentEdge()[s0] = m.cad[h];
            all.segmentT()[2 * s0] = m.tOrg[h];
            all.segmentT()[2 * s0 + 1] = m.tEnd[h];
            s0++;
          }
        }
        t0++;
      }
    }
    return all;
  }

  /** The half of a CAD segment that runs with rising t. */
  private static boolean isSegment(HalfEdgeMesh m, int h) {
    return m.face[h / 3] >= 0 && m.cad[h] >= 0 && m.tOrg[h] < m.tEnd[h];
  }
}
