package org.flexbound.report.results;

import java.util.List;
import java.util.OptionalDouble;

/**
 * A coefficient or a parameter over time with its control limits.
 *
 * @param kind coefficient or parameter
 * @param configuration the configuration of a coefficient, or empty
 * @param name gauge and load, or the parameter
 * @param unit the SI unit; 1 where values are factors
 * @param method how the limits were made
 * @param baseline how many of the first values they come from
 * @param centre their mean
 * @param lower lower limit
 * @param upper upper limit
 * @param meanRange mean moving range of the baseline
 * @param upperRange limit of a moving range; left out where there is none
 * @param points the values in order of time
 */
public record TrendSeries(
    String kind,
    String configuration,
    String name,
    String unit,
    String method,
    int baseline,
    double centre,
    double lower,
    double upper,
    double meanRange,
    OptionalDouble upperRange,
    List<TrendPoint> points) {
  /** Copies the lists. */
  public TrendSeries {
    points = List.copyOf(points);
  }

  /**
   * The points outside of the limits, by value or by moving range.
   *
   * @return in order of time
   */
  public List<TrendPoint> outside() {
    return points.stream().filter(p -> p.outside() || p.jump()).toList();
  }
}
