package org.edgefield.importer.mesh.size;

import java.util.List;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * Distances between parts, measured on a first triangulation. Parts that touch or overlap are
 * bolted or pressed together and one conductor: the gap between them, which falls to nothing along
 * the rim of the contact, does not count.
 */
public final class Gaps {
  /** Parts nearer than this share of the smaller one's size touch. */
  private static final double CONTACT = 1e-3;

  private final TriangleTree tree;
  private final boolean[][] counts;

  /**
   * Finds which parts touch.
   *
   * @param parts the parts
   * @param geometry tells the part of a face
   * @param mesh first triangulation of all parts
   * @param partGroup group per part as in {@link org.edgefield.importer.mesh.MeshRequest}, or null
   */
  public Gaps(List<Part> parts, ExactGeometry geometry, SurfaceMesh mesh, int[] partGroup) {
    int n = parts.size();
    int[] owner = new int[mesh.triangleCount()];
    for (int t = 0; t < owner.length; t++) {
      owner[t] = geometry.facePart(mesh.triangleFace()[t]);
    }
    tree = TriangleTree.build(mesh.xyz(), mesh.triangles(), owner);
    counts = new boolean[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        boolean apart =
            partGroup == null
                || (partGroup[i] >= 0 && partGroup[j] >= 0 && partGroup[i] != partGroup[j]);
        counts[i][j] = i != j && apart;
      }
    }
    dropTouching(parts, mesh, owner);
  }

  private void dropTouching(List<Part> parts, SurfaceMesh mesh, int[] owner) {
    TriangleCursor cursor = tree.cursor();
    double[] p = mesh.xyz();
    for (int t = 0; t < owner.length; t++) {
      int i = owner[t];
      int[] v = {mesh.triangles()[3 * t], mesh.triangles()[3 * t + 1], mesh.triangles()[3 * t + 2]};
      // Corners, mid-sides and the centroid are looked at.
      for (int k = 0; k < 7; k++) {
        double a = k < 3 ? (k == 0 ? 1 : 0) : k < 6 ? (k == 3 ? 0 : 0.5) : 1.0 / 3;
        double b = k < 3 ? (k == 1 ? 1 : 0) : k < 6 ? (k == 4 ? 0 : 0.5) : 1.0 / 3;
        double c = 1 - a - b;
        double x = a * p[3 * v[0]] + b * p[3 * v[1]] + c * p[3 * v[2]];
        double y = a * p[3 * v[0] + 1] + b * p[3 * v[1] + 1] + c * p[3 * v[2] + 1];
        double z = a * p[3 * v[0] + 2] + b * p[3 * v[1] + 2] + c * p[3 * v[2] + 2];
        double size = parts.get(i).size_m();
        cursor.allow(counts[i]);
        while (cursor.nearest(x, y, z, CONTACT * size)) {
          int j = cursor.group();
          if (cursor.distance() > CONTACT * Math.min(size, parts.get(j).size_m())) {
            break;
          }
          counts[i][j] = false;
          counts[j][i] = false;
          cursor.allow(counts[i]);
        }
      }
      for (int k = 0; k < 3; k++) {
        dropCrossed(cursor, p, v[k], v[(k + 1) % 3], i);
      }
    }
  }

  /** Parts that a triangle side of part i runs through overlap it. */
  private void dropCrossed(TriangleCursor cursor, double[] p, int a, int b, int i) {
    double dx = p[3 * b] - p[3 * a];
    double dy = p[3 * b + 1] - p[3 * a + 1];
    double dz = p[3 * b + 2] - p[3 * a + 2];
    double length = Math.sqrt(dx * dx + dy * dy + dz * dz);
    cursor.allow(counts[i]);
    while (length > 0
        && cursor.ray(
            p[3 * a], p[3 * a + 1], p[3 * a + 2], dx, dy, dz, 0, length, TriangleCursor.Side.ANY)) {
      int j = cursor.group();
      counts[i][j] = false;
      counts[j][i] = false;
      cursor.allow(counts[i]);
    }
  }

  /** Asks for the distances of one part's points; for one thread. */
  TriangleCursor cursor(int part) {
    TriangleCursor c = tree.cursor();
    c.allow(counts[part]);
    return c;
  }

  /** Whether any other part counts for this one. */
  boolean any(int part) {
    for (boolean b : counts[part]) {
      if (b) {
        return true;
      }
    }
    return false;
  }
}
