package org.flexbound.document;

import java.util.Optional;
import java.util.OptionalDouble;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.flexbound.quantity.Quantity;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.UnitException;

/**
 * A number as a cell states it: a number, a number stored as text where it can mean only one thing,
 * or a number with its unit as text, as in {@code 0.5 %} or {@code 120 mm}.
 *
 * @param value the number
 * @param unit the unit that stands with it
 * @param isText whether it was stored as text without a unit
 */
public record StatedNumber(double value, Optional<Unit> unit, boolean isText) {
  private static final Pattern PLAIN =
      Pattern.compile("[-+]?([0-9]+(\\.[0-9]*)?|\\.[0-9]+)([eE][-+]?[0-9]+)?");

  /** A number with a comma and what follows; before three digits it may part thousands, except 0. */
  private static final Pattern COMMA =
      Pattern.compile(
          "([-+]?(?:0|[0-9]+(?=,(?![0-9]{3}(?![0-9]))))),([0-9]+)(?![0-9.,])(.*)");

  /**
   * The number that a cell states.
   *
   * @param cell the cell
   * @return the number; empty where the cell states none
   */
  public static Optional<StatedNumber> of(EntryTable.Value cell) {
    if (cell.kind() == CellKind.NUMBER) {
      return Optional.of(new StatedNumber(cell.number(), Optional.empty(), false));
    }
    if (cell.kind() != CellKind.TEXT) {
      return Optional.empty();
    }
    OptionalDouble plain = plain(cell.text());
    if (plain.isPresent()) {
      return Optional.of(new StatedNumber(plain.getAsDouble(), Optional.empty(), true));
    }
    try {
      Quantity quantity = Quantity.parse(COMMA.matcher(cell.text().strip()).replaceFirst("$1.$2$3"));
      return Optional.of(
          new StatedNumber(quantity.value(), Optional.of(quantity.unit()), false));
    } catch (UnitException none) {
      return Optional.empty();
    }
  }

  /**
   * The number that a text states by itself, if it can mean only one.
   *
   * @param text the text
   * @return the number; empty where the text is none, or might be two
   */
  public static OptionalDouble plain(String text) {
    String plain = text.strip().replace('\u2212', '-');
    if (PLAIN.matcher(plain).matches()) {
      return OptionalDouble.of(Double.parseDouble(plain));
    }
    Matcher comma = COMMA.matcher(plain);
    if (comma.matches() && comma.group(3).isEmpty()) {
      return OptionalDouble.of(Double.parseDouble(comma.group(1) + "." + comma.group(2)));
    }
    return OptionalDouble.empty();
  }
}
