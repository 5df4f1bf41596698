package org.edgefield.cli.casefile.units;

/** A text that is not the quantity it should be; the message names what was expected. */
public final class QuantityException extends Exception {
  private static final long serialVersionUID = 1L;

  /** Creates the exception with its one-line message. */
  public QuantityException(String message) {
    super(message);
  }
}
