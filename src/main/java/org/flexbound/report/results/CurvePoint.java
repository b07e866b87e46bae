package org.flexbound.report.results;

/**
 * A load step of a load-deflection curve.
 *
 * @param load mean load of the step, N or N·m
 * @param motion mean motion of the step from the tare, SI
 * @param branch loading or unloading
 * @param cycle the load cycle, from 1
 * @param used whether it went into the fit
 * @param residual motion less the fitted line, SI
 * @param where its cells
 */
public record CurvePoint(
    double load,
    double motion,
    String branch,
    int cycle,
    boolean used,
    double residual,
    String where) {}
