package org.flexbound.quantity;

/**
 * A unit of measurement as the user spelt it: value in SI = value · {@code siFactor} + {@code
 * siOffset} (an offset only for temperatures).
 *
 * @param symbol the spelling to show
 * @param dimension what it measures
 * @param siFactor how many SI units (m, kg, s, K, rad and their products) one of it is
 * @param siOffset what is added, in SI units, after the factor
 */
public record Unit(String symbol, Dimension dimension, double siFactor, double siOffset) {
  /** The unit of pure numbers. */
  public static final Unit ONE = new Unit("1", Dimension.NUMBER, 1, 0);

  /** The metre. */
  public static final Unit METRE = new Unit("m", Dimension.LENGTH, 1, 0);

  /** The newton. */
  public static final Unit NEWTON = new Unit("N", Dimension.FORCE, 1, 0);

  /** The radian. */
  public static final Unit RADIAN = new Unit("rad", Dimension.ANGLE, 1, 0);

  /**
   * Turns a value in this unit into SI.
   *
   * @param value the value in this unit
   * @return the value in SI units
   */
  public double toSi(double value) {
    return value * siFactor + siOffset;
  }

  /**
   * Turns a value in SI into this unit.
   *
   * @param si the value in SI units
   * @return the value in this unit
   */
  public double fromSi(double si) {
    return (si - siOffset) / siFactor;
  }
}
