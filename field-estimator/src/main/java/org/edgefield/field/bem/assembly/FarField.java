package org.edgefield.field.bem.assembly;

/** Potential of all triangles by their three-point rules at the rows, images included. */
interface FarField {
  /**
   * Sums for one or more densities.
   *
   * @param density per set, one value per unknown
   * @param potential out: per set, one value per row
   */
  void apply(double[][] density, double[][] potential);
}
