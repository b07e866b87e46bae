package org.flexbound.reduce;

import java.util.Map;
import org.flexbound.setup.SlopeFit;
import org.flexbound.statistics.GroupedLine;
import org.flexbound.statistics.RobustLine;
import org.flexbound.statistics.YorkLine;

/**
 * Fits the slope of one run the way that was asked for.
 *
 * <p>Random variances of steps come from the scatter of readings while the load was held, pooled over the run, and from resolution. By itself
 * the program takes ordinary least squares, unless the load's random error would bias them (by −slope · n · variance of the load / spread of the
 * loads) by more than a tenth of the slope's standard error: then both variables have errors.
 */
final class SlopeFitter {
  /** A bias of so many standard errors matters. */
  private static final double MATTERS = 0.1;

  private final double[] x;
  private final double[] y;
  private final int[] branch;
  private final double[] varianceX;
  private final double[] varianceY;
  private final GroupedLine ordinary;

  /**
   * A slope.
   *
   * @param how the fit that was used
   * @param slope motion per load
   * @param standardError NaN without degrees of freedom
   * @param intercepts branch to motion at no load
   */
  record Fit(SlopeFit how, double slope, double standardError, Map<Integer, Double> intercepts) {}

  /**
   * Steps to fit.
   *
   * @param x loads
   * @param y motions
   * @param branch branches
   * @param varianceX random variance of each load
   * @param varianceY random variance of each motion
   * @param ordinary their ordinary least squares
   */
  SlopeFitter(double[] x, double[] y, int[] branch, double[] varianceX, double[] varianceY, GroupedLine ordinary) {
    this.x = x.clone();
    this.y = y.clone();
    this.branch = branch.clone();
    this.varianceX = varianceX.clone();
    this.varianceY = varianceY.clone();
    this.ordinary = ordinary;
  }

  Fit fit(SlopeFit asked) {
    return switch (asked) {
      case ROBUST -> robust();
      case WEIGHTED -> weighted();
      case BOTH_VARIABLES -> both();
      case ORDINARY -> ordinary();
      case AUTOMATIC -> loadMatters() ? both() : ordinary();
    };
  }

  private Fit ordinary() {
    return new Fit(SlopeFit.ORDINARY, ordinary.slope(), ordinary.slopeStandardError(), ordinary.intercepts());
  }

  private Fit robust() {
    RobustLine line = RobustLine.fit(x, y, branch);
    return new Fit(SlopeFit.ROBUST, line.slope(), line.slopeStandardError(), line.intercepts());
  }

  private boolean loadMatters() {
    double error = ordinary.slopeStandardError();
    double spread = ordinary.spread();
    double bias = 0;
    for (double variance : varianceX) {
      bias += Math.abs(ordinary.slope()) * variance / spread;
    }
    return error > 0 && bias > MATTERS * error;
  }

  /** Motions weighted by their own variances; where those explain too little, the standard error is widened (Birge 1932). */
  private Fit weighted() {
    double[] weightX = new double[x.length];
    double[] weightY = new double[x.length];
    for (int k = 0; k < x.length; k++) {
      weightX[k] = Double.POSITIVE_INFINITY;
      weightY[k] = 1 / varianceY[k];
      if (!(varianceY[k] > 0)) {
        return ordinary();
      }
    }
    return widened(SlopeFit.WEIGHTED, YorkLine.fit(x, y, weightX, weightY, branch));
  }

  private Fit both() {
    double residual = ordinary.regression().residualStandardDeviation();
    double[] weightX = new double[x.length];
    double[] weightY = new double[x.length];
    boolean any = false;
    for (int k = 0; k < x.length; k++) {
      double ofLoad = ordinary.slope() * ordinary.slope() * varianceX[k];
      double ofMotion = Double.isNaN(residual) ? varianceY[k] : Math.max(varianceY[k], residual * residual - ofLoad);
      any |= varianceX[k] > 0;
      weightX[k] = 1 / varianceX[k];
      weightY[k] = 1 / ofMotion;
      if (!(ofMotion > 0)) {
        return ordinary();
      }
    }
    return any ? widened(SlopeFit.BOTH_VARIABLES, YorkLine.fit(x, y, weightX, weightY, branch)) : ordinary();
  }

  private Fit widened(SlopeFit how, YorkLine line) {
    int degrees = ordinary.regression().degreesOfFreedom();
    double ratio = degrees > 0 ? Math.sqrt(Math.max(1, line.sumOfSquares() / degrees)) : Double.NaN;
    return new Fit(how, line.slope(), ratio * line.slopeStandardError(), line.intercepts());
  }
}
