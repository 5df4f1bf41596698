package org.edgefield.curvature;

/**
 * Nodes of a mesh: one per vertex and smooth patch. A vertex inside a patch carries one node, a
 * vertex on an edge where patches meet one per patch. Fields, curvatures and normals live on nodes.
 *
 * @param cornerNode node per triangle corner, 3 per triangle
 * @param nodeVertex mesh vertex per node
 * @param nodePatch patch per node
 * @param facePatch patch per CAD face
 * @param normal outward unit normals, 3 per node
 * @param k1 larger principal curvature per node, 1/m, positive = convex towards the gas
 * @param k2 smaller principal curvature per node, 1/m
 * @param direction1 unit direction of k1, 3 per node
 */
public record SurfaceNodes(
    int[] cornerNode,
    int[] nodeVertex,
    int[] nodePatch,
    int[] facePatch,
    double[] normal,
    double[] k1,
    double[] k2,
    double[] direction1) {

  /** Number of nodes. */
  public int count() {
    return nodeVertex.length;
  }
}
