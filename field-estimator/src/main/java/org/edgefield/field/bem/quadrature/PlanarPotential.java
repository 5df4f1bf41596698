package org.edgefield.field.bem.quadrature;

/**
 * Potential of a plane triangle with linear density, in closed form.
 *
 * <pre>
 *   Int 1/R dS          = sum_i ( P_i f_i - |h| b_i )
 *   Int (rho' - rho)/R  = 1/2 sum_i u_i ( R0_i^2 f_i + l+ R+ - l- R- )
 *   f_i = ln((R+ + l+)/(R- + l-)),  b_i = atan(P l+ / (R0^2 + |h| R+)) - atan(P l- / (R0^2 + |h| R-))
 * </pre>
 *
 * over the sides i, with h the height over the plane, P_i the signed distance of the foot point
 * from side i and u_i its outward normal. Any position, on the triangle included. Reference:
 * Wilton, Rao, Glisson, Schaubert, Al-Bundak and Butler, IEEE Trans. Antennas Propag. 32 (1984) 276
 * (memory; checked against adaptive quadrature in the tests).
 */
public final class PlanarPotential {
  private PlanarPotential() {}

  /**
   * Integrals of the three barycentric coordinates over R.
   *
   * @param q corners of the triangle, 9 doubles, metres
   * @param x observation point
   * @param y observation point
   * @param z observation point
   * @param out three integrals, metres
   */
  public static void linear(double[] q, double x, double y, double z, double[] out) {
    double e1x = q[3] - q[0];
    double e1y = q[4] - q[1];
    double e1z = q[5] - q[2];
    double e2x = q[6] - q[0];
    double e2y = q[7] - q[1];
    double e2z = q[8] - q[2];
    double nx = e1y * e2z - e1z * e2y;
    double ny = e1z * e2x - e1x * e2z;
    double nz = e1x * e2y - e1y * e2x;
    double twice = Math.sqrt(nx * nx + ny * ny + nz * nz);
    if (!(twice > 0)) {
      out[0] = 0;
      out[1] = 0;
      out[2] = 0;
      return;
    }
    nx /= twice;
    ny /= twice;
    nz /= twice;
    double h = (x - q[0]) * nx + (y - q[1]) * ny + (z - q[2]) * nz;
    double fx = x - h * nx;
    double fy = y - h * ny;
    double fz = z - h * nz;
    double height = Math.abs(h);
    double sum = 0;
    double mx = 0;
    double my = 0;
    double mz = 0;
    for (int i = 0; i < 3; i++) {
      int a = 3 * i;
      int b = 3 * ((i + 1) % 3);
      double tx = q[b] - q[a];
      double ty = q[b + 1] - q[a + 1];
      double tz = q[b + 2] - q[a + 2];
      double length = Math.sqrt(tx * tx + ty * ty + tz * tz);
      tx /= length;
      ty /= length;
      tz /= length;
      // Outward normal of the side in the plane: t x n.
      double ux = ty * nz - tz * ny;
      double uy = tz * nx - tx * nz;
      double uz = tx * ny - ty * nx;
      double ax = q[a] - fx;
      double ay = q[a + 1] - fy;
      double az = q[a + 2] - fz;
      double p = ax * ux + ay * uy + az * uz;
      double low = ax * tx + ay * ty + az * tz;
      double high = low + length;
      double r02 = p * p + h * h;
      double rLow = Math.sqrt(r02 + low * low);
      double rHigh = Math.sqrt(r02 + high * high);
      if (r02 < 1e-28 * length * length) {
        // On the line of the side both f terms vanish with P and R0^2.
        double ends = high * rHigh - low * rLow;
        mx += ux * ends;
        my += uy * ends;
        mz += uz * ends;
        continue;
      }
      // The form without cancellation, whichever side of the foot the segment lies on.
      double f =
          high + low >= 0
              ? Math.log((rHigh + high) / (rLow + low))
              : Math.log((rLow - low) / (rHigh - high));
      sum += p * f;
      if (height > 0) {
        sum -=
            height
                * (Math.atan(p * high / (r02 + height * rHigh))
                    - Math.atan(p * low / (r02 + height * rLow)));
      }
      double ends = r02 * f + high * rHigh - low * rLow;
      mx += ux * ends;
      my += uy * ends;
      mz += uz * ends;
    }
    mx *= 0.5;
    my *= 0.5;
    mz *= 0.5;
    // Barycentric coordinates of the foot point and their gradients along the plane.
    double g1x = (e2y * nz - e2z * ny) / twice;
    double g1y = (e2z * nx - e2x * nz) / twice;
    double g1z = (e2x * ny - e2y * nx) / twice;
    double g2x = (ny * e1z - nz * e1y) / twice;
    double g2y = (nz * e1x - nx * e1z) / twice;
    double g2z = (nx * e1y - ny * e1x) / twice;
    double dx = fx - q[0];
    double dy = fy - q[1];
    double dz = fz - q[2];
    double l1 = g1x * dx + g1y * dy + g1z * dz;
    double l2 = g2x * dx + g2y * dy + g2z * dz;
    out[1] = l1 * sum + g1x * mx + g1y * my + g1z * mz;
    out[2] = l2 * sum + g2x * mx + g2y * my + g2z * mz;
    out[0] = sum - out[1] - out[2];
  }
}
