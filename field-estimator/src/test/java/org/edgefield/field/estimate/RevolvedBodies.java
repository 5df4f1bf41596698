package org.edgefield.field.estimate;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import org.edgefield.curvature.EdgeFeature;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.EdgesAsMade;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.brep.SurfaceKind;
import org.edgefield.importer.mesh.SurfaceMesh;

/** Smooth bodies of revolution about z with exact nodes, each a part of one face; no CAD edges. */
final class RevolvedBodies {
  private final int around;
  private final int refine;

  private final List<double[]> xyz = new ArrayList<>();
  private final List<double[]> normals = new ArrayList<>();
  private final List<double[]> curvatures = new ArrayList<>();
  private final List<double[]> directions = new ArrayList<>();
  private final List<int[]> triangles = new ArrayList<>();
  private final List<Integer> triangleFace = new ArrayList<>();
  private final List<Part> parts = new ArrayList<>();

  RevolvedBodies() {
    this(32, 1);
  }

  /**
   * With another mesh.
   *
   * @param around points around the axis
   * @param refine factor on the points along the meridian
   */
  RevolvedBodies(int around, int refine) {
    this.around = around;
    this.refine = refine;
  }

  /** Point of a meridian: r, z, outward normal (r, z), curvatures along and around. */
  interface Meridian {
    double[] at(double u);
  }

  /** An ellipsoid of revolution, semi-axes a along z and b across; a shell's inside if hollow. */
  RevolvedBodies ellipsoid(double z0, double a, double b, boolean hollow) {
    double sign = hollow ? -1 : 1;
    return revolve(
        u -> {
          double s = Math.sin(Math.PI * u);
          double c = Math.cos(Math.PI * u);
          double h = Math.sqrt(b * b * c * c + a * a * s * s);
          double meridional = a * b / (h * h * h);
          double azimuthal = a / (b * h);
          return new double[] {
            b * s,
            z0 + a * c,
            sign * a * s / h,
            sign * b * c / h,
            sign * meridional,
            sign * azimuthal
          };
        },
        48,
        false,
        hollow);
  }

  /** A sphere. */
  RevolvedBodies sphere(double z0, double r) {
    return ellipsoid(z0, r, r, false);
  }

  /** A rod along z from its hemispherical tip at z0 upwards, rounded at both ends. */
  RevolvedBodies rod(double z0, double radius, double length) {
    double side = length - 2 * radius;
    double cap = 0.2;
    return revolve(
        u -> {
          // From the top pole down to the tip.
          if (u < cap || u > 1 - cap) {
            boolean top = u < cap;
            double angle = top ? u / cap * Math.PI / 2 : Math.PI - (1 - u) / cap * Math.PI / 2;
            double centre = top ? z0 + length - radius : z0 + radius;
            return new double[] {
              radius * Math.sin(angle),
              centre + radius * Math.cos(angle),
              Math.sin(angle),
              Math.cos(angle),
              1 / radius,
              1 / radius
            };
          }
          double z = z0 + length - radius - side * (u - cap) / (1 - 2 * cap);
          return new double[] {radius, z, 1, 0, 0, 1 / radius};
        },
        60,
        false,
        false);
  }

  /** A torus around z. */
  RevolvedBodies torus(double big, double small) {
    return revolve(
        u -> {
          double c = Math.cos(2 * Math.PI * u);
          double s = Math.sin(2 * Math.PI * u);
          double r = big + small * c;
          return new double[] {r, -small * s, c, -s, 1 / small, c / r};
        },
        48,
        true,
        false);
  }

