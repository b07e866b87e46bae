package org.flexbound.update;

import java.util.List;

/**
 * The μ = 1 estimate without one load case.
 *
 * @param configuration the load case's configuration
 * @param load its load
 * @param values the parameters, same kind as {@code ParameterResult.updated}
 * @param shifts how far each moved, in posterior standard deviations
 * @param prediction how well the rest predicts the case that was left out
 */
public record WithoutLoadCase(
    String configuration,
    String load,
    List<Double> values,
    List<Double> shifts,
    PredictedCase prediction) {
  /** Copies the lists. */
  public WithoutLoadCase {
    values = List.copyOf(values);
    shifts = List.copyOf(shifts);
  }
}
