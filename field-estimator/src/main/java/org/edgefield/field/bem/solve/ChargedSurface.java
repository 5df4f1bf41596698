package org.edgefield.field.bem.solve;

import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.field.bem.surface.CurvedTriangles;
import org.edgefield.field.bem.surface.SideMidPoints;
import org.edgefield.field.contact.HiddenTriangles;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Surroundings.EarthPlane;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * The part of a mesh that carries charge, with its unknowns: triangles of electrodes that are not
 * hidden and do not lie in the earth plane.
 *
 * @param triangles six-node geometry
 * @param meshTriangle mesh triangle per triangle
 * @param cornerUnknown unknown per corner, 3 per triangle
 * @param unknownNode node per unknown
 * @param nodeUnknown unknown per node, -1 where it carries no charge
 * @param position position per unknown, 3 each
 * @param seam whether an unknown lies on the border of its patch
 * @param border sides that belong to one triangle alone, 2 unknowns each: a sharp edge, an open
 *     edge or a crack
 * @param electrode electrode per unknown
 */
record ChargedSurface(
    CurvedTriangles triangles,
    int[] meshTriangle,
    int[] cornerUnknown,
    int[] unknownNode,
    int[] nodeUnknown,
    double[] position,
    boolean[] seam,
    int[] border,
    int[] electrode) {

  static ChargedSurface of(
      Assembly assembly, SurfaceMesh mesh, SurfaceNodes nodes, FieldCase fieldCase) {
    int[] electrodeOfPart = fieldCase.electrodeOfPart(assembly.parts().size());
    boolean[] hidden = HiddenTriangles.of(assembly, mesh, electrodeOfPart);
    EarthPlane plane = fieldCase.surroundings().earthPlane();
    int[] chosen = new int[mesh.triangleCount()];
    int n = 0;
    for (int t = 0; t < chosen.length; t++) {
      int part = assembly.geometry().facePart(mesh.triangleFace()[t]);
      boolean inPlane =
          plane != null && inPlane(mesh, t, plane, 1e-7 * assembly.parts().get(part).size_m());
      if (electrodeOfPart[part] >= 0 && !hidden[t] && !inPlane) {
        chosen[n++] = t;
      }
    }
    chosen = Arrays.copyOf(chosen, n);
    int[] nodeUnknown = new int[nodes.count()];
    Arrays.fill(nodeUnknown, -1);
    int[] unknownNode = new int[nodes.count()];
    int[] electrode = new int[nodes.count()];
    int[] corner = new int[3 * n];
    int unknowns = 0;
    for (int i = 0; i < n; i++) {
      int part = assembly.geometry().facePart(mesh.triangleFace()[chosen[i]]);
      for (int c = 0; c < 3; c++) {
        int node = nodes.cornerNode()[3 * chosen[i] + c];
        if (nodeUnknown[node] < 0) {
          electrode[unknowns] = electrodeOfPart[part];
          unknownNode[unknowns] = node;
          nodeUnknown[node] = unknowns++;
        }
        corner[3 * i + c] = nodeUnknown[node];
      }
    }
    double[] position = new double[3 * unknowns];
    for (int u = 0; u < unknowns; u++) {
      System.arraycopy(mesh.xyz(), 3 * nodes.nodeVertex()[unknownNode[u]], position, 3 * u, 3);
    }
    int[] border = borders(corner);
    boolean[] seam = new boolean[unknowns];
    for (int u : border) {
      seam[u] = true;
    }
    return new ChargedSurface(
        new CurvedTriangles(SideMidPoints.geometry(assembly.geometry(), mesh, chosen)),
        chosen,
        corner,
        Arrays.copyOf(unknownNode, unknowns),
        nodeUnknown,
        position,
        seam,
        border,
        Arrays.copyOf(electrode, unknowns));
  }

  private static boolean inPlane(SurfaceMesh mesh, int t, EarthPlane plane, double tolerance) {
    for (int c = 0; c < 3; c++) {
      double x = mesh.xyz()[3 * mesh.triangles()[3 * t + c] + plane.axis()];
      if (Math.abs(x - plane.offset_m()) > tolerance) {
        return false;
      }
    }
    return true;
  }

  private static int[] borders(int[] corner) {
    Map<Long, Integer> count = new HashMap<>(corner.length);
    for (int c = 0; c < corner.length; c++) {
      count.merge(key(corner, c), 1, Integer::sum);
    }
    int[] border = new int[2 * corner.length];
    int n = 0;
    for (int c = 0; c < corner.length; c++) {
      if (count.get(key(corner, c)) == 1) {
        border[n++] = corner[c];
        border[n++] = corner[3 * (c / 3) + (c + 1) % 3];
      }
    }
    return Arrays.copyOf(border, n);
  }

  private static long key(int[] corner, int c) {
    int a = corner[c];
    int b = corner[3 * (c / 3) + (c + 1) % 3];
    return (long) Math.min(a, b) << 32 | Math.max(a, b);
  }

  int unknowns() {
    return unknownNode.length;
  }
}
