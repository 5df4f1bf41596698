package org.edgefield.importer.mesh.remesh;

import java.util.Arrays;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;

/**
 * Removes vertices at the end of edges that are too short for the size field. CAD vertices stay;
 * vertices on CAD edges are removed along their edge only.
 */
final class Collapser {
  /** Length in elements below which an edge is collapsed. */
  static final double SHORT = 0.8;

  /** Longest edge that a collapse may leave behind, in elements. */
  private static final double LONGEST = 1.5;

  /** Shape that is good enough to let triangles get a little worse. */
  private static final double FAIR = 0.3;

  private final Workspace w;
  private int[] mark = new int[0];
  private int stamp;

  Collapser(Workspace w) {
    this.w = w;
  }

  /**
   * Tries every vertex once.
   *
   * @param stretch factor on the lengths that decide, 1 as a rule
   * @param most number of vertices after which to stop
   * @return the number of vertices removed
   */
  int round(double stretch, int most) {
    HalfEdgeMesh mesh = w.mesh;
    int removed = 0;
    for (int v = 0; v < mesh.vertices && removed < most; v++) {
      if (mesh.out[v] < 0 || mesh.kind[v] == SurfaceMesh.ON_VERTEX) {
        continue;
      }
      int best = -1;
      double shortest = SHORT * stretch;
      int h = mesh.out[v];
      do {
        if (mesh.kind[v] == SurfaceMesh.ON_FACE || mesh.cad[h] >= 0) {
          double l = Shape.length(mesh, w.field, h);
          if (l < shortest) {
            shortest = l;
            best = h;
          }
        }
        h = mesh.turn(h);
      } while (h != mesh.out[v]);
      if (best >= 0 && tryCollapse(best, LONGEST * stretch, FAIR)) {
        removed++;
      }
    }
    return removed;
  }

  /**
   * Moves the origin of h onto its far end where that is allowed.
   *
   * @param longest longest edge that may result, in elements
   * @param fair shape that the new triangles may fall to
   */
  boolean tryCollapse(int h, double longest, double fair) {
    HalfEdgeMesh mesh = w.mesh;
    int a = mesh.org[h];
    int b = mesh.dest(h);
    int o = mesh.opp[h];
    int p = HalfEdgeMesh.prev(h);
    int on = HalfEdgeMesh.next(o);
    if (mesh.kind[a] == SurfaceMesh.ON_VERTEX
        || (mesh.kind[a] == SurfaceMesh.ON_EDGE
            && (mesh.cad[h] < 0 || mesh.cad[p] >= 0 || mesh.cad[on] >= 0))) {
      return false;
    }
    if (!linked(h, a, b)) {
      return false;
    }
    double before = Double.POSITIVE_INFINITY;
    double after = Double.POSITIVE_INFINITY;
    int source = HalfEdgeMesh.next(h);
    int g = h;
    do {
      int t = g / 3;
      before = Math.min(before, w.shape(t));
      if (g != h) {
        if (mesh.cad[g] >= 0) {
          source = o;
        }
        int x = mesh.dest(g);
        if (x != b && Shape.length(mesh, w.field, b, x) > longest) {
          return false;
        }
        if (t != o / 3) {
          int gn = HalfEdgeMesh.next(g);
          int gp = HalfEdgeMesh.prev(g);
          after =
              Math.min(
                  after, Shape.of(mesh, w.field, b, mesh.org[gn], mesh.org[gp], source, gn, gp));
        }
      }
      g = mesh.turn(g);
    } while (g != h);
    if (after < Math.min(before, fair)) {
      return false;
    }
    mesh.collapse(h);
    w.markAround(b);
    return true;
  }

  /** Whether a and b have no common neighbours but the two across the edge. */
  private boolean linked(int h, int a, int b) {
    HalfEdgeMesh mesh = w.mesh;
    if (mark.length < mesh.vertices) {
      mark = Arrays.copyOf(mark, mesh.kind.length);
    }
    stamp++;
    int g = h;
    do {
      mark[mesh.dest(g)] = stamp;
      g = mesh.turn(g);
    } while (g != h);
    int common = 0;
    int b0 = mesh.out[b];
    g = b0;
    do {
      if (mesh.dest(g) != a && mark[mesh.dest(g)] == stamp) {
        common++;
      }
      g = mesh.turn(g);
    } while (g != b0);
    return common == 2;
  }
}
