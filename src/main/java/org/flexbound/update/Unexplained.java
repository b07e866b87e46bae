package org.flexbound.update;

import java.util.List;

/**
 * What no parameter can explain.
 *
 * @param misfit the part of the misfit at best that lies outside of what parameters, gains and
 *     bounds can reach
 * @param degreesOfFreedom its degrees of freedom
 * @param correctionSize the size of the smallest correction of the flexibility matrix itself that
 *     would bring the misfit to its limit, as a share of the matrix (Frobenius, whitened): a yardstick
 *     without physical meaning
 * @param worst the coefficients with the largest whitened residuals, {@code configuration: gauge /
 *     load}, largest first
 */
public record Unexplained(
    double misfit, double degreesOfFreedom, double correctionSize, List<String> worst) {
  /** Copies the list. */
  public Unexplained {
    worst = List.copyOf(worst);
  }
}
