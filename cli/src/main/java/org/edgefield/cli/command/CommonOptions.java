package org.edgefield.cli.command;

import picocli.CommandLine.Option;

/** Options every command takes. */
final class CommonOptions {
  @Option(
      names = {"-q", "--quiet"},
      description = "Only results and errors: no progress, no remarks.")
  boolean quiet;

  @Option(names = "--json", description = "Print the result as JSON on standard output.")
  boolean json;

  @Option(names = "--debug", description = "Print the stack trace of an internal fault.")
  boolean debug;

  @Option(
      names = {"-h", "--help"},
      usageHelp = true,
      description = "Show this help.")
  boolean help;
}
