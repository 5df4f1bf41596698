package org.edgefield.curvature.feature;

import java.util.Arrays;
import org.edgefield.curvature.EdgeClass;
import org.edgefield.curvature.EdgeFeature;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.incidence.MeshIncidence;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Recognises edges, corners and rounded edges of a model and names its places.
 *
 * <p>Everything is worked out at construction from exact normals and curvatures; afterwards the
 * object only answers and may be shared between threads. Names state what the geometry shows and no
 * more: a blend that is too short, not circular or not tangent on both sides keeps the plain name
 * of its surface.
 */
public final class FeatureRecogniser implements Features {
  /** Share of a turn that a hollow cylinder must close to count as a bore. */
  private static final double BORE_RAD = Math.toRadians(240);

  /** How far a cylinder may go round beyond the sides of a fillet. */
  private static final double BEYOND_RAD = Math.toRadians(30);

  /** Name of a pointed tip. */
  static final String TIP = "cone tip";

  private static final double END_TURN = Math.toRadians(150);

  private final ExactGeometry geometry;
  private final EdgeFeature[] edges;
  private final int[] group;
  private final FaceForm[] forms;
  private final Fillet[] fillets;
  private final double[] coverage;
  private final double[] area;

  /** Edges per CAD vertex, in compressed rows. */
  private final int[] vertexStart;

  private final int[] vertexEdges;

  /** Whether a tangent edge bounds the face all around, and number of its neighbours. */
  private final boolean[] allTangent;

  private final int[] neighbours;

  private FeatureRecogniser(ExactGeometry geometry, SurfaceMesh mesh) {
    this.geometry = geometry;
    byte[] left = EdgeSides.leftSides(geometry, mesh, new MeshIncidence(mesh));
    edges = EdgeClassifier.classify(geometry, left);
    int[] tangent = new int[edges.length];
    int count = 0;
    for (EdgeFeature e : edges) {
      if (e.edgeClass() == EdgeClass.TANGENT) {
        tangent[count++] = e.edge();
      }
    }
    int[] counts = new int[count];
    Arrays.fill(counts, FilletFinder.SAMPLES);
    EdgeSamples samples = EdgeSamples.take(geometry, Arrays.copyOf(tangent, count), counts);
    group = SurfaceGroups.find(geometry, samples);
    forms = FaceForms.find(geometry, mesh);
    fillets = FilletFinder.find(geometry, samples, left, group, forms);
    coverage = NormalCoverage.find(geometry, mesh, group, forms);
    area = GroupAreas.find(mesh, group);
    for (int g = 0; g < fillets.length; g++) {
      // A boss that runs into ribs has tangent sides too, yet goes round far beyond them.
      if (fillets[g] != null && coverage[g] > fillets[g].turning_rad() + BEYOND_RAD) {
        fillets[g] = null;
      }
    }
    allTangent = new boolean[geometry.faceCount()];
    neighbours = new int[geometry.faceCount()];
    surround();
    int vertices = 0;
    for (int e = 0; e < edges.length; e++) {
      for (int v : geometry.edgeVertices(e)) {
        vertices = Math.max(vertices, v + 1);
      }
    }
    vertexStart = new int[vertices + 1];
    for (int e = 0; e < edges.length; e++) {
      for (int v : ends(e)) {
        vertexStart[v + 1]++;
      }
    }
    for (int v = 0; v < vertices; v++) {
      vertexStart[v + 1] += vertexStart[v];
    }
    vertexEdges = new int[vertexStart[vertices]];
    int[] fill = vertexStart.clone();
    for (int e = 0; e < edges.length; e++) {
      for (int v : ends(e)) {
        vertexEdges[fill[v]++] = e;
      }
    }
  }

  /**
   * Recognises the features of a model.
   *
   * @param mesh any mesh of the model, coarse or fine: it tells the sides of edges and where faces
   *     are; angles and radii come from the exact geometry
   */
  public static FeatureRecogniser of(ExactGeometry geometry, SurfaceMesh mesh) {
    return new FeatureRecogniser(geometry, mesh);
  }

