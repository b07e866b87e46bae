package org.flexbound.acceptance;

import org.flexbound.statistics.Quantiles;

/**
 * Differences taken together: dᵀ V⁺ d, with directions in which V says nothing left out.
 *
 * @param statistic dᵀ V⁺ d
 * @param rank the number of directions
 */
record JointSquares(double statistic, int rank) {
  static JointSquares of(double[] differences, double[][] covariance) {
    Whitening whitening = new Whitening(covariance);
    return new JointSquares(whitening.squares(differences), whitening.rank());
  }

  /** The probability of so large a sum by chance: F, or χ² where the scatter is stated. */
  double probability(double scatterDegreesOfFreedom) {
    return rank == 0 ? 1 : Quantiles.fTail(statistic / rank, rank, scatterDegreesOfFreedom);
  }
}
