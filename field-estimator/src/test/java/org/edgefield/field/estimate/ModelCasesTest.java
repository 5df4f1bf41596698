package org.edgefield.field.estimate;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Stream;
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
import org.edgefield.field.result.DutyField;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.MeshSettings;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.SurfaceMesher;
import org.edgefield.importer.step.ReadLimits;
import org.edgefield.importer.step.StepReader;
import org.edgefield.models.cases.FieldCases;
import org.edgefield.models.cases.Quantity;
import org.edgefield.models.cases.Terminal;
import org.edgefield.models.cases.ValidationCase;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The estimate from STEP to field, over the exact field, for every model with a known answer. */
@Tag("slow")
class ModelCasesTest {
  private static final List<String> REPORT = new ArrayList<>();

  static Stream<ValidationCase> cases() {
    return FieldCases.all().stream();
  }

  @AfterAll
  static void table() {
    System.out.println(String.join(System.lineSeparator(), REPORT));
  }

  @ParameterizedTest
  @MethodSource("cases")
  void withinTheRangeOfAScreen(ValidationCase c) {
    Path file = Path.of("..", "test-models", "step", c.model());
    ReadLimits limits = ReadLimits.defaults().withMeshAngle(Math.toRadians(8));
    try (var assembly = StepReader.read(file, limits, Progress.NONE)) {
      SurfaceMesh mesh = SurfaceMesher.mesh(assembly, MeshSettings.defaults(), Progress.NONE);
      double estimate = estimate(assembly, mesh, c);
      double ratio = estimate / c.exact();
      REPORT.add(String.format(Locale.ROOT, "%-46s estimate/exact %.3f", c.name(), ratio));
      // A small sphere beside a large one at the same voltage: the shelter is not in the law.
      double high = c.name().startsWith("pair-1-4-near") ? 1.7 : 1.5;
      assertThat(ratio).isBetween(0.95, high);
    }
  }

  private static double estimate(Assembly assembly, SurfaceMesh mesh, ValidationCase c) {
    Features features = FeatureRecogniser.of(assembly.geometry(), mesh);
    SurfaceNodes nodes = NodeBuilder.perFace(assembly.geometry(), mesh, features);
    FieldCase fieldCase = fieldCase(assembly, c);
    DutyField field =
        EstimateModel.build(assembly, mesh, nodes, features, fieldCase, Progress.NONE)
            .field(0, (k1, k2) -> 3e6);
    int[] part = new int[nodes.count()];
    for (int i = 0; i < mesh.triangles().length; i++) {
      part[nodes.cornerNode()[i]] = assembly.geometry().facePart(mesh.triangleFace()[i / 3]);
    }
    boolean peak = c.quantity() instanceof Quantity.PeakField;
    String electrode =
        peak
            ? ((Quantity.PeakField) c.quantity()).electrode()
            : ((Quantity.FieldAt) c.quantity()).electrode();
    double best = 0;
    double nearest = Double.POSITIVE_INFINITY;
    for (int n = 0; n < nodes.count(); n++) {
      if (!assembly.parts().get(part[n]).name().equals(electrode)) {
        continue;
      }
      double e = field.field_V_per_m()[n];
      if (peak) {
        best = Math.max(best, e);
      } else {
        Quantity.FieldAt at = (Quantity.FieldAt) c.quantity();
        int v = 3 * nodes.nodeVertex()[n];
        double dx = mesh.xyz()[v] - at.x_m();
        double dy = mesh.xyz()[v + 1] - at.y_m();
        double dz = mesh.xyz()[v + 2] - at.z_m();
        double d = dx * dx + dy * dy + dz * dz;
        if (d < nearest) {
          nearest = d;
          best = e;
        }
      }
    }
    return best;
  }

  private static FieldCase fieldCase(Assembly assembly, ValidationCase c) {
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
        new Permitted(Permitted.Criterion.FIXED, 3e6, 1, 0.8, 1));
  }
}
