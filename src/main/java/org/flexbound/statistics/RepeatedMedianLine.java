package org.flexbound.statistics;

import java.util.Arrays;

/**
 * A straight line that half of the points cannot spoil: slope the median over points of the median
 * slope to all others (Siegel 1982, Biometrika 69:242), intercept the median of what is left. Points
 * next to each other say nothing of the slope and are not joined.
 *
 * @param intercept at x = 0
 * @param slope the slope; NaN with fewer than two different abscissae
 * @param scale 1.4826 times the median distance from the line: the standard deviation of normal
 *     scatter
 */
public record RepeatedMedianLine(double intercept, double slope, double scale) {
  /** More points than this are thinned evenly: the medians move by less than the scatter. */
  private static final int MOST = 400;

  private static final double NORMAL = 1.4826;

  /** Points are joined where they are apart by this share of the abscissae's range. */
  private static final double APART = 0.1;

  /**
   * Fits.
   *
   * @param x abscissae
   * @param y ordinates
   * @return the line
   */
  public static RepeatedMedianLine fit(double[] x, double[] y) {
    int stride = (x.length + MOST - 1) / MOST;
    int n = stride == 0 ? 0 : (x.length + stride - 1) / stride;
    double range =
        Arrays.stream(x).max().orElse(0) - Arrays.stream(x).min().orElse(0);
    double[] slopes = new double[n];
    int lines = 0;
    for (int i = 0; i < n; i++) {
      double[] own = new double[n];
      int count = 0;
      for (int j = 0; j < n; j++) {
        double apart = x[j * stride] - x[i * stride];
        if (Math.abs(apart) > APART * range) {
          own[count++] = (y[j * stride] - y[i * stride]) / apart;
        }
      }
      if (count > 0) {
        slopes[lines++] = median(Arrays.copyOf(own, count));
      }
    }
    double slope = median(Arrays.copyOf(slopes, lines));
    double[] rest = new double[x.length];
    for (int k = 0; k < x.length; k++) {
      rest[k] = y[k] - slope * x[k];
    }
    double intercept = median(rest.clone());
    for (int k = 0; k < x.length; k++) {
      rest[k] = Math.abs(rest[k] - intercept);
    }
    return new RepeatedMedianLine(intercept, slope, NORMAL * median(rest));
  }

  /**
   * The median.
   *
   * @param values some numbers
   * @return the middle one, or the mean of the two in the middle; NaN of none
   */
  public static double median(double[] values) {
    double[] sorted = values.clone();
    Arrays.sort(sorted);
    int n = sorted.length;
    return n == 0 ? Double.NaN : 0.5 * (sorted[(n - 1) / 2] + sorted[n / 2]);
  }

  /**
   * The line at an abscissa.
   *
   * @param x the abscissa
   * @return intercept + slope · x
   */
  public double at(double x) {
    return intercept + slope * x;
  }
}
