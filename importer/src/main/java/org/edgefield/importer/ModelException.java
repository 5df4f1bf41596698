package org.edgefield.importer;

/**
 * The model cannot be used: missing, damaged, empty, or beyond a limit. The message is one line
 * that names the file, the entity or part, and the cure.
 */
public final class ModelException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** Creates the exception with its one-line message. */
  public ModelException(String message) {
    super(message);
  }

  /** Creates the exception with its one-line message and the fault behind it. */
  public ModelException(String message, Throwable cause) {
    super(message, cause);
  }
}
