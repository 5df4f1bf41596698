package org.edgefield.importer.mesh.spatial;

import java.util.Arrays;

/**
 * Asks a {@link TriangleTree} and holds the answer of the last query. One cursor serves one thread
 * at a time.
 *
 * <p>A query keeps to the allowed groups: all at first, see {@link #allowAll}, {@link #allowOnly},
 * {@link #allowAllBut}, {@link #allow}. The setting stays until changed.
 */
public final class TriangleCursor {
  /** Which sides of a triangle a ray may hit. */
  public enum Side {
    /** Both. */
    ANY,
    /** Only where the ray runs against the triangle's normal: it enters the solid. */
    ENTERING,
    /** Only where the ray runs along the triangle's normal: it leaves the solid. */
    LEAVING
  }

  /** Covers the rounding of the slab test, so that a ray along a box face cannot slip through. */
  private static final double SLAB_SLACK = 1 + 8 * Math.ulp(1.0);

  /**
   * Squared sine of a corner below which a triangle counts as its three sides: its normal would
   * hold fewer digits than the triangle is high.
   */
  private static final double SLIVER = 1e-16;

  private final TriangleTree tree;
  private final boolean[] allowed;
  private long allowedBits;

  private final int[] stack;
  private final double[] stackKey;

  private int slot = -1;
  private double distance;
  private double w0;
  private double w1;
  private double w2;

  /** Answer of the last call of {@link #closest}: squared distance. */
  private double square;

  private double b0;
  private double b1;
  private double b2;

  TriangleCursor(TriangleTree tree) {
    this.tree = tree;
    stack = new int[tree.depth + 2];
    stackKey = new double[tree.depth + 2];
    allowed = new boolean[tree.groupCount];
    allowAll();
  }

  /** Allows every group. */
  public void allowAll() {
    Arrays.fill(allowed, true);
    allowedBits = -1L;
  }

  /** Allows one group alone. */
  public void allowOnly(int group) {
    Arrays.fill(allowed, false);
    allowedBits = 0;
    if (group >= 0 && group < allowed.length) {
      allowed[group] = true;
      allowedBits = 1L << (group & 63);
    }
  }

  /** Allows every group but one. */
  public void allowAllBut(int group) {
    Arrays.fill(allowed, true);
    if (group >= 0 && group < allowed.length) {
      allowed[group] = false;
    }
    gatherBits();
  }

  /**
   * Allows the groups marked true; groups beyond the array are not allowed.
   *
   * @param groups mark per group
   */
  public void allow(boolean[] groups) {
    for (int g = 0; g < allowed.length; g++) {
      allowed[g] = g < groups.length && groups[g];
    }
    gatherBits();
  }

  private void gatherBits() {
    allowedBits = 0;
    for (int g = 0; g < allowed.length; g++) {
      if (allowed[g]) {
        allowedBits |= 1L << (g & 63);
      }
    }
  }

  /**
   * Nearest point of the allowed triangles.
   *
   * @param x point
   * @param y point
   * @param z point
   * @param within largest distance to look at; infinite for no limit
   * @return whether a triangle lies within that distance
   */
  public boolean nearest(double x, double y, double z, double within) {
    int hint = slot;
    slot = -1;
    if (tree.link.length == 0) {
      return false;
    }
    double best = within * within;
    if (hint >= 0 && allowed[tree.group[hint]]) {
      // Queries often follow each other closely. The last answer's distance, a little enlarged,
      // bounds this one; what is found does not depend on it.
      closest(hint, x, y, z);
      best = Math.min(best, square * (1 + 1e-12) + Double.MIN_NORMAL);
    }
    int top = 0;
    stack[top] = 0;
    stackKey[top++] = boxSquare(0, x, y, z);
    while (top > 0) {
      int node = stack[--top];
      if (stackKey[top] > best || (tree.groupBits[node] & allowedBits) == 0) {
        continue;
      }
      int count = tree.leafCount[node];
      if (count == 0) {
        int first = node + 1;
        int second = tree.link[node];
        double d1 = boxSquare(first, x, y, z);
        double d2 = boxSquare(second, x, y, z);
        boolean swap = d1 > d2;
        double far = swap ? d1 : d2;
        double near = swap ? d2 : d1;
        // The nearer child goes on top.
        if (far <= best) {
          stack[top] = swap ? first : second;
          stackKey[top++] = far;
        }
        if (near <= best) {
          stack[top] = swap ? second : first;
          stackKey[top++] = near;
        }
        continue;
      }
      int from = tree.link[node];
      for (int i = from; i < from + count; i++) {
        if (!allowed[tree.group[i]]) {
          continue;
        }
        closest(i, x, y, z);
        if (square < best || (slot < 0 && square <= best)) {
          best = square;
          slot = i;
          w0 = b0;
          w1 = b1;
          w2 = b2;
        }
      }
    }
    distance = Math.sqrt(best);
    return slot >= 0;
  }

