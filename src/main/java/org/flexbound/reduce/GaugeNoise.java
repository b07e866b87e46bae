package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.statistics.Quantiles;
import org.flexbound.statistics.RepeatedMedianLine;

/**
 * What each gauge shows beside its movement, from all runs of a test: the scatter of one step about
 * its line (median over runs, so that one bad run does not excuse itself), never less than its
 * resolution allows, and the largest movement it saw.
 */
final class GaugeNoise {
  /** All steps of a test together may raise a false alarm this often. */
  private static final double LEVEL = 0.01;

  /** A quantity spread evenly over one step of resolution (JCGM 100:2008, 4.3.7). */
  private static final double UNIFORM = Math.sqrt(12);

  private static final double NORMAL = 1.4826;

  /** Readings closer than this share of their size differ by rounding only. */
  private static final double ROUNDING = 1e-9;

  private final Map<String, Double> noise = new LinkedHashMap<>();
  private final Map<String, Double> span = new LinkedHashMap<>();
  private final Map<String, Double> resolution = new LinkedHashMap<>();
  private final Map<String, Double> size = new LinkedHashMap<>();
  private final double quantile;
  private final int slopes;

  /**
   * Looks through the slopes.
   *
   * @param all every slope of the test
   * @param resolutions by instrument, SI
   */
  GaugeNoise(List<RunSlope> all, Map<String, Double> resolutions) {
    Map<String, List<Double>> scales = new LinkedHashMap<>();
    int steps = 1;
    for (RunSlope slope : all) {
      steps += slope.steps().size();
      double finest = resolutions.getOrDefault(slope.gaugeInstrument().orElse(""), 0.0);
      resolution.merge(slope.gauge(), finest, Math::max);
      span.merge(slope.gauge(), spanOf(slope), Math::max);
      size.merge(slope.gauge(), sizeOf(slope), Math::max);
      double scale = scale(slope);
      if (!Double.isNaN(scale)) {
        scales.computeIfAbsent(slope.gauge(), key -> new ArrayList<>()).add(scale);
      }
    }
    scales.forEach(
        (gauge, values) ->
            noise.put(
                gauge,
                RepeatedMedianLine.median(
                    values.stream().mapToDouble(Double::doubleValue).toArray())));
    quantile = Quantiles.normal(1 - Quantiles.sidak(LEVEL, steps) / 2);
    slopes = Math.max(1, all.size());
  }

  private static double spanOf(RunSlope slope) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (LoadStep step : slope.steps()) {
      if (!Double.isNaN(step.motion())) {
        low = Math.min(low, step.motion());
        high = Math.max(high, step.motion());
      }
    }
    return Math.max(0, high - low);
  }

  private static double sizeOf(RunSlope slope) {
    return slope.steps().stream()
        .mapToDouble(step -> Math.abs(step.motion()))
        .filter(value -> !Double.isNaN(value))
        .max()
        .orElse(0);
  }

  private static double scale(RunSlope slope) {
    double[] residuals =
        slope.steps().stream()
            .filter(step -> step.fate() == LoadStep.Fate.FITTED)
            .mapToDouble(step -> Math.abs(slope.residual(step)))
            .filter(value -> !Double.isNaN(value))
            .toArray();
    int free = residuals.length - slope.intercepts().size() - 1;
    return free < 1
        ? Double.NaN
        : NORMAL
            * RepeatedMedianLine.median(residuals)
            * Math.sqrt(residuals.length / (double) free);
  }

  /** Standard deviation of one step of a gauge about its line, SI. */
  double noise(String gauge) {
    return Math.hypot(noise.getOrDefault(gauge, 0.0), resolution(gauge) / UNIFORM)
        + ROUNDING * size.getOrDefault(gauge, 0.0);
  }

  double resolution(String gauge) {
    return resolution.getOrDefault(gauge, 0.0);
  }

  /** Largest movement of a gauge in any run, SI. */
  double span(String gauge) {
    return span.getOrDefault(gauge, 0.0);
  }

  /** How far the noisiest of all steps of the test may lie off by chance, in standard deviations. */
  double quantile() {
    return quantile;
  }

  /** How far a step may lie off by chance: noise, but no more than a share of the largest movement. */
  double allowance(String gauge, double limit) {
    return Math.min(quantile * noise(gauge) + resolution(gauge), limit * span(gauge));
  }

  int slopes() {
    return slopes;
  }

  /** The level of one of as many tests as there are slopes. */
  double levelOfOneSlope() {
    return Quantiles.sidak(LEVEL, slopes);
  }
}
