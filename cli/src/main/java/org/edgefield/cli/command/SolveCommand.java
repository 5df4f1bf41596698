package org.edgefield.cli.command;

import java.util.concurrent.Callable;
import org.edgefield.cli.console.Console;
import org.edgefield.cli.console.ProgressLine;
import org.edgefield.cli.output.OutputFolder;
import org.edgefield.cli.pipeline.CaseRun;
import org.edgefield.field.bem.solve.SolveSettings;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;

/** {@code edgefield solve}: the field by boundary elements. */
@Command(
    name = "solve",
    header = {
      "The field solved by boundary elements, to a stated accuracy.",
      "The mesh is refined until the peak of every electrode and duty is as accurate as asked.",
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
  private final Console console;

  @Mixin CommonOptions common;
  @Mixin CaseOptions options;
  @Mixin SolveOptions solve;

  SolveCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() {
    SolveSettings settings = solve.settings();
    OutputFolder folder = options.folder();
    try (ProgressLine progress = new ProgressLine(console, common.quiet);
        CaseRun run = CaseRun.open(options.caseFile, progress)) {
      run.solve(settings);
      progress.clear();
      return CaseOptions.finish(run, folder, common, console);
    }
  }
}
