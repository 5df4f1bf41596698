package org.edgefield.cli.gltf.scene;

import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Mesh segments on CAD edges where smooth patches meet, with the triangles beside them. Segments
 * inside a patch (tangent edges, seams) are not in it.
 */
final class SharpEdges {
  private final SurfaceMesh mesh;
  private final SurfaceNodes nodes;
  private final int[] beside;

  SharpEdges(SurfaceMesh mesh, SurfaceNodes nodes) {
    this.mesh = mesh;
    this.nodes = nodes;
    beside = new int[2 * mesh.segmentCount()];
    Arrays.fill(beside, -1);
    Map<Long, Integer> segmentOf = new HashMap<>(2 * mesh.segmentCount());
    for (int s = 0; s < mesh.segmentCount(); s++) {
      segmentOf.put(key(mesh.segmentVertices()[2 * s], mesh.segmentVertices()[2 * s + 1]), s);
    }
    int[] tri = mesh.triangles();
    for (int i = 0; i < tri.length; i++) {
      int a = tri[i];
      int b = tri[i - i % 3 + (i + 1) % 3];
      if (mesh.vertexKind()[a] != SurfaceMesh.ON_FACE
          && mesh.vertexKind()[b] != SurfaceMesh.ON_FACE) {
        Integer s = segmentOf.get(key(a, b));
        if (s != null) {
          beside[beside[2 * s] < 0 ? 2 * s : 2 * s + 1] = i;
        }
      }
    }
  }

  private static long key(int a, int b) {
    return ((long) Math.min(a, b) << 32) | Math.max(a, b);
  }

  int count() {
    return mesh.segmentCount();
  }

  /** Whether patches meet at a segment (or it bounds an open sheet). */
  boolean isSharp(int segment) {
    int first = corner(segment, 0);
    int second = corner(segment, 1);
    return first >= 0 && (second < 0 || patch(first) != patch(second));
  }

  private int patch(int corner) {
    return nodes.nodePatch()[nodes.cornerNode()[corner]];
  }

  /**
   * Triangle corner from which a triangle runs along a segment: its own corner and the next one are
   * the segment's ends.
   *
   * @param side 0 or 1
   * @return corner number (3 per triangle), -1 where there is no triangle on that side
   */
  int corner(int segment, int side) {
    return beside[2 * segment + side];
  }

  /** Node of the segment's end 0 or 1 on a side. */
  int node(int segment, int side, int end) {
    int corner = corner(segment, side);
    int next = corner - corner % 3 + (corner + 1) % 3;
    boolean forward = mesh.triangles()[corner] == mesh.segmentVertices()[2 * segment];
    return nodes.cornerNode()[(end == 0) == forward ? corner : next];
  }
}
