package org.edgefield.importer.kernel;

import java.util.Arrays;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.SurfaceKind;

/**
 * Exact evaluation by the CAD kernel. Tables are copied once; only evaluation crosses into native
 * code. Threads never share the kernel's spline caches.
 */
final class KernelGeometry implements ExactGeometry {
  private static final SurfaceKind[] KINDS = SurfaceKind.values();
  private static final int FACE_DOUBLES = 6;
  private static final int EDGE_INTS = 5;

  private volatile long model;
  private final int faces;
  private final int edges;
  private final int[] faceInts;
  private final double[] faceDoubles;
  private final int[] edgeInts;
  private final double[] edgeDoubles;

  KernelGeometry(long model) {
    this.model = model;
    int[] sizes = new int[3];
    Kernel.modelSizes(model, sizes);
    faces = sizes[0];
    edges = sizes[1];
    faceInts = new int[2 * faces];
    faceDoubles = new double[FACE_DOUBLES * faces];
    Kernel.faceTable(model, faceInts, faceDoubles);
    edgeInts = new int[EDGE_INTS * edges];
    edgeDoubles = new double[2 * edges];
    Kernel.edgeTable(model, edgeInts, edgeDoubles);
  }

  /** Marks the native model as gone, so that later evaluation throws; false when it already was. */
  synchronized boolean close() {
    boolean wasOpen = model != 0;
    model = 0;
    return wasOpen;
  }

  boolean isOpen() {
    return model != 0;
  }

  private long open() {
    long handle = model;
    if (handle == 0) {
      throw new IllegalStateException("the assembly is closed");
    }
    return handle;
  }

  private static void checked(long code, String what) {
    if (code == -2) {
      throw new IndexOutOfBoundsException(what + ": no such face, edge or side");
    }
    if (code < 0) {
      throw new ArithmeticException(what + ": the kernel failed at this point");
    }
  }

  private static void needs(int have, long want, String what) {
    if (have < want) {
      throw new IndexOutOfBoundsException(what + " holds " + have + " values, needs " + want);
    }
  }

  @Override
  public int faceCount() {
    return faces;
  }

  @Override
  public int edgeCount() {
    return edges;
  }

  @Override
  public int facePart(int face) {
    return faceInts[2 * face];
  }

  @Override
  public SurfaceKind faceKind(int face) {
    return KINDS[faceInts[2 * face + 1]];
  }

  @Override
  public double[] faceBounds(int face) {
    return Arrays.copyOfRange(faceDoubles, FACE_DOUBLES * face, FACE_DOUBLES * face + 4);
  }

  @Override
  public double uPeriod(int face) {
    return faceDoubles[FACE_DOUBLES * face + 4];
  }

  @Override
  public double vPeriod(int face) {
    return faceDoubles[FACE_DOUBLES * face + 5];
  }

  @Override
  public void surface(int n, int[] face, double[] uv, double[] out) {
    needs(face.length, n, "face");
    needs(uv.length, 2L * n, "uv");
    needs(out.length, 9L * n, "out");
    checked(Kernel.surface(open(), n, face, uv, out), "surface");
  }

  @Override
  public void curvature(int n, int[] face, double[] uv, double[] out) {
    needs(face.length, n, "face");
    needs(uv.length, 2L * n, "uv");
    needs(out.length, (long) CURVATURE_STRIDE * n, "out");
    checked(Kernel.curvature(open(), n, face, uv, out), "curvature");
  }

  @Override
  public void project(int n, int[] face, double[] xyz, double[] uv) {
    needs(face.length, n, "face");
    needs(xyz.length, 3L * n, "xyz");
    needs(uv.length, 2L * n, "uv");
    checked(Kernel.project(open(), n, face, xyz, uv), "project");
  }

  @Override
  public double[] edgeRange(int edge) {
    return new double[] {edgeDoubles[2 * edge], edgeDoubles[2 * edge + 1]};
  }

  @Override
  public boolean edgeDegenerate(int edge) {
    return edgeInts[EDGE_INTS * edge] != 0;
  }

  @Override
  public int[] edgeVertices(int edge) {
    return new int[] {edgeInts[EDGE_INTS * edge + 1], edgeInts[EDGE_INTS * edge + 2]};
  }

  @Override
  public int[] edgeFaces(int edge) {
    return new int[] {edgeInts[EDGE_INTS * edge + 3], edgeInts[EDGE_INTS * edge + 4]};
  }

  @Override
  public void curve(int n, int[] edge, double[] t, double[] out) {
    needs(edge.length, n, "edge");
    needs(t.length, n, "t");
    needs(out.length, 6L * n, "out");
    checked(Kernel.curve(open(), n, edge, t, out), "curve");
  }

  @Override
  public void edgeUv(int edge, int side, int n, double[] t, double[] uv) {
    needs(t.length, n, "t");
    needs(uv.length, 2L * n, "uv");
    checked(Kernel.edgeUv(open(), edge, side, n, t, uv), "edgeUv");
  }
}
