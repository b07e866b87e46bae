package org.flexbound.acceptance;

import org.flexbound.statistics.Quantiles;

/**
 * Control limits for single values in order of time.
 *
 * <p>From a baseline of eight values or more: Shewhart's chart of individuals and moving ranges, mean
 * ± 3 R̄/d₂ with d₂ = 1.128 for ranges of two (so 2.66 R̄), and 3.267 R̄ for the range itself
 * (NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.2). From fewer: the prediction interval of
 * one further value, mean ± t s √(1 + 1/n), at the same two-sided probability of 0.27 % as three
 * standard deviations of a normal.
 *
 * @param baseline how many values the limits come from
 * @param centre their mean
 * @param lower lower limit
 * @param upper upper limit
 * @param meanRange the mean moving range; of the baseline
 * @param upperRange the limit of a moving range; NaN for a prediction interval
 * @param predicted whether these are the limits of a prediction interval
 */
public record IndividualsChart(
    int baseline,
    double centre,
    double lower,
    double upper,
    double meanRange,
    double upperRange,
    boolean predicted) {
  /** Tests that a baseline must have for Shewhart's chart. */
  public static final int LEAST_BASELINE = 8;

  /** Mean of the range of two normal values, in standard deviations. */
  static final double D2 = 1.128;

  /** Upper limit of the range of two, in mean ranges. */
  static final double D4 = 3.267;

  /** Probability beyond three standard deviations of a normal, both sides. */
  private static final double BEYOND = 0.0027;

  /**
   * Limits of the first values of a series.
   *
   * @param values in order of time
   * @param baseline how many of the first are the baseline, at least 2
   * @return the limits
   */
  public static IndividualsChart of(double[] values, int baseline) {
    if (baseline < 2 || baseline > values.length) {
      throw new IllegalArgumentException(
          "a baseline of " + baseline + " out of " + values.length + " values");
    }
    double mean = 0;
    for (int k = 0; k < baseline; k++) {
      mean += values[k] / baseline;
    }
    double range = 0;
    for (int k = 1; k < baseline; k++) {
      range += Math.abs(values[k] - values[k - 1]) / (baseline - 1);
    }
    if (baseline >= LEAST_BASELINE) {
      double reach = 3 / D2 * range;
      return new IndividualsChart(
          baseline, mean, mean - reach, mean + reach, range, D4 * range, false);
    }
    double squares = 0;
    for (int k = 0; k < baseline; k++) {
      squares += (values[k] - mean) * (values[k] - mean);
    }
    double s = Math.sqrt(squares / (baseline - 1));
    double reach =
        Quantiles.studentT(1 - BEYOND / 2, baseline - 1.0) * s * Math.sqrt(1 + 1.0 / baseline);
    return new IndividualsChart(
        baseline, mean, mean - reach, mean + reach, range, Double.NaN, true);
  }

  /**
   * Whether a value lies outside.
   *
   * @param value the value
   * @return true if so
   */
  public boolean outside(double value) {
    return value < lower || value > upper;
  }

  /**
   * Whether a moving range is too large.
   *
   * @param range the distance to the value before
   * @return true if so; false where there is no limit
   */
  public boolean rangeOutside(double range) {
    return range > upperRange;
  }
}
