package org.edgefield.field.bem.solve;

import java.util.Arrays;
import java.util.Locale;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Surroundings.EarthPlane;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * Finds gaps between electrodes, or to the earth plane, that the elements are too large for. A
 * linear density cannot follow the field of a gap much smaller than an element, and raw and
 * recovered values may still agree: such a gap must be refined or owned up to.
 *
 * @param target_m wanted element width per mesh vertex, infinite where nothing is asked
 * @param worst smallest gap over element width
 * @param vertex where that is, -1 where no gap is near
 * @param against part across that gap, -1 for the earth plane
 */
record GapCheck(double[] target_m, double worst, int vertex, int against) {
  /** Gap over element width from which the field in the gap is resolved. */
  private static final double RESOLVED = 0.7;

  /**
   * Looks at every charged vertex.
   *
   * @param level a solved mesh
   * @param width_m element width per mesh vertex
   */
  static GapCheck of(Assembly assembly, Level level, FieldCase fieldCase, double[] width_m) {
    SurfaceMesh mesh = level.mesh();
    ChargedSurface surface = level.surface();
    int[] electrodeOfPart = fieldCase.electrodeOfPart(assembly.parts().size());
    int[] group = new int[mesh.triangleCount()];
    for (int t = 0; t < group.length; t++) {
      int part = assembly.geometry().facePart(mesh.triangleFace()[t]);
      group[t] = electrodeOfPart[part] < 0 ? -1 : part;
    }
    TriangleTree tree = TriangleTree.build(mesh.xyz(), mesh.triangles(), group);
    TriangleCursor cursor = tree.cursor();
    EarthPlane plane = fieldCase.surroundings().earthPlane();
    double[] target = new double[mesh.vertexCount()];
    Arrays.fill(target, Double.POSITIVE_INFINITY);
    double worst = Double.POSITIVE_INFINITY;
    int vertex = -1;
    int against = -1;
    int allowed = -1;
    double[] x = surface.position();
    for (int i = 0; i < surface.unknowns(); i++) {
      if (allowed != surface.electrode()[i]) {
        allowed = surface.electrode()[i];
        cursor.allow(others(electrodeOfPart, tree.groupCount(), allowed));
      }
      int v = level.nodes().nodeVertex()[surface.unknownNode()[i]];
      double reach = width_m[v] / RESOLVED;
      double gap = Double.POSITIVE_INFINITY;
      int other = -1;
      if (cursor.nearest(x[3 * i], x[3 * i + 1], x[3 * i + 2], reach)) {
        gap = cursor.distance();
        other = cursor.group();
      }
      // A body that stands on the plane meets it at its border; that is no gap.
      if (plane != null && !surface.seam()[i]) {
        double height = Math.abs(x[3 * i + plane.axis()] - plane.offset_m());
        if (height < gap && facesPlane(level, i, plane.axis())) {
          gap = height;
          other = -1;
        }
      }
      if (gap < reach) {
        target[v] = Math.min(target[v], gap / RESOLVED);
        if (gap / width_m[v] < worst) {
          worst = gap / width_m[v];
          vertex = v;
          against = other;
        }
      }
    }
    return new GapCheck(target, worst, vertex, against);
  }

  private static boolean facesPlane(Level level, int unknown, int axis) {
    double normal = level.nodes().normal()[3 * level.surface().unknownNode()[unknown] + axis];
    return Math.abs(normal) > 0.7;
  }

  private static boolean[] others(int[] electrodeOfPart, int groups, int electrode) {
    boolean[] allow = new boolean[groups];
    for (int p = 0; p < groups; p++) {
      allow[p] = electrodeOfPart[p] >= 0 && electrodeOfPart[p] != electrode;
    }
    return allow;
  }

  /** Whether every gap is resolved. */
  boolean resolved() {
    return worst >= RESOLVED;
  }

  /** One line that names the gap. */
  String remark(Assembly assembly, SurfaceMesh mesh) {
    int triangle = 0;
    while (mesh.triangles()[triangle] != vertex) {
      triangle++;
    }
    int part = assembly.geometry().facePart(mesh.triangleFace()[triangle / 3]);
    return String.format(
        Locale.ROOT,
        "the gap from part %s to %s at (%.3f, %.3f, %.3f) mm is %.2f of an element wide: the field"
            + " there is not resolved; allow more time or memory",
        assembly.parts().get(part).name(),
        against < 0 ? "the earth plane" : "part " + assembly.parts().get(against).name(),
        1e3 * mesh.xyz()[3 * vertex],
        1e3 * mesh.xyz()[3 * vertex + 1],
        1e3 * mesh.xyz()[3 * vertex + 2],
        worst);
  }
}
