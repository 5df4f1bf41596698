package org.edgefield.importer.mesh.size;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.EdgeGrading;
import org.edgefield.importer.mesh.MeshRequest;
import org.edgefield.importer.mesh.MeshSettings;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;

/**
 * Size tensors of one part's vertices before grading. On a surface with principal curvatures k1 and
 * k2 the sizes are (pi / 2) / (n |k|) along the principal directions for n elements per 90 degrees
 * of arc, no larger than the largest size and no longer than the largest aspect ratio allows; on
 * CAD edges the curve's own curvature counts likewise. Then come gaps, wanted sizes and graded
 * rows.
 */
public final class SizeSource {
  /** Smallest size over the part's size, against runaway curvature at flaws of the model. */
  private static final double SMALLEST = 1e-5;

  /** A pole whose curvature radius is below this share of its face is an apex. */
  private static final double APEX_RADIUS = 0.01;

  /** Smallest size on a face with an apex over the size of that face. */
  private static final double APEX_SIZE = 0.02;

  /** Gaps below this share of the part's size make no smaller elements. */
  private static final double SMALLEST_GAP = 1e-3;

  /** Cosine between normals of the sectors of a vertex above which it counts as smooth. */
  private static final double SMOOTH = 0.94;

  /** Parameter step for the curvature of CAD edges over the edge's range. */
  private static final double CURVE_STEP = 1e-3;

  private final ExactGeometry geometry;
  private final MeshSettings settings;
  private final MeshRequest request;
  private final double largest;
  private final double smallest;
  private final double smallestGap;
  private final double arc;
  private final int firstFace;
  private final double[] faceFloor;
  private final int firstEdge;
  private final double[][] edgeRange;
  private final TriangleCursor gaps;
  private final EdgeRows rows;

  private final double[] tensor = new double[Metric.STRIDE];
  private final double[] work = new double[24];
  private int[] corner = new int[64];
  private int[] faces = new int[64];
  private double[] uv = new double[128];
  private double[] curvature = new double[64 * ExactGeometry.CURVATURE_STRIDE];
  private int[] curveHalf = new int[64];
  private int[] curveEdge = new int[192];
  private double[] curveT = new double[192];
  private double[] curve = new double[6 * 192];

  /**
   * Prepares the source for one part.
   *
   * @param geometry exact geometry
   * @param part the part
   * @param settings sizes asked for
   * @param request sizes asked for on top
   * @param allGaps distances to other parts, or null
   */
  public SizeSource(
      ExactGeometry geometry, Part part, MeshSettings settings, MeshRequest request, Gaps allGaps) {
    this.geometry = geometry;
    this.settings = settings;
    this.request = request;
    double size = part.size_m();
    largest = Math.min(settings.maxSize_m(), settings.maxSizeFraction() * size);
    smallest = Math.min(SMALLEST * size, largest);
    smallestGap = Math.min(SMALLEST_GAP * size, largest);
    arc = Math.PI / 2 / settings.elementsPer90Degrees();
    firstFace = part.firstFace();
    faceFloor = new double[part.faceCount()];
    firstEdge = part.firstEdge();
    edgeRange = new double[part.edgeCount()][];
    for (int e = 0; e < edgeRange.length; e++) {
      edgeRange[e] = geometry.edgeRange(part.firstEdge() + e);
    }
    boolean useGaps = allGaps != null && settings.elementsPerGap() > 0 && allGaps.any(part.index());
    gaps = useGaps ? allGaps.cursor(part.index()) : null;
    List<EdgeGrading> own = new ArrayList<>();
    for (EdgeGrading g : request.edges()) {
      if (g.edge() >= part.firstEdge() && g.edge() < part.firstEdge() + part.edgeCount()) {
        own.add(g);
      }
    }
    rows = own.isEmpty() ? null : new EdgeRows(geometry, own);
  }

