package org.edgefield.importer.mesh.remesh;

import java.util.Arrays;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;
import org.edgefield.importer.mesh.size.VertexField;

/**
 * Splits edges that are too long for the size field, in rounds: each round takes the edges that are
 * about the longest of their two triangles (M.-C. Rivara, "Algorithms for refining triangular
 * grids", International Journal for Numerical Methods in Engineering 20, 1984; from memory). New
 * vertices lie on the exact surface or curve.
 */
final class Splitter {
  /** Length in elements above which an edge is split. */
  static final double LONG = 1.45;

  /** Share of its triangles' longest edges that an edge must have. */
  private static final double NEARLY_LONGEST = 0.85;

  /** Distance of a surface point from its chord midpoint over the chord that calls for steps. */
  private static final double FAR = 0.1;

  private static final int STEPS = 3;

  /** Edges per split from which on a round counts as refused. */
  private static final int REFUSED = 20;

  private final Workspace w;
  private double[] length = new double[0];
  private int[] list = new int[64];
  private int[] created = new int[64];
  private int[] curveEdge = new int[64];
  private double[] curveT = new double[64];
  private double[] curve = new double[6 * 64];
  private final double[] corners = new double[10];
  private final double[] around = new double[8];
  private final double[] t1 = new double[1];
  private final double[] uv1 = new double[2];

  Splitter(Workspace w) {
    this.w = w;
  }

  /** Which long edges a round takes. */
  enum Choice {
    /** Those on CAD edges, so that faces get their exact outline before points inside. */
    OUTLINES,
    /** Those that are about the longest of their triangles. */
    LONGEST,
    /** All. */
    ALL
  }

  /** One round; returns the number of splits. */
  int round(Choice choice) {
    HalfEdgeMesh mesh = w.mesh;
    measure(choice == Choice.OUTLINES);
    // A split renumbers the half-edges of its two triangles, so that each takes part in one only.
    boolean[] taken = new boolean[mesh.triangles];
    int n = 0;
    for (int t = 0; t < mesh.triangles; t++) {
      for (int h = 3 * t; h < 3 * t + 3 && mesh.face[t] >= 0 && !taken[t]; h++) {
        int o = mesh.opp[h];
        if (h < o
            && (choice != Choice.OUTLINES || mesh.cad[h] >= 0)
            && length[h] > LONG
            && !taken[o / 3]
            && (choice != Choice.LONGEST || length[h] >= NEARLY_LONGEST * longestBeside(h))) {
          if (n == list.length) {
            list = Arrays.copyOf(list, 2 * n);
          }
          list[n++] = h;
          taken[t] = true;
          taken[o / 3] = true;
        }
      }
    }
    // A round that is refused almost everywhere would go on for ever in small steps.
    int made = n == 0 ? 0 : split(n);
    return made * REFUSED < n ? 0 : made;
  }

  private void measure(boolean outlinesOnly) {
    HalfEdgeMesh mesh = w.mesh;
    if (length.length < 3 * mesh.triangles) {
      length = new double[3 * mesh.face.length];
    }
    for (int t = 0; t < mesh.triangles; t++) {
      if (mesh.face[t] < 0) {
        continue;
      }
      for (int h = 3 * t; h < 3 * t + 3; h++) {
        int o = mesh.opp[h];
        if (h < o && (!outlinesOnly || mesh.cad[h] >= 0)) {
          length[h] = Shape.length(mesh, w.field, h);
          length[o] = length[h];
        }
      }
    }
  }

  private double longestBeside(int h) {
    int o = w.mesh.opp[h];
    double a = Math.max(length[HalfEdgeMesh.next(h)], length[HalfEdgeMesh.prev(h)]);
    double b = Math.max(length[HalfEdgeMesh.next(o)], length[HalfEdgeMesh.prev(o)]);
    return Math.max(a, b);
  }

