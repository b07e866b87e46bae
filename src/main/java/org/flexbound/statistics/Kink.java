package org.flexbound.statistics;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A search for one kink in a line with an intercept for each group: y = intercept + slope · x + change · max(0, x − place), the place not known
 * beforehand. The largest |t| over the places is judged by the upper bound of Davies (1987, Biometrika 74:33, equation 3.4 with one degree of
 * freedom), after t is turned into the normal of the same probability.
 *
 * @param place the abscissa at which the fit is best; NaN where no place could be tried
 * @param change of the slope there
 * @param departure the largest distance of the kinked line from its chord, in units of y, signed like the change
 * @param probability that a straight line shows such a kink somewhere by chance, at most 1
 * @param residualSumOfSquares of the kinked line
 */
public record Kink(double place, double change, double departure, double probability, double residualSumOfSquares) {
  /** So many different abscissae must lie on each side of a place. */
  private static final int EACH_SIDE = 3;

  private static final Kink NONE = new Kink(Double.NaN, 0, 0, 1, Double.NaN);

  /**
   * Searches.
   *
   * @param x abscissae
   * @param y ordinates
   * @param group the group of each point
   * @return the best place
   */
  public static Kink search(double[] x, double[] y, int[] group) {
    double[] levels = Arrays.stream(x).sorted().distinct().toArray();
    levels = apart(levels);
    if (levels.length < 2 * EACH_SIDE) {
      return NONE;
    }
    double best = 0;
    Kink found = NONE;
    double variation = 0;
    double before = Double.NaN;
    double low = levels[0];
    double high = levels[levels.length - 1];
    for (int k = EACH_SIDE - 1; k <= levels.length - EACH_SIDE; k++) {
      // a place at each level and half way to the next
      for (double place : k < levels.length - EACH_SIDE ? new double[] {levels[k], 0.5 * (levels[k] + levels[k + 1])} : new double[] {levels[k]}) {
        Regression fit;
        try {
          fit = Regression.fit(design(x, group, place), y);
        } catch (Regression.DependentColumns | IllegalArgumentException tooFew) {
          continue;
        }
        if (fit.degreesOfFreedom() < 2) {
          return NONE;
        }
        double[] b = fit.coefficients();
        int last = b.length - 1;
        double t = b[last] / fit.standardError(last);
        double z = normal(Math.abs(t), fit.degreesOfFreedom());
        double signed = Math.signum(t) * z;
        variation += Double.isNaN(before) ? 0 : Math.abs(signed - before);
        before = signed;
        if (z > best) {
          best = z;
          double departure = b[last] * (high - place) * (place - low) / (high - low);
          found = new Kink(place, b[last], departure, 1, fit.residualSumOfSquares());
        }
      }
    }
    double bound = 2 * Quantiles.normalProbability(-best) + variation * Math.exp(-best * best / 2) / Math.sqrt(2 * Math.PI);
    return new Kink(found.place, found.change, found.departure, Math.min(1, bound), found.residualSumOfSquares);
  }

  /** Levels nearer to each other than a hundredth of the range are one. */
  private static double[] apart(double[] sorted) {
    List<Double> kept = new ArrayList<>();
    double least = sorted.length == 0 ? 0 : 0.01 * (sorted[sorted.length - 1] - sorted[0]);
    for (double value : sorted) {
      if (kept.isEmpty() || value - kept.get(kept.size() - 1) > least) {
        kept.add(value);
      }
    }
    return kept.stream().mapToDouble(Double::doubleValue).toArray();
  }

  /** The normal deviate with the two-sided probability of a t. */
  private static double normal(double t, int degrees) {
    double tail = Quantiles.studentTProbability(-t, degrees);
    // beyond this the tail is nought in doubles, and certain enough
    return tail > 1e-300 ? -Quantiles.normal(tail) : 37;
  }

  private static double[][] design(double[] x, int[] group, double place) {
    Map<Integer, Integer> columns = new LinkedHashMap<>();
    for (int g : group) {
      columns.putIfAbsent(g, columns.size());
    }
    double centre = Arrays.stream(x).average().orElse(0);
    double[][] rows = new double[x.length][columns.size() + 2];
    for (int i = 0; i < x.length; i++) {
      rows[i][columns.getOrDefault(group[i], 0)] = 1;
      rows[i][columns.size()] = x[i] - centre;
      rows[i][columns.size() + 1] = Math.max(0, x[i] - place);
    }
    return rows;
  }
}
