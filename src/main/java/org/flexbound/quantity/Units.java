package org.flexbound.quantity;

import java.util.List;
import java.util.Map;

/** The table of the spellings of units that people use in load tests and frame models. */
public final class Units {
  private static final Map<String, Unit> TABLE =
      Map.ofEntries(
          Map.entry("m", Unit.METRE),
          Map.entry("mm", new Unit("mm", Dimension.LENGTH, 1e-3, 0)),
          Map.entry("N", Unit.NEWTON),
          Map.entry("kN", new Unit("kN", Dimension.FORCE, 1e3, 0)),
          Map.entry("rad", Unit.RADIAN),
          Map.entry("kg", new Unit("kg", Dimension.MASS, 1, 0)),
          Map.entry("GPa", new Unit("GPa", Dimension.STRESS, 1e9, 0)));

  private Units() {}

  /**
   * Reads a unit such as {@code mm}, {@code kN/m} or {@code lbf·in/rad}.
   *
   * @param text the spelling, with blanks around it ignored
   * @return the unit
   * @throws UnitException where nothing in the table matches, with the nearest spellings
   */
  public static Unit parse(String text) throws UnitException {
    Unit unit = TABLE.get(text.strip());
    if (unit == null) {
      throw new UnitException("'" + text + "' is not a unit that is known here");
    }
    return unit;
  }

  /**
   * The spellings offered for a dimension, in the order in which a user would look for them (for
   * drop-down lists and messages).
   *
   * @param dimension what is measured
   * @return the spellings
   */
  public static List<String> spellings(Dimension dimension) {
    return TABLE.entrySet().stream()
        .filter(entry -> entry.getValue().dimension().equals(dimension))
        .map(Map.Entry::getKey)
        .sorted()
        .toList();
  }
}
