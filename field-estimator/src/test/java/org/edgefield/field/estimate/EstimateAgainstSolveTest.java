package org.edgefield.field.estimate;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.function.Function;
import java.util.stream.Stream;
import org.edgefield.field.bem.solve.SolveException;
import org.edgefield.field.bem.solve.SolveSettings;
import org.edgefield.field.estimate.ComparedBody.Row;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.EdgesAsMade;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Surroundings;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.models.cases.FieldCases;
import org.edgefield.models.cases.ScreenCases;
import org.edgefield.models.cases.ValidationCase;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Solves every validation body and the demo and writes the estimate over the solve at each hot spot
 * into docs/estimate-vs-solve.md.
 */
@Tag("slow")
class EstimateAgainstSolveTest {
  private static final double ACCURACY = 0.02;
  private static final SolveSettings BODY = new SolveSettings(ACCURACY, 20, 4L << 30, 2);
  private static final SolveSettings DEMO = new SolveSettings(ACCURACY, 60, 5L << 30, 2);

  /** Places that a solve claims to know less well than this are shown, but not counted. */
  private static final double KNOWN = 0.1;

  private final List<Row> rows = new ArrayList<>();
  private final List<String> notSolved = new ArrayList<>();

  @Test
  void estimateOverSolveAtEveryHotSpot() {
    Map<String, ValidationCase> bodies = new LinkedHashMap<>();
    Stream.concat(FieldCases.all().stream(), ScreenCases.all().stream())
        .forEach(c -> bodies.putIfAbsent(body(c), c));
    bodies.forEach((name, c) -> compare(name, c.model(), a -> ScreenedModel.fieldCase(a, c), BODY));
    for (String alone :
        List.of(
            "cube-100",
            "cube-100-rounded-0.1",
            "disc-rounded",
            "disc-rim-r4",
            "l-bracket",
            "pear",
            "wedge-60-r2",
            "wedge-120-r6")) {
      compare(alone, alone + ".step", EstimateAgainstSolveTest::alone, BODY);
    }
    compare("demo", "demo-compartment.step", EstimateAgainstSolveTest::demo, DEMO);
    List<Row> known = rows.stream().filter(r -> r.claim() <= KNOWN).toList();
    List<Row> rounded = known.stream().filter(Row::roundedEdge).toList();
    write(known, rounded);
    assertThat(rounded).hasSizeGreaterThan(10);
    assertThat(rounded).allSatisfy(r -> assertThat(r.ratio()).as(r.text()).isBetween(0.95, 2.0));
  }

  private static String body(ValidationCase c) {
    return c.name().substring(0, c.name().indexOf(':'));
  }

  private void compare(
      String name,
      String model,
      Function<KernelAssembly, FieldCase> fieldCase,
      SolveSettings settings) {
    try (KernelAssembly assembly = ScreenedModel.read(model)) {
      List<Row> found = ComparedBody.of(name, assembly, fieldCase.apply(assembly), settings).rows();
      rows.addAll(found);
      found.forEach(r -> System.out.println(r.text()));
    } catch (SolveException e) {
      notSolved.add(name + ": " + e.getMessage());
    }
  }

  private static FieldCase alone(KernelAssembly assembly) {
    int[] all = assembly.parts().stream().mapToInt(Part::index).toArray();
    return fieldCase(
        List.of(new Electrode("body", all, Electrode.Kind.LIVE)),
        List.of(),
        List.of(new Duty("duty", new double[] {1000}, new double[1])));
  }

  /** The demo as its case file has it, but for the power-frequency duty. */
  private static FieldCase demo(KernelAssembly assembly) {
    double peak = 4200 * Math.sqrt(2);
    double half = -0.5 * peak;
    double side = Math.sqrt(0.75) * peak;
    return fieldCase(
        List.of(
            new Electrode("phase 1", parts(assembly, "Busbar L1"), Electrode.Kind.LIVE),
            new Electrode(
                "phase 2", parts(assembly, "Busbar L2", "Shield ring"), Electrode.Kind.LIVE),
            new Electrode("phase 3", parts(assembly, "Busbar L3"), Electrode.Kind.LIVE),
            new Electrode("housing", parts(assembly, "Housing"), Electrode.Kind.EARTH)),
        java.util.Arrays.stream(parts(assembly, "Post insulator")).boxed().toList(),
        List.of(
            new Duty(
                "service", new double[] {peak, half, half, 0}, new double[] {0, -side, side, 0}),
            new Duty("impulse, phase 2", new double[] {0, 40e3, 0, 0}, new double[4]),
            new Duty("impulse, phase 3", new double[] {0, 0, 40e3, 0}, new double[4])));
  }

  private static int[] parts(KernelAssembly assembly, String... starts) {
    return assembly.parts().stream()
        .filter(p -> Stream.of(starts).anyMatch(p.name()::startsWith))
        .mapToInt(Part::index)
        .toArray();
  }

  private static FieldCase fieldCase(
      List<Electrode> electrodes, List<Integer> ignored, List<Duty> duties) {
    return new FieldCase(
        electrodes,
        ignored,
        new Surroundings("air", 101_325, 293.15, Double.NaN, Double.NaN, null, null),
        new EdgesAsMade(3e-4, Map.of()),
        duties,
        ScreenedModel.FIXED);
  }

  private void write(List<Row> known, List<Row> rounded) {
    List<String> out = new ArrayList<>();
    out.add("# Quick estimate over solve");
    out.add("");
    out.add(
        "Written by `mvn -Pvalidation -pl field-estimator -am verify"
            + " -Dtest=EstimateAgainstSolveTest -Dsurefire.failIfNoSpecifiedTests=false`; do not edit.");
    out.add(
        "Solves were asked for "
            + percent(ACCURACY)
            + "; 1 kV or 1 kV/m where no voltage is said, edges as made"
            + " 0.3 mm. A hot spot is a region above half of the duty's peak; of several of one name the"
            + " highest and those with the extreme ratios are listed.");
    out.add("");
    out.add(summary("hot spots that the solve knows to " + percent(KNOWN), known));
    out.add(summary("of these on rounded edges, corners and ends", rounded));
    out.add("");
    out.add(
        "| body | duty | hot spot | solved V/m | claim % | law of the estimate | estimate / solved |");
    out.add("|---|---|---|---|---|---|---|");
    rows.forEach(r -> out.add(r.text()));
    if (!notSolved.isEmpty()) {
      out.add("");
      out.add("Not solved:");
      notSolved.forEach(n -> out.add("- " + n));
    }
    try {
      Files.write(Path.of("docs", "estimate-vs-solve.md"), out);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static String summary(String what, List<Row> of) {
    double low = of.stream().mapToDouble(Row::ratio).min().orElse(Double.NaN);
    double high = of.stream().mapToDouble(Row::ratio).max().orElse(Double.NaN);
    long near = of.stream().filter(r -> r.ratio() >= 1 && r.ratio() <= 1.5).count();
    return String.format(
        Locale.ROOT,
        "- %d %s: ratio %.2f to %.2f, %d in 1.0 to 1.5",
        of.size(),
        what,
        low,
        high,
        near);
  }

  private static String percent(double x) {
    return String.format(Locale.ROOT, "%.0f %%", 100 * x);
  }
}
