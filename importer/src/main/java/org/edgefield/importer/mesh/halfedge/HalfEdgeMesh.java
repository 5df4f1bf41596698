package org.edgefield.importer.mesh.halfedge;

import java.util.Arrays;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Closed triangle mesh of one part as half-edges in primitive arrays. Triangle t has the half-edges
 * 3t, 3t + 1 and 3t + 2; half-edge h runs from {@code org[h]} to the origin of the next one in its
 * triangle, and {@code opp[h]} is its other half in the neighbouring triangle. The corner at the
 * origin of h carries the surface parameters and the outward normal in the triangle's own face.
 *
 * <p>The arrays are public because the remeshing loops read them millions of times; they may be
 * longer than the counts. Only the operations of this class change the connections. Not safe for
 * several threads.
 */
public final class HalfEdgeMesh {
  /** Number of vertices, dead ones included. */
  public int vertices;

  /** Number of triangles, dead ones included. */
  public int triangles;

  /** Number of living triangles. */
  public int living;

  /** Positions, 3 per vertex, metres. */
  public double[] xyz;

  /** Kind per vertex as in {@link SurfaceMesh}. */
  public byte[] kind;

  /** Face, edge or CAD vertex per vertex. */
  public int[] entity;

  /** A half-edge that leaves the vertex, -1 for dead vertices. */
  public int[] out;

  /** Origin vertex per half-edge. */
  public int[] org;

  /** Opposite half-edge. */
  public int[] opp;

  /** CAD edge the half-edge lies on, or -1. */
  public int[] cad;

  /** Which side of the CAD edge the half-edge's triangle is on, 0 or 1. */
  public byte[] side;

  /** Curve parameter at the origin, where on a CAD edge. */
  public double[] tOrg;

  /** Curve parameter at the far end, where on a CAD edge. */
  public double[] tEnd;

  /** Surface parameters per corner, 2 each. */
  public double[] uv;

  /** Outward unit normal per corner, 3 each. */
  public double[] normal;

  /** Parameter that is undefined at the corner because it is a pole: 0 none, 1 u, 2 v. */
  public byte[] pole;

  /** CAD face per triangle, -1 for dead triangles. */
  public int[] face;

  /** First face of the part: its index in {@link #faceSign} is 0. */
  public int firstFace;

  /** 1 per face where a triangle that faces outwards runs anticlockwise in (u, v), else -1. */
  public byte[] faceSign = new byte[0];

  private int[] freeTriangles = new int[16];
  private int freeTriangleCount;

  /** Creates an empty mesh with room for some vertices and triangles. */
  public HalfEdgeMesh(int vertexRoom, int triangleRoom) {
    int v = Math.max(4, vertexRoom);
    int h = 3 * Math.max(4, triangleRoom);
    xyz = new double[3 * v];
    kind = new byte[v];
    entity = new int[v];
    out = new int[v];
    org = new int[h];
    opp = new int[h];
    cad = new int[h];
    side = new byte[h];
    tOrg = new double[h];
    tEnd = new double[h];
    uv = new double[2 * h];
    normal = new double[3 * h];
    pole = new byte[h];
    face = new int[h / 3];
  }

  /** Next half-edge in the same triangle. */
  public static int next(int h) {
    return h % 3 == 2 ? h - 2 : h + 1;
  }

  /** Previous half-edge in the same triangle. */
  public static int prev(int h) {
    return h % 3 == 0 ? h + 2 : h - 1;
  }

  /** Vertex at the far end of a half-edge. */
  public int dest(int h) {
    return org[next(h)];
  }

  /** Next half-edge anticlockwise with the same origin. */
  public int turn(int h) {
    return opp[prev(h)];
  }

  /** Number of triangles around a vertex. */
  public int valence(int v) {
    int n = 0;
    int h = out[v];
    do {
      n++;
      h = turn(h);
    } while (h != out[v]);
    return n;
  }

  /** Half-edge from a to b, or -1. */
  public int find(int a, int b) {
    int h = out[a];
    do {
      if (dest(h) == b) {
        return h;
      }
      h = turn(h);
    } while (h != out[a]);
    return -1;
  }

  /** Adds a vertex without connections. */
  public int addVertex(double x, double y, double z, byte vertexKind, int vertexEntity) {
    if (vertices == kind.length) {
      int room = 2 * vertices;
      xyz = Arrays.copyOf(xyz, 3 * room);
      kind = Arrays.copyOf(kind, room);
      entity = Arrays.copyOf(entity, room);
      out = Arrays.copyOf(out, room);
    }
    int v = vertices++;
    xyz[3 * v] = x;
    xyz[3 * v + 1] = y;
    xyz[3 * v + 2] = z;
    kind[v] = vertexKind;
    entity[v] = vertexEntity;
    out[v] = -1;
    return v;
  }

