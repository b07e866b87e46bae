package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.IntToDoubleFunction;
import org.flexbound.statistics.Quantiles;

/**
 * What stands out in the steps of one gauge and run beside a line with a gap between loading and
 * unloading: a level that changes once and stays, a drift, a kink at one load, or one bad step. Each is
 * added to the line by itself, at the place where it takes away most; the best is told only where it is
 * significant, all places tried allowed for (Šidák 1967), and every other kind, a curve included,
 * leaves clearly more.
 *
 * @param kind what it is
 * @param before the step before it
 * @param after the step at which it shows first
 * @param size the change, SI: of the level, over the run, of the kink from the chord, of the bad step
 * @param load where it is: the load of the kink, or of the step; N or N·m
 * @param equivalentLoad the change of load that would make it, N or N·m
 */
record RunShape(
    Kind kind, LoadStep before, LoadStep after, double size, double load, double equivalentLoad) {
  /** What can stand out. */
  enum Kind {
    /** A level that changes once. */
    STEP,
    /** A drift through the run. */
    DRIFT,
    /** A slope that changes at one load. */
    KINK,
    /** One bad step. */
    BAD_STEP,
    /** A curve: not told here. */
    CURVE
  }

  /** What another explanation must leave, as a multiple of what the change leaves (no source). */
  private static final double BETTER = 2;

  /** A kink below this share of the peak is the toe that the fit range leaves out. */
  private static final double TOE = 0.15;

  private static final int LEAST_STEPS = 8;

  /**
   * The steps that count, the bedding-in cycle left out, with what the line and its gap leave and an
   * orthonormal basis of them: what one more column takes away follows from its part outside the basis.
   */
  private static final class Series {
    private final List<LoadStep> steps;
    private final List<double[]> basis;
    private final double[] left;
    private final double top;

    private Series(List<LoadStep> steps, List<double[]> basis, double[] left, double top) {
      this.steps = steps;
      this.basis = basis;
      this.left = left;
      this.top = top;
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
      return new Series(steps, basis, left, top);
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

    /** Where a kink is tried: at the load of a step, and halfway to the next. */
    double kink(int at) {
      int k = at / 2;
      double load = steps.get(k).load();
      return at % 2 == 0 ? load : 0.5 * (load + steps.get(Math.min(k + 1, left.length - 1)).load());
    }

    /** What a kind adds, by step; in shares of the peak load where it goes with the load. */
    IntToDoubleFunction column(Kind kind, int at) {
      return switch (kind) {
        case STEP -> i -> i >= at ? 1 : 0;
        case DRIFT -> i -> i / (left.length - 1.0);
        case BAD_STEP -> i -> i == at ? 1 : 0;
        case CURVE -> i -> steps.get(i).load() * Math.abs(steps.get(i).load()) / (top * top);
        case KINK -> {
          double from = kink(at);
          yield i -> {
            double load = steps.get(i).load();
            return from * load > 0 ? Math.max(0, Math.abs(load) - Math.abs(from)) / top : 0;
          };
        }
      };
    }

    /**
     * What one unit of a column comes to: its largest value; for a kink its largest distance from the
     * chord, since a straight part of it is the line's.
     */
    double reach(Best best) {
      if (best.kind() == Kind.KINK) {
        double share = Math.abs(kink(best.at())) / top;
        return share > TOE ? share * Math.max(0, 1 - share) : 0;
      }
      IntToDoubleFunction column = column(best.kind(), best.at());
      double most = 0;
      for (int i = 0; i < left.length; i++) {
        most = Math.max(most, column.applyAsDouble(i));
      }
      return most;
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

  /** The best that one kind can do. */
  private record Best(Kind kind, int at, double coefficient, double taken) {}

  /**
   * Looks for one.
   *
   * @param slope a slope with a single load
   * @param least sizes below this are not worth telling, SI
   * @param level the level of one slope
   */
  static Optional<RunShape> of(RunSlope slope, double least, double level) {
    Series series = Series.of(slope);
    int n = series.size();
    if (n < LEAST_STEPS) {
      return Optional.empty();
    }
    List<Best> each = new ArrayList<>();
    for (Kind kind : Kind.values()) {
      each.add(best(series, kind));
    }
    each.sort(Comparator.comparingDouble(b -> -b.taken()));
    Best first = each.get(0);
    double all = series.all();
    double left = Math.max(all - first.taken(), 0);
    int free = n - series.basis.size() - 1;
    double f = first.taken() / (left / free);
    double size = first.coefficient() * series.reach(first);
    if (first.kind() == Kind.CURVE
        || !(first.taken() > 0)
        || !(Math.abs(size) > least)
        || !(Quantiles.fTail(f, 1, free) < Quantiles.sidak(level, 2 * n))
        || !(all - each.get(1).taken() > BETTER * left)) {
      return Optional.empty();
    }
    boolean kink = first.kind() == Kind.KINK;
    int index = kink ? first.at() / 2 : first.at();
    return Optional.of(
        new RunShape(
            first.kind(),
            series.steps.get(Math.max(0, index - 1)),
            series.steps.get(index),
            size,
            kink ? series.kink(first.at()) : series.steps.get(index).load(),
            size / slope.slope()));
  }

  private static Best best(Series series, Kind kind) {
    Best best = new Best(kind, 0, 0, 0);
    int n = series.size();
    boolean once = kind == Kind.DRIFT || kind == Kind.CURVE;
    // a level that changes before the second or last step is a bad step as well
    int from = kind == Kind.STEP ? 2 : 0;
    int to = once ? 1 : kind == Kind.STEP ? n - 1 : kind == Kind.KINK ? 2 * n : n;
    for (int k = from; k < to; k++) {
      double[] found = series.with(series.column(kind, k));
      if (found[1] > best.taken()) {
        best = new Best(kind, k, found[0], found[1]);
      }
    }
    return best;
  }
}
