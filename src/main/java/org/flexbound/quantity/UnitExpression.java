package org.flexbound.quantity;

import java.util.List;

/**
 * A unit written as products (·, *, ., blank or hyphen between letters), quotients (/) and powers
 * (^4, ⁴ or a digit), with parentheses; everything after a stroke up to the next stroke divides only
 * its own factor, as in N/mm/mm.
 */
final class UnitExpression {
  private static final int LARGEST_POWER = 12;

  private final String text;
  private int at;

  UnitExpression(String text) {
    this.text = text;
  }

  Unit unit() throws UnitException {
    javax.measure.Unit<?> unit = expression();
    if (at < text.length()) {
      throw new UnitException(
          "'" + text + "' is not a unit: '" + text.substring(at) + "' cannot be read");
    }
    return Units.of(text, unit);
  }

  private javax.measure.Unit<?> expression() throws UnitException {
    javax.measure.Unit<?> unit = factor();
    while (at < text.length()) {
      char next = text.charAt(at);
      if (next == '/') {
        at++;
        unit = Units.product(unit, factor().inverse());
      } else if (" ·*.-⋅×".indexOf(next) >= 0) {
        at++;
        if (text.substring(at).isBlank() || "/)".indexOf(text.charAt(at)) >= 0) {
          continue;
        }
        unit = Units.product(unit, factor());
      } else {
        break;
      }
    }
    return unit;
  }

  private javax.measure.Unit<?> factor() throws UnitException {
    while (at < text.length() && text.charAt(at) == ' ') {
      at++;
    }
    if (at < text.length() && text.charAt(at) == '(') {
      at++;
      javax.measure.Unit<?> inner = expression();
      if (at >= text.length() || text.charAt(at) != ')') {
        throw new UnitException("'" + text + "' is not a unit: a parenthesis is not closed");
      }
      at++;
      return inner.pow(power());
    }
    int start = at;
    while (at < text.length() && isName(text.charAt(at), at == start)) {
      at++;
    }
    String piece = text.substring(start, at);
    return look(piece).pow(power());
  }

  private static boolean isName(char c, boolean first) {
    return Character.isLetter(c) || "%°'\"′″".indexOf(c) >= 0 || (first && c == '1');
  }

  private int power() throws UnitException {
    int start = at;
    if (at < text.length() && text.charAt(at) == '^') {
      at++;
    }
    StringBuilder digits = new StringBuilder();
    while (at < text.length()) {
      char c = text.charAt(at);
      int superscript = "⁰¹²³⁴⁵⁶⁷⁸⁹".indexOf(c);
      if (c >= '0' && c <= '9') {
        digits.append(c);
      } else if (superscript >= 0) {
        digits.append(superscript);
      } else if ((c == '-' || c == '⁻') && digits.length() == 0 && at > start) {
        digits.append('-');
      } else {
        break;
      }
      at++;
    }
    if (digits.length() == 0) {
      return 1;
    }
    int power = LARGEST_POWER + 1;
    if (digits.length() <= 3 && !digits.toString().equals("-")) {
      power = Integer.parseInt(digits.toString());
    }
    if (Math.abs(power) > LARGEST_POWER) {
      throw new UnitException(
          "'" + text + "' is not a unit: a power is a whole number of at most " + LARGEST_POWER);
    }
    return power;
  }

  private javax.measure.Unit<?> look(String piece) throws UnitException {
    javax.measure.Unit<?> unit = Spellings.TABLE.get(piece);
    if (unit != null) {
      return unit;
    }
    if (piece.equals("lb") || piece.equals("lbs")) {
      throw new UnitException(
          "'" + text + "' may be a force or a mass; write lbf for the force, lbm for the mass");
    }
    javax.measure.Unit<?> together = together(piece);
    if (together != null) {
      return together;
    }
    List<String> nearest = Units.nearest(piece);
    throw new UnitException(
        "'"
            + text
            + "' is not a unit that is known here"
            + (nearest.isEmpty() ? "" : "; did you mean " + String.join(" or ", nearest) + "?"));
  }

  /** Moments written together: kNm, Nmm, lbfin. */
  private static javax.measure.@org.jspecify.annotations.Nullable Unit<?> together(String piece) {
    for (String length : List.of("mm", "cm", "m", "in", "ft")) {
      if (piece.endsWith(length)) {
        String rest = piece.substring(0, piece.length() - length.length());
        if (List.of("N", "kN", "MN", "daN", "lbf", "kip", "kgf").contains(rest)) {
          return Units.product(
              Spellings.TABLE.getOrDefault(rest, Units.one()),
              Spellings.TABLE.getOrDefault(length, Units.one()));
        }
      }
    }
    return null;
  }
}
