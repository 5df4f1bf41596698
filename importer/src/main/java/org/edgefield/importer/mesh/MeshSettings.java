package org.edgefield.importer.mesh;

/**
 * What the size field asks for.
 *
 * @param elementsPer90Degrees elements per 90 degrees of arc, at least 1; 4 by default
 * @param maxAspect largest ratio of element sizes along and across, 1 to 20; 8 by default
 * @param maxSize_m largest element, metres; infinite to leave it to {@code maxSizeFraction}
 * @param maxSizeFraction largest element as a fraction of the part's bounding-box diagonal
 * @param elementsPerGap elements per distance to the nearest other part; 0 to ignore gaps
 * @param grading largest growth of size per size travelled, 0.1 to 1
 */
public record MeshSettings(
    double elementsPer90Degrees,
    double maxAspect,
    double maxSize_m,
    double maxSizeFraction,
    double elementsPerGap,
    double grading) {
  /** Defaults for the quick estimate. */
  public static MeshSettings defaults() {
    return new MeshSettings(4, 8, Double.POSITIVE_INFINITY, 0.08, 1, 0.4);
  }
}
