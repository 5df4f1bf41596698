package org.edgefield.importer.brep;

/**
 * Exact evaluation on the faces and edges of an assembly, in metres and at the assembly's
 * placement. Surface parameters (u, v) and curve parameters t are the kernel's own. Faces and edges
 * are numbered through the whole assembly.
 *
 * <p>Normals point out of the solid, into the gas. Curvatures are positive where the surface is
 * convex towards the gas (a sphere terminal of radius r has k1 = k2 = +1/r, the inside of a bore
 * negative), with k1 &gt;= k2.
 *
 * <p>Implementations may be called from several threads at once.
 */
public interface ExactGeometry {
  /**
   * Doubles per point in {@link #curvature}: normal 3, k1, k2, direction 1 (3), direction 2 (3).
   */
  int CURVATURE_STRIDE = 11;

  /** Number of faces. */
  int faceCount();

  /** Number of edges. */
  int edgeCount();

  /** Part that owns a face. */
  int facePart(int face);

  /** Geometry type of a face. */
  SurfaceKind faceKind(int face);

  /** Parameter bounds {umin, umax, vmin, vmax} of the trimmed face. */
  double[] faceBounds(int face);

  /** Period in u of the face's surface, 0 where it is not periodic. */
  double uPeriod(int face);

  /** Period in v of the face's surface, 0 where it is not periodic. */
  double vPeriod(int face);

  /**
   * Points and first derivatives.
   *
   * @param n number of points
   * @param face face per point, length n
   * @param uv parameters, length 2 n
   * @param out position, dS/du, dS/dv per point: length 9 n, metres and metres per parameter unit
   */
  void surface(int n, int[] face, double[] uv, double[] out);

  /**
   * Outward unit normals, principal curvatures and directions.
   *
   * @param n number of points
   * @param face face per point, length n
   * @param uv parameters, length 2 n
   * @param out {@link #CURVATURE_STRIDE} doubles per point: outward normal, k1 &gt;= k2 in 1/m,
   *     unit directions of k1 and k2; at umbilics any orthonormal tangent pair. Never NaN: at poles
   *     and apexes the limit along the face is taken (an apex has a large finite curvature)
   */
  void curvature(int n, int[] face, double[] uv, double[] out);

  /**
   * Nearest point on a face's surface, started from a guess.
   *
   * @param n number of points
   * @param face face per point, length n
   * @param xyz points to project, length 3 n, metres
   * @param uv in: start values, out: parameters of the foot points; length 2 n
   */
  void project(int n, int[] face, double[] xyz, double[] uv);

  /** Parameter range {t0, t1} of an edge. */
  double[] edgeRange(int edge);

  /** Whether an edge has no length (a pole or an apex). */
  boolean edgeDegenerate(int edge);

  /** Start and end vertex of an edge, equal where it is closed; ids through the whole assembly. */
  int[] edgeVertices(int edge);

  /** Faces on the two sides of an edge; equal on a seam; -1 where the edge is open. */
  int[] edgeFaces(int edge);

  /**
   * Points and first derivatives of edges.
   *
   * @param n number of points
   * @param edge edge per point, length n
   * @param t parameter per point, length n
   * @param out position and d/dt per point: length 6 n
   */
  void curve(int n, int[] edge, double[] t, double[] out);

  /**
   * Parameters on an adjoining face of points on an edge.
   *
   * @param edge the edge
   * @param side 0 or 1: which entry of {@link #edgeFaces}; on a seam the two sides of the face
   * @param n number of points
   * @param t curve parameters, length n
   * @param uv out: length 2 n
   */
  void edgeUv(int edge, int side, int n, double[] t, double[] uv);
}
