package org.flexbound.report.results;

/**
 * A test of a history.
 *
 * @param name its results file, relative to the folder
 * @param date its date
 */
public record TrendTest(
    String name,
    String date) {}
