package org.edgefield.importer.mesh;

/**
 * Rows of elements along a CAD edge that are thin across it and grow away from it, for fields that
 * are singular there. Sizes along the edge stay as they are, so that the largest aspect ratio of
 * {@link MeshSettings} does not hold here.
 *
 * @param edge CAD edge
 * @param firstRow_m height of the first row on both faces, metres
 * @param growth height of a row over that of the row before it, above 1 and at most 3
 */
public record EdgeGrading(int edge, double firstRow_m, double growth) {
  /** Checks the values. */
  public EdgeGrading {
    if (!(firstRow_m > 0) || !(growth > 1 && growth <= 3)) {
      throw new IllegalArgumentException("first row " + firstRow_m + " m, growth " + growth);
    }
  }
}
