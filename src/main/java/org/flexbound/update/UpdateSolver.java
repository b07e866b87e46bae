package org.flexbound.update;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.flexbound.finding.Findings;
import org.flexbound.flexibility.Gain;
import org.flexbound.study.Rule;

/**
 * Solves an update: the μ = 1 estimate with all that the data tell, and the point that the rule asks
 * for.
 */
public final class UpdateSolver {
  /** Starts that end nearer than this, in posterior standard deviations, agree. */
  private static final double SAME_POINT = 1e-3;

  private final UpdateSettings settings;

  /**
   * A solver.
   *
   * @param settings how much of the evidence is worked out
   */
  public UpdateSolver(UpdateSettings settings) {
    this.settings = settings;
  }

  /**
   * Solves.
   *
   * @param problem what is to be solved; every compared coefficient has an uncertainty from scatter
   *     or floor
   * @return the result with all its evidence
   */
  public UpdateResult solve(UpdateProblem problem) {
    return new Work(problem).result();
  }

  private final class Work {
    private final UpdateProblem problem;
    private final int p;
    private final Observations observations;
    private final FittedModel model;
    private final GaussNewton solver;
    private final FitQuality quality;
    private final Findings findings = new Findings();

    Work(UpdateProblem problem) {
      this.problem = problem;
      this.p = problem.parameters().size();
      this.observations = observations(1);
      this.model = model(observations);
      this.solver = new GaussNewton(model, model.lower(), model.upper());
      this.quality = new FitQuality(observations, problem.function(), model, p);
    }

    private Observations observations(double scatterFactor) {
      return new Observations(problem.measured(), problem.sharedEffects(), scatterFactor);
    }

    private FittedModel model(Observations of) {
      return new FittedModel(of, problem.parameters(), problem.function(), rows(of, false));
    }

    private int[] rows(Observations of, boolean heldOut) {
      return IntStream.range(0, of.rows().size())
          .filter(r -> isHeldOut(of.rows().get(r)) == heldOut)
          .toArray();
    }

    private boolean isHeldOut(Observations.Row row) {
      return problem.heldOut().stream().anyMatch(h -> h.matches(row.name(), row.load()));
    }

    UpdateResult result() {
      List<Minimum> ends = starts();
      Minimum estimate = ends.stream().min(UpdateSolver::better).orElseThrow();
      Posterior posterior = posterior(model, estimate);
      double degrees = observations.scatterDegreesOfFreedom();
      FittedModel wide = model(observations(MisfitLimit.scatterFactor(degrees)));
      Told told =
          new Told(
              problem.parameters(),
              model,
              solver,
              estimate,
              posterior,
              posterior(wide, estimate),
              degrees,
              settings.tracedProfiles());
      TradeOff tradeOff =
          new TradeOff(solver, model, quality, p, estimate, settings.curve());
      Minimum nominal = nominal();
      Misfit atNominal = quality.judge(nominal, Double.POSITIVE_INFINITY);
      Misfit atBest = quality.judge(tradeOff.best(), tradeOff.bestWeight());
      boolean misfits = !atBest.agrees();
      double widening =
          misfits && atBest.degreesOfFreedom() > 0
              ? Math.max(1, Math.sqrt(atBest.value() / atBest.degreesOfFreedom()))
              : 1;
      Chosen chosen = choose(estimate, nominal, atNominal, tradeOff, misfits);
      Verdict verdict = chosen.verdict;
      if (!estimate.converged || !chosen.point.converged) {
        verdict = Verdict.NOT_CONVERGED;
      }
      Convergence convergence = convergence(ends, estimate, posterior);
      ResultTables tables =
          new ResultTables(problem, observations, model, estimate, told, settings);
      List<ParameterResult> parameters = tables.parameters(chosen.point, widening);
      List<CoefficientFit> coefficients =
          settings.curve() ? tables.coefficients(chosen.point) : List.of();
      Optional<Validation> validation = tables.validation(rows(observations, true));
      List<ConfigurationFit> configurations = quality.configurations(chosen.point);
      Unexplained unexplained = tables.unexplained(tradeOff.best(), atBest, quality);
      UpdateResult result =
          new UpdateResult(
              problem.rule(),
              verdict,
              chosen.weight,
              distance(chosen.point, estimate),
              parameters,
              gains(wide, estimate),
              atNominal,
              quality.judge(chosen.point, chosen.weight),
              atBest,
              widening,
              degrees,
              settings.curve() ? tradeOff.curve() : List.of(),
              tables.profiles(),
              tables.groups(widening),
              Arrays.stream(posterior.singularValues()).boxed().toList(),
              (int) Arrays.stream(posterior.singularValues()).filter(s -> s > 1).count(),
              tables.correlation(),
              coefficients,
              tables.withoutLoadCase(quality),
              validation,
              configurations,
              unexplained,
              convergence,
              List.of());
      new ResultFindings(findings).add(result);
      return result.with(findings.list());
    }

