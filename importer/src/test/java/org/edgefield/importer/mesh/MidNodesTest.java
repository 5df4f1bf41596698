package org.edgefield.importer.mesh;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.edgefield.importer.Progress;
import org.edgefield.importer.mesh.bodies.AnalyticBody;
import org.junit.jupiter.api.Test;

class MidNodesTest {

  private static SurfaceMesh mesh(AnalyticBody body) {
    return SurfaceMesher.refine(
        body, body.mesh(), MeshSettings.defaults(), MeshRequest.NONE, Progress.NONE);
  }

  @Test
  void everySideIsSharedByTwoTrianglesWithTheSameEnds() {
    AnalyticBody body = AnalyticBody.cylinder(0.1, 1, 18);
    SurfaceMesh mesh = mesh(body);
    MidNodes mids = MidNodes.of(body, mesh);
    assertThat(mids.count()).isEqualTo(3 * mesh.triangleCount() / 2);
    int[] uses = new int[mids.count()];
    for (int h = 0; h < mids.sideOfTriangle().length; h++) {
      int side = mids.sideOfTriangle()[h];
      int a = mesh.triangles()[h];
      int b = mesh.triangles()[h % 3 == 2 ? h - 2 : h + 1];
      assertThat(mids.sideVertices()[2 * side]).isEqualTo(Math.min(a, b));
      assertThat(mids.sideVertices()[2 * side + 1]).isEqualTo(Math.max(a, b));
      uses[side]++;
    }
    assertThat(uses).containsOnly(2);
  }

  @Test
  void liesOnTheSphereMidwayAlsoAtPolesAndSeam() {
    AnalyticBody body = AnalyticBody.sphere(2, 9);
    SurfaceMesh mesh = mesh(body);
    MidNodes mids = MidNodes.of(body, mesh);
    double[] x = mesh.xyz();
    for (int s = 0; s < mids.count(); s++) {
      double radius2 = 0;
      double chord2 = 0;
      double scale = 0;
      for (int i = 0; i < 3; i++) {
        double a = x[3 * mids.sideVertices()[2 * s] + i];
        double b = x[3 * mids.sideVertices()[2 * s + 1] + i];
        double m = mids.midXyz()[3 * s + i];
        radius2 += m * m;
        chord2 += 0.25 * (a + b) * (a + b);
        scale += 0.5 * (a + b) * m;
      }
      assertThat(Math.sqrt(radius2)).isCloseTo(2, within(1e-12));
      // Along the radius through the middle of the chord.
      assertThat(scale / Math.sqrt(radius2 * chord2)).isCloseTo(1, within(1e-12));
    }
  }

  @Test
  void liesOnTheExactCurveOnCadEdges() {
    AnalyticBody body = AnalyticBody.cylinder(0.1, 1, 18);
    SurfaceMesh mesh = mesh(body);
    MidNodes mids = MidNodes.of(body, mesh);
    int onRim = 0;
    for (int s = 0; s < mids.count(); s++) {
      int a = mids.sideVertices()[2 * s];
      int b = mids.sideVertices()[2 * s + 1];
      boolean rim = isRim(mesh, a, b);
      if (rim) {
        onRim++;
        double[] m = mids.midXyz();
        assertThat(Math.hypot(m[3 * s], m[3 * s + 1])).isCloseTo(0.1, within(1e-14));
        assertThat(m[3 * s + 2] % 1).isZero();
      }
    }
    assertThat(onRim).isGreaterThan(20);
  }

  private static boolean isRim(SurfaceMesh mesh, int a, int b) {
    for (int g = 0; g < mesh.segmentCount(); g++) {
      int p = mesh.segmentVertices()[2 * g];
      int q = mesh.segmentVertices()[2 * g + 1];
      // Edge 0 is the seam.
      if (mesh.segmentEdge()[g] != 0 && ((p == a && q == b) || (p == b && q == a))) {
        return true;
      }
    }
    return false;
  }
}
