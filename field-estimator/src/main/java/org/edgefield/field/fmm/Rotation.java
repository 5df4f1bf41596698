package org.edgefield.field.fmm;

/**
 * Turns batches of harmonic coefficients so that a direction comes to lie on the z axis, and back.
 *
 * <p>The turn is split into one about z, which mixes the cosine and sine of one (l, m) only, and
 * one about y, whose matrix falls apart by degree and by parity in y into blocks of (l+1)^2 and
 * l^2. In the Schmidt basis all blocks are orthogonal, so the way back is the transpose. Blocks
 * come from the defining integral D_mm' = (2l+1)/(4 pi) Int Y_lm(Rx) Y_lm'(x) dOmega by a product
 * rule (Gauss in cos theta, uniform in phi) that is exact for these polynomials.
 */
final class Rotation {
  private final int order;
  private final double[][] cosineBlock;
  private final double[][] sineBlock;
  private final double[] cosine;
  private final double[] sine;

  /**
   * Prepares the turn of one direction.
   *
   * @param order highest degree
   * @param x direction, need not be a unit vector
   * @param y direction
   * @param z direction
   */
  Rotation(int order, double x, double y, double z) {
    this(order, polar(order, Math.hypot(x, y), z), x, y);
  }

  private Rotation(int order, double[][][] polar, double x, double y) {
    this.order = order;
    cosineBlock = polar[0];
    sineBlock = polar[1];
    double phi = x == 0 && y == 0 ? 0 : Math.atan2(y, x);
    cosine = new double[order + 1];
    sine = new double[order + 1];
    for (int m = 0; m <= order; m++) {
      cosine[m] = Math.cos(m * phi);
      sine[m] = Math.sin(m * phi);
    }
  }

  /** The same polar angle at another azimuth; shares the large tables. */
  Rotation atAzimuth(double x, double y) {
    return new Rotation(order, new double[][][] {cosineBlock, sineBlock}, x, y);
  }

  /**
   * Turns the direction onto z.
   *
   * @param lanes number of expansions in the batch
   * @param stride distance between coefficients
   * @param a in: coefficients a[k * stride + lane]; spoilt
   * @param b out
   */
  void toAxis(int lanes, int stride, double[] a, double[] b) {
    aboutZ(1, lanes, stride, a);
    aboutY(false, lanes, stride, a, b);
  }

  /** Turns z back into the direction; arguments as in {@link #toAxis}, {@code a} is kept. */
  void fromAxis(int lanes, int stride, double[] a, double[] b) {
    aboutY(true, lanes, stride, a, b);
    aboutZ(-1, lanes, stride, b);
  }

  private void aboutZ(int sign, int lanes, int stride, double[] a) {
    for (int m = 1; m <= order; m++) {
      double c = cosine[m];
      double s = sign * sine[m];
      if (c == 1 && s == 0) {
        continue;
      }
      for (int l = m; l <= order; l++) {
        turn(lanes, SolidHarmonics.cosine(l, m) * stride, stride, c, s, a);
      }
    }
  }

  private static void turn(int lanes, int p, int stride, double c, double s, double[] a) {
    int q = p + stride;
    for (int i = 0; i < lanes; i++) {
      double u = a[p + i];
      double v = a[q + i];
      a[p + i] = c * u + s * v;
      a[q + i] = c * v - s * u;
    }
  }

  private void aboutY(boolean back, int lanes, int stride, double[] a, double[] b) {
    for (int i = 0; i < lanes; i++) {
      b[i] = a[i];
    }
    for (int l = 1; l <= order; l++) {
      int base = l * l;
      for (int m = 0; m <= l; m++) {
        int to = (m == 0 ? base : base + 2 * m - 1) * stride;
        combine(cosineBlock[l], l + 1, m, back, base, -1, lanes, stride, a, b, to);
      }
      for (int m = 1; m <= l; m++) {
        combine(
            sineBlock[l], l, m - 1, back, base, 2, lanes, stride, a, b, (base + 2 * m) * stride);
      }
    }
  }