  /** Largest ratio of sizes along and across. */
  public double maxAspect() {
    return settings.maxAspect();
  }

  /**
   * Finds the faces with an apex, whose curvature grows beyond all bounds, and limits the sizes
   * there. To be called once with the first mesh.
   */
  public void findApexes(HalfEdgeMesh mesh) {
    double[] low = new double[3 * faceFloor.length];
    double[] high = new double[3 * faceFloor.length];
    Arrays.fill(low, Double.POSITIVE_INFINITY);
    Arrays.fill(high, Double.NEGATIVE_INFINITY);
    int[] poleCorner = new int[faceFloor.length];
    Arrays.fill(poleCorner, -1);
    for (int h = 0; h < 3 * mesh.triangles; h++) {
      int f = mesh.face[h / 3] - firstFace;
      for (int k = 0; k < 3; k++) {
        double x = mesh.xyz[3 * mesh.org[h] + k];
        low[3 * f + k] = Math.min(low[3 * f + k], x);
        high[3 * f + k] = Math.max(high[3 * f + k], x);
      }
      if (mesh.pole[h] == 0) {
        continue;
      }
      if (poleCorner[f] < 0 || mesh.org[h] != mesh.org[poleCorner[f]]) {
        poleCorner[f] = h;
      }
    }
    for (int f = 0; f < faceFloor.length; f++) {
      faceFloor[f] = smallest;
      if (poleCorner[f] < 0) {
        continue;
      }
      int h = poleCorner[f];
      geometry.curvature(
          1,
          new int[] {f + firstFace},
          new double[] {mesh.uv[2 * h], mesh.uv[2 * h + 1]},
          curvature);
      double k = Math.max(Math.abs(curvature[3]), Math.abs(curvature[4]));
      double diagonal =
          Math.sqrt(
              square(high[3 * f] - low[3 * f])
                  + square(high[3 * f + 1] - low[3 * f + 1])
                  + square(high[3 * f + 2] - low[3 * f + 2]));
      if (!(k * APEX_RADIUS * diagonal < 1)) {
        faceFloor[f] = Math.max(smallest, Math.min(APEX_SIZE * diagonal, largest));
      }
    }
  }

  private static double square(double x) {
    return x * x;
  }

  /**
   * Evaluates normals and tensors of vertices, writes the normals to the corners, and sets {@code
   * raw}, {@code metric} (equal to raw), {@code normal} and {@code rate} of the field.
   *
   * @param mesh the mesh
   * @param field tensors per vertex, with room for all vertices
   * @param list vertices
   * @param n number of them
   */
  public void refresh(HalfEdgeMesh mesh, VertexField field, int[] list, int n) {
    int corners = gatherCorners(mesh, list, n);
    geometry.curvature(corners, faces, uv, curvature);
    int curves = gatherCurves(mesh, list, n);
    geometry.curve(curves, curveEdge, curveT, curve);
    int i = 0;
    int j = 0;
    for (int k = 0; k < n; k++) {
      int v = list[k];
      int at = Metric.STRIDE * v;
      boolean first = true;
      double nx = 0;
      double ny = 0;
      double nz = 0;
      int from = i;
      for (; i < corners && mesh.org[corner[i]] == v; i++) {
        int c = ExactGeometry.CURVATURE_STRIDE * i;
        setNormals(mesh, corner[i], c);
        surfaceTensor(c, faceFloor[faces[i] - firstFace]);
        if (first) {
          System.arraycopy(tensor, 0, field.raw, at, Metric.STRIDE);
          first = false;
        } else {
          Metric.intersect(field.raw, at, tensor, work);
        }
        nx += curvature[c];
        ny += curvature[c + 1];
        nz += curvature[c + 2];
      }
      double length = Math.sqrt(nx * nx + ny * ny + nz * nz);
      boolean smooth = length > 0;
      for (int s = from; s < i; s++) {
        int c = ExactGeometry.CURVATURE_STRIDE * s;
        double dot = nx * curvature[c] + ny * curvature[c + 1] + nz * curvature[c + 2];
        smooth &= dot > SMOOTH * length && mesh.pole[corner[s]] == 0;
      }
      field.normal[3 * v] = smooth ? nx / length : 0;
      field.normal[3 * v + 1] = smooth ? ny / length : 0;
      field.normal[3 * v + 2] = smooth ? nz / length : 0;
      for (; j < curves / 3 && mesh.org[curveHalf[j]] == v; j++) {
        curveTensor(j, field.raw, at);
      }
      field.rate[v] = settings.grading();
      ask(mesh, field, v);
      System.arraycopy(field.raw, at, field.metric, at, Metric.STRIDE);
    }
  }