  private RevolvedBodies revolve(Meridian meridian, int sections, boolean closed, boolean flip) {
    int rows = sections * refine;
    int first = xyz.size();
    int face = parts.size();
    int[][] ring = new int[rows + 1][around];
    double[] bounds = {1e300, 1e300, 1e300, -1e300, -1e300, -1e300};
    for (int i = 0; i <= rows; i++) {
      double[] m = meridian.at(i / (double) rows);
      boolean pole = !closed && (i == 0 || i == rows);
      for (int j = 0; j < around; j++) {
        if (closed && i == rows) {
          ring[i][j] = ring[0][j];
          continue;
        }
        if (pole && j > 0) {
          ring[i][j] = ring[i][0];
          continue;
        }
        double phi = 2 * Math.PI * j / around;
        double c = Math.cos(phi);
        double s = Math.sin(phi);
        double r = pole ? 0 : m[0];
        double nr = pole ? 0 : m[2];
        ring[i][j] = xyz.size();
        xyz.add(new double[] {r * c, r * s, m[1]});
        normals.add(
            pole ? new double[] {0, 0, Math.signum(m[3])} : new double[] {nr * c, nr * s, m[3]});
        boolean meridional = m[4] >= m[5];
        curvatures.add(new double[] {Math.max(m[4], m[5]), Math.min(m[4], m[5])});
        directions.add(
            meridional ? new double[] {m[3] * c, m[3] * s, -nr} : new double[] {-s, c, 0});
        for (int k = 0; k < 3; k++) {
          bounds[k] = Math.min(bounds[k], xyz.get(ring[i][j])[k]);
          bounds[k + 3] = Math.max(bounds[k + 3], xyz.get(ring[i][j])[k]);
        }
      }
    }
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < around; j++) {
        int a = ring[i][j];
        int b = ring[i + 1][j];
        int c = ring[i + 1][(j + 1) % around];
        int d = ring[i][(j + 1) % around];
        add(a, b, c, face, flip);
        add(a, c, d, face, flip);
      }
    }
    if (xyz.size() == first) {
      throw new IllegalStateException("no points");
    }
    parts.add(new Part(face, "body " + face, "body " + face, null, face, 1, 0, 0, bounds, 1, 1));
    return this;
  }

  private void add(int a, int b, int c, int face, boolean flip) {
    if (a != b && b != c && c != a) {
      triangles.add(flip ? new int[] {a, c, b} : new int[] {a, b, c});
      triangleFace.add(face);
    }
  }

  SurfaceMesh mesh() {
    int n = xyz.size();
    int[] t = triangles.stream().flatMapToInt(Arrays::stream).toArray();
    return new SurfaceMesh(
        flat(xyz),
        t,
        triangleFace.stream().mapToInt(Integer::intValue).toArray(),
        new double[2 * t.length],
        new byte[n],
        new int[n],
        new int[0],
        new int[0],
        new double[0]);
  }

  SurfaceNodes nodes() {
    int n = xyz.size();
    int[] identity = new int[n];
    Arrays.setAll(identity, i -> i);
    return new SurfaceNodes(
        triangles.stream().flatMapToInt(Arrays::stream).toArray(),
        identity,
        new int[n],
        new int[parts.size()],
        flat(normals),
        curvatures.stream().mapToDouble(k -> k[0]).toArray(),
        curvatures.stream().mapToDouble(k -> k[1]).toArray(),
        flat(directions));
  }

  private static double[] flat(List<double[]> list) {
    return list.stream().flatMapToDouble(Arrays::stream).toArray();
  }

  /** Nodes of a body lie at or after this index and before the next body's. */
  int[] nodesOf(int body) {
    return triangleFace.isEmpty()
        ? new int[0]
        : java.util.stream.IntStream.range(0, triangles.size())
            .filter(i -> triangleFace.get(i) == body)
            .flatMap(i -> Arrays.stream(triangles.get(i)))
            .distinct()
            .sorted()
            .toArray();
  }

  Features features() {
    return new Plain();
  }

  Assembly assembly() {
    return new Bodies(List.copyOf(parts));
  }

  /** A case: one electrode per body. */
  static FieldCase fieldCase(
      double[] volts, boolean[] earth, Surroundings.EarthPlane plane, double[] ambient) {
    List<Electrode> electrodes = new ArrayList<>();
    for (int i = 0; i < volts.length; i++) {
      electrodes.add(
          new Electrode(
              "e" + i, new int[] {i}, earth[i] ? Electrode.Kind.EARTH : Electrode.Kind.LIVE));
    }
    return new FieldCase(
        electrodes,
        List.of(),
        new Surroundings("air", 101_325, 293.15, Double.NaN, Double.NaN, plane, ambient),
        new EdgesAsMade(3e-4, Map.of()),
        List.of(new Duty("test", volts, new double[volts.length])),
        new Permitted(Permitted.Criterion.FIXED, 3e6, 1, 0.8, 1));
  }

  private record Bodies(List<Part> parts) implements Assembly {
    @Override
    public ExactGeometry geometry() {
      return new OneFacePerPart(parts.size());
    }

    @Override
    public Source source() {
      return new Source("test", "", "m", "");
    }

    @Override
    public List<String> warnings() {
      return List.of();
    }

    @Override
    public void close() {}
  }

  private record OneFacePerPart(int faceCount) implements ExactGeometry {
    @Override
    public int edgeCount() {
      return 0;
    }

    @Override
    public int facePart(int face) {
      return face;
    }

    @Override
    public SurfaceKind faceKind(int face) {
      return SurfaceKind.OTHER;
    }

    @Override
    public double[] faceBounds(int face) {
      throw new UnsupportedOperationException();
    }

    @Override
    public double uPeriod(int face) {
      return 0;
    }

    @Override
    public double vPeriod(int face) {
      return 0;
    }

    @Override
    public void surface(int n, int[] face, double[] uv, double[] out) {
      throw new UnsupportedOperationException();
    }

    @Override
    public void curvature(int n, int[] face, double[] uv, double[] out) {
      throw new UnsupportedOperationException();
    }

    @Override
    public void project(int n, int[] face, double[] xyz, double[] uv) {
      throw new UnsupportedOperationException();
    }

    @Override
    public double[] edgeRange(int edge) {
      throw new UnsupportedOperationException();
    }

    @Override
    public boolean edgeDegenerate(int edge) {
      throw new UnsupportedOperationException();
    }

    @Override
    public int[] edgeVertices(int edge) {
      throw new UnsupportedOperationException();
    }

    @Override
    public int[] edgeFaces(int edge) {
      throw new UnsupportedOperationException();
    }

    @Override
    public void curve(int n, int[] edge, double[] t, double[] out) {
      throw new UnsupportedOperationException();
    }

    @Override
    public void edgeUv(int edge, int side, int n, double[] t, double[] uv) {
      throw new UnsupportedOperationException();
    }
  }

  private static final class Plain implements Features {
    @Override
    public EdgeFeature edge(int edge) {
      throw new UnsupportedOperationException();
    }

    @Override
    public boolean isCorner(int cadVertex) {
      return false;
    }

    @Override
    public RoundedEdge roundedEdge(int face) {
      return null;
    }

    @Override
    public String faceName(int face) {
      return "face " + face;
    }

    @Override
    public String edgeName(int edge) {
      throw new UnsupportedOperationException();
    }

    @Override
    public String vertexName(int cadVertex) {
      throw new UnsupportedOperationException();
    }
  }
}
