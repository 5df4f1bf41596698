package org.edgefield.importer.mesh.remesh;

import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;
import org.edgefield.importer.mesh.size.VertexField;

/** Flips edges inside faces wherever that betters the worse of the two triangles. */
final class Flipper {
  private static final int PASSES = 8;

  /** Shape from which on a pair of triangles is left alone. */
  private static final double GOOD = 0.93;

  /** Least gain as a share, so that rounding does not turn an edge to and fro. */
  private static final double GAIN = 1e-3;

  private Flipper() {}

  /** Flips among the changed triangles until nothing gets better; returns the number of flips. */
  static int run(Workspace w) {
    HalfEdgeMesh mesh = w.mesh;
    int total = 0;
    for (int pass = 0; pass < PASSES; pass++) {
      int flips = 0;
      for (int t = 0; t < mesh.triangles; t++) {
        if (mesh.face[t] < 0 || w.changed[t] == 0) {
          continue;
        }
        w.changed[t] = 0;
        for (int h = 3 * t; h < 3 * t + 3; h++) {
          int o = mesh.opp[h];
          if ((h < o || w.changed[o / 3] == 0) && tryFlip(w, h)) {
            flips++;
            break;
          }
        }
      }
      total += flips;
      if (flips == 0) {
        break;
      }
    }
    return total;
  }

  static boolean tryFlip(Workspace w, int h) {
    HalfEdgeMesh mesh = w.mesh;
    VertexField field = w.field;
    if (mesh.cad[h] >= 0) {
      return false;
    }
    int o = mesh.opp[h];
    int hc = HalfEdgeMesh.prev(h);
    int hd = HalfEdgeMesh.prev(o);
    int a = mesh.org[h];
    int b = mesh.org[o];
    int c = mesh.org[hc];
    int d = mesh.org[hd];
    if (c == d) {
      return false;
    }
    double before = Math.min(w.shape(h / 3), w.shape(o / 3));
    if (before > GOOD) {
      return false;
    }
    double least = before + GAIN * Math.abs(before);
    double first = Shape.of(mesh, field, a, d, c, h, hd, hc);
    if (first <= least) {
      return false;
    }
    double second = Shape.of(mesh, field, b, c, d, o, hc, hd);
    if (second <= least || mesh.find(c, d) >= 0) {
      return false;
    }
    mesh.flip(h);
    w.setShape(h / 3, first);
    w.setShape(o / 3, second);
    return true;
  }
}
