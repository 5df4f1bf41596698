package org.edgefield.field.bem.quadrature;

import org.edgefield.field.bem.surface.CurvedTriangles;

/**
 * Integrals of the three linear shape functions over 1/R on one curved triangle, at any distance.
 *
 * <p>Near the triangle the closed form on the plane triangle that touches it at the closest point
 * is taken out and only the bounded difference is integrated by a Gauss rule, finer for slender
 * triangles; farther away a rule alone is enough. A triangle is opened once and then serves many
 * points: its quadrature nodes are kept. Scratch memory is owned: one object per thread.
 */
public final class TriangleIntegrals {
  /** Beyond this many diameters from the middle the three-point rule serves. */
  public static final double FAR = 2.0;

  // Diameters from the middle beyond which 7, and 4 x 7, points do.
  private static final double SEVEN_BEYOND = 1.5;
  private static final double SPLIT_BEYOND = 0.9;

  private final CurvedTriangles triangles;
  private final Nodes three = new Nodes(TriangleRule.THREE);
  private final Nodes seven = new Nodes(TriangleRule.SEVEN);
  private final Nodes sevenBy4 = new Nodes(TriangleRule.SEVEN_BY_4);
  private final Nodes sevenBy16 = new Nodes(TriangleRule.SEVEN_BY_16);
  private final double[] p = new double[9];
  private final double[] plane = new double[9];
  private final double[] foot = new double[2];
  private int triangle = -1;

  /** Integrals over the given triangles. */
  public TriangleIntegrals(CurvedTriangles triangles) {
    this.triangles = triangles;
  }

  /** Quadrature nodes of the open triangle: positions and weights times the surface element. */
  private final class Nodes {
    private final TriangleRule rule;
    private final double[] x;
    private final double[] y;
    private final double[] z;
    private final double[] weight;
    private final double[] value;
    private int of = -1;

    Nodes(TriangleRule rule) {
      this.rule = rule;
      int n = rule.count();
      x = new double[n];
      y = new double[n];
      z = new double[n];
      weight = new double[n];
      value = new double[n];
    }

    Nodes ready() {
      if (of != triangle) {
        of = triangle;
        for (int g = 0; g < weight.length; g++) {
          triangles.evaluate(triangle, rule.u()[g], rule.v()[g], p);
          x[g] = p[0];
          y[g] = p[1];
          z[g] = p[2];
          weight[g] = rule.weight()[g] * CurvedTriangles.cross(p);
        }
      }
      return this;
    }

    /** Rule alone. */
    void plain(double px, double py, double pz, double[] out) {
      for (int g = 0; g < weight.length; g++) {
        double dx = x[g] - px;
        double dy = y[g] - py;
        double dz = z[g] - pz;
        value[g] = weight[g] / Math.sqrt(dx * dx + dy * dy + dz * dz);
      }
      out[0] = 0;
      out[1] = 0;
      out[2] = 0;
      moments(out);
    }

    /** Adds the difference between the curved triangle and the plane one. */
    void difference(double px, double py, double pz, double flat, double[] out) {
      double ax = plane[0] - px;
      double ay = plane[1] - py;
      double az = plane[2] - pz;
      double bx = plane[3] - plane[0];
      double by = plane[4] - plane[1];
      double bz = plane[5] - plane[2];
      double cx = plane[6] - plane[0];
      double cy = plane[7] - plane[1];
      double cz = plane[8] - plane[2];
      double[] u = rule.u();
      double[] v = rule.v();
      double[] w = rule.weight();
      for (int g = 0; g < weight.length; g++) {
        double dx = x[g] - px;
        double dy = y[g] - py;
        double dz = z[g] - pz;
        double ex = ax + u[g] * bx + v[g] * cx;
        double ey = ay + u[g] * by + v[g] * cy;
        double ez = az + u[g] * bz + v[g] * cz;
        value[g] =
            weight[g] / Math.sqrt(dx * dx + dy * dy + dz * dz)
                - flat * w[g] / Math.sqrt(ex * ex + ey * ey + ez * ez);
      }
      moments(out);
    }

    private void moments(double[] out) {
      double[] u = rule.u();
      double[] v = rule.v();
      double sum = 0;
      double su = 0;
      double sv = 0;
      for (int g = 0; g < value.length; g++) {
        sum += value[g];
        su += u[g] * value[g];
        sv += v[g] * value[g];
      }
      out[0] += sum - su - sv;
      out[1] += su;
      out[2] += sv;
    }
  }

  /** Opens a triangle; the points asked for next see this one. */
  public void open(int t) {
    triangle = t;
  }

