package org.edgefield.cli.gltf.scene;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.HashMap;
import java.util.Map;
import org.edgefield.cli.gltf.file.GlbBuilder;

/** Nodes and meshes of the scene: one root, named groups below it, one mesh per leaf. */
final class SceneTree {
  private final GlbBuilder glb;
  private final ArrayNode nodes;
  private final ArrayNode meshes;
  private final ArrayNode rootChildren;
  private final Map<String, ArrayNode> groups = new HashMap<>();

  SceneTree(GlbBuilder glb, String name) {
    this.glb = glb;
    glb.root().put("scene", 0);
    glb.root().putArray("scenes").addObject().put("name", name).putArray("nodes").add(0);
    nodes = glb.root().putArray("nodes");
    meshes = glb.root().putArray("meshes");
    rootChildren = nodes.addObject().put("name", name).putArray("children");
  }

  /** Adds a named leaf with an empty mesh to a group. */
  Leaf leaf(String group, String name) {
    ArrayNode children =
        groups.computeIfAbsent(
            group,
            g -> {
              rootChildren.add(nodes.size());
              return nodes.addObject().put("name", g).putArray("children");
            });
    children.add(nodes.size());
    ObjectNode node = nodes.addObject().put("name", name).put("mesh", meshes.size());
    return new Leaf(node, meshes.addObject().put("name", name).putArray("primitives"));
  }

  /**
   * A node with its mesh.
   *
   * @param node for extras
   * @param primitives to add to
   */
  record Leaf(ObjectNode node, ArrayNode primitives) {
    /** Adds a primitive; its attributes go to {@code primitive.withObject("/attributes")}. */
    ObjectNode primitive(int positions, int indices) {
      ObjectNode primitive = primitives.addObject();
      primitive.putObject("attributes").put("POSITION", positions);
      return primitive.put("indices", indices);
    }
  }

  GlbBuilder glb() {
    return glb;
  }
}
