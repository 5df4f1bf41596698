package org.edgefield.importer.mesh.size;

import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;

/**
 * Limits the growth of size: along a mesh edge e from p, sizes may grow by the factor 1 + rate
 * |e|_p, with the length |e|_p measured by the tensor at p, so that the shape of the elements is
 * kept while they grow (F. Alauzet, "Size gradation control of anisotropic meshes", Finite Elements
 * in Analysis and Design 46, 2010; from memory). On smooth parts of the surface only the tangential
 * sizes travel.
 */
public final class Grading {
  /** Share of a wanted tensor that may be missing before a vertex is changed. */
  private static final double SLACK = 0.97;

  private final double[] grown = new double[Metric.STRIDE];
  private final double[] difference = new double[Metric.STRIDE];
  private final double[] zero = new double[Metric.STRIDE];
  private final double[] work = new double[15];
  private int[] queue = new int[0];
  private int[] nextQueue = new int[0];
  private int[] stamp = new int[0];
  private int round;

  /**
   * Spreads small sizes from the given vertices until nothing changes.
   *
   * @param mesh the mesh
   * @param field its tensors; {@code metric} is changed
   * @param start vertices whose tensors are new; null for all
   * @param count number of them
   */
  public void spread(HalfEdgeMesh mesh, VertexField field, int[] start, int count) {
    if (queue.length < mesh.vertices) {
      queue = new int[2 * mesh.vertices];
      nextQueue = new int[2 * mesh.vertices];
      stamp = new int[2 * mesh.vertices];
      round = 0;
    }
    int n = 0;
    if (start == null) {
      for (int v = 0; v < mesh.vertices; v++) {
        if (mesh.out[v] >= 0) {
          queue[n++] = v;
        }
      }
    } else {
      for (int i = 0; i < count; i++) {
        if (mesh.out[start[i]] >= 0) {
          queue[n++] = start[i];
        }
      }
    }
    while (n > 0) {
      round++;
      int m = 0;
      for (int i = 0; i < n; i++) {
        int p = queue[i];
        int h = mesh.out[p];
        do {
          int q = mesh.dest(h);
          if (limit(mesh, field, p, q) && stamp[q] != round) {
            stamp[q] = round;
            nextQueue[m++] = q;
          }
          h = mesh.turn(h);
        } while (h != mesh.out[p]);
      }
      int[] swap = queue;
      queue = nextQueue;
      nextQueue = swap;
      n = m;
    }
  }

  /** Limits the tensor of q by the one of p; tells whether it changed. */
  public boolean limit(HalfEdgeMesh mesh, VertexField field, int p, int q) {
    double ex = mesh.xyz[3 * q] - mesh.xyz[3 * p];
    double ey = mesh.xyz[3 * q + 1] - mesh.xyz[3 * p + 1];
    double ez = mesh.xyz[3 * q + 2] - mesh.xyz[3 * p + 2];
    double[] m = field.metric;
    int ip = Metric.STRIDE * p;
    int iq = Metric.STRIDE * q;
    double length = Math.sqrt(Metric.square(m, ip, ex, ey, ez));
    double f = 1 / (1 + Math.max(field.rate[p], field.rate[q]) * length);
    f *= f;
    for (int i = 0; i < Metric.STRIDE; i++) {
      grown[i] = f * m[ip + i];
      difference[i] = m[iq + i] - SLACK * grown[i];
    }
    double nx = field.normal[3 * q];
    double ny = field.normal[3 * q + 1];
    double nz = field.normal[3 * q + 2];
    boolean smooth = nx != 0 || ny != 0 || nz != 0;
    if (smooth) {
      double k = 100 * (Metric.trace(grown, 0) + Metric.trace(m, iq));
      Metric.addOuter(difference, 0, k, nx, ny, nz);
    }
    if (Metric.covers(difference, 0, zero)) {
      return false;
    }
    if (smooth) {
      double along = Metric.square(m, iq, nx, ny, nz);
      project(grown, nx, ny, nz);
      Metric.addOuter(grown, 0, along, nx, ny, nz);
    }
    Metric.intersect(m, iq, grown, work);
    return true;
  }

  /** Removes the part of a tensor along a unit vector: (I - n n') G (I - n n'). */
  private static void project(double[] g, double nx, double ny, double nz) {
    double gx = g[0] * nx + g[1] * ny + g[2] * nz;
    double gy = g[1] * nx + g[3] * ny + g[4] * nz;
    double gz = g[2] * nx + g[4] * ny + g[5] * nz;
    double s = gx * nx + gy * ny + gz * nz;
    g[0] += s * nx * nx - 2 * gx * nx;
    g[1] += s * nx * ny - gx * ny - gy * nx;
    g[2] += s * nx * nz - gx * nz - gz * nx;
    g[3] += s * ny * ny - 2 * gy * ny;
    g[4] += s * ny * nz - gy * nz - gz * ny;
    g[5] += s * nz * nz - 2 * gz * nz;
  }
}
