package org.flexbound.statistics;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * A straight line with errors in both variables (York, Evensen, Martínez &amp; De Basabe Delgado
 * 2004, Am. J. Phys. 72:367, equation 13), errors of x and y uncorrelated; with one slope and an
 * intercept for each group of points, whose weighted means take the place of the common ones.
 *
 * @param slope the slope
 * @param slopeStandardError from the stated weights
 * @param intercepts group to intercept at x = 0
 * @param interceptStandardErrors group to standard error from the stated weights
 * @param sumOfSquares the weighted sum of squares, χ² with points less groups less one degrees of freedom
 * @param iterations how many were needed
 */
public record YorkLine(
    double slope,
    double slopeStandardError,
    Map<Integer, Double> intercepts,
    Map<Integer, Double> interceptStandardErrors,
    double sumOfSquares,
    int iterations) {
  /** The slope is repeated until it moves by less than this share of itself. */
  private static final double TOLERANCE = 1e-15;

  private static final int MOST_ITERATIONS = 200;

  /** Copies the maps. */
  public YorkLine {
    intercepts = Collections.unmodifiableMap(new LinkedHashMap<>(intercepts));
    interceptStandardErrors = Collections.unmodifiableMap(new LinkedHashMap<>(interceptStandardErrors));
  }

  /**
   * Fits one line.
   *
   * @param x abscissae
   * @param y ordinates
   * @param weightX 1/variance of each x
   * @param weightY 1/variance of each y
   * @return the line, its points in group 0
   */
  public static YorkLine fit(double[] x, double[] y, double[] weightX, double[] weightY) {
    return fit(x, y, weightX, weightY, new int[x.length]);
  }

  /**
   * Fits lines of one slope.
   *
   * @param x abscissae
   * @param y ordinates
   * @param weightX 1/variance of each x; infinite where x is exact
   * @param weightY 1/variance of each y, finite
   * @param group the group of each point
   * @return the lines
   * @throws Regression.DependentColumns where no group has two different abscissae
   * @throws IllegalArgumentException where there are fewer points than unknowns
   */
  public static YorkLine fit(double[] x, double[] y, double[] weightX, double[] weightY, int[] group) {
    double slope = GroupedLine.fit(x, y, group).slope();
    double[] w = new double[x.length];
    double[] beta = new double[x.length];
    Map<Integer, Mean> means = Map.of();
    int iterations = 0;
    double moved = Double.POSITIVE_INFINITY;
    while (iterations < MOST_ITERATIONS && moved > TOLERANCE * Math.abs(slope)) {
      for (int i = 0; i < x.length; i++) {
        w[i] = 1 / (1 / weightY[i] + slope * slope / weightX[i]);
      }
      means = means(x, y, w, group);
      double above = 0;
      double below = 0;
      for (int i = 0; i < x.length; i++) {
        Mean mean = of(means, group[i]);
        double u = x[i] - mean.x;
        double v = y[i] - mean.y;
        beta[i] = w[i] * (u / weightY[i] + slope * v / weightX[i]);
        above += w[i] * beta[i] * v;
        below += w[i] * beta[i] * u;
      }
      double next = above / below;
      moved = Math.abs(next - slope);
      slope = next;
      iterations++;
    }
    return errors(x, y, w, beta, group, means, slope, iterations);
  }

  /** Standard errors at the adjusted points (York et al. 2004, equations 13d to 13f). */
  private static YorkLine errors(
      double[] x, double[] y, double[] w, double[] beta, int[] group, Map<Integer, Mean> means, double slope, int iterations) {
    double[] adjusted = new double[x.length];
    for (int i = 0; i < x.length; i++) {
      adjusted[i] = of(means, group[i]).x + beta[i];
    }
    Map<Integer, Mean> adjustedMeans = means(adjusted, y, w, group);
    double spread = 0;
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      Mean mean = of(means, group[i]);
      double u = adjusted[i] - of(adjustedMeans, group[i]).x;
      spread += w[i] * u * u;
      double residual = y[i] - mean.y - slope * (x[i] - mean.x);
      sum += w[i] * residual * residual;
    }
    double slopeVariance = 1 / spread;
    Map<Integer, Double> intercepts = new LinkedHashMap<>();
    Map<Integer, Double> interceptErrors = new LinkedHashMap<>();
    for (Map.Entry<Integer, Mean> entry : means.entrySet()) {
      Mean mean = entry.getValue();
      double at = of(adjustedMeans, entry.getKey()).x;
      intercepts.put(entry.getKey(), mean.y - slope * mean.x);
      interceptErrors.put(entry.getKey(), Math.sqrt(1 / mean.weight + at * at * slopeVariance));
    }
    return new YorkLine(slope, Math.sqrt(slopeVariance), intercepts, interceptErrors, sum, iterations);
  }

  private static final class Mean {
    private double weight;
    private double x;
    private double y;

    void add(double w, double atX, double atY) {
      weight += w;
      x += w / weight * (atX - x);
      y += w / weight * (atY - y);
    }
  }

  private static Mean of(Map<Integer, Mean> means, int group) {
    Mean mean = means.get(group);
    if (mean == null) {
      throw new IllegalStateException("no mean of group " + group);
    }
    return mean;
  }

  private static Map<Integer, Mean> means(double[] x, double[] y, double[] w, int[] group) {
    Map<Integer, Mean> means = new LinkedHashMap<>();
    for (int i = 0; i < x.length; i++) {
      means.computeIfAbsent(group[i], key -> new Mean()).add(w[i], x[i], y[i]);
    }
    return means;
  }
}
