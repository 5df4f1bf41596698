package org.edgefield.cli.command;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import org.edgefield.cli.ExitCode;
import org.edgefield.cli.console.Console;
import org.edgefield.cli.output.OutputFolder;
import org.edgefield.cli.pipeline.CaseRun;
import org.edgefield.cli.report.Report;
import org.edgefield.cli.report.ResultJson;
import org.edgefield.cli.report.Summary;
import org.edgefield.cli.report.TerminalTable;
import org.edgefield.cli.report.Verdict;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** What screen and solve have in common: case, output folder, and how a result is shown. */
final class CaseOptions {
  @Parameters(paramLabel = "CASE.yaml", description = "Case file, see: edgefield draft --help.")
  Path caseFile;

  @Option(
      names = "--out",
      paramLabel = "DIR",
      description =
          "Folder for heatmap.glb, result.json and summary.md; the case file's name without its"
              + " ending plus -result by default.")
  Path out;

  OutputFolder folder() {
    Path target = out;
    if (target == null) {
      String name = caseFile.getFileName().toString();
      int dot = name.lastIndexOf('.');
      target = caseFile.resolveSibling((dot > 0 ? name.substring(0, dot) : name) + "-result");
    }
    OutputFolder folder = new OutputFolder(target);
    folder.check();
    return folder;
  }

  /** Writes the folder, shows the result and tells the exit code. */
  static int finish(CaseRun run, OutputFolder folder, CommonOptions common, Console console) {
    Report report = run.report();
    String json = ResultJson.text(report);
    run.addHeatmap(folder);
    folder.add("summary.md", o -> o.write(Summary.text(report).getBytes(StandardCharsets.UTF_8)));
    folder.add("result.json", o -> o.write(json.getBytes(StandardCharsets.UTF_8)));
    folder.write();
    if (common.json) {
      console.out().print(json);
    } else {
      console.out().print(TerminalTable.text(report, console));
      if (!common.quiet) {
        console.out().println("written: " + folder.target());
      }
    }
    if (!common.quiet) {
      report.warnings().forEach(w -> console.err().println("edgefield: warning: " + w));
    }
    if (!report.converged()) {
      return ExitCode.BUDGET;
    }
    return report.verdict() == Verdict.RED ? ExitCode.RED : ExitCode.PASS;
  }
}
