package org.edgefield.curvature.incidence;

import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Which triangle corners and CAD edge segments meet at the vertices on CAD edges. Vertices inside
 * faces are left out: nothing special happens there, and they are the many.
 */
public final class MeshIncidence {
  private final SurfaceMesh mesh;
  private final int[] cornerStart;
  private final int[] corners;
  private final int[] segmentStart;
  private final int[] segments;

  /** Gathers the incidence of a mesh. */
  public MeshIncidence(SurfaceMesh mesh) {
    this.mesh = mesh;
    int n = mesh.vertexCount();
    int[] triangles = mesh.triangles();
    byte[] kind = mesh.vertexKind();
    cornerStart = new int[n + 1];
    for (int v : triangles) {
      if (kind[v] != SurfaceMesh.ON_FACE) {
        cornerStart[v + 1]++;
      }
    }
    accumulate(cornerStart);
    corners = new int[cornerStart[n]];
    int[] fill = cornerStart.clone();
    for (int c = 0; c < triangles.length; c++) {
      int v = triangles[c];
      if (kind[v] != SurfaceMesh.ON_FACE) {
        corners[fill[v]++] = c;
      }
    }
    int[] ends = mesh.segmentVertices();
    segmentStart = new int[n + 1];
    for (int v : ends) {
      segmentStart[v + 1]++;
    }
    accumulate(segmentStart);
    segments = new int[segmentStart[n]];
    fill = segmentStart.clone();
    for (int i = 0; i < ends.length; i++) {
      segments[fill[ends[i]]++] = i / 2;
    }
  }

  private static void accumulate(int[] start) {
    for (int i = 1; i < start.length; i++) {
      start[i] += start[i - 1];
    }
  }

  /** First index of a vertex's corners, see {@link #corner}; the next vertex's first ends them. */
  public int cornerStart(int vertex) {
    return cornerStart[vertex];
  }

  /** Triangle corner (3 t + k) at an index between two {@link #cornerStart}. */
  public int corner(int index) {
    return corners[index];
  }

  /** First index of a vertex's segments, see {@link #segment}. */
  public int segmentStart(int vertex) {
    return segmentStart[vertex];
  }

  /** CAD edge segment at an index between two {@link #segmentStart}. */
  public int segment(int index) {
    return segments[index];
  }

  /** The vertex after a corner's, in the winding of its triangle. */
  public int next(int corner) {
    return mesh.triangles()[corner % 3 == 2 ? corner - 2 : corner + 1];
  }

  /** The vertex before a corner's, in the winding of its triangle. */
  public int previous(int corner) {
    return mesh.triangles()[corner % 3 == 0 ? corner + 2 : corner - 1];
  }
}
