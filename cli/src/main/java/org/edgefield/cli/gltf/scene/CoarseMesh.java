package org.edgefield.cli.gltf.scene;

import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.Set;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * What is drawn, coarse enough to be searched at once: vertices in one cell of a grid become the
 * first of them, collapsed and repeated triangles go. Bodies thinner than a cell may vanish.
 */
final class CoarseMesh {
  /** Cells per axis that a key has room for. */
  private static final long CELLS = 1L << 20;

  private CoarseMesh() {}

  /**
   * A search tree over the drawn triangles.
   *
   * @param cell edge length of a grid cell; at least a millionth of the model's size
   */
  static TriangleTree tree(SurfaceMesh mesh, OuterSkin skin, double cell) {
    double[] x = mesh.xyz();
    Map<Long, Integer> first = new HashMap<>();
    int[] merged = new int[mesh.vertexCount()];
    for (int v = 0; v < merged.length; v++) {
      long key = 0;
      for (int c = 0; c < 3; c++) {
        key = key * CELLS + Math.floorMod((long) Math.floor(x[3 * v + c] / cell), CELLS);
      }
      Integer known = first.putIfAbsent(key, v);
      merged[v] = known == null ? v : known;
    }
    Set<Corners> seen = new HashSet<>();
    Ints kept = new Ints();
    int[] tri = mesh.triangles();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int a = merged[tri[3 * t]];
      int b = merged[tri[3 * t + 1]];
      int c = merged[tri[3 * t + 2]];
      if (a != b && b != c && c != a && !skin.leftOut(t) && seen.add(new Corners(a, b, c))) {
        kept.add(a, b, c);
      }
    }
    return TriangleTree.build(x, kept.toArray());
  }

  private record Corners(int a, int b, int c) {}
}
