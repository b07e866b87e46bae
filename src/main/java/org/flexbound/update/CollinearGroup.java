package org.flexbound.update;

import java.util.List;

/**
 * Parameters that the tests cannot tell apart, with the combination that they do determine.
 *
 * @param parameters the names
 * @param weights the combination Σ weight · (x − nominal) in working variables; weights of unit
 *     length
 * @param value its value at the μ = 1 estimate
 * @param standardDeviation its posterior standard deviation
 * @param lower95 lower end of its 95 % interval
 * @param upper95 upper end
 * @param determined whether more than 90 % of its prior variance was removed; where not, there are
 *     no weights and the numbers are 0
 * @param inWords the combination for people, e.g. {@code knee^0.71 · base^0.70 = 0.62}
 */
public record CollinearGroup(
    List<String> parameters,
    List<Double> weights,
    double value,
    double standardDeviation,
    double lower95,
    double upper95,
    boolean determined,
    String inWords) {
  /** Copies the lists. */
  public CollinearGroup {
    parameters = List.copyOf(parameters);
    weights = List.copyOf(weights);
  }
}
