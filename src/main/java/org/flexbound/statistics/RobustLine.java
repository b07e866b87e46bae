package org.flexbound.statistics;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A straight line with one slope and an intercept for each group, which outlying points move little: an MM estimate (Maronna, Martin &amp;
 * Yohai, Robust Statistics, 2006, 5.5) that starts at the median of the slopes between points of a group (Theil 1950; Sen 1968, J. Am. Stat.
 * Assoc. 63:1379), takes its scale from the median of the residuals there, and ends in Tukey's bisquare with 95 % efficiency at the normal.
 *
 * @param slope the slope
 * @param slopeStandardError Huber, Robust Statistics, 1981, 7.6; NaN without degrees of freedom
 * @param intercepts group to intercept at x = 0
 * @param weights 0 to 1, the weight that each point has at the end
 */
public record RobustLine(double slope, double slopeStandardError, Map<Integer, Double> intercepts, List<Double> weights) {
  /** Bisquare: 95 % efficiency at the normal (Maronna et al. 2006, table 2.1). */
  private static final double TUNING = 4.685;

  /** Median of |normal|. */
  private static final double MEDIAN_OF_NORMAL = 0.6744897501960817;

  private static final int MOST_ITERATIONS = 500;

  /** Copies. */
  public RobustLine {
    intercepts = Collections.unmodifiableMap(new LinkedHashMap<>(intercepts));
    weights = List.copyOf(weights);
  }

  /**
   * Fits.
   *
   * @param x abscissae
   * @param y ordinates
   * @param group the group of each point
   * @return the line
   * @throws Regression.DependentColumns where no group has two different abscissae
   * @throws IllegalArgumentException where there are fewer points than unknowns
   */
  public static RobustLine fit(double[] x, double[] y, int[] group) {
    GroupedLine ordinary = GroupedLine.fit(x, y, group);
    int n = x.length;
    double slope = medianSlope(x, y, group, ordinary.slope());
    Map<Integer, Double> intercepts = medians(x, y, group, slope);
    double[] residuals = residuals(x, y, group, slope, intercepts);
    int unknowns = intercepts.size() + 1;
    double scale = scale(residuals, unknowns);
    double[] weights = new double[n];
    Arrays.fill(weights, 1);
    double moved = Double.POSITIVE_INFINITY;
    for (int pass = 0; pass < MOST_ITERATIONS && scale > 0 && moved > 1e-14 * Math.abs(slope); pass++) {
      for (int i = 0; i < n; i++) {
        double u = residuals[i] / (TUNING * scale);
        weights[i] = Math.abs(u) < 1 ? (1 - u * u) * (1 - u * u) : 0;
      }
      double[] next = weighted(x, y, group, weights, intercepts);
      if (Double.isNaN(next[0])) {
        break;
      }
      moved = Math.abs(next[0] - slope);
      slope = next[0];
      residuals = residuals(x, y, group, slope, intercepts);
    }
    List<Double> kept = new ArrayList<>();
    for (double weight : weights) {
      kept.add(weight);
    }
    return new RobustLine(slope, standardError(x, group, residuals, scale, unknowns), intercepts, kept);
  }

  /** One step of weighted least squares; the intercepts are replaced. */
  private static double[] weighted(double[] x, double[] y, int[] group, double[] weights, Map<Integer, Double> intercepts) {
    Map<Integer, double[]> sums = new LinkedHashMap<>();
    for (int i = 0; i < x.length; i++) {
      double[] sum = sums.computeIfAbsent(group[i], key -> new double[3]);
      sum[0] += weights[i];
      sum[1] += weights[i] * x[i];
      sum[2] += weights[i] * y[i];
    }
    double above = 0;
    double below = 0;
    for (int i = 0; i < x.length; i++) {
      double[] sum = sums.getOrDefault(group[i], new double[3]);
      if (sum[0] > 0) {
        double u = x[i] - sum[1] / sum[0];
        above += weights[i] * u * (y[i] - sum[2] / sum[0]);
        below += weights[i] * u * u;
      }
    }
    if (!(below > 0)) {
      return new double[] {Double.NaN};
    }
    double slope = above / below;
    sums.forEach((key, sum) -> {
      if (sum[0] > 0) {
        intercepts.put(key, (sum[2] - slope * sum[1]) / sum[0]);
      }
    });
    return new double[] {slope};
  }

  private static double medianSlope(double[] x, double[] y, int[] group, double otherwise) {
    List<Double> slopes = new ArrayList<>();
    for (int i = 0; i < x.length; i++) {
      for (int j = i + 1; j < x.length; j++) {
        if (group[i] == group[j] && x[i] != x[j]) {
          slopes.add((y[j] - y[i]) / (x[j] - x[i]));
        }
      }
    }
    return slopes.isEmpty() ? otherwise : median(slopes.stream().mapToDouble(Double::doubleValue).toArray());
  }

  private static Map<Integer, Double> medians(double[] x, double[] y, int[] group, double slope) {
    Map<Integer, List<Double>> left = new LinkedHashMap<>();
    for (int i = 0; i < x.length; i++) {
      left.computeIfAbsent(group[i], key -> new ArrayList<>()).add(y[i] - slope * x[i]);
    }
    Map<Integer, Double> medians = new LinkedHashMap<>();
    left.forEach((key, values) -> medians.put(key, median(values.stream().mapToDouble(Double::doubleValue).toArray())));
    return medians;
  }

  private static double[] residuals(double[] x, double[] y, int[] group, double slope, Map<Integer, Double> intercepts) {
    double[] residuals = new double[x.length];
    for (int i = 0; i < x.length; i++) {
      residuals[i] = y[i] - slope * x[i] - intercepts.getOrDefault(group[i], 0.0);
    }
    return residuals;
  }

  /** Median of the larger residuals, those that the unknowns could have made nought left out, in units of the normal. */
  private static double scale(double[] residuals, int unknowns) {
    double[] sizes = Arrays.stream(residuals).map(Math::abs).sorted().toArray();
    int from = Math.min(unknowns - 1, sizes.length - 1);
    return median(Arrays.copyOfRange(sizes, from, sizes.length)) / MEDIAN_OF_NORMAL;
  }

  private static double standardError(double[] x, int[] group, double[] residuals, double scale, int unknowns) {
    int n = x.length;
    if (n <= unknowns) {
      return Double.NaN;
    }
    double squares = 0;
    double derivative = 0;
    for (double residual : residuals) {
      double u = scale > 0 ? residual / (TUNING * scale) : residual == 0 ? 0 : 2;
      if (Math.abs(u) < 1) {
        double psi = residual * (1 - u * u) * (1 - u * u);
        squares += psi * psi;
        derivative += (1 - u * u) * (1 - 5 * u * u);
      }
    }
    Map<Integer, double[]> sums = new LinkedHashMap<>();
    for (int i = 0; i < n; i++) {
      double[] sum = sums.computeIfAbsent(group[i], key -> new double[3]);
      sum[0]++;
      sum[1] += x[i];
      sum[2] += x[i] * x[i];
    }
    double spread = 0;
    for (double[] sum : sums.values()) {
      spread += sum[2] - sum[1] * sum[1] / sum[0];
    }
    double mean = derivative / n;
    return Math.sqrt(squares / (n - unknowns)) / (Math.abs(mean) * Math.sqrt(spread));
  }

  private static double median(double[] values) {
    double[] sorted = values.clone();
    Arrays.sort(sorted);
    int n = sorted.length;
    return n % 2 == 1 ? sorted[n / 2] : 0.5 * (sorted[n / 2 - 1] + sorted[n / 2]);
  }
}
