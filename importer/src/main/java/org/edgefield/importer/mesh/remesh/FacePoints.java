package org.edgefield.importer.mesh.remesh;

import java.util.Arrays;
import org.edgefield.importer.brep.ExactGeometry;

/**
 * Points on faces near given points, many at a time, by Gauss-Newton steps in the parameters from a
 * start close by. The points returned are the surface's own at the parameters returned, however
 * near the steps came.
 */
public final class FacePoints {
  private static final int STRIDE = 9;

  private final ExactGeometry geometry;

  /** Face per point. */
  public int[] face = new int[0];

  /** Point to come near to, 3 each. */
  public double[] target = new double[0];

  /** Parameters: start, then result; 2 each. */
  public double[] uv = new double[0];

  /** Result: position and first derivatives, 9 each. */
  public double[] surface = new double[0];

  private double[] trialUv = new double[0];
  private double[] trial = new double[0];

  /** Creates an empty set. */
  public FacePoints(ExactGeometry geometry) {
    this.geometry = geometry;
  }

  /** Makes room for n points, keeping what is there. */
  public void ensure(int n) {
    if (face.length < n) {
      int room = Math.max(n, 2 * face.length);
      face = Arrays.copyOf(face, room);
      target = Arrays.copyOf(target, 3 * room);
      uv = Arrays.copyOf(uv, 2 * room);
      surface = Arrays.copyOf(surface, STRIDE * room);
      trialUv = new double[2 * room];
      trial = new double[STRIDE * room];
    }
  }

  /** Evaluates the first n points and takes some steps towards their targets. */
  public void settle(int n, int steps) {
    geometry.surface(n, face, uv, surface);
    for (int s = 0; s < steps; s++) {
      for (int i = 0; i < n; i++) {
        step(i);
      }
      geometry.surface(n, face, trialUv, trial);
      for (int i = 0; i < n; i++) {
        if (distance2(trial, i) < distance2(surface, i)) {
          uv[2 * i] = trialUv[2 * i];
          uv[2 * i + 1] = trialUv[2 * i + 1];
          System.arraycopy(trial, STRIDE * i, surface, STRIDE * i, STRIDE);
        }
      }
    }
  }

  private double distance2(double[] s, int i) {
    double dx = target[3 * i] - s[STRIDE * i];
    double dy = target[3 * i + 1] - s[STRIDE * i + 1];
    double dz = target[3 * i + 2] - s[STRIDE * i + 2];
    return dx * dx + dy * dy + dz * dz;
  }

  private void step(int i) {
    int a = STRIDE * i;
    double[] s = surface;
    double rx = target[3 * i] - s[a];
    double ry = target[3 * i + 1] - s[a + 1];
    double rz = target[3 * i + 2] - s[a + 2];
    double uu = s[a + 3] * s[a + 3] + s[a + 4] * s[a + 4] + s[a + 5] * s[a + 5];
    double vv = s[a + 6] * s[a + 6] + s[a + 7] * s[a + 7] + s[a + 8] * s[a + 8];
    double uv1 = s[a + 3] * s[a + 6] + s[a + 4] * s[a + 7] + s[a + 5] * s[a + 8];
    double ru = rx * s[a + 3] + ry * s[a + 4] + rz * s[a + 5];
    double rv = rx * s[a + 6] + ry * s[a + 7] + rz * s[a + 8];
    double det = uu * vv - uv1 * uv1;
    double du = 0;
    double dv = 0;
    if (det > 1e-14 * uu * vv) {
      du = (ru * vv - rv * uv1) / det;
      dv = (rv * uu - ru * uv1) / det;
    } else if (uu > vv) {
      du = ru / uu;
    } else if (vv > 0) {
      dv = rv / vv;
    }
    trialUv[2 * i] = uv[2 * i] + du;
    trialUv[2 * i + 1] = uv[2 * i + 1] + dv;
  }

  /**
   * Unit normal of a settled point, turned to the side of a reference.
   *
   * @param i point
   * @param reference normals
   * @param at first index of the reference
   * @param out receives the normal
   * @param to first index to write
   * @return false where the derivatives give no normal
   */
  boolean normal(int i, double[] reference, int at, double[] out, int to) {
    int a = STRIDE * i;
    double[] s = surface;
    double x = s[a + 4] * s[a + 8] - s[a + 5] * s[a + 7];
    double y = s[a + 5] * s[a + 6] - s[a + 3] * s[a + 8];
    double z = s[a + 3] * s[a + 7] - s[a + 4] * s[a + 6];
    double length = Math.sqrt(x * x + y * y + z * z);
    if (!(length > 0)) {
      return false;
    }
    if (x * reference[at] + y * reference[at + 1] + z * reference[at + 2] < 0) {
      length = -length;
    }
    out[to] = x / length;
    out[to + 1] = y / length;
    out[to + 2] = z / length;
    return true;
  }
}
