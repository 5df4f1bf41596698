package org.edgefield.curvature.feature;

import java.util.ArrayList;
import java.util.List;
import org.edgefield.curvature.EdgeClass;
import org.edgefield.curvature.EdgeFeature;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.PartSummary;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;

/** Sums up smallest radius and sharp edges per part. */
public final class PartSummaries {
  /** Radii of a pointed cone say where the mesh has its vertices, nothing about the part. */
  private final boolean[] pointed;

  private final double[] largest;
  private final int[] largestFace;
  private final int[] sharpEdges;
  private final double[] sharpLength;
  private final double[] sharpest;
  private final int[] corners;
  private final int[] tips;

  private PartSummaries(int parts, int faces) {
    pointed = new boolean[faces];
    largest = new double[parts];
    largestFace = new int[parts];
    sharpEdges = new int[parts];
    sharpLength = new double[parts];
    sharpest = new double[parts];
    corners = new int[parts];
    tips = new int[parts];
    java.util.Arrays.fill(largestFace, -1);
    java.util.Arrays.fill(sharpest, Math.PI);
  }

  /**
   * Summary per part, in the order of the parts.
   *
   * @param nodes per-face nodes of the mesh, so that each radius belongs to its own face
   */
  public static List<PartSummary> of(
      List<Part> parts,
      ExactGeometry geometry,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      Features features) {
    PartSummaries s = new PartSummaries(parts.size(), geometry.faceCount());
    s.edges(geometry, features);
    s.lengths(geometry, mesh, features);
    s.radii(geometry, mesh, nodes);
    List<PartSummary> result = new ArrayList<>();
    for (int p = 0; p < parts.size(); p++) {
      result.add(
          new PartSummary(
              p,
              s.largest[p] > 0 ? 1 / s.largest[p] : Double.POSITIVE_INFINITY,
              s.largestFace[p],
              s.sharpEdges[p],
              s.sharpLength[p],
              s.sharpest[p],
              s.corners[p],
              s.tips[p]));
    }
    return result;
  }

  private void edges(ExactGeometry geometry, Features features) {
    int vertices = 0;
    for (int e = 0; e < geometry.edgeCount(); e++) {
      for (int v : geometry.edgeVertices(e)) {
        vertices = Math.max(vertices, v + 1);
      }
    }
    boolean[] seen = new boolean[vertices];
    for (int e = 0; e < geometry.edgeCount(); e++) {
      int[] faces = geometry.edgeFaces(e);
      int part = geometry.facePart(Math.max(faces[0], faces[1]));
      EdgeFeature f = features.edge(e);
      if (sharpSomewhere(f)) {
        sharpEdges[part]++;
        sharpest[part] = Math.min(sharpest[part], f.sharpest_rad());
      }
      for (int v : geometry.edgeVertices(e)) {
        if (v >= 0 && !seen[v]) {
          seen[v] = true;
          corners[part] += features.isCorner(v) ? 1 : 0;
        }
      }
      if (f.edgeClass() == EdgeClass.DEGENERATE
          && features.edgeName(e).equals(FeatureRecogniser.TIP)) {
        tips[part]++;
        pointed[Math.max(faces[0], faces[1])] = true;
      }
    }
  }

  private static boolean sharpSomewhere(EdgeFeature f) {
    return switch (f.edgeClass()) {
      case SHARP_CONVEX -> true;
      case MIXED -> f.sharpest_rad() < Math.PI - EdgeFeature.TANGENT_RAD;
      default -> false;
    };
  }

  /** Lengths along the exact curves: Simpson's rule on the speed within each segment. */
  private void lengths(ExactGeometry geometry, SurfaceMesh mesh, Features features) {
    int n = 0;
    int[] edge = new int[3 * mesh.segmentCount()];
    double[] t = new double[3 * mesh.segmentCount()];
    for (int s = 0; s < mesh.segmentCount(); s++) {
      EdgeFeature f = features.edge(mesh.segmentEdge()[s]);
      double t0 = mesh.segmentT()[2 * s];
      double t1 = mesh.segmentT()[2 * s + 1];
      double middle = 0.5 * (t0 + t1);
      if (sharpSomewhere(f) && f.interiorAngle_rad(middle) < Math.PI - EdgeFeature.TANGENT_RAD) {
        for (double at : new double[] {t0, middle, t1}) {
          edge[n] = f.edge();
          t[n++] = at;
        }
      }
    }
    double[] x = new double[6 * n];
    geometry.curve(n, edge, t, x);
    for (int i = 0; i < n; i += 3) {
      double mean = (speed(x, i) + 4 * speed(x, i + 1) + speed(x, i + 2)) / 6;
      int[] faces = geometry.edgeFaces(edge[i]);
      sharpLength[geometry.facePart(Math.max(faces[0], faces[1]))] +=
          mean * Math.abs(t[i + 2] - t[i]);
    }
  }

  private static double speed(double[] x, int i) {
    int a = 6 * i + 3;
    return Math.sqrt(x[a] * x[a] + x[a + 1] * x[a + 1] + x[a + 2] * x[a + 2]);
  }

  private void radii(ExactGeometry geometry, SurfaceMesh mesh, SurfaceNodes nodes) {
    for (int c = 0; c < nodes.cornerNode().length; c++) {
      int face = mesh.triangleFace()[c / 3];
      double k = nodes.k1()[nodes.cornerNode()[c]];
      int part = geometry.facePart(face);
      // Of equal radii the first face is named, whatever the last bits say.
      if (!pointed[face] && k > largest[part] * (1 + 1e-9)) {
        largest[part] = k;
        largestFace[part] = face;
      }
    }
  }
}
