package org.edgefield.importer.step;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.edgefield.importer.mesh.SurfaceMesh;

/** Plain check that every triangle edge is met once from each side. */
final class Watertight {
  private Watertight() {}

  /** The first few faults in words; empty when the mesh is watertight. */
  static List<String> faults(SurfaceMesh mesh) {
    Map<Long, Integer> count = new HashMap<>();
    List<String> faults = new ArrayList<>();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        long a = mesh.triangles()[3 * t + k];
        long b = mesh.triangles()[3 * t + (k + 1) % 3];
        if (count.merge(a << 32 | b, 1, Integer::sum) > 1) {
          faults.add("edge " + a + "-" + b + " twice the same way, face " + mesh.triangleFace()[t]);
        }
      }
    }
    for (long key : count.keySet()) {
      long back = key << 32 | key >>> 32;
      if (!count.containsKey(back)) {
        faults.add("open edge " + (key >>> 32) + "-" + (key & 0xffffffffL));
      }
    }
    return faults.subList(0, Math.min(5, faults.size()));
  }
}
