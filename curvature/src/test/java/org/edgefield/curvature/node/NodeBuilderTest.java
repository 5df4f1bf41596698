package org.edgefield.curvature.node;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.edgefield.curvature.Features;
import org.edgefield.curvature.Revolved;
import org.edgefield.curvature.RevolvedSolid;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.curvature.feature.FeatureRecogniser;
import org.edgefield.importer.brep.SurfaceKind;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.junit.jupiter.api.Test;

class NodeBuilderTest {
  private static SurfaceNodes smooth(RevolvedSolid solid, SurfaceMesh mesh) {
    return NodeBuilder.smoothPatches(solid, mesh, FeatureRecogniser.of(solid, mesh));
  }

  private static SurfaceNodes perFace(RevolvedSolid solid, SurfaceMesh mesh) {
    return NodeBuilder.perFace(solid, mesh, FeatureRecogniser.of(solid, mesh));
  }

  @Test
  void anEmptyMeshHasNoNodes() {
    SurfaceMesh empty =
        new SurfaceMesh(
            new double[0],
            new int[0],
            new int[0],
            new double[0],
            new byte[0],
            new int[0],
            new int[0],
            new int[0],
            new double[0]);
    assertThat(smooth(Revolved.sphere(1), empty).count()).isZero();
  }

  @Test
  void aVertexOfNoTriangleGetsNoNode() {
    RevolvedSolid solid = Revolved.cylinder(1, 1);
    SurfaceMesh m = solid.mesh(8, 2);
    double[] xyz = java.util.Arrays.copyOf(m.xyz(), m.xyz().length + 3);
    byte[] kind = java.util.Arrays.copyOf(m.vertexKind(), m.vertexCount() + 1);
    int[] entity = java.util.Arrays.copyOf(m.vertexEntity(), m.vertexCount() + 1);
    SurfaceMesh more =
        new SurfaceMesh(
            xyz,
            m.triangles(),
            m.triangleFace(),
            m.cornerUv(),
            kind,
            entity,
            m.segmentVertices(),
            m.segmentEdge(),
            m.segmentT());
    assertThat(smooth(solid, more).count()).isEqualTo(smooth(solid, m).count());
  }

  @Test
  void polesAndSeamsOfASphereAreOrdinaryPoints() {
    RevolvedSolid solid = Revolved.sphere(0.05);
    SurfaceMesh mesh = solid.mesh(12, 8);
    SurfaceNodes nodes = smooth(solid, mesh);
    assertThat(nodes.count()).isEqualTo(mesh.vertexCount());
    for (int i = 0; i < nodes.count(); i++) {
      assertThat(nodes.k1()[i]).isCloseTo(20, within(1e-12 * 20));
      assertThat(nodes.k2()[i]).isCloseTo(20, within(1e-12 * 20));
      for (int c = 0; c < 3; c++) {
        assertThat(nodes.normal()[3 * i + c])
            .isCloseTo(mesh.xyz()[3 * nodes.nodeVertex()[i] + c] / 0.05, within(1e-12));
      }
      assertFrame(nodes, i);
    }
  }

  @Test
  void anApexHasOneNodeThatLooksAlongTheAxis() {
    RevolvedSolid solid = Revolved.cone(0.01, 0.03);
    SurfaceMesh mesh = solid.mesh(16, 3);
    SurfaceNodes nodes = smooth(solid, mesh);
    int apex = -1;
    for (int i = 0; i < nodes.count(); i++) {
      if (Math.abs(mesh.xyz()[3 * nodes.nodeVertex()[i] + 2] - 0.03) < 1e-12) {
        assertThat(apex).isEqualTo(-1);
        apex = i;
      }
    }
    assertThat(nodes.normal()[3 * apex + 2]).isCloseTo(1, within(1e-9));
    assertThat(nodes.k1()[apex]).isFinite().isGreaterThan(1e6);
    assertFrame(nodes, apex);
  }

