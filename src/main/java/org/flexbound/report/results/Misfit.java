package org.flexbound.report.results;

/**
 * The sum of squares of the whitened residuals and gains at one point, against what it may be.
 *
 * @param value the misfit, gains at their best
 * @param degreesOfFreedom number of coefficients less the effective number of parameters
 * @param limit the 95 % quantile: of chi-squared, or of F where the scatter is estimated
 * @param worstCase the load case with the largest whitened residual
 * @param worstResidual the size of that residual
 * @param residualLimit what it may be
 * @param agrees whether misfit and residuals stay within their limits
 */
public record Misfit(
    double value,
    double degreesOfFreedom,
    double limit,
    String worstCase,
    double worstResidual,
    double residualLimit,
    boolean agrees) {}