  /** Splits the listed edges. */
  private int split(int n) {
    HalfEdgeMesh mesh = w.mesh;
    FacePoints points = w.points;
    // Two points per edge, one for each side; the second counts on CAD edges only.
    points.ensure(2 * n);
    evaluateCurves(n);
    for (int i = 0; i < n; i++) {
      int h = list[i];
      place(h, 2 * i, i);
      if (mesh.cad[h] >= 0) {
        place(mesh.opp[h], 2 * i + 1, i);
      } else {
        copyStart(2 * i, 2 * i + 1);
      }
    }
    points.settle(2 * n, 0);
    settleFar(n);
    if (created.length < n) {
      created = new int[2 * n];
    }
    int made = 0;
    for (int i = 0; i < n; i++) {
      int m = splitOne(list[i], i);
      if (m >= 0) {
        created[made++] = m;
      }
    }
    w.sizes.refresh(mesh, w.field, created, made);
    for (int i = 0; i < made; i++) {
      int m = created[i];
      int h = mesh.out[m];
      do {
        w.grading.limit(mesh, w.field, mesh.dest(h), m);
        h = mesh.turn(h);
      } while (h != mesh.out[m]);
    }
    w.grading.spread(mesh, w.field, created, made);
    for (int i = 0; i < made; i++) {
      w.markAround(created[i]);
    }
    return made;
  }

  private void evaluateCurves(int n) {
    HalfEdgeMesh mesh = w.mesh;
    int count = 0;
    if (curveT.length < n) {
      curveEdge = new int[2 * n];
      curveT = new double[2 * n];
      curve = new double[12 * n];
    }
    for (int i = 0; i < n; i++) {
      int h = list[i];
      if (mesh.cad[h] >= 0) {
        curveEdge[count] = mesh.cad[h];
        curveT[count++] = 0.5 * (mesh.tOrg[h] + mesh.tEnd[h]);
      }
    }
    w.geometry.curve(count, curveEdge, curveT, curve);
    // Back to the places of their edges, from the last one so that nothing is overwritten.
    for (int i = n - 1; i >= 0; i--) {
      if (mesh.cad[list[i]] >= 0) {
        count--;
        System.arraycopy(curve, 6 * count, curve, 6 * i, 6);
        curveT[i] = curveT[count];
      }
    }
  }

  /** Start parameters and target of the new point on the side of h. */
  private void place(int h, int at, int i) {
    HalfEdgeMesh mesh = w.mesh;
    FacePoints points = w.points;
    points.face[at] = mesh.face[h / 3];
    if (mesh.cad[h] >= 0) {
      System.arraycopy(curve, 6 * i, points.target, 3 * at, 3);
      t1[0] = curveT[i];
      w.geometry.edgeUv(mesh.cad[h], mesh.side[h], 1, t1, uv1);
      points.uv[2 * at] = uv1[0];
      points.uv[2 * at + 1] = uv1[1];
      return;
    }
    int g = HalfEdgeMesh.next(h);
    for (int k = 0; k < 3; k++) {
      points.target[3 * at + k] =
          0.5 * (mesh.xyz[3 * mesh.org[h] + k] + mesh.xyz[3 * mesh.org[g] + k]);
    }
    for (int k = 0; k < 2; k++) {
      double a = mesh.uv[2 * h + k];
      double b = mesh.uv[2 * g + k];
      if (mesh.pole[h] == k + 1) {
        a = b;
      } else if (mesh.pole[g] == k + 1) {
        b = a;
      }
      points.uv[2 * at + k] = 0.5 * (a + b);
    }
  }

  private void copyStart(int from, int to) {
    FacePoints p = w.points;
    p.face[to] = p.face[from];
    System.arraycopy(p.uv, 2 * from, p.uv, 2 * to, 2);
    System.arraycopy(p.target, 3 * from, p.target, 3 * to, 3);
  }

