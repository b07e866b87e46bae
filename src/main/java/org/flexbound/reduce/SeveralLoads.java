package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.ToIntFunction;
import org.flexbound.statistics.Regression;

/**
 * One gauge under several loads that moved independently in one run: one linear regression with a column for each load and an intercept for
 * each branch (where the steps do not suffice, for each cycle, or one for the run).
 *
 * <p>Branches, cycles and the fit range follow the share of its own peak that the most loaded of the loads has reached. For plots and quality
 * figures each load gets the motion that is left when the other loads' fitted parts are taken out; a straight line through that has the same
 * slope as the regression (Frisch &amp; Waugh 1933, Econometrica 1:387).
 */
final class SeveralLoads {
  private final List<double[]> loads;
  private final List<LoadStep> steps;
  private final ToIntFunction<LoadStep> group;
  private final Regression regression;

  private SeveralLoads(List<double[]> loads, List<LoadStep> steps, ToIntFunction<LoadStep> group, Regression regression) {
    this.loads = loads;
    this.steps = steps;
    this.group = group;
    this.regression = regression;
  }

  /** For each step the largest share of its own peak that a load has, 0 to 1. */
  static double[] share(List<double[]> loads) {
    double[] share = new double[loads.isEmpty() ? 0 : loads.get(0).length];
    for (double[] load : loads) {
      double peak = 0;
      for (double value : load) {
        peak = Math.max(peak, Math.abs(value));
      }
      for (int k = 0; k < share.length; k++) {
        share[k] = Math.max(share[k], peak > 0 ? Math.abs(load[k]) / peak : 0);
      }
    }
    return share;
  }

  /**
   * Fits.
   *
   * @param loads one array for each load, a value for each step
   * @param steps the steps with motion and fate; their own load is the share
   * @throws IllegalArgumentException where there are too few steps
   * @throws Regression.DependentColumns where the loads did not move independently in the fitted steps
   */
  static SeveralLoads fit(List<double[]> loads, List<LoadStep> steps) {
    List<ToIntFunction<LoadStep>> groupings = List.of(LoadStep::branch, LoadStep::cycle);
    for (ToIntFunction<LoadStep> grouping : groupings) {
      Optional<SeveralLoads> fit = attempt(loads, steps, grouping);
      if (fit.isPresent() && fit.get().regression.degreesOfFreedom() > 0) {
        return fit.get();
      }
    }
    return fit(loads, steps, step -> 0);
  }

  /** Empty where the steps do not suffice: the next grouping asks less of them. */
  private static Optional<SeveralLoads> attempt(List<double[]> loads, List<LoadStep> steps, ToIntFunction<LoadStep> grouping) {
    try {
      return Optional.of(fit(loads, steps, grouping));
    } catch (Regression.DependentColumns | IllegalArgumentException tooFew) {
      return Optional.empty();
    }
  }

  private static SeveralLoads fit(List<double[]> loads, List<LoadStep> steps, ToIntFunction<LoadStep> group) {
    Set<Integer> groups = new LinkedHashSet<>();
    steps.stream().filter(SeveralLoads::isFitted).forEach(step -> groups.add(group.applyAsInt(step)));
    List<Integer> order = List.copyOf(groups);
    List<double[]> rows = new ArrayList<>();
    List<Double> motions = new ArrayList<>();
    for (int k = 0; k < steps.size(); k++) {
      if (!isFitted(steps.get(k))) {
        continue;
      }
      double[] row = new double[loads.size() + order.size()];
      for (int l = 0; l < loads.size(); l++) {
        row[l] = loads.get(l)[k];
      }
      row[loads.size() + order.indexOf(group.applyAsInt(steps.get(k)))] = 1;
      rows.add(row);
      motions.add(steps.get(k).motion());
    }
    Regression regression =
        Regression.fit(rows.toArray(double[][]::new), motions.stream().mapToDouble(Double::doubleValue).toArray());
    return new SeveralLoads(loads, steps, group, regression);
  }

  private static boolean isFitted(LoadStep step) {
    return step.fate() == LoadStep.Fate.FITTED;
  }

  /** The standard error of a load's slope; NaN without degrees of freedom. */
  double standardError(int load) {
    return regression.standardError(load);
  }

  /** The steps as one load sees them: its own values, and the motion without the other loads' parts. */
  List<LoadStep> steps(int load) {
    double[] slopes = regression.coefficients();
    List<LoadStep> result = new ArrayList<>();
    for (int k = 0; k < steps.size(); k++) {
      LoadStep step = steps.get(k);
      double motion = step.motion();
      for (int l = 0; l < loads.size(); l++) {
        motion -= l == load ? 0 : slopes[l] * loads.get(l)[k];
      }
      result.add(
          new LoadStep(loads.get(load)[k], motion, step.readings(), step.scatter(), step.rising(), step.cycle(), group.applyAsInt(step),
              step.fate(), step.where()));
    }
    return result;
  }
}
