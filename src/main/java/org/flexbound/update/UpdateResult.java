package org.flexbound.update;

import java.util.List;
import java.util.Optional;
import org.flexbound.finding.Finding;
import org.flexbound.study.Rule;

/**
 * The update with all its evidence.
 *
 * @param rule the rule asked for
 * @param verdict how it ended
 * @param weight μ of the point shown; 1e6 where it is the nominal model
 * @param distanceFromPrior distance of the point shown from the μ = 1 estimate, √Σ(Δx/s)²
 * @param parameters in the order of the study
 * @param gains the instrument gains
 * @param nominal the misfit of the nominal model
 * @param shown the misfit of the point shown
 * @param best the misfit of the best fit within the bounds (μ → 0)
 * @param widening the factor on all intervals, 1 or √(misfit/dof) where even the best fit misfits
 * @param scatterDegreesOfFreedom ν of the pooled scatter
 * @param curve the curve of misfit against change, largest weight first
 * @param profiles of the parameters whose profile is not parabolic or is open on a side
 * @param groups collinear groups
 * @param singularValues of the whitened Jacobian scaled by prior standard deviations, descending
 * @param rank how many of them stand above the noise (1)
 * @param correlation posterior correlations of the parameters
 * @param coefficients the fitted coefficients
 * @param withoutLoadCase the estimate without each load case
 * @param validation the held-out load cases, where there are any
 * @param configurations how each configuration fits
 * @param unexplained what no parameter can explain
 * @param convergence how the estimate was reached
 * @param findings everything the user should know
 */
public record UpdateResult(
    Rule rule,
    Verdict verdict,
    double weight,
    double distanceFromPrior,
    List<ParameterResult> parameters,
    List<GainResult> gains,
    Misfit nominal,
    Misfit shown,
    Misfit best,
    double widening,
    double scatterDegreesOfFreedom,
    List<TradeOffPoint> curve,
    List<Profile> profiles,
    List<CollinearGroup> groups,
    List<Double> singularValues,
    int rank,
    List<List<Double>> correlation,
    List<CoefficientFit> coefficients,
    List<WithoutLoadCase> withoutLoadCase,
    Optional<Validation> validation,
    List<ConfigurationFit> configurations,
    Unexplained unexplained,
    Convergence convergence,
    List<Finding> findings) {
  /** Copies the lists. */
  public UpdateResult {
    parameters = List.copyOf(parameters);
    gains = List.copyOf(gains);
    curve = List.copyOf(curve);
    profiles = List.copyOf(profiles);
    groups = List.copyOf(groups);
    singularValues = List.copyOf(singularValues);
    correlation = correlation.stream().map(List::copyOf).toList();
    coefficients = List.copyOf(coefficients);
    withoutLoadCase = List.copyOf(withoutLoadCase);
    configurations = List.copyOf(configurations);
    findings = List.copyOf(findings);
  }

  /**
   * The same result with its findings.
   *
   * @param newFindings what takes the findings' place
   * @return the result
   */
  UpdateResult with(List<Finding> newFindings) {
    return new UpdateResult(
        rule,
        verdict,
        weight,
        distanceFromPrior,
        parameters,
        gains,
        nominal,
        shown,
        best,
        widening,
        scatterDegreesOfFreedom,
        curve,
        profiles,
        groups,
        singularValues,
        rank,
        correlation,
        coefficients,
        withoutLoadCase,
        validation,
        configurations,
        unexplained,
        convergence,
        newFindings);
  }

  /**
   * Whether the update cannot be relied on as it stands (exit code 5): not converged, misfits even at
   * best, or not validated.
   *
   * @return true if so
   */
  public boolean undecided() {
    return verdict == Verdict.NOT_CONVERGED
        || verdict == Verdict.MISFITS_EVEN_AT_BEST
        || validation.map(v -> !v.validated()).orElse(false);
  }
}
