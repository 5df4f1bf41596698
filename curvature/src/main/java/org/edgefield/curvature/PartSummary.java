package org.edgefield.curvature;

/**
 * What matters for the field about one part.
 *
 * @param part index of the part
 * @param smallestConvexRadius_m smallest convex radius on its faces, infinite where none is convex;
 *     pointed tips are left out, see {@code tips}
 * @param smallestRadiusFace face with that radius, -1 where none
 * @param sharpConvexEdges number of edges that are sharp and convex, wholly or in part
 * @param sharpConvexLength_m length of those edges, partly sharp ones counted where they are sharp
 * @param sharpest_rad smallest interior angle of those edges, pi where there are none
 * @param corners number of corners where three or more of them meet
 * @param tips number of pointed tips (cone apexes)
 */
public record PartSummary(
    int part,
    double smallestConvexRadius_m,
    int smallestRadiusFace,
    int sharpConvexEdges,
    double sharpConvexLength_m,
    double sharpest_rad,
    int corners,
    int tips) {}
