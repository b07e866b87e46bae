package org.flexbound.update;

import java.util.List;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.study.HeldOutCase;
import org.flexbound.study.Rule;

/**
 * What is to be solved.
 *
 * @param parameters what may change
 * @param measured the measured flexibility of each configuration
 * @param function the computed flexibility
 * @param rule how the weight of the prior is chosen for the point shown
 * @param heldOut load cases that are predicted, not fitted
 * @param sharedEffects what one standard uncertainty of each other source that several coefficients
 *     share (a place, a direction) adds to the absolute coefficients, all configurations one after
 *     another, SI
 * @param starts how many starting points, at least 1 (the first is the nominal model)
 */
public record UpdateProblem(
    List<WorkingParameter> parameters,
    List<MeasuredFlexibility> measured,
    FlexibilityFunction function,
    Rule rule,
    List<HeldOutCase> heldOut,
    List<List<Double>> sharedEffects,
    int starts) {
  /** Copies the lists. */
  public UpdateProblem {
    parameters = List.copyOf(parameters);
    measured = List.copyOf(measured);
    heldOut = List.copyOf(heldOut);
    sharedEffects = sharedEffects.stream().map(List::copyOf).toList();
  }

  /**
   * A problem whose only shared sources are the gains.
   *
   * @param parameters what may change
   * @param measured the measured flexibility of each configuration
   * @param function the computed flexibility
   * @param rule how the weight of the prior is chosen for the point shown
   * @param heldOut load cases that are predicted, not fitted
   * @param starts how many starting points
   */
  public UpdateProblem(
      List<WorkingParameter> parameters,
      List<MeasuredFlexibility> measured,
      FlexibilityFunction function,
      Rule rule,
      List<HeldOutCase> heldOut,
      int starts) {
    this(parameters, measured, function, rule, heldOut, List.of(), starts);
  }
}
