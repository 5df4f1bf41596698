package org.edgefield.importer.mesh;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.stream.Stream;
import org.edgefield.importer.Progress;
import org.edgefield.importer.mesh.bodies.AnalyticBody;
import org.edgefield.importer.mesh.check.MeshQuality;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

class SurfaceMesherTest {

  static Stream<Arguments> bodies() {
    return Stream.of(
        Arguments.of("box", AnalyticBody.box(1, 0.5, 0.2)),
        Arguments.of("flat box", AnalyticBody.box(1, 1, 0.01)),
        Arguments.of("sphere", AnalyticBody.sphere(1, 9)),
        Arguments.of("torus", AnalyticBody.torus(1, 0.2, 18, 12)),
        Arguments.of("thin torus", AnalyticBody.torus(1, 0.02, 24, 12)),
        Arguments.of("cylinder", AnalyticBody.cylinder(0.1, 1, 18)),
        Arguments.of("disc", AnalyticBody.cylinder(1, 0.05, 24)),
        Arguments.of("cone", AnalyticBody.cone(0.5, 1, 18)),
        Arguments.of("two spheres", AnalyticBody.sphere(1, 9).addSphere(1, 2.1, 0, 0, 9)));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("bodies")
  void meetsTargets(String name, AnalyticBody body) {
    MeshSettings settings = MeshSettings.defaults();
    SurfaceMesh mesh =
        SurfaceMesher.refine(body, body.mesh(), settings, MeshRequest.NONE, Progress.NONE);
    MeshQuality q = MeshQuality.measure(body, mesh, settings, MeshRequest.NONE);
    assertThat(q.inverted()).isZero();
    assertThat(q.faceError()).isLessThan(1e-9);
    assertThat(q.edgeError()).isLessThan(1e-9);
    assertThat(q.shareBelow20()).isLessThan(0.005);
    assertThat(q.below5()).isZero();
    assertThat(q.countRatio()).isLessThan(1.3);
  }
}
