package org.edgefield.field.estimate;

import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import java.util.stream.IntStream;
import org.edgefield.curvature.EdgeClass;
import org.edgefield.curvature.EdgeFeature;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.Features.RoundedEdge;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.field.edge.RoundedWedge;
import org.edgefield.field.hotspot.MeshAreas;
import org.edgefield.field.hotspot.NodeFaces;
import org.edgefield.field.job.EdgesAsMade;
import org.edgefield.field.result.Law;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/** Lays the sites of an estimate: curvatures, edges, and the size of the body behind each. */
final class SiteBuilder {
  /** Sites per block of parallel work. */
  static final int BLOCK = 512;

  /** Radii below this are no edges any more. */
  private static final double LEAST_RADIUS = 1e-7;

  /**
   * Square of the curvature, in units of the body's end term, from which a direction counts as
   * curved: a body as a whole round in that direction has 1.
   */
  private static final double CURVED = 0.9;

  private final Assembly assembly;
  private final SurfaceMesh mesh;
  private final SurfaceNodes nodes;
  private final Features features;
  private final EdgesAsMade asMade;
  private final TriangleTree tree;

  /** A face of each node: its smallest convex rounded edge where it has one, else any. */
  private final int[] nodeFace;

  private final RoundedEdge[] rounded;

  /** Nodes of each vertex as linked lists, -1 at the end. */
  private final int[] firstNode;

  private final int[] nextNode;

  SiteBuilder(
      Assembly assembly,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      Features features,
      EdgesAsMade asMade,
      TriangleTree tree) {
    this.assembly = assembly;
    this.mesh = mesh;
    this.nodes = nodes;
    this.features = features;
    this.asMade = asMade;
    this.tree = tree;
    int faces = assembly.geometry().faceCount();
    rounded = NodeFaces.rounded(features, faces);
    firstNode = new int[mesh.vertexCount()];
    nextNode = new int[nodes.count()];
    Arrays.fill(firstNode, -1);
    for (int n = nodes.count() - 1; n >= 0; n--) {
      int v = nodes.nodeVertex()[n];
      nextNode[n] = firstNode[v];
      firstNode[v] = n;
    }
    nodeFace = NodeFaces.of(mesh, nodes, rounded);
  }

  Sites build() {
    int[] siteOfVertex = new int[mesh.vertexCount()];
    int[] siteOfNode = new int[nodes.count()];
    int count = number(siteOfVertex, siteOfNode);
    Sites sites = new Sites(siteOfNode, count);
    Arrays.fill(sites.node, -1);
    for (int n = 0; n < nodes.count(); n++) {
      int s = siteOfNode[n];
      int v = nodes.nodeVertex()[n];
      if (sites.node[s] < 0) {
        sites.node[s] = n;
        sites.part[s] = assembly.geometry().facePart(nodeFace[n]);
        System.arraycopy(mesh.xyz(), 3 * v, sites.position, 3 * s, 3);
        sites.k1[s] = nodes.k1()[n];
        sites.k2[s] = nodes.k2()[n];
        sites.law[s] = Law.PARALLEL_SURFACES;
      }
      for (int c = 0; c < 3; c++) {
        sites.normal[3 * s + c] += nodes.normal()[3 * n + c];
      }
    }
    normalise(sites.normal);
    double[] depth = new double[count];
    int blocks = (count + BLOCK - 1) / BLOCK;
    IntStream.range(0, blocks)
        .parallel()
        .forEach(
            b -> {
              TriangleCursor cursor = tree.cursor();
              int to = Math.min(count, (b + 1) * BLOCK);
              for (int s = b * BLOCK; s < to; s++) {
                smooth(sites, s, depth, cursor);
              }
            });
    roundedEdges(sites, depth);
    roundedCorners(sites, depth);
    sharpEdges(sites, siteOfVertex);
    return sites;
  }

