package org.edgefield.cli.command;

import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.edgefield.cli.ExitCode;
import org.edgefield.cli.UserException;
import org.edgefield.cli.casefile.CaseDraft;
import org.edgefield.cli.console.Console;
import org.edgefield.cli.console.ProgressLine;
import org.edgefield.cli.output.OutputFolder;
import org.edgefield.cli.pipeline.ModelLook;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code edgefield draft}: a starter case file. */
@Command(
    name = "draft",
    header = {
      "A starter case file with every part of a model listed.",
      "",
      "Examples:",
      "  edgefield draft compartment.step                  writes compartment.yaml",
      "  edgefield draft compartment.step -o study.yaml",
      ""
    })
final class DraftCommand implements Callable<Integer> {
  private final Console console;

  @Mixin CommonOptions common;

  @Parameters(paramLabel = "MODEL.step", description = "STEP file: AP203, AP214 or AP242.")
  Path model;

  @Option(
      names = {"-o", "--output"},
      paramLabel = "CASE.yaml",
      description = "Where to write; the model's name with .yaml by default.")
  Path output;

  @Option(names = "--force", description = "Replace an existing file.")
  boolean force;

  DraftCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() {
    Path target = output != null ? output : beside(model);
    if (Files.exists(target) && !force) {
      throw new UserException(target + " exists: name another with -o, or replace it with --force");
    }
    ModelLook look;
    try (ProgressLine progress = new ProgressLine(console, common.quiet)) {
      look = ModelLook.at(model, progress);
    }
    Path folder = target.toAbsolutePath().normalize().getParent();
    String text = CaseDraft.text(folder, model, look.parts());
    new OutputFolder(folder)
        .add(
            target.getFileName().toString(),
            out -> out.write(text.getBytes(StandardCharsets.UTF_8)))
        .write();
    console.out().println(target);
    if (!common.quiet) {
      console
          .err()
          .println(
              "edgefield: set the electrodes and voltages in it, then: edgefield screen " + target);
    }
    return ExitCode.PASS;
  }

  private static Path beside(Path model) {
    String name = model.getFileName().toString();
    int dot = name.lastIndexOf('.');
    return model.resolveSibling((dot > 0 ? name.substring(0, dot) : name) + ".yaml");
  }
}
