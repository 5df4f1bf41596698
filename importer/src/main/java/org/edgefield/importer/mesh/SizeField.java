package org.edgefield.importer.mesh;

/** Largest wanted element size at points in space, on top of what the mesher itself asks for. */
@FunctionalInterface
public interface SizeField {
  /**
   * Size at a point; must give the same answer for the same point, and may be called from several
   * threads.
   *
   * @param x metres
   * @param y metres
   * @param z metres
   * @return size in metres, above 0; infinite where nothing is asked
   */
  double size_m(double x, double y, double z);
}
