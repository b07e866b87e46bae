package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.statistics.CommonScatter;
import org.flexbound.statistics.PooledScatter;
import org.flexbound.statistics.Quantiles;
import org.flexbound.testlog.TestLog;

/**
 * The second stage: slopes of the same gauge, load and instruments are averaged over runs, and their scatter is pooled.
 *
 * <p>The variance of one run's slope has three parts: a floor and a share of its own ({@link ScatterPool}, apart for displacements, rotations
 * and strains and for forces and moments, since their numbers cannot be added), and a share common to all gauges of a run
 * ({@link CommonScatter}): an error of that run's load shows in every gauge. The common share is passed on as a gain for each load, because
 * taken as independent it would seem to average out over gauges. Gauges read in the same runs do not bear witness independently: the degrees
 * of freedom of the pooled scatter are reduced by the squared correlation that the common share may well have.
 *
 * <p>A repeatability that the user states is used where nothing was repeated; where runs were repeated the larger of the two counts.
 */
final class RunPooling {
  /** A stated repeatability is contradicted below this probability. */
  private static final double CONTRADICTED = 0.01;

  /** A coefficient below this share of the largest of its kind has no relative scatter worth judging. */
  private static final double WORTH = 0.05;

  /** All coefficients together may be called not repeatable by chance this often. */
  private static final double LEVEL = 0.01;

  private final TestLog log;
  private final Map<String, Gauge> gauges = new LinkedHashMap<>();
  private final Map<String, Load> loads = new LinkedHashMap<>();
  private final List<SlopeCell> cells;
  private final Map<Kind, List<SlopeCell>> kinds = new LinkedHashMap<>();
  private final Map<Kind, ScatterPool> pools = new LinkedHashMap<>();
  private final CommonScatter common;
  private final OptionalDouble repeatability;
  private final boolean measured;
  private final double borrowed;

  /** Coefficients whose numbers may be added: of one dimension. */
  private record Kind(Reads reads, boolean moment) {}

  private enum Reads {
    LENGTH,
    ANGLE,
    STRAIN
  }

  RunPooling(TestLog log, List<RunSlope> slopes, Findings findings) {
    this.log = log;
    log.gauges().forEach(gauge -> gauges.put(gauge.name(), gauge));
    log.loads().forEach(load -> loads.put(load.name(), load));
    this.cells = cells(slopes);
    cells.forEach(cell -> kinds.computeIfAbsent(kind(cell), key -> new ArrayList<>()).add(cell));
    kinds.forEach((kind, own) -> pools.put(kind, ScatterPool.of(own)));
    measured = cells.stream().anyMatch(cell -> cell.degreesOfFreedom() > 0);
    repeatability = log.options().statedRepeatability();
    common = CommonScatter.of(repeatedTogether());
    borrowed = borrowed();
    new ScatterJudgement(this, findings).judge();
  }

  private static List<SlopeCell> cells(List<RunSlope> slopes) {
    Map<List<Object>, List<RunSlope>> grouped = new LinkedHashMap<>();
    for (RunSlope slope : slopes) {
      if (slope.isFitted()) {
        grouped
            .computeIfAbsent(
                List.of(slope.gauge(), slope.load(), slope.gaugeInstrument(), slope.loadInstrument()), key -> new ArrayList<>())
            .add(slope);
      }
    }
    return grouped.values().stream()
        .map(list -> new SlopeCell(list.get(0).gauge(), list.get(0).load(), list.get(0).gaugeInstrument(), list.get(0).loadInstrument(), list))
        .toList();
  }

  private Kind kind(SlopeCell cell) {
    Gauge gauge = gauges.get(cell.gauge());
    Load load = loads.get(cell.load());
    Reads reads = gauge == null ? Reads.LENGTH
        : gauge.kind() == GaugeKind.STRAIN ? Reads.STRAIN : gauge.readsAngle() ? Reads.ANGLE : Reads.LENGTH;
    return new Kind(reads, load != null && load.isMoment());
  }

