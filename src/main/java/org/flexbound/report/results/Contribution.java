package org.flexbound.report.results;

/**
 * What a part adds to a computed coefficient.
 *
 * @param configuration the configuration
 * @param gauge the gauge
 * @param load the load
 * @param part the part, as the model names it
 * @param value what it adds; the contributions to a coefficient sum to it
 * @param unit the SI unit
 */
public record Contribution(
    String configuration,
    String gauge,
    String load,
    String part,
    double value,
    String unit) {}
