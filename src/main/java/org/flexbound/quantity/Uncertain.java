package org.flexbound.quantity;

/**
 * A value with its standard uncertainty (JCGM 100:2008, 2.3.1), both in the same SI unit.
 *
 * @param value the estimate
 * @param standardUncertainty its standard uncertainty, not negative
 */
public record Uncertain(double value, double standardUncertainty) {
  /** Checks that the uncertainty is a number and not negative. */
  public Uncertain {
    if (!(standardUncertainty >= 0)) {
      throw new IllegalArgumentException(
          "a standard uncertainty is at least 0, not " + standardUncertainty);
    }
  }
}
