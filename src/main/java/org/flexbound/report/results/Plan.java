package org.flexbound.report.results;

import java.util.List;

/**
 * A planned test, of which nothing has been measured yet.
 *
 * @param loads the loads as they would be applied
 * @param coefficients what the nominal model expects to be measured, and how well
 */
public record Plan(
    List<PlannedLoad> loads,
    List<PlannedCoefficient> coefficients) {
  /** Copies the lists. */
  public Plan {
    loads = List.copyOf(loads);
    coefficients = List.copyOf(coefficients);
  }
}
