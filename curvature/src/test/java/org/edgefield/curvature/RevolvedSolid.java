package org.edgefield.curvature;

import java.util.ArrayList;
import java.util.List;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.SurfaceKind;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * A solid of revolution about z with a profile of lines and arcs, evaluated in closed form: an
 * exact geometry that needs no kernel.
 *
 * <p>The profile runs with the solid on its left in the (r, z) half-plane, from axis to axis or
 * closed. Each piece is one face with parameters u = angle, v = 0 to 1 along the piece. Curvatures
 * of a surface of revolution: along the meridian that of the profile, around it n_r / r (any book
 * on differential geometry).
 */
public final class RevolvedSolid implements ExactGeometry {
  private record Piece(double r0, double z0, double r1, double z1, double turn, SurfaceKind kind) {
    /** Length of the chord. */
    double chord() {
      return Math.hypot(r1 - r0, z1 - z0);
    }

    /** Signed curvature of the profile, positive where it turns left (convex). */
    double curvature() {
      return turn == 0 ? 0 : 2 * Math.sin(0.5 * turn) / chord();
    }

    /** Direction of the tangent at v. */
    double heading(double v) {
      return Math.atan2(z1 - z0, r1 - r0) + (v - 0.5) * turn;
    }

    double[] at(double v) {
      if (turn == 0) {
        return new double[] {r0 + v * (r1 - r0), z0 + v * (z1 - z0)};
      }
      double k = curvature();
      double h0 = heading(0);
      double h = heading(v);
      // Snaps the end, so that an end on the axis stays there.
      return v == 1
          ? new double[] {r1, z1}
          : new double[] {
            r0 + (Math.sin(h) - Math.sin(h0)) / k, z0 - (Math.cos(h) - Math.cos(h0)) / k
          };
    }

    double speed() {
      return turn == 0 ? chord() : turn / curvature();
    }
  }

  private final List<Piece> pieces = new ArrayList<>();
  private double r;
  private double z;
  private boolean closed;

  /** Starts the profile. */
  public RevolvedSolid(double r, double z) {
    this.r = r;
    this.z = z;
  }

  /** Straight piece to a point. */
  public RevolvedSolid line(double toR, double toZ) {
    SurfaceKind kind =
        toZ == z ? SurfaceKind.PLANE : toR == r ? SurfaceKind.CYLINDER : SurfaceKind.CONE;
    return add(toR, toZ, 0, kind);
  }

  /** Arc to a point, turning left by an angle (right where negative). */
  public RevolvedSolid arc(double toR, double toZ, double turn, SurfaceKind kind) {
    return add(toR, toZ, turn, kind);
  }

  private RevolvedSolid add(double toR, double toZ, double turn, SurfaceKind kind) {
    pieces.add(new Piece(r, z, toR, toZ, turn, kind));
    r = toR;
    z = toZ;
    return this;
  }

  /** Marks the profile as closed: its end is its start. */
  public RevolvedSolid close() {
    closed = true;
    return this;
  }

  private int joints() {
    return closed ? pieces.size() : pieces.size() + 1;
  }

  private boolean onAxis(int joint) {
    Piece p = pieces.get(joint % pieces.size());
    return !closed && (joint == 0 ? p.r0 : pieces.get(joint - 1).r1) == 0;
  }

  private int jointOf(int piece, int end) {
    return (piece + end) % joints();
  }

  // Edges: the joints' circles first, then the seams of the pieces.

  @Override
  public int faceCount() {
    return pieces.size();
  }

  @Override
  public int edgeCount() {
    return joints() + pieces.size();
  }

  @Override
  public int facePart(int face) {
    return 0;
  }

  @Override
  public SurfaceKind faceKind(int face) {
    return pieces.get(face).kind;
  }

  @Override
  public double[] faceBounds(int face) {
    return new double[] {0, 2 * Math.PI, 0, 1};
  }

  @Override
  public double uPeriod(int face) {
    return 2 * Math.PI;
  }

  @Override
  public double vPeriod(int face) {
    return 0;
  }

