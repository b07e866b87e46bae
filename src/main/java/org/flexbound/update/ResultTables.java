package org.flexbound.update;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;

/** Turns what was worked out in scaled unknowns into the tables of a result. */
final class ResultTables {
  /** Moved by more prior standard deviations than this, a change needs a reason. */
  private static final double FAR = 2;

  private static final int WORST_SHOWN = 5;

  private final UpdateProblem problem;
  private final List<WorkingParameter> parameters;
  private final Observations observations;
  private final FittedModel model;
  private final Minimum estimate;
  private final Told told;
  private final UpdateSettings settings;
  private final double degrees;

  ResultTables(
      UpdateProblem problem,
      Observations observations,
      FittedModel model,
      Minimum estimate,
      Told told,
      UpdateSettings settings) {
    this.problem = problem;
    this.parameters = problem.parameters();
    this.observations = observations;
    this.model = model;
    this.estimate = estimate;
    this.told = told;
    this.settings = settings;
    this.degrees = observations.scatterDegreesOfFreedom();
  }

  List<ParameterResult> parameters(Minimum shown, double widening) {
    double[] x = model.x(shown.w);
    double[] atOne = model.x(estimate.w);
    List<ParameterResult> result = new ArrayList<>();
    for (int k = 0; k < parameters.size(); k++) {
      WorkingParameter parameter = parameters.get(k);
      Interval scaled = told.interval(k, widening);
      double low = x(k, scaled.low());
      double high = x(k, scaled.high());
      boolean lowOpen = told.profile(k).lowOpen() && !told.profile(k).highOpen();
      boolean highOpen = told.profile(k).highOpen() && !told.profile(k).lowOpen();
      boolean swap = !parameter.growing();
      double lower = parameter.stiffness(swap ? high : low);
      double upper = parameter.stiffness(swap ? low : high);
      boolean onBound = shown.w[k] <= model.lower()[k] || shown.w[k] >= model.upper()[k];
      boolean far = Math.abs(shown.w[k]) > FAR;
      double updated = parameter.stiffness(x[k]);
      result.add(
          new ParameterResult(
              parameter.name(),
              parameter.parameter().scales(),
              parameter.parameter().working(),
              parameter.unit(),
              parameter.nominalStiffness(),
              updated,
              parameter.factor(x[k]),
              parameter.nominal(),
              x[k],
              atOne[k],
              parameter.priorStandardDeviation(),
              parameter.priorStandardDeviation() * told.posterior().standardDeviation(k),
              told.posterior().removed(k),
              (swap ? highOpen : lowOpen) ? 0 : lower,
              (swap ? lowOpen : highOpen) ? Double.POSITIVE_INFINITY : upper,
              parameter.stiffness(swap ? parameter.upper() : parameter.lower()),
              parameter.stiffness(swap ? parameter.lower() : parameter.upper()),
              told.status(k),
              onBound,
              (onBound || far) && parameter.parameter().justification().isBlank(),
              parameter.parameter().justification(),
              jointClass(parameter, parameter.nominalStiffness()),
              jointClass(parameter, updated),
              notes(k)));
    }
    return result;
  }

  private double x(int k, double scaled) {
    WorkingParameter parameter = parameters.get(k);
    double free = parameter.nominal() + scaled * parameter.priorStandardDeviation();
    return Math.min(Math.max(free, parameter.lower()), parameter.upper());
  }

  private static Optional<JointClass> jointClass(WorkingParameter parameter, double stiffness) {
    Optional<String> member = parameter.parameter().referenceMember();
    if (member.isEmpty()
        || !parameter.unit().equals("N·m/rad")
        || Double.isNaN(parameter.referenceStiffness())) {
      return Optional.empty();
    }
    return Optional.of(
        JointClass.of(member.get(), stiffness, parameter.referenceStiffness() / 3));
  }

  private List<String> notes(int k) {
    List<String> notes = new ArrayList<>();
    if (told.fromProfile(k)) {
      notes.add("interval from the profile");
    }
    if (Double.isInfinite(parameters.get(k).nominalStiffness())) {
      notes.add("rigid in the nominal model");
    }
    return notes;
  }

