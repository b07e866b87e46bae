package org.flexbound.acceptance;

import java.util.List;

/**
 * Which parameters' change explains the differences between two tests with the fewest parameters:
 * the smallest number, one and then two, for which some subset leaves no more than chance explains.
 *
 * @param subsets the subsets of that number, best first: those that explain it and cannot be told
 *     from the best; where none explains it, the best one alone
 * @param explained whether the best leaves no more than chance explains
 */
public record Explanation(List<Subset> subsets, boolean explained) {
  /** Copies the list. */
  public Explanation {
    subsets = List.copyOf(subsets);
  }

  /**
   * One subset of the parameters with its best change.
   *
   * @param parameters their names
   * @param factors by which each stiffness changed; NaN where it was rigid or free
   * @param misfit what is left of the statistic
   * @param limit what chance explains at 95 %
   * @param degreesOfFreedom of what is left
   */
  public record Subset(
      List<String> parameters,
      List<Double> factors,
      double misfit,
      double limit,
      int degreesOfFreedom) {
    /** Copies the lists. */
    public Subset {
      parameters = List.copyOf(parameters);
      factors = List.copyOf(factors);
    }
  }
}
