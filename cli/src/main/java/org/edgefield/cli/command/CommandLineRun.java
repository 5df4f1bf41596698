package org.edgefield.cli.command;

import java.io.OutputStreamWriter;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.InvalidPathException;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.CancellationException;
import org.edgefield.cli.ExitCode;
import org.edgefield.cli.UserException;
import org.edgefield.cli.console.Console;
import org.edgefield.field.bem.solve.SolveException;
import org.edgefield.field.gas.GasException;
import org.edgefield.importer.ModelException;
import picocli.CommandLine;
import picocli.CommandLine.Help.Ansi;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.UnmatchedArgumentException;

/** One run of the command line: parses, runs, and turns every fault into a line and a code. */
public final class CommandLineRun {
  private static final String REPORT =
      "please report it with the command line and the output of --debug";

  private final Console console;
  private final boolean debug;

  private CommandLineRun(Console console, boolean debug) {
    this.console = console;
    this.debug = debug;
  }

  /** Runs the arguments and returns the exit code; never throws, never prints a stack trace. */
  public static int run(Console console, String... args) {
    boolean debug = console.isSet("EDGEFIELD_DEBUG") || Arrays.asList(args).contains("--debug");
    return new CommandLineRun(console, debug).execute(args);
  }

  private int execute(String... args) {
    try {
      CommandLine line = RootCommand.commandLine(console);
      line.setOut(writer(console.out()));
      line.setErr(writer(console.err()));
      line.setColorScheme(
          CommandLine.Help.defaultColorScheme(console.colour() ? Ansi.ON : Ansi.OFF));
      line.setUsageHelpWidth(Math.min(Math.max(console.width(), 60), 100));
      line.setParameterExceptionHandler((e, arguments) -> usage(e));
      line.setExecutionExceptionHandler((e, command, parse) -> fault(e));
      return line.execute(args);
    } catch (Throwable e) {
      return fault(e);
    }
  }

  private static PrintWriter writer(java.io.PrintStream stream) {
    return new PrintWriter(new OutputStreamWriter(stream, StandardCharsets.UTF_8), true);
  }

  private int usage(ParameterException e) {
    CommandLine line = e.getCommandLine();
    StringBuilder text = new StringBuilder(e.getMessage());
    if (e instanceof UnmatchedArgumentException unmatched) {
      List<String> suggestions = unmatched.getSuggestions();
      if (!suggestions.isEmpty()) {
        text.append("; did you mean ").append(String.join(" or ", suggestions)).append('?');
      }
    }
    say(text.toString());
    console.err().println("try: " + line.getCommandSpec().qualifiedName() + " --help");
    return ExitCode.USAGE;
  }

  private int fault(Throwable e) {
    if (debug) {
      e.printStackTrace(console.err());
    }
    if (e instanceof UserException user) {
      say(user.getMessage());
      return user.exitCode();
    }
    if (e instanceof ModelException model) {
      say(model.getMessage());
      return ExitCode.MODEL;
    }
    if (e instanceof GasException) {
      say(e.getMessage());
      return ExitCode.USAGE;
    }
    if (e instanceof SolveException) {
      say(e.getMessage());
      return ExitCode.MODEL;
    }
    if (e instanceof OutOfMemoryError) {
      say("out of memory: give Java more, or coarsen the mesh (mesh: largest size)");
      return ExitCode.BUDGET;
    }
    if (e instanceof CancellationException) {
      say("stopped");
      return ExitCode.BUDGET;
    }
    if (e instanceof InvalidPathException path) {
      say(
          "cannot use the file name "
              + path.getInput()
              + ": set a UTF-8 locale, for example LC_ALL=C.UTF-8");
      return ExitCode.USAGE;
    }
    String what =
        e.getMessage() == null ? "" : ": " + e.getMessage().lines().findFirst().orElse("");
    say("internal fault (" + e.getClass().getSimpleName() + what + "); " + REPORT);
    return ExitCode.FAULT;
  }

  private void say(String text) {
    console.err().println("edgefield: " + text);
  }
}
