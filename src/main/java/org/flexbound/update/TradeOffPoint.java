package org.flexbound.update;

import java.util.List;

/**
 * One point of the curve of misfit against change.
 *
 * @param weight μ
 * @param misfit the misfit there
 * @param change √Σ(x/s)², the size of the change in prior standard deviations
 * @param effectiveParameters the effective number of parameters
 * @param values the parameters in their working variables
 */
public record TradeOffPoint(
    double weight,
    double misfit,
    double change,
    double effectiveParameters,
    List<Double> values) {
  /** Copies the list. */
  public TradeOffPoint {
    values = List.copyOf(values);
  }
}
