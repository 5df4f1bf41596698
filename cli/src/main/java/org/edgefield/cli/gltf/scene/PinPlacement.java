package org.edgefield.cli.gltf.scene;

import java.util.ArrayList;
import java.util.List;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;

/**
 * Finds room for the heads of the pins: clear of metal and of each other, and in sight from where
 * viewers first look (from the front, a little above). Model axes.
 */
final class PinPlacement {
  /** Towards the default camera: 15 degrees above the horizon, from -y. */
  private static final double[] CAMERA = {
    0, -Math.cos(Math.toRadians(15)), Math.sin(Math.toRadians(15))
  };

  private static final double[] REACHES = {1, 1.7, 2.6, 4, 6};
  private static final double SLOPE = Math.sqrt(0.5);

  /** Cell of the coarse mesh that is searched, as a share of a head. */
  private static final double CELL_OF_HEAD = 0.25;

  private final TriangleCursor cursor;
  private final double head;
  private final double reach;
  private final List<double[]> taken = new ArrayList<>();

  /**
   * Prepares the search.
   *
   * @param skin what is not drawn and so hides nothing
   * @param head edge length of a pin's head
   * @param reach usual length of a pin
   */
  PinPlacement(SurfaceMesh mesh, OuterSkin skin, double head, double reach) {
    cursor = CoarseMesh.tree(mesh, skin, CELL_OF_HEAD * head).cursor();
    this.head = head;
    this.reach = reach;
  }

  /**
   * Centre of the head for a hot spot.
   *
   * @param at hot spot
   * @param normal direction out of the surface there
   */
  double[] head(double[] at, double[] normal) {
    double[] best = null;
    double bestScore = Double.NEGATIVE_INFINITY;
    for (int r = 0; r < REACHES.length; r++) {
      for (double[] direction : directions(normal)) {
        double length = REACHES[r] * reach;
        double[] c = {
          at[0] + length * direction[0],
          at[1] + length * direction[1],
          at[2] + length * direction[2]
        };
        double score = score(at, c, direction, length) - 0.1 * r;
        if (score > bestScore) {
          bestScore = score;
          best = c;
        }
      }
    }
    taken.add(best);
    return best;
  }

  private static List<double[]> directions(double[] n) {
    List<double[]> out = new ArrayList<>();
    out.add(n);
    double[][] others = {
      {0, 0, 1}, {0, -1, 0}, {0, -SLOPE, SLOPE}, {SLOPE, 0, SLOPE}, {-SLOPE, 0, SLOPE},
      {SLOPE, -SLOPE, 0}, {-SLOPE, -SLOPE, 0}, {1, 0, 0}, {-1, 0, 0}, {0, 0, -1}
    };
    for (double[] o : others) {
      double[] between = Triangles.unit(new double[] {n[0] + o[0], n[1] + o[1], n[2] + o[2]});
      if (n[0] * o[0] + n[1] * o[1] + n[2] * o[2] > -0.5) {
        out.add(between);
      }
    }
    out.addAll(List.of(others));
    return out;
  }

  private double score(double[] at, double[] c, double[] d, double length) {
    double score = 0;
    boolean free = !cursor.nearest(c[0], c[1], c[2], 0.95 * head);
    for (double[] other : taken) {
      double dx = c[0] - other[0];
      double dy = c[1] - other[1];
      double dz = c[2] - other[2];
      double along = dx * CAMERA[0] + dy * CAMERA[1] + dz * CAMERA[2];
      double across = dx * dx + dy * dy + dz * dz - along * along;
      free &= across > 2 * head * head;
    }
    if (free) {
      score += 4;
    }
    // Only a surface that faces the camera can hide the head: backs are not drawn.
    if (!hit(c, 0, CAMERA, Double.POSITIVE_INFINITY, TriangleCursor.Side.LEAVING)) {
      score += 2;
    }
    if (!hit(at, CELL_OF_HEAD * head, d, length, TriangleCursor.Side.ANY)) {
      score += 1;
    }
    return score;
  }

  private boolean hit(
      double[] from, double least, double[] d, double most, TriangleCursor.Side side) {
    return cursor.ray(from[0], from[1], from[2], d[0], d[1], d[2], least, most, side);
  }
}
