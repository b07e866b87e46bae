package org.flexbound.setup;

/**
 * The part of the load range that a slope is fitted to, as shares of the peak load.
 *
 * @param lower lower share, 0 to below upper
 * @param upper upper share, to 1
 */
public record FitRange(double lower, double upper) {
  /**
   * 10 to 100 %: leaves out the toe where the article seats itself, keeps the rest (common
   * practice, no source).
   */
  public static final FitRange USUAL = new FitRange(0.10, 1.00);

  /** Checks the order. */
  public FitRange {
    if (!(0 <= lower && lower < upper && upper <= 1)) {
      throw new IllegalArgumentException(
          "a fit range goes from 0 or more up to 1 or less, not from " + lower + " to " + upper);
    }
  }
}
