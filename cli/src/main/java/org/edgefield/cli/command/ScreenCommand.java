package org.edgefield.cli.command;

import java.util.concurrent.Callable;
import org.edgefield.cli.console.Console;
import org.edgefield.cli.console.ProgressLine;
import org.edgefield.cli.output.OutputFolder;
import org.edgefield.cli.pipeline.CaseRun;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;

/** {@code edgefield screen}: the quick estimate. */
@Command(
    name = "screen",
    header = {
      "Quick estimate from curvature and gap: hot spots in seconds.",
      "",
      "Examples:",
      "  edgefield screen compartment.yaml",
      "  edgefield screen compartment.yaml --out results/rev-b",
      "  edgefield screen compartment.yaml --json -q > result.json",
      ""
    },
    footer = {"", "Exit codes: 0 nothing red; 1 red regions; 2 case file; 3 model."})
final class ScreenCommand implements Callable<Integer> {
  private final Console console;

  @Mixin CommonOptions common;
  @Mixin CaseOptions options;

  ScreenCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() {
    OutputFolder folder = options.folder();
    try (ProgressLine progress = new ProgressLine(console, common.quiet);
        CaseRun run = CaseRun.open(options.caseFile, progress)) {
      run.screen();
      progress.clear();
      return CaseOptions.finish(run, folder, common, console);
    }
  }
}
