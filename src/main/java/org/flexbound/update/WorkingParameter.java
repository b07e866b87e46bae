package org.flexbound.update;

import org.flexbound.study.Parameter;

/**
 * A parameter with its numbers in the working variable x. Nominal is x = {@code nominal}; for the
 * logarithm that is 0.
 *
 * @param parameter as the study has it
 * @param nominal x of the nominal model
 * @param lower the lower bound of x
 * @param upper the upper bound of x
 * @param priorStandardDeviation of x about the nominal, above 0
 */
public record WorkingParameter(
    Parameter parameter,
    double nominal,
    double lower,
    double upper,
    double priorStandardDeviation) {
  /** Checks the order of the numbers. */
  public WorkingParameter {
    if (!(lower < upper) || !(priorStandardDeviation > 0)) {
      throw new IllegalArgumentException(
          "parameter " + parameter.name() + " has no room: " + lower + " to " + upper);
    }
  }

  /**
   * The parameter's name.
   *
   * @return as in the study
   */
  public String name() {
    return parameter.name();
  }
}
