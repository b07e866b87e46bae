package org.flexbound.quantity;

/** A text is not a unit or a quantity; the message says why and what would be, for the user. */
public final class UnitException extends Exception {
  private static final long serialVersionUID = 1L;

  /**
   * A text could not be read.
   *
   * @param message what was found and what is expected
   */
  public UnitException(String message) {
    super(message);
  }
}
