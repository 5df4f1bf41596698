package org.edgefield.field.bem.edge;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Corners where three or more sharp convex edges meet.
 *
 * @param vertex mesh vertex per corner
 * @param triangle a mesh triangle at each
 * @param rightAngled whether exactly three edges meet at right angles
 * @param thickness_m least distance from its edges to the next edge across a face
 * @param reach_m how far the corner's field holds
 * @param position 3 each
 * @param direction unit mean of the faces' outward normals, 3 each
 */
record CornerStations(
    int[] vertex,
    int[] triangle,
    boolean[] rightAngled,
    double[] thickness_m,
    double[] reach_m,
    double[] position,
    double[] direction) {
  /** Cosine of a right angle, give or take half a degree. */
  private static final double RIGHT = 0.0087;

  int count() {
    return vertex.length;
  }

  static CornerStations of(
      Features features,
      SharpEdges edges,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      boolean[] charged) {
    List<List<double[]>> tangents = tangents(edges, mesh);
    boolean[] bare = new boolean[mesh.vertexCount()];
    int[] beside = new int[mesh.vertexCount()];
    double[] normal = new double[3 * mesh.vertexCount()];
    boolean[] done = new boolean[nodes.count()];
    for (int c = 0; c < mesh.triangles().length; c++) {
      int v = mesh.triangles()[c];
      bare[v] |= !charged[c / 3];
      beside[v] = c / 3;
      int node = nodes.cornerNode()[c];
      if (!done[node]) {
        done[node] = true;
        for (int k = 0; k < 3; k++) {
          normal[3 * v + k] += nodes.normal()[3 * node + k];
        }
      }
    }
    List<Integer> found = new ArrayList<>();
    for (int v = 0; v < mesh.vertexCount(); v++) {
      if (mesh.vertexKind()[v] == SurfaceMesh.ON_VERTEX
          && features.isCorner(mesh.vertexEntity()[v])
          && !bare[v]
          && tangents.get(v) != null) {
        found.add(v);
      }
    }
    int n = found.size();
    CornerStations out =
        new CornerStations(
            found.stream().mapToInt(Integer::intValue).toArray(),
            new int[n],
            new boolean[n],
            new double[n],
            new double[n],
            new double[3 * n],
            new double[3 * n]);
    for (int i = 0; i < n; i++) {
      int v = out.vertex[i];
      out.triangle[i] = beside[v];
      out.rightAngled[i] = rightAngled(tangents.get(v));
      System.arraycopy(mesh.xyz(), 3 * v, out.position, 3 * i, 3);
      double length = Math.hypot(Math.hypot(normal[3 * v], normal[3 * v + 1]), normal[3 * v + 2]);
      for (int k = 0; k < 3; k++) {
        out.direction[3 * i + k] = normal[3 * v + k] / length;
      }
    }
    Arrays.fill(out.thickness_m, Double.POSITIVE_INFINITY);
    Arrays.fill(out.reach_m, Double.POSITIVE_INFINITY);
    out.measure(edges, mesh);
    return out;
  }

  /** Unit tangents of the sharp edges' first segments at each vertex that has some. */
  private static List<List<double[]>> tangents(SharpEdges edges, SurfaceMesh mesh) {
    List<List<double[]>> out = new ArrayList<>();
    for (int v = 0; v < mesh.vertexCount(); v++) {
      out.add(null);
    }
    double[] x = mesh.xyz();
    for (int g = 0; g < mesh.segmentCount(); g++) {
      for (int end = 0; edges.number(mesh.segmentEdge()[g]) >= 0 && end < 2; end++) {
        int v = mesh.segmentVertices()[2 * g + end];
        int w = mesh.segmentVertices()[2 * g + 1 - end];
        double[] d = {
          x[3 * w] - x[3 * v], x[3 * w + 1] - x[3 * v + 1], x[3 * w + 2] - x[3 * v + 2]
        };
        double length = Math.hypot(Math.hypot(d[0], d[1]), d[2]);
        for (int k = 0; k < 3; k++) {
          d[k] /= length;
        }
        if (out.get(v) == null) {
          out.set(v, new ArrayList<>());
        }
        out.get(v).add(d);
      }
    }
    return out;
  }

  private static boolean rightAngled(List<double[]> tangents) {
    if (tangents.size() != 3) {
      return false;
    }
    for (int i = 0; i < 3; i++) {
      double[] a = tangents.get(i);
      double[] b = tangents.get((i + 1) % 3);
      if (Math.abs(a[0] * b[0] + a[1] * b[1] + a[2] * b[2]) > RIGHT) {
        return false;
      }
    }
    return true;
  }

  private void measure(SharpEdges edges, SurfaceMesh mesh) {
    int[] number = new int[mesh.vertexCount()];
    Arrays.fill(number, -1);
    for (int i = 0; i < vertex.length; i++) {
      number[vertex[i]] = i;
    }
    for (int g = 0; g < mesh.segmentCount(); g++) {
      int e = edges.number(mesh.segmentEdge()[g]);
      for (int end = 0; e >= 0 && end < 2; end++) {
        int i = number[mesh.segmentVertices()[2 * g + end]];
        if (i >= 0) {
          thickness_m[i] = Math.min(thickness_m[i], edges.thickness_m(e));
          reach_m[i] = Math.min(reach_m[i], edges.reach_m(e));
        }
      }
    }
  }
}