    private List<Minimum> starts() {
      List<Minimum> ends = new ArrayList<>();
      for (int s = 0; s < problem.starts(); s++) {
        double[] start = new double[model.unknowns()];
        if (s > 0) {
          for (int i = 0; i < p; i++) {
            start[i] = scattered(problem.parameters().get(i).name(), s, i);
          }
        }
        ends.add(solver.minimise(start, model.ridge(1)));
      }
      return ends;
    }

    /** A start drawn evenly between the bounds, by the parameter's name and not its place. */
    private double scattered(String name, int start, int i) {
      double u = new SplittableRandom(name.hashCode() * 1_000_003L + start).nextDouble();
      return model.lower()[i] + u * (model.upper()[i] - model.lower()[i]);
    }

    private Posterior posterior(FittedModel of, Minimum at) {
      return new Posterior(of.linearise(at.w), at.w, p);
    }

    private Minimum nominal() {
      double[] low = model.lower();
      double[] high = model.upper();
      for (int i = 0; i < p; i++) {
        low[i] = 0;
        high[i] = 0;
      }
      return solver.minimise(new double[model.unknowns()], model.ridge(1), low, high);
    }

    private record Chosen(Minimum point, double weight, Verdict verdict) {}

    private Chosen choose(
        Minimum estimate, Minimum nominal, Misfit atNominal, TradeOff tradeOff, boolean misfits) {
      Verdict usual = misfits ? Verdict.MISFITS_EVEN_AT_BEST : Verdict.UPDATED;
      Rule rule = problem.rule();
      if (rule instanceof Rule.Stated stated) {
        return new Chosen(tradeOff.at(Math.log(stated.weight())), stated.weight(), usual);
      }
      if (rule instanceof Rule.CurveCorner) {
        double corner = tradeOff.corner();
        return new Chosen(tradeOff.at(corner), Math.exp(corner), usual);
      }
      if (rule instanceof Rule.Discrepancy) {
        if (atNominal.agrees()) {
          return new Chosen(nominal, TradeOff.MOST, Verdict.NO_CHANGE_WARRANTED);
        }
        double ln = tradeOff.largestAgreeing();
        if (!Double.isNaN(ln)) {
          return new Chosen(tradeOff.at(ln), Math.exp(ln), Verdict.UPDATED);
        }
        return new Chosen(estimate, 1, Verdict.MISFITS_EVEN_AT_BEST);
      }
      return new Chosen(estimate, 1, usual);
    }

    private double distance(Minimum a, Minimum b) {
      double sum = 0;
      for (int i = 0; i < p; i++) {
        sum += (a.w[i] - b.w[i]) * (a.w[i] - b.w[i]);
      }
      return Math.sqrt(sum);
    }

    private Convergence convergence(List<Minimum> ends, Minimum best, Posterior posterior) {
      List<Convergence.Start> starts = new ArrayList<>();
      boolean agree = true;
      int evaluations = 0;
      for (Minimum end : ends) {
        double furthest = 0;
        for (int i = 0; i < p; i++) {
          double sd = Math.max(posterior.standardDeviation(i), 1e-12);
          furthest = Math.max(furthest, Math.abs(end.w[i] - best.w[i]) / sd);
        }
        agree &= !end.converged || furthest <= SAME_POINT;
        evaluations += end.evaluations;
        starts.add(new Convergence.Start(end.converged, end.objective, end.iterations, furthest));
      }
      return new Convergence(
          best.converged,
          best.reason,
          best.iterations,
          evaluations,
          best.projectedGradient,
          starts,
          agree);
    }

    private List<GainResult> gains(FittedModel of, Minimum estimate) {
      List<GainResult> result = new ArrayList<>();
      double[] variances = GainVariance.of(of.linearise(estimate.w).jacobian, p);
      for (int g = 0; g < observations.gains().size(); g++) {
        Gain gain = observations.gains().get(g);
        result.add(
            new GainResult(
                gain.key(),
                gain.description(),
                gain.priorUncertainty(),
                estimate.w[p + g] * gain.priorUncertainty(),
                gain.priorUncertainty() * Math.sqrt(variances[g])));
      }
      return result;
    }
  }

  private static int better(Minimum a, Minimum b) {
    if (a.converged != b.converged) {
      return a.converged ? -1 : 1;
    }
    return Double.compare(a.objective, b.objective);
  }
}
