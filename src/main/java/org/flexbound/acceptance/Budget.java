package org.flexbound.acceptance;

import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * The standard uncertainty of a quantity by its sources, which are independent of one another.
 *
 * @param scatter from run-to-run scatter: the part that more runs make smaller
 * @param scatterDegreesOfFreedom of the scatter; infinite where it is stated
 * @param fixed the sources that more runs with the same instruments leave as they are
 */
public record Budget(double scatter, double scatterDegreesOfFreedom, List<Source> fixed) {
  /** Copies the list. */
  public Budget {
    fixed = List.copyOf(fixed);
  }

  /**
   * One source.
   *
   * @param name what it is, for the reader
   * @param uncertainty its standard uncertainty, in the unit of the quantity; not negative
   * @param relative its standard uncertainty as a share of the reading, for a gain; NaN otherwise
   */
  public record Source(String name, double uncertainty, double relative) {
    double variance() {
      return uncertainty * uncertainty;
    }
  }

  /**
   * The variance of the sources that do not change with more runs.
   *
   * @return the sum of their squares
   */
  public double fixedVariance() {
    return fixed.stream().mapToDouble(Source::variance).sum();
  }

  /**
   * The combined standard uncertainty.
   *
   * @return the root of the sum of squares
   */
  public double standardUncertainty() {
    return Math.sqrt(scatter * scatter + fixedVariance());
  }

  /**
   * The effective degrees of freedom (Welch–Satterthwaite, JCGM 100:2008, G.4.1: only the scatter
   * has finite ones).
   *
   * @return at least those of the scatter
   */
  public double degreesOfFreedom() {
    return effective(scatter * scatter, scatterDegreesOfFreedom, fixedVariance());
  }

  static double effective(double scatterVariance, double degrees, double fixedVariance) {
    if (!(scatterVariance > 0)) {
      return Double.POSITIVE_INFINITY;
    }
    double ratio = (scatterVariance + fixedVariance) / scatterVariance;
    return degrees * ratio * ratio;
  }

  /**
   * The largest of the fixed sources.
   *
   * @return it, if there is any
   */
  public Optional<Source> dominant() {
    return fixed.stream()
        .max(Comparator.comparingDouble(Source::variance))
        .filter(s -> s.variance() > 0);
  }
}
