package org.flexbound.report.results;

/**
 * A source of uncertainty with its share.
 *
 * @param source what it is
 * @param share its share of the variance, 0 to 1
 */
public record UncertaintyShare(
    String source,
    double share) {}
