package org.edgefield.field.bem.surface;

import java.util.HashMap;
import java.util.Map;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Mid-points of the sides of a mesh on the exact surface: on CAD edges at the middle parameter,
 * inside faces at the foot of the chord's middle. Both triangles of a side get the same point.
 */
public final class SideMidPoints {
  private SideMidPoints() {}

  /**
   * Six-node geometry of some triangles of a mesh.
   *
   * @param geometry exact geometry
   * @param mesh the mesh
   * @param chosen triangles to take, in this order
   * @return {@link CurvedTriangles#STRIDE} doubles per chosen triangle
   */
  public static double[] geometry(ExactGeometry geometry, SurfaceMesh mesh, int[] chosen) {
    Map<Long, Integer> sideOf = new HashMap<>(4 * chosen.length);
    int[] side = new int[3 * chosen.length];
    int[] first = new int[3 * chosen.length];
    int sides = 0;
    for (int i = 0; i < chosen.length; i++) {
      for (int c = 0; c < 3; c++) {
        int a = mesh.triangles()[3 * chosen[i] + c];
        int b = mesh.triangles()[3 * chosen[i] + (c + 1) % 3];
        Integer known = sideOf.putIfAbsent(key(a, b), sides);
        if (known == null) {
          first[sides] = 3 * i + c;
          side[3 * i + c] = sides++;
        } else {
          side[3 * i + c] = known;
        }
      }
    }
    double[] middle = inFaces(geometry, mesh, chosen, first, sides);
    onEdges(geometry, mesh, sideOf, middle);
    double[] out = new double[CurvedTriangles.STRIDE * chosen.length];
    for (int i = 0; i < chosen.length; i++) {
      for (int c = 0; c < 3; c++) {
        int v = mesh.triangles()[3 * chosen[i] + c];
        System.arraycopy(mesh.xyz(), 3 * v, out, CurvedTriangles.STRIDE * i + 3 * c, 3);
        System.arraycopy(
            middle, 3 * side[3 * i + c], out, CurvedTriangles.STRIDE * i + 9 + 3 * c, 3);
      }
    }
    return out;
  }

  private static long key(int a, int b) {
    return (long) Math.min(a, b) << 32 | Math.max(a, b);
  }

  private static double[] inFaces(
      ExactGeometry geometry, SurfaceMesh mesh, int[] chosen, int[] first, int sides) {
    int[] face = new int[sides];
    double[] uv = new double[2 * sides];
    double[] chord = new double[3 * sides];
    for (int s = 0; s < sides; s++) {
      int t = chosen[first[s] / 3];
      int c = first[s] % 3;
      int d = (c + 1) % 3;
      face[s] = mesh.triangleFace()[t];
      uv[2 * s] = 0.5 * (mesh.cornerUv()[6 * t + 2 * c] + mesh.cornerUv()[6 * t + 2 * d]);
      uv[2 * s + 1] =
          0.5 * (mesh.cornerUv()[6 * t + 2 * c + 1] + mesh.cornerUv()[6 * t + 2 * d + 1]);
      int a = mesh.triangles()[3 * t + c];
      int b = mesh.triangles()[3 * t + d];
      for (int k = 0; k < 3; k++) {
        chord[3 * s + k] = 0.5 * (mesh.xyz()[3 * a + k] + mesh.xyz()[3 * b + k]);
      }
    }
    geometry.project(sides, face, chord, uv);
    double[] at = new double[9 * sides];
    geometry.surface(sides, face, uv, at);
    double[] middle = new double[3 * sides];
    for (int s = 0; s < sides; s++) {
      System.arraycopy(at, 9 * s, middle, 3 * s, 3);
    }
    return middle;
  }

  private static void onEdges(
      ExactGeometry geometry, SurfaceMesh mesh, Map<Long, Integer> sideOf, double[] middle) {
    int n = mesh.segmentCount();
    double[] t = new double[n];
    for (int g = 0; g < n; g++) {
      t[g] = 0.5 * (mesh.segmentT()[2 * g] + mesh.segmentT()[2 * g + 1]);
    }
    double[] at = new double[6 * n];
    geometry.curve(n, mesh.segmentEdge(), t, at);
    for (int g = 0; g < n; g++) {
      Integer s = sideOf.get(key(mesh.segmentVertices()[2 * g], mesh.segmentVertices()[2 * g + 1]));
      if (s != null) {
        System.arraycopy(at, 6 * g, middle, 3 * s, 3);
      }
    }
  }
}
