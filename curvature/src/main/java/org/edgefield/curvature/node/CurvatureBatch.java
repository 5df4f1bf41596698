package org.edgefield.curvature.node;

import java.util.Arrays;
import java.util.stream.IntStream;
import org.edgefield.importer.brep.ExactGeometry;

/** Evaluates many curvatures on all cores. Chunks are independent, so the result is the same. */
final class CurvatureBatch {
  private static final int CHUNK = 4096;

  private CurvatureBatch() {}

  /**
   * Curvature per point as {@link ExactGeometry#curvature} gives it.
   *
   * @param face face per point
   * @param uv parameters, 2 per point
   * @return {@link ExactGeometry#CURVATURE_STRIDE} doubles per point
   */
  static double[] evaluate(ExactGeometry geometry, int[] face, double[] uv) {
    int stride = ExactGeometry.CURVATURE_STRIDE;
    int n = face.length;
    double[] out = new double[stride * n];
    IntStream.range(0, (n + CHUNK - 1) / CHUNK)
        .parallel()
        .forEach(
            chunk -> {
              int from = chunk * CHUNK;
              int to = Math.min(n, from + CHUNK);
              double[] part = new double[stride * (to - from)];
              geometry.curvature(
                  to - from,
                  Arrays.copyOfRange(face, from, to),
                  Arrays.copyOfRange(uv, 2 * from, 2 * to),
                  part);
              System.arraycopy(part, 0, out, stride * from, part.length);
            });
    return out;
  }
}
