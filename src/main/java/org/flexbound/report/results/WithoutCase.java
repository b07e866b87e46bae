package org.flexbound.report.results;

import java.util.List;

/**
 * The estimate without one load case.
 *
 * @param configuration the configuration
 * @param load the load case left out
 * @param parameters the estimates without it, in the order of the parameters
 * @param misfit how badly the others predict it, gains shared
 * @param limit what that misfit may be
 * @param predicted whether it stays within its limit
 */
public record WithoutCase(
    String configuration,
    String load,
    List<ParameterWithout> parameters,
    double misfit,
    double limit,
    boolean predicted) {
  /** Copies the lists. */
  public WithoutCase {
    parameters = List.copyOf(parameters);
  }
}
