package org.edgefield.cli;

import org.edgefield.cli.command.CommandLineRun;
import org.edgefield.cli.console.Console;

/** Entry point of the command line. */
public final class Main {
  private Main() {}

  /** Runs one command and ends the process with its exit code. */
  public static void main(String[] args) {
    Console console = Console.ofProcess();
    int code = CommandLineRun.run(console, args);
    console.out().flush();
    console.err().flush();
    System.exit(code);
  }
}
