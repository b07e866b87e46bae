package org.flexbound.reduce;

import java.util.List;
import java.util.Optional;
import org.flexbound.statistics.Quantiles;

/**
 * Slopes of one gauge and load by the same instruments, from one or more runs.
 *
 * @param gauge the gauge
 * @param load the load
 * @param gaugeInstrument what read the gauge
 * @param loadInstrument what read the load
 * @param slopes one for each run
 */
record SlopeCell(
    String gauge,
    String load,
    Optional<String> gaugeInstrument,
    Optional<String> loadInstrument,
    List<RunSlope> slopes) {
  SlopeCell {
    slopes = List.copyOf(slopes);
  }

  double mean() {
    return slopes.stream().mapToDouble(RunSlope::slope).average().orElse(Double.NaN);
  }

  double variance() {
    double mean = mean();
    return slopes.size() < 2
        ? 0
        : slopes.stream().mapToDouble(s -> (s.slope() - mean) * (s.slope() - mean)).sum() / (slopes.size() - 1);
  }

  int degreesOfFreedom() {
    return slopes.size() - 1;
  }

  /**
   * Whether the slopes scatter by more than the scatter of the readings within the runs explains.
   *
   * @param level how often chance alone may say so
   */
  boolean scattersBeyondItsReadings(double level) {
    double within =
        slopes.stream()
            .mapToDouble(RunSlope::standardError)
            .filter(error -> !Double.isNaN(error))
            .map(error -> error * error)
            .average()
            .orElse(0);
    return slopes.size() > 1
        && variance()
            > within * Quantiles.f(1 - level, degreesOfFreedom(), Double.POSITIVE_INFINITY);
  }
}