  /** Numbers the sites; vertices on sharp convex edges and corners get one of their own. */
  private int number(int[] siteOfVertex, int[] siteOfNode) {
    boolean[] sharp = new boolean[mesh.vertexCount()];
    for (int g = 0; g < mesh.segmentCount(); g++) {
      EdgeClass c = features.edge(mesh.segmentEdge()[g]).edgeClass();
      if (c == EdgeClass.SHARP_CONVEX || c == EdgeClass.MIXED) {
        sharp[mesh.segmentVertices()[2 * g]] = true;
        sharp[mesh.segmentVertices()[2 * g + 1]] = true;
      }
    }
    Arrays.fill(siteOfVertex, -1);
    int count = 0;
    for (int n = 0; n < nodes.count(); n++) {
      int v = nodes.nodeVertex()[n];
      if (!sharp[v]) {
        siteOfNode[n] = count++;
        continue;
      }
      if (siteOfVertex[v] < 0) {
        siteOfVertex[v] = count++;
      }
      siteOfNode[n] = siteOfVertex[v];
    }
    return count;
  }

  private static void normalise(double[] v) {
    for (int i = 0; i < v.length; i += 3) {
      double length = Math.sqrt(v[i] * v[i] + v[i + 1] * v[i + 1] + v[i + 2] * v[i + 2]);
      double f = length > 0 ? 1 / length : 0;
      v[i] *= f;
      v[i + 1] *= f;
      v[i + 2] *= f;
    }
  }

  /** Curvature terms of a smooth site from the extent of the body behind it. */
  private void smooth(Sites sites, int s, double[] depth, TriangleCursor cursor) {
    int n = sites.node[s];
    Part part = assembly.parts().get(sites.part[s]);
    double[] normal = Arrays.copyOfRange(sites.normal, 3 * s, 3 * s + 3);
    double[] d1 = Arrays.copyOfRange(nodes.direction1(), 3 * n, 3 * n + 3);
    double[] d2 = cross(normal, d1);
    double k1 = sites.k1[s];
    double k2 = sites.k2[s];
    sites.end1[s] = inverseSquare(halfExtent(part, d1));
    sites.end2[s] = inverseSquare(halfExtent(part, d2));
    sites.c1[s] = sites.end1[s];
    sites.c2[s] = sites.end2[s];
    boolean curved1 = k1 > 0 && k1 * k1 > CURVED * sites.end1[s];
    boolean curved2 = k2 > 0 && k2 * k2 > CURVED * sites.end2[s];
    if (!curved1 && !curved2 && rounded[nodeFace[n]] == null) {
      return;
    }
    double size = part.size_m();
    cursor.allowOnly(sites.part[s]);
    double[] p = Arrays.copyOfRange(sites.position, 3 * s, 3 * s + 3);
    depth[s] = chord(cursor, p, normal, -1, 1e-6 * size, size);
    for (int c = 0; c < 3; c++) {
      p[c] -= 0.5 * depth[s] * normal[c];
    }
    double half = halfExtent(part, normal);
    if (curved1) {
      sites.c1[s] = quadratic(k1, half, breadth(cursor, p, d1, size));
    }
    if (curved2) {
      sites.c2[s] = quadratic(k2, half, breadth(cursor, p, d2, size));
    }
  }

  /**
   * Quadratic term of the smooth form. On an ellipsoid's axis it is both k / a, a the semi-axis
   * along the normal, and 1 / b^2, b the half-breadth; on a sphere k^2. Other bodies get a mean of
   * the first two, not above the third; the weights are fitted to hemispherically ended rods.
   */
  private static double quadratic(double k, double half, double breadth) {
    return Math.min(k * k, Math.pow(breadth, -1.5) * Math.pow(k / half, 0.25));
  }

  /** Half the width of the part through an inner point. */
  private static double breadth(TriangleCursor cursor, double[] p, double[] d, double size) {
    return 0.5 * (chord(cursor, p, d, 1, 0, size) + chord(cursor, p, d, -1, 0, size));
  }

