package org.edgefield.importer.mesh.bodies;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.brep.SurfaceKind;
import org.edgefield.importer.mesh.SurfaceMesh;

/** Bodies with closed-form geometry and coarse first meshes, so that tests need no CAD kernel. */
public final class AnalyticBody implements Assembly, ExactGeometry {
  /** Closed-form surface: fills P, Su, Sv, Suu, Suv, Svv, three doubles each. */
  @FunctionalInterface
  interface Surface {
    void at(double u, double v, double[] out);
  }

  private record Face(Surface surface, double sign, double[] bounds, SurfaceKind kind, int part) {}

  /** Curve o + x cos t + y sin t, or o + x t where y is null; uv = a + b t on either side. */
  private record Edge(
      double[] o,
      double[] x,
      double[] y,
      double[] range,
      int[] vertices,
      int[] faces,
      double[][] a,
      double[][] b,
      boolean degenerate) {}

  private final List<Face> faces = new ArrayList<>();
  private final List<Edge> edges = new ArrayList<>();
  private final List<Part> parts = new ArrayList<>();
  private final List<double[]> vertices = new ArrayList<>();

  private final Map<String, Integer> ids = new HashMap<>();
  private final List<Double> xyz = new ArrayList<>();
  private final List<Byte> kind = new ArrayList<>();
  private final List<Integer> entity = new ArrayList<>();
  private final List<Integer> triangles = new ArrayList<>();
  private final List<Integer> triangleFace = new ArrayList<>();
  private final List<Double> cornerUv = new ArrayList<>();
  private final List<Integer> segmentVertices = new ArrayList<>();
  private final List<Integer> segmentEdge = new ArrayList<>();
  private final List<Double> segmentT = new ArrayList<>();

  private int firstFace;
  private int firstEdge;

  /** Sphere with a seam and two poles. */
  public static AnalyticBody sphere(double r, int n) {
    return new AnalyticBody().addSphere(r, 0, 0, 0, n);
  }

  /** Adds a sphere as a part of its own. */
  public AnalyticBody addSphere(double r, double cx, double cy, double cz, int n) {
    double p = Math.PI / 2;
    Surface s =
        (u, v, o) -> {
          double cu = Math.cos(u);
          double su = Math.sin(u);
          double cv = Math.cos(v);
          double sv = Math.sin(v);
          set(o, 0, cx + r * cv * cu, cy + r * cv * su, cz + r * sv);
          set(o, 3, -r * cv * su, r * cv * cu, 0);
          set(o, 6, -r * sv * cu, -r * sv * su, r * cv);
          set(o, 9, -r * cv * cu, -r * cv * su, 0);
          set(o, 12, r * sv * su, -r * sv * cu, 0);
          set(o, 15, -r * cv * cu, -r * cv * su, -r * sv);
        };
    int f = face(s, 1, new double[] {0, 2 * Math.PI, -p, p}, SurfaceKind.SPHERE);
    int south = vertex(cx, cy, cz - r);
    int north = vertex(cx, cy, cz + r);
    int seam =
        seam(
            f,
            new double[] {cx, cy, cz},
            new double[] {r, 0, 0},
            new double[] {0, 0, r},
            new double[] {-p, p},
            new int[] {south, north},
            new double[] {0, 0},
            new double[] {0, 1},
            new double[] {2 * Math.PI, 0});
    pole(f, south, -p);
    pole(f, north, p);
    grid(f, 2 * n, n);
    segments(seam, n);
    return finish(4 * Math.PI * r * r);
  }

