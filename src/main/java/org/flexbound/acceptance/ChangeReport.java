package org.flexbound.acceptance;

import java.util.List;
import java.util.Optional;

/**
 * This test against an earlier one.
 *
 * @param before the earlier test
 * @param changes the coefficients that both have
 * @param statistic dᵀ V⁺ d of all differences together
 * @param rank its degrees of freedom
 * @param scatterDegreesOfFreedom degrees of freedom of the scatter of both tests together
 * @param probability of so large a statistic by chance
 * @param shared calibrations that both tests used, whose errors cancel
 * @param explanation which parameters' change explains the differences, where there is a model and a
 *     change
 */
public record ChangeReport(
    KeptTest before,
    List<Change> changes,
    double statistic,
    int rank,
    double scatterDegreesOfFreedom,
    double probability,
    List<String> shared,
    Optional<Explanation> explanation) {
  /** Copies the lists. */
  public ChangeReport {
    changes = List.copyOf(changes);
    shared = List.copyOf(shared);
  }

  /**
   * Whether anything changed.
   *
   * @return true where all differences together, or one of them, are past chance
   */
  public boolean changed() {
    return probability < Recheck.LEVEL || changes.stream().anyMatch(Change::significant);
  }
}
