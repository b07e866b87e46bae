package org.flexbound.acceptance;

import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.flexbound.statistics.Quantiles;

/**
 * What would settle an undecided limit: the number of further runs that decides it with a stated
 * probability (assurance), or the source of uncertainty that stands in the way.
 *
 * <p>After m more runs beside n the mean is y' = y + δ, δ normal with variance S m/(n + m), S the
 * variance of the present mean from scatter: what the first n runs leave unknown of the mean, and
 * gains and floors stay as they were. Its uncertainty is then S n/(n + m) plus the fixed sources. The
 * assurance is the probability that y' lies outside the guard band of that uncertainty on either
 * side; the value may well move, so that "the number at which today's value would pass" is decided in
 * half of the cases only. A better calibration of one source takes its old error out and puts a
 * smaller one in: δ has the variance of both.
 */
final class Settling {
  /** The probability with which the advice must settle it (ours; no source). */
  static final double ASSURANCE = 0.8;

  /** Nobody runs a test more often. */
  private static final int MOST_RUNS = 60;

  private final Quantity quantity;
  private final OptionalDouble lower;
  private final OptionalDouble upper;
  private final double largest;

  Settling(Quantity quantity, OptionalDouble lower, OptionalDouble upper, double largest) {
    boolean inverse = quantity.law() == Quantity.Law.INVERSE;
    this.quantity = inverse ? quantity.inverse() : quantity;
    this.lower = inverse ? inverted(upper) : lower;
    this.upper = inverse ? inverted(lower) : upper;
    this.largest = largest;
  }

  private static OptionalDouble inverted(OptionalDouble bound) {
    return bound.isPresent() ? OptionalDouble.of(1 / bound.getAsDouble()) : bound;
  }

  Advice advice() {
    if (quantity.law() == Quantity.Law.STANDARD_DEVIATION) {
      return deviation();
    }
    Budget budget = quantity.budget();
    if (budget.scatter() > 0) {
      for (int more = 1; more <= MOST_RUNS; more++) {
        double assurance = afterRuns(more);
        if (assurance >= ASSURANCE) {
          return runs(more, assurance);
        }
      }
    }
    double ever = budget.scatter() > 0 ? afterRuns(1_000_000) : 0;
    Optional<Budget.Source> dominant = budget.dominant();
    if (dominant.isEmpty()) {
      return Advice.because(
          "the value lies so near the limit that more than "
              + MOST_RUNS
              + " runs would be needed");
    }
    double total = budget.standardUncertainty();
    OptionalDouble needed = needed(dominant.get());
    Budget.Source source = dominant.get();
    return new Advice(
        OptionalInt.empty(),
        ever,
        dominant.map(Budget.Source::name),
        source.variance() / (total * total),
        Double.isFinite(source.relative())
            ? OptionalDouble.of(source.relative())
            : OptionalDouble.empty(),
        needed.isPresent()
            ? OptionalDouble.of(needed.getAsDouble() / source.uncertainty())
            : needed,
        "");
  }

  private static Advice runs(int more, double assurance) {
    return new Advice(
        OptionalInt.of(more),
        assurance,
        Optional.empty(),
        0,
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        "");
  }

  /** The probability that so many more runs settle it. */
  private double afterRuns(int more) {
    Budget budget = quantity.budget();
    double runs = Math.max(1, quantity.runs());
    double scatter = budget.scatter() * budget.scatter();
    double later = scatter * runs / (runs + more);
    double degrees = budget.scatterDegreesOfFreedom();
    double laterDegrees =
        runs > 1 ? degrees * (runs + more - 1) / (runs - 1) : degrees;
    return decided(
        scatter * more / (runs + more),
        degrees,
        later,
        laterDegrees,
        budget.fixedVariance());
  }

  /**
   * The probability that a value which moves with a variance is decided under its later uncertainty.
   */
  private double decided(
      double moves, double moveDegrees, double scatter, double degrees, double fixed) {
    double u = Math.sqrt(scatter + fixed);
    double guard =
        u > 0
            ? u
                * Quantiles.studentT(
                    1 - largest, Budget.effective(scatter, degrees, fixed))
            : 0;
    double sum = 0;
    double low = lower.isPresent() ? lower.getAsDouble() + guard : Double.NEGATIVE_INFINITY;
    double high = upper.isPresent() ? upper.getAsDouble() - guard : Double.POSITIVE_INFINITY;
    if (low < high) {
      sum += below(high, moves, moveDegrees) - below(low, moves, moveDegrees);
    }
    if (lower.isPresent()) {
      sum += below(lower.getAsDouble() - guard, moves, moveDegrees);
    }
    if (upper.isPresent()) {
      sum += 1 - below(upper.getAsDouble() + guard, moves, moveDegrees);
    }
    return sum;
  }

  private double below(double bound, double moves, double degrees) {
    if (Double.isInfinite(bound)) {
      return bound > 0 ? 1 : 0;
    }
    double distance = bound - quantity.value();
    if (!(moves > 0)) {
      return distance >= 0 ? 1 : 0;
    }
    return Quantiles.studentTProbability(distance / Math.sqrt(moves), degrees);
  }

  /** The uncertainty that one source would have to have; empty where even none would not do. */
  private OptionalDouble needed(Budget.Source source) {
    if (withSource(source, 0) < ASSURANCE) {
      return OptionalDouble.empty();
    }
    double good = 0;
    double bad = source.uncertainty();
    for (int step = 0; step < 50; step++) {
      double middle = (good + bad) / 2;
      if (withSource(source, middle) >= ASSURANCE) {
        good = middle;
      } else {
        bad = middle;
      }
    }
    return OptionalDouble.of(good);
  }

  private double withSource(Budget.Source source, double uncertainty) {
    Budget budget = quantity.budget();
    double replaced = uncertainty * uncertainty;
    return decided(
        source.variance() + replaced,
        Double.POSITIVE_INFINITY,
        budget.scatter() * budget.scatter(),
        budget.scatterDegreesOfFreedom(),
        Math.max(0, budget.fixedVariance() - source.variance()) + replaced);
  }

  /**
   * More runs for a standard deviation: σ² is k s²/χ²_k, drawn at even steps of its probability; the
   * later estimate pools k and m degrees of freedom.
   */
  private Advice deviation() {
    double k = quantity.budget().scatterDegreesOfFreedom();
    double bound = upper.orElse(lower.orElse(Double.NaN));
    for (int more = 1; more <= MOST_RUNS; more++) {
      double assurance = deviationDecided(k, more, bound);
      if (assurance >= ASSURANCE) {
        return runs(more, assurance);
      }
    }
    return Advice.because(
        "the value lies so near the limit that more than " + MOST_RUNS + " runs would be needed");
  }

  private double deviationDecided(double k, int more, double bound) {
    int steps = 50;
    double sum = k * quantity.value() * quantity.value();
    double later = k + more;
    double accept = bound * bound * Quantiles.chiSquared(largest, later);
    double reject = bound * bound * Quantiles.chiSquared(1 - largest, later);
    double decided = 0;
    for (int q = 0; q < steps; q++) {
      double variance = sum / Quantiles.chiSquared((q + 0.5) / steps, k);
      double toAccept = (accept - sum) / variance;
      double toReject = (reject - sum) / variance;
      decided += toAccept > 0 ? 1 - Quantiles.chiSquaredTail(toAccept, more) : 0;
      decided += toReject > 0 ? Quantiles.chiSquaredTail(toReject, more) : 1;
    }
    return decided / steps;
  }
}
