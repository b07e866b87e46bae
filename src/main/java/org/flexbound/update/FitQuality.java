package org.flexbound.update;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.ejml.data.DMatrixRMaj;

/**
 * Judges one point: its misfit against the limit, and the residuals of every load case and of every
 * coefficient against Šidák limits, so that one loosened joint cannot hide among many coefficients
 * that fit.
 */
final class FitQuality {
  private final Observations observations;
  private final FlexibilityFunction function;
  private final FittedModel model;
  private final int parameters;
  private final double scatterDegrees;

  FitQuality(
      Observations observations, FlexibilityFunction function, FittedModel model, int parameters) {
    this.observations = observations;
    this.function = function;
    this.model = model;
    this.parameters = parameters;
    this.scatterDegrees = observations.scatterDegreesOfFreedom();
  }

  /**
   * Judges a point.
   *
   * @param point where a minimisation ended (its gains at their best)
   * @param weight the μ it was found with; infinite for the nominal model
   */
  Misfit judge(Minimum point, double weight) {
    double value = misfit(point);
    double used = effective(point, weight);
    double degrees = Math.max(0, point.residuals.length - used);
    double limit = MisfitLimit.at(MisfitLimit.LEVEL, degrees, scatterDegrees);
    Worst worst = worst(raw(point));
    return new Misfit(value, degrees, limit, worst.name, worst.statistic, worst.limit);
  }

  /** ‖r‖² + Σ(gain/u)². */
  double misfit(Minimum point) {
    double sum = 0;
    for (double r : point.residuals) {
      sum += r * r;
    }
    for (int i = parameters; i < point.w.length; i++) {
      sum += point.w[i] * point.w[i];
    }
    return sum;
  }

  /** The effective number of parameters, those on a bound left out. */
  double effective(Minimum point, double weight) {
    if (Double.isInfinite(weight)) {
      return 0;
    }
    return new Posterior(
            new WhitenedModel.Linear(point.residuals, freeColumns(point)),
            freeUnknowns(point),
            free(point).length)
        .effective(weight);
  }

  /** The parameters that do not lie on a bound. */
  int[] free(Minimum point) {
    double[] lower = model.lower();
    double[] upper = model.upper();
    List<Integer> result = new ArrayList<>();
    for (int i = 0; i < parameters; i++) {
      if (point.w[i] > lower[i] && point.w[i] < upper[i]) {
        result.add(i);
      }
    }
    return result.stream().mapToInt(Integer::intValue).toArray();
  }

  private double[] freeUnknowns(Minimum point) {
    int[] free = free(point);
    double[] result = new double[free.length + point.w.length - parameters];
    for (int i = 0; i < result.length; i++) {
      result[i] = point.w[i < free.length ? free[i] : parameters + i - free.length];
    }
    return result;
  }

  private DMatrixRMaj freeColumns(Minimum point) {
    int[] free = free(point);
    int columns = free.length + point.w.length - parameters;
    DMatrixRMaj result = new DMatrixRMaj(point.residuals.length, columns);
    for (int row = 0; row < result.numRows; row++) {
      for (int i = 0; i < columns; i++) {
        int from = i < free.length ? free[i] : parameters + i - free.length;
        result.set(row, i, point.jacobian.get(row, from));
      }
    }
    return result;
  }

  /** Measured less fitted, not whitened, for the fitted coefficients. */
  double[] raw(Minimum point) {
    int[] chosen = model.chosen();
    double[] result = observations.values(chosen);
    double[] predicted =
        observations.predict(
            chosen, function.coefficients(model.x(point.w)), model.gains(point.w));
    for (int i = 0; i < result.length; i++) {
      result[i] -= predicted[i];
    }
    return result;
  }

  private record Worst(String name, double statistic, double limit) {}

  private Worst worst(double[] raw) {
    Map<String, List<Integer>> cases = cases();
    DMatrixRMaj covariance = observations.covariance(model.chosen());
    double caseLevel = MisfitLimit.sidak(cases.size());
    Worst worst = new Worst("", 0, 1);
    for (Map.Entry<String, List<Integer>> entry : cases.entrySet()) {
      Worst found = ofRows(entry.getKey(), entry.getValue(), raw, covariance, caseLevel);
      if (found.statistic / found.limit > worst.statistic / worst.limit) {
        worst = found;
      }
    }
    double single = MisfitLimit.at(MisfitLimit.sidak(raw.length), 1, scatterDegrees);
    for (int i = 0; i < raw.length; i++) {
      double square = raw[i] * raw[i] / covariance.get(i, i);
      if (square / single > worst.statistic / worst.limit) {
        Observations.Row row = observations.rows().get(model.chosen()[i]);
        worst = new Worst(row.caseName() + " at " + row.gauge(), square, single);
      }
    }
    return worst;
  }

  private Worst ofRows(
      String name, List<Integer> rows, double[] raw, DMatrixRMaj covariance, double level) {
    int n = rows.size();
    DMatrixRMaj block = new DMatrixRMaj(n, n);
    double[] part = new double[n];
    for (int i = 0; i < n; i++) {
      part[i] = raw[rows.get(i)];
      for (int k = 0; k < n; k++) {
        block.set(i, k, covariance.get(rows.get(i), rows.get(k)));
      }
    }
    Whitener whitener = Whitener.of(block);
    double sum = 0;
    for (double v : whitener.whiten(part)) {
      sum += v * v;
    }
    return new Worst(name, sum, MisfitLimit.at(level, whitener.rank(), scatterDegrees));
  }

  /** The fitted coefficients of each load case, as places in the chosen rows. */
  Map<String, List<Integer>> cases() {
    Map<String, List<Integer>> result = new LinkedHashMap<>();
    int[] chosen = model.chosen();
    for (int i = 0; i < chosen.length; i++) {
      result
          .computeIfAbsent(
              observations.rows().get(chosen[i]).caseName(), unused -> new ArrayList<>())
          .add(i);
    }
    return result;
  }

  /** How each configuration fits. */
  List<ConfigurationFit> configurations(Minimum point) {
    double[] raw = raw(point);
    DMatrixRMaj covariance = observations.covariance(model.chosen());
    Map<String, List<Integer>> byName = new LinkedHashMap<>();
    for (int i = 0; i < raw.length; i++) {
      byName
          .computeIfAbsent(
              observations.rows().get(model.chosen()[i]).name(), unused -> new ArrayList<>())
          .add(i);
    }
    List<ConfigurationFit> result = new ArrayList<>();
    byName.forEach(
        (name, rows) -> {
          Worst found = ofRows(name, rows, raw, covariance, MisfitLimit.sidak(byName.size()));
          result.add(
              new ConfigurationFit(
                  name,
                  rows.size(),
                  found.statistic,
                  found.limit,
                  found.statistic <= found.limit));
        });
    return result;
  }
}