  /** Distinct end vertices of an edge; a closed curve may have none. */
  private int[] ends(int edge) {
    int[] v = geometry.edgeVertices(edge);
    return v[0] == v[1] ? Arrays.copyOf(v, v[0] < 0 ? 0 : 1) : v;
  }

  private void surround() {
    Arrays.fill(allTangent, true);
    for (int e = 0; e < edges.length; e++) {
      EdgeClass c = edges[e].edgeClass();
      int[] faces = geometry.edgeFaces(e);
      if (c == EdgeClass.SEAM || c == EdgeClass.DEGENERATE) {
        continue;
      }
      for (int k = 0; k < 2; k++) {
        if (faces[k] < 0 || (faces[1 - k] >= 0 && group[faces[0]] == group[faces[1]])) {
          continue;
        }
        int g = group[faces[k]];
        neighbours[g]++;
        allTangent[g] &= c == EdgeClass.TANGENT;
      }
    }
  }

  @Override
  public EdgeFeature edge(int edge) {
    return edges[edge];
  }

  @Override
  public boolean isCorner(int cadVertex) {
    return sharpEdges(cadVertex) >= 3;
  }

  private int sharpEdges(int vertex) {
    int n = 0;
    for (int i = vertexStart[vertex]; i < vertexStart[vertex + 1]; i++) {
      if (sharpAt(vertexEdges[i], vertex)) {
        n++;
      }
    }
    return n;
  }

  /** Whether an edge is sharp and convex where it ends at a vertex. */
  private boolean sharpAt(int edge, int vertex) {
    EdgeFeature f = edges[edge];
    return switch (f.edgeClass()) {
      case SHARP_CONVEX -> true;
      case MIXED -> {
        double[] a = f.interiorAngle_rad();
        boolean starts = geometry.edgeVertices(edge)[0] == vertex;
        yield a[starts ? 0 : a.length - 1] < Math.PI - EdgeFeature.TANGENT_RAD;
      }
      default -> false;
    };
  }

  @Override
  public RoundedEdge roundedEdge(int face) {
    Fillet f = fillets[group[face]];
    return f == null || !f.isLong()
        ? null
        : new RoundedEdge(face, f.radius_m(), f.turning_rad(), f.convex());
  }

  @Override
  public String faceName(int face) {
    Fillet fillet = fillets[group[face]];
    if (fillet != null) {
      return filletName(fillet);
    }
    FaceForm form = forms[face];
    String radius = Millimetres.radius(form.radius_m());
    boolean blended = allTangent[group[face]] && neighbours[group[face]] >= 3;
    return switch (form.form()) {
      case FLAT -> "flat face";
      case CYLINDER ->
          form.convex()
              ? "cylinder " + radius
              : (coverage[group[face]] >= BORE_RAD ? "bore " : "inside radius ") + radius;
      case SPHERE -> {
        if (blended) {
          yield (form.convex() ? "rounded corner " : "inside corner ") + radius;
        }
        // No more than half a sphere that runs into its neighbour smoothly.
        boolean cap =
            allTangent[group[face]]
                && neighbours[group[face]] > 0
                && area[group[face]] < 2.2 * Math.PI * form.radius_m() * form.radius_m();
        yield form.convex()
            ? (cap ? "rounded end " : "sphere ") + radius
            : "hollow sphere " + radius;
      }
      case ROUND_SECTION ->
          form.convex()
              ? (geometry.faceKind(face) == org.edgefield.importer.brep.SurfaceKind.TORUS
                      ? "torus, section "
                      : "round section ")
                  + radius
              : "groove " + radius;
      case DOME -> (form.convex() ? "domed face " : "hollow face ") + radius;
      case CONE ->
          String.format(
              java.util.Locale.ROOT,
              "%s, half-angle %s deg",
              form.convex() ? "cone" : "inside cone",
              degrees(form.halfAngle_rad()));
      case FREE -> {
        String name = blended && form.convex() ? "rounded corner" : "free-form face";
        yield form.convex() ? name + ", down to " + Millimetres.radius(form.tightest_m()) : name;
      }
    };
  }

