package org.edgefield.cli.gltf.scene;

import com.fasterxml.jackson.databind.node.ObjectNode;
import org.edgefield.cli.gltf.file.GlbBuilder;

/** Vertex attributes that hold a scalar and its place on the scale's texture. */
final class ScaledAttributes {
  private ScaledAttributes() {}

  /**
   * Adds {@code _UTILISATION} per duty and the texture coordinates that show it.
   *
   * @param utilisation per duty and vertex
   */
  static void add(GlbBuilder glb, ObjectNode attributes, float[][] utilisation) {
    for (int d = 0; d < utilisation.length; d++) {
      attributes.put(named("_UTILISATION", d), glb.floats(utilisation[d], 1));
    }
    coordinates(glb, attributes, utilisation);
  }

  /** Adds the texture coordinates alone: two duties per set, along u and along v. */
  static void coordinates(GlbBuilder glb, ObjectNode attributes, float[][] utilisation) {
    for (int set = 0; 2 * set < utilisation.length; set++) {
      float[] uv = new float[2 * utilisation[0].length];
      for (int i = 0; i < uv.length; i++) {
        int d = 2 * set + i % 2;
        uv[i] = d < utilisation.length ? (float) Materials.coordinate(utilisation[d][i / 2]) : 0;
      }
      attributes.put("TEXCOORD_" + set, glb.floats(uv, 2));
    }
  }

  /** Attribute of a duty: the first has no number, the second "_1". */
  static String named(String attribute, int duty) {
    return duty == 0 ? attribute : attribute + "_" + duty;
  }
}
