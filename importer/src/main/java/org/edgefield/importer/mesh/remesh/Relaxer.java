package org.edgefield.importer.mesh.remesh;

import java.util.Arrays;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;

/**
 * Moves vertices so that their edges come near length 1 in elements: each neighbour pulls or pushes
 * its vertex to the distance of one element, and the mean of these places, brought back to the
 * exact surface or curve, is taken where the triangles around do not get worse.
 */
final class Relaxer {
  /** Part of the way that is gone in one round. */
  private static final double STEP = 0.7;

  /** Shape that lets a vertex move although the worst triangle around gets a little worse. */
  private static final double FAIR = 0.7;

  private static final int STEPS = 2;

  private final Workspace w;
  private int[] list = new int[0];
  private final double[] oldUv = new double[4];
  private final double[] oldNormal = new double[6];
  private final double[] oldPoint = new double[3];
  private final double[] normal = new double[3];
  private final double[] point = new double[3];
  private double[] now = new double[16];
  private double leastBefore;
  private double sumBefore;
  private final double[] t1 = new double[1];
  private final double[] uv1 = new double[2];
  private final int[] edge1 = new int[1];
  private final double[] curve1 = new double[6];
  private final double[] corners = new double[10];

  Relaxer(Workspace w) {
    this.w = w;
  }

  /** One round over all vertices whose surroundings are worse than the given shape. */
  int round(double below) {
    return alongEdges(below) + inFaces(below);
  }

  private int inFaces(double below) {
    HalfEdgeMesh mesh = w.mesh;
    FacePoints points = w.points;
    int n = 0;
    if (list.length < mesh.vertices) {
      list = new int[2 * mesh.vertices];
    }
    for (int v = 0; v < mesh.vertices; v++) {
      if (mesh.out[v] >= 0 && mesh.kind[v] == SurfaceMesh.ON_FACE && w.worst(v) < below) {
        list[n++] = v;
      }
    }
    points.ensure(n);
    for (int i = 0; i < n; i++) {
      int v = list[i];
      int h = mesh.out[v];
      points.face[i] = mesh.face[h / 3];
      points.uv[2 * i] = mesh.uv[2 * h];
      points.uv[2 * i + 1] = mesh.uv[2 * h + 1];
      aim(v, points.target, 3 * i);
    }
    points.settle(n, STEPS);
    int moved = 0;
    for (int i = 0; i < n; i++) {
      int v = list[i];
      if (!points.normal(i, mesh.normal, 3 * mesh.out[v], normal, 0)) {
        continue;
      }
      System.arraycopy(points.surface, 9 * i, point, 0, 3);
      if (moveInFace(v, points.uv[2 * i], points.uv[2 * i + 1])) {
        moved++;
      }
    }
    return moved;
  }

  /** The place where the neighbours want vertex v. */
  private void aim(int v, double[] target, int at) {
    HalfEdgeMesh mesh = w.mesh;
    double[] x = mesh.xyz;
    double sx = 0;
    double sy = 0;
    double sz = 0;
    int count = 0;
    int h = mesh.out[v];
    do {
      int q = mesh.dest(h);
      double f = 1 / Math.max(Shape.length(mesh, w.field, v, q), 0.2);
      sx += (1 - f) * (x[3 * q] - x[3 * v]);
      sy += (1 - f) * (x[3 * q + 1] - x[3 * v + 1]);
      sz += (1 - f) * (x[3 * q + 2] - x[3 * v + 2]);
      count++;
      h = mesh.turn(h);
    } while (h != mesh.out[v]);
    double s = STEP / count;
    target[at] = x[3 * v] + s * sx;
    target[at + 1] = x[3 * v + 1] + s * sy;
    target[at + 2] = x[3 * v + 2] + s * sz;
  }

  /** Moves a vertex to {@code point} with {@code normal}, unless that makes things worse. */
  private boolean moveInFace(int v, double u0, double v0) {
    HalfEdgeMesh mesh = w.mesh;
    remember(v);
    save(v);
    int h = mesh.out[v];
    double oldU = mesh.uv[2 * h];
    double oldV = mesh.uv[2 * h + 1];
    double nx = mesh.normal[3 * h];
    double ny = mesh.normal[3 * h + 1];
    double nz = mesh.normal[3 * h + 2];
    mesh.moveInFace(v, point, u0, v0, normal);
    if (better(v)) {
      return true;
    }
    normal[0] = nx;
    normal[1] = ny;
    normal[2] = nz;
    mesh.moveInFace(v, oldPoint, oldU, oldV, normal);
    return false;
  }