  /** Adds a triangle slot on a face, connections to be set by the caller. */
  public int addTriangle(int cadFace) {
    int t;
    if (freeTriangleCount > 0) {
      t = freeTriangles[--freeTriangleCount];
    } else {
      if (triangles == face.length) {
        int room = 2 * triangles;
        org = Arrays.copyOf(org, 3 * room);
        opp = Arrays.copyOf(opp, 3 * room);
        cad = Arrays.copyOf(cad, 3 * room);
        side = Arrays.copyOf(side, 3 * room);
        tOrg = Arrays.copyOf(tOrg, 3 * room);
        tEnd = Arrays.copyOf(tEnd, 3 * room);
        uv = Arrays.copyOf(uv, 6 * room);
        normal = Arrays.copyOf(normal, 9 * room);
        pole = Arrays.copyOf(pole, 3 * room);
        face = Arrays.copyOf(face, room);
      }
      t = triangles++;
    }
    face[t] = cadFace;
    for (int h = 3 * t; h < 3 * t + 3; h++) {
      cad[h] = -1;
      pole[h] = 0;
    }
    living++;
    return t;
  }

  private void removeTriangle(int t) {
    face[t] = -1;
    if (freeTriangleCount == freeTriangles.length) {
      freeTriangles = Arrays.copyOf(freeTriangles, 2 * freeTriangleCount);
    }
    freeTriangles[freeTriangleCount++] = t;
    living--;
  }

  private void link(int a, int b) {
    opp[a] = b;
    opp[b] = a;
  }

  private void copyEdge(int from, int to) {
    cad[to] = cad[from];
    side[to] = side[from];
    tOrg[to] = tOrg[from];
    tEnd[to] = tEnd[from];
  }

  private void copyCorner(int from, int to) {
    org[to] = org[from];
    copyCornerData(from, to);
  }

  private void copyCornerData(int from, int to) {
    uv[2 * to] = uv[2 * from];
    uv[2 * to + 1] = uv[2 * from + 1];
    normal[3 * to] = normal[3 * from];
    normal[3 * to + 1] = normal[3 * from + 1];
    normal[3 * to + 2] = normal[3 * from + 2];
    pole[to] = pole[from];
  }

  private void setCorner(int h, int v, double[] corner, int at) {
    org[h] = v;
    uv[2 * h] = corner[at];
    uv[2 * h + 1] = corner[at + 1];
    normal[3 * h] = corner[at + 2];
    normal[3 * h + 1] = corner[at + 3];
    normal[3 * h + 2] = corner[at + 4];
    pole[h] = 0;
  }

  /**
   * Gives the free parameter of a triangle's pole corner the mean of the other two corners.
   *
   * @param t triangle
   */
  public void settlePole(int t) {
    for (int h = 3 * t; h < 3 * t + 3; h++) {
      if (pole[h] != 0) {
        int c = pole[h] - 1;
        int n = next(h);
        int p = prev(h);
        if (pole[n] == pole[h]) {
          uv[2 * h + c] = uv[2 * p + c];
        } else if (pole[p] == pole[h]) {
          uv[2 * h + c] = uv[2 * n + c];
        } else {
          uv[2 * h + c] = 0.5 * (uv[2 * n + c] + uv[2 * p + c]);
        }
      }
    }
  }

  /**
   * Splits an edge and its two triangles at vertex m.
   *
   * @param h the half-edge a to b
   * @param m vertex on it, without connections yet
   * @param corners u, v and normal of m on the side of h (five doubles at index 0) and on the other
   *     side (at index 5)
   * @param t curve parameter of m where the edge lies on a CAD edge
   */
  public void split(int h, int m, double[] corners, double t) {
    int n = next(h);
    int p = prev(h);
    int o = opp[h];
    int on = next(o);
    int op = prev(o);
    int a = org[h];
    int b = org[o];
    int t1 = addTriangle(face[h / 3]);
    int t2 = addTriangle(face[o / 3]);
    int e0 = 3 * t1;
    int e1 = e0 + 1;
    int e2 = e0 + 2;
    int f0 = 3 * t2;
    int f1 = f0 + 1;
    int f2 = f0 + 2;
    int oppN = opp[n];
    int oppOn = opp[on];
    // far half of the first triangle: m, b, c
    copyCorner(n, e1);
    copyEdge(n, e1);
    copyCorner(p, e2);
    setCorner(e0, m, corners, 0);
    setCorner(n, m, corners, 0);
    copyEdge(h, e0);
    cad[n] = -1;
    // far half of the second triangle: m, a, d
    copyCorner(on, f1);
    copyEdge(on, f1);
    copyCorner(op, f2);
    setCorner(f0, m, corners, 5);
    setCorner(on, m, corners, 5);
    copyEdge(o, f0);
    cad[on] = -1;
    if (cad[h] >= 0) {
      tEnd[h] = t;
      tOrg[e0] = t;
      tEnd[o] = t;
      tOrg[f0] = t;
    }
    link(h, f0);
    link(e0, o);
    link(n, e2);
    link(on, f2);
    link(e1, oppN);
    link(f1, oppOn);
    out[m] = e0;
    out[a] = h;
    out[b] = o;
    settlePole(h / 3);
    settlePole(o / 3);
    settlePole(t1);
    settlePole(t2);
  }

