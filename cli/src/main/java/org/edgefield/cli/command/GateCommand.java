package org.edgefield.cli.command;

import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import org.edgefield.cli.ExitCode;
import org.edgefield.cli.UserException;
import org.edgefield.cli.casefile.units.Dimension;
import org.edgefield.cli.casefile.units.Quantities;
import org.edgefield.cli.casefile.units.QuantityException;
import org.edgefield.cli.console.Console;
import org.edgefield.cli.console.ProgressLine;
import org.edgefield.cli.gate.Gate;
import org.edgefield.cli.output.OutputFolder;
import org.edgefield.cli.output.WholeFile;
import org.edgefield.cli.pipeline.CaseRun;
import org.edgefield.cli.report.Report;
import org.edgefield.cli.report.ResultJson;
import org.edgefield.cli.report.Summary;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code edgefield gate}: compares with an accepted result. */
@Command(
    name = "gate",
    header = {
      "Screens or solves, then compares with an accepted result: no new or worse red region.",
      "",
      "Examples:",
      "  edgefield gate compartment.yaml --accepted accepted.json --accept",
      "                                        accept what is there now",
      "  edgefield gate compartment.yaml --accepted accepted.json",
      "                                        fail on new or worse red regions",
      "  edgefield gate compartment.yaml --accepted accepted.json --out gate-result",
      "                                        keep heatmap, result, gate.json, junit.xml",
      ""
    },
    footer = {"", "Exit codes: 0 gate passed; 1 gate failed; 2 case or accepted file; 3 model."})
final class GateCommand implements Callable<Integer> {
  private final Console console;

  @Mixin CommonOptions common;
  @Mixin SolveOptions solve;

  @Parameters(paramLabel = "CASE.yaml", description = "Case file, see: edgefield draft --help.")
  Path caseFile;

  @Option(
      names = "--accepted",
      required = true,
      paramLabel = "FILE",
      description = "The accepted result, as --accept wrote it; a result.json serves as well.")
  Path accepted;

  @Option(names = "--accept", description = "Accept the result: write it to the accepted file.")
  boolean accept;

  @Option(
      names = "--method",
      paramLabel = "METHOD",
      description = "screen or solve; that of the accepted result by default.")
  String method;

  @Option(
      names = "--tolerance",
      paramLabel = "LENGTH",
      defaultValue = "1 mm",
      description = "How far a hot spot may move and be the same; \"1 mm\" by default.")
  String tolerance;

  @Option(
      names = "--worse",
      paramLabel = "PERCENT",
      defaultValue = "2 %",
      description = "Rise of utilisation that counts as worse; \"2 %%\" by default.")
  String worse;

  @Option(
      names = "--out",
      paramLabel = "DIR",
      description =
          "Folder for heatmap.glb, result.json, summary.md, gate.json and junit.xml; none by"
              + " default.")
  Path out;

  GateCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() {
    double tolerance_m = quantity("--tolerance", tolerance, Dimension.LENGTH, 1);
    double worseBy = quantity("--worse", worse, Dimension.RATIO, 10);
    String chosen = chosenMethod();
    OutputFolder folder = null;
    if (out != null) {
      folder = new OutputFolder(out);
      folder.check();
    }
    try (ProgressLine progress = new ProgressLine(console, common.quiet);
        CaseRun run = CaseRun.open(caseFile, progress)) {
      if (chosen.equals("solve")) {
        run.solve(solve.settings());
      } else {
        run.screen();
      }
      progress.clear();
      return judge(run, folder, tolerance_m, worseBy);
    }
  }

  private int judge(CaseRun run, OutputFolder folder, double tolerance_m, double worseBy) {
    Report report = run.report();
    String json = ResultJson.text(report);
    Gate gate = new Gate(json);
    if (!common.quiet) {
      report.warnings().forEach(w -> console.err().println("edgefield: warning: " + w));
    }
    if (!report.converged()) {
      throw new UserException(
          ExitCode.BUDGET,
          "the asked accuracy was not reached, so nothing is "
              + (accept ? "accepted" : "compared")
              + ": give more --time or --memory, or ask for less --accuracy",
          null);
    }
    if (accept) {
      WholeFile.write(accepted, gate.acceptedText());
    }
    Gate.Outcome outcome = gate.compare(accepted, tolerance_m, worseBy);
    if (folder != null) {
      run.addHeatmap(folder);
      add(folder, "summary.md", Summary.text(report));
      add(folder, "gate.json", outcome.json());
      add(folder, "junit.xml", outcome.junitXml());
      add(folder, "result.json", json);
      folder.write();
    }
    if (common.json) {
      console.out().print(outcome.json());
    } else {
      outcome.print(console);
      if (accept && !common.quiet) {
        console.out().println("accepted: " + accepted);
      }
    }
    return outcome.passes() ? ExitCode.PASS : ExitCode.RED;
  }

  private static void add(OutputFolder folder, String name, String text) {
    folder.add(name, o -> o.write(text.getBytes(StandardCharsets.UTF_8)));
  }

  private String chosenMethod() {
    if (method != null) {
      if (!List.of("screen", "solve").contains(method)) {
        throw new UserException("--method " + method + ": screen or solve is wanted");
      }
      return method;
    }
    if (accept && !Files.exists(accepted)) {
      return "screen";
    }
    return Gate.method(accepted);
  }

  private static double quantity(String option, String text, Dimension dimension, double most) {
    try {
      double value = Quantities.parse(text, dimension);
      if (value >= 0 && value <= most) {
        return value;
      }
    } catch (QuantityException e) {
      throw new UserException(option + ": " + e.getMessage(), e);
    }
    throw new UserException(option + " " + text + " is out of range");
  }
}
