package org.edgefield.curvature;

/** What a CAD edge is to the field. */
public enum EdgeClass {
  /** Faces meet at an angle, the solid's interior angle below 180 degrees: field concentrates. */
  SHARP_CONVEX,
  /** Interior angle above 180 degrees: field vanishes. */
  SHARP_CONCAVE,
  /** Faces join with a common tangent plane (below about one degree). */
  TANGENT,
  /** The two sides of one periodic face. */
  SEAM,
  /** No length: a pole or an apex. */
  DEGENERATE,
  /** The class changes along the edge between convex, tangent and concave. */
  MIXED
}
