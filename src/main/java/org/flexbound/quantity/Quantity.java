package org.flexbound.quantity;

/**
 * A value with the unit in which the user stated it.
 *
 * @param value the value in {@code unit}
 * @param unit the unit as stated
 */
public record Quantity(double value, Unit unit) {
  /**
   * Reads a text such as {@code 12.5 kN/m} or {@code 210 GPa}: a number in the notation of {@code
   * Double.parseDouble} (point, no thousands separators), then a unit.
   *
   * @param text the text
   * @return the quantity
   * @throws UnitException where the number or the unit cannot be read
   */
  public static Quantity parse(String text) throws UnitException {
    return QuantityText.parse(text);
  }

  /**
   * The value in SI units.
   *
   * @return the value in SI
   */
  public double si() {
    return unit.toSi(value);
  }
}
