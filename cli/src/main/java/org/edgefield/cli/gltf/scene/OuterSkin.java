package org.edgefield.cli.gltf.scene;

import java.util.List;
import org.edgefield.field.job.Electrode;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Finds the outer skin of an electrode that encloses all the others (a housing, a tank, an outer
 * conductor). Left out of view, it opens the model like a doll's house: the near wall's inside is
 * seen from behind and not drawn, the far wall's inside shows its colours. Only calm skin is left
 * out; a hot place always stays in view.
 *
 * <p>An electrode encloses when its box holds the box of all other assessed parts in at least two
 * directions and half of it in the third.
 */
final class OuterSkin {
  private final boolean[] leftOut;
  private String encloser;

  /**
   * Marks the triangles to leave out.
   *
   * @param calm whether a triangle is calm in every duty
   */
  OuterSkin(
      List<Part> parts,
      List<Electrode> electrodes,
      SurfaceMesh mesh,
      PartLayout layout,
      boolean[] calm) {
    leftOut = new boolean[mesh.triangleCount()];
    for (int e = 0; e < electrodes.size(); e++) {
      Electrode electrode = electrodes.get(e);
      double[] own = emptyBox();
      for (int p : electrode.parts()) {
        grow(own, parts.get(p).bounds_m());
      }
      double[] others = emptyBox();
      for (int o = 0; o < electrodes.size(); o++) {
        for (int p : o == e ? new int[0] : electrodes.get(o).parts()) {
          grow(others, parts.get(p).bounds_m());
        }
      }
      if (others[0] <= others[3] && encloses(own, others)) {
        encloser = electrode.name();
        for (int p : electrode.parts()) {
          mark(mesh, layout.triangles(p), others, calm);
        }
      }
    }
  }

  /** Whether a triangle is left out of view. */
  boolean leftOut(int triangle) {
    return leftOut[triangle];
  }

  /** Name of the electrode whose outer skin is left out, null where none is. */
  String encloser() {
    return encloser;
  }

  private static double[] emptyBox() {
    double inf = Double.POSITIVE_INFINITY;
    return new double[] {inf, inf, inf, -inf, -inf, -inf};
  }

  private static void grow(double[] box, double[] other) {
    for (int c = 0; c < 3; c++) {
      box[c] = Math.min(box[c], other[c]);
      box[c + 3] = Math.max(box[c + 3], other[c + 3]);
    }
  }

  private static boolean encloses(double[] own, double[] others) {
    int within = 0;
    for (int c = 0; c < 3; c++) {
      boolean holds = own[c] < others[c] && own[c + 3] > others[c + 3];
      double overlap = Math.min(own[c + 3], others[c + 3]) - Math.max(own[c], others[c]);
      if (holds) {
        within++;
      } else if (overlap < 0.5 * (others[c + 3] - others[c])) {
        return false;
      }
    }
    return within >= 2;
  }

  /** A triangle belongs to the skin when all the others lie behind its plane. */
  private void mark(SurfaceMesh mesh, int[] triangles, double[] box, boolean[] calm) {
    double[] x = mesh.xyz();
    for (int t : triangles) {
      int a = 3 * mesh.triangles()[3 * t];
      double[] n = Triangles.areaVector(mesh, t);
      double reach = 0;
      for (int c = 0; c < 3; c++) {
        reach += n[c] * ((n[c] > 0 ? box[c + 3] : box[c]) - x[a + c]);
      }
      leftOut[t] = reach <= 0 && calm[t];
    }
  }
}
