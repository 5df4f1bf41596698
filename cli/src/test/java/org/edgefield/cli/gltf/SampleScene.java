package org.edgefield.cli.gltf;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.IntStream;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.EdgesAsMade;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;
import org.edgefield.field.result.DutyField;
import org.edgefield.field.result.DutyResult;
import org.edgefield.field.result.FieldResult;
import org.edgefield.field.result.HotSpot;
import org.edgefield.field.result.Law;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Made-up bodies with made-up fields, meshed here: what the writer sees, without a kernel or an
 * estimate. Boxes have sharp edges with values as made, balls are smooth.
 */
final class SampleScene {
  private static final double PERMITTED = 3e6;
  private static final double AMBER = 0.8;

  private final List<Part> parts = new ArrayList<>();
  private final List<double[]> xyz = new ArrayList<>();
  private final List<Byte> kind = new ArrayList<>();
  private final List<int[]> triangles = new ArrayList<>();
  private final List<Integer> triangleFace = new ArrayList<>();
  private final List<int[]> segments = new ArrayList<>();
  private final List<Integer> nodeVertex = new ArrayList<>();
  private final List<Integer> nodePatch = new ArrayList<>();
  private final List<double[]> normal = new ArrayList<>();
  private final List<int[]> corners = new ArrayList<>();
  private final List<Boolean> nodeOnEdge = new ArrayList<>();
  private final List<Electrode> electrodes = new ArrayList<>();
  private final List<Integer> ignored = new ArrayList<>();
  private final List<String> duties = new ArrayList<>();
  private final List<int[]> pins = new ArrayList<>();
  private final List<Double> levels = new ArrayList<>();
  private int faces;

  /** A ball; {@code rings} bands of triangles from pole to pole. */
  SampleScene ball(String name, double x, double y, double z, double radius, int rings) {
    int around = 2 * rings;
    int face = faces++;
    int[][] id = new int[rings + 1][around];
    for (int i = 0; i <= rings; i++) {
      double theta = Math.PI * i / rings;
      for (int j = 0; j < around; j++) {
        if ((i == 0 || i == rings) && j > 0) {
          id[i][j] = id[i][0];
          continue;
        }
        double phi = 2 * Math.PI * j / around;
        double[] n = {
          Math.sin(theta) * Math.cos(phi), Math.sin(theta) * Math.sin(phi), Math.cos(theta)
        };
        id[i][j] =
            node(vertex(x + radius * n[0], y + radius * n[1], z + radius * n[2], false), n, face);
      }
    }
    for (int i = 0; i < rings; i++) {
      for (int j = 0; j < around; j++) {
        int k = (j + 1) % around;
        if (i > 0) {
          triangle(id[i][j], id[i + 1][j], id[i][k], face);
        }
        if (i < rings - 1) {
          triangle(id[i][k], id[i + 1][j], id[i + 1][k], face);
        }
      }
    }
    double r = radius;
    part(
        name,
        new double[] {x - r, y - r, z - r, x + r, y + r, z + r},
        face,
        1,
        4.0 / 3 * Math.PI * r * r * r,
        4 * Math.PI * r * r);
    return this;
  }

  /** A box with sharp edges, each face {@code n} by {@code n} cells. */
  SampleScene box(String name, double[] low, double[] high, int n) {
    int firstFace = faces;
    shell(low, high, n, 1);
    double dx = high[0] - low[0];
    double dy = high[1] - low[1];
    double dz = high[2] - low[2];
    part(
        name,
        new double[] {low[0], low[1], low[2], high[0], high[1], high[2]},
        firstFace,
        6,
        dx * dy * dz,
        2 * (dx * dy + dy * dz + dz * dx));
    return this;
  }

  /** A closed housing: a box with a box-shaped void. */
  SampleScene housing(String name, double[] low, double[] high, double wall, int n) {
    int firstFace = faces;
    shell(low, high, n, 1);
    double[] innerLow = {low[0] + wall, low[1] + wall, low[2] + wall};
    double[] innerHigh = {high[0] - wall, high[1] - wall, high[2] - wall};
    shell(innerLow, innerHigh, n, -1);
    double area = 0;
    for (int c = 0; c < 3; c++) {
      area += 4 * (high[c] - low[c]) * (high[(c + 1) % 3] - low[(c + 1) % 3]);
    }
    part(
        name,
        new double[] {low[0], low[1], low[2], high[0], high[1], high[2]},
        firstFace,
        12,
        area / 2 * wall,
        area);
    return this;
  }

