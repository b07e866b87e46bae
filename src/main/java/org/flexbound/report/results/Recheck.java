package org.flexbound.report.results;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * This test against an earlier one.
 *
 * @param baseline the file of the earlier results
 * @param baselineTitle their title
 * @param baselineDate the date of the earlier test, or empty
 * @param changes the coefficients that both tests have
 * @param statistic all differences together, weighted by their covariance
 * @param degreesOfFreedom degrees of freedom of the statistic
 * @param scatterDegreesOfFreedom degrees of freedom of the scatter of both tests; left out where
 *     infinite
 * @param probability the probability of so large a statistic by chance
 * @param changed whether anything changed beyond chance
 * @param shared calibrations that both tests used, whose errors cancel
 * @param explanation which parameters' change explains it; left out where there is no model or no
 *     change
 */
public record Recheck(
    String baseline,
    String baselineTitle,
    String baselineDate,
    List<CoefficientChange> changes,
    double statistic,
    int degreesOfFreedom,
    OptionalDouble scatterDegreesOfFreedom,
    double probability,
    boolean changed,
    List<String> shared,
    Optional<ChangeExplanation> explanation) {
  /** Copies the lists. */
  public Recheck {
    changes = List.copyOf(changes);
    shared = List.copyOf(shared);
  }
}
