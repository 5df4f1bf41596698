package org.edgefield.importer.kernel;

import org.bytedeco.javacpp.annotation.CriticalRegion;
import org.bytedeco.javacpp.annotation.Namespace;
import org.bytedeco.javacpp.annotation.Platform;

/**
 * Entry points of the native library, see {@code kernel.h}. Flat arrays only; a model is an opaque
 * handle. Return values below zero are faults.
 */
@Platform(
    include = "kernel.h",
    compiler = {"cpp17", "nodeprecated"},
    link = {"TKTopAlgo", "TKBRep", "TKGeomBase", "TKG3d", "TKG2d", "TKMath", "TKernel"})
@Namespace("edgefield")
final class Kernel {
  private Kernel() {}

  static native long openModel(byte[] file, int[] signs, int count);

  static native void closeModel(long model);

  static native void modelSizes(long model, int[] out);

  static native void partRanges(long model, int[] out);

  static native void faceTable(long model, int[] ints, double[] doubles);

  static native void edgeTable(long model, int[] ints, double[] doubles);

  @CriticalRegion
  static native long surface(long model, int n, int[] face, double[] uv, double[] out);

  @CriticalRegion
  static native long curvature(long model, int n, int[] face, double[] uv, double[] out);

  @CriticalRegion
  static native long project(long model, int n, int[] face, double[] xyz, double[] uv);

  @CriticalRegion
  static native long curve(long model, int n, int[] edge, double[] t, double[] out);

  @CriticalRegion
  static native long edgeUv(long model, int edge, int side, int n, double[] t, double[] uv);

  static native long triangulate(long model, int[] sizes);

  @CriticalRegion
  static native void takeTriangulation(
      long model,
      double[] xyz,
      byte[] vertexKind,
      int[] vertexEntity,
      int[] triangles,
      int[] triangleFace,
      double[] cornerUv,
      int[] segmentVertices,
      int[] segmentEdge,
      double[] segmentT);
}