  private double boxSquare(int node, double x, double y, double z) {
    double[] b = tree.bounds;
    int at = 6 * node;
    double dx = Math.max(0, Math.max(b[at] - x, x - b[at + 3]));
    double dy = Math.max(0, Math.max(b[at + 1] - y, y - b[at + 4]));
    double dz = Math.max(0, Math.max(b[at + 2] - z, z - b[at + 5]));
    return dx * dx + dy * dy + dz * dz;
  }

  /**
   * Closest point of one triangle: its foot where that lies inside, else the best of the three
   * sides. A triangle without area is looked at as its sides alone.
   */
  private void closest(int i, double x, double y, double z) {
    double[] c = tree.corners;
    int at = 9 * i;
    double ax = c[at];
    double ay = c[at + 1];
    double az = c[at + 2];
    double abx = c[at + 3] - ax;
    double aby = c[at + 4] - ay;
    double abz = c[at + 5] - az;
    double acx = c[at + 6] - ax;
    double acy = c[at + 7] - ay;
    double acz = c[at + 8] - az;
    double apx = x - ax;
    double apy = y - ay;
    double apz = z - az;
    double d1 = abx * apx + aby * apy + abz * apz;
    double d2 = acx * apx + acy * apy + acz * apz;
    double ab2 = abx * abx + aby * aby + abz * abz;
    double ac2 = acx * acx + acy * acy + acz * acz;
    double nx = aby * acz - abz * acy;
    double ny = abz * acx - abx * acz;
    double nz = abx * acy - aby * acx;
    double n2 = nx * nx + ny * ny + nz * nz;
    if (n2 > SLIVER * ab2 * ac2) {
      // Mixed products with the normal keep their digits on slender triangles.
      double wc = triple(nx, ny, nz, abx, aby, abz, apx, apy, apz);
      double wb = triple(nx, ny, nz, apx, apy, apz, acx, acy, acz);
      if (wb > 0 && wc > 0 && wb + wc < n2) {
        double h = nx * apx + ny * apy + nz * apz;
        b1 = wb / n2;
        b2 = wc / n2;
        b0 = 1 - b1 - b2;
        square = h * h / n2;
        return;
      }
    }
    // On the rim: the best of the three sides.
    double t = clamp(d1, ab2);
    square = squareTo(apx, apy, apz, abx, aby, abz, t);
    b0 = 1 - t;
    b1 = t;
    b2 = 0;
    t = clamp(d2, ac2);
    double s = squareTo(apx, apy, apz, acx, acy, acz, t);
    if (s < square) {
      square = s;
      b0 = 1 - t;
      b1 = 0;
      b2 = t;
    }
    double bcx = acx - abx;
    double bcy = acy - aby;
    double bcz = acz - abz;
    double bpx = apx - abx;
    double bpy = apy - aby;
    double bpz = apz - abz;
    t = clamp(bcx * bpx + bcy * bpy + bcz * bpz, bcx * bcx + bcy * bcy + bcz * bcz);
    s = squareTo(bpx, bpy, bpz, bcx, bcy, bcz, t);
    if (s < square) {
      square = s;
      b0 = 0;
      b1 = 1 - t;
      b2 = t;
    }
  }

