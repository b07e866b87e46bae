package org.flexbound.report.results;

/**
 * One term of the base-motion operator.
 *
 * @param gauge the gauge
 * @param load the load
 * @param weight what the absolute coefficient is multiplied with
 */
public record Term(
    String gauge,
    String load,
    double weight) {}