  /** Torus with two seams through one vertex. */
  public static AnalyticBody torus(double big, double r, int nu, int nv) {
    AnalyticBody b = new AnalyticBody();
    Surface s =
        (u, v, o) -> {
          double cu = Math.cos(u);
          double su = Math.sin(u);
          double cv = Math.cos(v);
          double sv = Math.sin(v);
          double w = big + r * cv;
          set(o, 0, w * cu, w * su, r * sv);
          set(o, 3, -w * su, w * cu, 0);
          set(o, 6, -r * sv * cu, -r * sv * su, r * cv);
          set(o, 9, -w * cu, -w * su, 0);
          set(o, 12, r * sv * su, -r * sv * cu, 0);
          set(o, 15, -r * cv * cu, -r * cv * su, -r * sv);
        };
    double[] full = {0, 2 * Math.PI};
    int f = b.face(s, 1, new double[] {0, 2 * Math.PI, 0, 2 * Math.PI}, SurfaceKind.TORUS);
    int v = b.vertex(big + r, 0, 0);
    int tube =
        b.seam(
            f,
            new double[] {big, 0, 0},
            new double[] {r, 0, 0},
            new double[] {0, 0, r},
            full,
            new int[] {v, v},
            new double[] {0, 0},
            new double[] {0, 1},
            new double[] {2 * Math.PI, 0});
    int ring =
        b.seam(
            f,
            new double[3],
            new double[] {big + r, 0, 0},
            new double[] {0, big + r, 0},
            full,
            new int[] {v, v},
            new double[] {0, 0},
            new double[] {1, 0},
            new double[] {0, 2 * Math.PI});
    b.grid(f, nu, nv);
    b.segments(tube, nv);
    b.segments(ring, nu);
    return b.finish(4 * Math.PI * Math.PI * big * r);
  }

  /** Cylinder with two flat ends; the ends are fans of slivers, as a display mesh has them. */
  public static AnalyticBody cylinder(double r, double length, int n) {
    AnalyticBody b = new AnalyticBody();
    return b.frustum(r, r, length, n);
  }

  /** Cone with an apex and a flat bottom. */
  public static AnalyticBody cone(double r, double height, int n) {
    AnalyticBody b = new AnalyticBody();
    return b.frustum(r, 0, height, n);
  }

  private AnalyticBody frustum(double r, double top, double height, int n) {
    double slope = (top - r) / height;
    Surface s =
        (u, v, o) -> {
          double cu = Math.cos(u);
          double su = Math.sin(u);
          double w = r + slope * v;
          set(o, 0, w * cu, w * su, v);
          set(o, 3, -w * su, w * cu, 0);
          set(o, 6, slope * cu, slope * su, 1);
          set(o, 9, -w * cu, -w * su, 0);
          set(o, 12, -slope * su, slope * cu, 0);
          set(o, 15, 0, 0, 0);
        };
    boolean apex = top == 0;

    int side =
        face(
            s,
            1,
            new double[] {0, 2 * Math.PI, 0, height},
            apex ? SurfaceKind.CONE : SurfaceKind.CYLINDER);
    int low = vertex(r, 0, 0);
    int high = vertex(top, 0, height);
    int seam =
        seam(
            side,
            new double[] {r, 0, 0},
            new double[] {slope, 0, 1},
            null,
            new double[] {0, height},
            new int[] {low, high},
            new double[] {0, 0},
            new double[] {0, 1},
            new double[] {2 * Math.PI, 0});
    int bottom = face(plane(0), -1, new double[] {-r, r, -r, r}, SurfaceKind.PLANE);
    int rim = circle(r, 0, side, bottom, low);
    int rim2 = -1;
    int lid = -1;
    if (apex) {
      pole(side, high, height);
    } else {
      lid = face(plane(height), 1, new double[] {-r, r, -r, r}, SurfaceKind.PLANE);
      rim2 = circle(top, height, side, lid, high);
    }
    grid(side, n, 1);
    segments(seam, 1);
    segments(rim, n);
    fan(bottom, r, n, true);
    if (!apex) {
      segments(rim2, n);
      fan(lid, top, n, false);
    }
    return finish(2 * Math.PI * r * height);
  }

  private static Surface plane(double z) {
    return (u, v, o) -> {
      Arrays.fill(o, 0);
      set(o, 0, u, v, z);
      set(o, 3, 1, 0, 0);
      set(o, 6, 0, 1, 0);
    };
  }

  private int circle(double r, double z, int side, int flat, int v) {
    edges.add(
        new Edge(
            new double[] {0, 0, z},
            new double[] {r, 0, 0},
            new double[] {0, r, 0},
            new double[] {0, 2 * Math.PI},
            new int[] {v, v},
            new int[] {side, flat},
            new double[][] {{0, z}, null},
            new double[][] {{1, 0}, null},
            false));
    return edges.size() - 1;
  }

