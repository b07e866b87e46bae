package org.flexbound.report.gather;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.Function;
import java.util.function.ToDoubleFunction;
import org.flexbound.compare.CoefficientComparison;
import org.flexbound.compare.ConfigurationComparison;
import org.flexbound.report.results.Comparison;
import org.flexbound.report.results.Contribution;
import org.flexbound.report.results.JointTest;
import org.flexbound.update.CoefficientFit;
import org.flexbound.update.PredictedCase;
import org.flexbound.update.UpdateResult;

/** Measured against computed, before and after an update. */
final class ComparisonPart {
  private final Map<String, String> units;
  private final Map<String, Double> updated = new LinkedHashMap<>();
  private final Map<String, Double> heldOut = new LinkedHashMap<>();

  /**
   * With what an update made of the coefficients, where there was one.
   *
   * @param units SI unit of each coefficient, by {@link #key}
   */
  ComparisonPart(Map<String, String> units, Optional<UpdateResult> update) {
    this.units = units;
    if (update.isEmpty()) {
      return;
    }
    for (CoefficientFit fit : update.get().coefficients()) {
      updated.put(key(fit.configuration(), fit.gauge(), fit.load()), fit.updatedModel());
    }
    update
        .get()
        .validation()
        .ifPresent(
            validation -> {
              for (PredictedCase held : validation.cases()) {
                for (PredictedCase.PredictedCoefficient c : held.coefficients()) {
                  heldOut.put(key(held.configuration(), c.gauge(), held.load()), c.predicted());
                }
              }
            });
  }

  static String key(String configuration, String gauge, String load) {
    return configuration + "\u0000" + gauge + "\u0000" + load;
  }

  List<Comparison> comparison(org.flexbound.compare.Comparison comparison) {
    List<Comparison> result = new ArrayList<>();
    for (CoefficientComparison c : comparison.coefficients()) {
      String key = key(c.configuration(), c.gauge(), c.load());
      boolean held = heldOut.containsKey(key);
      OptionalDouble after = optional(held ? heldOut.get(key) : updated.get(key));
      boolean small = c.ratio().isEmpty();
      result.add(
          new Comparison(
              c.configuration(),
              c.gauge(),
              c.load(),
              c.measured(),
              c.standardUncertainty(),
              c.computed(),
              c.ratio(),
              Values.orZero(c.z()),
              after,
              after.isPresent() && !small
                  ? Values.finite(c.measured() / after.getAsDouble())
                  : OptionalDouble.empty(),
              after.isPresent()
                  ? Values.finite(
                      (c.measured() - after.getAsDouble()) / c.standardUncertainty())
                  : OptionalDouble.empty(),
              held,
              modal(c, CoefficientComparison.Truncated::full),
              count(c, CoefficientComparison.Truncated::within10),
              count(c, CoefficientComparison.Truncated::within5),
              count(c, CoefficientComparison.Truncated::within1),
              modal(c, CoefficientComparison.Truncated::massless),
              c.fromMeasuredModes(),
              units.getOrDefault(key, "")));
    }
    return result;
  }

  private static OptionalDouble modal(
      CoefficientComparison c, ToDoubleFunction<CoefficientComparison.Truncated> part) {
    return c.truncated().isPresent()
        ? Values.finite(part.applyAsDouble(c.truncated().get()))
        : OptionalDouble.empty();
  }

  private static OptionalDouble count(
      CoefficientComparison c, Function<CoefficientComparison.Truncated, OptionalInt> part) {
    OptionalInt count = c.truncated().map(part).orElse(OptionalInt.empty());
    return count.isPresent() ? OptionalDouble.of(count.getAsInt()) : OptionalDouble.empty();
  }

  private static OptionalDouble optional(@org.jspecify.annotations.Nullable Double value) {
    return value == null ? OptionalDouble.empty() : Values.finite(value);
  }

  List<Contribution> contributions(org.flexbound.compare.Comparison comparison) {
    List<Contribution> result = new ArrayList<>();
    for (CoefficientComparison c : comparison.coefficients()) {
      if (c.ratio().isEmpty()) {
        // Nothing against its uncertainty: its parts would only show rounding.
        continue;
      }
      for (CoefficientComparison.Contribution part : c.contributions()) {
        if (part.value() != 0) {
          result.add(
              new Contribution(
                  c.configuration(),
                  c.gauge(),
                  c.load(),
                  part.part(),
                  part.value(),
                  units.getOrDefault(key(c.configuration(), c.gauge(), c.load()), "")));
        }
      }
    }
    return result;
  }

  static List<JointTest> tests(org.flexbound.compare.Comparison comparison) {
    List<JointTest> result = new ArrayList<>();
    for (ConfigurationComparison c : comparison.configurations()) {
      result.add(
          new JointTest(
              c.configuration(),
              "Nominal model against all coefficients",
              c.misfit(),
              Values.finite(c.limit()),
              OptionalDouble.of(c.coefficients().size()),
              OptionalDouble.empty(),
              c.misfit() <= c.limit(),
              c.misfit() <= c.limit()
                  ? "the nominal model agrees with the test"
                  : "the nominal model disagrees with the test by more than chance explains"));
    }
    return result;
  }
}
