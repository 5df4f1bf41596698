package org.edgefield.cli.console;

import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;

/**
 * The terminal as the commands see it: results to {@code out}, messages to {@code err}, both UTF-8.
 *
 * @param out results
 * @param err messages
 * @param outTerminal whether results go to a terminal
 * @param errTerminal whether messages go to a terminal
 * @param width columns, at least 40; 80 off a terminal unless COLUMNS says otherwise
 * @param environment environment variables
 */
public record Console(
    PrintStream out,
    PrintStream err,
    boolean outTerminal,
    boolean errTerminal,
    int width,
    Map<String, String> environment) {
  private static final int DEFAULT_WIDTH = 80;
  private static final int LEAST_WIDTH = 40;

  /** The process's own streams. */
  public static Console ofProcess() {
    Map<String, String> environment = System.getenv();
    return new Console(
        new PrintStream(new FileOutputStream(FileDescriptor.out), false, StandardCharsets.UTF_8),
        new PrintStream(new FileOutputStream(FileDescriptor.err), true, StandardCharsets.UTF_8),
        isTerminal(1),
        isTerminal(2),
        widthFrom(environment.get("COLUMNS")),
        environment);
  }

  /** Width from the COLUMNS variable, 80 where it says nothing usable. */
  public static int widthFrom(String columns) {
    if (columns == null || !columns.matches("[0-9]{1,5}")) {
      return DEFAULT_WIDTH;
    }
    int width = Integer.parseInt(columns);
    return width == 0 ? DEFAULT_WIDTH : Math.max(LEAST_WIDTH, width);
  }

  /** Whether results may carry colour: a terminal, and neither NO_COLOR nor TERM=dumb. */
  public boolean colour() {
    return outTerminal && plainEnvironment();
  }

  /** Whether a line of progress may be drawn over: a terminal that can. */
  public boolean animation() {
    return errTerminal && !"dumb".equals(environment.get("TERM"));
  }

  /** Whether an environment variable is set to something. */
  public boolean isSet(String variable) {
    String value = environment.get(variable);
    return value != null && !value.isEmpty();
  }

  private boolean plainEnvironment() {
    return !isSet("NO_COLOR") && !"dumb".equals(environment.get("TERM"));
  }

  // Java does not tell per stream. Linux does, through the name behind the descriptor; elsewhere
  // the
  // output stays plain.
  private static boolean isTerminal(int descriptor) {
    Path link = Path.of("/proc/self/fd/" + descriptor);
    if (Files.isSymbolicLink(link)) {
      try {
        String target = Files.readSymbolicLink(link).toString();
        return target.startsWith("/dev/pts/")
            || target.startsWith("/dev/tty")
            || target.equals("/dev/console");
      } catch (IOException e) {
        return false;
      }
    }
    return false;
  }
}