  private void fan(int f, double r, int n, boolean reverse) {
    for (int i = 1; i + 1 < n; i++) {
      double[] w = new double[6];
      int[] at = {0, reverse ? i + 1 : i, reverse ? i : i + 1};
      for (int k = 0; k < 3; k++) {
        w[2 * k] = r * Math.cos(2 * Math.PI * at[k] / n);
        w[2 * k + 1] = r * Math.sin(2 * Math.PI * at[k] / n);
      }
      triangle(f, w);
    }
  }

  /** Box with its corner at the origin. */
  public static AnalyticBody box(double a, double b, double c) {
    AnalyticBody body = new AnalyticBody();
    double[] size = {a, b, c};
    for (int i = 0; i < 8; i++) {
      body.vertex((i & 1) * a, (i >> 1 & 1) * b, (i >> 2) * c);
    }
    for (int i = 0; i < 3; i++) {
      int axis = i;
      for (int end = 0; end < 2; end++) {
        int p = (axis + 1) % 3;
        int q = (axis + 2) % 3;
        double level = end * size[axis];
        Surface s =
            (u, v, o) -> {
              Arrays.fill(o, 0);
              o[axis] = level;
              o[p] = u;
              o[q] = v;
              o[3 + p] = 1;
              o[6 + q] = 1;
            };
        body.face(s, end == 1 ? 1 : -1, new double[] {0, size[p], 0, size[q]}, SurfaceKind.PLANE);
      }
    }
    for (int axis = 0; axis < 3; axis++) {
      int p = (axis + 1) % 3;
      int q = (axis + 2) % 3;
      for (int k = 0; k < 4; k++) {
        int from = ((k & 1) << p) | ((k >> 1) << q);
        double[] dir = new double[3];
        dir[axis] = 1;
        // The edge lies on the face of axis p at end k & 1 and on that of axis q at end k >> 1.
        body.edges.add(
            new Edge(
                body.vertices.get(from),
                dir,
                null,
                new double[] {0, size[axis]},
                new int[] {from, from | 1 << axis},
                new int[] {2 * p + (k & 1), 2 * q + (k >> 1)},
                new double[][] {null, null},
                new double[][] {null, null},
                false));
      }
    }
    for (int f = 0; f < 6; f++) {
      body.grid(f, 1, 1);
    }
    for (int e = 0; e < 12; e++) {
      body.segments(e, 1);
    }
    return body.finish(2 * (a * b + b * c + c * a));
  }

  private static void set(double[] o, int at, double x, double y, double z) {
    o[at] = x;
    o[at + 1] = y;
    o[at + 2] = z;
  }

  private int face(Surface s, double sign, double[] bounds, SurfaceKind k) {
    faces.add(new Face(s, sign, bounds, k, parts.size()));
    return faces.size() - 1;
  }

  private int vertex(double x, double y, double z) {
    vertices.add(new double[] {x, y, z});
    return vertices.size() - 1;
  }

  private int seam(
      int f,
      double[] o,
      double[] x,
      double[] y,
      double[] range,
      int[] v,
      double[] a,
      double[] b,
      double[] shift) {
    double[] other = {a[0] + shift[0], a[1] + shift[1]};
    edges.add(
        new Edge(
            o,
            x,
            y,
            range,
            v,
            new int[] {f, f},
            new double[][] {a, other},
            new double[][] {b, b},
            false));
    return edges.size() - 1;
  }

  private void pole(int f, int v, double level) {
    edges.add(
        new Edge(
            vertices.get(v),
            new double[3],
            null,
            new double[] {0, 2 * Math.PI},
            new int[] {v, v},
            new int[] {f, -1},
            new double[][] {{0, level}, null},
            new double[][] {{1, 0}, null},
            true));
  }

