package org.edgefield.curvature.node;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.stream.IntStream;
import org.edgefield.curvature.Revolved;
import org.edgefield.curvature.RevolvedSolid;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.curvature.feature.FeatureRecogniser;
import org.edgefield.importer.brep.SurfaceKind;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleTree;
import org.junit.jupiter.api.Test;

/** Expected values are the bodies' own measures. */
class WallThicknessTest {
  private static double[] thickness(SurfaceMesh mesh, SurfaceNodes nodes) {
    TriangleCursor cursor =
        TriangleTree.build(mesh.xyz(), mesh.triangles(), new int[mesh.triangleCount()]).cursor();
    WallThickness walls = new WallThickness(mesh, nodes);
    return IntStream.range(0, nodes.count()).mapToDouble(n -> walls.at(cursor, n)).toArray();
  }

  private static SurfaceNodes nodes(RevolvedSolid solid, SurfaceMesh mesh) {
    return NodeBuilder.perFace(solid, mesh, FeatureRecogniser.of(solid, mesh));
  }

  @Test
  void anOpenSurfaceHasNoThickness() {
    RevolvedSolid solid = Revolved.cylinder(0.01, 0.02);
    SurfaceMesh all = solid.mesh(16, 2);
    int keep = 0;
    while (all.triangleFace()[keep] == 0) {
      keep++;
    }
    SurfaceMesh bottom =
        new SurfaceMesh(
            all.xyz(),
            java.util.Arrays.copyOf(all.triangles(), 3 * keep),
            java.util.Arrays.copyOf(all.triangleFace(), keep),
            java.util.Arrays.copyOf(all.cornerUv(), 6 * keep),
            all.vertexKind(),
            all.vertexEntity(),
            all.segmentVertices(),
            all.segmentEdge(),
            all.segmentT());
    // Edges whose walls are missing from the mesh still have their exact classes.
    SurfaceNodes nodes = nodes(solid, bottom);
    assertThat(nodes.count()).isPositive();
    assertThat(thickness(bottom, nodes)).containsOnly(Double.POSITIVE_INFINITY);
  }

  @Test
  void aCylinderIsAsThickAsItIsTallOrWideAlsoOnItsRims() {
    RevolvedSolid solid = Revolved.cylinder(0.01, 0.07);
    SurfaceMesh mesh = solid.mesh(64, 3);
    SurfaceNodes nodes = nodes(solid, mesh);
    double[] t = thickness(mesh, nodes);
    for (int c = 0; c < nodes.cornerNode().length; c++) {
      int node = nodes.cornerNode()[c];
      if (mesh.triangleFace()[c / 3] == 1) {
        // The ray may end on a chord of the far side: 1 - cos(pi / 64) short of it.
        assertThat(t[node]).isCloseTo(0.02, within(0.02 * 2e-3));
      } else {
        assertThat(t[node]).isCloseTo(0.07, within(1e-12));
      }
    }
  }

  @Test
  void aTubeIsAsThickAsItsWallFromInsideAndOutside() {
    RevolvedSolid solid = Revolved.tube(0.010, 0.012, 0.05);
    SurfaceMesh mesh = solid.mesh(128, 2);
    SurfaceNodes nodes = nodes(solid, mesh);
    double[] t = thickness(mesh, nodes);
    for (int c = 0; c < nodes.cornerNode().length; c++) {
      int face = mesh.triangleFace()[c / 3];
      if (face == 1 || face == 3) {
        assertThat(t[nodes.cornerNode()[c]]).isCloseTo(0.002, within(1e-5));
      }
    }
  }

  @Test
  void aSphereIsAsThickAsItsDiameterAlsoAtItsPoles() {
    RevolvedSolid solid = Revolved.sphere(0.05);
    SurfaceMesh mesh = solid.mesh(64, 32);
    double[] t = thickness(mesh, nodes(solid, mesh));
    for (double x : t) {
      assertThat(x).isCloseTo(0.1, within(0.1 * 5e-3));
    }
  }

  @Test
  void aTorusIsAsThickAsItsSection() {
    RevolvedSolid solid = Revolved.torus(0.05, 0.01, SurfaceKind.TORUS);
    SurfaceMesh mesh = solid.mesh(128, 32);
    double[] t = thickness(mesh, nodes(solid, mesh));
    for (double x : t) {
      assertThat(x).isCloseTo(0.02, within(2e-4));
    }
  }
}
