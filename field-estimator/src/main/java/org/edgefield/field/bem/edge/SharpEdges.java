package org.edgefield.field.bem.edge;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.edgefield.curvature.EdgeClass;
import org.edgefield.curvature.EdgeFeature;
import org.edgefield.curvature.Features;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.EdgeGrading;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * The edges of a model that are sharp and convex, wholly or in part, with the reach of each: how
 * far from it the field is that of its wedge alone. The reach is a tenth of the distance to the
 * next edge across a face (the thickness t), to another electrode, and of the smallest radius of
 * the adjoining faces; towards an end where the edge breaks off or turns, a third of the distance
 * to that end.
 */
public final class SharpEdges {
  private static final double SHARE = 0.1;
  private static final double SHARE_TO_END = 1 / 3.0;

  /** Samples along an edge, in the middle part of which other edges are looked for. */
  private static final int SAMPLES = 17;

  /** Least reach over the part's size. */
  private static final double LEAST = 3e-5;

  /** Cosine of the turn below which one edge carries on as another. */
  private static final double CARRIES_ON = 0.94;

  /** Radius of the adjoining faces over the part's size from which they count as plane. */
  private static final double PLAIN = 1e3;

  /** Rows of elements within the reach. */
  private static final double FIRST_ROW = 0.125;

  private static final double GROWTH = 2;

  /** Size of elements along an edge over its thickness, near its ends. */
  private static final double ALONG = 0.12;

  /** Size of elements along an edge over the distance to its ends. */
  private static final double ALONG_FROM_END = 0.25;

  private final ExactGeometry geometry;
  private final Features features;
  private final int[] edge;
  private final Map<Integer, Integer> numberOfEdge = new HashMap<>();
  private final double[] reach;
  private final double[] thickness;
  private final double[][] ends;
  private final boolean[] plain;
  private final double finer;

  private SharpEdges(
      ExactGeometry geometry,
      Features features,
      int[] edge,
      double[] reach,
      double[] thickness,
      double[][] ends,
      boolean[] plain,
      double finer) {
    this.geometry = geometry;
    this.features = features;
    this.edge = edge;
    this.reach = reach;
    this.thickness = thickness;
    this.ends = ends;
    this.plain = plain;
    this.finer = finer;
    for (int i = 0; i < edge.length; i++) {
      numberOfEdge.put(edge[i], i);
    }
  }

  /**
   * Finds the edges.
   *
   * @param assembly the model
   * @param mesh any mesh of it
   * @param features edge classes
   * @param electrodeOfPart electrode per part, negative where a part is none: its edges are left
   *     out
   */
  public static SharpEdges of(
      Assembly assembly, SurfaceMesh mesh, Features features, int[] electrodeOfPart) {
    ExactGeometry geometry = assembly.geometry();
    List<Integer> found = new ArrayList<>();
    for (Part part : assembly.parts()) {
      for (int k = 0; electrodeOfPart[part.index()] >= 0 && k < part.edgeCount(); k++) {
        EdgeClass c = features.edge(part.firstEdge() + k).edgeClass();
        if (c == EdgeClass.SHARP_CONVEX || c == EdgeClass.MIXED) {
          found.add(part.firstEdge() + k);
        }
      }
    }
    int[] edge = found.stream().mapToInt(Integer::intValue).toArray();
    int n = edge.length;
    SharpEdges out =
        new SharpEdges(
            geometry,
            features,
            edge,
            new double[n],
            new double[n],
            new double[n][],
            new boolean[n],
            1);
    if (out.edge.length > 0) {
      out.measure(assembly, mesh, electrodeOfPart);
    }
    return out;
  }

  /**
   * The same edges looked at from nearer by: reach, rows and sizes along them shrink.
   *
   * @param share of what they are
   */
  public SharpEdges nearer(double share) {
    double[] less = Arrays.stream(reach).map(r -> share * r).toArray();
    return new SharpEdges(geometry, features, edge, less, thickness, ends, plain, share * finer);
  }

