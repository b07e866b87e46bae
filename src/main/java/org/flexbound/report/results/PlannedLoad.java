package org.flexbound.report.results;

/**
 * A load of a planned test.
 *
 * @param configuration the configuration
 * @param load the load
 * @param largest the largest load that is planned, N or N·m
 * @param runs how many runs of it are planned
 * @param repeatability relative standard deviation of a slope from run to run that is counted on
 * @param basis where largest load, runs and repeatability come from
 * @param unit the SI unit of the load
 */
public record PlannedLoad(
    String configuration,
    String load,
    double largest,
    int runs,
    double repeatability,
    String basis,
    String unit) {}
