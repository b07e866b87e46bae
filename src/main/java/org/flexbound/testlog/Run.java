package org.flexbound.testlog;

import java.util.List;
import java.util.OptionalDouble;
import org.flexbound.finding.Where;

/**
 * One recorded sequence of load steps.
 *
 * @param name its name
 * @param date when, ISO 8601, or empty
 * @param temperature the temperature, K, where stated
 * @param use false where the user wants the run left out
 * @param remark the user's remark, or empty
 * @param loads the load columns
 * @param gauges the gauge columns
 * @param readings the rows
 * @param where the run's place: its sheet or its rows
 */
public record Run(
    String name,
    String date,
    OptionalDouble temperature,
    boolean use,
    String remark,
    List<Channel> loads,
    List<Channel> gauges,
    Readings readings,
    Where where) {
  /** Copies the lists. */
  public Run {
    loads = List.copyOf(loads);
    gauges = List.copyOf(gauges);
  }
}
