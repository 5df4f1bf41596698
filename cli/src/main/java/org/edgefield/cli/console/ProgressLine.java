package org.edgefield.cli.console;

import org.edgefield.importer.Progress;

/**
 * Shows progress on the message stream: one line drawn over on a terminal, a line now and then
 * elsewhere, nothing when quiet. Work shorter than two seconds shows nothing.
 */
public final class ProgressLine implements Progress, AutoCloseable {
  private static final double SILENT_SECONDS = 2;
  private static final double TERMINAL_SECONDS = 0.1;
  private static final double LOG_SECONDS = 10;

  private final Console console;
  private final boolean quiet;
  private final long begin = System.nanoTime();
  private double shown = Double.NEGATIVE_INFINITY;
  private String phase = "";
  private boolean drawn;

  /** Progress to a console. */
  public ProgressLine(Console console, boolean quiet) {
    this.console = console;
    this.quiet = quiet;
  }

  @Override
  public synchronized void report(String nowPhase, double fraction, String detail) {
    double seconds = (System.nanoTime() - begin) * 1e-9;
    if (quiet || seconds < SILENT_SECONDS) {
      return;
    }
    boolean terminal = console.animation();
    boolean fresh = !nowPhase.equals(phase) || detail.contains("done");
    if (!fresh && seconds - shown < (terminal ? TERMINAL_SECONDS : LOG_SECONDS)) {
      return;
    }
    shown = seconds;
    phase = nowPhase;
    StringBuilder text = new StringBuilder(nowPhase);
    if (!Double.isNaN(fraction)) {
      text.append(' ').append(Math.round(100 * fraction)).append(" %");
    }
    if (!detail.isEmpty()) {
      text.append(": ").append(detail);
    }
    String line = text.toString();
    if (terminal) {
      int room = console.width() - 1;
      console
          .err()
          .print("\r" + (line.length() > room ? line.substring(0, room) : line) + "\u001b[K");
      console.err().flush();
      drawn = true;
    } else {
      console.err().println(line);
    }
  }

  @Override
  public void close() {
    clear();
  }

  /** Wipes the line, so that results can be printed. */
  public synchronized void clear() {
    if (drawn) {
      console.err().print("\r\u001b[K");
      console.err().flush();
      drawn = false;
    }
  }
}
