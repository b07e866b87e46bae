package org.flexbound.report.results;

import java.util.List;

/**
 * Which parameters' change explains the differences between two tests with the fewest parameters.
 *
 * @param explained whether the best subset leaves no more than chance explains
 * @param subsets the subsets that explain it and cannot be told from the best, best first; the best
 *     alone where none explains it
 */
public record ChangeExplanation(
    boolean explained,
    List<ChangeSubset> subsets) {
  /** Copies the lists. */
  public ChangeExplanation {
    subsets = List.copyOf(subsets);
  }
}