  List<Profile> profiles() {
    List<Profile> result = new ArrayList<>();
    for (int k = 0; k < parameters.size(); k++) {
      ProfileTracer.Traced traced = told.profile(k);
      if (!traced.evaluated() || (traced.parabolic() && traced.lowOpen() == traced.highOpen())) {
        continue;
      }
      List<Profile.Point> points = new ArrayList<>();
      int place = k;
      traced
          .curve()
          .forEach(
              (at, rise) ->
                  points.add(
                      new Profile.Point(
                          parameters.get(place).stiffness(x(place, at)), x(place, at), rise)));
      boolean growing = parameters.get(k).growing();
      OptionalDouble low = crossing(k, growing ? traced.low() : traced.high());
      OptionalDouble high = crossing(k, growing ? traced.high() : traced.low());
      result.add(
          new Profile(
              parameters.get(k).name(), points, told.threshold(), low, high, traced.parabolic()));
    }
    return result;
  }

  private OptionalDouble crossing(int k, double at) {
    return Double.isNaN(at)
        ? OptionalDouble.empty()
        : OptionalDouble.of(parameters.get(k).stiffness(x(k, at)));
  }

  List<CollinearGroup> groups(double widening) {
    List<CollinearGroup> result = new ArrayList<>();
    for (List<Integer> group : told.groups()) {
      List<double[]> directions = told.determined(group);
      for (double[] direction : directions) {
        result.add(combination(group, direction, widening));
      }
      if (directions.isEmpty()) {
        double[] all = new double[group.size() + 1];
        java.util.Arrays.fill(all, 1 / Math.sqrt(group.size()));
        CollinearGroup undetermined = combination(group, all, widening);
        result.add(
            new CollinearGroup(
                undetermined.parameters(),
                List.of(),
                0,
                0,
                0,
                0,
                false,
                String.join(", ", undetermined.parameters())
                    + ": no combination is determined to better than 10 % of its prior variance"));
      }
    }
    return result;
  }

  private CollinearGroup combination(List<Integer> group, double[] direction, double widening) {
    int n = group.size();
    double[] weights = new double[n];
    double length = 0;
    for (int i = 0; i < n; i++) {
      weights[i] = direction[i + 1] / parameters.get(group.get(i)).priorStandardDeviation();
      length += weights[i] * weights[i];
    }
    length = Math.sqrt(length);
    double value = 0;
    double mean = 0;
    double variance = 0;
    double posterior = 0;
    for (int i = 0; i < n; i++) {
      int a = group.get(i);
      double sa = parameters.get(a).priorStandardDeviation() * weights[i] / length;
      value += sa * estimate.w[a];
      mean += sa * told.truncated().mean(a);
      for (int k = 0; k < n; k++) {
        int b = group.get(k);
        double sb = parameters.get(b).priorStandardDeviation() * weights[k] / length;
        variance += sa * sb * told.truncated().covariance(a, b);
        posterior += sa * sb * told.posterior().covariance(a, b);
      }
    }
    List<Double> unit = new ArrayList<>();
    for (double weight : weights) {
      unit.add(weight / length);
    }
    double reach =
        widening * MisfitLimit.student(0.975, Double.POSITIVE_INFINITY) * Math.sqrt(variance);
    return new CollinearGroup(
        group.stream().map(i -> parameters.get(i).name()).toList(),
        unit,
        value,
        Math.sqrt(Math.max(posterior, 0)),
        mean - reach,
        mean + reach,
        true,
        words(group, unit, value, mean - reach, mean + reach));
  }

  private String words(
      List<Integer> group, List<Double> weights, double value, double low, double high) {
    double largest = weights.stream().mapToDouble(Math::abs).max().orElse(1);
    boolean powers =
        group.stream()
            .allMatch(
                i -> parameters.get(i).parameter().working() == org.flexbound.study.Working.LN);
    List<String> parts = new ArrayList<>();
    for (int i = 0; i < group.size(); i++) {
      double relative = weights.get(i) / largest;
      if (Math.abs(relative) < 5e-3) {
        continue;
      }
      String name = parameters.get(group.get(i)).name();
      String number = String.format(Locale.ROOT, "%.2f", relative);
      if (powers) {
        parts.add(number.equals("1.00") ? name : name + "^" + number);
      } else {
        parts.add(number + " · Δ" + name);
      }
    }
    if (powers) {
      return String.format(
          Locale.ROOT,
          "%s = %.4g of nominal (95 %%: %.4g to %.4g)",
          String.join(" · ", parts),
          Math.exp(value / largest),
          Math.exp(low / largest),
          Math.exp(high / largest));
    }
    return String.format(
        Locale.ROOT,
        "%s = %.4g (95 %%: %.4g to %.4g; working variables, from nominal)",
        String.join(" + ", parts),
        value / largest,
        low / largest,
        high / largest);
  }

