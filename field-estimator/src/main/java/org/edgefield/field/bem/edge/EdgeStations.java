package org.edgefield.field.bem.edge;

import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import org.edgefield.curvature.EdgeFeature;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Places on sharp convex edges where the field is looked at: the middles of the mesh's segments
 * that carry charge on both sides.
 *
 * @param segment mesh segment per station
 * @param triangle a mesh triangle beside each
 * @param number which of the sharp edges
 * @param interiorAngle_rad angle of the solid
 * @param plain whether both faces are plane
 * @param reach_m how far the wedge's field holds
 * @param frame position, unit direction into face 1 across the edge, outward normal of face 1: 9
 *     each
 */
record EdgeStations(
    int[] segment,
    int[] triangle,
    int[] number,
    double[] interiorAngle_rad,
    boolean[] plain,
    double[] reach_m,
    double[] frame) {

  int count() {
    return segment.length;
  }

  static EdgeStations of(
      ExactGeometry geometry, SharpEdges edges, SurfaceMesh mesh, boolean[] charged) {
    int segments = mesh.segmentCount();
    int[] beside = new int[segments];
    int[] chargedSides = chargedSides(edges, mesh, charged, beside);
    int[] segment = new int[segments];
    int n = 0;
    for (int g = 0; g < segments; g++) {
      if (chargedSides[g] == 2) {
        EdgeFeature feature = edges.feature(edges.number(mesh.segmentEdge()[g]));
        double t = middle(mesh, g);
        if (feature.interiorAngle_rad(t) < Math.PI && !feature.smoothAt(t)) {
          segment[n++] = g;
        }
      }
    }
    EdgeStations out =
        new EdgeStations(
            Arrays.copyOf(segment, n),
            new int[n],
            new int[n],
            new double[n],
            new boolean[n],
            new double[n],
            new double[9 * n]);
    for (int i = 0; i < n; i++) {
      out.triangle[i] = beside[out.segment[i]];
    }
    out.place(geometry, edges, mesh);
    return out;
  }

  private static double middle(SurfaceMesh mesh, int g) {
    return 0.5 * (mesh.segmentT()[2 * g] + mesh.segmentT()[2 * g + 1]);
  }

  private static int[] chargedSides(
      SharpEdges edges, SurfaceMesh mesh, boolean[] charged, int[] beside) {
    Map<Long, Integer> segmentOf = new HashMap<>();
    for (int g = 0; g < beside.length; g++) {
      if (edges.number(mesh.segmentEdge()[g]) >= 0) {
        segmentOf.put(key(mesh.segmentVertices()[2 * g], mesh.segmentVertices()[2 * g + 1]), g);
      }
    }
    int[] sides = new int[beside.length];
    for (int c = 0; c < mesh.triangles().length; c++) {
      int a = mesh.triangles()[c];
      int b = mesh.triangles()[c % 3 == 2 ? c - 2 : c + 1];
      Integer g = charged[c / 3] ? segmentOf.get(key(a, b)) : null;
      if (g != null) {
        sides[g]++;
        beside[g] = c / 3;
      }
    }
    return sides;
  }

  private static long key(int a, int b) {
    return (long) Math.min(a, b) << 32 | Math.max(a, b);
  }

  private void place(ExactGeometry geometry, SharpEdges edges, SurfaceMesh mesh) {
    int n = count();
    double[] curve = new double[6];
    double[] uv = new double[2];
    double[] first = new double[ExactGeometry.CURVATURE_STRIDE];
    double[] second = new double[ExactGeometry.CURVATURE_STRIDE];
    for (int i = 0; i < n; i++) {
      int edge = mesh.segmentEdge()[segment[i]];
      double[] t = {middle(mesh, segment[i])};
      int[] faces = geometry.edgeFaces(edge);
      geometry.curve(1, new int[] {edge}, t, curve);
      geometry.edgeUv(edge, 0, 1, t, uv);
      geometry.curvature(1, new int[] {faces[0]}, uv, first);
      geometry.edgeUv(edge, 1, 1, t, uv);
      geometry.curvature(1, new int[] {faces[1]}, uv, second);
      number[i] = edges.number(edge);
      plain[i] = edges.plain(number[i]);
      interiorAngle_rad[i] = edges.feature(number[i]).interiorAngle_rad(t[0]);
      reach_m[i] = edges.reach_m(number[i], curve[0], curve[1], curve[2]);
      // Across the edge within face 1; at a convex edge it leads behind face 2.
      double mx = first[1] * curve[5] - first[2] * curve[4];
      double my = first[2] * curve[3] - first[0] * curve[5];
      double mz = first[0] * curve[4] - first[1] * curve[3];
      double length = Math.sqrt(mx * mx + my * my + mz * mz);
      double sign = mx * second[0] + my * second[1] + mz * second[2] > 0 ? -1 : 1;
      System.arraycopy(curve, 0, frame, 9 * i, 3);
      frame[9 * i + 3] = sign * mx / length;
      frame[9 * i + 4] = sign * my / length;
      frame[9 * i + 5] = sign * mz / length;
      System.arraycopy(first, 0, frame, 9 * i + 6, 3);
    }
  }
}
