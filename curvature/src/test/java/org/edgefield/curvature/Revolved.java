package org.edgefield.curvature;

import org.edgefield.importer.brep.SurfaceKind;

/** Solids of revolution that the tests share; lengths in metres. */
public final class Revolved {
  private Revolved() {}

  /** Sphere with its poles on the axis. */
  public static RevolvedSolid sphere(double radius) {
    return new RevolvedSolid(0, -radius).arc(0, radius, Math.PI, SurfaceKind.SPHERE);
  }

  /** Cylinder with sharp rims. */
  public static RevolvedSolid cylinder(double radius, double height) {
    return new RevolvedSolid(0, 0).line(radius, 0).line(radius, height).line(0, height);
  }

  /** Cone standing on its base. */
  public static RevolvedSolid cone(double radius, double height) {
    return new RevolvedSolid(0, 0).line(radius, 0).line(0, height);
  }

  /** Disc with both rims rounded. */
  public static RevolvedSolid roundedDisc(
      double radius, double height, double rim, SurfaceKind kind) {
    return new RevolvedSolid(0, 0)
        .line(radius - rim, 0)
        .arc(radius, rim, Math.PI / 2, kind)
        .line(radius, height - rim)
        .arc(radius - rim, height, Math.PI / 2, kind)
        .line(0, height);
  }

  /** Plate with a stud on it; the foot of the stud has a hollow fillet. */
  public static RevolvedSolid stud(double radius, double foot, SurfaceKind kind) {
    return new RevolvedSolid(0, 0)
        .line(10 * radius, 0)
        .line(10 * radius, radius)
        .line(radius + foot, radius)
        .arc(radius, radius + foot, -Math.PI / 2, kind)
        .line(radius, 8 * radius)
        .line(0, 8 * radius);
  }

  /** Tube with sharp rims. */
  public static RevolvedSolid tube(double inner, double outer, double height) {
    return new RevolvedSolid(inner, 0)
        .line(outer, 0)
        .line(outer, height)
        .line(inner, height)
        .line(inner, 0)
        .close();
  }

  /** Rod with a hemispherical top. */
  public static RevolvedSolid rod(double radius, double height) {
    return new RevolvedSolid(0, 0)
        .line(radius, 0)
        .line(radius, height - radius)
        .arc(0, height, Math.PI / 2, SurfaceKind.SPHERE);
  }

  /** Torus. */
  public static RevolvedSolid torus(double major, double minor, SurfaceKind kind) {
    return new RevolvedSolid(major, -minor)
        .arc(major, minor, Math.PI, kind)
        .arc(major, -minor, Math.PI, kind)
        .close();
  }
}
