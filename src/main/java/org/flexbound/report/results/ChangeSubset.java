package org.flexbound.report.results;

import java.util.List;

/**
 * Some parameters with the change that explains most.
 *
 * @param parameters the parameters with their factors
 * @param misfit what is left of the statistic
 * @param limit what chance explains at 95 %
 * @param degreesOfFreedom degrees of freedom of what is left
 */
public record ChangeSubset(
    List<ParameterChange> parameters,
    double misfit,
    double limit,
    int degreesOfFreedom) {
  /** Copies the lists. */
  public ChangeSubset {
    parameters = List.copyOf(parameters);
  }
}
