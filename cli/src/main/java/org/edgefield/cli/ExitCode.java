package org.edgefield.cli;

/** What the process tells the shell. */
public final class ExitCode {
  /** Nothing red; the gate passed. */
  public static final int PASS = 0;

  /** Red regions, or a failed gate. */
  public static final int RED = 1;

  /** Command line, case file or output folder. */
  public static final int USAGE = 2;

  /** The model cannot be used. */
  public static final int MODEL = 3;

  /** Not converged, or out of memory or time. */
  public static final int BUDGET = 4;

  /** A fault of the tool itself. */
  public static final int FAULT = 70;

  private ExitCode() {}
}
