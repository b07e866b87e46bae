package org.flexbound.update;

import java.util.Locale;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;

/** Says in findings what a reader of the result must not overlook. */
final class ResultFindings {
  private final Findings findings;

  ResultFindings(Findings findings) {
    this.findings = findings;
  }

  void add(UpdateResult result) {
    if (!result.convergence().converged()) {
      say(
          UpdateFinding.NOT_CONVERGED,
          "the solver stopped after "
              + result.convergence().iterations()
              + " iterations: "
              + result.convergence().reason());
    }
    if (!result.convergence().startsAgree()) {
      say(
          UpdateFinding.STARTS_DISAGREE,
          result.convergence().starts().size() + " starts came to more than one point");
    }
    if (!result.best().agrees()) {
      say(
          UpdateFinding.MISFITS_EVEN_AT_BEST,
          String.format(
              Locale.ROOT,
              "the best fit within the bounds has a misfit of %.1f (limit %.1f), worst at %s (%.1f,"
                  + " limit %.1f); all intervals are widened by the factor %.2f",
              result.best().value(),
              result.best().limit(),
              result.best().worstCase(),
              result.best().worstResidual(),
              result.best().residualLimit(),
              result.widening()));
    }
    for (ParameterResult parameter : result.parameters()) {
      if (parameter.needsReason()) {
        say(
            UpdateFinding.NEEDS_REASON,
            "the parameter '"
                + parameter.name()
                + "' "
                + (parameter.onBound()
                    ? "ended on a bound"
                    : "moved by more than two prior standard deviations"));
      }
      if (parameter.status() == Status.NOT_IDENTIFIABLE) {
        say(
            UpdateFinding.NOT_IDENTIFIABLE,
            "the parameter '" + parameter.name() + "' is not identifiable from this test");
      }
    }
    for (CoefficientFit fit : result.coefficients()) {
      if (fit.outlying()) {
        say(
            UpdateFinding.OUTLYING_COEFFICIENT,
            String.format(
                Locale.ROOT,
                "%s: gauge %s under load %s lies %.1f standard deviations from what the others say",
                fit.configuration(),
                fit.gauge(),
                fit.load(),
                fit.studentisedResidual()));
      }
    }
    if (result.configurations().size() > 1) {
      for (ConfigurationFit fit : result.configurations()) {
        if (!fit.agrees()) {
          say(
              UpdateFinding.CONFIGURATION_DISAGREES,
              String.format(
                  Locale.ROOT,
                  "the configuration '%s' has a misfit of %.1f (limit %.1f)",
                  fit.configuration(),
                  fit.misfit(),
                  fit.limit()));
        }
      }
    }
    result
        .validation()
        .filter(v -> !v.validated())
        .ifPresent(
            v ->
                say(
                    UpdateFinding.NOT_VALIDATED,
                    String.format(
                        Locale.ROOT,
                        "the held-out load cases are missed by a misfit of %.1f (limit %.1f)",
                        v.misfit(),
                        v.limit())));
  }

  private void say(UpdateFinding kind, String message) {
    findings.add(kind, Where.nowhere(), message);
  }
}
