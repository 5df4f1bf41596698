package org.edgefield.cli;

/**
 * Something the user can mend: the message is one line (or one line per problem) that says what is
 * wrong and how to mend it. Never shown with a stack trace.
 */
public final class UserException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  private final int exitCode;

  /** A command line, case file or output folder at fault: exit 2. */
  public UserException(String message) {
    this(ExitCode.USAGE, message, null);
  }

  /** As above, with the fault behind it. */
  public UserException(String message, Throwable cause) {
    this(ExitCode.USAGE, message, cause);
  }

  /** With its own exit code. */
  public UserException(int exitCode, String message, Throwable cause) {
    super(message, cause);
    this.exitCode = exitCode;
  }

  /** The process's exit code. */
  public int exitCode() {
    return exitCode;
  }
}
