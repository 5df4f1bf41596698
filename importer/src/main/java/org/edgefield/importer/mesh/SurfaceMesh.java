package org.edgefield.importer.mesh;

/**
 * Triangle mesh of all parts as a struct of arrays. Watertight per part: triangles on both sides of
 * a CAD edge share their vertices. Vertices are never shared between parts. Every vertex lies on
 * the exact surface.
 *
 * <p>Arrays are handed out without copying; treat them as read-only.
 *
 * @param xyz vertex positions, 3 per vertex, metres
 * @param triangles vertex ids, 3 per triangle, anticlockwise seen from the gas
 * @param triangleFace CAD face per triangle
 * @param cornerUv surface parameters of each corner in the triangle's own face, 6 per triangle (u0,
 *     v0, u1, v1, u2, v2); on seams and poles the two sides differ
 * @param vertexKind {@link #ON_FACE}, {@link #ON_EDGE} or {@link #ON_VERTEX} per vertex
 * @param vertexEntity id of that face, edge or CAD vertex
 * @param segmentVertices mesh edges that lie on CAD edges (seams included, degenerate edges not): 2
 *     vertex ids per segment, in the direction of rising t
 * @param segmentEdge CAD edge per segment
 * @param segmentT curve parameters of the two ends, 2 per segment (a closed edge has both t0 and t1
 *     at its start vertex)
 */
public record SurfaceMesh(
    double[] xyz,
    int[] triangles,
    int[] triangleFace,
    double[] cornerUv,
    byte[] vertexKind,
    int[] vertexEntity,
    int[] segmentVertices,
    int[] segmentEdge,
    double[] segmentT) {
  /** Vertex inside a face. */
  public static final byte ON_FACE = 0;

  /** Vertex inside a CAD edge. */
  public static final byte ON_EDGE = 1;

  /** Vertex at a CAD vertex. */
  public static final byte ON_VERTEX = 2;

  /** Number of vertices. */
  public int vertexCount() {
    return xyz.length / 3;
  }

  /** Number of triangles. */
  public int triangleCount() {
    return triangles.length / 3;
  }

  /** Number of CAD edge segments. */
  public int segmentCount() {
    return segmentEdge.length;
  }
}
