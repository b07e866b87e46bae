package org.flexbound.quantity;

import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads a number followed by a unit. */
final class QuantityText {
  private static final Pattern NUMBER =
      Pattern.compile("([-+\\u2212]?(?:\\d+\\.?\\d*|\\.\\d+)(?:[eE][-+]?\\d+)?)(.*)", Pattern.DOTALL);
  private static final String EXAMPLE = "; expected a number with a unit, such as 12.5 kN/m";

  private QuantityText() {}

  static Quantity parse(String text) throws UnitException {
    String trimmed = text.strip();
    Matcher parts = NUMBER.matcher(trimmed);
    if (!parts.matches()) {
      throw new UnitException("'" + Units.shown(trimmed) + "' does not begin with a number" + EXAMPLE);
    }
    String number = parts.group(1).replace('\u2212', '-');
    String rest = parts.group(2).strip();
    if (rest.startsWith(",")) {
      throw new UnitException(
          "'"
              + Units.shown(trimmed)
              + "' has a comma in its number; write a decimal point, and no thousands separators");
    }
    boolean one = rest.equals("1") || rest.startsWith("1/");
    if (!one && !rest.isEmpty() && "0123456789.".indexOf(rest.charAt(0)) >= 0) {
      throw new UnitException(
          "'"
              + Units.shown(trimmed)
              + "' has a gap or a second point in its number; write it in one piece");
    }
    double value = Double.parseDouble(number);
    if (Double.isInfinite(value)) {
      throw new UnitException(
          "'" + Units.shown(trimmed) + "' is beyond the largest number that 64 bits hold");
    }
    return new Quantity(value, Units.parse(rest));
  }
}