  @Override
  public void surface(int n, int[] face, double[] uv, double[] out) {
    for (int i = 0; i < n; i++) {
      Piece p = pieces.get(face[i]);
      double[] x = p.at(uv[2 * i + 1]);
      double h = p.heading(uv[2 * i + 1]);
      double c = Math.cos(uv[2 * i]);
      double s = Math.sin(uv[2 * i]);
      double dr = p.speed() * Math.cos(h);
      double dz = p.speed() * Math.sin(h);
      double[] row = {
        x[0] * c, x[0] * s, x[1], -x[0] * s, x[0] * c, 0, dr * c, dr * s, dz,
      };
      System.arraycopy(row, 0, out, 9 * i, 9);
    }
  }

  @Override
  public void curvature(int n, int[] face, double[] uv, double[] out) {
    for (int i = 0; i < n; i++) {
      Piece p = pieces.get(face[i]);
      double v = uv[2 * i + 1];
      double radius = p.at(v)[0];
      double h = p.heading(v);
      double c = Math.cos(uv[2 * i]);
      double s = Math.sin(uv[2 * i]);
      double nr = Math.sin(h);
      double nz = -Math.cos(h);
      double meridian = p.curvature();
      double parallel;
      if (radius > 1e-12) {
        parallel = nr / radius;
      } else {
        parallel = Math.abs(nr) < 1e-9 ? meridian : nr * 1e9;
      }
      double[] along = {Math.cos(h) * c, Math.cos(h) * s, Math.sin(h)};
      double[] around = {-s, c, 0};
      boolean first = meridian >= parallel;
      int at = CURVATURE_STRIDE * i;
      out[at] = nr * c;
      out[at + 1] = nr * s;
      out[at + 2] = nz;
      out[at + 3] = Math.max(meridian, parallel);
      out[at + 4] = Math.min(meridian, parallel);
      System.arraycopy(first ? along : around, 0, out, at + 5, 3);
      System.arraycopy(first ? around : along, 0, out, at + 8, 3);
    }
  }

  @Override
  public void project(int n, int[] face, double[] xyz, double[] uv) {
    throw new UnsupportedOperationException();
  }

  @Override
  public double[] edgeRange(int edge) {
    return edge < joints() ? new double[] {0, 2 * Math.PI} : new double[] {0, 1};
  }

  @Override
  public boolean edgeDegenerate(int edge) {
    return edge < joints() && onAxis(edge);
  }

  @Override
  public int[] edgeVertices(int edge) {
    if (edge < joints()) {
      return new int[] {edge, edge};
    }
    int p = edge - joints();
    return new int[] {jointOf(p, 0), jointOf(p, 1)};
  }

  @Override
  public int[] edgeFaces(int edge) {
    if (edge >= joints()) {
      return new int[] {edge - joints(), edge - joints()};
    }
    int n = pieces.size();
    if (onAxis(edge)) {
      int f = edge == 0 ? 0 : n - 1;
      return new int[] {f, f};
    }
    return new int[] {(edge + n - 1) % n, edge % n};
  }

  @Override
  public void curve(int n, int[] edge, double[] t, double[] out) {
    for (int i = 0; i < n; i++) {
      boolean circle = edge[i] < joints();
      int face = circle ? Math.min(edge[i], pieces.size() - 1) : edge[i] - joints();
      double v = circle ? (edge[i] < pieces.size() ? 0 : 1) : t[i];
      double[] s = new double[9];
      surface(1, new int[] {face}, new double[] {circle ? t[i] : 0, v}, s);
      System.arraycopy(s, 0, out, 6 * i, 3);
      System.arraycopy(s, circle ? 3 : 6, out, 6 * i + 3, 3);
    }
  }

  @Override
  public void edgeUv(int edge, int side, int n, double[] t, double[] uv) {
    for (int i = 0; i < n; i++) {
      if (edge < joints()) {
        uv[2 * i] = t[i];
        uv[2 * i + 1] = onAxis(edge) ? (edge == 0 ? 0 : 1) : 1 - side;
      } else {
        uv[2 * i] = side * 2 * Math.PI;
        uv[2 * i + 1] = t[i];
      }
    }
  }