  private static double triple(
      double nx,
      double ny,
      double nz,
      double ax,
      double ay,
      double az,
      double bx,
      double by,
      double bz) {
    return nx * (ay * bz - az * by) + ny * (az * bx - ax * bz) + nz * (ax * by - ay * bx);
  }

  private static double clamp(double dot, double length2) {
    return dot <= 0 ? 0 : dot >= length2 ? 1 : dot / length2;
  }

  private static double squareTo(
      double px, double py, double pz, double ex, double ey, double ez, double t) {
    double dx = px - t * ex;
    double dy = py - t * ey;
    double dz = pz - t * ez;
    return dx * dx + dy * dy + dz * dz;
  }

  /**
   * First hit of a ray with the allowed triangles. No ray slips between triangles that share an
   * edge: S. Woop, C. Benthin, I. Wald, "Watertight ray/triangle intersection", JCGT 2(1), 2013
   * (from memory).
   *
   * @param ox origin
   * @param oy origin
   * @param oz origin
   * @param dx direction, any length but zero
   * @param dy direction
   * @param dz direction
   * @param from smallest distance that counts, 0 or more
   * @param to largest distance that counts; infinite for no limit
   * @param side which sides of triangles count
   * @return whether there is a hit; {@link #distance} is a length whatever the direction's length
   */
  public boolean ray(
      double ox,
      double oy,
      double oz,
      double dx,
      double dy,
      double dz,
      double from,
      double to,
      Side side) {
    slot = -1;
    double length = Math.sqrt(dx * dx + dy * dy + dz * dz);
    if (tree.link.length == 0 || !(length > 0)) {
      return false;
    }
    double ux = dx / length;
    double uy = dy / length;
    double uz = dz / length;
    double ix = 1 / ux;
    double iy = 1 / uy;
    double iz = 1 / uz;

    // Shear that maps the ray onto the axis of its largest component.
    double lx = Math.abs(ux);
    double ly = Math.abs(uy);
    double lz = Math.abs(uz);
    int kz = lx > ly ? (lx > lz ? 0 : 2) : (ly > lz ? 1 : 2);
    int kx = kz == 2 ? 0 : kz + 1;
    int ky = kx == 2 ? 0 : kx + 1;
    double dk = kz == 0 ? ux : kz == 1 ? uy : uz;
    if (dk < 0) {
      // Keeps the winding, so that the sign of the determinant tells the side.
      int swap = kx;
      kx = ky;
      ky = swap;
    }
    double sx = (kx == 0 ? ux : kx == 1 ? uy : uz) / dk;
    double sy = (ky == 0 ? ux : ky == 1 ? uy : uz) / dk;
    double sz = 1 / dk;
    double okx = kx == 0 ? ox : kx == 1 ? oy : oz;
    double oky = ky == 0 ? ox : ky == 1 ? oy : oz;
    double okz = kz == 0 ? ox : kz == 1 ? oy : oz;

    double best = to;
    double[] c = tree.corners;
    int top = 0;
    stack[top] = 0;
    stackKey[top++] = entry(0, ox, oy, oz, ix, iy, iz, from, best);
    while (top > 0) {
      int node = stack[--top];
      if (!(stackKey[top] <= best) || (tree.groupBits[node] & allowedBits) == 0) {
        continue;
      }
      int count = tree.leafCount[node];
      if (count == 0) {
        int first = node + 1;
        int second = tree.link[node];
        double t1 = entry(first, ox, oy, oz, ix, iy, iz, from, best);
        double t2 = entry(second, ox, oy, oz, ix, iy, iz, from, best);
        boolean swap = t1 > t2;
        double far = swap ? t1 : t2;
        double near = swap ? t2 : t1;
        if (far <= best) {
          stack[top] = swap ? first : second;
          stackKey[top++] = far;
        }
        if (near <= best) {
          stack[top] = swap ? second : first;
          stackKey[top++] = near;
        }
        continue;
      }
      int start = tree.link[node];
      for (int i = start; i < start + count; i++) {
        if (!allowed[tree.group[i]]) {
          continue;
        }
        int at = 9 * i;
        double az = c[at + kz] - okz;
        double bz = c[at + 3 + kz] - okz;
        double cz = c[at + 6 + kz] - okz;
        double ax = c[at + kx] - okx - sx * az;
        double ay = c[at + ky] - oky - sy * az;
        double bx = c[at + 3 + kx] - okx - sx * bz;
        double by = c[at + 3 + ky] - oky - sy * bz;
        double cx = c[at + 6 + kx] - okx - sx * cz;
        double cy = c[at + 6 + ky] - oky - sy * cz;
        double u = cx * by - cy * bx;
        double v = ax * cy - ay * cx;
        double w = bx * ay - by * ax;
        if ((u < 0 || v < 0 || w < 0) && (u > 0 || v > 0 || w > 0)) {
          continue;
        }
        double det = u + v + w;
        // The determinant is positive where the ray meets the triangle from its front.
        if (det == 0 || (side == Side.ENTERING && det < 0) || (side == Side.LEAVING && det > 0)) {
          continue;
        }
        double t = (u * az + v * bz + w * cz) * sz / det;
        if (t >= from && (t < best || (slot < 0 && t <= best))) {
          best = t;
          slot = i;
          w0 = u / det;
          w1 = v / det;
          w2 = w / det;
        }
      }
    }
    distance = best;
    return slot >= 0;
  }

