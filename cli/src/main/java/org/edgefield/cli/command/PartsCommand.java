package org.edgefield.cli.command;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import org.edgefield.cli.ExitCode;
import org.edgefield.cli.console.Console;
import org.edgefield.cli.console.ProgressLine;
import org.edgefield.cli.console.Table;
import org.edgefield.cli.console.Wrap;
import org.edgefield.cli.pipeline.ModelLook;
import org.edgefield.cli.report.Human;
import org.edgefield.cli.report.PartLabels;
import org.edgefield.cli.report.PartsJson;
import org.edgefield.curvature.PartSummary;
import org.edgefield.importer.brep.Part;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code edgefield parts}: what is in a model. */
@Command(
    name = "parts",
    header = {
      "What is in a model: parts, sizes, sharp edges, smallest convex radius.",
      "",
      "Examples:",
      "  edgefield parts compartment.step",
      "  edgefield parts compartment.step --json",
      ""
    })
final class PartsCommand implements Callable<Integer> {
  private final Console console;

  @Mixin CommonOptions common;

  @Parameters(paramLabel = "MODEL.step", description = "STEP file: AP203, AP214 or AP242.")
  Path model;

  PartsCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() {
    ModelLook look;
    try (ProgressLine progress = new ProgressLine(console, common.quiet)) {
      look = ModelLook.at(model, progress);
    }
    if (common.json) {
      console.out().print(PartsJson.text(look));
      return ExitCode.PASS;
    }
    PartLabels labels = new PartLabels(look.parts());
    List<String[]> rows = new ArrayList<>();
    for (Part part : look.parts()) {
      PartSummary s = look.summaries().get(part.index());
      double[] b = part.bounds_m();
      rows.add(
          new String[] {
            labels.of(part.index()),
            Human.number(1e3 * (b[3] - b[0]))
                + " x "
                + Human.number(1e3 * (b[4] - b[1]))
                + " x "
                + Human.number(1e3 * (b[5] - b[2])),
            s.sharpConvexEdges() == 0
                ? "none"
                : s.sharpConvexEdges() + ", " + Human.length(s.sharpConvexLength_m()),
            Double.isInfinite(s.smallestConvexRadius_m())
                ? "none"
                : "R" + Human.number(1e3 * s.smallestConvexRadius_m())
          });
    }
    String schema = look.source().schema();
    String head =
        look.source().file()
            + ": "
            + look.parts().size()
            + (look.parts().size() == 1 ? " part, " : " parts, ")
            + (schema.isEmpty() ? "" : schema + ", ")
            + "drawn in "
            + look.source().unit();
    console.out().println(Wrap.text(head, console.width()));
    new Table("part", "size, mm", "sharp convex edges", "least radius, mm")
        .print(rows, console.width(), console.out());
    if (!common.quiet) {
      look.warnings().forEach(w -> console.err().println("edgefield: warning: " + w));
    }
    return ExitCode.PASS;
  }
}
