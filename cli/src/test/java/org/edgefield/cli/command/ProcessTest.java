package org.edgefield.cli.command;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.function.Predicate;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The program as a process of its own: stopped by the user, with a full disk, into a pipe. */
class ProcessTest {
  private static final Path DEMO = Path.of("../test-models/demo/compartment.yaml");
  private static final List<String> SET =
      List.of("result.json", "heatmap.glb", "summary.md", "gate.json", "junit.xml");

  @TempDir Path folder;
  private Path temporary;
  private Path out;

  @BeforeEach
  void folders() throws IOException {
    temporary = Files.createDirectory(folder.resolve("tmp"));
    out = folder.resolve("out");
  }

  private List<String> program(String... args) {
    List<String> command = new ArrayList<>();
    command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
    command.add("-Djava.io.tmpdir=" + temporary);
    command.add("-XX:TieredStopAtLevel=1");
    command.add("-cp");
    command.add(System.getProperty("java.class.path"));
    command.add("org.edgefield.cli.Main");
    command.addAll(List.of(args));
    return command;
  }

  private Process start(List<String> command) throws IOException {
    return new ProcessBuilder(command)
        .redirectOutput(folder.resolve("stdout").toFile())
        .redirectError(folder.resolve("stderr").toFile())
        .start();
  }

  private int run(List<String> command) throws Exception {
    Process process = start(command);
    assertThat(process.waitFor(120, TimeUnit.SECONDS)).isTrue();
    return process.exitValue();
  }

  private String text(String name) throws IOException {
    return Files.readString(folder.resolve(name));
  }

  // Sends what Ctrl-C sends as soon as the program is where it is wanted, and waits for its end.
  private int interrupt(Predicate<Process> there, String... args) throws Exception {
    // A parent may have told its children to ignore the signal; a terminal does not.
    List<String> command = new ArrayList<>(List.of("env", "--default-signal=INT"));
    command.addAll(program(args));
    Process process = start(command);
    long end = System.nanoTime() + TimeUnit.SECONDS.toNanos(60);
    while (!there.test(process)) {
      assertThat(process.isAlive()).as("ended too early: %s", text("stderr")).isTrue();
      assertThat(System.nanoTime()).isLessThan(end);
      Thread.sleep(2);
    }
    List<ProcessHandle> children = process.descendants().toList();
    new ProcessBuilder("kill", "-INT", Long.toString(process.pid())).start().waitFor();
    assertThat(process.waitFor(20, TimeUnit.SECONDS)).as("ends within 20 s").isTrue();
    for (ProcessHandle child : children) {
      child.onExit().get(5, TimeUnit.SECONDS);
    }
    assertThat(text("stdout")).isEmpty();
    assertThat(text("stderr")).doesNotContain("Exception", "\tat ");
    return process.exitValue();
  }

  private static List<Path> list(Path at) {
    try (Stream<Path> inside = Files.list(at)) {
      return inside.toList();
    } catch (IOException e) {
      throw new AssertionError(e);
    }
  }

  @Test
  void interruptedWhileReadingLeavesNoFileAndNoChild() throws Exception {
    int code =
        interrupt(
            p -> p.children().findAny().isPresent(),
            "screen",
            DEMO.toString(),
            "--out",
            out.toString());
    assertThat(code).isEqualTo(130);
    assertThat(out).doesNotExist();
    assertThat(list(temporary)).isEmpty();
  }

  @Test
  void interruptedSolveLeavesNothing() throws Exception {
    boolean[] read = {false};
    int code =
        interrupt(
            p -> {
              boolean child = p.children().findAny().isPresent();
              read[0] |= child;
              return read[0] && !child;
            },
            "solve",
            DEMO.toString(),
            "--out",
            out.toString());
    assertThat(code).isEqualTo(130);
    assertThat(out).doesNotExist();
    assertThat(list(temporary)).isEmpty();
    assertThat(list(folder)).noneMatch(f -> f.getFileName().toString().startsWith("."));
  }

  @Test
  void interruptedWhileWritingKeepsOneWholeSet() throws Exception {
    Files.createDirectory(out);
    for (String name : SET) {
      Files.writeString(out.resolve(name), "old");
    }
    Files.writeString(out.resolve("notes.txt"), "mine");
    interrupt(
        p -> list(out).size() > SET.size() + 1,
        "screen",
        DEMO.toString(),
        "--out",
        out.toString(),
        "-q");
    assertThat(list(out)).noneMatch(f -> f.getFileName().toString().startsWith("."));
    assertThat(out.resolve("notes.txt")).hasContent("mine");
    boolean old = Files.readString(out.resolve("result.json")).equals("old");
    if (old) {
      SET.forEach(name -> assertThat(out.resolve(name)).hasContent("old"));
    } else {
      assertThat(list(out)).hasSize(4);
    }
  }

  @Test
  void fileThatMayNotGrowKeepsTheEarlierResult() throws Exception {
    Files.createDirectory(out);
    Files.writeString(out.resolve("result.json"), "old");
    List<String> command =
        new ArrayList<>(List.of("bash", "-c", "ulimit -f 1000; exec \"$@\"", "_"));
    command.addAll(program("screen", DEMO.toString(), "--out", out.toString()));
    assertThat(run(command)).as(text("stderr")).isEqualTo(2);
    assertThat(text("stderr")).contains("cannot write " + out, "nothing was kept");
    assertThat(list(out)).hasSize(1);
    assertThat(out.resolve("result.json")).hasContent("old");
  }

  @Test
  void fullDiskIsOneLineAndLeavesNothing() throws Exception {
    Files.createDirectory(out);
    Process mount =
        new ProcessBuilder("mount", "-t", "tmpfs", "-o", "size=600k", "edgefield-test", out + "")
            .redirectErrorStream(true)
            .start();
    assumeTrue(mount.waitFor() == 0, "a small file system can be mounted");
    try {
      assertThat(run(program("screen", DEMO.toString(), "--out", out.toString()))).isEqualTo(2);
      assertThat(text("stderr").lines().filter(l -> l.startsWith("edgefield: cannot write")))
          .singleElement()
          .asString()
          .contains("No space left", "nothing was kept");
      assertThat(list(out)).isEmpty();
    } finally {
      new ProcessBuilder("umount", out.toString()).start().waitFor();
    }
  }

  @Test
  void readOnlyDiskIsRefusedBeforeTheWork() throws Exception {
    Files.createDirectory(out);
    Process mount =
        new ProcessBuilder("mount", "-t", "tmpfs", "-o", "ro,size=600k", "edgefield-test", out + "")
            .redirectErrorStream(true)
            .start();
    assumeTrue(mount.waitFor() == 0, "a small file system can be mounted");
    try {
      assertThat(run(program("screen", DEMO.toString(), "--out", out.resolve("new").toString())))
          .isEqualTo(2);
      assertThat(text("stderr").lines()).hasSize(1);
      assertThat(text("stderr")).contains("cannot be written", "--out");
    } finally {
      new ProcessBuilder("umount", out.toString()).start().waitFor();
    }
  }
}