  /** For each load the slopes of its runs, a column for each cell that was repeated. */
  private List<CommonScatter.RepeatedTogether> repeatedTogether() {
    List<CommonScatter.RepeatedTogether> sets = new ArrayList<>();
    for (List<SlopeCell> column : repeatedByLoad().values()) {
      Set<String> runs = new LinkedHashSet<>();
      column.forEach(cell -> cell.slopes().forEach(slope -> runs.add(slope.run())));
      List<String> order = List.copyOf(runs);
      double[][] values = new double[order.size()][column.size()];
      double[] variances = new double[column.size()];
      for (int c = 0; c < column.size(); c++) {
        SlopeCell cell = column.get(c);
        variances[c] = pool(cell).variance(cell);
        for (int r = 0; r < order.size(); r++) {
          String run = order.get(r);
          values[r][c] = cell.slopes().stream().filter(slope -> slope.run().equals(run)).mapToDouble(RunSlope::slope).findFirst()
              .orElse(Double.NaN);
        }
      }
      sets.add(new CommonScatter.RepeatedTogether(values, variances));
    }
    return sets;
  }

  private Map<String, List<SlopeCell>> repeatedByLoad() {
    Map<String, List<SlopeCell>> byLoad = new LinkedHashMap<>();
    for (SlopeCell cell : cells) {
      if (cell.degreesOfFreedom() > 0) {
        byLoad.computeIfAbsent(cell.load(), key -> new ArrayList<>()).add(cell);
      }
    }
    return byLoad;
  }

  private ScatterPool pool(SlopeCell cell) {
    ScatterPool pool = pools.get(kind(cell));
    if (pool == null) {
      throw new IllegalStateException("no pool for " + cell.gauge());
    }
    return pool;
  }

  /** The relative variance, in the middle, of what was repeated: for kinds of which nothing was. */
  private double borrowed() {
    double[] relative = cells.stream().filter(cell -> cell.degreesOfFreedom() > 0 && cell.mean() != 0)
        .mapToDouble(cell -> pool(cell).variance(cell) / (cell.mean() * cell.mean())).sorted().toArray();
    return relative.length == 0 ? 0 : relative[relative.length / 2];
  }

  /** The variance of one run's slope, its common part included; NaN where it must be borrowed and cannot. */
  private double total(SlopeCell cell) {
    double own = pool(cell).variance(cell);
    double square = cell.mean() * cell.mean();
    double found = Double.isNaN(own) ? borrowed * square : own;
    double stated = repeatability.orElse(0);
    return Math.max(found, stated * stated * square);
  }

  List<SlopeCell> cells() {
    return cells;
  }

  /** Standard uncertainty of a cell's mean from the scatter that it does not share with other gauges. */
  double uncertainty(SlopeCell cell) {
    if (withoutSpread()) {
      double error = cell.slopes().get(0).standardError();
      return Double.isNaN(error) ? 0 : error;
    }
    double own = total(cell) - common.variance() * cell.mean() * cell.mean();
    return Math.sqrt(Math.max(0, own) / cell.slopes().size());
  }

  /** Degrees of freedom of a cell's scatter; infinite where it is stated, or without spread. */
  double degreesOfFreedom(SlopeCell cell) {
    double square = cell.mean() * cell.mean();
    double own = pool(cell).variance(cell);
    double stated = repeatability.orElse(0);
    if (!measured || stated * stated * square > (Double.isNaN(own) ? borrowed * square : own)) {
      return Double.POSITIVE_INFINITY;
    }
    double degrees = pool(cell).model(cell).degreesOfFreedom();
    return (degrees > 0 ? degrees : most()) * independence(kinds.getOrDefault(kind(cell), List.of()));
  }

  private double most() {
    return pools.values().stream().mapToDouble(pool -> pool.common().degreesOfFreedom()).max().orElse(1);
  }

