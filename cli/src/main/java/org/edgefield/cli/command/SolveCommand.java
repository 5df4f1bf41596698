package org.edgefield.cli.command;

import java.util.concurrent.Callable;
import org.edgefield.cli.UserException;
import org.edgefield.cli.console.Console;
import org.edgefield.cli.console.ProgressLine;
import org.edgefield.cli.output.OutputFolder;
import org.edgefield.cli.pipeline.CaseRun;
import org.edgefield.field.bem.solve.SolveSettings;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** {@code edgefield solve}: the field by boundary elements. */
@Command(
    name = "solve",
    header = {
      "The true field on the conductors, solved by boundary elements and refined until the peak of",
      "every electrode and duty is as accurate as asked.",
      "",
      "Examples:",
      "  edgefield solve compartment.yaml",
      "  edgefield solve compartment.yaml --accuracy 0.3%% --time 600",
      ""
    },
    footer = {
      "",
      "Exit codes: 0 nothing red; 1 red regions; 2 case file; 3 model; 4 accuracy not reached",
      "(the best result is written with its uncertainty)."
    })
final class SolveCommand implements Callable<Integer> {
  private static final double SHARE_OF_HEAP = 0.7;

  private final Console console;

  @Mixin CommonOptions common;
  @Mixin CaseOptions options;

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

  SolveCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() {
    SolveSettings settings = settings();
    OutputFolder folder = options.folder();
    try (ProgressLine progress = new ProgressLine(console, common.quiet);
        CaseRun run = CaseRun.open(options.caseFile, progress)) {
      run.solve(settings);
      progress.clear();
      return CaseOptions.finish(run, folder, common, console);
    }
  }

  private SolveSettings settings() {
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
