package org.edgefield.curvature.feature;

import java.util.Arrays;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.SurfaceKind;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Finds the form of every face from exact curvatures at points inside its triangles, evaluated in
 * one batch.
 */
final class FaceForms {
  private static final int STRIDE = ExactGeometry.CURVATURE_STRIDE;

  /** Triangles looked at per face; three points in each. */
  private static final int TRIANGLES = 16;

  /** Free forms are looked at more closely, for their smallest radius. */
  private static final int FREE_TRIANGLES = 2000;

  /** Relative spread up to which a curvature counts as constant (NURBS fits are not exact). */
  private static final double CONSTANT = 0.01;

  /** Angle between all normals of a face below which it counts as flat. */
  private static final double FLAT_RAD = Math.toRadians(0.05);

  private static final FaceForm FLAT =
      new FaceForm(FaceForm.Kind.FLAT, true, Double.NaN, Double.POSITIVE_INFINITY, Double.NaN);

  private final ExactGeometry geometry;
  private final SurfaceMesh mesh;
  private final int[] faceStart;
  private final int[] faceTriangles;

  /** First point per face, and all values of the points. */
  private int[] start;

  private double[] values;

  private FaceForms(ExactGeometry geometry, SurfaceMesh mesh) {
    this.geometry = geometry;
    this.mesh = mesh;
    int n = geometry.faceCount();
    faceStart = new int[n + 1];
    for (int f : mesh.triangleFace()) {
      faceStart[f + 1]++;
    }
    for (int f = 0; f < n; f++) {
      faceStart[f + 1] += faceStart[f];
    }
    faceTriangles = new int[mesh.triangleCount()];
    int[] fill = faceStart.clone();
    for (int t = 0; t < faceTriangles.length; t++) {
      faceTriangles[fill[mesh.triangleFace()[t]]++] = t;
    }
  }

  static FaceForm[] find(ExactGeometry geometry, SurfaceMesh mesh) {
    return new FaceForms(geometry, mesh).find();
  }

  private FaceForm[] find() {
    int n = geometry.faceCount();
    int[] most = new int[n];
    Arrays.fill(most, TRIANGLES);
    sample(most, 0.1);
    FaceForm[] forms = new FaceForm[n];
    Arrays.fill(most, 0);
    boolean anyFree = false;
    for (int f = 0; f < n; f++) {
      forms[f] = form(f);
      if (forms[f].form() == FaceForm.Kind.FREE) {
        most[f] = FREE_TRIANGLES;
        anyFree = true;
      }
    }
    if (anyFree) {
      sample(most, 0);
      for (int f = 0; f < n; f++) {
        if (most[f] > 0) {
          forms[f] = free(f);
        }
      }
    }
    return forms;
  }

  /**
   * Evaluates three points in up to so many triangles of each face, spread over the face.
   *
   * @param inset 0 for the corners themselves, more to keep away from poles and apexes
   */
  private void sample(int[] most, double inset) {
    int n = most.length;
    start = new int[n + 1];
    for (int f = 0; f < n; f++) {
      start[f + 1] = start[f] + 3 * Math.min(most[f], faceStart[f + 1] - faceStart[f]);
    }
    int points = start[n];
    int[] face = new int[points];
    double[] uv = new double[2 * points];
    for (int f = 0; f < n; f++) {
      int have = faceStart[f + 1] - faceStart[f];
      int take = (start[f + 1] - start[f]) / 3;
      for (int i = 0; i < take; i++) {
        int t = faceTriangles[faceStart[f] + (int) ((long) i * have / take)];
        for (int k = 0; k < 3; k++) {
          int p = start[f] + 3 * i + k;
          face[p] = f;
          for (int c = 0; c < 2; c++) {
            double[] w = mesh.cornerUv();
            double sum = w[6 * t + c] + w[6 * t + 2 + c] + w[6 * t + 4 + c];
            uv[2 * p + c] = inset * sum + (1 - 3 * inset) * w[6 * t + 2 * k + c];
          }
        }
      }
    }
    values = new double[STRIDE * points];
    geometry.curvature(points, face, uv, values);
  }