  /**
   * A structured mesh.
   *
   * @param around triangles' columns around the axis
   * @param along rows per piece
   */
  public SurfaceMesh mesh(int around, int along) {
    List<double[]> xyz = new ArrayList<>();
    List<Integer> kind = new ArrayList<>();
    List<Integer> entity = new ArrayList<>();
    List<int[]> triangles = new ArrayList<>();
    List<Integer> faces = new ArrayList<>();
    List<double[]> uv = new ArrayList<>();
    List<int[]> segments = new ArrayList<>();
    List<double[]> segmentT = new ArrayList<>();
    int[][] circle = new int[joints()][around + 1];
    for (int j = 0; j < joints(); j++) {
      for (int i = 0; i < around; i++) {
        if (i > 0 && onAxis(j)) {
          circle[j][i] = circle[j][0];
          continue;
        }
        double[] x = new double[6];
        double t = 2 * Math.PI * i / around;
        curve(1, new int[] {j}, new double[] {t}, x);
        circle[j][i] = xyz.size();
        xyz.add(new double[] {x[0], x[1], x[2]});
        kind.add((int) (i == 0 ? SurfaceMesh.ON_VERTEX : SurfaceMesh.ON_EDGE));
        entity.add(j);
      }
      circle[j][around] = circle[j][0];
      for (int i = 0; i < around && !onAxis(j); i++) {
        segments.add(new int[] {circle[j][i], circle[j][i + 1], j});
        segmentT.add(new double[] {2 * Math.PI * i / around, 2 * Math.PI * (i + 1) / around});
      }
    }
    for (int f = 0; f < pieces.size(); f++) {
      int[] below = circle[jointOf(f, 0)];
      for (int row = 1; row <= along; row++) {
        int[] above = new int[around + 1];
        if (row == along) {
          above = circle[jointOf(f, 1)];
        } else {
          for (int i = 0; i < around; i++) {
            double[] s = new double[9];
            double u = 2 * Math.PI * i / around;
            surface(1, new int[] {f}, new double[] {u, (double) row / along}, s);
            above[i] = xyz.size();
            xyz.add(new double[] {s[0], s[1], s[2]});
            kind.add((int) (i == 0 ? SurfaceMesh.ON_EDGE : SurfaceMesh.ON_FACE));
            entity.add(i == 0 ? joints() + f : f);
          }
          above[around] = above[0];
        }
        segments.add(new int[] {below[0], above[0], joints() + f});
        segmentT.add(new double[] {(row - 1.0) / along, (double) row / along});
        for (int i = 0; i < around; i++) {
          double u0 = 2 * Math.PI * i / around;
          double u1 = 2 * Math.PI * (i + 1) / around;
          double v0 = (row - 1.0) / along;
          double v1 = (double) row / along;
          if (below[i] != below[i + 1]) {
            triangles.add(new int[] {below[i], below[i + 1], above[i + 1]});
            uv.add(new double[] {u0, v0, u1, v0, u1, v1});
            faces.add(f);
          }
          if (above[i] != above[i + 1]) {
            triangles.add(new int[] {below[i], above[i + 1], above[i]});
            uv.add(new double[] {u0, v0, u1, v1, u0, v1});
            faces.add(f);
          }
        }
        below = above;
      }
    }
    byte[] kinds = new byte[kind.size()];
    for (int i = 0; i < kinds.length; i++) {
      kinds[i] = kind.get(i).byteValue();
    }
    return new SurfaceMesh(
        xyz.stream().flatMapToDouble(java.util.Arrays::stream).toArray(),
        triangles.stream().flatMapToInt(java.util.Arrays::stream).toArray(),
        faces.stream().mapToInt(Integer::intValue).toArray(),
        uv.stream().flatMapToDouble(java.util.Arrays::stream).toArray(),
        kinds,
        entity.stream().mapToInt(Integer::intValue).toArray(),
        segments.stream().flatMapToInt(s -> java.util.Arrays.stream(s, 0, 2)).toArray(),
        segments.stream().mapToInt(s -> s[2]).toArray(),
        segmentT.stream().flatMapToDouble(java.util.Arrays::stream).toArray());
  }
}