  /** Distance at which the ray enters a node's box, infinite (beyond all) where it misses. */
  private double entry(
      int node,
      double ox,
      double oy,
      double oz,
      double ix,
      double iy,
      double iz,
      double from,
      double to) {
    double[] b = tree.bounds;
    int at = 6 * node;
    double near = from;
    double far = to;
    // Comparisons with NaN (a ray inside a box face, zero times infinity) are false: conservative.
    double t0 = (b[at] - ox) * ix;
    double t1 = (b[at + 3] - ox) * ix;
    near = later(near, ix < 0 ? t1 : t0);
    far = sooner(far, ix < 0 ? t0 : t1);
    t0 = (b[at + 1] - oy) * iy;
    t1 = (b[at + 4] - oy) * iy;
    near = later(near, iy < 0 ? t1 : t0);
    far = sooner(far, iy < 0 ? t0 : t1);
    t0 = (b[at + 2] - oz) * iz;
    t1 = (b[at + 5] - oz) * iz;
    near = later(near, iz < 0 ? t1 : t0);
    far = sooner(far, iz < 0 ? t0 : t1);
    return near <= far * SLAB_SLACK ? Math.min(near, to) : Double.NaN;
  }

  private static double later(double near, double t) {
    return t > near ? t : near;
  }

  private static double sooner(double far, double t) {
    return t < far ? t : far;
  }

  /** Triangle of the last answer, in the caller's numbering; -1 where there was none. */
  public int triangle() {
    return slot < 0 ? -1 : tree.triangle[slot];
  }

  /** Group of that triangle; -1 where there was no answer. */
  public int group() {
    return slot < 0 ? -1 : tree.group[slot];
  }

  /** Distance of the last answer; infinite where there was none. */
  public double distance() {
    return slot < 0 ? Double.POSITIVE_INFINITY : distance;
  }

  /**
   * Barycentric coordinate of the point found.
   *
   * @param corner 0, 1 or 2 as the caller numbered the triangle's corners
   */
  public double weight(int corner) {
    return switch (corner) {
      case 0 -> w0;
      case 1 -> w1;
      case 2 -> w2;
      default -> throw new IllegalArgumentException("corner " + corner);
    };
  }

  /**
   * Writes the point found.
   *
   * @param out receives x, y, z
   * @param at first index to write
   */
  public void point(double[] out, int at) {
    for (int c = 0; c < 3; c++) {
      int from = 9 * slot + c;
      out[at + c] =
          w0 * tree.corners[from] + w1 * tree.corners[from + 3] + w2 * tree.corners[from + 6];
    }
  }
}
