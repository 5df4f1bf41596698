/**
 * Quick estimate of the field from curvatures, gaps and body sizes.
 *
 * <p>What it is worth, as peak of the estimate over peak of the closed solution (or of a solve on
 * the cross-section), from the tests of this package and the studies behind its constants:
 *
 * <ul>
 *   <li>parallel plates, coaxial cylinders, concentric and isolated spheres: exact but for the
 *       mesh;
 *   <li>sphere over earth plane, gap 0.05 to 20 radii: 1.02 to 1.13;
 *   <li>two equal spheres: at the live one 1.01 to 1.15, at opposed voltages 1.01 to 1.13, at the
 *       earthed one 1.01 to 1.41 (widest gaps);
 *   <li>round-ended rod over earth plane, gap 0.5 to 100 radii: 1.02 to 1.12;
 *   <li>isolated spheroids up to 10:1: 1.00 to 1.26; isolated tori: 1.08 to 1.13;
 *   <li>half-ellipsoids and rods in an ambient field: 1.00, flat ones 1.05;
 *   <li>rounded bar, radius over thickness 0.01 to 0.35, width 1 to 10 thicknesses, in a round
 *       shell 0.97 to 1.24, over a plane at 1 to 30 thicknesses 1.04 to 1.37; in a box 1.03 to
 *       1.06;
 *   <li>corners of three bars in a housing, radius over thickness 0.05 to 0.2: 1.01 to 1.2, their
 *       edges, which carry most beside the corners, 1.2 to 1.5.
 * </ul>
 *
 * <p>Every hot spot of the validation bodies and of the demo against a solve: docs,
 * estimate-vs-solve.md.
 *
 * <p>Where it is weak: flanks of slender bodies, away from the peak, down to 0.6; flat faces beside
 * an edge, down to 0.2; bodies sheltered by a neighbour at the same voltage, 1.25 to 2.1; rounded
 * cone tips, up to 1.6; corners as made that are sharper than right-angled ones, 7 to 9; bodies
 * whose bounding box says little of them (bent, hollow, slanting); floating electrodes, which are
 * given the widest voltage difference of the duty. Field lines are taken as circular arcs.
 */
package org.edgefield.field.estimate;
