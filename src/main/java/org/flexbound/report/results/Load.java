package org.flexbound.report.results;

import java.util.List;
import java.util.OptionalDouble;

/**
 * A load point or a load pattern: one column of the flexibility matrix.
 *
 * @param configuration the configuration
 * @param name its name
 * @param points where it acts
 * @param instrument the instrument that reads it, or empty
 * @param limit the total that it may not pass, N or N·m
 * @param remark the remark of the log
 */
public record Load(
    String configuration,
    String name,
    List<Point> points,
    String instrument,
    OptionalDouble limit,
    String remark) {
  /** Copies the lists. */
  public Load {
    points = List.copyOf(points);
  }
}
