package org.flexbound.report.results;

import java.util.List;

/**
 * One fitted coefficient: how well it fits.
 *
 * @param configuration the configuration
 * @param gauge the gauge
 * @param load the load
 * @param fitted by the updated model with the fitted gains, SI
 * @param leverage diagonal of the hat matrix, 0 to 1
 * @param studentisedResidual externally studentised under the full covariance
 * @param outlying whether it exceeds its limit
 * @param influence for each parameter, how far leaving the coefficient out would move the
 *     estimate, in posterior standard deviations
 */
public record Fit(
    String configuration,
    String gauge,
    String load,
    double fitted,
    double leverage,
    double studentisedResidual,
    boolean outlying,
    List<Double> influence) {
  /** Copies the lists. */
  public Fit {
    influence = List.copyOf(influence);
  }
}
