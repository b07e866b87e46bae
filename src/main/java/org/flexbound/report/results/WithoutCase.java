package org.flexbound.report.results;

import java.util.List;

/**
 * The estimate without one load case.
 *
 * @param configuration the configuration
 * @param load the load case left out
 * @param shift for each parameter, how far the estimate moves, in posterior standard
 *     deviations
 */
public record WithoutCase(
    String configuration,
    String load,
    List<Double> shift) {
  /** Copies the lists. */
  public WithoutCase {
    shift = List.copyOf(shift);
  }
}
