package org.flexbound.report.results;

/**
 * A point of the curve of misfit against change.
 *
 * @param weight the weight of the prior
 * @param misfit the misfit
 * @param change root of the sum of the squared changes, each in prior standard deviations
 * @param effectiveParameters the effective number of parameters
 */
public record TradeOff(
    double weight,
    double misfit,
    double change,
    double effectiveParameters) {}
