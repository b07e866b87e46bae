package org.flexbound.report.gather;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.BiFunction;
import org.flexbound.report.results.ConfigurationFit;
import org.flexbound.report.results.Fit;
import org.flexbound.report.results.GainEstimate;
import org.flexbound.report.results.Group;
import org.flexbound.report.results.JointClass;
import org.flexbound.report.results.JointTest;
import org.flexbound.report.results.Misfit;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.Profile;
import org.flexbound.report.results.ParameterWithout;
import org.flexbound.report.results.ProfilePoint;
import org.flexbound.report.results.Start;
import org.flexbound.report.results.TradeOff;
import org.flexbound.report.results.Unexplained;
import org.flexbound.report.results.Update;
import org.flexbound.report.results.Validation;
import org.flexbound.report.results.WithoutCase;
import org.flexbound.study.Rule;
import org.flexbound.update.ParameterResult;
import org.flexbound.update.PredictedCase;
import org.flexbound.update.UpdateResult;
import org.flexbound.update.WithoutLoadCase;

/** What an update found. */
final class UpdatePart {
  private UpdatePart() {}

  static List<Parameter> parameters(UpdateResult result) {
    return result.parameters().stream().map(p -> parameter(p, result)).toList();
  }

  private static Parameter parameter(ParameterResult p, UpdateResult result) {
    return new Parameter(
        p.name(),
        p.scales(),
        p.stiffnessUnit(),
        Values.finite(p.nominal()),
        Values.finite(p.updated()),
        Values.finite(p.factor()),
        Values.finite(p.lowerBound()),
        Values.finite(p.upperBound()),
        Values.word(p.working()),
        p.priorMean(),
        p.workingValue(),
        p.workingEstimate(),
        p.priorStandardDeviation(),
        p.posteriorStandardDeviation(),
        p.varianceRemoved(),
        p.lower95() > 0 ? Values.finite(p.lower95()) : OptionalDouble.empty(),
        Values.finite(p.upper95()),
        p.status().words(),
        p.onBound(),
        p.needsReason(),
        p.justification(),
        p.classBefore().map(UpdatePart::jointClass),
        p.classAfter().map(UpdatePart::jointClass),
        p.notes(),
        result.profiles().stream()
            .filter(profile -> profile.parameter().equals(p.name()))
            .findFirst()
            .map(UpdatePart::profile));
  }

  private static JointClass jointClass(org.flexbound.update.JointClass c) {
    return new JointClass(c.member(), Values.orZero(c.ratio()), c.en1993(), c.aisc360());
  }

  private static Profile profile(org.flexbound.update.Profile profile) {
    return new Profile(
        profile.threshold(),
        profile.parabolic(),
        profile.points().stream()
            .filter(p -> Double.isFinite(p.rise()) && Double.isFinite(p.working()))
            .map(p -> new ProfilePoint(Values.finite(p.value()), p.working(), p.rise()))
            .toList());
  }

