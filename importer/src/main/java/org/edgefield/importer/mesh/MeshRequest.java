package org.edgefield.importer.mesh;

import java.util.List;

/**
 * What a caller asks of the mesh beyond {@link MeshSettings}.
 *
 * @param partGroup group per part: gaps between parts of one group do not count; a negative group
 *     counts for nobody. Null: every part is a group of its own
 * @param targetSize_m wanted size per vertex of the mesh to be refined, metres, infinite where
 *     nothing is asked; null where there is none. Where an element is longer than wide this is the
 *     width, and the length shrinks with it
 * @param field wanted size at points, same meaning; null where there is none
 * @param edges graded rows along CAD edges
 */
public record MeshRequest(
    int[] partGroup, double[] targetSize_m, SizeField field, List<EdgeGrading> edges) {
  /** Nothing asked. */
  public static final MeshRequest NONE = new MeshRequest(null, null, null, List.of());

  /** Copies the list. */
  public MeshRequest {
    edges = List.copyOf(edges);
  }

  /** The same with part groups. */
  public MeshRequest withPartGroup(int[] group) {
    return new MeshRequest(group, targetSize_m, field, edges);
  }

  /** The same with a wanted size per vertex of the mesh to be refined. */
  public MeshRequest withTargetSize(double[] size_m) {
    return new MeshRequest(partGroup, size_m, field, edges);
  }

  /** The same with a wanted size at points. */
  public MeshRequest withField(SizeField sizes) {
    return new MeshRequest(partGroup, targetSize_m, sizes, edges);
  }

  /** The same with graded rows along edges. */
  public MeshRequest withEdges(List<EdgeGrading> gradings) {
    return new MeshRequest(partGroup, targetSize_m, field, gradings);
  }
}
