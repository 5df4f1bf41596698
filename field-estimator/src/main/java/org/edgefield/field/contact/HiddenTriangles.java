package org.edgefield.field.contact;

import java.util.List;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * Surface of one electrode inside or pressed against another of its parts: it carries no charge and
 * sees no field.
 */
public final class HiddenTriangles {
  /** How far above a triangle its test point lies, in diameters. */
  private static final double LIFT = 1e-3;

  private HiddenTriangles() {}

  /**
   * Finds hidden triangles.
   *
   * @param electrodeOfPart electrode per part, -1 where ignored
   * @return mark per triangle: it lies inside or against another part of its own electrode
   */
  public static boolean[] of(Assembly assembly, SurfaceMesh mesh, int[] electrodeOfPart) {
    int[] part = parts(assembly, mesh);
    boolean[] hidden = new boolean[part.length];
    TriangleTree tree = TriangleTree.build(mesh.xyz(), mesh.triangles(), part);
    InsideTest test = new InsideTest(tree);
    List<Part> parts = assembly.parts();
    double[] g = new double[7];
    for (int t = 0; t < part.length; t++) {
      int e = electrodeOfPart[part[t]];
      if (e < 0) {
        continue;
      }
      boolean ready = false;
      for (Part other : parts) {
        if (other.index() == part[t] || electrodeOfPart[other.index()] != e) {
          continue;
        }
        if (!ready) {
          lifted(mesh, t, g);
          ready = true;
        }
        if (within(other, g) && test.inside(other.index(), g[0], g[1], g[2])) {
          hidden[t] = true;
          break;
        }
      }
    }
    return hidden;
  }

  /** Whether a point lies in the bounds of a part. */
  public static boolean within(Part part, double[] p) {
    double[] b = part.bounds_m();
    for (int k = 0; k < 3; k++) {
      if (p[k] < b[k] || p[k] > b[3 + k]) {
        return false;
      }
    }
    return true;
  }

  // Centroid lifted a little along the normal.
  private static void lifted(SurfaceMesh mesh, int t, double[] out) {
    double[] x = mesh.xyz();
    int a = 3 * mesh.triangles()[3 * t];
    int b = 3 * mesh.triangles()[3 * t + 1];
    int c = 3 * mesh.triangles()[3 * t + 2];
    double ux = x[b] - x[a];
    double uy = x[b + 1] - x[a + 1];
    double uz = x[b + 2] - x[a + 2];
    double vx = x[c] - x[a];
    double vy = x[c + 1] - x[a + 1];
    double vz = x[c + 2] - x[a + 2];
    double nx = uy * vz - uz * vy;
    double ny = uz * vx - ux * vz;
    double nz = ux * vy - uy * vx;
    double n = Math.sqrt(nx * nx + ny * ny + nz * nz);
    double lift =
        n > 0
            ? LIFT
                * Math.sqrt(Math.max(ux * ux + uy * uy + uz * uz, vx * vx + vy * vy + vz * vz))
                / n
            : 0;
    out[0] = (x[a] + x[b] + x[c]) / 3 + lift * nx;
    out[1] = (x[a + 1] + x[b + 1] + x[c + 1]) / 3 + lift * ny;
    out[2] = (x[a + 2] + x[b + 2] + x[c + 2]) / 3 + lift * nz;
  }

  /** Part per triangle. */
  public static int[] parts(Assembly assembly, SurfaceMesh mesh) {
    int[] part = new int[mesh.triangleCount()];
    for (int t = 0; t < part.length; t++) {
      part[t] = assembly.geometry().facePart(mesh.triangleFace()[t]);
    }
    return part;
  }
}
