package org.flexbound.update;

import java.util.Map;
import java.util.TreeMap;

/** A 95 % interval in scaled unknowns. */
record Interval(double low, double high) {
  private static final int CELLS = 800;

  /** Quantiles of the posterior cut off at all bounds. */
  static Interval of(TruncatedPosterior posterior, int parameter) {
    return new Interval(
        posterior.quantile(parameter, 0.025), posterior.quantile(parameter, 0.975));
  }

  /**
   * Quantiles of the density exp(−(profile + own prior) + log volume) within the bounds, for a
   * profile that is not parabolic.
   *
   * @param traced the profile
   * @param scatterFactor what Student's t makes of the scatter's variances
   */
  static Interval of(ProfileTracer.Traced traced, double scatterFactor) {
    return new Interval(
        quantile(traced, scatterFactor, 0.025), quantile(traced, scatterFactor, 0.975));
  }

  /** One quantile of that density. */
  static double quantile(ProfileTracer.Traced traced, double scatterFactor, double probability) {
    TreeMap<Double, Double> logDensity = new TreeMap<>();
    double highest = Double.NEGATIVE_INFINITY;
    for (Map.Entry<Double, Double> point : traced.curve().entrySet()) {
      double at = point.getKey();
      Double volume = traced.logVolume().get(at);
      double value =
          -point.getValue() / scatterFactor - 0.5 * at * at + (volume == null ? 0 : volume);
      logDensity.put(at, value);
      highest = Math.max(highest, value);
    }
    double from = logDensity.firstKey();
    double to = logDensity.lastKey();
    double[] sums = new double[CELLS + 1];
    double step = (to - from) / CELLS;
    for (int i = 0; i < CELLS; i++) {
      double middle = from + (i + 0.5) * step;
      sums[i + 1] = sums[i] + Math.exp(between(logDensity, middle) - highest);
    }
    return from + step * place(sums, probability);
  }

  private static double place(double[] sums, double share) {
    double wanted = share * sums[CELLS];
    int cell = 0;
    while (cell < CELLS - 1 && sums[cell + 1] < wanted) {
      cell++;
    }
    double width = sums[cell + 1] - sums[cell];
    return cell + (width > 0 ? (wanted - sums[cell]) / width : 0.5);
  }

  private static double between(TreeMap<Double, Double> points, double at) {
    Map.Entry<Double, Double> low = points.floorEntry(at);
    Map.Entry<Double, Double> high = points.ceilingEntry(at);
    if (low == null) {
      return high == null ? 0 : high.getValue();
    }
    if (high == null || high.getKey().equals(low.getKey())) {
      return low.getValue();
    }
    double share = (at - low.getKey()) / (high.getKey() - low.getKey());
    return low.getValue() + share * (high.getValue() - low.getValue());
  }

  /** Widened about a point, and kept within bounds. */
  Interval widened(double about, double factor, double lower, double upper) {
    double newLow = about - factor * (about - low);
    double newHigh = about + factor * (high - about);
    return new Interval(
        Math.max(Math.min(newLow, low), lower), Math.min(Math.max(newHigh, high), upper));
  }
}
