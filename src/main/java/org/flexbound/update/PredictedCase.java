package org.flexbound.update;

import java.util.List;

/**
 * A load case that was predicted, not fitted; intervals conditioned on the gains and the scatter that
 * it shares with the fitted ones.
 *
 * @param configuration its configuration
 * @param load its load
 * @param coefficients its coefficients
 * @param misfit sum of squares of the prediction errors under their covariance
 * @param limit the 95 % quantile for it
 */
public record PredictedCase(
    String configuration,
    String load,
    List<PredictedCoefficient> coefficients,
    double misfit,
    double limit) {
  /** Copies the list. */
  public PredictedCase {
    coefficients = List.copyOf(coefficients);
  }

  /**
   * Whether the prediction agrees with the measurement.
   *
   * @return true if the misfit stays within its limit
   */
  public boolean agrees() {
    return misfit <= limit;
  }

  /**
   * One predicted coefficient.
   *
   * @param gauge the gauge
   * @param measured as measured, SI
   * @param predicted what the reading should have been, SI
   * @param standardUncertainty of the difference, SI
   * @param lower95 lower end of the 95 % prediction interval
   * @param upper95 upper end
   */
  public record PredictedCoefficient(
      String gauge,
      double measured,
      double predicted,
      double standardUncertainty,
      double lower95,
      double upper95) {}
}
