package org.edgefield.cli.command;

import org.edgefield.cli.Version;
import org.edgefield.cli.console.Console;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.IVersionProvider;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** {@code edgefield} itself: help and version; the work is in the subcommands. */
@Command(
    name = "edgefield",
    header = {
      "Electric field on the conductors of a STEP model, and what the gas withstands there.",
      "",
      "Examples:",
      "  edgefield parts compartment.step              what is in the model",
      "  edgefield draft compartment.step              a starter case file",
      "  edgefield screen compartment.yaml             hot spots in seconds, a heatmap",
      "  edgefield solve compartment.yaml              the field solved, to 1 %%",
      "  edgefield gate compartment.yaml --accepted accepted.json",
      "                                                fail on new or worse red regions",
      ""
    },
    footer = {
      "",
      "Exit codes: 0 pass; 1 red regions or failed gate; 2 command line, case file or",
      "output folder; 3 model cannot be used; 4 not converged or out of memory or time;",
      "70 internal fault.",
      "",
      "Results inform a design; they replace no type test."
    },
    synopsisSubcommandLabel = "COMMAND",
    versionProvider = RootCommand.VersionText.class)
final class RootCommand implements Runnable {
  @Spec CommandSpec spec;

  @Option(
      names = {"-h", "--help"},
      usageHelp = true,
      description = "Show this help.")
  boolean help;

  @Option(
      names = {"-V", "--version"},
      versionHelp = true,
      description = "Print the version.")
  boolean version;

  @Override
  public void run() {
    throw new ParameterException(spec.commandLine(), "no command given");
  }

  /** One line: tool and version. */
  static final class VersionText implements IVersionProvider {
    @Override
    public String[] getVersion() {
      return new String[] {Version.TOOL + " " + Version.number()};
    }
  }

  static CommandLine commandLine(Console console) {
    return new CommandLine(new RootCommand())
        .addSubcommand(new PartsCommand(console))
        .addSubcommand(new DraftCommand(console))
        .addSubcommand(new ScreenCommand(console))
        .addSubcommand(new SolveCommand(console))
        .addSubcommand(new GateCommand(console));
  }
}
