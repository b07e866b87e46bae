package org.flexbound.report.results;

import java.util.List;

/**
 * A source of error that several coefficients share: one vector of the covariance.
 *
 * @param key what makes it the same source elsewhere: instrument and calibration
 * @param description for the reader
 * @param priorUncertainty standard uncertainty (k = 1), relative
 * @param effect what one standard uncertainty of it changes in each coefficient, SI; in the
 *     order of the coefficients of this configuration
 */
public record SharedFactor(
    String key,
    String description,
    double priorUncertainty,
    List<Double> effect) {
  /** Copies the lists. */
  public SharedFactor {
    effect = List.copyOf(effect);
  }
}
