package org.edgefield.field.hotspot;

import java.util.Arrays;
import java.util.HashSet;
import java.util.Set;
import org.edgefield.curvature.EdgeClass;
import org.edgefield.curvature.EdgeFeature;
import org.edgefield.curvature.Features;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Mesh vertices on sharp convex edges, each with the sharpest edge through it. On an edge that runs
 * out into a smooth join, only the vertices where it is still sharp count.
 */
public final class SharpVertices {
  private final SurfaceMesh mesh;
  private final Features features;
  private final int[] segment;
  private final double[] angle;

  private SharpVertices(SurfaceMesh mesh, Features features, boolean[] hidden) {
    this.mesh = mesh;
    this.features = features;
    segment = new int[mesh.vertexCount()];
    angle = new double[mesh.vertexCount()];
    Arrays.fill(segment, -1);
    Arrays.fill(angle, Double.POSITIVE_INFINITY);
    Set<Long> seams = seams(mesh, hidden);
    for (int g = 0; g < mesh.segmentCount(); g++) {
      EdgeFeature edge = features.edge(mesh.segmentEdge()[g]);
      if (edge.edgeClass() != EdgeClass.SHARP_CONVEX && edge.edgeClass() != EdgeClass.MIXED) {
        continue;
      }
      if (seams.contains(key(mesh.segmentVertices()[2 * g], mesh.segmentVertices()[2 * g + 1]))) {
        continue;
      }
      for (int end = 0; end < 2; end++) {
        int v = mesh.segmentVertices()[2 * g + end];
        double a = edge.interiorAngle_rad(mesh.segmentT()[2 * g + end]);
        if (a < Math.PI - EdgeFeature.TANGENT_RAD && a < angle[v]) {
          angle[v] = a;
          segment[v] = g;
        }
      }
    }
  }

  /**
   * Sides of hidden triangles: an edge between a hidden and an open face is a seam of two parts.
   */
  private static Set<Long> seams(SurfaceMesh mesh, boolean[] hidden) {
    Set<Long> result = new HashSet<>();
    for (int i = 0; i < mesh.triangles().length; i++) {
      if (hidden[i / 3]) {
        int next = i % 3 == 2 ? i - 2 : i + 1;
        result.add(key(mesh.triangles()[i], mesh.triangles()[next]));
      }
    }
    return result;
  }

  private static long key(int a, int b) {
    return (long) Math.min(a, b) << 32 | Math.max(a, b);
  }

  /**
   * Finds the sharp vertices of a mesh.
   *
   * @param hidden mark per triangle: it lies inside or against another part of its electrode
   */
  public static SharpVertices of(SurfaceMesh mesh, Features features, boolean[] hidden) {
    return new SharpVertices(mesh, features, hidden);
  }

  /** Whether a vertex lies where an edge is sharp. */
  public boolean isSharp(int vertex) {
    return segment[vertex] >= 0;
  }

  /** Interior angle of the sharpest edge at a sharp vertex, radians. */
  public double angle_rad(int vertex) {
    return angle[vertex];
  }

  /** Mesh segment of the sharpest edge at a sharp vertex. */
  public int segment(int vertex) {
    return segment[vertex];
  }

  /** Whether three or more sharp edges meet at a sharp vertex. */
  public boolean isCorner(int vertex) {
    return isSharp(vertex)
        && mesh.vertexKind()[vertex] == SurfaceMesh.ON_VERTEX
        && features.isCorner(mesh.vertexEntity()[vertex]);
  }
}
