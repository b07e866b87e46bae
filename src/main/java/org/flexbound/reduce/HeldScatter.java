package org.flexbound.reduce;

import java.util.List;
import java.util.function.ToDoubleFunction;
import java.util.function.ToIntFunction;

/**
 * The random variance of the mean of each step: the scatter of readings while the load was held, pooled over the run, over their number; and
 * rounding to the resolution once a step (JCGM 100:2008, F.2.2.1).
 */
final class HeldScatter {
  private final ToIntFunction<StepGrouping.RawStep> counts;
  private final double pooled;
  private final double rounding;

  /**
   * Pools.
   *
   * @param steps the steps of the run
   * @param counts readings of a step
   * @param squares their sum of squares about the step's mean
   * @param resolution smallest step of the instrument; NaN where not stated
   */
  HeldScatter(
      List<StepGrouping.RawStep> steps,
      ToIntFunction<StepGrouping.RawStep> counts,
      ToDoubleFunction<StepGrouping.RawStep> squares,
      double resolution) {
    this.counts = counts;
    double sum = 0;
    double degrees = 0;
    for (StepGrouping.RawStep step : steps) {
      int count = counts.applyAsInt(step);
      if (count > 1) {
        sum += squares.applyAsDouble(step);
        degrees += count - 1;
      }
    }
    pooled = degrees > 0 ? sum / degrees : 0;
    rounding = Double.isNaN(resolution) ? 0 : resolution * resolution / 12;
  }

  double[] variances(List<StepGrouping.RawStep> steps) {
    return steps.stream().mapToDouble(step -> pooled / Math.max(1, counts.applyAsInt(step)) + rounding).toArray();
  }
}
