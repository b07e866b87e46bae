package org.flexbound.acceptance;

import java.util.OptionalDouble;
import org.flexbound.statistics.Quantiles;

/**
 * The probability that a true value lies within limits, given what was measured (conformance
 * probability, JCGM 106:2012, clause 7, with little known beforehand: the distribution is that of
 * the measurement alone).
 */
final class Conformity {
  private Conformity() {}

  /**
   * The probability that the true value lies from lower to upper.
   *
   * @param quantity what was measured
   * @param lower the smallest allowed value
   * @param upper the largest allowed value
   * @return 0 to 1
   */
  static double probability(Quantity quantity, OptionalDouble lower, OptionalDouble upper) {
    double below = upper.isPresent() ? below(quantity, upper.getAsDouble()) : 1;
    double above = lower.isPresent() ? below(quantity, lower.getAsDouble()) : 0;
    return Math.max(0, below - above);
  }

  /** The probability that the true value lies below a bound. */
  static double below(Quantity quantity, double bound) {
    return switch (quantity.law()) {
      case ABOUT_VALUE -> {
        double u = quantity.budget().standardUncertainty();
        double distance = bound - quantity.value();
        if (!(u > 0)) {
          yield distance >= 0 ? 1 : 0;
        }
        yield Quantiles.studentTProbability(distance / u, quantity.budget().degreesOfFreedom());
      }
      // a stiffness lies below its bound where the coefficient, above zero, lies above the inverse
      case INVERSE -> bound > 0 ? 1 - below(quantity.inverse(), 1 / bound) : 0;
      case STANDARD_DEVIATION -> {
        double k = quantity.budget().scatterDegreesOfFreedom();
        double ratio = quantity.value() / bound;
        if (!(bound > 0)) {
          yield 0;
        }
        yield Quantiles.chiSquaredTail(k * ratio * ratio, k);
      }
    };
  }

  /**
   * The width of the guard band: how far within a limit the value must lie.
   *
   * @param quantity what was measured
   * @param largestProbability of being wrong
   * @return the distance from the limit, in the unit of the quantity; not a number for a standard
   *     deviation, whose band is no fixed width
   */
  static double guard(Quantity quantity, double largestProbability) {
    return quantity.law() == Quantity.Law.STANDARD_DEVIATION
        ? Double.NaN
        : Quantiles.studentT(1 - largestProbability, quantity.budget().degreesOfFreedom())
            * quantity.budget().standardUncertainty();
  }
}
