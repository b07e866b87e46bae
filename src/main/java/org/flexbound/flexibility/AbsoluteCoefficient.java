package org.flexbound.flexibility;

import java.util.List;

/**
 * A flexibility coefficient before base motion is taken out: the motion that the gauge showed per
 * unit of the load, averaged over runs.
 *
 * @param gauge the gauge's index in {@link MeasuredFlexibility#gauges()}
 * @param load the load's index in {@link MeasuredFlexibility#loads()}
 * @param value motion per load, SI (m/N, rad/N, m/(N·m), …)
 * @param scatterUncertainty standard uncertainty of the value from run-to-run scatter (pooled),
 *     same unit
 * @param floorUncertainty standard uncertainty from the gauge instrument's fixed floor, same unit;
 *     independent between coefficients
 * @param gains indices in {@link MeasuredFlexibility#gains()} of the gains that act on it
 * @param runs how many runs it is the mean of
 * @param scatterDegreesOfFreedom of the scatter's estimate; infinite where it is stated
 */
public record AbsoluteCoefficient(
    int gauge,
    int load,
    double value,
    double scatterUncertainty,
    double floorUncertainty,
    List<Integer> gains,
    int runs,
    double scatterDegreesOfFreedom) {
  /** Copies the list. */
  public AbsoluteCoefficient {
    gains = List.copyOf(gains);
  }

  /**
   * A coefficient whose scatter is taken as known.
   *
   * @param gauge the gauge's index
   * @param load the load's index
   * @param value motion per load, SI
   * @param scatterUncertainty standard uncertainty from run-to-run scatter
   * @param floorUncertainty standard uncertainty from the gauge instrument's fixed floor
   * @param gains indices of the gains that act on it
   * @param runs how many runs it is the mean of
   */
  public AbsoluteCoefficient(
      int gauge,
      int load,
      double value,
      double scatterUncertainty,
      double floorUncertainty,
      List<Integer> gains,
      int runs) {
    this(gauge, load, value, scatterUncertainty, floorUncertainty, gains, runs, Double.POSITIVE_INFINITY);
  }
}
