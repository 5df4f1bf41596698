package org.edgefield.cli.console;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import org.junit.jupiter.api.Test;

class ProgressLineTest {
  private static String shown(boolean terminal, boolean quiet) throws InterruptedException {
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    PrintStream print = new PrintStream(err, true, StandardCharsets.UTF_8);
    Console console = new Console(print, print, false, terminal, 40, Map.of());
    try (ProgressLine progress = new ProgressLine(console, quiet)) {
      progress.report("read", 0.1, "early");
      Thread.sleep(2100);
      progress.report("mesh", 0.5, "a name that is far longer than the line it has to fit in");
    }
    return err.toString(StandardCharsets.UTF_8);
  }

  @Test
  void pipeGetsPlainLines() throws InterruptedException {
    assertThat(shown(false, false))
        .isEqualTo("mesh 50 %: a name that is far longer than the line it has to fit in\n");
  }

  @Test
  void terminalGetsOneLineThatFitsAndIsWiped() throws InterruptedException {
    assertThat(shown(true, false))
        .isEqualTo("\rmesh 50 %: a name that is far longer th\u001b[K\r\u001b[K");
  }

  @Test
  void quietShowsNothing() throws InterruptedException {
    assertThat(shown(true, true)).isEmpty();
  }
}
