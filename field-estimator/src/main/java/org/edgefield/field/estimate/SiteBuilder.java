package org.edgefield.field.estimate;

import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import java.util.stream.IntStream;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.Features.RoundedEdge;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.curvature.node.WallThickness;
import org.edgefield.field.edge.RoundedCorner;
import org.edgefield.field.edge.RoundedWedge;
import org.edgefield.field.hotspot.MeshAreas;
import org.edgefield.field.hotspot.NodeFaces;
import org.edgefield.field.hotspot.SharpVertices;
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
  private final EdgesAsMade asMade;
  private final TriangleTree tree;
  private final SharpVertices sharp;
  private final WallThickness walls;

  /** Turn of the surface per face: the integral of its Gaussian curvature, convex places only. */
  private final double[] turn;

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
      TriangleTree tree,
      boolean[] hidden) {
    this.assembly = assembly;
    this.mesh = mesh;
    this.nodes = nodes;
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
    sharp = SharpVertices.of(mesh, features, hidden);
    walls = new WallThickness(mesh, nodes);
    turn = turns(faces);
  }

  private double[] turns(int faces) {
    double[] sum = new double[faces];
    double[] area = MeshAreas.triangles(mesh);
    for (int i = 0; i < nodes.cornerNode().length; i++) {
      int n = nodes.cornerNode()[i];
      sum[mesh.triangleFace()[i / 3]] +=
          area[i / 3] / 3 * Math.max(0, nodes.k1()[n]) * Math.max(0, nodes.k2()[n]);
    }
    return sum;
  }

  /** Where edges are sharp. */
  SharpVertices sharp() {
    return sharp;
  }

  Sites build() {
    int[] siteOfVertex = new int[mesh.vertexCount()];
    int[] siteOfNode = new int[nodes.count()];
    int count = number(siteOfVertex, siteOfNode);
    Sites sites = new Sites(siteOfNode, count);
    Arrays.fill(sites.node, -1);
    double[] bend = bends();
    for (int n = 0; n < nodes.count(); n++) {
      int s = siteOfNode[n];
      int v = nodes.nodeVertex()[n];
      if (sites.node[s] < 0) {
        sites.node[s] = n;
        sites.part[s] = assembly.geometry().facePart(nodeFace[n]);
        System.arraycopy(mesh.xyz(), 3 * v, sites.position, 3 * s, 3);
        sites.k1[s] = Math.min(nodes.k1()[n], SPIKE * bend[n]);
        sites.k2[s] = Math.min(nodes.k2()[n], SPIKE * bend[n]);
        sites.law[s] = Law.PARALLEL_SURFACES;
      }
      for (int c = 0; c < 3; c++) {
        sites.normal[3 * s + c] += nodes.normal()[3 * n + c];
      }
    }
    normalise(sites.normal);
    double[] depth = new double[count];
    double[] ahead = new double[count];
    int blocks = (count + BLOCK - 1) / BLOCK;
    IntStream.range(0, blocks)
        .parallel()
        .forEach(
            b -> {
              TriangleCursor cursor = tree.cursor();
              int to = Math.min(count, (b + 1) * BLOCK);
              for (int s = b * BLOCK; s < to; s++) {
                smooth(sites, s, depth, ahead, cursor);
              }
            });
    roundedEdges(sites, depth, ahead);
    roundedCorners(sites, depth);
    sharpEdges(sites, siteOfVertex);
    return sites;
  }

  /** Ratio of a node's curvature to that of its surroundings above which it is a spike. */
  private static final double SPIKE = 2;

  /**
   * How much the surface bends around a node: the largest norm of the shape operator that the
   * normals of a triangle give, over its triangles. Where a surface degenerates (blends that run
   * out into a point) its curvature may rise without limit on a spot too small to matter.
   */
  private double[] bends() {
    double[] most = new double[nodes.count()];
    double[] e = new double[6];
    double[] d = new double[6];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int[] corner = nodes.cornerNode();
      for (int i = 0; i < 6; i++) {
        int c = i / 3;
        int k = i % 3;
        e[i] =
            mesh.xyz()[3 * mesh.triangles()[3 * t + c + 1] + k]
                - mesh.xyz()[3 * mesh.triangles()[3 * t] + k];
        d[i] =
            nodes.normal()[3 * corner[3 * t + c + 1] + k] - nodes.normal()[3 * corner[3 * t] + k];
      }
      double first = Math.sqrt(e[0] * e[0] + e[1] * e[1] + e[2] * e[2]);
      double along = (e[0] * e[3] + e[1] * e[4] + e[2] * e[5]) / first;
      double second = e[3] * e[3] + e[4] * e[4] + e[5] * e[5] - along * along;
      double norm = 0;
      for (int k = 0; k < 3; k++) {
        double u = d[k] / first;
        double w = d[3 + k] - along * u;
        norm += u * u + w * w / second;
      }
      double rate = Math.sqrt(norm);
      for (int c = 0; c < 3; c++) {
        most[corner[3 * t + c]] = Math.max(most[corner[3 * t + c]], rate);
      }
    }
    return most;
  }

  /** Numbers the sites; vertices where an edge is sharp get one of their own. */
  private int number(int[] siteOfVertex, int[] siteOfNode) {
    Arrays.fill(siteOfVertex, -1);
    int count = 0;
    for (int n = 0; n < nodes.count(); n++) {
      int v = nodes.nodeVertex()[n];
      if (!sharp.isSharp(v)) {
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
  private void smooth(Sites sites, int s, double[] depth, double[] ahead, TriangleCursor cursor) {
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
    depth[s] = Math.min(walls.at(cursor, n), size);
    RoundedEdge edge = rounded[nodeFace[n]];
    if (edge != null) {
      double[] centre = p.clone();
      for (int c = 0; c < 3; c++) {
        centre[c] -= Math.min(edge.radius_m(), 0.5 * depth[s]) * normal[c];
      }
      ahead[s] = nearEnd(cursor, centre, alongIsFirst(edge, k1, k2) ? d1 : d2, size);
    }
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

  /** Whether a rounded edge runs in the direction of the larger curvature. */
  private static boolean alongIsFirst(RoundedEdge edge, double k1, double k2) {
    double across = 1 / edge.radius_m();
    return Math.abs(k2 - across) < Math.abs(k1 - across);
  }

  /** The shorter way from an inner point along a line to where the part ends. */
  private static double nearEnd(TriangleCursor cursor, double[] p, double[] d, double size) {
    return Math.min(chord(cursor, p, d, 1, 0, size), chord(cursor, p, d, -1, 0, size));
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
  private void roundedEdges(Sites sites, double[] depth, double[] ahead) {
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
      double along = alongIsFirst(r, k1, k2) ? Math.min(k1, across) : k2;
      sites.form[s] = Sites.EDGE;
      sites.law[s] = Law.ROUNDED_WEDGE;
      sites.wedge[s] = wedge;
      sites.thickness[s] = t;
      sites.width[s] = w;
      sites.k1[s] = across;
      sites.k2[s] = along;
      // The turn of a fillet is that across it, seen from its side, times that along it.
      double side = 1 - Math.cos(r.turning_rad());
      sites.arc(s, turn[f] / Math.max(side, 1e-3));
      sites.ahead(s, ahead[s]);
    }
  }

  /**
   * Faces that are round in both directions but turn through less than a hemisphere are corners,
   * not balls. The solid angle of the turn is the integral of the Gaussian curvature.
   */
  private void roundedCorners(Sites sites, double[] depth) {
    double[] thin = new double[rounded.length];
    double[] wide = new double[rounded.length];
    double[] next = new double[rounded.length];
    int[] thinnest = new int[rounded.length];
    Arrays.fill(thin, Double.POSITIVE_INFINITY);
    Arrays.fill(next, Double.POSITIVE_INFINITY);
    for (int s = 0; s < sites.count(); s++) {
      if (depth[s] > 0) {
        int f = nodeFace[sites.node[s]];
        if (depth[s] < thin[f]) {
          thin[f] = depth[s];
          thinnest[f] = s;
        }
        wide[f] = Math.max(wide[f], depth[s]);
      }
    }
    // The width is the least depth of the rays that do not end at the wall across the thinnest.
    for (int s = 0; s < sites.count(); s++) {
      int f = nodeFace[sites.node[s]];
      double across = depth[s] * Math.abs(dot(sites.normal, s, thinnest[f]));
      if (depth[s] > 0 && across < 0.5 * thin[f]) {
        next[f] = Math.min(next[f], depth[s]);
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
        sites.wedge[s] = right;
        sites.exponent[s] = RoundedCorner.exponent(turn[f]);
        sites.thickness[s] = Math.max(thin[f], 2 * radius);
        sites.width[s] = Math.max(Math.min(next[f], wide[f]), 2 * radius);
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

  /** Depth of the body in radii from which its round face may be a corner. */
  private static final double CORNER_DEPTH = 2.5;

  private static double longestHalf(Part part) {
    double[] b = part.bounds_m();
    return Math.max(b[3] - b[0], Math.max(b[4] - b[1], b[5] - b[2])) / 2;
  }

  /** Sharp edges and corners with their radius as made. */
  private void sharpEdges(Sites sites, int[] siteOfVertex) {
    int vertices = mesh.vertexCount();
    double[] tangent = new double[3 * vertices];
    for (int v = 0; v < vertices; v++) {
      if (sharp.isSharp(v)) {
        int[] ends = mesh.segmentVertices();
        int g = sharp.segment(v);
        for (int k = 0; k < 3; k++) {
          tangent[3 * v + k] =
              mesh.xyz()[3 * ends[2 * g + 1] + k] - mesh.xyz()[3 * ends[2 * g] + k];
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
    double[] turns = vertexTurns();
    TriangleCursor cursor = tree.cursor();
    for (int v = 0; v < vertices; v++) {
      int s = siteOfVertex[v];
      if (s < 0) {
        continue;
      }
      double radius = Math.max(asMade.radius_m(sites.part[s]), LEAST_RADIUS);
      boolean corner = sharp.isCorner(v);
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
      sites.wedge[s] = RoundedWedge.ofInteriorAngle(Math.max(0, sharp.angle_rad(v)));
      sites.k1[s] = 1 / radius;
      sites.k2[s] = corner ? 1 / radius : patches[s] > 1 && sum > 0.1 ? along[s] / sum : 0;
      sites.end2[s] = end;
      sites.c2[s] = end;
      sites.arc(s, turns[v]);
      double near = behind(sites, s, v, radius, part, d, cursor);
      if (!corner) {
        sites.ahead(s, near);
      }
    }
  }

  /**
   * Thickness and width behind a sharp edge or corner, the smallest and the next of the rays along
   * the faces' normals from the round's centre.
   *
   * @return way to the nearer end of the edge
   */
  private double behind(
      Sites sites,
      int s,
      int v,
      double radius,
      Part part,
      double[] tangent,
      TriangleCursor cursor) {
    cursor.allowOnly(part.index());
    double size = part.size_m();
    double shift = Math.max(radius, 1e-5 * size);
    double[] p = new double[3];
    for (int k = 0; k < 3; k++) {
      p[k] = sites.position[3 * s + k] - shift * sites.normal[3 * s + k];
    }
    double thin = Double.POSITIVE_INFINITY;
    double wide = Double.POSITIVE_INFINITY;
    for (int n = firstNode[v]; n >= 0; n = nextNode[n]) {
      if (repeats(n, v)) {
        continue;
      }
      double[] normal = Arrays.copyOfRange(nodes.normal(), 3 * n, 3 * n + 3);
      double t = chord(cursor, p, normal, -1, 0, size) + shift;
      wide = Math.min(wide, Math.max(thin, t));
      thin = Math.min(thin, t);
    }
    sites.thickness[s] = Math.max(thin, 2 * radius);
    sites.width[s] = Math.max(wide < Double.POSITIVE_INFINITY ? wide : thin, 2 * radius);
    return nearEnd(cursor, p, tangent, size);
  }

  /** Whether an earlier node of the vertex has the same normal: two faces that join smoothly. */
  private boolean repeats(int node, int v) {
    for (int n = firstNode[v]; n != node; n = nextNode[n]) {
      if (dot(nodes.normal(), n, node) > SAME_NORMAL) {
        return true;
      }
    }
    return false;
  }

  private static final double SAME_NORMAL = 0.98;

  /**
   * Angle through which the sharp edge at every mesh vertex turns from end to end, the larger of
   * two that meet.
   */
  private double[] vertexTurns() {
    double[] turns = new double[assembly.geometry().edgeCount()];
    int[] segments = new int[turns.length];
    double[] first = new double[3 * mesh.vertexCount()];
    double[] here = new double[3];
    for (int g = 0; g < mesh.segmentCount(); g++) {
      int a = mesh.segmentVertices()[2 * g];
      int b = mesh.segmentVertices()[2 * g + 1];
      for (int k = 0; k < 3; k++) {
        here[k] = mesh.xyz()[3 * b + k] - mesh.xyz()[3 * a + k];
      }
      normalise(here);
      segments[mesh.segmentEdge()[g]]++;
      for (int v : new int[] {a, b}) {
        double cos = 0;
        double seen = 0;
        for (int k = 0; k < 3; k++) {
          cos += here[k] * first[3 * v + k];
          seen += Math.abs(first[3 * v + k]);
        }
        if (mesh.vertexKind()[v] == SurfaceMesh.ON_EDGE && seen > 0) {
          turns[mesh.segmentEdge()[g]] += Math.acos(Math.max(-1, Math.min(1, cos)));
        }
        System.arraycopy(here, 0, first, 3 * v, 3);
      }
    }
    double[] result = new double[mesh.vertexCount()];
    for (int g = 0; g < mesh.segmentCount(); g++) {
      int a = mesh.segmentVertices()[2 * g];
      int b = mesh.segmentVertices()[2 * g + 1];
      int e = mesh.segmentEdge()[g];
      if (segments[e] > 1 && (sharp.isSharp(a) || sharp.isSharp(b))) {
        // The vertices inside see all of the turn but half a segment at each end.
        double turn = turns[e] * segments[e] / (segments[e] - 1);
        result[a] = Math.max(result[a], turn);
        result[b] = Math.max(result[b], turn);
      }
    }
    return result;
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

  private static double dot(double[] v, int s, int t) {
    return v[3 * s] * v[3 * t] + v[3 * s + 1] * v[3 * t + 1] + v[3 * s + 2] * v[3 * t + 2];
  }

  private static double inverseSquare(double x) {
    return 1 / (x * x);
  }
}
