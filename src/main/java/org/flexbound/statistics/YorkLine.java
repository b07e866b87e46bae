package org.flexbound.statistics;

/**
 * A straight line with errors in both variables (York, Evensen, Martínez &amp; De Basabe Delgado
 * 2004, Am. J. Phys. 72:367, equation 13), errors of x and y uncorrelated.
 *
 * @param intercept at x = 0
 * @param slope the slope
 * @param interceptStandardError from the stated weights
 * @param slopeStandardError from the stated weights
 * @param sumOfSquares the weighted sum of squares, χ² with n − 2 degrees of freedom
 * @param iterations how many were needed
 */
public record YorkLine(
    double intercept,
    double slope,
    double interceptStandardError,
    double slopeStandardError,
    double sumOfSquares,
    int iterations) {
  /** The slope is repeated until it moves by less than this share of itself. */
  private static final double TOLERANCE = 1e-15;

  private static final int MOST_ITERATIONS = 200;

  /**
   * Fits.
   *
   * @param x abscissae
   * @param y ordinates
   * @param weightX 1/variance of each x
   * @param weightY 1/variance of each y
   * @return the line
   */
  public static YorkLine fit(double[] x, double[] y, double[] weightX, double[] weightY) {
    double slope = GroupedLine.fit(x, y, new int[x.length]).slope();
    double[] w = new double[x.length];
    double[] beta = new double[x.length];
    double xBar = 0;
    double yBar = 0;
    int iterations = 0;
    double moved = Double.POSITIVE_INFINITY;
    while (iterations < MOST_ITERATIONS && moved > TOLERANCE * Math.abs(slope)) {
      double sumW = 0;
      xBar = 0;
      yBar = 0;
      for (int i = 0; i < x.length; i++) {
        w[i] = weightX[i] * weightY[i] / (weightX[i] + slope * slope * weightY[i]);
        sumW += w[i];
        xBar += w[i] * x[i];
        yBar += w[i] * y[i];
      }
      xBar /= sumW;
      yBar /= sumW;
      double above = 0;
      double below = 0;
      for (int i = 0; i < x.length; i++) {
        double u = x[i] - xBar;
        double v = y[i] - yBar;
        beta[i] = w[i] * (u / weightY[i] + slope * v / weightX[i]);
        above += w[i] * beta[i] * v;
        below += w[i] * beta[i] * u;
      }
      double next = above / below;
      moved = Math.abs(next - slope);
      slope = next;
      iterations++;
    }
    double sumW = 0;
    double xAdjusted = 0;
    for (int i = 0; i < x.length; i++) {
      sumW += w[i];
      xAdjusted += w[i] * (xBar + beta[i]);
    }
    xAdjusted /= sumW;
    double spread = 0;
    double sum = 0;
    double intercept = yBar - slope * xBar;
    for (int i = 0; i < x.length; i++) {
      double u = xBar + beta[i] - xAdjusted;
      spread += w[i] * u * u;
      double residual = y[i] - intercept - slope * x[i];
      sum += w[i] * residual * residual;
    }
    double slopeVariance = 1 / spread;
    return new YorkLine(
        intercept,
        slope,
        Math.sqrt(1 / sumW + xAdjusted * xAdjusted * slopeVariance),
        Math.sqrt(slopeVariance),
        sum,
        iterations);
  }
}
