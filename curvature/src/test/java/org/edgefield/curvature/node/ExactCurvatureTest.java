package org.edgefield.curvature.node;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.stream.Stream;
import org.edgefield.curvature.Models;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.curvature.feature.FeatureRecogniser;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Normals and principal curvatures at every node of STEP models, poles and apexes included, against
 * closed forms (sphere, cylinder, cone, torus, spheroid: any book on differential geometry,
 * recomputed here).
 */
class ExactCurvatureTest {
  /** Outward normal (3), k1, k2 at a point on the body; null where the node is not looked at. */
  private interface Body {
    double[] at(double x, double y, double z, double nz);
  }

  private record Case(String file, Body body, double tolerance) {
    @Override
    public String toString() {
      return file + " to " + tolerance;
    }
  }

  private static final double EXACT = 1e-12;
  private static final double NURBS = 1e-8;

  static Stream<Case> cases() {
    return Stream.of(
        // Degenerate points first: poles, apexes.
        new Case("sphere-r50.step", sphere(0.05, 0, 0, 0), EXACT),
        new Case("sphere-r50-askew.step", sphere(0.05, 0.1373, -0.0719, 0.05317), EXACT),
        new Case("sphere-r50-nurbs.step", sphere(0.05, 0, 0, 0), NURBS),
        new Case("sphere-r2in.step", sphere(0.0508, 0, 0, 0), EXACT),
        new Case("sphere-r1m.step", sphere(1, 0, 0, 0), EXACT),
        // The file gives the half-angle with 12 digits: 0.463647609001.
        new Case("cone.step", cone(0.03, 0.03 - 0.06 * Math.tan(0.463647609001), 0.06), EXACT),
        new Case("cone-nurbs.step", cone(0.03, 0.01, 0.04), NURBS),
        new Case("cylinder.step", cone(0.02, 0.02, 0.06), EXACT),
        new Case("cylinder-nurbs.step", cone(0.02, 0.02, 0.06), NURBS),
        new Case("torus-2.step", torus(0.02, 0.01), EXACT),
        new Case("torus-3.step", torus(0.03, 0.01), EXACT),
        new Case("torus-10.step", torus(0.1, 0.01), EXACT),
        new Case("torus-3-nurbs.step", torus(0.03, 0.01), NURBS),
        new Case("prolate-5.step", spheroid(0.1, 0.02), 1e-11),
        new Case("prolate-10.step", spheroid(0.1, 0.01), 1e-11));
  }

  private static Body sphere(double r, double cx, double cy, double cz) {
    return (x, y, z, nz) -> new double[] {(x - cx) / r, (y - cy) / r, (z - cz) / r, 1 / r, 1 / r};
  }

  /** Standing frustum; its wall's curvature is cos(half-angle) / rho. */
  private static Body cone(double r0, double r1, double height) {
    double slope = Math.hypot(height, r0 - r1);
    double cos = height / slope;
    double sin = (r0 - r1) / slope;
    return (x, y, z, nz) -> {
      if (Math.hypot(x, y) < 1e-9 && r1 < 1e-9 && z > 0) {
        // The apex looks along the axis; its curvature is large, finite, and no property of it.
        assertThat(nz).isCloseTo(1, within(1e-3));
        return null;
      }
      if (Math.abs(Math.abs(nz) - 1) < 1e-6) {
        return new double[] {0, 0, z > 0 ? 1 : -1, 0, 0};
      }
      double rho = r0 + (r1 - r0) * z / height;
      double flat = Math.hypot(x, y);
      return new double[] {cos * x / flat, cos * y / flat, sin, cos / rho, 0};
    };
  }

  private static Body torus(double major, double minor) {
    return (x, y, z, nz) -> {
      double rho = Math.hypot(x, y);
      double cos = (rho - major) / minor;
      return new double[] {
        cos * x / rho, cos * y / rho, z / minor, 1 / minor, (rho - major) / (minor * rho)
      };
    };
  }

  /** Polar semi-axis a along z, equatorial b. With w^2 = rho^2/b^4 + z^2/a^4. */
  private static Body spheroid(double a, double b) {
    return (x, y, z, nz) -> {
      double rho2 = x * x + y * y;
      double w = Math.sqrt(rho2 / (b * b * b * b) + z * z / (a * a * a * a));
      double meridian = 1 / (a * a * b * b * w * w * w);
      double parallel = 1 / (b * b * w);
      return new double[] {
        x / (b * b * w),
        y / (b * b * w),
        z / (a * a * w),
        Math.max(meridian, parallel),
        Math.min(meridian, parallel)
      };
    };
  }

  @ParameterizedTest
  @MethodSource("cases")
  void everyNodeHasTheExactCurvature(Case c) {
    try (KernelAssembly assembly = Models.open(c.file)) {
      SurfaceMesh mesh = assembly.triangulation();
      SurfaceNodes nodes =
          NodeBuilder.perFace(
              assembly.geometry(), mesh, FeatureRecogniser.of(assembly.geometry(), mesh));
      double[] n = nodes.normal();
      double[] d = nodes.direction1();
      double worstCurvature = 0;
      double worstNormal = 0;
      int seen = 0;
      for (int i = 0; i < nodes.count(); i++) {
        int v = 3 * nodes.nodeVertex()[i];
        int a = 3 * i;
        assertThat(nodes.k1()[i]).isFinite().isGreaterThanOrEqualTo(nodes.k2()[i]);
        assertThat(n[a] * d[a] + n[a + 1] * d[a + 1] + n[a + 2] * d[a + 2])
            .isCloseTo(0, within(1e-12));
        assertThat(d[a] * d[a] + d[a + 1] * d[a + 1] + d[a + 2] * d[a + 2])
            .isCloseTo(1, within(1e-12));
        double[] e = c.body.at(mesh.xyz()[v], mesh.xyz()[v + 1], mesh.xyz()[v + 2], n[a + 2]);
        if (e == null) {
          continue;
        }
        seen++;
        double scale = e[3] == 0 ? 1 : e[3];
        worstCurvature =
            Math.max(
                worstCurvature,
                Math.max(Math.abs(nodes.k1()[i] - e[3]), Math.abs(nodes.k2()[i] - e[4])) / scale);
        for (int k = 0; k < 3; k++) {
          worstNormal = Math.max(worstNormal, Math.abs(n[a + k] - e[k]));
        }
      }
      assertThat(seen).isGreaterThan(nodes.count() - 2);
      assertThat(worstCurvature).as("curvature").isLessThan(c.tolerance);
      assertThat(worstNormal).as("normal").isLessThan(c.tolerance);
    }
  }
}