  /**
   * What share of their degrees of freedom cells keep that were read in the same runs: the variance of a mean of variances is raised by the
   * squared correlation of each two.
   */
  private double independence(List<SlopeCell> own) {
    double alone = 0;
    double together = 0;
    Map<String, double[]> byLoad = new LinkedHashMap<>();
    for (SlopeCell cell : own) {
      if (cell.degreesOfFreedom() == 0) {
        continue;
      }
      double variance = pool(cell).variance(cell);
      double shared = variance > 0 ? Math.min(1, common.upper() * cell.mean() * cell.mean() / variance) : 0;
      double[] sums = byLoad.computeIfAbsent(cell.load(), key -> new double[3]);
      sums[0] += shared;
      sums[1] += shared * shared;
      sums[2] = Math.max(sums[2], cell.degreesOfFreedom());
      alone += cell.degreesOfFreedom();
    }
    for (double[] sums : byLoad.values()) {
      together += sums[2] * (sums[0] * sums[0] - sums[1]);
    }
    return alone > 0 ? alone / (alone + together) : 1;
  }

  /**
   * Relative standard uncertainty of the means of a load that all its gauges share. It is widened as Student's t is to the normal, because it
   * rests on few runs and is passed on as if it were known.
   */
  double commonUncertainty(String load) {
    if (!(common.variance() > 0) || withoutSpread()) {
      return 0;
    }
    int runs = cells.stream().filter(cell -> cell.load().equals(load)).mapToInt(cell -> cell.slopes().size()).max().orElse(1);
    double wide = Quantiles.studentT(0.975, Math.max(1, common.degreesOfFreedom())) / Quantiles.normal(0.975);
    return wide * Math.sqrt(common.variance() / runs);
  }

  /** The model with the most degrees of freedom. */
  PooledScatter scatter() {
    return pools.values().stream().map(ScatterPool::common)
        .reduce(new PooledScatter(0, 0, 0), (a, b) -> b.degreesOfFreedom() > a.degreesOfFreedom() ? b : a);
  }

  /**
   * Degrees of freedom of all scatter together, as a sum of squares over all coefficients has them: models are weighted by the coefficients
   * that rest on them (Satterthwaite 1946).
   */
  double degreesOfFreedom() {
    if (!measured) {
      return Double.POSITIVE_INFINITY;
    }
    double sum = 0;
    double coefficients = cells.size();
    for (Map.Entry<Kind, ScatterPool> entry : pools.entrySet()) {
      List<SlopeCell> own = kinds.getOrDefault(entry.getKey(), List.of());
      double independence = independence(own);
      for (Map.Entry<PooledScatter, Integer> model : entry.getValue().models(own).entrySet()) {
        double degrees = model.getKey().degreesOfFreedom();
        double share = model.getValue() / coefficients;
        sum += share * share / ((degrees > 0 ? degrees : most()) * independence);
      }
    }
    return 1 / sum;
  }

  boolean stated() {
    return !measured && repeatability.isPresent();
  }

  boolean withoutSpread() {
    return !measured && repeatability.isEmpty();
  }

  Map<String, Double> repeatability() {
    Map<String, Double> map = new LinkedHashMap<>();
    for (SlopeCell cell : cells) {
      if (cell.slopes().size() > 1) {
        map.put(Reduction.key(cell.gauge(), cell.load()), Math.sqrt(cell.variance()) / Math.abs(cell.mean()));
      }
    }
    return map;
  }

  /** Says what the user should know of the scatter. */
  private static final class ScatterJudgement {
    private final RunPooling of;
    private final Findings findings;

    ScatterJudgement(RunPooling of, Findings findings) {
      this.of = of;
      this.findings = findings;
    }

    void judge() {
      if (of.withoutSpread()) {
        findings.add(ReduceFinding.ONE_RUN, of.log.runs().isEmpty() ? Where.nowhere() : of.log.runs().get(0).where(),
            "no coefficient was measured in more than one run, and no repeatability is stated");
      }
      of.kinds.forEach((kind, own) -> {
        repeatable(own);
        ofKind(own);
      });
      if (of.measured && of.repeatability.isPresent()) {
        stated(of.repeatability.getAsDouble());
      }
    }

