package org.edgefield.field.estimate;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.curvature.feature.FeatureRecogniser;
import org.edgefield.curvature.node.NodeBuilder;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.EdgesAsMade;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.importer.mesh.MeshSettings;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.SurfaceMesher;
import org.edgefield.importer.step.ReadLimits;
import org.edgefield.importer.step.StepReader;
import org.edgefield.models.cases.Terminal;
import org.edgefield.models.cases.ValidationCase;

/**
 * A committed STEP model on the mesh that a screen takes, with its estimate.
 *
 * @param nodePart part per node
 */
record ScreenedModel(
    SurfaceMesh mesh,
    SurfaceNodes nodes,
    int[] nodePart,
    FieldCase fieldCase,
    EstimateModel estimate) {
  /** What fields are compared with in the cases. */
  static final Permitted FIXED = new Permitted(Permitted.Criterion.FIXED, 3e6, 1, 0.8, 1);

  static KernelAssembly read(String model) {
    Path file = Path.of("..", "test-models", "step", model);
    return StepReader.read(file, ReadLimits.defaults(), Progress.NONE);
  }

  static ScreenedModel of(KernelAssembly assembly, FieldCase fieldCase) {
    return of(
        assembly, fieldCase, SurfaceMesher.mesh(assembly, MeshSettings.defaults(), Progress.NONE));
  }

  static ScreenedModel of(KernelAssembly assembly, FieldCase fieldCase, SurfaceMesh mesh) {
    Features features = FeatureRecogniser.of(assembly.geometry(), mesh);
    SurfaceNodes nodes = NodeBuilder.perFace(assembly.geometry(), mesh, features);
    int[] part = new int[nodes.count()];
    for (int i = 0; i < mesh.triangles().length; i++) {
      part[nodes.cornerNode()[i]] = assembly.geometry().facePart(mesh.triangleFace()[i / 3]);
    }
    return new ScreenedModel(
        mesh,
        nodes,
        part,
        fieldCase,
        EstimateModel.build(assembly, mesh, nodes, features, fieldCase, Progress.NONE));
  }

  /** Electrodes and surroundings of a case. */
  static FieldCase fieldCase(KernelAssembly assembly, ValidationCase c) {
    List<Electrode> electrodes = new ArrayList<>();
    List<Integer> ignored = new ArrayList<>();
    double[] volts = new double[c.electrodes().size()];
    for (Terminal t : c.electrodes()) {
      int[] parts =
          assembly.parts().stream()
              .filter(p -> t.parts().contains(p.name()))
              .mapToInt(Part::index)
              .toArray();
      assertThat(parts).as(t.name()).isNotEmpty();
      volts[electrodes.size()] = t.voltage_V();
      // With an earth plane, earthed bodies stand on it; without, an ambient field finds them free.
      boolean free = c.ambientAlongZ_V_per_m() != 0 && !c.earthPlane();
      Electrode.Kind kind =
          free
              ? Electrode.Kind.FLOATING
              : t.voltage_V() == 0 ? Electrode.Kind.EARTH : Electrode.Kind.LIVE;
      electrodes.add(new Electrode(t.name(), parts, kind));
    }
    double[] ambient =
        c.ambientAlongZ_V_per_m() == 0 ? null : new double[] {0, 0, c.ambientAlongZ_V_per_m()};
    return new FieldCase(
        electrodes,
        ignored,
        new Surroundings(
            "air",
            101_325,
            293.15,
            Double.NaN,
            Double.NaN,
            c.earthPlane() ? new Surroundings.EarthPlane(2, 0) : null,
            ambient),
        new EdgesAsMade(3e-4, Map.of()),
        List.of(new Duty("test", volts, new double[volts.length])),
        FIXED);
  }
}
