package org.flexbound.report.results;

import java.util.List;

/**
 * Parameters that the tests cannot tell apart, with the combination that they do determine.
 *
 * @param parameters their names
 * @param weights the combination of the changes in the working variables, of unit length
 * @param value its value at the estimate
 * @param standardDeviation its posterior standard deviation
 * @param lower95 lower end of its 95 % interval
 * @param upper95 upper end of its 95 % interval
 * @param determined whether the data removed more than 90 % of its prior variance
 * @param inWords the combination for people
 */
public record Group(
    List<String> parameters,
    List<Double> weights,
    double value,
    double standardDeviation,
    double lower95,
    double upper95,
    boolean determined,
    String inWords) {
  /** Copies the lists. */
  public Group {
    parameters = List.copyOf(parameters);
    weights = List.copyOf(weights);
  }
}