    private Where where(SlopeCell cell) {
      List<LoadStep> steps = cell.slopes().get(0).steps();
      Gauge gauge = of.gauges.get(cell.gauge());
      return !steps.isEmpty() ? steps.get(0).where() : gauge == null ? Where.nowhere() : gauge.where();
    }

    private void repeatable(List<SlopeCell> own) {
      double limit = of.log.options().qualityLimits().repeatability();
      double largest = largest(own);
      for (SlopeCell cell : own) {
        double relative = Math.sqrt(cell.variance()) / Math.abs(cell.mean());
        if (relative > limit
            && Math.abs(cell.mean()) > WORTH * largest
            && cell.scattersBeyondItsReadings(Quantiles.sidak(LEVEL, own.size()))) {
          findings.add(ReduceFinding.NOT_REPEATABLE, where(cell),
              String.format(Locale.ROOT, "the slopes of '%s' under '%s' in %d runs scatter by %.1f %%, limit %.1f %%", cell.gauge(),
                  cell.load(), cell.slopes().size(), 100 * relative, 100 * limit));
        }
      }
    }

    private static double largest(List<SlopeCell> own) {
      return own.stream().mapToDouble(cell -> Math.abs(cell.mean())).max().orElse(0);
    }

    private void ofKind(List<SlopeCell> own) {
      SlopeCell first = own.get(0);
      ScatterPool pool = of.pool(first);
      for (String name : pool.apart()) {
        own.stream().filter(cell -> cell.gauge().equals(name)).findFirst().ifPresent(cell -> findings.add(
            ReduceFinding.SCATTER_APART, where(cell),
            "the slopes of '" + name + "' scatter from run to run " + (more(pool, cell) ? "more" : "less") + " than those of the other gauges"));
      }
      boolean repeated = own.stream().anyMatch(cell -> cell.degreesOfFreedom() > 0);
      if (!repeated && of.measured) {
        findings.add(ReduceFinding.SCATTER_BORROWED, where(first),
            "nothing of the kind of '" + first.gauge() + "' under '" + first.load() + "' was measured in more than one run; "
                + String.format(Locale.ROOT, "%.2g %% was taken from the others", 100 * Math.sqrt(of.borrowed)));
      }
      if (repeated && own.stream().allMatch(cell -> cell.variance() == 0)) {
        findings.add(ReduceFinding.NO_SCATTER, where(first),
            "the slopes of repeated runs agree to the last digit for all gauges like '" + first.gauge() + "'");
      }
    }

    private static boolean more(ScatterPool pool, SlopeCell cell) {
      return pool.model(cell).variance(cell.mean()) > pool.common().variance(cell.mean());
    }

    private void stated(double stated) {
      double sum = 0;
      double degrees = 0;
      SlopeCell worst = of.cells.get(0);
      double largestRatio = 0;
      for (List<SlopeCell> own : of.kinds.values()) {
        double largest = largest(own);
        for (SlopeCell cell : own) {
          if (cell.degreesOfFreedom() > 0 && Math.abs(cell.mean()) > WORTH * largest) {
            double ratio = cell.variance() / (cell.mean() * cell.mean());
            sum += cell.degreesOfFreedom() * ratio;
            degrees += cell.degreesOfFreedom();
            if (ratio > largestRatio) {
              largestRatio = ratio;
              worst = cell;
            }
          }
        }
      }
      if (!(degrees > 0)) {
        return;
      }
      double seen = Math.sqrt(sum / degrees);
      boolean above = stated <= 0 || Quantiles.chiSquaredTail(sum / (stated * stated), degrees) < CONTRADICTED;
      findings.add(above ? ReduceFinding.SCATTER_ABOVE_STATED : ReduceFinding.SCATTER_AND_STATED, where(worst),
          String.format(Locale.ROOT, "the slopes of repeated runs scatter by %.2g %%; stated is %.2g %%; for each coefficient the larger of"
              + " the two is used", 100 * seen, 100 * stated));
    }
  }
}