  List<List<Double>> correlation() {
    List<List<Double>> result = new ArrayList<>();
    Posterior posterior = told.posterior();
    for (int i = 0; i < parameters.size(); i++) {
      List<Double> row = new ArrayList<>();
      for (int k = 0; k < parameters.size(); k++) {
        double sds = posterior.standardDeviation(i) * posterior.standardDeviation(k);
        row.add(i == k ? 1.0 : sds > 0 ? posterior.covariance(i, k) / sds : 0.0);
      }
      result.add(row);
    }
    return result;
  }

  /** The joint linear model of some rows about the estimate; parameters on a bound are held. */
  private LeaveOut joint(int[] rows, Observations of) {
    FlexibilityFunction.Computed computed = problem.function().at(model.x(estimate.w));
    double[] gains = model.gains(estimate.w);
    DMatrixRMaj jacobian = model.columns(computed, gains, rows);
    double[] residuals = of.values(rows);
    double[] predicted = of.predict(rows, computed.coefficients(), gains);
    int p = parameters.size();
    for (int u = 0; u < jacobian.numCols; u++) {
      boolean held =
          u < p
              && (estimate.w[u] <= model.lower()[u] || estimate.w[u] >= model.upper()[u]);
      for (int r = 0; r < rows.length; r++) {
        if (held) {
          jacobian.set(r, u, 0);
        }
        residuals[r] += jacobian.get(r, u) * estimate.w[u];
      }
    }
    for (int r = 0; r < rows.length; r++) {
      residuals[r] -= predicted[r];
    }
    return new LeaveOut(of.covariance(rows), jacobian, p, residuals);
  }

  List<CoefficientFit> coefficients(Minimum shown) {
    int[] rows = model.chosen();
    LeaveOut joint = joint(rows, observations);
    double[] absolute = problem.function().coefficients(model.x(shown.w));
    double[] fitted = observations.predict(rows, absolute, model.gains(shown.w));
    double[] alone =
        observations.predict(rows, absolute, new double[observations.gains().size()]);
    double limit =
        MisfitLimit.student(0.5 + 0.5 * MisfitLimit.sidak(rows.length), degrees);
    List<CoefficientFit> result = new ArrayList<>();
    for (int r = 0; r < rows.length; r++) {
      Observations.Row row = observations.rows().get(rows[r]);
      double studentised = joint.studentised(r);
      List<Double> influence = new ArrayList<>();
      double[] shift = joint.without(List.of(r)).shift;
      for (int k = 0; k < parameters.size(); k++) {
        double sd = Math.max(told.posterior().standardDeviation(k), 1e-12);
        influence.add(shift[k] / sd);
      }
      result.add(
          new CoefficientFit(
              row.name(),
              row.gauge(),
              row.load(),
              row.value(),
              fitted[r],
              alone[r],
              joint.leverage(r),
              studentised,
              Math.abs(studentised) > limit,
              influence));
    }
    return result;
  }

  List<WithoutLoadCase> withoutLoadCase(FitQuality quality) {
    List<WithoutLoadCase> result = new ArrayList<>();
    Map<String, List<Integer>> cases = quality.cases();
    if (cases.size() < 2 || settings.refits() == 0) {
      return result;
    }
    int[] rows = model.chosen();
    LeaveOut joint = joint(rows, observations);
    int refits = settings.refits();
    for (List<Integer> left : cases.values()) {
      LeaveOut.Left without = joint.without(left);
      double[] w = estimate.w.clone();
      for (int i = 0; i < w.length; i++) {
        w[i] = Math.min(Math.max(w[i] + without.shift[i], model.lower()[i]), model.upper()[i]);
      }
      if (refits > 0) {
        refits--;
        int[] kept =
            IntStream.range(0, rows.length)
                .filter(r -> !left.contains(r))
                .map(r -> rows[r])
                .toArray();
        FittedModel rest =
            new FittedModel(observations, parameters, problem.function(), kept);
        w = new GaussNewton(rest, rest.lower(), rest.upper()).minimise(w, rest.ridge(1)).w;
      }
      double[] x = model.x(w);
      List<Double> values = new ArrayList<>();
      List<Double> shifts = new ArrayList<>();
      for (int k = 0; k < parameters.size(); k++) {
        double sd = Math.max(told.posterior().standardDeviation(k), 1e-12);
        values.add(parameters.get(k).stiffness(x[k]));
        shifts.add((w[k] - estimate.w[k]) / sd);
      }
      Observations.Row row = observations.rows().get(rows[left.get(0)]);
      List<Integer> global = left.stream().map(r -> rows[r]).toList();
      result.add(
          new WithoutLoadCase(
              row.name(), row.load(), values, shifts, predicted(global, left, without)));
    }
    return result;
  }

