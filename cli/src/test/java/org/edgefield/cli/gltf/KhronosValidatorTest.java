package org.edgefield.cli.gltf;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;

/**
 * The Khronos glTF validator on files that use everything the writer can do. Needs node and npm;
 * says so and skips where they, or the package, are not to be had.
 */
final class KhronosValidatorTest {
  private static final Path MODULES = Path.of("target", "validator");
  private static final Path VIEWERS = Path.of("viewers");

  @Test
  void noErrorsWarningsInfosOrHints() throws IOException, InterruptedException {
    boolean node = run(List.of("node", "--version")).code() == 0;
    assume(node, "there is no node here");
    Files.createDirectories(MODULES);
    if (!Files.exists(MODULES.resolve("node_modules/gltf-validator/package.json"))) {
      Files.copy(
          VIEWERS.resolve("package.json"),
          MODULES.resolve("package.json"),
          StandardCopyOption.REPLACE_EXISTING);
      Output npm =
          run(
              List.of(
                  "npm",
                  "install",
                  "--prefix",
                  MODULES.toString(),
                  "--omit=optional",
                  "--no-package-lock",
                  "--no-audit",
                  "--no-fund"));
      assume(npm.code() == 0, "npm could not install the validator: " + npm.text());
    }
    List<String> command = new ArrayList<>();
    command.add("node");
    command.add(VIEWERS.resolve("validate.mjs").toString());
    command.add(MODULES.toString());
    Path folder = Files.createDirectories(Path.of("target", "samples"));
    for (Map.Entry<String, byte[]> sample : Samples.all().entrySet()) {
      Path file = folder.resolve(sample.getKey() + ".glb");
      Files.write(file, sample.getValue());
      command.add(file.toString());
    }
    Output report = run(command);
    assertThat(report.text()).contains("0 errors 0 warnings 0 infos 0 hints");
    assertThat(report.code()).as(report.text()).isZero();
  }

  private static void assume(boolean holds, String why) {
    if (!holds) {
      System.out.println("SKIPPED, heatmaps were not validated: " + why);
    }
    Assumptions.assumeTrue(holds, why);
  }

  private record Output(int code, String text) {}

  private static Output run(List<String> command) throws IOException, InterruptedException {
    Path log = Files.createTempFile("edgefield", ".log");
    try {
      Process process =
          new ProcessBuilder(command)
              .redirectErrorStream(true)
              .redirectOutput(log.toFile())
              .start();
      boolean ended = process.waitFor(120, TimeUnit.SECONDS);
      if (!ended) {
        process.destroyForcibly();
      }
      return new Output(ended ? process.exitValue() : -1, Files.readString(log));
    } catch (IOException e) {
      return new Output(-1, String.valueOf(e.getMessage()));
    } finally {
      Files.deleteIfExists(log);
    }
  }
}
