package org.edgefield.cli.gltf.scene;

import com.fasterxml.jackson.databind.node.ObjectNode;
import org.edgefield.cli.gltf.file.GlbBuilder;

/**
 * Stands the board to the right of the model as seen from the front, upright, readable from both
 * sides.
 */
final class BoardNode {
  /** Distance from the model as a share of its diagonal. */
  private static final double GAP = 0.06;

  /** Distance as a share of the model's depth: free of it in views up to 30 degrees aside. */
  private static final double GAP_OF_DEPTH = 0.5 * Math.tan(Math.toRadians(30));

  /** Smallest and largest height as a share of the model's diagonal. */
  private static final double LOWEST = 0.5;

  private static final double HIGHEST = 0.72;

  private BoardNode() {}

  /**
   * Adds the board.
   *
   * @param model bounds of the model in glTF axes
   * @param image picture per duty, all of the same shape
   * @param rows rows of the pictures in use
   */
  static void add(SceneTree tree, Materials materials, Box model, int[] image, int rows) {
    double diagonal = model.diagonal();
    double high = Math.max(LOWEST * diagonal, Math.min(HIGHEST * diagonal, 1.15 * model.size(1)));
    double wide = high * Board.WIDTH / rows;
    double left = model.high[0] + Math.max(GAP * diagonal, GAP_OF_DEPTH * model.size(2));
    double bottom = model.centre(1) - high / 2;
    double z = model.centre(2);
    float x0 = (float) left;
    float x1 = (float) (left + wide);
    float y0 = (float) bottom;
    float y1 = (float) (bottom + high);
    // Front and back lie apart by a hair, each drawn from its own side only.
    float front = (float) (z + 0.001 * diagonal);
    float back = (float) (z - 0.001 * diagonal);
    float[] xyz = {
      x0, y0, front, x1, y0, front, x1, y1, front, x0, y1, front,
      x1, y0, back, x0, y0, back, x0, y1, back, x1, y1, back
    };
    float v = (float) rows / Board.TALLEST;
    float[] uv = {0, v, 1, v, 1, 0, 0, 0, 0, v, 1, v, 1, 0, 0, 0};
    int[] index = {0, 1, 2, 0, 2, 3, 4, 5, 6, 4, 6, 7};
    GlbBuilder glb = tree.glb();
    SceneTree.Leaf leaf = tree.leaf("legend", "legend board");
    ObjectNode primitive = leaf.primitive(glb.positions(xyz), glb.indices(index));
    primitive.withObject("/attributes").put("TEXCOORD_0", glb.floats(uv, 2));
    materials.pictured(primitive, "legend board", image);
  }
}
