package org.edgefield.field.bem;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.edgefield.field.bem.surface.CurvedTriangles;

/** Six-node meshes of bodies with a closed form, all nodes on the exact surface. */
final class AnalyticMesh {
  /** Maps a point near the surface onto it. */
  interface Onto {
    double[] at(double[] point);
  }

  final List<double[]> vertices = new ArrayList<>();
  final List<int[]> triangles = new ArrayList<>();
  final List<Onto> shape = new ArrayList<>();

  /**
   * Sphere-like body: a subdivided icosahedron with n segments per side, mapped from the unit
   * sphere.
   */
  void ball(int n, Onto fromUnitSphere) {
    double g = (1 + Math.sqrt(5)) / 2;
    double[][] v = {
      {-1, g, 0},
      {1, g, 0},
      {-1, -g, 0},
      {1, -g, 0},
      {0, -1, g},
      {0, 1, g},
      {0, -1, -g},
      {0, 1, -g},
      {g, 0, -1},
      {g, 0, 1},
      {-g, 0, -1},
      {-g, 0, 1}
    };
    int[][] f = {
      {0, 11, 5},
      {0, 5, 1},
      {0, 1, 7},
      {0, 7, 10},
      {0, 10, 11},
      {1, 5, 9},
      {5, 11, 4},
      {11, 10, 2},
      {10, 7, 6},
      {7, 1, 8},
      {3, 9, 4},
      {3, 4, 2},
      {3, 2, 6},
      {3, 6, 8},
      {3, 8, 9},
      {4, 9, 5},
      {2, 4, 11},
      {6, 2, 10},
      {8, 6, 7},
      {9, 8, 1}
    };
    Map<String, Integer> known = new HashMap<>();
    for (int[] t : f) {
      int[][] id = new int[n + 1][n + 1];
      for (int i = 0; i <= n; i++) {
        for (int j = 0; i + j <= n; j++) {
          double[] p = new double[3];
          for (int d = 0; d < 3; d++) {
            p[d] = (v[t[0]][d] * (n - i - j) + v[t[1]][d] * i + v[t[2]][d] * j) / n;
          }
          id[i][j] = vertex(known, unit(p));
        }
      }
      for (int i = 0; i < n; i++) {
        for (int j = 0; i + j < n; j++) {
          add(id[i][j], id[i + 1][j], id[i][j + 1], fromUnitSphere);
          if (i + j < n - 1) {
            add(id[i + 1][j], id[i + 1][j + 1], id[i][j + 1], fromUnitSphere);
          }
        }
      }
    }
  }

  private void add(int a, int b, int c, Onto onto) {
    triangles.add(new int[] {a, b, c});
    shape.add(onto);
  }

  private int vertex(Map<String, Integer> known, double[] p) {
    String key =
        Math.round(p[0] * 1e9) + "," + Math.round(p[1] * 1e9) + "," + Math.round(p[2] * 1e9);
    return known.computeIfAbsent(
        key,
        k -> {
          vertices.add(p);
          return vertices.size() - 1;
        });
  }

  static double[] unit(double[] p) {
    double r = Math.sqrt(p[0] * p[0] + p[1] * p[1] + p[2] * p[2]);
    return new double[] {p[0] / r, p[1] / r, p[2] / r};
  }

  double[] geometry() {
    double[] g = new double[CurvedTriangles.STRIDE * triangles.size()];
    for (int t = 0; t < triangles.size(); t++) {
      for (int i = 0; i < 3; i++) {
        double[] a = vertices.get(triangles.get(t)[i]);
        double[] b = vertices.get(triangles.get(t)[(i + 1) % 3]);
        System.arraycopy(shape.get(t).at(a), 0, g, 18 * t + 3 * i, 3);
        double[] m = unit(new double[] {a[0] + b[0], a[1] + b[1], a[2] + b[2]});
        System.arraycopy(shape.get(t).at(m), 0, g, 18 * t + 9 + 3 * i, 3);
      }
    }
    return g;
  }

  int[] corners() {
    int[] c = new int[3 * triangles.size()];
    for (int t = 0; t < triangles.size(); t++) {
      System.arraycopy(triangles.get(t), 0, c, 3 * t, 3);
    }
    return c;
  }

  double[] positions(double[] geometry, int[] corners) {
    double[] p = new double[3 * vertices.size()];
    for (int c = 0; c < corners.length; c++) {
      System.arraycopy(geometry, 18 * (c / 3) + 3 * (c % 3), p, 3 * corners[c], 3);
    }
    return p;
  }
}
