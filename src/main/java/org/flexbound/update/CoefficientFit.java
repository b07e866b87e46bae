package org.flexbound.update;

import java.util.List;

/**
 * One fitted coefficient: how well it fits, and what it pulls.
 *
 * @param configuration the configuration
 * @param gauge the gauge
 * @param load the load
 * @param measured as measured, SI
 * @param fitted by the updated model with the fitted gains, at the point shown
 * @param updatedModel by the updated model alone, at the point shown
 * @param leverage diagonal of the hat matrix at μ = 1, 0 to 1
 * @param studentisedResidual externally studentised under the full covariance
 * @param outlying whether it exceeds the Šidák limit
 * @param influence for each parameter, how far leaving the coefficient out would move the μ = 1
 *     estimate, in posterior standard deviations
 */
public record CoefficientFit(
    String configuration,
    String gauge,
    String load,
    double measured,
    double fitted,
    double updatedModel,
    double leverage,
    double studentisedResidual,
    boolean outlying,
    List<Double> influence) {
  /** Copies the list. */
  public CoefficientFit {
    influence = List.copyOf(influence);
  }
}
