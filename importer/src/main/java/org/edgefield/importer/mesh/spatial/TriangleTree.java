package org.edgefield.importer.mesh.spatial;

/**
 * Bounding-volume hierarchy over the triangles of a mesh, for nearest points and ray hits.
 *
 * <p>Every triangle belongs to a group (a part, an electrode); a query may be kept to some groups.
 * The tree never changes once built and may be shared between threads; each thread asks through its
 * own {@link TriangleCursor}, which holds all the working storage, so that a query allocates
 * nothing.
 *
 * <p>Degenerate triangles are allowed: a nearest point may lie on one (it is then a segment or a
 * point), a ray never hits one. Answers are the same on every run.
 *
 * <p>Triangles are kept in leaf order with their coordinates beside each other, since a query reads
 * whole leaves.
 */
public final class TriangleTree {
  /** Bounds of each node, 6 per node: xmin, ymin, zmin, xmax, ymax, zmax. */
  final double[] bounds;

  /** Second child of an inner node (the first is the next node), or first triangle of a leaf. */
  final int[] link;

  /** Number of triangles of a leaf, 0 for an inner node. */
  final byte[] leafCount;

  /** Groups present below a node: bit {@code group mod 64}. */
  final long[] groupBits;

  /** Corner coordinates in leaf order, 9 per triangle. */
  final double[] corners;

  /** Group in leaf order. */
  final int[] group;

  /** Caller's triangle number in leaf order. */
  final int[] triangle;

  final int groupCount;
  final int depth;

  TriangleTree(
      double[] bounds,
      int[] link,
      byte[] leafCount,
      long[] groupBits,
      double[] corners,
      int[] group,
      int[] triangle,
      int groupCount,
      int depth) {
    this.bounds = bounds;
    this.link = link;
    this.leafCount = leafCount;
    this.groupBits = groupBits;
    this.corners = corners;
    this.group = group;
    this.triangle = triangle;
    this.groupCount = groupCount;
    this.depth = depth;
  }

  /**
   * Builds the tree.
   *
   * @param xyz vertex positions, 3 per vertex
   * @param triangles vertex ids, 3 per triangle
   * @param triangleGroup group per triangle, rising from 0; triangles of a negative group are left
   *     out
   * @throws IllegalArgumentException where a coordinate is not finite or the lengths do not fit
   */
  public static TriangleTree build(double[] xyz, int[] triangles, int[] triangleGroup) {
    return new TreeBuilder(xyz, triangles, triangleGroup).build();
  }

  /** Builds the tree over all triangles as one group 0. */
  public static TriangleTree build(double[] xyz, int[] triangles) {
    return build(xyz, triangles, new int[triangles.length / 3]);
  }

  /** Number of triangles in the tree. */
  public int triangleCount() {
    return triangle.length;
  }

  /** Number of groups: one more than the largest group. */
  public int groupCount() {
    return groupCount;
  }

  /** A new cursor, to be used by one thread at a time; all groups allowed. */
  public TriangleCursor cursor() {
    return new TriangleCursor(this);
  }
}
