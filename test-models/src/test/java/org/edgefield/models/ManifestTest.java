package org.edgefield.models;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.assertj.core.api.SoftAssertions;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.step.ReadLimits;
import org.edgefield.importer.step.StepReader;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Every committed model is read, and is what the manifest says. */
class ManifestTest {
  /** The importer's box is free to be wider than the body by this share of its size. */
  private static final double BOX_SLACK = 1e-3;

  /**
   * Finds missing, doubled and shrunken bodies; the importer integrates with a fixed order, which
   * is up to 1 % off on spheroids as surfaces of revolution.
   */
  private static final double VOLUME_TOLERANCE = 0.01;

  /** A share of the models that stays quick and still meets every group. */
  private static final int STRIDE = 5;

  private record Line(String file, String unit, int bodies, double[] box_mm, double volume_mm3) {
    @Override
    public String toString() {
      return file;
    }
  }

  static List<Line> lines() throws IOException {
    try (Stream<String> text = Files.lines(Path.of("MANIFEST.csv"))) {
      return text.skip(1).map(ManifestTest::line).toList();
    }
  }

  private static Line line(String text) {
    String[] f = text.split(",", -1);
    double[] box = new double[6];
    for (int i = 0; i < 6; i++) {
      box[i] = Double.parseDouble(f[5 + i]);
    }
    return new Line(f[0], f[3], Integer.parseInt(f[4]), box, Double.parseDouble(f[11]));
  }

  static List<Line> some() throws IOException {
    List<Line> all = lines();
    return IntStream.range(0, all.size()).filter(i -> i % STRIDE == 0).mapToObj(all::get).toList();
  }

  @ParameterizedTest
  @MethodSource("some")
  void modelIsAsListed(Line line) {
    check(line);
  }

  @Tag("slow")
  @ParameterizedTest
  @MethodSource("lines")
  void everyModelIsAsListed(Line line) {
    check(line);
  }

  private static void check(Line line) {
    Path file = Path.of("step", line.file());
    try (Assembly model = StepReader.read(file, ReadLimits.defaults(), Progress.NONE)) {
      assertThat(model.parts()).hasSize(line.bodies());
      assertThat(model.source().unit().toUpperCase(Locale.ROOT)).isEqualTo(line.unit());
      double volume = model.parts().stream().mapToDouble(Part::volume_m3).sum() * 1e9;
      assertThat(volume / line.volume_mm3()).isCloseTo(1, within(VOLUME_TOLERANCE));
      checkBox(model.parts(), line.box_mm());
    }
  }

  private static void checkBox(List<Part> parts, double[] expected_mm) {
    double size = 0;
    for (int i = 0; i < 3; i++) {
      size = Math.max(size, expected_mm[i + 3] - expected_mm[i]);
    }
    SoftAssertions soft = new SoftAssertions();
    for (int i = 0; i < 6; i++) {
      int axis = i;
      var values = parts.stream().mapToDouble(p -> p.bounds_m()[axis] * 1e3);
      double bound = i < 3 ? values.min().orElseThrow() : values.max().orElseThrow();
      soft.assertThat(bound).as("bound %d", i).isCloseTo(expected_mm[i], within(BOX_SLACK * size));
    }
    soft.assertAll();
  }

  @Test
  void everyModelIsListed() throws IOException {
    List<String> listed = lines().stream().map(Line::file).sorted().toList();
    try (Stream<Path> files = Files.list(Path.of("step"))) {
      assertThat(files.map(f -> f.getFileName().toString()).sorted().toList()).isEqualTo(listed);
    }
  }
}
