package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.statistics.PooledScatter;
import org.flexbound.statistics.Quantiles;

/**
 * The run-to-run scatter of coefficients of one kind and unit: one floor and one share for all of them, but a gauge whose coefficients scatter
 * significantly more or less than the others' has a model of its own.
 *
 * <p>Whether a gauge stands apart is an F test of its mean squared scatter, in units of the common model, against that of all others, at
 * a level that allows for the number of gauges (Šidák 1967). Gauges go one by one, the furthest first.
 */
final class ScatterPool {
  /** Joint level of the tests for gauges that stand apart. */
  private static final double LEVEL = 0.01;

  /** A gauge with fewer degrees of freedom than this is never taken by itself. */
  private static final int LEAST = 4;

  private final Map<String, PooledScatter> apart = new LinkedHashMap<>();
  private final PooledScatter common;
  private final int commonCells;

  private ScatterPool(List<SlopeCell> cells) {
    List<SlopeCell> rest = new ArrayList<>(cells);
    PooledScatter model = fit(rest);
    boolean found = true;
    while (found) {
      found = false;
      String furthest = "";
      double least = Double.POSITIVE_INFINITY;
      Map<String, List<SlopeCell>> byGauge = byGauge(rest);
      double level = Quantiles.sidak(LEVEL, Math.max(1, byGauge.size()));
      for (Map.Entry<String, List<SlopeCell>> entry : byGauge.entrySet()) {
        double probability = standsApart(entry.getValue(), rest, model);
        if (probability < least) {
          least = probability;
          furthest = entry.getKey();
        }
      }
      if (least < level) {
        List<SlopeCell> own = byGauge.getOrDefault(furthest, List.of());
        apart.put(furthest, fit(own));
        rest.removeAll(own);
        model = fit(rest);
        found = true;
      }
    }
    common = model;
    commonCells = rest.size();
  }

  static ScatterPool of(List<SlopeCell> cells) {
    return new ScatterPool(cells);
  }

  private static Map<String, List<SlopeCell>> byGauge(List<SlopeCell> cells) {
    Map<String, List<SlopeCell>> map = new LinkedHashMap<>();
    cells.forEach(cell -> map.computeIfAbsent(cell.gauge(), key -> new ArrayList<>()).add(cell));
    return map;
  }

  private static PooledScatter fit(List<SlopeCell> cells) {
    return PooledScatter.fit(
        cells.stream().mapToDouble(SlopeCell::mean).toArray(),
        cells.stream().mapToDouble(SlopeCell::variance).toArray(),
        cells.stream().mapToInt(SlopeCell::degreesOfFreedom).toArray());
  }

  /** Two-sided probability that a gauge's scatter differs so much from the others' by chance. */
  private static double standsApart(List<SlopeCell> own, List<SlopeCell> all, PooledScatter model) {
    double[] mine = new double[2];
    double[] others = new double[2];
    for (SlopeCell cell : all) {
      double variance = model.variance(cell.mean());
      double[] to = own.contains(cell) ? mine : others;
      if (variance > 0) {
        to[0] += cell.degreesOfFreedom() * cell.variance() / variance;
        to[1] += cell.degreesOfFreedom();
      }
    }
    if (mine[1] < LEAST || others[1] < LEAST || !(others[0] > 0)) {
      return 1;
    }
    double f = mine[0] / mine[1] / (others[0] / others[1]);
    double tail = Quantiles.fTail(f, mine[1], others[1]);
    return 2 * Math.min(tail, 1 - tail);
  }

  /** Gauges with a model of their own. */
  List<String> apart() {
    return List.copyOf(apart.keySet());
  }

  /** The model of all others. */
  PooledScatter common() {
    return common;
  }

  /** The variance of one run's slope; NaN where nothing was repeated. */
  double variance(SlopeCell cell) {
    PooledScatter own = model(cell);
    return own.degreesOfFreedom() > 0 ? own.variance(cell.mean()) : Double.NaN;
  }

  PooledScatter model(SlopeCell cell) {
    return apart.getOrDefault(cell.gauge(), common);
  }

  /** The degrees of freedom of all models with how many cells stand behind each. */
  Map<PooledScatter, Integer> models(List<SlopeCell> cells) {
    Map<PooledScatter, Integer> models = new LinkedHashMap<>();
    models.put(common, commonCells);
    Map<String, List<SlopeCell>> byGauge = byGauge(cells);
    apart.forEach((name, model) -> models.merge(model, byGauge.getOrDefault(name, List.of()).size(), Integer::sum));
    return models;
  }
}
