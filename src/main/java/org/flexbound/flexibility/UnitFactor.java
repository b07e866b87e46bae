package org.flexbound.flexibility;

import java.util.List;

/**
 * A factor that comes of a unit mistaken for another.
 *
 * @param value the factor
 * @param words which units
 */
public record UnitFactor(double value, String words) {
  /**
   * The usual ones: 25.4 mm an inch, 4.4482216152605 N a pound-force and 9.80665 N a kilogram-force
   * (NIST SP 811:2008, appendix B), 175.126835 N/m a pound-force an inch, and a thousand.
   */
  public static final List<UnitFactor> USUAL =
      List.of(
          new UnitFactor(25.4, "inch for mm"),
          new UnitFactor(1000, "a thousandfold unit, as mm for µm or kN for N"),
          new UnitFactor(4.4482216152605, "pound-force for newton"),
          new UnitFactor(9.80665, "kilogram-force for newton, or kilogram for newton"),
          new UnitFactor(175.126835, "pound-force an inch for newton a metre"));
}
