package org.flexbound.compare;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.statistics.RepeatedMedianLine;

/**
 * Measured beside computed coefficients for the search after mistakes: a distance that takes the
 * model's own error into account, so that a mistake stands out against a model that is merely wrong.
 *
 * <p>The distance of a pair is (measured − computed) over √(u² + (τ s)²), s the larger of the two, but
 * no less than a tenth of the gauge's largest measured coefficient of one kind of load, and τ the usual
 * relative disagreement of the whole test (1.4826 times its median, no less than 5 %).
 */
final class HintTable {
  private static final double NORMAL = 1.4826;
  private static final double LEAST_DISAGREEMENT = 0.05;
  private static final double FLOOR = 0.1;

  private final double[] measured;
  private final double[] computed;
  private final double[] uncertainty;
  private final double[] floor;
  private final double disagreement;
  private final Map<Integer, List<Integer>> byGauge = new LinkedHashMap<>();
  private final Map<Integer, List<Integer>> byLoad = new LinkedHashMap<>();
  private final MeasuredFlexibility test;

  HintTable(
      MeasuredFlexibility test, double[] measured, double[] computed, double[] uncertainty) {
    this.test = test;
    this.measured = measured.clone();
    this.computed = computed.clone();
    this.uncertainty = uncertainty.clone();
    this.floor = new double[measured.length];
    for (int r = 0; r < measured.length; r++) {
      Coefficient c = test.coefficients().get(r);
      byGauge.computeIfAbsent(c.gauge(), key -> new ArrayList<>()).add(r);
      byLoad.computeIfAbsent(c.load(), key -> new ArrayList<>()).add(r);
    }
    for (List<Integer> rows : byGauge.values()) {
      for (int r : rows) {
        double largest = 0;
        for (int other : rows) {
          if (isMoment(other) == isMoment(r)) {
            largest = Math.max(largest, Math.abs(measured[other]));
          }
        }
        floor[r] = FLOOR * largest;
      }
    }
    this.disagreement = disagreement(1);
  }

  private boolean isMoment(int row) {
    return test.loads().get(test.coefficients().get(row).load()).isMoment();
  }

  /** The usual relative disagreement, were everything computed a factor larger. */
  double disagreement(double factor) {
    double[] each = new double[measured.length];
    for (int r = 0; r < each.length; r++) {
      double size =
          Math.max(Math.max(Math.abs(measured[r]), Math.abs(factor * computed[r])), floor[r]);
      each[r] = size > 0 ? Math.abs(measured[r] - factor * computed[r]) / size : 0;
    }
    double median = RepeatedMedianLine.median(each);
    return Double.isNaN(median)
        ? LEAST_DISAGREEMENT
        : Math.max(LEAST_DISAGREEMENT, NORMAL * median);
  }

  double disagreement() {
    return disagreement;
  }

  /** The squared distance of one coefficient from another computed value. */
  double squared(int row, double other) {
    double size = Math.max(Math.max(Math.abs(measured[row]), Math.abs(other)), floor[row]);
    double scale = Math.hypot(uncertainty[row], disagreement * size);
    double d = scale > 0 ? (measured[row] - other) / scale : 0;
    return d * d;
  }

  /** The squared distance as it is. */
  double squared(int row) {
    return squared(row, computed[row]);
  }

  double sum(List<Integer> rows) {
    return rows.stream().mapToDouble(this::squared).sum();
  }

  double scaled(List<Integer> rows, double factor) {
    return rows.stream().mapToDouble(r -> squared(r, factor * computed[r])).sum();
  }

  double computed(int row) {
    return computed[row];
  }

  double measured(int row) {
    return measured[row];
  }

  double uncertainty(int row) {
    return Math.hypot(
        uncertainty[row],
        disagreement * Math.max(Math.max(Math.abs(measured[row]), Math.abs(computed[row])), floor[row]));
  }

  Map<Integer, List<Integer>> byGauge() {
    return byGauge;
  }

  Map<Integer, List<Integer>> byLoad() {
    return byLoad;
  }

  int load(int row) {
    return test.coefficients().get(row).load();
  }

  int gauge(int row) {
    return test.coefficients().get(row).gauge();
  }
}
