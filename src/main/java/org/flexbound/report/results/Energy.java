package org.flexbound.report.results;

/**
 * The elastic energy that a run stored at its peak.
 *
 * @param configuration the configuration
 * @param run the run
 * @param energy J: half of load times motion along it, at the peak
 * @param complete false where no gauge reads along the load at its point, and the energy is
 *     left at nought
 */
public record Energy(
    String configuration,
    String run,
    double energy,
    boolean complete) {}
