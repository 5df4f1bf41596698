package org.edgefield.cli.gltf.scene;

import com.fasterxml.jackson.databind.node.ObjectNode;
import org.edgefield.cli.gltf.SliceLayer;
import org.edgefield.cli.gltf.file.GlbBuilder;

/** Cuts through the gas, visible from both sides. */
final class SliceNodes {
  private SliceNodes() {}

  /**
   * Adds one cut.
   *
   * @param shown indices of the duties shown
   */
  static void add(SceneTree tree, Materials materials, SliceLayer slice, int[] shown) {
    if (slice.triangles().length == 0) {
      return;
    }
    GlbBuilder glb = tree.glb();
    int vertices = slice.xyz_m().length / 3;
    float[] xyz = new float[3 * vertices];
    for (int v = 0; v < vertices; v++) {
      double[] p = Axes.of(slice.xyz_m(), v);
      xyz[3 * v] = (float) p[0];
      xyz[3 * v + 1] = (float) p[1];
      xyz[3 * v + 2] = (float) p[2];
    }
    SceneTree.Leaf leaf = tree.leaf("slices", slice.name());
    ObjectNode primitive = leaf.primitive(glb.positions(xyz), glb.indices(slice.triangles()));
    ObjectNode attributes = primitive.withObject("/attributes");
    float[][] ratio = new float[shown.length][vertices];
    for (int d = 0; d < shown.length; d++) {
      float[] field = new float[vertices];
      for (int v = 0; v < vertices; v++) {
        field[v] = (float) slice.field_V_per_m()[shown[d]][v];
        ratio[d][v] = (float) slice.utilisation()[shown[d]][v];
      }
      attributes.put(ScaledAttributes.named("_FIELD_V_PER_M", d), glb.floats(field, 1));
    }
    ScaledAttributes.add(glb, attributes, ratio);
    materials.scaled(primitive, true);
  }
}
