package org.edgefield.curvature.feature;

import java.util.Arrays;
import org.edgefield.curvature.EdgeClass;
import org.edgefield.curvature.EdgeFeature;
import org.edgefield.importer.brep.ExactGeometry;

/**
 * Classes and interior angles of all CAD edges from the exact normals on both sides.
 *
 * <p>An edge starts with five samples; where the angle, a normal or the tangent changes much from
 * sample to sample, it is sampled twice as densely, up to 65.
 *
 * <p>With n the outward normals and b the directions in the faces away from the edge, the interior
 * angle is the angle from b of the left face to b of the right face through the solid. A join whose
 * interior angle is within {@link EdgeFeature#TANGENT_RAD} of pi counts as tangent.
 */
final class EdgeClassifier {
  private static final int FIRST_SAMPLES = 5;
  private static final int MOST_SAMPLES = 65;

  /** Change of the interior angle between samples that calls for more of them. */
  private static final double ANGLE_STEP = Math.toRadians(3);

  /** Turn of a normal or of the tangent between samples that calls for more of them. */
  private static final double COS_TURN_STEP = Math.cos(Math.toRadians(46));

  private EdgeClassifier() {}

  /**
   * Classifies every edge.
   *
   * @param left left side per edge, see {@link EdgeSides}; where it is not known the edge is taken
   *     for convex, the careful reading
   */
  static EdgeFeature[] classify(ExactGeometry geometry, byte[] left) {
    int n = geometry.edgeCount();
    EdgeFeature[] result = new EdgeFeature[n];
    int[] pending = new int[n];
    int count = 0;
    for (int e = 0; e < n; e++) {
      double[] range = geometry.edgeRange(e);
      int[] faces = geometry.edgeFaces(e);
      if (geometry.edgeDegenerate(e)) {
        result[e] = uniform(e, EdgeClass.DEGENERATE, range, Math.PI);
      } else if (faces[0] < 0 || faces[1] < 0) {
        // The rim of an open sheet is as sharp as an edge can be.
        result[e] = uniform(e, EdgeClass.SHARP_CONVEX, range, 0);
      } else {
        pending[count++] = e;
      }
    }
    for (int samples = FIRST_SAMPLES; count > 0; samples = 2 * samples - 1) {
      int[] edges = Arrays.copyOf(pending, count);
      int[] counts = new int[count];
      Arrays.fill(counts, samples);
      EdgeSamples s = EdgeSamples.take(geometry, edges, counts);
      count = 0;
      for (int i = 0; i < edges.length; i++) {
        double[] angle = angles(s, i, left[edges[i]]);
        if (samples < MOST_SAMPLES && coarse(s, i, angle)) {
          pending[count++] = edges[i];
        } else {
          int[] faces = geometry.edgeFaces(edges[i]);
          double[] t = Arrays.copyOfRange(s.t, s.start[i], s.start[i + 1]);
          result[edges[i]] = new EdgeFeature(edges[i], classOf(angle, faces), t, angle);
        }
      }
    }
    return result;
  }

  private static EdgeFeature uniform(int edge, EdgeClass c, double[] range, double angle) {
    return new EdgeFeature(edge, c, range.clone(), new double[] {angle, angle});
  }

  private static double[] angles(EdgeSamples s, int entry, byte left) {
    double[] angle = new double[s.start[entry + 1] - s.start[entry]];
    for (int j = 0; j < angle.length; j++) {
      int at = s.start[entry] + j;
      int n = EdgeSamples.STRIDE * at;
      if (left >= 0) {
        angle[j] = interiorAngle(s.side[left], s.side[1 - left], n, s.curve, 6 * at + 3);
      } else {
        double a = interiorAngle(s.side[0], s.side[1], n, s.curve, 6 * at + 3);
        angle[j] = Math.min(a, 2 * Math.PI - a);
      }
    }
    return angle;
  }

  /**
   * Interior angle between two faces, 0 to 2 pi.
   *
   * @param l outward normal of the left face at index n
   * @param r outward normal of the right face at index n
   * @param x unit tangent at index t, the left face on its left seen from the gas
   */
  static double interiorAngle(double[] l, double[] r, int n, double[] x, int t) {
    // Into the left face: n x t. Into the right face: t x n.
    double ax = l[n + 1] * x[t + 2] - l[n + 2] * x[t + 1];
    double ay = l[n + 2] * x[t] - l[n] * x[t + 2];
    double az = l[n] * x[t + 1] - l[n + 1] * x[t];
    double bx = x[t + 1] * r[n + 2] - x[t + 2] * r[n + 1];
    double by = x[t + 2] * r[n] - x[t] * r[n + 2];
    double bz = x[t] * r[n + 1] - x[t + 1] * r[n];
    double down = -(bx * l[n] + by * l[n + 1] + bz * l[n + 2]);
    double angle = Math.atan2(down, ax * bx + ay * by + az * bz);
    return angle < 0 ? angle + 2 * Math.PI : angle;
  }

  private static boolean coarse(EdgeSamples s, int entry, double[] angle) {
    for (int j = 1; j < angle.length; j++) {
      int at = s.start[entry] + j;
      if (Math.abs(angle[j] - angle[j - 1]) > ANGLE_STEP
          || cosTurn(s.curve, 6 * at + 3, 6) < COS_TURN_STEP
          || cosTurn(s.side[0], EdgeSamples.STRIDE * at, EdgeSamples.STRIDE) < COS_TURN_STEP
          || cosTurn(s.side[1], EdgeSamples.STRIDE * at, EdgeSamples.STRIDE) < COS_TURN_STEP) {
        return true;
      }
    }
    return false;
  }

  private static double cosTurn(double[] x, int at, int stride) {
    int b = at - stride;
    return x[at] * x[b] + x[at + 1] * x[b + 1] + x[at + 2] * x[b + 2];
  }

  private static EdgeClass classOf(double[] angle, int[] faces) {
    boolean convex = false;
    boolean tangent = false;
    boolean concave = false;
    for (double a : angle) {
      if (Math.abs(a - Math.PI) <= EdgeFeature.TANGENT_RAD) {
        tangent = true;
      } else if (a < Math.PI) {
        convex = true;
      } else {
        concave = true;
      }
    }
    if ((convex ? 1 : 0) + (tangent ? 1 : 0) + (concave ? 1 : 0) > 1) {
      return EdgeClass.MIXED;
    }
    if (tangent) {
      return faces[0] == faces[1] ? EdgeClass.SEAM : EdgeClass.TANGENT;
    }
    return convex ? EdgeClass.SHARP_CONVEX : EdgeClass.SHARP_CONCAVE;
  }
}
