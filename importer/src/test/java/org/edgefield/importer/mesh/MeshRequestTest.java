package org.edgefield.importer.mesh;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.List;
import org.edgefield.importer.Progress;
import org.edgefield.importer.mesh.bodies.AnalyticBody;
import org.edgefield.importer.mesh.check.MeshQuality;
import org.junit.jupiter.api.Test;

class MeshRequestTest {
  private static final MeshSettings SETTINGS = MeshSettings.defaults();

  private static SurfaceMesh mesh(AnalyticBody body, MeshRequest request) {
    return SurfaceMesher.refine(body, body.mesh(), SETTINGS, request, Progress.NONE);
  }

  private static void assertGood(AnalyticBody body, SurfaceMesh mesh, MeshRequest request) {
    MeshQuality q = MeshQuality.measure(body, mesh, SETTINGS, request);
    assertThat(q.inverted()).isZero();
    assertThat(q.shareBelow20()).as(q.line()).isLessThan(0.005);
    assertThat(q.below5()).isZero();
    assertThat(q.countRatio()).as(q.line()).isLessThan(1.3);
  }

  private static double longestSide(SurfaceMesh mesh, int t) {
    double longest = 0;
    for (int k = 0; k < 3; k++) {
      int a = mesh.triangles()[3 * t + k];
      int b = mesh.triangles()[3 * t + (k + 1) % 3];
      longest = Math.max(longest, distance(mesh.xyz(), a, b));
    }
    return longest;
  }

  private static double distance(double[] x, int a, int b) {
    double dx = x[3 * a] - x[3 * b];
    double dy = x[3 * a + 1] - x[3 * b + 1];
    double dz = x[3 * a + 2] - x[3 * b + 2];
    return Math.sqrt(dx * dx + dy * dy + dz * dz);
  }

  @Test
  void fieldMakesSmallElementsAroundAPoint() {
    AnalyticBody body = AnalyticBody.box(1, 1, 0.5);
    MeshRequest request =
        MeshRequest.NONE.withField(
            (x, y, z) -> Math.max(0.005, 0.3 * Math.hypot(Math.hypot(x - 0.5, y - 0.5), z)));
    SurfaceMesh mesh = mesh(body, request);
    assertGood(body, mesh, request);
    int near = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int v = mesh.triangles()[3 * t];
      double r =
          Math.hypot(
              Math.hypot(mesh.xyz()[3 * v] - 0.5, mesh.xyz()[3 * v + 1] - 0.5),
              mesh.xyz()[3 * v + 2]);
      if (r < 0.02) {
        near++;
        assertThat(longestSide(mesh, t)).isLessThan(0.015);
      }
    }
    assertThat(near).isGreaterThan(20);
  }

  @Test
  void targetPerVertexRefinesAnEarlierMesh() {
    AnalyticBody body = AnalyticBody.sphere(1, 9);
    SurfaceMesh first = mesh(body, MeshRequest.NONE);
    double[] target = new double[first.vertexCount()];
    for (int v = 0; v < target.length; v++) {
      target[v] = first.xyz()[3 * v + 2] > 0.7 ? 0.05 : Double.POSITIVE_INFINITY;
    }
    SurfaceMesh second =
        SurfaceMesher.refine(
            body, first, SETTINGS, MeshRequest.NONE.withTargetSize(target), Progress.NONE);
    assertThat(second.triangleCount()).isBetween(1500, 6000);
    double longest = 0;
    for (int t = 0; t < second.triangleCount(); t++) {
      if (second.xyz()[3 * second.triangles()[3 * t] + 2] > 0.85) {
        longest = Math.max(longest, longestSide(second, t));
      }
    }
    assertThat(longest).isBetween(0.04, 0.085);
  }

  @Test
  void gradedRowsAreThinAcrossTheEdgeAndGrow() {
    AnalyticBody body = AnalyticBody.box(1, 1, 1);
    double row = 0.002;
    MeshRequest request = MeshRequest.NONE.withEdges(List.of(new EdgeGrading(0, row, 2)));
    SurfaceMesh mesh = mesh(body, request);
    assertGood(body, mesh, request);
    int first = 0;
    double mean = 0;
    double[] x = mesh.xyz();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int on = 0;
      double farthest = 0;
      for (int k = 0; k < 3; k++) {
        int v = mesh.triangles()[3 * t + k];
        // Edge 0 runs along x through the origin.
        double d = Math.hypot(x[3 * v + 1], x[3 * v + 2]);
        on += d == 0 ? 1 : 0;
        farthest = Math.max(farthest, d);
      }
      if (on == 2) {
        first++;
        mean += farthest;
        assertThat(farthest).isBetween(0.4 * row, 2.2 * row);
        assertThat(longestSide(mesh, t)).isGreaterThan(0.03);
      }
    }
    assertThat(first).isBetween(10, 40);
    assertThat(mean / first).isBetween(0.6 * row, 1.6 * row);
    // Rows of elements 0.1 wide that double from 0.002: few, whatever the finest.
    assertThat(mesh.triangleCount()).isLessThan(4000);
  }

  @Test
  void partsOfOneGroupDoNotRefineEachOther() {
    AnalyticBody body = AnalyticBody.sphere(1, 9).addSphere(1, 2.02, 0, 0, 9);
    SurfaceMesh apart = mesh(body, MeshRequest.NONE);
    SurfaceMesh group = mesh(body, MeshRequest.NONE.withPartGroup(new int[] {0, 0}));
    assertThat(apart.triangleCount()).isGreaterThan(group.triangleCount() + 200);
  }

  @Test
  void sameInputGivesTheSameBits() {
    AnalyticBody body = AnalyticBody.sphere(1, 9).addSphere(0.5, 2.02, 0, 0, 9);
    SurfaceMesh a = mesh(body, MeshRequest.NONE);
    SurfaceMesh b = mesh(body, MeshRequest.NONE);
    assertThat(Arrays.equals(a.xyz(), b.xyz())).isTrue();
    assertThat(Arrays.equals(a.triangles(), b.triangles())).isTrue();
    assertThat(Arrays.equals(a.cornerUv(), b.cornerUv())).isTrue();
    assertThat(Arrays.equals(a.segmentT(), b.segmentT())).isTrue();
  }
}
