package org.edgefield.curvature;

/**
 * What a reader of the model would call its places: edge classes, corners, rounded edges, walls.
 */
public interface Features {
  /** Class and angle of a CAD edge. */
  EdgeFeature edge(int edge);

  /** Whether three or more sharp convex edges meet at a CAD vertex. */
  boolean isCorner(int cadVertex);

  /**
   * Rounded edge that a face belongs to, or null where the face is not a recognised fillet.
   *
   * @param face CAD face
   */
  RoundedEdge roundedEdge(int face);

  /**
   * Name of a place on a face for people, without the part: "rounded edge R2", "face, cylinder
   * R25", "flat face".
   */
  String faceName(int face);

  /** Name of a CAD edge for people, without the part: "sharp edge 90 deg". */
  String edgeName(int edge);

  /** Name of a CAD vertex for people, without the part: "corner of 3 sharp edges". */
  String vertexName(int cadVertex);

  /**
   * A recognised rounded edge.
   *
   * @param face its face
   * @param radius_m fillet radius across the edge
   * @param turning_rad angle the normal turns through across the edge
   * @param convex whether the fillet is convex towards the gas
   */
  record RoundedEdge(int face, double radius_m, double turning_rad, boolean convex) {}
}
