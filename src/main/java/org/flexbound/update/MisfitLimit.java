package org.flexbound.update;

import org.apache.commons.statistics.distribution.ChiSquaredDistribution;
import org.apache.commons.statistics.distribution.FDistribution;
import org.apache.commons.statistics.distribution.TDistribution;

/**
 * What a sum of squares of whitened residuals may be: χ², or F where the scatter was estimated with ν
 * degrees of freedom.
 */
final class MisfitLimit {
  /** The usual level of a test (common practice, no source). */
  static final double LEVEL = 0.95;

  /** With less than this left of the degrees of freedom there is nothing to test. */
  private static final double NOTHING_LEFT = 0.01;

  /** Beyond this many degrees of freedom F is χ² to more digits than matter. */
  private static final double MANY = 1e7;

  private MisfitLimit() {}

  /** The quantile at a level. */
  static double at(double level, double degreesOfFreedom, double scatterDegreesOfFreedom) {
    if (degreesOfFreedom < NOTHING_LEFT) {
      return Double.POSITIVE_INFINITY;
    }
    if (scatterDegreesOfFreedom < MANY) {
      return degreesOfFreedom
          * FDistribution.of(degreesOfFreedom, scatterDegreesOfFreedom)
              .inverseCumulativeProbability(level);
    }
    return ChiSquaredDistribution.of(degreesOfFreedom).inverseCumulativeProbability(level);
  }

  /** The level of each of several tests that together keep {@link #LEVEL} (Šidák 1967). */
  static double sidak(int tests) {
    return Math.pow(LEVEL, 1.0 / Math.max(tests, 1));
  }

  /** Student's t quantile; the normal's where nothing is estimated. */
  static double student(double probability, double scatterDegreesOfFreedom) {
    return TDistribution.of(Math.min(scatterDegreesOfFreedom, MANY))
        .inverseCumulativeProbability(probability);
  }

  /**
   * By how much the scatter's variances are raised, so that normal quantiles give Student's.
   */
  static double scatterFactor(double scatterDegreesOfFreedom) {
    double t =
        student(0.975, scatterDegreesOfFreedom) / student(0.975, Double.POSITIVE_INFINITY);
    return t * t;
  }
}
