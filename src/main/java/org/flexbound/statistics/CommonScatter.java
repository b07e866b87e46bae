package org.flexbound.statistics;

import java.util.List;

/**
 * A relative error that all series of a set share in one repeat: several gauges read under the same load in the same run all come out too large
 * together when that run's load was read too small.
 *
 * <p>Estimated by the products of deviations of different series in one repeat, whose mean is the common variance (the moment estimate of a
 * variance component; Searle, Casella &amp; McCulloch, Variance Components, 1992, ch. 4), each series weighted by its squared value over its
 * variance.
 *
 * @param variance relative variance common to the series of a repeat; 0 unless it stands out from what independent series show
 * @param upper the estimate and one standard error more, not below 0: how large it may well be, seen or not
 * @param degreesOfFreedom repeats less one, summed over the sets
 */
public record CommonScatter(double variance, double upper, double degreesOfFreedom) {
  /** An estimate below this many standard errors is not told from none. */
  private static final double SEEN = 2;

  /** Series that were repeated together. */
  public static final class RepeatedTogether {
    private final double[][] values;
    private final double[] variances;

    /**
     * Copies.
     *
     * @param values repeats × series; NaN where a series was not repeated
     * @param variances the variance of one repeat of each series, above 0
     */
    public RepeatedTogether(double[][] values, double[] variances) {
      this.values = new double[values.length][];
      for (int r = 0; r < values.length; r++) {
        this.values[r] = values[r].clone();
      }
      this.variances = variances.clone();
    }
  }

  /**
   * Estimates.
   *
   * @param sets one for each load
   * @return the estimate; all zero where no set has two series repeated together
   */
  public static CommonScatter of(List<RepeatedTogether> sets) {
    double products = 0;
    double weights = 0;
    double degrees = 0;
    for (RepeatedTogether set : sets) {
      double[][] values = set.values;
      int repeats = values.length;
      if (repeats < 2) {
        continue;
      }
      double[] variances = set.variances;
      double[] means = means(values, variances.length);
      double correction = repeats / (repeats - 1.0);
      boolean any = false;
      for (double[] row : values) {
        double sum = 0;
        double squares = 0;
        double weight = 0;
        double weightSquares = 0;
        for (int s = 0; s < variances.length; s++) {
          if (Double.isNaN(row[s]) || !(variances[s] > 0)) {
            continue;
          }
          double deviation = means[s] * (row[s] - means[s]) / variances[s];
          double w = means[s] * means[s] / variances[s];
          sum += deviation;
          squares += deviation * deviation;
          weight += w;
          weightSquares += w * w;
        }
        products += correction * (sum * sum - squares);
        weights += weight * weight - weightSquares;
        any |= weight * weight > weightSquares * (1 + 1e-9);
      }
      degrees += any ? repeats - 1 : 0;
    }
    if (!(weights > 0)) {
      return new CommonScatter(0, 0, 0);
    }
    double estimate = products / weights;
    double error = Math.sqrt(2 / weights);
    return new CommonScatter(estimate > SEEN * error ? estimate : 0, Math.max(0, estimate + error), degrees);
  }

  private static double[] means(double[][] values, int series) {
    double[] means = new double[series];
    for (int s = 0; s < series; s++) {
      double sum = 0;
      int count = 0;
      for (double[] row : values) {
        if (!Double.isNaN(row[s])) {
          sum += row[s];
          count++;
        }
      }
      means[s] = count == 0 ? 0 : sum / count;
    }
    return means;
  }
}
