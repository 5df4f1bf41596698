package org.edgefield.importer.mesh;

import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.remesh.FacePoints;

/**
 * Mid-nodes of the sides of all triangles, for curved triangles with six nodes. Each lies on the
 * exact surface near the middle of the side's chord; on CAD edges on the exact curve.
 *
 * @param sideOfTriangle side ids, 3 per triangle: side k runs from corner k to corner k + 1; the
 *     two triangles at a side share its id
 * @param midXyz mid-node positions, 3 per side, metres
 * @param sideVertices the two vertex ids of each side, the smaller first
 */
public record MidNodes(int[] sideOfTriangle, double[] midXyz, int[] sideVertices) {
  private static final int STEPS = 4;

  /** Number of sides. */
  public int count() {
    return midXyz.length / 3;
  }

  /**
   * Computes the mid-nodes; the same mesh gives the same bits.
   *
   * @param geometry exact geometry of the mesh's assembly
   * @param mesh the mesh
   */
  public static MidNodes of(ExactGeometry geometry, SurfaceMesh mesh) {
    int[] tri = mesh.triangles();
    int[] firstOf = buckets(mesh.vertexCount(), tri);
    int[] fill = firstOf.clone();
    int[] slotSide = new int[tri.length];
    int[] slotFar = new int[tri.length];
    int[] sideOf = new int[tri.length];
    int[] half = new int[tri.length];
    int sides = 0;
    for (int h = 0; h < tri.length; h++) {
      int a = tri[h];
      int b = tri[next(h)];
      int low = Math.min(a, b);
      int high = Math.max(a, b);
      int side = find(firstOf[low], fill[low], slotFar, slotSide, high);
      if (side < 0) {
        side = sides++;
        half[side] = h;
        slotFar[fill[low]] = high;
        slotSide[fill[low]++] = side;
      }
      sideOf[h] = side;
    }
    double[] mid = new double[3 * sides];
    int[] ends = new int[2 * sides];
    double[] chord = new double[3 * sides];
    for (int s = 0; s < sides; s++) {
      int a = tri[half[s]];
      int b = tri[next(half[s])];
      ends[2 * s] = Math.min(a, b);
      ends[2 * s + 1] = Math.max(a, b);
      for (int i = 0; i < 3; i++) {
        chord[3 * s + i] = 0.5 * (mesh.xyz()[3 * a + i] + mesh.xyz()[3 * b + i]);
      }
    }
    onFaces(geometry, mesh, half, chord, mid);
    for (int g = 0; g < mesh.segmentCount(); g++) {
      int a = mesh.segmentVertices()[2 * g];
      int b = mesh.segmentVertices()[2 * g + 1];
      int low = Math.min(a, b);
      int side = find(firstOf[low], fill[low], slotFar, slotSide, Math.max(a, b));
      onCurve(geometry, mesh, g, chord, mid, side);
    }
    return new MidNodes(sideOf, mid, ends);
  }

  private static int next(int h) {
    return h % 3 == 2 ? h - 2 : h + 1;
  }

  /** First slot per vertex for the sides whose smaller vertex it is. */
  private static int[] buckets(int vertices, int[] tri) {
    int[] first = new int[vertices + 1];
    for (int h = 0; h < tri.length; h++) {
      first[Math.min(tri[h], tri[next(h)]) + 1]++;
    }
    for (int v = 0; v < vertices; v++) {
      first[v + 1] += first[v];
    }
    return first;
  }

  private static int find(int from, int to, int[] far, int[] side, int high) {
    for (int i = from; i < to; i++) {
      if (far[i] == high) {
        return side[i];
      }
    }
    return -1;
  }

  private static void onFaces(
      ExactGeometry geometry, SurfaceMesh mesh, int[] half, double[] chord, double[] mid) {
    int n = mid.length / 3;
    FacePoints points = new FacePoints(geometry);
    points.ensure(n);
    for (int s = 0; s < n; s++) {
      int h = half[s];
      int g = next(h);
      points.face[s] = mesh.triangleFace()[h / 3];
      for (int k = 0; k < 2; k++) {
        points.uv[2 * s + k] = 0.5 * (mesh.cornerUv()[2 * h + k] + mesh.cornerUv()[2 * g + k]);
      }
    }
    System.arraycopy(chord, 0, points.target, 0, 3 * n);
    points.settle(n, STEPS);
    for (int s = 0; s < n; s++) {
      System.arraycopy(points.surface, 9 * s, mid, 3 * s, 3);
    }
  }

  /** The point of a segment's curve nearest to the middle of its chord, by Newton steps. */
  private static void onCurve(
      ExactGeometry geometry, SurfaceMesh mesh, int g, double[] chord, double[] mid, int side) {
    int[] edge = {mesh.segmentEdge()[g]};
    double t0 = mesh.segmentT()[2 * g];
    double t1 = mesh.segmentT()[2 * g + 1];
    double[] t = {0.5 * (t0 + t1)};
    double[] c = new double[6];
    for (int step = 0; step <= STEPS; step++) {
      geometry.curve(1, edge, t, c);
      double dot = 0;
      double speed2 = 0;
      for (int i = 0; i < 3; i++) {
        dot += (chord[3 * side + i] - c[i]) * c[3 + i];
        speed2 += c[3 + i] * c[3 + i];
      }
      System.arraycopy(c, 0, mid, 3 * side, 3);
      if (!(speed2 > 0)) {
        return;
      }
      double quarter = 0.25 * (t1 - t0);
      t[0] = Math.max(t0 + quarter, Math.min(t1 - quarter, t[0] + dot / speed2));
    }
  }
}