  private void grid(int f, int nu, int nv) {
    double[] b = faces.get(f).bounds;
    boolean reverse = faces.get(f).sign < 0;
    for (int i = 0; i < nu; i++) {
      for (int j = 0; j < nv; j++) {
        double u0 = b[0] + (b[1] - b[0]) * i / nu;
        double u1 = b[0] + (b[1] - b[0]) * (i + 1) / nu;
        double v0 = b[2] + (b[3] - b[2]) * j / nv;
        double v1 = b[2] + (b[3] - b[2]) * (j + 1) / nv;
        if (reverse) {
          triangle(f, new double[] {u0, v0, u1, v1, u1, v0});
          triangle(f, new double[] {u0, v0, u0, v1, u1, v1});
        } else {
          triangle(f, new double[] {u0, v0, u1, v0, u1, v1});
          triangle(f, new double[] {u0, v0, u1, v1, u0, v1});
        }
      }
    }
  }

  private void triangle(int f, double[] w) {
    int[] v = new int[3];
    double[] o = new double[18];
    for (int k = 0; k < 3; k++) {
      faces.get(f).surface.at(w[2 * k], w[2 * k + 1], o);
      v[k] = meshVertex(o[0], o[1], o[2], SurfaceMesh.ON_FACE, f);
    }
    if (v[0] == v[1] || v[1] == v[2] || v[2] == v[0]) {
      return;
    }
    triangleFace.add(f);
    for (int k = 0; k < 3; k++) {
      triangles.add(v[k]);
      cornerUv.add(w[2 * k]);
      cornerUv.add(w[2 * k + 1]);
    }
  }

  private int meshVertex(double x, double y, double z, byte k, int e) {
    String key =
        parts.size()
            + ":"
            + Math.round(x * 1e7)
            + ":"
            + Math.round(y * 1e7)
            + ":"
            + Math.round(z * 1e7);
    Integer id = ids.get(key);
    if (id == null) {
      id = kind.size();
      ids.put(key, id);
      xyz.addAll(List.of(x, y, z));
      kind.add(k);
      entity.add(e);
    } else if (k > kind.get(id)) {
      kind.set(id, k);
      entity.set(id, e);
    }
    return id;
  }

  private void segments(int e, int n) {
    Edge edge = edges.get(e);
    double[] out = new double[6];
    int last = -1;
    for (int i = 0; i <= n; i++) {
      double t = edge.range[0] + (edge.range[1] - edge.range[0]) * i / n;
      curve(1, new int[] {e}, new double[] {t}, out);
      int end = i == 0 ? 0 : i == n ? 1 : -1;
      byte k = end < 0 ? SurfaceMesh.ON_EDGE : SurfaceMesh.ON_VERTEX;
      int v = meshVertex(out[0], out[1], out[2], k, end < 0 ? e : edge.vertices[end]);
      if (i > 0) {
        segmentVertices.add(last);
        segmentVertices.add(v);
        segmentEdge.add(e);
        segmentT.add(edge.range[0] + (edge.range[1] - edge.range[0]) * (i - 1) / n);
        segmentT.add(t);
      }
      last = v;
    }
  }

  private AnalyticBody finish(double area) {
    double[] b = new double[6];
    Arrays.fill(b, 0, 3, Double.POSITIVE_INFINITY);
    Arrays.fill(b, 3, 6, Double.NEGATIVE_INFINITY);
    SurfaceMesh m = mesh();
    for (int t = 0; t < m.triangleCount(); t++) {
      if (faces.get(m.triangleFace()[t]).part != parts.size()) {
        continue;
      }
      for (int i = 0; i < 9; i++) {
        double x = m.xyz()[3 * m.triangles()[3 * t + i / 3] + i % 3];
        b[i % 3] = Math.min(b[i % 3], x);
        b[3 + i % 3] = Math.max(b[3 + i % 3], x);
      }
    }
    String name = "part " + (parts.size() + 1);
    parts.add(
        new Part(
            parts.size(),
            name,
            name,
            null,
            firstFace,
            faces.size() - firstFace,
            firstEdge,
            edges.size() - firstEdge,
            b,
            1,
            area));
    firstFace = faces.size();
    firstEdge = edges.size();
    return this;
  }

