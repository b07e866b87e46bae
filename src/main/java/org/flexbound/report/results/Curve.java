package org.flexbound.report.results;

import java.util.List;

/**
 * The load-deflection curve of one gauge in one run.
 *
 * @param configuration the configuration
 * @param run the run
 * @param gauge the gauge
 * @param load the load
 * @param loadUnit the SI unit of the load: N or N·m
 * @param motionUnit the SI unit of the motion: m, rad, or 1 for a strain
 * @param slope fitted motion per unit load, SI
 * @param slopeUncertainty standard uncertainty of the slope from its own residuals
 * @param lines the fitted lines: the slope with an intercept for each branch and cycle
 * @param fitFrom lower end of the fit range, in loadUnit
 * @param fitTo upper end of the fit range, in loadUnit
 * @param points the load steps in order
 */
public record Curve(
    String configuration,
    String run,
    String gauge,
    String load,
    String loadUnit,
    String motionUnit,
    double slope,
    double slopeUncertainty,
    List<Line> lines,
    double fitFrom,
    double fitTo,
    List<CurvePoint> points) {
  /** Copies the lists. */
  public Curve {
    lines = List.copyOf(lines);
    points = List.copyOf(points);
  }
}
