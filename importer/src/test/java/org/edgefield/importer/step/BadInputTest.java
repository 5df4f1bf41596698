package org.edgefield.importer.step;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Random;
import java.util.stream.Stream;
import org.edgefield.importer.ModelException;
import org.edgefield.importer.Progress;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * What bad files get: one line that names the file and a cure, in good time, and nothing left over.
 */
class BadInputTest {
  private static final ReadLimits LIMITS = ReadLimits.defaults().withTime(Duration.ofSeconds(20));

  @TempDir Path folder;

  private void refused(Path file, String... words) {
    assertThatThrownBy(() -> StepReader.read(file, LIMITS, Progress.NONE).close())
        .isInstanceOf(ModelException.class)
        .satisfies(
            e -> {
              assertThat(e.getMessage().lines().count()).isEqualTo(1);
              assertThat(e.getMessage()).startsWith(file + ": ");
              for (String word : words) {
                assertThat(e.getMessage()).contains(word);
              }
            });
  }

  private Path file(String name, String text) throws IOException {
    return Files.writeString(folder.resolve(name), text, StandardCharsets.ISO_8859_1);
  }

  private static String model(String name) throws IOException {
    return Files.readString(Folders.models().resolve(name), StandardCharsets.ISO_8859_1);
  }

  @Test
  void missing() {
    refused(folder.resolve("nothing.step"), "no such file");
  }

  @Test
  void folderInsteadOfFile() {
    refused(folder);
  }

  @Test
  void empty() throws IOException {
    refused(file("empty.step", ""), "export the model again");
  }

  @Test
  void proseText() throws IOException {
    refused(file("prose.step", "This is a letter, not a model.\n"), "export the model again");
  }

  @Test
  void randomBytes() throws IOException {
    byte[] bytes = new byte[20_000];
    new Random(1).nextBytes(bytes);
    refused(Files.write(folder.resolve("random.step"), bytes), "export the model again");
  }

  @Test
  void truncated() throws IOException {
    String text = model("cube-100.step");
    refused(file("cut.step", text.substring(0, text.length() / 2)), "export the model again");
  }

  @Test
  void headerWithoutBodies() throws IOException {
    String text = model("cube-100.step");
    refused(
        file(
            "bare.step",
            text.substring(0, text.indexOf("DATA;") + 5) + "\nENDSEC;\nEND-ISO-10303-21;\n"));
  }

  @Test
  void danglingReferences() throws IOException {
    refused(
        file(
            "dangling.step",
            model("cube-100.step")
                .replace("MANIFOLD_SOLID_BREP('',#", "MANIFOLD_SOLID_BREP('',#9")));
  }

  @Test
  void openShell() throws IOException {
    // A cube with one face less.
    String text = model("cube-100.step");
    int shell = text.indexOf("CLOSED_SHELL('',(");
    int comma = text.indexOf(',', shell + 17);
    refused(file("open.step", text.substring(0, shell + 17) + text.substring(comma + 1)));
  }

  @Test
  void absurdNumbers() throws IOException {
    refused(file("absurd.step", model("sphere-r50.step").replace(",50.)", ",5.E+307)")));
  }

  @Test
  void nothingIsLeftBehind() throws IOException {
    Path temporary = Path.of(System.getProperty("java.io.tmpdir"));
    long before = ours(temporary);
    truncated();
    randomBytes();
    assertThat(ours(temporary)).isLessThanOrEqualTo(before);
    try (Stream<Path> here = Files.list(Path.of(""))) {
      assertThat(here.map(p -> p.getFileName().toString()))
          .noneMatch(n -> n.startsWith("core") || n.startsWith("hs_err"));
    }
  }

  private static long ours(Path folder) throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      return files.filter(p -> p.getFileName().toString().startsWith("edgefield")).count();
    }
  }
}
