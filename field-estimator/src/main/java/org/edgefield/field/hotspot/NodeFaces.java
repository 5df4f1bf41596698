package org.edgefield.field.hotspot;

import java.util.Arrays;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.Features.RoundedEdge;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.importer.mesh.SurfaceMesh;

/** Which CAD face speaks for a node where several faces of a smooth patch meet. */
public final class NodeFaces {
  private NodeFaces() {}

  /**
   * Rounded edges that count as edges: convex ones that turn by less than 180 degrees (beyond that
   * a face is a rod or a full round, not the edge of something thicker).
   *
   * @return per face, null elsewhere
   */
  public static RoundedEdge[] rounded(Features features, int faceCount) {
    RoundedEdge[] rounded = new RoundedEdge[faceCount];
    for (int f = 0; f < faceCount; f++) {
      RoundedEdge r = features.roundedEdge(f);
      rounded[f] = r != null && r.convex() && r.turning_rad() < 0.98 * Math.PI ? r : null;
    }
    return rounded;
  }

  /**
   * Face per node: its smallest convex rounded edge where it has one, else the first of its faces.
   *
   * @param rounded by {@link #rounded}
   */
  public static int[] of(SurfaceMesh mesh, SurfaceNodes nodes, RoundedEdge[] rounded) {
    int[] nodeFace = new int[nodes.count()];
    Arrays.fill(nodeFace, -1);
    for (int i = 0; i < mesh.triangles().length; i++) {
      int n = nodes.cornerNode()[i];
      int f = mesh.triangleFace()[i / 3];
      if (nodeFace[n] < 0 || radius(rounded[f]) < radius(rounded[nodeFace[n]])) {
        nodeFace[n] = f;
      }
    }
    return nodeFace;
  }

  private static double radius(RoundedEdge r) {
    return r == null ? Double.POSITIVE_INFINITY : r.radius_m();
  }
}