  /** One triangle as a part of its own. */
  SampleScene lone(String name) {
    int face = faces++;
    double[] n = {0, 0, 1};
    int a = node(vertex(0, 0, 0, false), n, face);
    int b = node(vertex(1, 0, 0, false), n, face);
    int c = node(vertex(0, 1, 0, false), n, face);
    triangle(a, b, c, face);
    part(name, new double[] {0, 0, 0, 1, 1, 0}, face, 1, 0.1, 1);
    return this;
  }

  /** Makes the parts with these indices an electrode. */
  SampleScene electrode(String name, Electrode.Kind kind, int... indices) {
    electrodes.add(new Electrode(name, indices, kind));
    return this;
  }

  /** Makes a part ignored. */
  SampleScene ignore(int part) {
    ignored.add(part);
    return this;
  }

  /**
   * Adds a duty whose utilisation has its top {@code level}.
   *
   * @param pinNodes share of the nodes at which pins stand, per mille
   */
  SampleScene duty(String name, double level, int... pinNodes) {
    duties.add(name);
    levels.add(level);
    pins.add(pinNodes);
    return this;
  }

  private void shell(double[] low, double[] high, int n, int outward) {
    int firstFace = faces;
    faces += 6;
    Map<String, Integer> known = new HashMap<>();
    Set<String> drawn = new HashSet<>();
    for (int f = 0; f < 6; f++) {
      int axis = f / 2;
      boolean top = f % 2 == 1;
      int face = firstFace + f;
      double[] normalOut = new double[3];
      normalOut[axis] = (top ? 1 : -1) * outward;
      int[][] id = new int[n + 1][n + 1];
      int[][] at = new int[n + 1][n + 1];
      for (int i = 0; i <= n; i++) {
        for (int j = 0; j <= n; j++) {
          int[] step = new int[3];
          step[axis] = top ? n : 0;
          step[(axis + 1) % 3] = i;
          step[(axis + 2) % 3] = j;
          boolean rim = i == 0 || j == 0 || i == n || j == n;
          String key = step[0] + "/" + step[1] + "/" + step[2];
          at[i][j] =
              known.computeIfAbsent(
                  key,
                  k ->
                      vertex(
                          low[0] + (high[0] - low[0]) * step[0] / n,
                          low[1] + (high[1] - low[1]) * step[1] / n,
                          low[2] + (high[2] - low[2]) * step[2] / n,
                          rim));
          id[i][j] = node(at[i][j], normalOut, face);
          nodeOnEdge.set(id[i][j], rim && outward > 0);
        }
      }
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          int[] q = {id[i][j], id[i + 1][j], id[i + 1][j + 1], id[i][j + 1]};
          if (top == outward > 0) {
            triangle(q[0], q[1], q[2], face);
            triangle(q[0], q[2], q[3], face);
          } else {
            triangle(q[0], q[2], q[1], face);
            triangle(q[0], q[3], q[2], face);
          }
        }
      }
      for (int i = 0; i < n; i++) {
        int[][] rims = {
          {at[i][0], at[i + 1][0]},
          {at[i][n], at[i + 1][n]},
          {at[0][i], at[0][i + 1]},
          {at[n][i], at[n][i + 1]}
        };
        for (int[] r : rims) {
          if (drawn.add(Math.min(r[0], r[1]) + "-" + Math.max(r[0], r[1]))) {
            segments.add(r);
          }
        }
      }
    }
  }

  private int vertex(double x, double y, double z, boolean onEdge) {
    xyz.add(new double[] {x, y, z});
    kind.add(onEdge ? SurfaceMesh.ON_EDGE : SurfaceMesh.ON_FACE);
    return xyz.size() - 1;
  }

  private int node(int vertex, double[] n, int patch) {
    nodeVertex.add(vertex);
    nodePatch.add(patch);
    normal.add(n);
    nodeOnEdge.add(false);
    return nodeVertex.size() - 1;
  }

  private void triangle(int a, int b, int c, int face) {
    corners.add(new int[] {a, b, c});
    triangles.add(new int[] {nodeVertex.get(a), nodeVertex.get(b), nodeVertex.get(c)});
    triangleFace.add(face);
  }

  private void part(
      String name, double[] bounds, int firstFace, int faceCount, double volume, double area) {
    int index = parts.size();
    parts.add(
        new Part(
            index,
            name,
            "Assembly/" + index + "/" + name,
            null,
            firstFace,
            faceCount,
            0,
            0,
            bounds,
            volume,
            area));
  }

  /** The case. */
  FieldCase job() {
    List<Duty> list = new ArrayList<>();
    for (String name : duties) {
      double[] real = new double[electrodes.size()];
      for (int e = 0; e < real.length; e++) {
        real[e] = electrodes.get(e).kind() == Electrode.Kind.LIVE ? 70.7e3 : 0;
      }
      list.add(new Duty(name, real, new double[real.length]));
    }
    return new FieldCase(
        electrodes,
        ignored,
        new Surroundings("air", 87_500, 313.15, Double.NaN, 1200, null, null),
        new EdgesAsMade(3e-4, Map.of()),
        list,
        new Permitted(Permitted.Criterion.FIXED, PERMITTED, 1, AMBER, 1));
  }

  /** The model. */
  Assembly assembly() {
    return new Sample(List.copyOf(parts));
  }

  private record Sample(List<Part> parts) implements Assembly {
    @Override
    public ExactGeometry geometry() {
      throw new UnsupportedOperationException("the writer needs no exact geometry");
    }

    @Override
    public Source source() {
      return new Source("sämple.step", "0".repeat(64), "mm", "AP214");
    }

    @Override
    public List<String> warnings() {
      return List.of();
    }

    @Override
    public void close() {}
  }

  /** The outcome: utilisation rises along x and over the top of each body, edges twice that. */
  FieldResult result() {
    int nodes = nodeVertex.size();
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (double[] p : xyz) {
      low = Math.min(low, p[0]);
      high = Math.max(high, p[0]);
    }
    boolean[] dead = new boolean[nodes];
    ignored.forEach(p -> mark(p, dead));
    boolean[] earthed = new boolean[nodes];
    for (Electrode e : electrodes) {
      if (e.kind() == Electrode.Kind.EARTH) {
        Arrays.stream(e.parts()).forEach(p -> mark(p, earthed));
      }
    }
    List<DutyResult> results = new ArrayList<>();
    for (int d = 0; d < duties.size(); d++) {
      double[] field = new double[nodes];
      double[] permitted = new double[nodes];
      byte[] law = new byte[nodes];
      for (int n = 0; n < nodes; n++) {
        double[] p = xyz.get(nodeVertex.get(n));
        double along = (p[0] - low) / (high - low);
        double[] m = normal.get(n);
        double part = earthed[n] ? 0.3 : 1;
        double u =
            part * 0.45 * along * (1.2 + m[2] - 0.6 * m[1] + (d % 2 == 0 ? 0.5 : -0.5) * m[0]);
        if (nodeOnEdge.get(n)) {
          u = part * (0.2 + 0.8 * along);
          law[n] = 2;
        }
        field[n] = dead[n] ? 0 : Math.max(0, u) * levels.get(d) * PERMITTED;
        permitted[n] = PERMITTED;
      }
      List<HotSpot> spots = new ArrayList<>();
      int peak = 0;
      for (int n = 0; n < nodes; n++) {
        peak = field[n] > field[peak] ? n : peak;
      }
      for (int share : pins.get(d)) {
        spots.add(spot(spots.size() + 1, (int) ((nodes - 1) * (long) share / 1000), field));
      }
      double[] none = new double[nodes];
      results.add(
          new DutyResult(
              new DutyField(duties.get(d), field, permitted, none, none, law, none),
              spot(1, peak, field),
              spots));
    }
    return new FieldResult(
        FieldResult.Method.SCREEN,
        mesh(),
        nodes(),
        results,
        new double[0],
        Double.NaN,
        true,
        List.of());
  }

  private void mark(int part, boolean[] node) {
    Part p = parts.get(part);
    for (int n = 0; n < node.length; n++) {
      int face = nodePatch.get(n);
      node[n] |= face >= p.firstFace() && face < p.firstFace() + p.faceCount();
    }
  }

  private HotSpot spot(int id, int node, double[] field) {
    int face = nodePatch.get(node);
    Part owner =
        parts.stream()
            .filter(p -> face >= p.firstFace() && face < p.firstFace() + p.faceCount())
            .findFirst()
            .orElseThrow();
    return new HotSpot(
        id,
        owner.index(),
        nodeOnEdge.get(node) ? "sharp edge 90 deg" : "face, sphere R50",
        xyz.get(nodeVertex.get(node)),
        field[node],
        PERMITTED,
        field[node] / PERMITTED,
        0.1,
        1e-4,
        Double.NaN,
        0.05,
        0.1,
        -1,
        Law.PARALLEL_SURFACES,
        new int[] {node},
        new HotSpot.Cure(0.01, 5e4, 0.7, 0.2));
  }

  private SurfaceMesh mesh() {
    double[] points = new double[3 * xyz.size()];
    byte[] kinds = new byte[xyz.size()];
    for (int v = 0; v < xyz.size(); v++) {
      System.arraycopy(xyz.get(v), 0, points, 3 * v, 3);
      kinds[v] = kind.get(v);
    }
    return new SurfaceMesh(
        points,
        flat(triangles),
        triangleFace.stream().mapToInt(Integer::intValue).toArray(),
        new double[6 * triangles.size()],
        kinds,
        new int[xyz.size()],
        flat(segments),
        new int[segments.size()],
        new double[2 * segments.size()]);
  }

  private SurfaceNodes nodes() {
    double[] n = new double[3 * normal.size()];
    for (int i = 0; i < normal.size(); i++) {
      System.arraycopy(normal.get(i), 0, n, 3 * i, 3);
    }
    return new SurfaceNodes(
        flat(corners),
        nodeVertex.stream().mapToInt(Integer::intValue).toArray(),
        nodePatch.stream().mapToInt(Integer::intValue).toArray(),
        IntStream.range(0, faces).toArray(),
        n,
        new double[normal.size()],
        new double[normal.size()],
        new double[n.length]);
  }

  private static int[] flat(List<int[]> rows) {
    return rows.stream().flatMapToInt(Arrays::stream).toArray();
  }

  /** The heatmap file. */
  byte[] glb(SliceLayer... slices) {
    return glb(result(), slices);
  }

  /** The heatmap file of a doctored outcome. */
  byte[] glb(FieldResult result, SliceLayer... slices) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    try {
      HeatmapWriter.write(
          out,
          assembly(),
          job(),
          result,
          new HeatmapStamp("0.0-test", LocalDate.of(2026, 1, 2)),
          List.of(slices));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return out.toByteArray();
  }

  /** Three live boxes and a ball in an earthed housing, with an insulator to ignore. */
  static SampleScene compartment() {
    SampleScene s = new SampleScene();
    for (int i = 0; i < 3; i++) {
      double x = 0.15 + 0.2 * i;
      s.box(
          "Busbar L" + (i + 1),
          new double[] {x, 0.15, 0.1},
          new double[] {x + 0.05, 0.21, 0.7},
          12);
    }
    s.ball("Schirm Ø120 – 日本", 0.8, 0.25, 0.45, 0.06, 40);
    s.housing("Housing", new double[] {0, 0, 0}, new double[] {1, 0.5, 0.8}, 0.003, 16);
    s.box("Insulator", new double[] {0.12, 0.3, 0.3}, new double[] {0.62, 0.36, 0.36}, 3);
    s.electrode("phase 1", Electrode.Kind.LIVE, 0)
        .electrode("phase 2", Electrode.Kind.LIVE, 1)
        .electrode("phase 3", Electrode.Kind.LIVE, 2, 3)
        .electrode("housing", Electrode.Kind.EARTH, 4);
    return s.ignore(5);
  }
}
