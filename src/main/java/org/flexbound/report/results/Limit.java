package org.flexbound.report.results;

/**
 * An acceptance limit and its decision.
 *
 * @param name what is limited
 * @param value the measured value, SI
 * @param standardUncertainty its standard uncertainty
 * @param limit the limit, SI
 * @param unit the SI unit
 * @param decision pass, fail or undecided
 */
public record Limit(
    String name,
    double value,
    double standardUncertainty,
    double limit,
    String unit,
    String decision) {}
