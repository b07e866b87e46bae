package org.flexbound.report.results;

import java.util.List;

/**
 * The part of the misfit that no parameter, gain or bound can reach.
 *
 * @param misfit the misfit of the best fit within the bounds
 * @param degreesOfFreedom its degrees of freedom
 * @param correctionSize size of the smallest correction of the flexibility matrix itself that would
 *     bring the misfit to its limit, as a share of the matrix (whitened): a yardstick without
 *     physical meaning
 * @param worst the coefficients that are missed most, worst first
 */
public record Unexplained(
    double misfit,
    double degreesOfFreedom,
    double correctionSize,
    List<String> worst) {
  /** Copies the list. */
  public Unexplained {
    worst = List.copyOf(worst);
  }
}
