package org.flexbound.reduce;

import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;
import org.flexbound.statistics.GroupedLine;
import org.flexbound.statistics.Quantiles;
import org.flexbound.statistics.Regression;

/**
 * The slope of one part of the steps against that of another: pull against push, loading against unloading.
 *
 * @param first slope of the first part, SI
 * @param second slope of the second part, SI
 * @param share their difference, share of the slope of all steps
 * @param z their difference over its standard error
 * @param probability that equal slopes differ so much by chance (Welch 1947, Biometrika 34:28)
 */
public record SlopePair(double first, double second, double share, double z, double probability) {
  /** So many steps a part needs. */
  private static final int LEAST = 3;

  static Optional<SlopePair> pullAndPush(List<LoadStep> used, double slope) {
    double peak = used.stream().mapToDouble(step -> Math.abs(step.load())).max().orElse(0);
    return of(used, slope, step -> step.load() > 0.01 * peak, step -> step.load() < -0.01 * peak);
  }

  static Optional<SlopePair> loadingAndUnloading(List<LoadStep> used, double slope) {
    return of(used, slope, LoadStep::rising, step -> !step.rising());
  }

  private static Optional<SlopePair> of(List<LoadStep> used, double slope, Predicate<LoadStep> one, Predicate<LoadStep> other) {
    Optional<GroupedLine> first = fit(used.stream().filter(one).toList());
    Optional<GroupedLine> second = fit(used.stream().filter(other).toList());
    if (first.isEmpty() || second.isEmpty() || slope == 0) {
      return Optional.empty();
    }
    double a = Math.pow(first.get().slopeStandardError(), 2);
    double b = Math.pow(second.get().slopeStandardError(), 2);
    double difference = first.get().slope() - second.get().slope();
    double z = difference == 0 ? 0 : difference / Math.sqrt(a + b);
    double degrees = (a + b) * (a + b)
        / (a * a / first.get().regression().degreesOfFreedom() + b * b / second.get().regression().degreesOfFreedom());
    double probability = a + b > 0 ? 2 * Quantiles.studentTProbability(-Math.abs(z), degrees) : difference == 0 ? 1 : 0;
    return Optional.of(new SlopePair(first.get().slope(), second.get().slope(), difference / Math.abs(slope), z, probability));
  }

  private static Optional<GroupedLine> fit(List<LoadStep> steps) {
    if (steps.size() < LEAST) {
      return Optional.empty();
    }
    try {
      GroupedLine line = GroupedLine.fit(steps.stream().mapToDouble(LoadStep::load).toArray(),
          steps.stream().mapToDouble(LoadStep::motion).toArray(), steps.stream().mapToInt(LoadStep::branch).toArray());
      return line.regression().degreesOfFreedom() > 0 ? Optional.of(line) : Optional.empty();
    } catch (Regression.DependentColumns | IllegalArgumentException tooFew) {
      return Optional.empty();
    }
  }
}