  private FaceForm form(int f) {
    int from = start[f];
    int to = start[f + 1];
    if (from == to) {
      return FLAT;
    }
    SurfaceKind kind = geometry.faceKind(f);
    double[] one = range(from, to, 3);
    double[] two = range(from, to, 4);
    double mean1 = 0.5 * (one[0] + one[1]);
    double mean2 = 0.5 * (two[0] + two[1]);
    if (kind == SurfaceKind.PLANE || normalSpread(from, to) < FLAT_RAD) {
      return FLAT;
    }
    double tightest = one[1] > 0 ? 1 / one[1] : Double.POSITIVE_INFINITY;
    boolean analytic = kind != SurfaceKind.NURBS && kind != SurfaceKind.OTHER;
    double scale = Math.max(Math.abs(mean1), Math.abs(mean2));
    boolean constant1 = one[1] - one[0] <= CONSTANT * Math.abs(mean1);
    boolean constant2 = two[1] - two[0] <= CONSTANT * Math.abs(mean2);
    if (kind == SurfaceKind.SPHERE
        || (!analytic && constant1 && constant2 && mean1 - mean2 <= CONSTANT * scale)) {
      return round(FaceForm.Kind.SPHERE, 0.5 * (mean1 + mean2), tightest);
    }
    boolean zero1 = Math.max(Math.abs(one[0]), Math.abs(one[1])) <= CONSTANT * scale;
    boolean zero2 = Math.max(Math.abs(two[0]), Math.abs(two[1])) <= CONSTANT * scale;
    if (kind == SurfaceKind.CYLINDER
        || (!analytic
            && ((constant1 && zero2 && acrossAxis(from, to, 8))
                || (constant2 && zero1 && acrossAxis(from, to, 5))))) {
      double k = Math.abs(mean1) > Math.abs(mean2) ? mean1 : mean2;
      return round(FaceForm.Kind.CYLINDER, k, tightest);
    }
    if (kind == SurfaceKind.CONE || (!analytic && (zero1 || zero2))) {
      double halfAngle = coneHalfAngle(from, to);
      if (kind == SurfaceKind.CONE || halfAngle > 0) {
        return new FaceForm(
            FaceForm.Kind.CONE, mean1 > Math.abs(mean2), Double.NaN, tightest, Math.abs(halfAngle));
      }
    }
    if (kind == SurfaceKind.TORUS || constant1 || constant2) {
      // The section's curvature is the steadier one.
      boolean first = (one[1] - one[0]) * Math.abs(mean2) <= (two[1] - two[0]) * Math.abs(mean1);
      double k = first ? mean1 : mean2;
      boolean leads = Math.abs(k) >= 0.999 * scale;
      return round(leads ? FaceForm.Kind.ROUND_SECTION : FaceForm.Kind.DOME, k, tightest);
    }
    return free(f);
  }

  private static FaceForm round(FaceForm.Kind kind, double curvature, double tightest) {
    return new FaceForm(kind, curvature > 0, Math.abs(1 / curvature), tightest, Double.NaN);
  }

  private FaceForm free(int f) {
    double most = 0;
    for (int p = start[f]; p < start[f + 1]; p++) {
      most = Math.max(most, values[STRIDE * p + 3]);
    }
    return new FaceForm(FaceForm.Kind.FREE, most > 0, Double.NaN, 1 / most, Double.NaN);
  }

  private double[] range(int from, int to, int component) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int p = from; p < to; p++) {
      low = Math.min(low, values[STRIDE * p + component]);
      high = Math.max(high, values[STRIDE * p + component]);
    }
    return new double[] {low, high};
  }

  /** Largest angle between the first normal and any other. */
  private double normalSpread(int from, int to) {
    double most = 0;
    for (int p = from + 1; p < to; p++) {
      most = Math.max(most, angle(from, p));
    }
    return most;
  }

  private double angle(int p, int q) {
    double[] c = cross(p, q, -1);
    double dot = 0;
    for (int k = 0; k < 3; k++) {
      dot += values[STRIDE * p + k] * values[STRIDE * q + k];
    }
    return Math.atan2(Math.sqrt(c[0] * c[0] + c[1] * c[1] + c[2] * c[2]), dot);
  }

  /**
   * Whether all normals are across one axis: the first point's direction of no curvature. A thin
   * ring has as small a second curvature as a cylinder, but its normals go round.
   *
   * @param direction offset of that direction in a point's values
   */
  private boolean acrossAxis(int from, int to, int direction) {
    for (int p = from; p < to; p++) {
      double along = 0;
      for (int k = 0; k < 3; k++) {
        along += values[STRIDE * p + k] * values[STRIDE * from + direction + k];
      }
      if (Math.abs(along) > CONSTANT) {
        return false;
      }
    }
    return true;
  }

  /** Cross product of two normals, or of their differences to a third. */
  private double[] cross(int p, int q, int origin) {
    double[] a = new double[3];
    double[] b = new double[3];
    for (int k = 0; k < 3; k++) {
      double o = origin < 0 ? 0 : values[STRIDE * origin + k];
      a[k] = values[STRIDE * p + k] - o;
      b[k] = values[STRIDE * q + k] - o;
    }
    return new double[] {
      a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]
    };
  }

  /**
   * Half-angle of a cone. Its normals lie in one plane across the axis, at the sine of the
   * half-angle from the origin. Negative where the normals do not lie in a plane.
   */
  private double coneHalfAngle(int from, int to) {
    int far = from;
    for (int p = from; p < to; p++) {
      if (angle(from, p) > angle(from, far)) {
        far = p;
      }
    }
    double[] axis = new double[3];
    double best = 0;
    for (int p = from; p < to; p++) {
      double[] c = cross(far, p, from);
      double l = Math.sqrt(c[0] * c[0] + c[1] * c[1] + c[2] * c[2]);
      if (l > best) {
        best = l;
        axis = new double[] {c[0] / l, c[1] / l, c[2] / l};
      }
    }
    if (best == 0) {
      return -1;
    }
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int p = from; p < to; p++) {
      double h = 0;
      for (int k = 0; k < 3; k++) {
        h += axis[k] * values[STRIDE * p + k];
      }
      low = Math.min(low, h);
      high = Math.max(high, h);
    }
    double sine = Math.abs(0.5 * (low + high));
    return high - low <= 0.002 ? Math.asin(Math.min(1, sine)) : -Math.asin(Math.min(1, sine));
  }
}