  /**
   * Flips the edge h, from a to b with the third corners c and d, into the edge from d to c. The
   * caller makes sure that it is no CAD edge and that c and d are not joined yet.
   */
  public void flip(int h) {
    int n = next(h);
    int p = prev(h);
    int o = opp[h];
    int on = next(o);
    int op = prev(o);
    int oppN = opp[n];
    int oppOn = opp[on];
    int a = org[h];
    int b = org[o];
    // first triangle becomes a, d, c: h a-d, n d-c, p c-a
    copyEdge(on, h);
    // second triangle becomes b, c, d: o b-c, on c-d, op d-b
    copyEdge(n, o);
    copyCorner(op, n);
    copyCorner(p, on);
    cad[n] = -1;
    cad[on] = -1;
    link(h, oppOn);
    link(o, oppN);
    link(n, on);
    out[a] = h;
    out[b] = o;
    out[org[p]] = p;
    out[org[op]] = op;
    settlePole(h / 3);
    settlePole(o / 3);
  }

  /**
   * Removes the origin of h by moving it onto the far end. The caller makes sure that this keeps a
   * manifold and all CAD edges.
   */
  public void collapse(int h) {
    int n = next(h);
    int p = prev(h);
    int o = opp[h];
    int on = next(o);
    int op = prev(o);
    int a = org[h];
    int b = org[o];
    int c = org[p];
    int d = org[op];
    double endOfH = tEnd[h];
    // Corners around a, anticlockwise from h: those on the side of h take the corner of b in the
    // first triangle, those past the CAD edge through a (if any) the one in the second.
    int source = n;
    int g = turn(h);
    while (g != h) {
      if (cad[g] >= 0) {
        source = o;
        tOrg[g] = endOfH;
        tEnd[opp[g]] = endOfH;
      }
      copyCorner(source, g);
      g = turn(g);
    }
    int x = opp[p];
    int y = opp[n];
    int x2 = opp[on];
    int y2 = opp[op];
    if (cad[n] >= 0) {
      copyEdge(n, x);
    }
    if (cad[op] >= 0) {
      copyEdge(op, x2);
    }
    link(x, y);
    link(x2, y2);
    removeTriangle(h / 3);
    removeTriangle(o / 3);
    out[a] = -1;
    out[b] = y2;
    out[c] = y;
    out[d] = x2;
    g = y2;
    do {
      settlePole(g / 3);
      g = turn(g);
    } while (g != y2);
  }

  /** Moves a vertex inside a face. */
  public void moveInFace(int v, double[] point, double u, double w, double[] unitNormal) {
    System.arraycopy(point, 0, xyz, 3 * v, 3);
    int h = out[v];
    do {
      uv[2 * h] = u;
      uv[2 * h + 1] = w;
      System.arraycopy(unitNormal, 0, normal, 3 * h, 3);
      settlePole(h / 3);
      h = turn(h);
    } while (h != out[v]);
  }

  /**
   * Half-edge that leaves the vertex along a CAD edge, first found from {@code out[v]}; -1 where
   * there is none.
   */
  public int firstCad(int v) {
    int h = out[v];
    do {
      if (cad[h] >= 0) {
        return h;
      }
      h = turn(h);
    } while (h != out[v]);
    return -1;
  }

  /**
   * Gives the corners of one sector the same parameters and normal: from half-edge h, which leaves
   * the vertex along a CAD edge, anticlockwise up to the next CAD edge.
   */
  public void setSector(int h, double[] corner, int at) {
    int g = h;
    do {
      if (pole[g] == 0) {
        setCorner(g, org[h], corner, at);
      }
      settlePole(g / 3);
      g = turn(g);
    } while (cad[g] < 0 && g != h);
  }
}
