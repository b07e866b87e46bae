package org.flexbound.report.results;

/**
 * A fitted line of a load-deflection curve.
 *
 * @param branch loading, unloading or both
 * @param cycle the load cycle, from 1; 0 where it serves all
 * @param intercept motion at no load, SI
 */
public record Line(
    String branch,
    int cycle,
    double intercept) {}
