package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntToDoubleFunction;
import org.flexbound.statistics.Quantiles;

/**
 * A step that stays, between two load steps of one gauge and run: found by adding to the line (with a
 * gap between loading and unloading) a level that changes once, at the place where that takes away
 * most, and told only where it takes away clearly more than a drift, a kink or one bad step would.
 *
 * @param before the step before the change
 * @param after the step after it
 * @param size the change, SI
 * @param equivalentLoad the change of load that would make it, N or N·m
 */
record StepChange(LoadStep before, LoadStep after, double size, double equivalentLoad) {
  /** What another explanation must leave, as a multiple of what the change leaves (no source). */
  private static final double BETTER = 2;

  private static final int LEAST_STEPS = 8;

  /**
   * The steps that count, the bedding-in cycle left out, with what the line and its gap leave and an
   * orthonormal basis of them: what one more column takes away follows from its part outside the basis.
   */
  private static final class Series {
    private final List<LoadStep> steps;
    private final List<double[]> basis;
    private final double[] left;

    private Series(List<LoadStep> steps, List<double[]> basis, double[] left) {
      this.steps = steps;
      this.basis = basis;
      this.left = left;
    }

    static Series of(RunSlope slope) {
      List<LoadStep> steps =
          slope.steps().stream()
              .filter(
                  s ->
                      s.fate() == LoadStep.Fate.FITTED || s.fate() == LoadStep.Fate.OUTSIDE_RANGE)
              .toList();
      double top = steps.stream().mapToDouble(s -> Math.abs(s.load())).max().orElse(1);
      List<double[]> basis = new ArrayList<>();
      add(steps.stream().mapToDouble(s -> 1).toArray(), basis);
      add(steps.stream().mapToDouble(s -> s.load() / top).toArray(), basis);
      add(steps.stream().mapToDouble(s -> s.rising() ? 1 : -1).toArray(), basis);
      double[] left = outside(steps.stream().mapToDouble(LoadStep::motion).toArray(), basis);
      return new Series(steps, basis, left);
    }

    private static void add(double[] column, List<double[]> basis) {
      double[] rest = outside(outside(column, basis), basis);
      double norm = Math.sqrt(product(rest, rest));
      if (norm > 1e-6 * Math.sqrt(product(column, column))) {
        for (int k = 0; k < rest.length; k++) {
          rest[k] /= norm;
        }
        basis.add(rest);
      }
    }

    private static double product(double[] a, double[] b) {
      double sum = 0;
      for (int k = 0; k < a.length; k++) {
        sum += a[k] * b[k];
      }
      return sum;
    }

    private static double[] outside(double[] column, List<double[]> basis) {
      double[] rest = column.clone();
      for (double[] direction : basis) {
        double along = product(direction, rest);
        for (int k = 0; k < rest.length; k++) {
          rest[k] -= along * direction[k];
        }
      }
      return rest;
    }

    int size() {
      return left.length;
    }

    double all() {
      return product(left, left);
    }

    /** The coefficient of one more column and what it takes off the sum of squares. */
    double[] with(IntToDoubleFunction more) {
      double[] column = new double[left.length];
      for (int k = 0; k < column.length; k++) {
        column[k] = more.applyAsDouble(k);
      }
      double own = product(column, column);
      double[] rest = outside(column, basis);
      double free = product(rest, rest);
      if (!(free > 1e-9 * own)) {
        return new double[] {0, 0};
      }
      double along = product(rest, left);
      return new double[] {along / free, along * along / free};
    }
  }

  /**
   * Looks for one.
   *
   * @param slope a slope with a single load
   * @param least sizes below this are not worth telling, SI
   * @param level the level of one slope
   */
  static Optional<StepChange> of(RunSlope slope, double least, double level) {
    Series series = Series.of(slope);
    int n = series.size();
    if (n < LEAST_STEPS) {
      return Optional.empty();
    }
    int at = 0;
    double[] best = {0, 0};
    for (int k = 2; k <= n - 2; k++) {
      int place = k;
      double[] found = series.with(i -> i >= place ? 1 : 0);
      if (found[1] > best[1]) {
        best = found;
        at = k;
      }
    }
    double all = series.all();
    double left = Math.max(all - best[1], 0);
    int free = n - series.basis.size() - 1;
    double f = best[1] / (left / free);
    if (at == 0
        || !(Math.abs(best[0]) > least)
        || !(Quantiles.fTail(f, 1, free) < Quantiles.sidak(level, n - 3))
        || !(all - otherwise(series) > BETTER * left)) {
      return Optional.empty();
    }
    return Optional.of(
        new StepChange(
            series.steps.get(at - 1),
            series.steps.get(at),
            best[0],
            best[0] / slope.slope()));
  }

  /** What the best of the other explanations takes away: drift, one bad step, a kink. */
  private static double otherwise(Series series) {
    double most = series.with(i -> i)[1];
    for (int k = 0; k < series.size(); k++) {
      int bad = k;
      double from = series.steps.get(k).load();
      most = Math.max(most, series.with(i -> i == bad ? 1 : 0)[1]);
      most =
          Math.max(
              most,
              series.with(
                  i -> {
                    double load = series.steps.get(i).load();
                    return from * load > 0 ? Math.max(0, Math.abs(load) - Math.abs(from)) : 0;
                  })[1]);
    }
    return most;
  }
}
