package org.edgefield.field.bem.solve;

import java.util.Arrays;
import org.edgefield.field.bem.edge.AsMadeField;
import org.edgefield.field.bem.edge.SharpEdges;
import org.edgefield.importer.mesh.MeshRequest;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Which sharp edges get graded rows of elements, how fine these are, and how far the peaks on sharp
 * edges are to be trusted.
 */
final class EdgeRefinement {
  /** Share of an electrode's highest field from which an edge is worth rows of its own. */
  private static final double WORTH = 0.5;

  private static final double FINER = 0.6;
  private static final double FLOOR = 1e-3;
  private static final double SAFETY = 1.5;

  /** Claim on a mesh without rows along the edge. */
  private static final double WITHOUT_ROWS = 0.3;

  private SharpEdges edges;
  private final boolean[] chosen;
  private double[][] before;

  EdgeRefinement(SharpEdges edges) {
    this.edges = edges;
    chosen = new boolean[edges.count()];
  }

  /** The edges as they are looked at now. */
  SharpEdges edges() {
    return edges;
  }

  /**
   * Relative uncertainty of the highest value on sharp edges, per duty and electrode: from its
   * change since the level before and from the extrapolation to the edge. 0 where no sharp edge
   * leads.
   */
  double[][] claims(Level level, int electrodes) {
    int duties = level.raw().size();
    double[][] out = new double[duties][electrodes];
    double[][] now = new double[duties][electrodes];
    for (int d = 0; d < duties; d++) {
      for (int e = 0; e < electrodes; e++) {
        int v = level.edgePeak(d, e);
        if (v < 0) {
          continue;
        }
        AsMadeField.Values values = level.asMade().get(d);
        now[d][e] = values.field_V_per_m()[v];
        int smooth = level.peak(d, e);
        boolean leads = smooth < 0 || now[d][e] > WORTH * level.recovered().get(d)[smooth];
        if (leads && now[d][e] > 0) {
          double change = before == null ? 0 : Math.abs(before[d][e] / now[d][e] - 1);
          double doubt = Math.max(FLOOR, Math.max(change, values.uncertainty()[v]));
          out[d][e] = before == null ? WITHOUT_ROWS : SAFETY * doubt;
        }
      }
    }
    before = now;
    return out;
  }

  /**
   * Chooses the edges for the next mesh.
   *
   * @param tooCoarse whether a claim of this level is above what is asked
   */
  void choose(Level level, boolean tooCoarse) {
    boolean added = false;
    for (int d = 0; d < level.asMade().size(); d++) {
      double[] highest = level.sharp().highest(level.asMade().get(d));
      double top = Arrays.stream(highest).max().orElse(0);
      for (int i = 0; i < chosen.length; i++) {
        boolean worth = highest[i] > WORTH * top;
        added |= worth && !chosen[i];
        chosen[i] |= worth;
      }
    }
    if (tooCoarse && !added) {
      edges = edges.nearer(FINER);
    }
  }

  /** Adds the rows to a request, and sizes along the edges to the wanted sizes. */
  MeshRequest request(MeshRequest plain, SurfaceMesh mesh, double[] target_m) {
    edges.sizesAlong(mesh, chosen, target_m);
    return plain.withTargetSize(target_m).withEdges(edges.gradings(chosen));
  }
}
