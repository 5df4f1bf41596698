package org.edgefield.curvature.feature;

/**
 * Form of a face as its curvatures tell it, whatever the file stores it as: a NURBS copy of a
 * cylinder is a cylinder.
 *
 * @param form kind of form
 * @param convex whether the leading curvature is convex towards the gas
 * @param radius_m radius of a cylinder, a sphere or a round section, NaN otherwise
 * @param tightest_m smallest convex radius found on the face, infinite where none is convex
 * @param halfAngle_rad half-angle of a cone, NaN otherwise
 */
record FaceForm(
    Kind form, boolean convex, double radius_m, double tightest_m, double halfAngle_rad) {
  /** Kinds of form. */
  enum Kind {
    FLAT,
    CYLINDER,
    CONE,
    SPHERE,
    /** The larger principal curvature is constant, the other not: torus, bent rod. */
    ROUND_SECTION,
    /** The smaller principal curvature is constant, the other not: barrel, lens. */
    DOME,
    FREE
  }
}
