package org.edgefield.field.hotspot;

import org.edgefield.field.gas.FieldProfile;

/**
 * What is known of the field around a node beyond its value: what it stands against, and how it
 * would change with radius and gap. Comes from the estimate; a solve uses it for its cures, scaled
 * to the solved field.
 */
public interface LocalLaw {
  /** Where edges are sharp. */
  SharpVertices sharp();

  /**
   * Part at the far end of the field line that governs a node.
   *
   * @param duty index in the case
   * @param node mesh node
   * @return part index, -1 where the earth plane or infinity governs
   */
  int opposingPart(int duty, int node);

  /** Potential difference that governs a node, peak over the cycle, V. */
  double difference_V(int duty, int node);

  /** Distance along the field line to the body that governs a node, infinite where none. */
  double gap_m(int duty, int node);

  /** Larger and smaller curvature at a node, 1/m, radii of edges as made included. */
  double[] curvatures(int node);

  /**
   * Largest radius that a node's feature can be given on the body as it is: half the thickness
   * behind an edge or corner, infinite on whole round bodies.
   */
  double largestRadius_m(int node);

  /**
   * Field at a node with another radius or gap, over the field with its own.
   *
   * @param duty index in the case
   * @param node mesh node
   * @param radius_m radius, NaN to keep it
   * @param gap_m gap, NaN to keep it
   */
  double change(int duty, int node, double radius_m, double gap_m);

  /**
   * Fall of the field near a node on an edge or corner drawn sharp, as a share of the peak on its
   * rounding.
   *
   * @return share by distance, null where the node lies on no such edge
   */
  FieldProfile asMade(int node);
}
