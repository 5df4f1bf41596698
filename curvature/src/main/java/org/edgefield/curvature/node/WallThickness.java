package org.edgefield.curvature.node;

import java.util.stream.IntStream;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleTree;

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

  private static final int CHUNK = 4096;

  private WallThickness() {}

  /**
   * Thickness per node.
   *
   * @param geometry tells the part of each face
   * @return metres, infinite where the ray leaves nowhere (an open mesh)
   */
  public static double[] perNode(ExactGeometry geometry, SurfaceMesh mesh, SurfaceNodes nodes) {
    int[] trianglePart = new int[mesh.triangleCount()];
    for (int t = 0; t < trianglePart.length; t++) {
      trianglePart[t] = geometry.facePart(mesh.triangleFace()[t]);
    }
    TriangleTree tree = TriangleTree.build(mesh.xyz(), mesh.triangles(), trianglePart);
    int n = nodes.count();
    double[] start = startPoints(mesh, nodes);
    int[] part = new int[n];
    for (int c = 0; c < nodes.cornerNode().length; c++) {
      part[nodes.cornerNode()[c]] = trianglePart[c / 3];
    }
    double[] thickness = new double[n];
    // Each node's value is its own affair, so the order of the chunks does not matter.
    IntStream.range(0, (n + CHUNK - 1) / CHUNK)
        .parallel()
        .forEach(
            chunk -> {
              TriangleCursor cursor = tree.cursor();
              int last = -1;
              for (int i = chunk * CHUNK; i < Math.min(n, (chunk + 1) * CHUNK); i++) {
                if (part[i] != last) {
                  last = part[i];
                  cursor.allowOnly(last);
                }
                thickness[i] = ray(cursor, start, nodes.normal(), 3 * i);
              }
            });
    return thickness;
  }

  private static double ray(TriangleCursor cursor, double[] start, double[] normal, int at) {
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