  @Test
  void sharpRimsDoubleTheirNodesAndSeamsDoNot() {
    RevolvedSolid solid = Revolved.cylinder(0.02, 0.05);
    int around = 10;
    SurfaceMesh mesh = solid.mesh(around, 3);
    SurfaceNodes nodes = smooth(solid, mesh);
    assertThat(nodes.count()).isEqualTo(mesh.vertexCount() + 2 * around);
    assertThat(nodes.facePatch()).containsExactly(0, 1, 2);
    for (int c = 0; c < nodes.cornerNode().length; c++) {
      int node = nodes.cornerNode()[c];
      assertThat(nodes.nodeVertex()[node]).isEqualTo(mesh.triangles()[c]);
      assertThat(nodes.nodePatch()[node]).isEqualTo(nodes.facePatch()[mesh.triangleFace()[c / 3]]);
      boolean wall = mesh.triangleFace()[c / 3] == 1;
      assertThat(nodes.k1()[node]).isCloseTo(wall ? 50 : 0, within(1e-11));
      assertThat(Math.abs(nodes.normal()[3 * node + 2])).isCloseTo(wall ? 0 : 1, within(1e-14));
    }
  }

  @Test
  void tangentJoinsShareNodesAndTakeTheTighterCurvature() {
    RevolvedSolid solid = Revolved.roundedDisc(0.05, 0.02, 0.002, SurfaceKind.TORUS);
    int around = 24;
    SurfaceMesh mesh = solid.mesh(around, 4);
    SurfaceNodes nodes = smooth(solid, mesh);
    assertThat(nodes.count()).isEqualTo(mesh.vertexCount());
    assertThat(nodes.facePatch()).containsExactly(0, 0, 0, 0, 0);
    for (int i = 0; i < nodes.count(); i++) {
      double[] x = mesh.xyz();
      int v = 3 * nodes.nodeVertex()[i];
      if (Math.abs(x[v + 2]) < 1e-12 && Math.abs(Math.hypot(x[v], x[v + 1]) - 0.048) < 1e-12) {
        // On the line between the flat bottom and the rounded rim: the rim's 1/2 mm.
        assertThat(nodes.k1()[i]).isCloseTo(500, within(1e-9));
        assertThat(nodes.normal()[3 * i + 2]).isCloseTo(-1, within(1e-12));
      }
    }
    SurfaceNodes crisp = perFace(solid, mesh);
    assertThat(crisp.count()).isEqualTo(mesh.vertexCount() + 4 * around);
    assertThat(crisp.facePatch()).containsExactly(0, 1, 2, 3, 4);
    for (int c = 0; c < crisp.cornerNode().length; c++) {
      int face = mesh.triangleFace()[c / 3];
      double k = crisp.k1()[crisp.cornerNode()[c]];
      double expected = face == 1 || face == 3 ? 500 : face == 2 ? 20 : 0;
      assertThat(k).isCloseTo(expected, within(1e-9));
    }
  }

  @Test
  void hollowSurfacesHaveNegativeCurvature() {
    RevolvedSolid solid = Revolved.tube(0.01, 0.02, 0.05);
    SurfaceMesh mesh = solid.mesh(16, 2);
    SurfaceNodes nodes = perFace(solid, mesh);
    for (int c = 0; c < nodes.cornerNode().length; c++) {
      int node = nodes.cornerNode()[c];
      switch (mesh.triangleFace()[c / 3]) {
        case 1 -> assertThat(nodes.k1()[node]).isCloseTo(50, within(1e-11));
        case 3 -> {
          assertThat(nodes.k1()[node]).isCloseTo(0, within(1e-11));
          assertThat(nodes.k2()[node]).isCloseTo(-100, within(1e-10));
        }
        default -> assertThat(nodes.k1()[node]).isCloseTo(0, within(1e-12));
      }
    }
  }

  @Test
  void twoTrianglesAroundASliverRimStillFallIntoSectors() {
    // Three columns: the coarsest closed mesh.
    RevolvedSolid solid = Revolved.cylinder(1, 1);
    SurfaceMesh mesh = solid.mesh(3, 1);
    Features features = FeatureRecogniser.of(solid, mesh);
    assertThat(NodeBuilder.smoothPatches(solid, mesh, features).count())
        .isEqualTo(mesh.vertexCount() + 6);
  }

  private static void assertFrame(SurfaceNodes nodes, int i) {
    double[] n = nodes.normal();
    double[] d = nodes.direction1();
    int a = 3 * i;
    assertThat(n[a] * n[a] + n[a + 1] * n[a + 1] + n[a + 2] * n[a + 2]).isCloseTo(1, within(1e-12));
    assertThat(d[a] * d[a] + d[a + 1] * d[a + 1] + d[a + 2] * d[a + 2]).isCloseTo(1, within(1e-12));
    assertThat(n[a] * d[a] + n[a + 1] * d[a + 1] + n[a + 2] * d[a + 2]).isCloseTo(0, within(1e-12));
  }
}