  /** One corner per sector between CAD edges; those of poles only where there is no other. */
  private int gatherCorners(HalfEdgeMesh mesh, int[] list, int n) {
    int count = 0;
    for (int k = 0; k < n; k++) {
      int v = list[k];
      int start = mesh.kind[v] == SurfaceMesh.ON_FACE ? -1 : mesh.firstCad(v);
      if (start < 0) {
        count = addCorner(mesh, mesh.out[v], count);
        continue;
      }
      int h = start;
      do {
        if (mesh.cad[h] >= 0) {
          count = addCorner(mesh, h, count);
        }
        h = mesh.turn(h);
      } while (h != start);
    }
    return count;
  }

  private int addCorner(HalfEdgeMesh mesh, int h, int count) {
    if (count == corner.length) {
      corner = Arrays.copyOf(corner, 2 * count);
      faces = Arrays.copyOf(faces, 2 * count);
      uv = Arrays.copyOf(uv, 4 * count);
      curvature = new double[2 * count * ExactGeometry.CURVATURE_STRIDE];
    }
    corner[count] = h;
    faces[count] = mesh.face[h / 3];
    uv[2 * count] = mesh.uv[2 * h];
    uv[2 * count + 1] = mesh.uv[2 * h + 1];
    return count + 1;
  }

  /** Three curve points per CAD edge at a vertex: before, at and after it. */
  private int gatherCurves(HalfEdgeMesh mesh, int[] list, int n) {
    int count = 0;
    for (int k = 0; k < n; k++) {
      int v = list[k];
      if (mesh.kind[v] == SurfaceMesh.ON_FACE) {
        continue;
      }
      int start = mesh.firstCad(v);
      if (start < 0) {
        continue;
      }
      int h = start;
      do {
        if (mesh.cad[h] >= 0) {
          if (count + 3 > curveT.length) {
            curveHalf = Arrays.copyOf(curveHalf, 2 * curveHalf.length);
            curveEdge = Arrays.copyOf(curveEdge, 2 * curveEdge.length);
            curveT = Arrays.copyOf(curveT, 2 * curveT.length);
            curve = new double[2 * curve.length];
          }
          double[] range = edgeRange[mesh.cad[h] - firstEdge];
          double step = CURVE_STEP * (range[1] - range[0]);
          double mid = Math.max(range[0] + step, Math.min(range[1] - step, mesh.tOrg[h]));
          curveHalf[count / 3] = h;
          for (int s = -1; s <= 1; s++) {
            curveEdge[count] = mesh.cad[h];
            curveT[count++] = mid + s * step;
          }
          if (mesh.kind[v] == SurfaceMesh.ON_EDGE) {
            break;
          }
        }
        h = mesh.turn(h);
      } while (h != start);
    }
    return count;
  }

  private void setNormals(HalfEdgeMesh mesh, int h, int c) {
    int g = h;
    do {
      if (mesh.pole[g] == 0) {
        mesh.normal[3 * g] = curvature[c];
        mesh.normal[3 * g + 1] = curvature[c + 1];
        mesh.normal[3 * g + 2] = curvature[c + 2];
      }
      g = mesh.turn(g);
    } while (mesh.cad[g] < 0 && g != h);
  }

