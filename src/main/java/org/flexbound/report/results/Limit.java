package org.flexbound.report.results;

import java.util.List;
import java.util.OptionalDouble;

/**
 * An acceptance limit and its decision.
 *
 * @param configuration the configuration in which it was judged
 * @param name the limit's name
 * @param on what kind of quantity it is set on
 * @param subject the quantity; the one nearest to breaking the limit where it covers several
 * @param value the measured value, SI; left out where it could not be made out
 * @param standardUncertainty its standard uncertainty
 * @param degreesOfFreedom effective degrees of freedom; left out where infinite
 * @param lower the smallest allowed value, SI; left out where there is none
 * @param upper the largest allowed value, SI; left out where there is none
 * @param unit the SI unit; 1 for a share
 * @param statedUnit the unit in which the limit was stated
 * @param statedFactor how many SI units one of it is
 * @param judged how many quantities the limit covers
 * @param rule guarded or simple (JCGM 106:2012)
 * @param largestProbability the largest probability of being wrong that the rule allows
 * @param guard width of the guard band, SI; left out where there is none of a fixed width
 * @param probability the probability that the true value lies within the limit
 * @param decision pass, fail or undecided
 * @param wrong the probability that the decision is wrong
 * @param advice what would settle it where it is undecided; otherwise empty
 * @param sources where the uncertainty comes from, largest share first
 */
public record Limit(
    String configuration,
    String name,
    String on,
    String subject,
    OptionalDouble value,
    OptionalDouble standardUncertainty,
    OptionalDouble degreesOfFreedom,
    OptionalDouble lower,
    OptionalDouble upper,
    String unit,
    String statedUnit,
    double statedFactor,
    int judged,
    String rule,
    double largestProbability,
    OptionalDouble guard,
    OptionalDouble probability,
    String decision,
    OptionalDouble wrong,
    String advice,
    List<UncertaintyShare> sources) {
  /** Copies the lists. */
  public Limit {
    sources = List.copyOf(sources);
  }

  /**
   * A value in the unit in which the limit was stated.
   *
   * @param si the value, SI
   * @return the value to show
   */
  public double stated(double si) {
    return si / statedFactor;
  }
}