  /** Length of the ray from a point until it leaves the part. */
  private static double chord(
      TriangleCursor cursor, double[] p, double[] d, double sign, double start, double size) {
    boolean hit =
        cursor.ray(
            p[0] + sign * d[0] * start,
            p[1] + sign * d[1] * start,
            p[2] + sign * d[2] * start,
            sign * d[0],
            sign * d[1],
            sign * d[2],
            0,
            2 * size,
            TriangleCursor.Side.LEAVING);
    return hit ? cursor.distance() + start : size;
  }

  private static double halfExtent(Part part, double[] d) {
    double[] b = part.bounds_m();
    double sum = 0;
    for (int c = 0; c < 3; c++) {
      sum += Math.abs(d[c]) * (b[c + 3] - b[c]) / 2;
    }
    return sum;
  }

  private static double[] cross(double[] a, double[] b) {
    return new double[] {
      a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]
    };
  }

  /** Turns sites on recognised rounded edges of bodies thicker than the round into edge sites. */
  private void roundedEdges(Sites sites, double[] depth) {
    double[] thin = new double[rounded.length];
    double[] wide = new double[rounded.length];
    Arrays.fill(thin, Double.POSITIVE_INFINITY);
    for (int s = 0; s < sites.count(); s++) {
      int f = nodeFace[sites.node[s]];
      thin[f] = Math.min(thin[f], depth[s]);
      wide[f] = Math.max(wide[f], depth[s]);
    }
    Map<Integer, RoundedWedge> wedges = new HashMap<>();
    for (int s = 0; s < sites.count(); s++) {
      int f = nodeFace[sites.node[s]];
      RoundedEdge r = rounded[f];
      if (r == null || sites.k1[s] <= 0) {
        continue;
      }
      double radius = r.radius_m();
      RoundedWedge wedge =
          wedges.computeIfAbsent(
              f, x -> RoundedWedge.ofInteriorAngle(Math.max(0, Math.PI - r.turning_rad())));
      double t = Math.max(thin[f], 2 * radius);
      double w = Math.max(wide[f], 2 * radius);
      // Curvature along the edge: what is left beside the round's own.
      double across = 1 / radius;
      double k1 = sites.k1[s];
      double k2 = sites.k2[s];
      double along = Math.abs(k2 - across) < Math.abs(k1 - across) ? Math.min(k1, across) : k2;
      sites.form[s] = Sites.EDGE;
      sites.law[s] = Law.ROUNDED_WEDGE;
      sites.wedge[s] = wedge;
      sites.thickness[s] = t;
      sites.width[s] = w;
      sites.k1[s] = across;
      sites.k2[s] = along;
    }
  }

  /**
   * Faces that are round in both directions but turn through less than a hemisphere are corners,
   * not balls. The solid angle of the turn is the integral of the Gaussian curvature.
   */
  private void roundedCorners(Sites sites, double[] depth) {
    double[] turn = new double[rounded.length];
    double[] thin = new double[rounded.length];
    double[] wide = new double[rounded.length];
    Arrays.fill(thin, Double.POSITIVE_INFINITY);
    double[] area = MeshAreas.triangles(mesh);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int f = mesh.triangleFace()[t];
      for (int c = 0; c < 3; c++) {
        int n = nodes.cornerNode()[3 * t + c];
        turn[f] += area[t] / 3 * Math.max(0, nodes.k1()[n]) * Math.max(0, nodes.k2()[n]);
      }
    }
    for (int s = 0; s < sites.count(); s++) {
      if (depth[s] > 0) {
        int f = nodeFace[sites.node[s]];
        thin[f] = Math.min(thin[f], depth[s]);
        wide[f] = Math.max(wide[f], depth[s]);
      }
    }
    RoundedWedge right = RoundedWedge.ofInteriorAngle(Math.PI / 2);
    for (int s = 0; s < sites.count(); s++) {
      int f = nodeFace[sites.node[s]];
      double k1 = sites.k1[s];
      double k2 = sites.k2[s];
      if (sites.form[s] != Sites.SMOOTH || k2 < CORNER_ROUNDNESS * k1 || turn[f] > CORNER_TURN) {
        continue;
      }
      double radius = 1 / Math.sqrt(k1 * k2);
      if (k1 > 0 && depth[s] > 0 && wide[f] > CORNER_DEPTH * radius) {
        sites.form[s] = Sites.CORNER;
        sites.law[s] = Law.ROUNDED_WEDGE;
        sites.wedge[s] = turn[f] > RIGHT_CORNER_TURN ? SHARP_CORNER : right;
        sites.thickness[s] = Math.max(thin[f], 2 * radius);
        sites.width[s] = Math.max(wide[f], 2 * radius);
        sites.end2[s] = inverseSquare(longestHalf(assembly.parts().get(sites.part[s])));
        sites.k1[s] = 1 / radius;
        sites.k2[s] = 1 / radius;
      }
    }
  }

  /** Ratio of the curvatures from which a place is round in both directions. */
  private static final double CORNER_ROUNDNESS = 0.3;

  /** Solid angle of the turn below which a round face is a corner: short of a hemisphere. */
  private static final double CORNER_TURN = 1.7 * Math.PI;

  /** Solid angle up to which it counts as right-angled (an octant turns through pi / 2). */
  private static final double RIGHT_CORNER_TURN = 0.55 * Math.PI;

  /** Depth of the body in radii from which its round face may be a corner. */
  private static final double CORNER_DEPTH = 2.5;

  private static final RoundedWedge SHARP_CORNER = RoundedWedge.ofInteriorAngle(Math.toRadians(45));

  private static double longestHalf(Part part) {
    double[] b = part.bounds_m();
    return Math.max(b[3] - b[0], Math.max(b[4] - b[1], b[5] - b[2])) / 2;
  }

  /** Sharp edges and corners with their radius as made. */
  private void sharpEdges(Sites sites, int[] siteOfVertex) {
    int vertices = mesh.vertexCount();
    double[] sharpest = new double[vertices];
    Arrays.fill(sharpest, Double.POSITIVE_INFINITY);
    double[] tangent = new double[3 * vertices];
    for (int g = 0; g < mesh.segmentCount(); g++) {
      int edge = mesh.segmentEdge()[g];
      EdgeClass c = features.edge(edge).edgeClass();
      if (c != EdgeClass.SHARP_CONVEX && c != EdgeClass.MIXED) {
        continue;
      }
      for (int end = 0; end < 2; end++) {
        int v = mesh.segmentVertices()[2 * g + end];
        double angle = angleAt(edge, mesh.segmentT()[2 * g + end]);
        if (angle < sharpest[v]) {
          sharpest[v] = angle;
          for (int k = 0; k < 3; k++) {
            tangent[3 * v + k] =
                mesh.xyz()[3 * mesh.segmentVertices()[2 * g + 1] + k]
                    - mesh.xyz()[3 * mesh.segmentVertices()[2 * g] + k];
          }
        }
      }
    }
    normalise(tangent);
    double[] sumNormals = new double[3 * sites.count()];
    double[] along = new double[sites.count()];
    int[] patches = new int[sites.count()];
    for (int n = 0; n < nodes.count(); n++) {
      int v = nodes.nodeVertex()[n];
      int s = siteOfVertex[v];
      if (s < 0) {
        continue;
      }
      for (int k = 0; k < 3; k++) {
        sumNormals[3 * s + k] += nodes.normal()[3 * n + k];
      }
      along[s] += normalCurvature(n, tangent, 3 * v);
      patches[s]++;
    }
    TriangleCursor cursor = tree.cursor();
    for (int v = 0; v < vertices; v++) {
      int s = siteOfVertex[v];
      if (s < 0 || !(sharpest[v] < Math.PI - Math.toRadians(1))) {
        continue;
      }
      double radius = Math.max(asMade.radius_m(sites.part[s]), LEAST_RADIUS);
      boolean corner =
          mesh.vertexKind()[v] == SurfaceMesh.ON_VERTEX
              && features.isCorner(mesh.vertexEntity()[v]);
      Part part = assembly.parts().get(sites.part[s]);
      double sum =
          Math.sqrt(
              sumNormals[3 * s] * sumNormals[3 * s]
                  + sumNormals[3 * s + 1] * sumNormals[3 * s + 1]
                  + sumNormals[3 * s + 2] * sumNormals[3 * s + 2]);
      double[] d = Arrays.copyOfRange(tangent, 3 * v, 3 * v + 3);
      double end = inverseSquare(corner ? longestHalf(part) : halfExtent(part, d));
      sites.form[s] = corner ? Sites.CORNER : Sites.EDGE;
      sites.law[s] = corner ? Law.CORNER_AS_MADE : Law.EDGE_AS_MADE;
      sites.wedge[s] = RoundedWedge.ofInteriorAngle(Math.max(0, sharpest[v]));
      sites.k1[s] = 1 / radius;
      sites.k2[s] = corner ? 1 / radius : patches[s] > 1 && sum > 0.1 ? along[s] / sum : 0;
      sites.end2[s] = end;
      // A short arc along the edge spreads the flux only at first; beyond it the body's length
      // counts.
      sites.c2[s] = corner ? Math.max(end, sites.k2[s] * sites.k2[s]) : end;
      behind(sites, s, v, radius, part, cursor);
    }
  }

  /**
   * Thickness and width behind a sharp edge: rays along the faces' normals from the round's centre.
   */
  private void behind(Sites sites, int s, int v, double radius, Part part, TriangleCursor cursor) {
    cursor.allowOnly(part.index());
    double size = part.size_m();
    double shift = Math.max(radius, 1e-5 * size);
    double[] p = new double[3];
    for (int k = 0; k < 3; k++) {
      p[k] = sites.position[3 * s + k] - shift * sites.normal[3 * s + k];
    }
    double thin = Double.POSITIVE_INFINITY;
    double wide = 0;
    for (int n = firstNode[v]; n >= 0; n = nextNode[n]) {
      double[] normal = Arrays.copyOfRange(nodes.normal(), 3 * n, 3 * n + 3);
      double t = chord(cursor, p, normal, -1, 0, size) + shift;
      thin = Math.min(thin, t);
      wide = Math.max(wide, t);
    }
    sites.thickness[s] = Math.max(thin, 2 * radius);
    sites.width[s] = Math.max(wide, 2 * radius);
  }

  /** Interior angle at a curve parameter, linear between the samples. */
  private double angleAt(int edge, double t) {
    EdgeFeature feature = features.edge(edge);
    double[] ts = feature.t();
    double[] angles = feature.interiorAngle_rad();
    int i = Arrays.binarySearch(ts, t);
    if (i >= 0) {
      return angles[i];
    }
    int right = -i - 1;
    if (right == 0 || right == ts.length) {
      return angles[right == 0 ? 0 : ts.length - 1];
    }
    double w = (t - ts[right - 1]) / (ts[right] - ts[right - 1]);
    return angles[right - 1] * (1 - w) + angles[right] * w;
  }

  /** Curvature of the surface at a node along a unit tangent (Euler's formula). */
  private double normalCurvature(int n, double[] tangent, int at) {
    double c = 0;
    for (int k = 0; k < 3; k++) {
      c += nodes.direction1()[3 * n + k] * tangent[at + k];
    }
    double cos2 = Math.min(1, c * c);
    return nodes.k1()[n] * cos2 + nodes.k2()[n] * (1 - cos2);
  }

  private static double inverseSquare(double x) {
    return 1 / (x * x);
  }
}