  /**
   * Accurate integrals of the shape functions over 1/R.
   *
   * @param x observation point
   * @param y observation point
   * @param z observation point
   * @param out three integrals, metres
   */
  public void potential(double x, double y, double z, double[] out) {
    double d = triangles.diameter(triangle);
    double dx = x - triangles.centre(triangle, 0);
    double dy = y - triangles.centre(triangle, 1);
    double dz = z - triangles.centre(triangle, 2);
    double r = Math.sqrt(dx * dx + dy * dy + dz * dz) / d;
    if (r > SPLIT_BEYOND) {
      (r > SEVEN_BEYOND ? seven : sevenBy4).ready().plain(x, y, z, out);
      return;
    }
    if (triangles.flat(triangle)) {
      System.arraycopy(triangles.geometry(), CurvedTriangles.STRIDE * triangle, plane, 0, 9);
      PlanarPotential.linear(plane, x, y, z, out);
      return;
    }
    closest(x, y, z);
    triangles.evaluate(triangle, foot[0], foot[1], p);
    for (int i = 0; i < 3; i++) {
      double du = (i == 1 ? 1 : 0) - foot[0];
      double dv = (i == 2 ? 1 : 0) - foot[1];
      for (int k = 0; k < 3; k++) {
        plane[3 * i + k] = p[k] + du * p[3 + k] + dv * p[6 + k];
      }
    }
    double flat = CurvedTriangles.cross(p);
    PlanarPotential.linear(plane, x, y, z, out);
    double aspect = triangles.aspect(triangle);
    (aspect > 5 ? sevenBy16 : sevenBy4).ready().difference(x, y, z, flat, out);
  }

  /**
   * Integrals by the three-point rule alone: what the far field uses.
   *
   * @param out three integrals, metres
   */
  public void far(double x, double y, double z, double[] out) {
    three.ready().plain(x, y, z, out);
  }

  /** Distance of a point from the open triangle, metres. */
  public double distance(double x, double y, double z) {
    closest(x, y, z);
    triangles.evaluate(triangle, foot[0], foot[1], p);
    double dx = p[0] - x;
    double dy = p[1] - y;
    double dz = p[2] - z;
    return Math.sqrt(dx * dx + dy * dy + dz * dz);
  }

  // Closest point by Gauss-Newton in (u, v), kept inside the triangle.
  private void closest(double x, double y, double z) {
    double u = 1 / 3.0;
    double v = 1 / 3.0;
    for (int step = 0; step < 4; step++) {
      triangles.evaluate(triangle, u, v, p);
      double rx = x - p[0];
      double ry = y - p[1];
      double rz = z - p[2];
      double a = p[3] * p[3] + p[4] * p[4] + p[5] * p[5];
      double b = p[3] * p[6] + p[4] * p[7] + p[5] * p[8];
      double c = p[6] * p[6] + p[7] * p[7] + p[8] * p[8];
      double f = p[3] * rx + p[4] * ry + p[5] * rz;
      double g = p[6] * rx + p[7] * ry + p[8] * rz;
      double det = a * c - b * b;
      double nu = u;
      double nv = v;
      if (det > 0) {
        nu = u + (c * f - b * g) / det;
        nv = v + (a * g - b * f) / det;
      }
      if (nu < 0 || nv < 0 || nu + nv > 1) {
        clamp(nu, nv, a, b, c);
        nu = foot[0];
        nv = foot[1];
      }
      double moved = Math.abs(nu - u) + Math.abs(nv - v);
      u = nu;
      v = nv;
      if (moved < 1e-9) {
        break;
      }
    }
    foot[0] = u;
    foot[1] = v;
  }

  // The best point on the border, distances in the metric of the current step.
  private void clamp(double u, double v, double a, double b, double c) {
    double best = Double.POSITIVE_INFINITY;
    double bu = 0;
    double bv = 0;
    for (int side = 0; side < 3; side++) {
      double u0 = side == 1 ? 1 : 0;
      double v0 = side == 2 ? 1 : 0;
      double du = side == 0 ? 1 : side == 1 ? -1 : 0;
      double dv = side == 0 ? 0 : side == 1 ? 1 : -1;
      double pu = u - u0;
      double pv = v - v0;
      double along = a * pu * du + b * (pu * dv + pv * du) + c * pv * dv;
      double length = a * du * du + 2 * b * du * dv + c * dv * dv;
      double s = Math.max(0, Math.min(1, length > 0 ? along / length : 0));
      double qu = u0 + s * du;
      double qv = v0 + s * dv;
      double eu = u - qu;
      double ev = v - qv;
      double distance = a * eu * eu + 2 * b * eu * ev + c * ev * ev;
      if (distance < best) {
        best = distance;
        bu = qu;
        bv = qv;
      }
    }
    foot[0] = bu;
    foot[1] = bv;
  }
}
