package org.edgefield.cli.gate;

import java.nio.file.Path;
import org.edgefield.cli.console.Console;

/** The gate on one result, given as the text of its result.json. */
public final class Gate {
  private final GateSide now;
  private final String acceptedText;

  /** A gate for a result. */
  public Gate(String resultJson) {
    var tree = AcceptedFile.tree(resultJson);
    now = GateSide.from(tree);
    acceptedText = AcceptedFile.text(tree);
  }

  /** What to write as the accepted file to accept the result. */
  public String acceptedText() {
    return acceptedText;
  }

  /**
   * Method of an accepted result.
   *
   * @throws org.edgefield.cli.UserException where the file is no accepted result
   */
  public static String method(Path accepted) {
    return AcceptedFile.read(accepted).method();
  }

  /**
   * Compares with an accepted result.
   *
   * @param tolerance_m how far a hot spot may move and be the same
   * @param worseBy relative rise of utilisation that counts as worse
   */
  public Outcome compare(Path accepted, double tolerance_m, double worseBy) {
    return new Outcome(Comparison.of(now, AcceptedFile.read(accepted), tolerance_m, worseBy));
  }

  /** A comparison made. */
  public static final class Outcome {
    private final Comparison comparison;

    private Outcome(Comparison comparison) {
      this.comparison = comparison;
    }

    /** Whether nothing red is new or worse. */
    public boolean passes() {
      return comparison.passes();
    }

    /** Prints it. */
    public void print(Console console) {
      GateText.print(comparison, console);
    }

    /** As JSON. */
    public String json() {
      return GateJson.text(comparison);
    }

    /** As a JUnit-style report. */
    public String junitXml() {
      return JunitXml.text(comparison);
    }
  }
}