  private void measure(Assembly assembly, SurfaceMesh mesh, int[] electrodeOfPart) {
    int n = edge.length;
    Map<Integer, List<Integer>> atVertex = edgesAtVertices();
    TriangleCursor others = edgeTree(mesh);
    int[] group = new int[mesh.triangleCount()];
    for (int t = 0; t < group.length; t++) {
      int part = geometry.facePart(mesh.triangleFace()[t]);
      group[t] = electrodeOfPart[part] < 0 ? -1 : electrodeOfPart[part];
    }
    TriangleCursor bodies = TriangleTree.build(mesh.xyz(), mesh.triangles(), group).cursor();
    for (int i = 0; i < n; i++) {
      int face = geometry.edgeFaces(edge[i])[0];
      Part part = assembly.parts().get(geometry.facePart(face));
      ends[i] = ends(i, atVertex);
      boolean[] allowed = allowed(i);
      others.allow(allowed);
      bodies.allowAllBut(electrodeOfPart[part.index()]);
      thickness[i] = part.size_m();
      double clear = part.size_m();
      double[] c = samples(i);
      double longest = 0;
      for (int s = 0; s < SAMPLES; s++) {
        longest = Math.max(longest, toEnd(i, c[6 * s], c[6 * s + 1], c[6 * s + 2]));
      }
      for (int s = 0; s < SAMPLES; s++) {
        double x = c[6 * s];
        double y = c[6 * s + 1];
        double z = c[6 * s + 2];
        // Near the ends other edges come close as they must.
        if (toEnd(i, x, y, z) < 0.5 * longest) {
          continue;
        }
        if (others.nearest(x, y, z, thickness[i])) {
          thickness[i] = others.distance();
        }
        if (bodies.nearest(x, y, z, clear)) {
          clear = bodies.distance();
        }
      }
      double radius = smallestRadius(i);
      plain[i] = radius > PLAIN * part.size_m();
      double r = Math.min(Math.min(thickness[i], clear), radius);
      r = Math.min(SHARE * r, Double.isInfinite(longest) ? r : SHARE_TO_END * longest);
      reach[i] = Math.max(r, LEAST * part.size_m());
    }
  }

  private double[] samples(int i) {
    double[] range = geometry.edgeRange(edge[i]);
    int[] ids = new int[SAMPLES];
    double[] t = new double[SAMPLES];
    Arrays.fill(ids, edge[i]);
    for (int s = 0; s < SAMPLES; s++) {
      t[s] = range[0] + (range[1] - range[0]) * (s + 0.5) / SAMPLES;
    }
    double[] c = new double[6 * SAMPLES];
    geometry.curve(SAMPLES, ids, t, c);
    return c;
  }

  private Map<Integer, List<Integer>> edgesAtVertices() {
    Map<Integer, List<Integer>> out = new HashMap<>();
    for (int e = 0; e < geometry.edgeCount(); e++) {
      if (!geometry.edgeDegenerate(e) && features.edge(e).edgeClass() != EdgeClass.SEAM) {
        for (int v : geometry.edgeVertices(e)) {
          out.computeIfAbsent(v, k -> new ArrayList<>()).add(e);
        }
      }
    }
    return out;
  }

  /** Points where an edge breaks off or turns, 3 coordinates each. */
  private double[] ends(int i, Map<Integer, List<Integer>> atVertex) {
    int[] v = geometry.edgeVertices(edge[i]);
    if (v[0] == v[1]) {
      return new double[0];
    }
    double[] out = new double[6];
    int n = 0;
    for (int side = 0; side < 2; side++) {
      double[] here = endPoint(edge[i], v[side]);
      boolean carriesOn = false;
      for (int other : atVertex.getOrDefault(v[side], List.of())) {
        if (other != edge[i] && numberOfEdge.containsKey(other)) {
          double[] there = endPoint(other, v[side]);
          double dot = here[3] * there[3] + here[4] * there[4] + here[5] * there[5];
          carriesOn |= dot < -CARRIES_ON;
        }
      }
      if (!carriesOn) {
        System.arraycopy(here, 0, out, n, 3);
        n += 3;
      }
    }
    return Arrays.copyOf(out, n);
  }

  /** End of an edge at a CAD vertex: position, and unit tangent into the edge. */
  private double[] endPoint(int e, int vertex) {
    boolean start = geometry.edgeVertices(e)[0] == vertex;
    double[] range = geometry.edgeRange(e);
    double[] c = new double[6];
    geometry.curve(1, new int[] {e}, new double[] {range[start ? 0 : 1]}, c);
    double length = Math.sqrt(c[3] * c[3] + c[4] * c[4] + c[5] * c[5]) * (start ? 1 : -1);
    for (int k = 3; k < 6; k++) {
      c[k] = length == 0 ? 0 : c[k] / length;
    }
    return c;
  }

  /** All edges but itself and those it meets at its ends; seams do not count. */
  private boolean[] allowed(int i) {
    boolean[] out = new boolean[geometry.edgeCount()];
    int part = geometry.facePart(geometry.edgeFaces(edge[i])[0]);
    int[] own = geometry.edgeVertices(edge[i]);
    for (int e = 0; e < out.length; e++) {
      int[] v = geometry.edgeVertices(e);
      boolean meets = v[0] == own[0] || v[0] == own[1] || v[1] == own[0] || v[1] == own[1];
      out[e] =
          !meets
              && !geometry.edgeDegenerate(e)
              && features.edge(e).edgeClass() != EdgeClass.SEAM
              && geometry.facePart(geometry.edgeFaces(e)[0]) == part;
    }
    return out;
  }

