package org.edgefield.field.estimate;

import java.util.Arrays;
import java.util.stream.IntStream;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * What one electrode (or the earth plane) is to each site: how far along the field line, and where
 * it ends.
 *
 * <p>A field line leaves the conductor along the normal. To the nearest point, at the distance rho
 * and the angle phi off the normal, it is taken as the circular arc of length rho phi / sin phi; a
 * ray along the normal may find a shorter way. Distances to facets are corrected to the curved
 * surface by the corner normals, to third order in the facet's size.
 */
final class Opposing {
  /** Length of the field line per site, infinite where the electrode is out of sight. */
  final double[] gap;

  /** Site at the far end, -1 where none or on the earth plane. */
  final int[] site;

  private Opposing(int count) {
    gap = new double[count];
    site = new int[count];
    Arrays.fill(gap, Double.POSITIVE_INFINITY);
    Arrays.fill(site, -1);
  }

  /**
   * Finds the parts of one electrode from all sites of others.
   *
   * @param own whether a site needs no answer
   * @param partsOfElectrode mark per part
   */
  static Opposing electrode(
      Sites sites,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      TriangleTree tree,
      boolean[] own,
      boolean[] partsOfElectrode) {
    Opposing result = new Opposing(sites.count());
    int blocks = (sites.count() + SiteBuilder.BLOCK - 1) / SiteBuilder.BLOCK;
    IntStream.range(0, blocks)
        .parallel()
        .forEach(
            b -> {
              TriangleCursor cursor = tree.cursor();
              cursor.allow(partsOfElectrode);
              double[] q = new double[3];
              int to = Math.min(sites.count(), (b + 1) * SiteBuilder.BLOCK);
              for (int s = b * SiteBuilder.BLOCK; s < to; s++) {
                if (!own[s]) {
                  result.find(sites, s, mesh, nodes, cursor, q);
                }
              }
            });
    return result;
  }

  /** The earth plane seen from all sites. */
  static Opposing plane(Sites sites, int axis, double offset_m) {
    Opposing result = new Opposing(sites.count());
    for (int s = 0; s < sites.count(); s++) {
      double h = offset_m - sites.position[3 * s + axis];
      double distance = Math.max(Math.abs(h), LEAST_GAP);
      double cos = Math.signum(h) * sites.normal[3 * s + axis];
      double ray = cos > 0 ? distance / cos : Double.POSITIVE_INFINITY;
      result.gap[s] = Math.min(ray, arc(distance, cos));
    }
    return result;
  }

  /** Bodies closer than this touch; the field stays finite. */
  static final double LEAST_GAP = 1e-7;

  private void find(
      Sites sites, int s, SurfaceMesh mesh, SurfaceNodes nodes, TriangleCursor cursor, double[] q) {
    double x = sites.position[3 * s];
    double y = sites.position[3 * s + 1];
    double z = sites.position[3 * s + 2];
    double nx = sites.normal[3 * s];
    double ny = sites.normal[3 * s + 1];
    double nz = sites.normal[3 * s + 2];
    if (!cursor.nearest(x, y, z, Double.POSITIVE_INFINITY)) {
      return;
    }
    curved(mesh, nodes, cursor, q);
    double dx = q[0] - x;
    double dy = q[1] - y;
    double dz = q[2] - z;
    double rho = Math.max(Math.sqrt(dx * dx + dy * dy + dz * dz), LEAST_GAP);
    double cos = (dx * nx + dy * ny + dz * nz) / rho;
    gap[s] = arc(rho, cos);
    site[s] = farSite(sites, nodes, cursor);
    if (cos < NEARLY_STRAIGHT
        && cursor.ray(x, y, z, nx, ny, nz, 0, gap[s], TriangleCursor.Side.ENTERING)) {
      curved(mesh, nodes, cursor, q);
      double straight = Math.max((q[0] - x) * nx + (q[1] - y) * ny + (q[2] - z) * nz, LEAST_GAP);
      if (straight < gap[s]) {
        gap[s] = straight;
        site[s] = farSite(sites, nodes, cursor);
      }
    }
  }

  private static final double NEARLY_STRAIGHT = 0.9999;

  /** Site nearest to where a cursor last hit. */
  static int farSite(Sites sites, SurfaceNodes nodes, TriangleCursor cursor) {
    int corner =
        cursor.weight(0) >= cursor.weight(1)
            ? (cursor.weight(0) >= cursor.weight(2) ? 0 : 2)
            : (cursor.weight(1) >= cursor.weight(2) ? 1 : 2);
    return sites.siteOfNode[nodes.cornerNode()[3 * cursor.triangle() + corner]];
  }

  /** Length of a circular arc that starts along the normal and ends at the distance rho. */
  static double arc(double rho, double cos) {
    double c = Math.min(1, Math.max(-1, cos));
    double sin = Math.sqrt((1 - c) * (1 + c));
    double phi = Math.atan2(sin, c);
    if (phi < 1e-4) {
      return rho;
    }
    return sin < 1e-6 ? Double.POSITIVE_INFINITY : rho * phi / sin;
  }

  /** Point of the curved surface over the facet point last found. */
  private static void curved(
      SurfaceMesh mesh, SurfaceNodes nodes, TriangleCursor cursor, double[] q) {
    cursor.point(q, 0);
    double sx = 0;
    double sy = 0;
    double sz = 0;
    for (int c = 0; c < 3; c++) {
      int corner = 3 * cursor.triangle() + c;
      int v = 3 * mesh.triangles()[corner];
      int n = 3 * nodes.cornerNode()[corner];
      double[] xyz = mesh.xyz();
      double[] normal = nodes.normal();
      double lift =
          0.5
              * cursor.weight(c)
              * ((xyz[v] - q[0]) * normal[n]
                  + (xyz[v + 1] - q[1]) * normal[n + 1]
                  + (xyz[v + 2] - q[2]) * normal[n + 2]);
      sx += lift * normal[n];
      sy += lift * normal[n + 1];
      sz += lift * normal[n + 2];
    }
    q[0] += sx;
    q[1] += sy;
    q[2] += sz;
  }
}
