package org.flexbound.update;

import org.apache.commons.statistics.distribution.TruncatedNormalDistribution;
import org.ejml.data.DMatrixRMaj;

/**
 * The posterior with the bounds of all parameters: a normal cut off by a box.
 *
 * <p>The box of every parameter is taken into account for every other by expectation propagation
 * (Minka 2001; for boxes Cunningham, Hennig &amp; Lacoste-Julien 2011, arXiv:1111.6832), run to
 * convergence, so that the answer does not depend on the order of the parameters. What is left for
 * one parameter is a normal (its cavity) cut off at its own bounds: its quantiles are the interval.
 */
final class TruncatedPosterior {
  private static final int SWEEPS = 200;
  private static final double TOLERANCE = 1e-10;

  /** A bound further off than this many standard deviations cuts nothing off. */
  private static final double FAR = 9;

  private final double[] lower;
  private final double[] upper;
  private final double[] precision;
  private final double[] shift;
  private final double[] mean;
  private final DMatrixRMaj covariance;

  TruncatedPosterior(Posterior posterior, double[] lower, double[] upper) {
    int n = posterior.size();
    this.lower = lower.clone();
    this.upper = upper.clone();
    precision = new double[n];
    shift = new double[n];
    covariance = posterior.covariance();
    mean = new double[n];
    for (int i = 0; i < n; i++) {
      mean[i] = posterior.mean(i);
    }
    propagate();
  }

  private void propagate() {
    int n = mean.length;
    for (int sweep = 0; sweep < SWEEPS; sweep++) {
      double moved = 0;
      for (int i = 0; i < n; i++) {
        moved = Math.max(moved, site(i));
      }
      if (moved < TOLERANCE) {
        return;
      }
    }
  }

  /** Renews the site of one parameter; returns how far its moments were off. */
  private double site(int i) {
    double variance = covariance.get(i, i);
    if (!(variance > 1e-300)) {
      return 0;
    }
    Cavity cavity = cavity(i);
    double sd = Math.sqrt(cavity.variance);
    if (cavity.mean - FAR * sd > lower[i] && cavity.mean + FAR * sd < upper[i] && precision[i] == 0) {
      return 0;
    }
    double[] moments = moments(cavity, lower[i], upper[i]);
    if (!(moments[1] > 0)) {
      return 0;
    }
    double newPrecision = Math.max(1 / moments[1] - 1 / cavity.variance, 0);
    double newShift = moments[0] / moments[1] - cavity.mean / cavity.variance;
    double deltaPrecision = newPrecision - precision[i];
    double deltaShift = newShift - shift[i];
    double before = mean[i];
    // rank-one update of covariance and mean
    int n = mean.length;
    double[] column = new double[n];
    for (int k = 0; k < n; k++) {
      column[k] = covariance.get(k, i);
    }
    double denominator = 1 + deltaPrecision * variance;
    double meanStep = (deltaShift - deltaPrecision * mean[i]) / denominator;
    for (int k = 0; k < n; k++) {
      mean[k] += column[k] * meanStep;
      double left = column[k] * deltaPrecision / denominator;
      if (left != 0) {
        for (int l = 0; l < n; l++) {
          covariance.set(k, l, covariance.get(k, l) - left * column[l]);
        }
      }
    }
    precision[i] = newPrecision;
    shift[i] = newShift;
    double scale = Math.sqrt(variance);
    return Math.max(
        Math.abs(mean[i] - before) / scale, Math.abs(covariance.get(i, i) / variance - 1));
  }

  private record Cavity(double mean, double variance) {}

  private Cavity cavity(int i) {
    double p = Math.max(1 / covariance.get(i, i) - precision[i], 1e-12);
    double s = mean[i] / covariance.get(i, i) - shift[i];
    return new Cavity(s / p, 1 / p);
  }

  /** Mean and variance of a normal cut off at two bounds. */
  private static double[] moments(Cavity cavity, double low, double high) {
    double sd = Math.sqrt(cavity.variance);
    double a = (low - cavity.mean) / sd;
    double b = (high - cavity.mean) / sd;
    if (a > 30 || b < -30) {
      // Far in a tail the normal is an exponential (Mills ratio, first terms).
      double edge = a > 30 ? a : -b;
      double away = 1 / edge - 2 / (edge * edge * edge);
      double mean = a > 30 ? low + sd * away : high - sd * away;
      return new double[] {mean, cavity.variance / (edge * edge)};
    }
    TruncatedNormalDistribution cut =
        TruncatedNormalDistribution.of(cavity.mean, sd, low, high);
    return new double[] {cut.getMean(), cut.getVariance()};
  }

  /** The quantile of one parameter, all bounds taken into account. */
  double quantile(int i, double probability) {
    Cavity cavity = cavity(i);
    double sd = Math.sqrt(cavity.variance);
    double a = (lower[i] - cavity.mean) / sd;
    double b = (upper[i] - cavity.mean) / sd;
    double value;
    if (a > 30) {
      value = lower[i] - sd * Math.log1p(-probability) / a;
    } else if (b < -30) {
      value = upper[i] + sd * Math.log(probability) / -b;
    } else {
      value =
          TruncatedNormalDistribution.of(cavity.mean, sd, lower[i], upper[i])
              .inverseCumulativeProbability(probability);
    }
    return Math.min(Math.max(value, lower[i]), upper[i]);
  }

  double mean(int i) {
    return mean[i];
  }

  double covariance(int i, int k) {
    return covariance.get(i, k);
  }
}