  // One row of a block (or of its transpose) times the batch; inputs stand at base, base + 1, base
  // +
  // 3 ... for cosines (offset -1) and at base + 2, base + 4 ... for sines (offset 2).
  private static void combine(
      double[] block,
      int n,
      int row,
      boolean transposed,
      int base,
      int offset,
      int lanes,
      int stride,
      double[] a,
      double[] b,
      int to) {
    int step = transposed ? n : 1;
    int at = transposed ? row : row * n;
    int j = 0;
    if ((n & 1) == 1) {
      double f = block[at];
      int p = input(base, offset, 0) * stride;
      for (int i = 0; i < lanes; i++) {
        b[to + i] = f * a[p + i];
      }
      j = 1;
    } else {
      double f = block[at];
      double g = block[at + step];
      int p = input(base, offset, 0) * stride;
      int q = input(base, offset, 1) * stride;
      for (int i = 0; i < lanes; i++) {
        b[to + i] = f * a[p + i] + g * a[q + i];
      }
      j = 2;
    }
    for (; j + 3 < n; j += 4) {
      double f0 = block[at + j * step];
      double f1 = block[at + (j + 1) * step];
      double f2 = block[at + (j + 2) * step];
      double f3 = block[at + (j + 3) * step];
      int p0 = input(base, offset, j) * stride;
      int p1 = input(base, offset, j + 1) * stride;
      int p2 = input(base, offset, j + 2) * stride;
      int p3 = input(base, offset, j + 3) * stride;
      for (int i = 0; i < lanes; i++) {
        b[to + i] += f0 * a[p0 + i] + f1 * a[p1 + i] + (f2 * a[p2 + i] + f3 * a[p3 + i]);
      }
    }
    for (; j < n; j += 2) {
      double f0 = block[at + j * step];
      double f1 = block[at + (j + 1) * step];
      int p0 = input(base, offset, j) * stride;
      int p1 = input(base, offset, j + 1) * stride;
      for (int i = 0; i < lanes; i++) {
        b[to + i] += f0 * a[p0 + i] + f1 * a[p1 + i];
      }
    }
  }

  private static int input(int base, int offset, int j) {
    return offset < 0 && j == 0 ? base : base + 2 * j + offset;
  }

  // Blocks of the turn about y that brings (sin theta, 0, cos theta) to z: {cosine blocks, sine
  // blocks}.
  private static double[][][] polar(int order, double rho, double z) {
    double r = Math.hypot(rho, z);
    double sin = rho / r;
    double cos = z / r;
    double[][] rule = GaussLegendre.rule(order + 1);
    int turns = 2 * order + 2;
    int n = (order + 1) * turns;
    double[][] p = new double[6][n];
    double[] weight = new double[n];
    for (int i = 0, q = 0; i <= order; i++) {
      double s = Math.sqrt(1 - rule[0][i] * rule[0][i]);
      for (int k = 0; k < turns; k++, q++) {
        double phi = 2 * Math.PI * (k + 0.5) / turns;
        p[0][q] = s * Math.cos(phi);
        p[1][q] = s * Math.sin(phi);
        p[2][q] = rule[0][i];
        p[3][q] = cos * p[0][q] - sin * p[2][q];
        p[4][q] = p[1][q];
        p[5][q] = sin * p[0][q] + cos * p[2][q];
        weight[q] = rule[1][i] / (2 * turns);
      }
    }
    SolidHarmonics harmonics = new SolidHarmonics(order);
    double[] plain = new double[SolidHarmonics.count(order) * n];
    double[] turned = new double[plain.length];
    harmonics.regular(n, p[0], p[1], p[2], n, plain);
    harmonics.regular(n, p[3], p[4], p[5], n, turned);
    double[][] c = new double[order + 1][];
    double[][] s = new double[order + 1][];
    for (int l = 0; l <= order; l++) {
      c[l] = new double[(l + 1) * (l + 1)];
      s[l] = new double[l * l];
      for (int m = 0; m <= l; m++) {
        for (int k = 0; k <= l; k++) {
          c[l][m * (l + 1) + k] =
              inner(l, n, weight, turned, input(l * l, -1, m), plain, input(l * l, -1, k));
          if (m > 0 && k > 0) {
            s[l][(m - 1) * l + k - 1] =
                inner(l, n, weight, turned, l * l + 2 * m, plain, l * l + 2 * k);
          }
        }
      }
    }
    return new double[][][] {c, s};
  }

  private static double inner(
      int l, int n, double[] weight, double[] turned, int row, double[] plain, int column) {
    double sum = 0;
    for (int q = 0; q < n; q++) {
      sum += weight[q] * turned[row * n + q] * plain[column * n + q];
    }
    return (2 * l + 1) * sum;
  }
}