  /** The coarse first mesh. */
  public SurfaceMesh mesh() {
    byte[] k = new byte[kind.size()];
    for (int i = 0; i < k.length; i++) {
      k[i] = kind.get(i);
    }
    return new SurfaceMesh(
        doubles(xyz),
        ints(triangles),
        ints(triangleFace),
        doubles(cornerUv),
        k,
        ints(entity),
        ints(segmentVertices),
        ints(segmentEdge),
        doubles(segmentT));
  }

  private static double[] doubles(List<Double> list) {
    return list.stream().mapToDouble(Double::doubleValue).toArray();
  }

  private static int[] ints(List<Integer> list) {
    return list.stream().mapToInt(Integer::intValue).toArray();
  }

  @Override
  public List<Part> parts() {
    return parts;
  }

  @Override
  public ExactGeometry geometry() {
    return this;
  }

  @Override
  public Source source() {
    return new Source("analytic", "", "m", "");
  }

  @Override
  public List<String> warnings() {
    return List.of();
  }

  @Override
  public void close() {}

  @Override
  public int faceCount() {
    return faces.size();
  }

  @Override
  public int edgeCount() {
    return edges.size();
  }

  @Override
  public int facePart(int face) {
    return faces.get(face).part;
  }

  @Override
  public SurfaceKind faceKind(int face) {
    return faces.get(face).kind;
  }

  @Override
  public double[] faceBounds(int face) {
    return faces.get(face).bounds.clone();
  }

  @Override
  public double uPeriod(int face) {
    return faces.get(face).kind == SurfaceKind.PLANE ? 0 : 2 * Math.PI;
  }

  @Override
  public double vPeriod(int face) {
    return faces.get(face).kind == SurfaceKind.TORUS ? 2 * Math.PI : 0;
  }

  @Override
  public void surface(int n, int[] face, double[] uv, double[] out) {
    double[] o = new double[18];
    for (int i = 0; i < n; i++) {
      faces.get(face[i]).surface.at(uv[2 * i], uv[2 * i + 1], o);
      System.arraycopy(o, 0, out, 9 * i, 9);
    }
  }

  @Override
  public void curvature(int n, int[] face, double[] uv, double[] out) {
    double[] o = new double[18];
    for (int i = 0; i < n; i++) {
      Face f = faces.get(face[i]);
      double v = uv[2 * i + 1];
      // A little inside at poles and apexes: the limit along the face.
      double inside = 1e-5 * (f.bounds[3] - f.bounds[2]);
      if (f.kind == SurfaceKind.SPHERE || f.kind == SurfaceKind.CONE) {
        v = Math.max(f.bounds[2] + inside, Math.min(f.bounds[3] - inside, v));
      }
      f.surface.at(uv[2 * i], v, o);
      principal(o, f.sign, out, CURVATURE_STRIDE * i);
    }
  }

  private static void principal(double[] o, double sign, double[] out, int at) {
    double[] n = cross(o, 3, o, 6);
    double l = Math.sqrt(dot(n, 0, n, 0));
    for (int k = 0; k < 3; k++) {
      n[k] *= sign / l;
    }
    double e = dot(o, 3, o, 3);
    double f = dot(o, 3, o, 6);
    double g = dot(o, 6, o, 6);
    double ll = -dot(n, 0, o, 9);
    double mm = -dot(n, 0, o, 12);
    double nn = -dot(n, 0, o, 15);
    double det = e * g - f * f;
    double mean = (ll * g - 2 * mm * f + nn * e) / (2 * det);
    double gauss = (ll * nn - mm * mm) / det;
    double root = Math.sqrt(Math.max(0, mean * mean - gauss));
    double k1 = mean + root;
    double k2 = mean - root;
    double a = ll - k1 * e;
    double b = mm - k1 * f;
    double c = nn - k1 * g;
    // Direction (p, q) with the larger of the two equations.
    double p;
    double q;
    if (root <= 1e-9 * Math.abs(mean)) {
      p = 1;
      q = 0;
    } else if (a * a / e >= c * c / g) {
      p = -b;
      q = a;
    } else {
      p = c;
      q = -b;
    }
    double[] d = new double[3];
    for (int k = 0; k < 3; k++) {
      d[k] = p * o[3 + k] + q * o[6 + k];
    }
    double dl = Math.sqrt(dot(d, 0, d, 0));
    if (!(dl > 0)) {
      System.arraycopy(o, 3, d, 0, 3);
      dl = Math.sqrt(dot(d, 0, d, 0));
    }
    for (int k = 0; k < 3; k++) {
      d[k] /= dl;
    }
    double[] d2 = cross(n, 0, d, 0);
    System.arraycopy(n, 0, out, at, 3);
    out[at + 3] = k1;
    out[at + 4] = k2;
    System.arraycopy(d, 0, out, at + 5, 3);
    System.arraycopy(d2, 0, out, at + 8, 3);
  }

