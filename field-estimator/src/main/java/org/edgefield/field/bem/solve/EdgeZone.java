package org.edgefield.field.bem.solve;

import org.edgefield.field.job.EdgesAsMade;
import org.edgefield.field.job.Surroundings.EarthPlane;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * Surface so close to a border of its patch that the field follows the singularity of an edge drawn
 * sharp: it grows without limit as elements shrink, and no mesh gives it a peak. The zone has a
 * width that does not depend on the mesh: five times the edge radius as made, at least a tenth of
 * the part's least dimension.
 */
final class EdgeZone {
  private static final double RADII = 5;
  private static final double SHARE = 0.1;

  private EdgeZone() {}

  /**
   * Nearest border unknown per unknown of the zone (itself where it lies on a border), -1 outside
   * it.
   */
  static int[] of(
      Assembly assembly,
      ChargedSurface surface,
      int[] partOfUnknown,
      EdgesAsMade edges,
      EarthPlane plane) {
    int n = surface.unknowns();
    int[] zone = new int[n];
    double[] x = surface.position();
    int[] border = surface.border();
    // Sides are kept as triangles without width.
    int[] corners = new int[3 * border.length / 2];
    int[] group = new int[border.length / 2];
    for (int g = 0; g < group.length; g++) {
      int a = border[2 * g];
      int b = border[2 * g + 1];
      corners[3 * g] = a;
      corners[3 * g + 1] = b;
      corners[3 * g + 2] = b;
      group[g] = inPlane(x, a, plane) && inPlane(x, b, plane) ? -1 : partOfUnknown[a];
    }
    for (int i = 0; i < n; i++) {
      zone[i] = surface.seam()[i] ? i : -1;
    }
    TriangleTree tree = TriangleTree.build(x, corners, group);
    TriangleCursor cursor = tree.cursor();
    int allowed = -1;
    for (int i = 0; i < n; i++) {
      int part = partOfUnknown[i];
      if (zone[i] >= 0 || part >= tree.groupCount()) {
        continue;
      }
      if (allowed != part) {
        cursor.allowOnly(part);
        allowed = part;
      }
      double width =
          Math.max(RADII * edges.radius_m(part), SHARE * least(assembly.parts().get(part)));
      if (cursor.nearest(x[3 * i], x[3 * i + 1], x[3 * i + 2], width)) {
        int g = cursor.triangle();
        zone[i] = border[2 * g + (cursor.weight(0) > 0.5 ? 0 : 1)];
      }
    }
    return zone;
  }

  /** A body that stands on the earth plane has no sharp edge there. */
  private static boolean inPlane(double[] x, int i, EarthPlane plane) {
    return plane != null && Math.abs(x[3 * i + plane.axis()] - plane.offset_m()) < 1e-9;
  }

  private static double least(Part part) {
    double[] b = part.bounds_m();
    return Math.min(b[3] - b[0], Math.min(b[4] - b[1], b[5] - b[2]));
  }
}
