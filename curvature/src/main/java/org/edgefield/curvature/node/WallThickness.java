package org.edgefield.curvature.node;

import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;

/**
 * Local wall thickness: the length of a ray from a node into the solid, against its normal, to
 * where it leaves the solid again.
 *
 * <p>Known limit: the mesh's chords stand in for the surface, so on curved walls the value is off
 * by the chord height. Near the edge of a wedge the thickness goes to zero with the distance from
 * the edge, as it should.
 */
public final class WallThickness {
  /**
   * The ray starts this share of the way from the node to the middle of its triangles, so that on
   * an edge it does not run within the neighbouring wall.
   */
  private static final double INSET = 1e-3;

  private final double[] start;
  private final double[] normal;

  /** Prepares the rays of all nodes. */
  public WallThickness(SurfaceMesh mesh, SurfaceNodes nodes) {
    start = startPoints(mesh, nodes);
    normal = nodes.normal();
  }

  /**
   * Thickness at a node.
   *
   * @param cursor over a tree of the mesh, restricted to the node's part
   * @return metres, infinite where the ray leaves nowhere (an open mesh)
   */
  public double at(TriangleCursor cursor, int node) {
    int at = 3 * node;
    cursor.ray(
        start[at],
        start[at + 1],
        start[at + 2],
        -normal[at],
        -normal[at + 1],
        -normal[at + 2],
        0,
        Double.POSITIVE_INFINITY,
        TriangleCursor.Side.LEAVING);
    return cursor.distance();
  }

  private static double[] startPoints(SurfaceMesh mesh, SurfaceNodes nodes) {
    double[] sum = new double[3 * nodes.count()];
    int[] count = new int[nodes.count()];
    double[] x = mesh.xyz();
    int[] triangles = mesh.triangles();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        double third =
            (x[3 * triangles[3 * t] + k]
                    + x[3 * triangles[3 * t + 1] + k]
                    + x[3 * triangles[3 * t + 2] + k])
                / 3;
        for (int corner = 3 * t; corner < 3 * t + 3; corner++) {
          sum[3 * nodes.cornerNode()[corner] + k] += third;
        }
      }
      for (int corner = 3 * t; corner < 3 * t + 3; corner++) {
        count[nodes.cornerNode()[corner]]++;
      }
    }
    for (int i = 0; i < count.length; i++) {
      for (int k = 0; k < 3; k++) {
        sum[3 * i + k] =
            (1 - INSET) * x[3 * nodes.nodeVertex()[i] + k] + INSET * sum[3 * i + k] / count[i];
      }
    }
    return sum;
  }
}
