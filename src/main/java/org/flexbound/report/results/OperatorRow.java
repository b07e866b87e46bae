package org.flexbound.report.results;

import java.util.List;

/**
 * One coefficient as a weighted sum of absolute coefficients.
 *
 * @param configuration the configuration
 * @param gauge the gauge of the coefficient
 * @param load the load of the coefficient
 * @param terms the terms of the sum
 */
public record OperatorRow(
    String configuration,
    String gauge,
    String load,
    List<Term> terms) {
  /** Copies the lists. */
  public OperatorRow {
    terms = List.copyOf(terms);
  }
}
