package org.edgefield.importer.mesh.remesh;

import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;
import org.edgefield.importer.mesh.size.SizeSource;
import org.edgefield.importer.mesh.size.VertexField;

/**
 * Remeshes one part on its exact surface in a field of size tensors: splits long edges, collapses
 * short ones, flips and relaxes, until little changes. Deterministic.
 *
 * <p>CAD vertices and CAD edges are kept, seams included. Where the CAD model itself has slivers
 * thinner than 1/128 of the size around, elements there stay slivers.
 */
public final class PartRemesher {
  private static final int PASSES = 6;
  private static final int SPLIT_ROUNDS = 80;
  private static final int COLLAPSE_ROUNDS = 3;

  /** Share of triangles that may still change when the work counts as done. */
  private static final double SETTLED = 0.01;

  /** Shape below which a triangle counts as flat. */
  private static final double FLAT = 1e-3;

  /** Splits per triangle of a round that is not worth another one; the next pass goes on. */
  private static final double FEW = 0.002;

  /** Triangles over the number wanted up to which another pass follows narrow places. */
  private static final double COARSE = 0.8;

  /** Triangles over the number wanted from which on they are thinned out. */
  private static final double CROWDED = 1.15;

  private final Workspace w;
  private final Splitter splitter;
  private final Collapser collapser;
  private final Relaxer relaxer;

  private PartRemesher(Workspace w) {
    this.w = w;
    splitter = new Splitter(w);
    collapser = new Collapser(w);
    relaxer = new Relaxer(w);
  }

  /**
   * Remeshes in place.
   *
   * @param geometry exact geometry
   * @param mesh the part's mesh
   * @param field holds the wanted sizes per vertex in {@code target}; receives the tensors
   * @param sizes the size field
   */
  public static void run(
      ExactGeometry geometry, HalfEdgeMesh mesh, VertexField field, SizeSource sizes) {
    sizes.findApexes(mesh);
    new PartRemesher(new Workspace(geometry, mesh, field, sizes)).run();
  }

  /**
   * Evaluates the size field on a mesh as it is.
   *
   * @param geometry exact geometry
   * @param mesh the part's mesh; receives its normals
   * @param field holds the wanted sizes per vertex in {@code target}; receives the tensors
   * @param sizes the size field
   */
  public static void measure(
      ExactGeometry geometry, HalfEdgeMesh mesh, VertexField field, SizeSource sizes) {
    sizes.findApexes(mesh);
    new Workspace(geometry, mesh, field, sizes).refreshAll(true);
  }

  private void run() {
    new EdgeCorners(w).settle();
    w.refreshAll(false);
    Flipper.run(w);
    for (int pass = 0; pass < PASSES; pass++) {
      int changes = splitAll() + collapseAll() + repair();
      relax(2, 0.9);
      w.refreshAll(true);
      Flipper.run(w);
      if (pass > 0 && changes < SETTLED * w.mesh.living && w.mesh.living > COARSE * wanted()) {
        break;
      }
    }
    thin();
    relax(3, 0.8);
    mend();
    w.refreshAll(true);
  }

  private int splitAll() {
    int total = 0;
    Splitter.Choice choice = Splitter.Choice.OUTLINES;
    for (int round = 0; round < SPLIT_ROUNDS; round++) {
      int n = splitter.round(choice);
      total += n;
      Flipper.run(w);
      if (n > FEW * w.mesh.living) {
        choice = choice == Splitter.Choice.ALL ? Splitter.Choice.LONGEST : choice;
      } else if (choice == Splitter.Choice.ALL) {
        break;
      } else {
        choice = choice == Splitter.Choice.OUTLINES ? Splitter.Choice.LONGEST : Splitter.Choice.ALL;
      }
    }
    return total;
  }

  private int collapseAll() {
    int total = 0;
    for (int round = 0; round < COLLAPSE_ROUNDS; round++) {
      int n = collapser.round(1, Integer.MAX_VALUE);
      total += n;
      Flipper.run(w);
      if (n <= FEW * w.mesh.living) {
        break;
      }
    }
    return total;
  }

  /** Number of triangles that the size field integrates to. */
  private double wanted() {
    double sum = 0;
    for (int t = 0; t < w.mesh.triangles; t++) {
      sum += w.mesh.face[t] < 0 ? 0 : Shape.elements(w.mesh, w.field, t);
    }
    return sum;
  }

  /** Collapses more where regular patterns hold many more triangles than the field asks for. */
  private void thin() {
    double wanted = wanted();
    double excess = w.mesh.living / wanted;
    if (excess > CROWDED) {
      // A vertex takes two triangles with it.
      collapser.round(Math.sqrt(excess), (int) (0.5 * (w.mesh.living - wanted)));
      Flipper.run(w);
    }
  }

  private void relax(int rounds, double below) {
    for (int i = 0; i < rounds; i++) {
      relaxer.round(below);
      Flipper.run(w);
    }
  }

  /** Collapses flat and overturned triangles, whatever the lengths that leaves. */
  private int repair() {
    return collapseWorse(FLAT, Double.POSITIVE_INFINITY, 0);
  }

  /** Works on the worst triangles alone: collapses whatever makes them better. */
  private void mend() {
    for (int round = 0; round < 3; round++) {
      int n = collapseWorse(0.6, 1.7, 0.6) + repair();
      Flipper.run(w);
      relax(2, 0.7);
      if (n == 0) {
        break;
      }
    }
  }

  private int collapseWorse(double shape, double longest, double fair) {
    int n = 0;
    for (int t = 0; t < w.mesh.triangles; t++) {
      if (w.mesh.face[t] < 0 || w.shape(t) > shape) {
        continue;
      }
      for (int h = 3 * t; h < 3 * t + 3; h++) {
        if (collapser.tryCollapse(h, longest, fair)
            || collapser.tryCollapse(w.mesh.opp[h], longest, fair)) {
          n++;
          break;
        }
      }
    }
    return n;
  }
}
