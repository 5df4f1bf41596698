package org.edgefield.cli.command;

import org.edgefield.cli.UserException;
import org.edgefield.field.bem.solve.SolveSettings;
import picocli.CommandLine.Option;

/** What a solve may spend and how accurate it must be. */
final class SolveOptions {
  private static final double SHARE_OF_HEAP = 0.7;

  @Option(
      names = "--accuracy",
      paramLabel = "PERCENT",
      defaultValue = "1%",
      description = "Relative accuracy of the peak fields; 1%% by default.")
  String accuracy;

  @Option(
      names = "--time",
      paramLabel = "SECONDS",
      defaultValue = "900",
      description = "Time to spend, seconds; 900 by default.")
  double time_s;

  @Option(
      names = "--memory",
      paramLabel = "GB",
      description = "Memory to spend, gigabytes; most of what Java may have by default.")
  Double memory_GB;

  @Option(
      names = "--threads",
      paramLabel = "N",
      description = "Threads; all processors by default. The result does not depend on it.")
  Integer threads;

  /** The settings, checked. */
  SolveSettings settings() {
    String text = accuracy.endsWith("%") ? accuracy.substring(0, accuracy.length() - 1) : "";
    double asked;
    try {
      asked = Double.parseDouble(text.trim()) / 100;
    } catch (NumberFormatException e) {
      throw new UserException("--accuracy " + accuracy + ": a percentage such as 1% is wanted", e);
    }
    if (!(asked >= 1e-4 && asked <= 0.2)) {
      throw new UserException("--accuracy " + accuracy + ": between 0.01% and 20% is possible");
    }
    if (!(time_s > 0)) {
      throw new UserException("--time " + time_s + ": seconds above 0 are wanted");
    }
    if (memory_GB != null && !(memory_GB > 0)) {
      throw new UserException("--memory " + memory_GB + ": gigabytes above 0 are wanted");
    }
    if (threads != null && threads < 1) {
      throw new UserException("--threads " + threads + ": at least 1 is wanted");
    }
    Runtime machine = Runtime.getRuntime();
    long memory =
        memory_GB == null ? (long) (SHARE_OF_HEAP * machine.maxMemory()) : (long) (memory_GB * 1e9);
    int crew = threads == null ? machine.availableProcessors() : threads;
    return new SolveSettings(asked, time_s, memory, crew);
  }
}
