package org.flexbound.quantity;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import javax.measure.IncommensurableException;
import tech.units.indriya.AbstractUnit;

/** Reads units as people spell them: products, quotients and powers of the table's spellings. */
public final class Units {
  /** Longer than any unit somebody writes; keeps nested parentheses from exhausting the stack. */
  private static final int LONGEST = 100;

  private Units() {}

  /**
   * Reads a unit such as {@code mm}, {@code kN/m}, {@code mm^4} or {@code lbf·in/rad}.
   *
   * @param text the spelling, with blanks around it ignored; empty or {@code 1} for a pure number
   * @return the unit
   * @throws UnitException where a piece is not in the table or stands for two units, with the
   *     nearest spellings
   */
  public static Unit parse(String text) throws UnitException {
    String trimmed = text.strip();
    if (trimmed.isEmpty()) {
      return Unit.ONE;
    }
    if (trimmed.length() > LONGEST) {
      throw new UnitException(
          "'" + shown(trimmed) + "' is not a unit: it is longer than " + LONGEST + " characters");
    }
    Unit degrees = TemperatureUnits.find(trimmed);
    if (degrees != null) {
      return degrees;
    }
    return new UnitExpression(trimmed).unit();
  }

  /**
   * A unit that is certainly in the table, for use in the program itself.
   *
   * @param text the spelling
   * @return the unit
   * @throws IllegalArgumentException where the spelling is not in the table
   */
  public static Unit known(String text) {
    try {
      return parse(text);
    } catch (UnitException unknown) {
      throw new IllegalArgumentException(unknown);
    }
  }

  /** Turns a unit of the kept library into ours. */
  static Unit of(String symbol, javax.measure.Unit<?> unit) throws UnitException {
    Dimension dimension = Dimension.NUMBER;
    javax.measure.Dimension measured = unit.getDimension();
    Map<? extends javax.measure.Dimension, Integer> bases = measured.getBaseDimensions();
    List<Map.Entry<? extends javax.measure.Dimension, Integer>> entries =
        bases == null ? List.of(Map.entry(measured, 1)) : new ArrayList<>(bases.entrySet());
    for (Map.Entry<? extends javax.measure.Dimension, Integer> entry : entries) {
      Dimension base = Spellings.dimension(entry.getKey());
      for (int k = 0; k < Math.abs(entry.getValue()); k++) {
        dimension = entry.getValue() > 0 ? dimension.times(base) : dimension.per(base);
      }
    }
    try {
      double factor = unit.getConverterToAny(unit.getSystemUnit()).convert(1.0);
      return new Unit(symbol, dimension, factor, 0);
    } catch (IncommensurableException impossible) {
      throw new UnitException("'" + symbol + "' has no conversion to SI units");
    }
  }

  /** A text as it is shown in a message: cut where it is very long. */
  static String shown(String text) {
    return text.length() > 60 ? text.substring(0, 57) + "…" : text;
  }

  /** The product of two units of any kind. */
  static javax.measure.Unit<?> product(javax.measure.Unit<?> left, javax.measure.Unit<?> right) {
    return left.multiply(right);
  }

  /** The unit of pure numbers in the kept library. */
  static javax.measure.Unit<?> one() {
    return AbstractUnit.ONE;
  }

  /**
   * The spellings offered for a dimension, in the order in which a user would look for them (for
   * drop-down lists and messages).
   *
   * @param dimension what is measured
   * @return the spellings
   */
  public static List<String> spellings(Dimension dimension) {
    List<String> offered = new ArrayList<>();
    for (String spelling : Spellings.OFFERED) {
      try {
        if (parse(spelling).dimension().equals(dimension)) {
          offered.add(spelling);
        }
      } catch (UnitException impossible) {
        throw new IllegalStateException("the table offers what it cannot read", impossible);
      }
    }
    return List.copyOf(offered);
  }

  /** The spellings nearest to a piece that is not in the table, at most three. */
  static List<String> nearest(String piece) {
    return NearestWord.of(piece, Spellings.TABLE.keySet());
  }
}