  private static double dot(double[] a, int i, double[] b, int j) {
    return a[i] * b[j] + a[i + 1] * b[j + 1] + a[i + 2] * b[j + 2];
  }

  private static double[] cross(double[] a, int i, double[] b, int j) {
    return new double[] {
      a[i + 1] * b[j + 2] - a[i + 2] * b[j + 1],
      a[i + 2] * b[j] - a[i] * b[j + 2],
      a[i] * b[j + 1] - a[i + 1] * b[j]
    };
  }

  @Override
  public void project(int n, int[] face, double[] xyzIn, double[] uv) {
    double[] s = new double[9];
    for (int i = 0; i < n; i++) {
      double[] w = {uv[2 * i], uv[2 * i + 1]};
      for (int step = 0; step < 20; step++) {
        surface(1, new int[] {face[i]}, w, s);
        double[] r = {xyzIn[3 * i] - s[0], xyzIn[3 * i + 1] - s[1], xyzIn[3 * i + 2] - s[2]};
        double e = dot(s, 3, s, 3);
        double f = dot(s, 3, s, 6);
        double g = dot(s, 6, s, 6);
        double ru = dot(r, 0, s, 3);
        double rv = dot(r, 0, s, 6);
        w[0] += (ru * g - rv * f) / (e * g - f * f);
        w[1] += (rv * e - ru * f) / (e * g - f * f);
      }
      System.arraycopy(w, 0, uv, 2 * i, 2);
    }
  }

  @Override
  public double[] edgeRange(int edge) {
    return edges.get(edge).range.clone();
  }

  @Override
  public boolean edgeDegenerate(int edge) {
    return edges.get(edge).degenerate;
  }

  @Override
  public int[] edgeVertices(int edge) {
    return edges.get(edge).vertices.clone();
  }

  @Override
  public int[] edgeFaces(int edge) {
    return edges.get(edge).faces.clone();
  }

  @Override
  public void curve(int n, int[] edge, double[] t, double[] out) {
    for (int i = 0; i < n; i++) {
      Edge e = edges.get(edge[i]);
      for (int k = 0; k < 3; k++) {
        if (e.y == null) {
          out[6 * i + k] = e.o[k] + e.x[k] * t[i];
          out[6 * i + 3 + k] = e.x[k];
        } else {
          out[6 * i + k] = e.o[k] + e.x[k] * Math.cos(t[i]) + e.y[k] * Math.sin(t[i]);
          out[6 * i + 3 + k] = -e.x[k] * Math.sin(t[i]) + e.y[k] * Math.cos(t[i]);
        }
      }
    }
  }

  @Override
  public void edgeUv(int edge, int side, int n, double[] t, double[] uv) {
    Edge e = edges.get(edge);
    double[] c = new double[6];
    for (int i = 0; i < n; i++) {
      if (e.a[side] != null) {
        uv[2 * i] = e.a[side][0] + e.b[side][0] * t[i];
        uv[2 * i + 1] = e.a[side][1] + e.b[side][1] * t[i];
        continue;
      }
      // Planes: the parameters are two of the coordinates, found from the derivatives.
      curve(1, new int[] {edge}, new double[] {t[i]}, c);
      double[] s = new double[18];
      faces.get(e.faces[side]).surface.at(0, 0, s);
      uv[2 * i] = dot(c, 0, s, 3);
      uv[2 * i + 1] = dot(c, 0, s, 6);
    }
  }
}
