package org.edgefield.importer.mesh.size;

/**
 * Symmetric positive definite 3 x 3 tensors that measure lengths in elements: sqrt(e' M e) = 1 for
 * a mesh edge e of the wanted size. Stored as six doubles in a row: xx, xy, xz, yy, yz, zz, in
 * 1/m2. Arrays hold one tensor per vertex; {@code at} is the first index of a tensor.
 */
public final class Metric {
  /** Doubles per tensor. */
  public static final int STRIDE = 6;

  private static final int JACOBI_SWEEPS = 12;

  private Metric() {}

  /** Squared length of a vector in elements. */
  public static double square(double[] m, int at, double x, double y, double z) {
    return m[at] * x * x
        + m[at + 3] * y * y
        + m[at + 5] * z * z
        + 2 * (m[at + 1] * x * y + m[at + 2] * x * z + m[at + 4] * y * z);
  }

  /** Writes the tensor of one size in all directions. */
  public static void setIsotropic(double[] m, int at, double size) {
    double w = 1 / (size * size);
    m[at] = w;
    m[at + 1] = 0;
    m[at + 2] = 0;
    m[at + 3] = w;
    m[at + 4] = 0;
    m[at + 5] = w;
  }

  /** Adds w d d' for a unit vector d. */
  public static void addOuter(double[] m, int at, double w, double x, double y, double z) {
    m[at] += w * x * x;
    m[at + 1] += w * x * y;
    m[at + 2] += w * x * z;
    m[at + 3] += w * y * y;
    m[at + 4] += w * y * z;
    m[at + 5] += w * z * z;
  }

  /** Adds w times the identity. */
  public static void addIdentity(double[] m, int at, double w) {
    m[at] += w;
    m[at + 3] += w;
    m[at + 5] += w;
  }

  /** Multiplies a tensor. */
  public static void scale(double[] m, int at, double f) {
    for (int i = 0; i < STRIDE; i++) {
      m[at + i] *= f;
    }
  }

  /** Sum of the diagonal. */
  public static double trace(double[] m, int at) {
    return m[at] + m[at + 3] + m[at + 5];
  }

  /**
   * Squared area factor: determinant of the tensor restricted to the plane with unit normal n. The
   * square root times an area is the area in elements.
   */
  public static double planeDeterminant(double[] m, int at, double nx, double ny, double nz) {
    double xx = m[at];
    double xy = m[at + 1];
    double xz = m[at + 2];
    double yy = m[at + 3];
    double yz = m[at + 4];
    double zz = m[at + 5];
    // n' adj(M) n
    double axx = yy * zz - yz * yz;
    double ayy = xx * zz - xz * xz;
    double azz = xx * yy - xy * xy;
    double axy = xz * yz - xy * zz;
    double axz = xy * yz - xz * yy;
    double ayz = xy * xz - yz * xx;
    return axx * nx * nx
        + ayy * ny * ny
        + azz * nz * nz
        + 2 * (axy * nx * ny + axz * nx * nz + ayz * ny * nz);
  }

  /** Whether a - b is positive definite, b taken from index 0. */
  static boolean covers(double[] a, int at, double[] b) {
    double xx = a[at] - b[0];
    double xy = a[at + 1] - b[1];
    double xz = a[at + 2] - b[2];
    double yy = a[at + 3] - b[3];
    double yz = a[at + 4] - b[4];
    double zz = a[at + 5] - b[5];
    if (xx <= 0) {
      return false;
    }
    double m2 = xx * yy - xy * xy;
    if (m2 <= 0) {
      return false;
    }
    double det = zz * m2 - (xx * yz * yz - 2 * xy * xz * yz + yy * xz * xz);
    return det > 0;
  }

  /**
   * Replaces tensor a by the intersection of a and b: the sizes of both are kept to in every
   * direction. By simultaneous reduction (F. Alauzet, "Size gradation control of anisotropic
   * meshes", Finite Elements in Analysis and Design 46, 2010; from memory).
   *
   * @param a tensors, the one at {@code at} is replaced
   * @param at first index
   * @param b the other tensor at index 0; may be semi-definite
   * @param work at least 15 doubles
   */
  public static void intersect(double[] a, int at, double[] b, double[] work) {
    // a = L L'
    double l00 = Math.sqrt(a[at]);
    double l10 = a[at + 1] / l00;
    double l20 = a[at + 2] / l00;
    double l11 = Math.sqrt(Math.max(a[at + 3] - l10 * l10, 1e-12 * a[at + 3]));
    double l21 = (a[at + 4] - l20 * l10) / l11;
    double l22 = Math.sqrt(Math.max(a[at + 5] - l20 * l20 - l21 * l21, 1e-12 * a[at + 5]));
    // C = inverse(L) B inverse(L)'
    double i00 = 1 / l00;
    double i11 = 1 / l11;
    double i22 = 1 / l22;
    double i10 = -l10 * i00 * i11;
    double i21 = -l21 * i11 * i22;
    double i20 = -(l20 * i00 + l21 * i10) * i22;
    double b00 = b[0];
    double b01 = b[1];
    double b02 = b[2];
    double b11 = b[3];
    double b12 = b[4];
    double b22 = b[5];
    double r10 = i10 * b00 + i11 * b01;
    double r11 = i10 * b01 + i11 * b11;
    double r20 = i20 * b00 + i21 * b01 + i22 * b02;
    double r21 = i20 * b01 + i21 * b11 + i22 * b12;
    double r22 = i20 * b02 + i21 * b12 + i22 * b22;
    double[] c = work;
    c[0] = i00 * i00 * b00;
    c[1] = i00 * r10;
    c[2] = i00 * r20;
    c[3] = r10 * i10 + r11 * i11;
    c[4] = r20 * i10 + r21 * i11;
    c[5] = r20 * i20 + r21 * i21 + r22 * i22;
    eigen(c, 6);
    // a = L Q max(1, lambda) Q' L'
    double xx = 0;
    double xy = 0;
    double xz = 0;
    double yy = 0;
    double yz = 0;
    double zz = 0;
    for (int k = 0; k < 3; k++) {
      double lambda = Math.max(1, c[k]);
      double q0 = c[6 + 3 * k];
      double q1 = c[7 + 3 * k];
      double q2 = c[8 + 3 * k];
      double x = l00 * q0;
      double y = l10 * q0 + l11 * q1;
      double z = l20 * q0 + l21 * q1 + l22 * q2;
      xx += lambda * x * x;
      xy += lambda * x * y;
      xz += lambda * x * z;
      yy += lambda * y * y;
      yz += lambda * y * z;
      zz += lambda * z * z;
    }
    a[at] = xx;
    a[at + 1] = xy;
    a[at + 2] = xz;
    a[at + 3] = yy;
    a[at + 4] = yz;
    a[at + 5] = zz;
  }

