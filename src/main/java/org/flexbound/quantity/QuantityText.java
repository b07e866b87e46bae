package org.flexbound.quantity;

/** Reads a number followed by a unit. */
final class QuantityText {
  private QuantityText() {}

  static Quantity parse(String text) throws UnitException {
    String trimmed = text.strip();
    int end = 0;
    while (end < trimmed.length() && "+-.0123456789eE".indexOf(trimmed.charAt(end)) >= 0) {
      end++;
    }
    try {
      double value = Double.parseDouble(trimmed.substring(0, end));
      return new Quantity(value, Units.parse(trimmed.substring(end)));
    } catch (NumberFormatException notANumber) {
      throw new UnitException(
          "'" + text + "' is not a number with a unit, such as 12.5 kN/m (" + notANumber + ")");
    }
  }
}
