package org.flexbound.reduce;

/**
 * A load of a test that is only planned.
 *
 * @param load the load's name
 * @param largest the largest load that is planned, N or N·m
 * @param runs how many runs of it are planned
 * @param repeatability relative standard deviation of a slope from run to run that is counted on
 * @param basis where the three come from, for the report
 */
public record PlannedLoad(
    String load, double largest, int runs, double repeatability, String basis) {}
