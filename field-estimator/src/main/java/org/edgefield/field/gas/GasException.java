package org.edgefield.field.gas;

/**
 * A gas, state or criterion for which no valid figure can be given. The message is one line that
 * says why, and what to do instead.
 */
public final class GasException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** Creates the exception with its one-line message. */
  public GasException(String message) {
    super(message);
  }
}
