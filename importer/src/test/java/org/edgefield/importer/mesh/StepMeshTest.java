package org.edgefield.importer.mesh;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import org.edgefield.importer.Progress;
import org.edgefield.importer.mesh.check.MeshQuality;
import org.edgefield.importer.step.ReadLimits;
import org.edgefield.importer.step.StepReader;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Meshes of STEP models through the kernel: periodic and NURBS faces, poles, apexes, fillets. */
class StepMeshTest {
  private static final Path MODELS = Path.of("..", "test-models", "step");

  @ParameterizedTest
  @ValueSource(
      strings = {
        "sphere-r50-askew.step",
        "sphere-r50-nurbs.step",
        "torus-3-inch.step",
        "torus-3-nurbs.step",
        "cone.step",
        "cone-nurbs.step",
        "cylinder-nurbs.step",
        "disc-sharp.step",
        // Chords of the first mesh longer than the fillet is wide.
        "disc-rim-r0.8.step",
        "cube-100-rounded-0.05.step",
        // Walls of 1.5 mm on 400 mm.
        "thin-housing.step",
        "demo-compartment.step"
      })
  void meetsTargets(String file) {
    try (var model = StepReader.read(MODELS.resolve(file), ReadLimits.defaults(), Progress.NONE)) {
      MeshSettings settings = MeshSettings.defaults();
      SurfaceMesh mesh = SurfaceMesher.mesh(model, settings, Progress.NONE);
      MeshQuality q = MeshQuality.measure(model, mesh, settings, MeshRequest.NONE);
      assertThat(q.inverted()).isZero();
      assertThat(q.faceError()).isLessThan(1e-9);
      assertThat(q.edgeError()).isLessThan(1e-9);
      assertThat(q.shareBelow20()).as(q.line()).isLessThan(0.005);
      assertThat(q.below5()).as(q.line()).isZero();
      assertThat(q.countRatio()).as(q.line()).isLessThan(1.3);
    }
  }
}
