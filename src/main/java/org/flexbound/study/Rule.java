package org.flexbound.study;

/** How the weight μ of the prior is chosen for the point that is shown. */
public sealed interface Rule {
  /** μ = 1: the prior standard deviations mean what they say. */
  record Prior() implements Rule {}

  /** The largest μ at which the misfit and every load case's residuals stay acceptable. */
  record Discrepancy() implements Rule {}

  /** The corner of the curve of misfit against change. */
  record CurveCorner() implements Rule {}

  /**
   * A stated weight.
   *
   * @param weight μ, above 0
   */
  record Stated(double weight) implements Rule {}
}
