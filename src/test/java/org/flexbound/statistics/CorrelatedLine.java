package org.flexbound.statistics;

import org.hipparchus.linear.LUDecomposition;
import org.hipparchus.linear.MatrixUtils;
import org.hipparchus.linear.RealMatrix;

/**
 * A straight line through points whose errors are all correlated with each other, by generalised distance regression (ISO/TS 28037:2010, clause
 * 10): Gauss-Newton over the true abscissae, intercept and slope. A reference for the fits of the program: slow, and sharing no line with them.
 *
 * @param intercept at x = 0
 * @param slope the slope
 * @param covariance of intercept and slope
 * @param sumOfSquares the generalised sum of squares
 */
record CorrelatedLine(double intercept, double slope, RealMatrix covariance, double sumOfSquares) {
  /**
   * Fits.
   *
   * @param x abscissae
   * @param y ordinates
   * @param errors covariance of all abscissae, then all ordinates
   */
  static CorrelatedLine fit(double[] x, double[] y, RealMatrix errors) {
    int n = x.length;
    RealMatrix weight = MatrixUtils.inverse(errors);
    double[] at = x.clone();
    double slope = (y[n - 1] - y[0]) / (x[n - 1] - x[0]);
    double intercept = y[0] - slope * x[0];
    RealMatrix normal = MatrixUtils.createRealMatrix(n + 2, n + 2);
    RealMatrix off = MatrixUtils.createRealMatrix(2 * n, 1);
    for (int pass = 0; pass < 60; pass++) {
      RealMatrix jacobian = MatrixUtils.createRealMatrix(2 * n, n + 2);
      for (int i = 0; i < n; i++) {
        off.setEntry(i, 0, x[i] - at[i]);
        off.setEntry(n + i, 0, y[i] - intercept - slope * at[i]);
        jacobian.setEntry(i, i, 1);
        jacobian.setEntry(n + i, i, slope);
        jacobian.setEntry(n + i, n, 1);
        jacobian.setEntry(n + i, n + 1, at[i]);
      }
      normal = jacobian.transpose().multiply(weight).multiply(jacobian);
      RealMatrix step =
          new LUDecomposition(normal).getSolver().solve(jacobian.transpose().multiply(weight).multiply(off));
      for (int i = 0; i < n; i++) {
        at[i] += step.getEntry(i, 0);
      }
      intercept += step.getEntry(n, 0);
      slope += step.getEntry(n + 1, 0);
    }
    RealMatrix covariance = MatrixUtils.inverse(normal).getSubMatrix(n, n + 1, n, n + 1);
    return new CorrelatedLine(intercept, slope, covariance, off.transpose().multiply(weight).multiply(off).getEntry(0, 0));
  }
}
