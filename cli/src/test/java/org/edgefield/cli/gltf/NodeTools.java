package org.edgefield.cli.gltf;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Assumptions;

/**
 * Runs the scripts of {@code cli/viewers}; tests skip, and say so, where their needs are not met.
 */
final class NodeTools {
  /** Holds {@code node_modules}. */
  static final Path MODULES = Path.of("target", "viewer-modules");

  private static final Path SCRIPTS = Path.of("viewers");
  private static final int LIMIT_S = 180;

  private NodeTools() {}

  /**
   * Output of a command.
   *
   * @param code exit code, -1 where it did not start or did not end in time
   * @param text stdout and stderr
   */
  record Output(int code, String text) {}

  /** Sees that node and the packages are there, once per build. */
  static synchronized void need() throws IOException, InterruptedException {
    need(run(List.of("node", "--version")).code() == 0, "there is no node here");
    Files.createDirectories(MODULES);
    if (!Files.exists(MODULES.resolve("complete"))) {
      Files.copy(
          SCRIPTS.resolve("package.json"),
          MODULES.resolve("package.json"),
          StandardCopyOption.REPLACE_EXISTING);
      Output npm =
          run(
              List.of(
                  "npm",
                  "install",
                  "--prefix",
                  MODULES.toString(),
                  "--no-package-lock",
                  "--no-audit",
                  "--no-fund"));
      need(npm.code() == 0, "npm could not install the packages: " + npm.text());
      Files.createFile(MODULES.resolve("complete"));
    }
  }

  /** Skips the test, with the reason on the console, unless something holds. */
  static void need(boolean holds, String why) {
    if (!holds) {
      System.out.println("SKIPPED, heatmaps were not checked: " + why);
    }
    Assumptions.assumeTrue(holds, why);
  }

  /** Path of a script. */
  static String script(String name) {
    return SCRIPTS.resolve(name).toString();
  }

  /** Runs a command to its end. */
  static Output run(List<String> command) throws IOException, InterruptedException {
    Path log = Files.createTempFile("edgefield", ".log");
    try {
      Process process =
          new ProcessBuilder(command)
              .redirectErrorStream(true)
              .redirectOutput(log.toFile())
              .start();
      boolean ended = process.waitFor(LIMIT_S, TimeUnit.SECONDS);
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