  /** Steps towards the targets where the mean of the parameters lands far away, and on curves. */
  private void settleFar(int n) {
    HalfEdgeMesh mesh = w.mesh;
    FacePoints p = w.points;
    FacePoints far = new FacePoints(w.geometry);
    int[] index = new int[2 * n];
    int count = 0;
    for (int at = 0; at < 2 * n; at++) {
      int h = list[at / 2];
      boolean onCurve = mesh.cad[h] >= 0;
      if (!onCurve && at % 2 == 1) {
        continue;
      }
      double d2 = 0;
      double chord2 = 0;
      for (int k = 0; k < 3; k++) {
        double d = p.surface[9 * at + k] - p.target[3 * at + k];
        double e = mesh.xyz[3 * mesh.org[h] + k] - mesh.xyz[3 * mesh.dest(h) + k];
        d2 += d * d;
        chord2 += e * e;
      }
      if (d2 > (onCurve ? 0 : FAR * FAR * chord2)) {
        far.ensure(count + 1);
        far.face[count] = p.face[at];
        System.arraycopy(p.uv, 2 * at, far.uv, 2 * count, 2);
        System.arraycopy(p.target, 3 * at, far.target, 3 * count, 3);
        index[count++] = at;
      }
    }
    if (count == 0) {
      return;
    }
    far.settle(count, STEPS);
    for (int i = 0; i < count; i++) {
      System.arraycopy(far.uv, 2 * i, p.uv, 2 * index[i], 2);
      System.arraycopy(far.surface, 9 * i, p.surface, 9 * index[i], 9);
    }
  }

  /** Splits one edge unless that turns a triangle over; returns the new vertex or -1. */
  private int splitOne(int h, int i) {
    HalfEdgeMesh mesh = w.mesh;
    VertexField field = w.field;
    FacePoints points = w.points;
    boolean onCurve = mesh.cad[h] >= 0;
    int o = mesh.opp[h];
    int a = mesh.org[h];
    int b = mesh.org[o];
    int c = mesh.org[HalfEdgeMesh.prev(h)];
    int d = mesh.org[HalfEdgeMesh.prev(o)];
    double[] from = onCurve ? curve : points.surface;
    int at = onCurve ? 6 * i : 18 * i;
    int m =
        mesh.addVertex(
            from[at],
            from[at + 1],
            from[at + 2],
            onCurve ? SurfaceMesh.ON_EDGE : SurfaceMesh.ON_FACE,
            onCurve ? mesh.cad[h] : mesh.face[h / 3]);
    double before = Math.min(Math.min(facing(h / 3), facing(o / 3)), Shape.LEAST_FACING);
    int hn = HalfEdgeMesh.next(h);
    int hp = HalfEdgeMesh.prev(h);
    int on = HalfEdgeMesh.next(o);
    int op = HalfEdgeMesh.prev(o);
    for (int s = 0; s < 2; s++) {
      int point = onCurve ? 2 * i + s : 2 * i;
      corners[5 * s] = points.uv[2 * point];
      corners[5 * s + 1] = points.uv[2 * point + 1];
      Arrays.fill(corners, 5 * s + 2, 5 * s + 5, 0);
    }
    boolean faces =
        Shape.facing(mesh, a, m, c, h, h, hp) >= before
            && Shape.facing(mesh, m, b, c, hn, hn, hp) >= before
            && Shape.facing(mesh, b, m, d, o, o, op) >= before
            && Shape.facing(mesh, m, a, d, on, on, op) >= before;
    if (!faces && !(unfolded(h, 0) && unfolded(o, 5))) {
      mesh.vertices--;
      return -1;
    }
    field.ensure(mesh.vertices);
    field.target[m] = 2 / (1 / field.target[a] + 1 / field.target[b]);
    mesh.split(h, m, corners, onCurve ? curveT[i] : 0);
    return m;
  }

  /** Whether both halves of h's triangle run the right way round in the parameters. */
  private boolean unfolded(int h, int corner) {
    HalfEdgeMesh mesh = w.mesh;
    int n = HalfEdgeMesh.next(h);
    int p = HalfEdgeMesh.prev(h);
    if (mesh.pole[h] != 0 || mesh.pole[n] != 0 || mesh.pole[p] != 0) {
      return false;
    }
    System.arraycopy(corners, corner, around, 0, 2);
    System.arraycopy(mesh.uv, 2 * h, around, 2, 2);
    System.arraycopy(mesh.uv, 2 * n, around, 4, 2);
    System.arraycopy(mesh.uv, 2 * p, around, 6, 2);
    return Shape.turn(mesh, h, around, 2, 0, 6) > 0 && Shape.turn(mesh, h, around, 0, 4, 6) > 0;
  }

  private double facing(int t) {
    int h = 3 * t;
    HalfEdgeMesh mesh = w.mesh;
    return Shape.facing(mesh, mesh.org[h], mesh.org[h + 1], mesh.org[h + 2], h, h + 1, h + 2);
  }
}