  private static String filletName(Fillet f) {
    String radius =
        f.varies()
            ? Millimetres.radius(f.smallest_m()) + " to " + Millimetres.radius(f.largest_m())
            : Millimetres.radius(f.median_m());
    boolean end = !f.isLong() && f.turning_rad() > END_TURN;
    if (f.convex()) {
      return (f.isLong() ? "rounded edge " : end ? "rounded end " : "rounded corner ") + radius;
    }
    return (f.turning_rad() > END_TURN ? "slot end " : "inside fillet ") + radius;
  }

  @Override
  public String edgeName(int edge) {
    EdgeFeature f = edges[edge];
    return switch (f.edgeClass()) {
      case SHARP_CONVEX -> "sharp edge " + angles(f);
      case SHARP_CONCAVE -> "concave edge " + angles(f);
      case MIXED -> "partly sharp edge " + angles(f);
      case TANGENT, SEAM -> faceName(tighterFace(edge));
      case DEGENERATE -> {
        int[] ends = ends(edge);
        yield ends.length == 0 ? "point" : vertexName(ends[0]);
      }
    };
  }

  private static String angles(EdgeFeature f) {
    double low = f.sharpest_rad();
    double high = f.bluntest_rad();
    if (high - low <= Math.toRadians(1)) {
      return degrees(0.5 * (low + high)) + " deg";
    }
    return degrees(low) + " to " + degrees(high) + " deg";
  }

  private static String degrees(double rad) {
    return Long.toString(Math.round(Math.toDegrees(rad)));
  }

  /**
   * Of the two faces at a smooth edge, the one that curves more towards the gas; where none does,
   * the curved one.
   */
  private int tighterFace(int edge) {
    int[] faces = geometry.edgeFaces(edge);
    return leads(faces[1], faces[0]) ? faces[1] : faces[0];
  }

  private boolean leads(int face, int other) {
    double a = tightness(face);
    double b = tightness(other);
    return a > b || (a == b && flat(other) && !flat(face));
  }

  private boolean flat(int face) {
    return forms[face].form() == FaceForm.Kind.FLAT;
  }

  /** Largest convex curvature that a face is known for, 0 where it has none. */
  private double tightness(int face) {
    Fillet fillet = fillets[group[face]];
    if (fillet != null) {
      return fillet.convex() ? 1 / fillet.smallest_m() : 0;
    }
    return 1 / forms[face].tightest_m();
  }

  @Override
  public String vertexName(int cadVertex) {
    int sharp = sharpEdges(cadVertex);
    if (sharp >= 3) {
      return "corner of " + sharp + " sharp edges";
    }
    int sharpest = -1;
    int tightest = -1;
    int concave = 0;
    for (int i = vertexStart[cadVertex]; i < vertexStart[cadVertex + 1]; i++) {
      int e = vertexEdges[i];
      if (edges[e].edgeClass() == EdgeClass.DEGENERATE) {
        int[] faces = geometry.edgeFaces(e);
        int face = Math.max(faces[0], faces[1]);
        if (forms[face].form() == FaceForm.Kind.CONE && forms[face].convex()) {
          return TIP;
        }
      }
      if (edges[e].edgeClass() == EdgeClass.SHARP_CONCAVE) {
        concave++;
      }
      if (sharpAt(e, cadVertex)
          && (sharpest < 0 || edges[e].sharpest_rad() < edges[sharpest].sharpest_rad())) {
        sharpest = e;
      }
      for (int face : geometry.edgeFaces(e)) {
        if (face >= 0 && (tightest < 0 || leads(face, tightest))) {
          tightest = face;
        }
      }
    }
    if (sharpest >= 0) {
      return edgeName(sharpest);
    }
    if (concave >= 3) {
      return "inside corner of " + concave + " edges";
    }
    return tightest >= 0 ? faceName(tightest) : "point";
  }
}
