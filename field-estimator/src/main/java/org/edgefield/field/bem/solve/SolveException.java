package org.edgefield.field.bem.solve;

/** The model or case cannot be solved as it stands; the message names parts, place and cure. */
public final class SolveException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** Creates the exception with its one-line message. */
  public SolveException(String message) {
    super(message);
  }
}
