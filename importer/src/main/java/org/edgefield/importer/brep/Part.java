package org.edgefield.importer.brep;

/**
 * One solid of the model at its place in the assembly. Faces and edges are numbered through the
 * whole assembly; a part owns the ranges {@code firstFace .. firstFace + faceCount - 1} and {@code
 * firstEdge .. firstEdge + edgeCount - 1}.
 *
 * @param index position in {@link Assembly#parts()}
 * @param name the solid's or product's name; "part N" where the file gives none
 * @param path instance path through the assembly, names joined by "/", unique within the model
 * @param colour_rgb colour of the solid, linear 0 to 1, or null where the file gives none
 * @param firstFace first face of the part
 * @param faceCount number of faces
 * @param firstEdge first edge of the part
 * @param edgeCount number of edges
 * @param bounds_m axis-aligned bounding box {xmin, ymin, zmin, xmax, ymax, zmax} in metres
 * @param volume_m3 enclosed volume, positive
 * @param area_m2 surface area
 */
public record Part(
    int index,
    String name,
    String path,
    float[] colour_rgb,
    int firstFace,
    int faceCount,
    int firstEdge,
    int edgeCount,
    double[] bounds_m,
    double volume_m3,
    double area_m2) {

  /** Diagonal of the bounding box in metres. */
  public double size_m() {
    double dx = bounds_m[3] - bounds_m[0];
    double dy = bounds_m[4] - bounds_m[1];
    double dz = bounds_m[5] - bounds_m[2];
    return Math.sqrt(dx * dx + dy * dy + dz * dz);
  }
}
