package org.edgefield.cli.gltf.scene;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Arrays;
import java.util.List;
import org.edgefield.cli.colour.ColourScale;
import org.edgefield.cli.gltf.file.GlbBuilder;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.field.result.DutyResult;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;

/** The parts themselves: one glTF node each, vertices at the mesh nodes. */
final class PartNodes {
  private static final int WHITE = 0xffff;

  private final SceneTree tree;
  private final Materials materials;
  private final SurfaceMesh mesh;
  private final SurfaceNodes nodes;
  private final List<DutyResult> duties;
  private final Utilisation utilisation;
  private final double amberLimit;

  /** Local vertex per mesh node, -1 where the part at hand does not use it. */
  private final int[] local;

  PartNodes(
      SceneTree tree,
      Materials materials,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      List<DutyResult> duties,
      Utilisation utilisation,
      double amberLimit) {
    this.tree = tree;
    this.materials = materials;
    this.mesh = mesh;
    this.nodes = nodes;
    this.duties = duties;
    this.utilisation = utilisation;
    this.amberLimit = amberLimit;
    local = new int[nodes.count()];
    Arrays.fill(local, -1);
  }

  /**
   * Adds a part.
   *
   * @param triangles its triangles
   * @param electrode name of its electrode, null where the part is ignored
   */
  void add(Part part, int[] triangles, String electrode, OuterSkin skin) {
    if (triangles.length == 0) {
      return;
    }
    int[] used = used(triangles);
    Ints shown = new Ints();
    Ints leftOut = new Ints();
    for (int t : triangles) {
      Ints into = skin.leftOut(t) ? leftOut : shown;
      for (int c = 0; c < 3; c++) {
        into.add(local[nodes.cornerNode()[3 * t + c]]);
      }
    }
    GlbBuilder glb = tree.glb();
    SceneTree.Leaf leaf = tree.leaf("parts", part.name());
    ObjectNode extras = leaf.node().putObject("extras");
    extras.put("path", part.path());
    if (electrode != null) {
      extras.put("electrode", electrode);
    }
    int positions = glb.positions(positions(used));
    if (shown.size() > 0) {
      ObjectNode primitive = leaf.primitive(positions, glb.indices(shown.toArray()));
      ObjectNode attributes = primitive.withObject("/attributes");
      attributes.put("COLOR_0", glb.colours(shades(used)));
      if (electrode == null) {
        materials.plain(primitive, "not assessed", ColourScale.NOT_ASSESSED);
      } else {
        values(attributes, used);
        materials.scaled(primitive, false);
      }
    }
    if (leftOut.size() > 0) {
      materials.leftOut(leaf.primitive(positions, glb.indices(leftOut.toArray())));
    }
    for (int node : used) {
      local[node] = -1;
    }
  }

  private int[] used(int[] triangles) {
    Ints used = new Ints();
    for (int t : triangles) {
      for (int c = 0; c < 3; c++) {
        int node = nodes.cornerNode()[3 * t + c];
        if (local[node] < 0) {
          local[node] = used.size();
          used.add(node);
        }
      }
    }
    return used.toArray();
  }

  private float[] positions(int[] used) {
    float[] out = new float[3 * used.length];
    double[] x = mesh.xyz();
    for (int i = 0; i < used.length; i++) {
      int v = 3 * nodes.nodeVertex()[used[i]];
      Axes.put(x[v], x[v + 1], x[v + 2], out, 3 * i);
    }
    return out;
  }

  private void values(ObjectNode attributes, int[] used) {
    GlbBuilder glb = tree.glb();
    float[][] shown = new float[duties.size()][used.length];
    for (int d = 0; d < duties.size(); d++) {
      float[] ratio = new float[used.length];
      float[] field = new float[used.length];
      for (int i = 0; i < used.length; i++) {
        ratio[i] = (float) utilisation.onNode(d, used[i]);
        field[i] = (float) duties.get(d).field().field_V_per_m()[used[i]];
        shown[d][i] = (float) utilisation.onFace(d, used[i]);
      }
      attributes.put(ScaledAttributes.named("_UTILISATION", d), glb.floats(ratio, 1));
      attributes.put(ScaledAttributes.named("_FIELD_V_PER_M", d), glb.floats(field, 1));
    }
    ScaledAttributes.coordinates(glb, attributes, shown);
  }

  /** Soft shading baked into the vertex colours: an unlit grey body would have no shape. */
  private short[] shades(int[] used) {
    short[] out = new short[4 * used.length];
    double[] normal = nodes.normal();
    for (int i = 0; i < used.length; i++) {
      double[] n = Axes.of(normal, used[i]);
      double shade = Shading.factor(n, utilisation.mostOnFace(used[i]), amberLimit);
      short word = (short) Math.round(WHITE * shade);
      out[4 * i] = word;
      out[4 * i + 1] = word;
      out[4 * i + 2] = word;
      out[4 * i + 3] = (short) WHITE;
    }
    return out;
  }
}