  /**
   * A load case's prediction.
   *
   * @param global its rows among all
   * @param local its rows within what was left out
   * @param without what leaving out showed; errors in the order of {@code local}
   */
  private PredictedCase predicted(
      List<Integer> global, List<Integer> local, LeaveOut.Left without) {
    double t = MisfitLimit.student(0.975, degrees);
    List<PredictedCase.PredictedCoefficient> coefficients = new ArrayList<>();
    for (int i = 0; i < global.size(); i++) {
      Observations.Row row = observations.rows().get(global.get(i));
      double prediction = row.value() - without.errors[i];
      double u = Math.sqrt(without.covariance.get(i, i));
      coefficients.add(
          new PredictedCase.PredictedCoefficient(
              row.gauge(), row.value(), prediction, u, prediction - t * u, prediction + t * u));
    }
    Observations.Row row = observations.rows().get(global.get(0));
    return new PredictedCase(
        row.name(),
        row.load(),
        coefficients,
        without.misfit(),
        MisfitLimit.at(MisfitLimit.LEVEL, local.size(), degrees));
  }

  Optional<Validation> validation(int[] heldOut) {
    if (heldOut.length == 0) {
      return Optional.empty();
    }
    int[] fitted = model.chosen();
    int[] rows = IntStream.concat(IntStream.of(fitted), IntStream.of(heldOut)).toArray();
    LeaveOut joint = joint(rows, observations);
    List<Integer> all = IntStream.range(fitted.length, rows.length).boxed().toList();
    LeaveOut.Left together = joint.without(all);
    Map<String, List<Integer>> cases = new LinkedHashMap<>();
    for (int i = 0; i < heldOut.length; i++) {
      cases
          .computeIfAbsent(
              observations.rows().get(heldOut[i]).caseName(), unused -> new ArrayList<>())
          .add(i);
    }
    List<PredictedCase> predicted = new ArrayList<>();
    for (List<Integer> places : cases.values()) {
      predicted.add(
          predicted(
              places.stream().map(i -> heldOut[i]).toList(), places, together.part(places)));
    }
    double misfit = together.misfit();
    double limit = MisfitLimit.at(MisfitLimit.LEVEL, heldOut.length, degrees);
    return Optional.of(new Validation(predicted, misfit, limit, misfit <= limit));
  }

  Unexplained unexplained(Minimum best, Misfit atBest, FitQuality quality) {
    double[] raw = quality.raw(best);
    int[] rows = model.chosen();
    DMatrixRMaj covariance = observations.covariance(rows);
    Whitener whitener = Whitener.of(covariance);
    double size = norm(whitener.whiten(observations.values(rows)));
    double misfits = norm(whitener.whiten(raw));
    double share =
        atBest.value() > atBest.limit() ? 1 - Math.sqrt(atBest.limit() / atBest.value()) : 0;
    List<Integer> order = new ArrayList<>(IntStream.range(0, raw.length).boxed().toList());
    order.sort(
        Comparator.comparingDouble(r -> -Math.abs(raw[r]) / Math.sqrt(covariance.get(r, r))));
    List<String> worst =
        order.stream()
            .limit(WORST_SHOWN)
            .map(r -> observations.rows().get(rows[r]))
            .map(row -> row.name() + ": " + row.gauge() + " / " + row.load())
            .toList();
    return new Unexplained(
        atBest.value(), atBest.degreesOfFreedom(), size > 0 ? share * misfits / size : 0, worst);
  }

  private static double norm(double[] vector) {
    double sum = 0;
    for (double v : vector) {
      sum += v * v;
    }
    return Math.sqrt(sum);
  }
}
