package org.flexbound.statistics;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A straight line with one slope and an intercept for each group (run, cycle and branch), by
 * ordinary least squares.
 *
 * @param slope the common slope
 * @param slopeStandardError its standard error from the residuals; NaN without degrees of freedom
 * @param intercepts group to intercept
 * @param regression the fit behind it: groups first, the slope last
 * @param spread Σ (x less the mean of its group)²
 */
public record GroupedLine(
    double slope,
    double slopeStandardError,
    Map<Integer, Double> intercepts,
    Regression regression,
    double spread) {
  /** Copies the map. */
  public GroupedLine {
    intercepts = Collections.unmodifiableMap(new LinkedHashMap<>(intercepts));
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
  public static GroupedLine fit(double[] x, double[] y, int[] group) {
    Design design = new Design(x, group, 1);
    Regression regression = Regression.fit(design.rows, y);
    double[] b = regression.coefficients();
    int last = b.length - 1;
    Map<Integer, Double> intercepts = new LinkedHashMap<>();
    for (int g = 0; g < design.groups.size(); g++) {
      // the design is centred; the intercept is at x = 0
      intercepts.put(design.groups.get(g), b[g] - b[last] * design.centre);
    }
    return new GroupedLine(
        b[last], regression.standardError(last), intercepts, regression, spread(x, group));
  }

  private static double spread(double[] x, int[] group) {
    Map<Integer, double[]> sums = new LinkedHashMap<>();
    for (int k = 0; k < x.length; k++) {
      double[] sum = sums.computeIfAbsent(group[k], key -> new double[3]);
      // Welford's update, which does not lose the spread in the size of the mean
      double before = x[k] - sum[1];
      sum[0]++;
      sum[1] += before / sum[0];
      sum[2] += before * (x[k] - sum[1]);
    }
    return sums.values().stream().mapToDouble(sum -> sum[2]).sum();
  }

  /**
   * What a quadratic term would add to the line.
   *
   * @param probability that a straight line shows so much curvature by chance (F test of the added
   *     term)
   * @param f the F value
   * @param departure the largest distance of the curve from its chord over the abscissae, signed
   *     like the second derivative, in units of y
   */
  public record Curvature(double probability, double f, double departure) {}

  /**
   * Tests for curvature by an added quadratic term (Draper &amp; Smith, 6.1).
   *
   * @param x abscissae
   * @param y ordinates
   * @param group the group of each point
   * @return the test; probability 1 where there are too few points
   */
  public static Curvature curvature(double[] x, double[] y, int[] group) {
    try {
      Regression line = Regression.fit(new Design(x, group, 1).rows, y);
      Regression curve = Regression.fit(new Design(x, group, 2).rows, y);
      double low = Double.POSITIVE_INFINITY;
      double high = Double.NEGATIVE_INFINITY;
      for (double value : x) {
        low = Math.min(low, value);
        high = Math.max(high, value);
      }
      double[] b = curve.coefficients();
      double departure = b[b.length - 1] * (high - low) * (high - low) / 4;
      if (curve.degreesOfFreedom() < 1) {
        return new Curvature(1, 0, departure);
      }
      double f =
          (line.residualSumOfSquares() - curve.residualSumOfSquares())
              / (curve.residualSumOfSquares() / curve.degreesOfFreedom());
      return new Curvature(
          Quantiles.fTail(Math.max(f, 0), 1, curve.degreesOfFreedom()), f, departure);
    } catch (Regression.DependentColumns | IllegalArgumentException tooFew) {
      return new Curvature(1, 0, 0);
    }
  }

  /** One indicator column for each group, then the powers of the centred abscissa. */
  private static final class Design {
    private final List<Integer> groups = new ArrayList<>();
    private final double[][] rows;
    private final double centre;

    Design(double[] x, int[] group, int degree) {
      double sum = 0;
      for (int k = 0; k < x.length; k++) {
        sum += x[k];
        if (!groups.contains(group[k])) {
          groups.add(group[k]);
        }
      }
      centre = sum / Math.max(1, x.length);
      rows = new double[x.length][groups.size() + degree];
      for (int k = 0; k < x.length; k++) {
        rows[k][groups.indexOf(group[k])] = 1;
        double power = 1;
        for (int d = 0; d < degree; d++) {
          power *= x[k] - centre;
          rows[k][groups.size() + d] = power;
        }
      }
    }
  }
}