  private TriangleCursor edgeTree(SurfaceMesh mesh) {
    int n = mesh.segmentCount();
    int[] corners = new int[3 * n];
    int[] group = new int[n];
    for (int g = 0; g < n; g++) {
      corners[3 * g] = mesh.segmentVertices()[2 * g];
      corners[3 * g + 1] = mesh.segmentVertices()[2 * g + 1];
      corners[3 * g + 2] = corners[3 * g + 1];
      group[g] = mesh.segmentEdge()[g];
    }
    return TriangleTree.build(mesh.xyz(), corners, group).cursor();
  }

  /** Smallest radius of curvature of the adjoining faces along the edge. */
  private double smallestRadius(int i) {
    double[] range = geometry.edgeRange(edge[i]);
    double[] t = new double[SAMPLES];
    for (int s = 0; s < SAMPLES; s++) {
      t[s] = range[0] + (range[1] - range[0]) * (s + 0.5) / SAMPLES;
    }
    double[] uv = new double[2 * SAMPLES];
    double[] out = new double[SAMPLES * ExactGeometry.CURVATURE_STRIDE];
    double largest = 0;
    int[] faces = geometry.edgeFaces(edge[i]);
    for (int side = 0; side < 2; side++) {
      if (faces[side] < 0) {
        continue;
      }
      int[] face = new int[SAMPLES];
      Arrays.fill(face, faces[side]);
      geometry.edgeUv(edge[i], side, SAMPLES, t, uv);
      geometry.curvature(SAMPLES, face, uv, out);
      for (int s = 0; s < SAMPLES; s++) {
        int at = s * ExactGeometry.CURVATURE_STRIDE;
        largest = Math.max(largest, Math.max(Math.abs(out[at + 3]), Math.abs(out[at + 4])));
      }
    }
    return largest > 0 ? 1 / largest : Double.POSITIVE_INFINITY;
  }

  private double toEnd(int i, double x, double y, double z) {
    double least = Double.POSITIVE_INFINITY;
    for (int k = 0; k < ends[i].length; k += 3) {
      double dx = x - ends[i][k];
      double dy = y - ends[i][k + 1];
      double dz = z - ends[i][k + 2];
      least = Math.min(least, Math.sqrt(dx * dx + dy * dy + dz * dz));
    }
    return least;
  }

  /** Number of edges. */
  public int count() {
    return edge.length;
  }

  /** CAD edge of a number. */
  int edge(int i) {
    return edge[i];
  }

  /** Number of a CAD edge, -1 where it is not among them. */
  int number(int cadEdge) {
    return numberOfEdge.getOrDefault(cadEdge, -1);
  }

  /** Distance to the next edge across a face, metres. */
  double thickness_m(int i) {
    return thickness[i];
  }

  /** Reach in the middle of an edge, metres. */
  double reach_m(int i) {
    return reach[i];
  }

  /** Reach at a point of an edge, metres. */
  double reach_m(int i, double x, double y, double z) {
    return Math.min(reach[i], SHARE_TO_END * toEnd(i, x, y, z));
  }

  /** Whether an edge is straight between plane faces, as far as its adjoining faces tell. */
  boolean plain(int i) {
    return plain[i];
  }

  EdgeFeature feature(int i) {
    return features.edge(edge[i]);
  }

  /**
   * Rows of elements that resolve the field within the reach.
   *
   * @param chosen which edges, by number
   */
  public List<EdgeGrading> gradings(boolean[] chosen) {
    List<EdgeGrading> out = new ArrayList<>();
    for (int i = 0; i < edge.length; i++) {
      if (chosen[i]) {
        out.add(new EdgeGrading(edge[i], FIRST_ROW * reach[i], GROWTH));
      }
    }
    return out;
  }

  /**
   * Lowers wanted sizes at vertices on chosen edges so that the field can change along them.
   *
   * @param chosen which edges, by number
   * @param target_m wanted size per mesh vertex
   */
  public void sizesAlong(SurfaceMesh mesh, boolean[] chosen, double[] target_m) {
    for (int g = 0; g < mesh.segmentCount(); g++) {
      int i = number(mesh.segmentEdge()[g]);
      if (i >= 0 && chosen[i]) {
        for (int end = 0; end < 2; end++) {
          int v = mesh.segmentVertices()[2 * g + end];
          double[] x = mesh.xyz();
          double away = ALONG_FROM_END * toEnd(i, x[3 * v], x[3 * v + 1], x[3 * v + 2]);
          target_m[v] = Math.min(target_m[v], finer * Math.max(ALONG * thickness[i], away));
        }
      }
    }
  }
}
