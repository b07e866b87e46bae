package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.statistics.PooledScatter;
import org.flexbound.statistics.Quantiles;
import org.flexbound.testlog.TestLog;

/**
 * The second stage: slopes of the same gauge, load and instruments are averaged over runs, and their
 * scatter is pooled over all coefficients, apart for displacements, rotations and strains.
 */
final class RunPooling {
  /** Slopes of one gauge and load by the same instruments. */
  record Cell(
      String gauge,
      String load,
      Optional<String> gaugeInstrument,
      Optional<String> loadInstrument,
      List<RunSlope> slopes) {
    double mean() {
      return slopes.stream().mapToDouble(RunSlope::slope).average().orElse(Double.NaN);
    }

    double variance() {
      double mean = mean();
      return slopes.size() < 2
          ? 0
          : slopes.stream().mapToDouble(s -> (s.slope() - mean) * (s.slope() - mean)).sum()
              / (slopes.size() - 1);
    }
  }

  /** All coefficients together may raise a false alarm this often. */
  private static final double LEVEL = 0.01;

  private final TestLog log;
  private final List<Cell> cells;
  private final Map<Boolean, PooledScatter> scatter = new LinkedHashMap<>();
  private final boolean stated;
  private final boolean withoutSpread;

  RunPooling(TestLog log, List<RunSlope> slopes, Findings findings) {
    this.log = log;
    Map<List<Object>, List<RunSlope>> grouped = new LinkedHashMap<>();
    for (RunSlope slope : slopes) {
      if (slope.isFitted()) {
        grouped
            .computeIfAbsent(
                List.of(
                    slope.gauge(), slope.load(), slope.gaugeInstrument(), slope.loadInstrument()),
                key -> new ArrayList<>())
            .add(slope);
      }
    }
    this.cells =
        grouped.values().stream()
            .map(
                list ->
                    new Cell(
                        list.get(0).gauge(),
                        list.get(0).load(),
                        list.get(0).gaugeInstrument(),
                        list.get(0).loadInstrument(),
                        List.copyOf(list)))
            .toList();
    for (boolean angle : new boolean[] {false, true}) {
      scatter.put(angle, pool(cells.stream().filter(c -> readsAngle(c) == angle).toList()));
    }
    boolean measured = scatter.values().stream().anyMatch(s -> s.degreesOfFreedom() > 0);
    OptionalDouble repeatability = log.options().statedRepeatability();
    this.stated = !measured && repeatability.isPresent();
    this.withoutSpread = !measured && repeatability.isEmpty();
    if (withoutSpread) {
      findings.add(
          ReduceFinding.ONE_RUN,
          log.runs().isEmpty() ? Where.nowhere() : log.runs().get(0).where(),
          "no coefficient was measured in more than one run, and no repeatability is stated");
    }
    judge(findings);
  }

  private boolean readsAngle(Cell cell) {
    return log.gauges().stream()
        .anyMatch(gauge -> gauge.name().equals(cell.gauge()) && gauge.readsAngle());
  }

  private static PooledScatter pool(List<Cell> cells) {
    return PooledScatter.fit(
        cells.stream().mapToDouble(Cell::mean).toArray(),
        cells.stream().mapToDouble(Cell::variance).toArray(),
        cells.stream().mapToInt(cell -> cell.slopes().size() - 1).toArray());
  }

  private void judge(Findings findings) {
    double limit = log.options().qualityLimits().repeatability();
    double largest = cells.stream().mapToDouble(c -> Math.abs(c.mean())).max().orElse(0);
    for (Cell cell : cells) {
      double relative = Math.sqrt(cell.variance()) / Math.abs(cell.mean());
      // a coefficient near zero has a large share of nothing
      if (relative > limit
          && Math.abs(cell.mean()) > 0.05 * largest
          && beyondReadings(cell, cells.size())) {
        findings.add(
            ReduceFinding.NOT_REPEATABLE,
            Where.nowhere(),
            String.format(
                Locale.ROOT,
                "the slopes of '%s' under '%s' in %d runs scatter by %.1f %%, limit %.1f %%",
                cell.gauge(),
                cell.load(),
                cell.slopes().size(),
                100 * relative,
                100 * limit));
      }
    }
  }

  /** Whether slopes scatter by more than the scatter of the readings within the runs explains. */
  private static boolean beyondReadings(Cell cell, int cells) {
    double within =
        cell.slopes().stream()
            .mapToDouble(RunSlope::standardError)
            .filter(error -> !Double.isNaN(error))
            .map(error -> error * error)
            .average()
            .orElse(0);
    double level = Quantiles.sidak(LEVEL, Math.max(1, cells));
    return cell.variance()
        > within * Quantiles.f(1 - level, cell.slopes().size() - 1.0, Double.POSITIVE_INFINITY);
  }

  List<Cell> cells() {
    return cells;
  }

  /** Standard uncertainty of a cell's mean from run-to-run scatter. */
  double uncertainty(Cell cell) {
    if (stated) {
      double share = log.options().statedRepeatability().orElse(0);
      return share * Math.abs(cell.mean()) / Math.sqrt(cell.slopes().size());
    }
    if (withoutSpread) {
      double error = cell.slopes().get(0).standardError();
      return Double.isNaN(error) ? 0 : error;
    }
    PooledScatter model = model(cell);
    return Math.sqrt(model.variance(cell.mean()) / cell.slopes().size());
  }

  private PooledScatter model(Cell cell) {
    PooledScatter own = pooled(readsAngle(cell));
    return own.degreesOfFreedom() > 0 ? own : pooled(!readsAngle(cell));
  }

  private PooledScatter pooled(boolean angle) {
    return scatter.getOrDefault(angle, new PooledScatter(0, 0, 0));
  }

  PooledScatter scatter() {
    return pooled(false).degreesOfFreedom() > 0 ? pooled(false) : pooled(true);
  }

  /** Degrees of freedom of the pooled scatter. */
  double degreesOfFreedom() {
    if (stated || withoutSpread) {
      return Double.POSITIVE_INFINITY;
    }
    return scatter.values().stream().mapToDouble(PooledScatter::degreesOfFreedom).sum();
  }

  boolean stated() {
    return stated;
  }

  boolean withoutSpread() {
    return withoutSpread;
  }

  Map<String, Double> repeatability() {
    Map<String, Double> map = new LinkedHashMap<>();
    for (Cell cell : cells) {
      if (cell.slopes().size() > 1) {
        map.put(
            Reduction.key(cell.gauge(), cell.load()),
            Math.sqrt(cell.variance()) / Math.abs(cell.mean()));
      }
    }
    return map;
  }
}
