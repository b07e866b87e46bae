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
 * @param ofOneTest true where the error belongs to this test alone and does not cancel against
 *     another test under the same calibration
 */
public record SharedFactor(
    String key,
    String description,
    double priorUncertainty,
    List<Double> effect,
    boolean ofOneTest) {
  /** Copies the lists. */
  public SharedFactor {
    effect = List.copyOf(effect);
  }
}
