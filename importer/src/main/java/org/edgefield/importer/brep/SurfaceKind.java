package org.edgefield.importer.brep;

/** Geometry type of a face. */
public enum SurfaceKind {
  PLANE,
  CYLINDER,
  CONE,
  SPHERE,
  TORUS,
  /** Bezier or B-spline, rational or not. */
  NURBS,
  /** Offset, extrusion, revolution and whatever else the kernel knows. */
  OTHER
}
