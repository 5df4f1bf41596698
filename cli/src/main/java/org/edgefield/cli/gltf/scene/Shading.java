package org.edgefield.cli.gltf.scene;

import org.edgefield.cli.colour.ColourScale;

/**
 * Brightness of a surface by its direction, as from a high window at the viewer's left. Calm
 * surfaces get all of it, hot ones next to none, so that amber and red keep their colours.
 */
final class Shading {
  /** Darkest factor on a calm surface, in linear light. */
  static final double DARKEST = 0.45;

  /** Share of the shading that stays where a limit is passed. */
  static final double SHARE_WHEN_HOT = 0.3;

  private static final double[] LIGHT = Triangles.unit(new double[] {-0.45, 0.7, 0.55});

  private Shading() {}

  /**
   * Factor on linear colour.
   *
   * @param normal outward unit normal in glTF axes
   * @param utilisation largest utilisation shown there
   * @param amberLimit utilisation from which the colour must not suffer
   */
  static double factor(double[] normal, double utilisation, double amberLimit) {
    double facing =
        0.5 + 0.5 * (normal[0] * LIGHT[0] + normal[1] * LIGHT[1] + normal[2] * LIGHT[2]);
    double calm = Math.min(ColourScale.CALM, amberLimit / 2);
    double heat = Math.max(0, Math.min(1, (utilisation - calm) / (amberLimit - calm)));
    double share = 1 - (1 - SHARE_WHEN_HOT) * heat;
    return 1 - share * (1 - DARKEST) * (1 - facing);
  }
}
