package org.flexbound.report.results;

/**
 * How one configuration fits at the point shown.
 *
 * @param configuration its name
 * @param coefficients how many of its coefficients were fitted
 * @param misfit its part of the sum of squares
 * @param limit the 95 % quantile for a part of that size
 * @param agrees whether it stays within the limit
 */
public record ConfigurationFit(
    String configuration,
    int coefficients,
    double misfit,
    double limit,
    boolean agrees) {}
