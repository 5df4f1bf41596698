package org.edgefield.field.contact;

import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleCursor.Side;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * Tells whether a point lies inside a closed body of a mesh: along a ray the first wall of the body
 * is met from behind. Three rays in odd directions vote, so that a ray along a wall cannot mislead.
 */
public final class InsideTest {
  private static final double[][] RAYS = {
    {0.5377, 0.8339, 0.1243}, {-0.7259, 0.1363, 0.6741}, {0.2158, -0.6321, -0.7442}
  };

  private final TriangleCursor cursor;

  /** A test of the bodies in a tree; for one thread. */
  public InsideTest(TriangleTree tree) {
    cursor = tree.cursor();
  }

  /** Whether the point lies inside the body of a group of triangles. */
  public boolean inside(int group, double x, double y, double z) {
    cursor.allowOnly(group);
    int votes = 0;
    for (double[] ray : RAYS) {
      double out = first(x, y, z, ray, Side.LEAVING);
      if (out < Double.POSITIVE_INFINITY && out < first(x, y, z, ray, Side.ENTERING)) {
        votes++;
      }
    }
    return votes >= 2;
  }

  private double first(double x, double y, double z, double[] ray, Side side) {
    boolean any = cursor.ray(x, y, z, ray[0], ray[1], ray[2], 0, Double.POSITIVE_INFINITY, side);
    return any ? cursor.distance() : Double.POSITIVE_INFINITY;
  }
}
