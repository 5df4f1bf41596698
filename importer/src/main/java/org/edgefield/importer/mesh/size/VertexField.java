package org.edgefield.importer.mesh.size;

import java.util.Arrays;

/**
 * Size tensors and what goes with them per vertex, in arrays that grow with the mesh. Public for
 * the same reason as those of the half-edge mesh.
 */
public final class VertexField {
  /** Tensors that the surface and the requests ask for, before grading. */
  public double[] raw;

  /** Graded tensors: those the mesh follows. */
  public double[] metric;

  /** Unit normal where the surface is smooth around the vertex, else zero; 3 per vertex. */
  public double[] normal;

  /** Growth of size per size travelled. */
  public double[] rate;

  /** Wanted width, infinite where nothing is asked. */
  public double[] target;

  /** Creates arrays for some vertices. */
  public VertexField(int vertices) {
    raw = new double[Metric.STRIDE * vertices];
    metric = new double[Metric.STRIDE * vertices];
    normal = new double[3 * vertices];
    rate = new double[vertices];
    target = new double[vertices];
    Arrays.fill(target, Double.POSITIVE_INFINITY);
  }

  /** Makes room for at least this many vertices. */
  public void ensure(int vertices) {
    int old = rate.length;
    if (vertices > old) {
      int room = Math.max(vertices, 2 * old);
      raw = Arrays.copyOf(raw, Metric.STRIDE * room);
      metric = Arrays.copyOf(metric, Metric.STRIDE * room);
      normal = Arrays.copyOf(normal, 3 * room);
      rate = Arrays.copyOf(rate, room);
      target = Arrays.copyOf(target, room);
      Arrays.fill(target, old, room, Double.POSITIVE_INFINITY);
    }
  }
}