  private void remember(int v) {
    leastBefore = Double.POSITIVE_INFINITY;
    sumBefore = 0;
    HalfEdgeMesh mesh = w.mesh;
    int h = mesh.out[v];
    do {
      double s = w.shape(h / 3);
      leastBefore = Math.min(leastBefore, s);
      sumBefore += s;
      h = mesh.turn(h);
    } while (h != mesh.out[v]);
  }

  /** Whether the triangles around v are better than remembered; their shapes are noted then. */
  private boolean better(int v) {
    HalfEdgeMesh mesh = w.mesh;
    double least = Double.POSITIVE_INFINITY;
    double sum = 0;
    int n = 0;
    int h = mesh.out[v];
    do {
      double s = Shape.ofTriangle(mesh, w.field, h / 3);
      least = Math.min(least, s);
      if (least <= leastBefore && least <= FAIR) {
        return false;
      }
      sum += s;
      if (n == now.length) {
        now = Arrays.copyOf(now, 2 * n);
      }
      now[n++] = s;
      h = mesh.turn(h);
    } while (h != mesh.out[v]);
    if (least <= leastBefore && sum <= sumBefore) {
      return false;
    }
    n = 0;
    do {
      w.setShape(h / 3, now[n++]);
      h = mesh.turn(h);
    } while (h != mesh.out[v]);
    return true;
  }

  private void save(int v) {
    System.arraycopy(w.mesh.xyz, 3 * v, oldPoint, 0, 3);
  }

  private int alongEdges(double below) {
    HalfEdgeMesh mesh = w.mesh;
    int moved = 0;
    for (int v = 0; v < mesh.vertices; v++) {
      if (mesh.out[v] >= 0 && mesh.kind[v] == SurfaceMesh.ON_EDGE && w.worst(v) < below) {
        moved += moveAlong(v) ? 1 : 0;
      }
    }
    return moved;
  }

  /** Evens out the lengths of the two segments at a vertex on a CAD edge. */
  private boolean moveAlong(int v) {
    HalfEdgeMesh mesh = w.mesh;
    int h = mesh.firstCad(v);
    int g = mesh.turn(h);
    while (mesh.cad[g] < 0) {
      g = mesh.turn(g);
    }
    if (g == h) {
      return false;
    }
    double lh = Shape.length(mesh, w.field, h);
    double lg = Shape.length(mesh, w.field, g);
    int longer = lh > lg ? h : g;
    double share = STEP * 0.5 * Math.abs(lh - lg) / Math.max(lh, lg);
    if (share < 0.02) {
      return false;
    }
    double t = mesh.tOrg[h] + share * (mesh.tEnd[longer] - mesh.tOrg[longer]);
    edge1[0] = mesh.cad[h];
    t1[0] = t;
    w.geometry.curve(1, edge1, t1, curve1);
    FacePoints points = w.points;
    points.ensure(2);
    for (int s = 0; s < 2; s++) {
      int e = s == 0 ? h : g;
      points.face[s] = mesh.face[e / 3];
      w.geometry.edgeUv(mesh.cad[e], mesh.side[e], 1, t1, uv1);
      System.arraycopy(uv1, 0, points.uv, 2 * s, 2);
      System.arraycopy(curve1, 0, points.target, 3 * s, 3);
    }
    points.settle(2, STEPS);
    for (int s = 0; s < 2; s++) {
      int e = s == 0 ? h : g;
      System.arraycopy(points.uv, 2 * s, corners, 5 * s, 2);
      if (!points.normal(s, mesh.normal, 3 * e, corners, 5 * s + 2)) {
        return false;
      }
    }
    remember(v);
    save(v);
    double oldT = mesh.tOrg[h];
    saveSector(h, 0);
    saveSector(g, 1);
    place(v, h, g, curve1, corners, t);
    if (better(v)) {
      return true;
    }
    for (int s = 0; s < 2; s++) {
      System.arraycopy(oldUv, 2 * s, corners, 5 * s, 2);
      System.arraycopy(oldNormal, 3 * s, corners, 5 * s + 2, 3);
    }
    place(v, h, g, oldPoint, corners, oldT);
    return false;
  }

  private void saveSector(int h, int s) {
    System.arraycopy(w.mesh.uv, 2 * h, oldUv, 2 * s, 2);
    System.arraycopy(w.mesh.normal, 3 * h, oldNormal, 3 * s, 3);
  }

  private void place(int v, int h, int g, double[] position, double[] sectors, double t) {
    HalfEdgeMesh mesh = w.mesh;
    System.arraycopy(position, 0, mesh.xyz, 3 * v, 3);
    mesh.setSector(h, sectors, 0);
    mesh.setSector(g, sectors, 5);
    mesh.tOrg[h] = t;
    mesh.tEnd[mesh.opp[h]] = t;
    mesh.tOrg[g] = t;
    mesh.tEnd[mesh.opp[g]] = t;
  }
}