  private double sizeOf(double k, double floor) {
    return Math.max(floor, Math.min(largest, arc / Math.max(Math.abs(k), 1e-300)));
  }

  private void surfaceTensor(int c, double floor) {
    double h1 = sizeOf(curvature[c + 3], floor);
    double h2 = sizeOf(curvature[c + 4], floor);
    double longest = settings.maxAspect() * Math.min(h1, h2);
    h1 = Math.min(h1, longest);
    h2 = Math.min(h2, longest);
    double h3 = Math.max(h1, h2);
    Arrays.fill(tensor, 0);
    Metric.addOuter(tensor, 0, 1 / (h1 * h1), curvature[c + 5], curvature[c + 6], curvature[c + 7]);
    Metric.addOuter(
        tensor, 0, 1 / (h2 * h2), curvature[c + 8], curvature[c + 9], curvature[c + 10]);
    Metric.addOuter(tensor, 0, 1 / (h3 * h3), curvature[c], curvature[c + 1], curvature[c + 2]);
  }

  private void curveTensor(int j, double[] m, int at) {
    int a = 18 * j + 3;
    int b = a + 6;
    int c = a + 12;
    double la = length(curve, a);
    double lb = length(curve, b);
    double lc = length(curve, c);
    double span = (curveT[3 * j + 2] - curveT[3 * j]) * lb;
    if (!(la > 0 && lb > 0 && lc > 0 && span > 0)) {
      return;
    }
    double dx = curve[c] / lc - curve[a] / la;
    double dy = curve[c + 1] / lc - curve[a + 1] / la;
    double dz = curve[c + 2] / lc - curve[a + 2] / la;
    double size = sizeOf(Math.sqrt(dx * dx + dy * dy + dz * dz) / span, smallest);
    double w = 1 / (size * size);
    double tx = curve[b] / lb;
    double ty = curve[b + 1] / lb;
    double tz = curve[b + 2] / lb;
    double have = Metric.square(m, at, tx, ty, tz);
    if (w > have) {
      Metric.addOuter(m, at, w - have, tx, ty, tz);
      double wide = 1 / square(settings.maxAspect() * size);
      Arrays.fill(tensor, 0);
      Metric.addIdentity(tensor, 0, wide);
      Metric.intersect(m, at, tensor, work);
    }
  }

  private static double length(double[] x, int at) {
    return Math.sqrt(square(x[at]) + square(x[at + 1]) + square(x[at + 2]));
  }

  /** Gaps, wanted sizes and graded rows. */
  private void ask(HalfEdgeMesh mesh, VertexField field, int v) {
    double x = mesh.xyz[3 * v];
    double y = mesh.xyz[3 * v + 1];
    double z = mesh.xyz[3 * v + 2];
    int at = Metric.STRIDE * v;
    if (gaps != null && gaps.nearest(x, y, z, largest * settings.elementsPerGap())) {
      double size = Math.max(smallestGap, gaps.distance() / settings.elementsPerGap());
      Metric.setIsotropic(tensor, 0, size);
      Metric.intersect(field.raw, at, tensor, work);
    }
    double want = field.target[v];
    if (request.field() != null) {
      want = Math.min(want, request.field().size_m(x, y, z));
    }
    if (want < largest) {
      System.arraycopy(field.raw, at, work, 0, Metric.STRIDE);
      Metric.eigen(work, Metric.STRIDE);
      double width2 = 1 / Math.max(work[0], Math.max(work[1], work[2]));
      double floor = Math.max(want, smallest);
      if (floor * floor < width2) {
        Metric.scale(field.raw, at, width2 / (floor * floor));
      }
    }
    if (rows != null) {
      double rate = rows.shape(x, y, z, field.raw, at, largest, work);
      field.rate[v] = Math.max(field.rate[v], rate);
    }
  }
}
