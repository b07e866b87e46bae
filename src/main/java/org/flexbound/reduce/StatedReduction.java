package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.MatrixChecks;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.flexbound.setup.StatedCoefficient;
import org.flexbound.statistics.PooledScatter;
import org.flexbound.testlog.TestLog;

/**
 * Takes coefficients that were reduced elsewhere for what they are: base motion is taken out and the
 * matrix is checked as for readings, and what only readings could show is said to be unknown.
 *
 * <p>The stated uncertainties are taken as those of independent errors. A calibration error that is
 * common to several coefficients cannot be told from them. Where degrees of freedom differ, the
 * smallest count for the matrix as a whole.
 */
final class StatedReduction {
  private final ReductionProblem problem;
  private final TestLog log;
  private final Findings findings;

  StatedReduction(ReductionProblem problem, Findings findings) {
    this.problem = problem;
    this.log = problem.log();
    this.findings = findings;
  }

  Reduction reduce() {
    findings.add(
        ReduceFinding.STATED,
        log.coefficients().get(0).where(),
        log.coefficients().size()
            + " coefficients were taken as they are stated. Without readings nothing can be said of"
            + " linearity, hysteresis, drift, set, repeatability or faults of gauges; errors that"
            + " are common to several coefficients, such as a calibration, are taken as independent");
    noteMissing();
    List<AbsoluteCoefficient> absolute = new ArrayList<>();
    double freedom = Double.POSITIVE_INFINITY;
    for (StatedCoefficient stated : log.coefficients()) {
      absolute.add(
          new AbsoluteCoefficient(
              index(log.gauges().stream().map(Gauge::name).toList(), stated.gauge()),
              index(log.loads().stream().map(Load::name).toList(), stated.load()),
              stated.value(),
              stated.standardUncertainty(),
              0,
              List.of(),
              1));
      freedom = Math.min(freedom, stated.degreesOfFreedom());
    }
    FlexibilityBuilder builder = new FlexibilityBuilder(problem, findings);
    MeasuredFlexibility flexibility = withOwnFreedom(builder.build(absolute, freedom));
    MatrixChecks checks =
        MatrixChecks.of(
            flexibility, problem.places()::of, log.options().qualityLimits().reciprocityZ());
    new MatrixJudgement(log.gauges(), findings).judge(checks);
    return new Reduction(
        flexibility,
        List.of(),
        List.of(),
        new PooledScatter(0, 0, 0),
        false,
        false,
        true,
        Map.of(),
        builder.baseShares(),
        checks,
        List.of(),
        findings.list());
  }

  private static int index(List<String> names, String name) {
    return names.indexOf(name);
  }

  /** A coefficient that stands as it was stated keeps its own degrees of freedom. */
  private MeasuredFlexibility withOwnFreedom(MeasuredFlexibility flexibility) {
    List<Coefficient> own = new ArrayList<>();
    for (int row = 0; row < flexibility.coefficients().size(); row++) {
      Coefficient c = flexibility.coefficients().get(row);
      int[] inputs = flexibility.map().columns(row);
      own.add(
          inputs.length == 1
              ? new Coefficient(
                  c.gauge(),
                  c.load(),
                  c.value(),
                  c.standardUncertainty(),
                  log.coefficients().get(inputs[0]).degreesOfFreedom())
              : c);
    }
    return new MeasuredFlexibility(
        flexibility.configuration(),
        flexibility.gauges(),
        flexibility.loads(),
        flexibility.absolute(),
        flexibility.gains(),
        flexibility.scatterDegreesOfFreedom(),
        flexibility.map(),
        own);
  }

  private void noteMissing() {
    for (Load load : log.loads()) {
      if (log.coefficients().stream().noneMatch(c -> c.load().equals(load.name()))) {
        missing(load.where(), "load", load.name());
      }
    }
    for (Gauge gauge : log.gauges()) {
      if (log.coefficients().stream().noneMatch(c -> c.gauge().equals(gauge.name()))) {
        missing(gauge.where(), "gauge", gauge.name());
      }
    }
  }

  private void missing(Where where, String kind, String name) {
    findings.add(
        ReduceFinding.NOT_MEASURED,
        where,
        "no coefficient is stated for the " + kind + " '" + name + "'");
  }
}
