package org.flexbound.report.results;

/**
 * A rule or an option that was in force.
 *
 * @param name the option
 * @param value its value, as one would say it
 * @param source where it was stated, or default
 */
public record Option(
    String name,
    String value,
    String source) {}
