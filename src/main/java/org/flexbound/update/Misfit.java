package org.flexbound.update;

/**
 * The sum of squares of the whitened residuals and gains at one point, against what it may be.
 *
 * @param value the misfit, gains at their best
 * @param degreesOfFreedom number of coefficients less the effective number of parameters
 * @param limit the 95 % quantile: of χ², or of F where the scatter is estimated
 * @param worstCase the load case with the largest whitened residual, as {@code configuration: load}
 * @param worstResidual that residual's size
 * @param residualLimit what it may be (Šidák)
 */
public record Misfit(
    double value,
    double degreesOfFreedom,
    double limit,
    String worstCase,
    double worstResidual,
    double residualLimit) {
  /**
   * Whether the point agrees with the data.
   *
   * @return true if misfit and residuals stay within their limits
   */
  public boolean agrees() {
    return value <= limit && worstResidual <= residualLimit;
  }
}
