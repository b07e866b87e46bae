package org.flexbound.report.results;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * How the update ended, with its evidence.
 *
 * @param rule how the weight of the prior was chosen
 * @param verdict updated, no change warranted, misfits even at best or not converged
 * @param weight the weight of the prior at the point shown
 * @param distanceFromPrior distance of the point shown from the estimate at weight 1, in prior
 *     standard deviations
 * @param nominal the misfit of the nominal model
 * @param shown the misfit of the point shown
 * @param best the misfit of the best fit within the bounds
 * @param widening the factor by which intervals were widened; 1 where none was
 * @param scatterDegreesOfFreedom degrees of freedom of the pooled scatter; left out where
 *     infinite
 * @param tradeOff misfit against change, largest weight first
 * @param groups parameters that cannot be told apart
 * @param singularValues singular values of the whitened Jacobian, scaled by the prior standard
 *     deviations, descending
 * @param rank how many of them stand above the noise
 * @param correlation posterior correlations of the parameters
 * @param gains gains of instruments
 * @param fits the fitted coefficients
 * @param configurations how each configuration fits
 * @param withoutLoadCase the estimate without each load case
 * @param validation all held-out coefficients together
 * @param unexplained the part of the misfit that no parameter, gain or bound can reach
 * @param converged whether the solver met its tolerance
 * @param reason why the solver stopped
 * @param iterations number of outer iterations
 * @param evaluations number of evaluations of the computed flexibility
 * @param projectedGradient largest component of the projected gradient at the end, relative to
 *     its size at the nominal model
 * @param starts the starting points
 * @param startsAgree whether all starts that converged came to the same point
 */
public record Update(
    String rule,
    String verdict,
    double weight,
    double distanceFromPrior,
    Misfit nominal,
    Misfit shown,
    Misfit best,
    double widening,
    OptionalDouble scatterDegreesOfFreedom,
    List<TradeOff> tradeOff,
    List<Group> groups,
    List<Double> singularValues,
    int rank,
    List<List<Double>> correlation,
    List<GainEstimate> gains,
    List<Fit> fits,
    List<ConfigurationFit> configurations,
    List<WithoutCase> withoutLoadCase,
    Optional<JointTest> validation,
    Unexplained unexplained,
    boolean converged,
    String reason,
    int iterations,
    int evaluations,
    double projectedGradient,
    List<Start> starts,
    boolean startsAgree) {
  /** Copies the lists. */
  public Update {
    tradeOff = List.copyOf(tradeOff);
    groups = List.copyOf(groups);
    singularValues = List.copyOf(singularValues);
    correlation = List.copyOf(correlation);
    gains = List.copyOf(gains);
    fits = List.copyOf(fits);
    configurations = List.copyOf(configurations);
    withoutLoadCase = List.copyOf(withoutLoadCase);
    starts = List.copyOf(starts);
  }
}
