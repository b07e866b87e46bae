package org.flexbound.update;

import java.util.List;

/**
 * The held-out load cases against their prediction.
 *
 * @param cases one for each
 * @param misfit of all together under their joint covariance
 * @param limit the 95 % quantile for it
 * @param validated whether the joint misfit stays within its limit
 */
public record Validation(
    List<PredictedCase> cases, double misfit, double limit, boolean validated) {
  /** Copies the list. */
  public Validation {
    cases = List.copyOf(cases);
  }
}