  /**
   * Eigenvalues and unit eigenvectors by cyclic Jacobi rotations.
   *
   * @param c in: tensor at index 0 (six doubles); out: the three eigenvalues at index 0,
   *     eigenvector k at {@code vectors + 3 k}
   * @param vectors first index of the nine doubles of the vectors, at least 6
   */
  public static void eigen(double[] c, int vectors) {
    double a00 = c[0];
    double a01 = c[1];
    double a02 = c[2];
    double a11 = c[3];
    double a12 = c[4];
    double a22 = c[5];
    double v00 = 1;
    double v01 = 0;
    double v02 = 0;
    double v10 = 0;
    double v11 = 1;
    double v12 = 0;
    double v20 = 0;
    double v21 = 0;
    double v22 = 1;
    double scale = Math.abs(a00) + Math.abs(a11) + Math.abs(a22);
    for (int sweep = 0; sweep < JACOBI_SWEEPS; sweep++) {
      if (Math.abs(a01) + Math.abs(a02) + Math.abs(a12) <= 1e-15 * scale) {
        break;
      }
      if (a01 != 0) {
        double theta = 0.5 * (a11 - a00) / a01;
        double t = Math.copySign(1, theta) / (Math.abs(theta) + Math.sqrt(1 + theta * theta));
        double cs = 1 / Math.sqrt(1 + t * t);
        double s = t * cs;
        a00 -= t * a01;
        a11 += t * a01;
        a01 = 0;
        double p = a02;
        a02 = cs * p - s * a12;
        a12 = s * p + cs * a12;
        p = v00;
        v00 = cs * p - s * v01;
        v01 = s * p + cs * v01;
        p = v10;
        v10 = cs * p - s * v11;
        v11 = s * p + cs * v11;
        p = v20;
        v20 = cs * p - s * v21;
        v21 = s * p + cs * v21;
      }
      if (a02 != 0) {
        double theta = 0.5 * (a22 - a00) / a02;
        double t = Math.copySign(1, theta) / (Math.abs(theta) + Math.sqrt(1 + theta * theta));
        double cs = 1 / Math.sqrt(1 + t * t);
        double s = t * cs;
        a00 -= t * a02;
        a22 += t * a02;
        a02 = 0;
        double p = a01;
        a01 = cs * p - s * a12;
        a12 = s * p + cs * a12;
        p = v00;
        v00 = cs * p - s * v02;
        v02 = s * p + cs * v02;
        p = v10;
        v10 = cs * p - s * v12;
        v12 = s * p + cs * v12;
        p = v20;
        v20 = cs * p - s * v22;
        v22 = s * p + cs * v22;
      }
      if (a12 != 0) {
        double theta = 0.5 * (a22 - a11) / a12;
        double t = Math.copySign(1, theta) / (Math.abs(theta) + Math.sqrt(1 + theta * theta));
        double cs = 1 / Math.sqrt(1 + t * t);
        double s = t * cs;
        a11 -= t * a12;
        a22 += t * a12;
        a12 = 0;
        double p = a01;
        a01 = cs * p - s * a02;
        a02 = s * p + cs * a02;
        p = v01;
        v01 = cs * p - s * v02;
        v02 = s * p + cs * v02;
        p = v11;
        v11 = cs * p - s * v12;
        v12 = s * p + cs * v12;
        p = v21;
        v21 = cs * p - s * v22;
        v22 = s * p + cs * v22;
      }
    }
    c[0] = a00;
    c[1] = a11;
    c[2] = a22;
    c[vectors] = v00;
    c[vectors + 1] = v10;
    c[vectors + 2] = v20;
    c[vectors + 3] = v01;
    c[vectors + 4] = v11;
    c[vectors + 5] = v21;
    c[vectors + 6] = v02;
    c[vectors + 7] = v12;
    c[vectors + 8] = v22;
  }
}
