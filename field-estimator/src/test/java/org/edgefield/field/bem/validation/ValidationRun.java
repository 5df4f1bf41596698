package org.edgefield.field.bem.validation;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.feature.FeatureRecogniser;
import org.edgefield.field.bem.solve.FieldSolver;
import org.edgefield.field.bem.solve.SolveSettings;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.EdgesAsMade;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;
import org.edgefield.field.result.DutyField;
import org.edgefield.field.result.FieldResult;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.importer.mesh.MeshSettings;
import org.edgefield.importer.step.ReadLimits;
import org.edgefield.importer.step.StepReader;
import org.edgefield.models.cases.Quantity;
import org.edgefield.models.cases.Terminal;
import org.edgefield.models.cases.ValidationCase;

/**
 * One validation case through the whole road: STEP file, mesh, solve, quantity.
 *
 * @param nodes nodes of the last mesh
 * @param time_s wall time from reading the file on
 * @param computed value in SI units
 * @param claimed relative uncertainty that the solve claims
 * @param converged whether the solve says that the asked accuracy is met
 */
record ValidationRun(int nodes, double time_s, double computed, double claimed, boolean converged) {
  /** Heading of a table of {@link #row}s. */
  static final String HEADING =
      String.format(
          Locale.ROOT,
          "| %-58s | %7s | %6s | %11s | %11s | %8s | %8s |%n|%s|%s|%s|%s|%s|%s|%s|",
          "case",
          "nodes",
          "time s",
          "exact",
          "computed",
          "error %",
          "claim %",
          "-".repeat(60),
          "-".repeat(9),
          "-".repeat(8),
          "-".repeat(13),
          "-".repeat(13),
          "-".repeat(10),
          "-".repeat(10));

  static ValidationRun of(ValidationCase validation, double accuracy) {
    long begin = System.nanoTime();
    Path path = models().resolve(validation.model());
    try (KernelAssembly assembly = StepReader.read(path, ReadLimits.defaults(), Progress.NONE)) {
      Features features = FeatureRecogniser.of(assembly.geometry(), assembly.triangulation());
      FieldCase fieldCase = fieldCase(validation, assembly);
      FieldResult result =
          FieldSolver.solve(
              assembly,
              assembly.triangulation(),
              features,
              fieldCase,
              MeshSettings.defaults(),
              new SolveSettings(accuracy, 120, 4L << 30, 2),
              Progress.NONE);
      return new ValidationRun(
          result.nodes().count(),
          (System.nanoTime() - begin) * 1e-9,
          value(validation, assembly, fieldCase, result),
          result.errorEstimate(),
          result.converged());
    }
  }

  double error(ValidationCase validation) {
    return computed / validation.exact() - 1;
  }

  String row(ValidationCase validation) {
    return String.format(
        Locale.ROOT,
        "| %-58s | %7d | %6.1f | %11.5g | %11.5g | %8.3f | %8.3f |",
        validation.name(),
        nodes,
        time_s,
        validation.exact(),
        computed,
        100 * error(validation),
        100 * claimed);
  }

  private static FieldCase fieldCase(ValidationCase validation, Assembly assembly) {
    List<Electrode> electrodes = new ArrayList<>();
    double[] volts = new double[validation.electrodes().size()];
    for (Terminal terminal : validation.electrodes()) {
      volts[electrodes.size()] = terminal.voltage_V();
      int[] parts =
          assembly.parts().stream()
              .filter(p -> terminal.parts().stream().anyMatch(n -> matches(n, p.name())))
              .mapToInt(Part::index)
              .toArray();
      Electrode.Kind kind = terminal.voltage_V() == 0 ? Electrode.Kind.EARTH : Electrode.Kind.LIVE;
      electrodes.add(new Electrode(terminal.name(), parts, kind));
    }
    double ambient = validation.ambientAlongZ_V_per_m();
    return new FieldCase(
        electrodes,
        List.of(),
        new Surroundings(
            "air",
            101_325,
            293.15,
            Double.NaN,
            Double.NaN,
            validation.earthPlane() ? new Surroundings.EarthPlane(2, 0) : null,
            ambient == 0 ? null : new double[] {0, 0, ambient}),
        new EdgesAsMade(3e-4, Map.of()),
        List.of(new Duty("duty", volts, new double[volts.length])),
        new Permitted(Permitted.Criterion.FIXED, 3e6, 1, 0.8, 1));
  }

  static boolean matches(String pattern, String name) {
    return pattern.endsWith("*")
        ? name.startsWith(pattern.substring(0, pattern.length() - 1))
        : name.equals(pattern);
  }

  private static double value(
      ValidationCase validation, Assembly assembly, FieldCase fieldCase, FieldResult result) {
    Quantity quantity = validation.quantity();
    if (quantity instanceof Quantity.Capacitance c) {
      int n = fieldCase.electrodes().size();
      return result.capacitance_F()[index(fieldCase, c.row()) * n + index(fieldCase, c.column())];
    }
    DutyField field = result.duties().get(0).field();
    if (quantity instanceof Quantity.PeakField p) {
      int electrode = index(fieldCase, p.electrode());
      int[] electrodeOfPart = fieldCase.electrodeOfPart(assembly.parts().size());
      double most = 0;
      for (int c = 0; c < result.mesh().triangles().length; c++) {
        int part = assembly.geometry().facePart(result.mesh().triangleFace()[c / 3]);
        if (electrodeOfPart[part] == electrode) {
          most = Math.max(most, field.field_V_per_m()[result.nodes().cornerNode()[c]]);
        }
      }
      return most;
    }
    Quantity.FieldAt at = (Quantity.FieldAt) quantity;
    return nearest(result, field, at);
  }

  private static double nearest(FieldResult result, DutyField field, Quantity.FieldAt at) {
    double least = Double.POSITIVE_INFINITY;
    double value = Double.NaN;
    double[] x = result.mesh().xyz();
    for (int i = 0; i < result.nodes().count(); i++) {
      int v = 3 * result.nodes().nodeVertex()[i];
      double dx = x[v] - at.x_m();
      double dy = x[v + 1] - at.y_m();
      double dz = x[v + 2] - at.z_m();
      double d = dx * dx + dy * dy + dz * dz;
      if (d < least) {
        least = d;
        value = field.field_V_per_m()[i];
      }
    }
    return value;
  }

  private static int index(FieldCase fieldCase, String electrode) {
    for (int e = 0; e < fieldCase.electrodes().size(); e++) {
      if (fieldCase.electrodes().get(e).name().equals(electrode)) {
        return e;
      }
    }
    throw new IllegalArgumentException(electrode);
  }

  static Path models() {
    Path folder = Path.of("").toAbsolutePath();
    while (!Files.isDirectory(folder.resolve("test-models/step"))) {
      folder = folder.getParent();
    }
    return folder.resolve("test-models/step");
  }
}