  static Update update(UpdateResult r) {
    List<TradeOff> curve =
        r.curve().stream()
            .filter(p -> Double.isFinite(p.weight()) && Double.isFinite(p.misfit()))
            .map(p -> new TradeOff(p.weight(), p.misfit(), p.change(), p.effectiveParameters()))
            .toList();
    List<Group> groups =
        r.groups().stream()
            .map(
                g ->
                    new Group(
                        g.parameters(),
                        g.weights(),
                        g.value(),
                        g.standardDeviation(),
                        g.lower95(),
                        g.upper95(),
                        g.determined(),
                        g.inWords()))
            .toList();
    List<GainEstimate> gains =
        r.gains().stream()
            .map(
                g ->
                    new GainEstimate(
                        g.key(),
                        g.description(),
                        g.priorUncertainty(),
                        g.fitted(),
                        g.posteriorStandardDeviation()))
            .toList();
    List<Fit> fits =
        r.coefficients().stream()
            .map(
                c ->
                    new Fit(
                        c.configuration(),
                        c.gauge(),
                        c.load(),
                        c.fitted(),
                        Values.orZero(c.leverage()),
                        Values.orZero(c.studentisedResidual()),
                        c.outlying(),
                        c.influence().stream().map(Values::orZero).toList()))
            .toList();
    List<ConfigurationFit> configurations =
        r.configurations().stream()
            .map(
                c ->
                    new ConfigurationFit(
                        c.configuration(), c.coefficients(), c.misfit(), c.limit(), c.agrees()))
            .toList();
    List<WithoutCase> without =
        r.withoutLoadCase().stream()
            .map(
                w ->
                    new WithoutCase(
                        w.configuration(),
                        w.load(),
                        without(r, w),
                        w.prediction().misfit(),
                        Values.orZero(w.prediction().limit()),
                        w.prediction().misfit() <= w.prediction().limit()))
            .toList();
    return new Update(
        rule(r.rule()),
        r.verdict().words(),
        r.weight(),
        r.distanceFromPrior(),
        misfit(r.nominal()),
        misfit(r.shown()),
        misfit(r.best()),
        r.widening(),
        Values.finite(r.scatterDegreesOfFreedom()),
        curve,
        groups,
        r.singularValues(),
        r.rank(),
        r.correlation(),
        gains,
        fits,
        configurations,
        without,
        validation(r),
        new Unexplained(
            Values.orZero(r.unexplained().misfit()),
            Values.orZero(r.unexplained().degreesOfFreedom()),
            Values.orZero(r.unexplained().correctionSize()),
            r.unexplained().worst()),
        r.convergence().converged(),
        r.convergence().reason(),
        r.convergence().iterations(),
        r.convergence().evaluations(),
        Values.orZero(r.convergence().projectedGradient()),
        r.convergence().starts().stream()
            .map(
                s ->
                    new Start(
                        s.converged(), Values.orZero(s.objective()), s.iterations(), s.distance()))
            .toList(),
        r.convergence().startsAgree());
  }

  private static List<ParameterWithout> without(UpdateResult r, WithoutLoadCase w) {
    List<ParameterWithout> list = new ArrayList<>();
    for (int k = 0; k < r.parameters().size(); k++) {
      list.add(
          new ParameterWithout(
              r.parameters().get(k).name(),
              Values.finite(w.values().get(k)),
              Values.orZero(w.shifts().get(k))));
    }
    return list;
  }

  private static String rule(Rule rule) {
    if (rule instanceof Rule.Prior) {
      return "prior";
    }
    if (rule instanceof Rule.Discrepancy) {
      return "discrepancy";
    }
    return rule instanceof Rule.Stated stated ? "stated weight " + stated.weight() : "curve-corner";
  }

  private static Misfit misfit(org.flexbound.update.Misfit m) {
    return new Misfit(
        m.value(),
        m.degreesOfFreedom(),
        Values.orZero(m.limit()),
        m.worstCase(),
        Values.orZero(m.worstResidual()),
        Values.orZero(m.residualLimit()),
        m.agrees());
  }

  private static Optional<JointTest> validation(UpdateResult r) {
    return r.validation()
        .map(
            v ->
                new JointTest(
                    "",
                    "held-out load cases together",
                    v.misfit(),
                    Values.finite(v.limit()),
                    OptionalDouble.empty(),
                    OptionalDouble.empty(),
                    v.validated(),
                    v.validated()
                        ? "predicted as well as their uncertainty allows"
                        : "predicted worse than their uncertainty allows"));
  }

  /**
   * The held-out coefficients.
   *
   * @param unit the SI unit of a coefficient by gauge and load
   */
  static List<Validation> validation(
      UpdateResult result, BiFunction<String, String, String> unit) {
    List<Validation> list = new ArrayList<>();
    if (result.validation().isEmpty()) {
      return list;
    }
    for (PredictedCase held : result.validation().get().cases()) {
      for (PredictedCase.PredictedCoefficient c : held.coefficients()) {
        list.add(
            new Validation(
                held.configuration(),
                c.gauge(),
                held.load(),
                c.measured(),
                c.predicted(),
                c.standardUncertainty(),
                c.lower95(),
                c.upper95(),
                (c.measured() - c.predicted()) / c.standardUncertainty(),
                c.measured() >= c.lower95() && c.measured() <= c.upper95(),
                unit.apply(c.gauge(), held.load())));
      }
    }
    return list;
  }
}
