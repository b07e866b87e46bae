package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.flexbound.finding.Where;
import org.flexbound.statistics.RepeatedMedianLine;

/**
 * Finds gauges that stay where they are while the load goes on: stuck where they do not come back
 * with the load, saturated where they stay at the end of their readings round the top of it.
 *
 * <p>A stretch of steps counts as flat where none leaves its first by more than the noise; it is a
 * fault where the movement that the load in it should have made is many times that.
 */
final class FlatReadings {
  /** The movement that should have been, in noises, before its absence is a fault (no source). */
  private static final double MISSED = 8;

  /** The load in the stretch must go through this share of its range (no source). */
  private static final double LOAD_SHARE = 0.1;

  /** Steps outside of the stretch must go through this share of the load (no source). */
  private static final double OUTSIDE_SHARE = 0.2;

  /** A gauge stuck for a whole run must have repeated itself so often (no source). */
  private static final int REPEATED = 6;

  private final List<RunRecord> records;
  private final GaugeNoise noise;

  FlatReadings(List<RunRecord> records, GaugeNoise noise) {
    this.records = records;
    this.noise = noise;
  }

  List<GaugeFault> find() {
    List<GaugeFault> faults = new ArrayList<>();
    for (RunRecord record : records) {
      for (RunSlope slope : record.slopes()) {
        List<LoadStep> steps =
            slope.steps().stream().filter(s -> !Double.isNaN(s.motion())).toList();
        if (steps.size() < 3) {
          continue;
        }
        if (record.gauge(slope.gauge()).differentValues() == 1) {
          still(record, slope, steps).ifPresent(faults::add);
        } else if (record.single()) {
          flat(record, slope, steps).ifPresent(faults::add);
        }
      }
    }
    return faults;
  }

  private static Where where(RunRecord record, RunSlope slope, LoadStep first, LoadStep last) {
    int from = first.where().row().orElse(0);
    int to = last.where().row().orElse(from);
    return from == 0 ? first.where() : record.gauge(slope.gauge()).rows(from, to);
  }

  /** One value throughout the run. */
  private Optional<GaugeFault> still(RunRecord record, RunSlope slope, List<LoadStep> steps) {
    boolean moved = noise.span(slope.gauge()) > 0;
    double expected = elsewhere(slope) * range(steps);
    boolean missed = expected > MISSED * noise.noise(slope.gauge());
    // a gauge whose readings flicker elsewhere cannot repeat itself for a whole run
    boolean flickers =
        record.gauge(slope.gauge()).readings() >= REPEATED && usuallyRepeats(slope.gauge()) < 0.1;
    if (moved && !missed && !flickers) {
      return Optional.empty();
    }
    return Optional.of(
        new GaugeFault(
            GaugeFaultFinding.STUCK,
            where(record, slope, steps.get(0), steps.get(steps.size() - 1)),
            record.run().name(),
            slope.gauge(),
            "shows one value in all "
                + record.gauge(slope.gauge()).readings()
                + " readings"
                + (moved ? "; in other runs it moves" : ""),
            RunVerdict.DOUBTFUL));
  }

  private double usuallyRepeats(String gauge) {
    return records.stream()
        .filter(r -> r.slopes().stream().anyMatch(s -> s.gauge().equals(gauge)))
        .map(r -> r.gauge(gauge))
        .filter(watch -> watch.differentValues() > 1)
        .mapToDouble(ColumnWatch::repeats)
        .max()
        .orElse(1);
  }

  /**
   * The slope of the same gauge under the same load in other runs: the least of them, so that one bad
   * run among them does no harm; 0 without.
   */
  private double elsewhere(RunSlope slope) {
    double[] others =
        records.stream()
            .flatMap(r -> r.slopes().stream())
            .filter(
                s ->
                    s.gauge().equals(slope.gauge())
                        && s.load().equals(slope.load())
                        && !s.run().equals(slope.run())
                        && s.isFitted())
            .mapToDouble(s -> Math.abs(s.slope()))
            .toArray();
    return Arrays.stream(others).min().orElse(0);
  }

  private static double range(List<LoadStep> steps) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (LoadStep step : steps) {
      low = Math.min(low, step.load());
      high = Math.max(high, step.load());
    }
    return high - low;
  }

  /** The flat stretch of some steps that misses the most movement. */
  private Optional<GaugeFault> flat(RunRecord record, RunSlope slope, List<LoadStep> steps) {
    double sigma = noise.noise(slope.gauge());
    double tolerance = Math.max(noise.resolution(slope.gauge()), 2 * sigma);
    int from = -1;
    int to = -1;
    double most = 0;
    for (int i = 0; i < steps.size(); i++) {
      int j = i;
      while (j + 1 < steps.size()
          && Math.abs(steps.get(j + 1).motion() - steps.get(i).motion()) <= tolerance) {
        j++;
      }
      double covered = range(steps.subList(i, j + 1));
      if (j - i >= 2 && covered > most) {
        most = covered;
        from = i;
        to = j;
      }
    }
    if (from < 0 || most < LOAD_SHARE * range(steps)) {
      return Optional.empty();
    }
    double usual = Math.max(elsewhere(slope), outside(steps, from, to, sigma));
    double missed = usual * most;
    if (missed < MISSED * sigma
        || missed < 4 * tolerance
        || dropped(steps, from, usual, tolerance)) {
      return Optional.empty();
    }
    return Optional.of(fault(record, slope, steps, from, to, missed));
  }

  /**
   * Whether the stretch begins by a drop that the load does not explain: lost readings, not a gauge that
   * stays where it is.
   */
  private static boolean dropped(
      List<LoadStep> steps, int from, double usual, double tolerance) {
    if (from == 0) {
      return false;
    }
    double moved = Math.abs(steps.get(from).motion() - steps.get(from - 1).motion());
    double load = Math.abs(steps.get(from).load() - steps.get(from - 1).load());
    return moved > 2 * usual * load + 2 * tolerance;
  }

  /**
   * Size of the slope that the steps outside of a stretch follow; 0 where they are too few, or go
   * through too little of the load, to tell it from noise.
   */
  private static double outside(List<LoadStep> steps, int from, int to, double sigma) {
    List<LoadStep> rest = new ArrayList<>(steps.subList(0, from));
    rest.addAll(steps.subList(to + 1, steps.size()));
    if (rest.size() < 3 || range(rest) < OUTSIDE_SHARE * range(steps)) {
      return 0;
    }
    double slope =
        RepeatedMedianLine.fit(
                rest.stream().mapToDouble(LoadStep::load).toArray(),
                rest.stream().mapToDouble(LoadStep::motion).toArray())
            .slope();
    return Math.abs(slope) * range(rest) > MISSED * sigma ? Math.abs(slope) : 0;
  }

  private GaugeFault fault(
      RunRecord record, RunSlope slope, List<LoadStep> steps, int from, int to, double missed) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (LoadStep step : steps) {
      low = Math.min(low, step.motion());
      high = Math.max(high, step.motion());
    }
    double top = steps.stream().mapToDouble(s -> Math.abs(s.load())).max().orElse(0);
    double value = steps.get(from).motion();
    double end = Math.max(2 * noise.noise(slope.gauge()), noise.resolution(slope.gauge()));
    boolean atAnEnd = high - value <= 2 * end || value - low <= 2 * end;
    boolean reachesTop =
        steps.subList(from, to + 1).stream().anyMatch(s -> Math.abs(s.load()) > 0.95 * top);
    boolean loadCameBack =
        Math.abs(steps.get(to).load()) < 0.6 * top && to == steps.size() - 1;
    boolean saturated = atAnEnd && reachesTop && !loadCameBack;
    List<LoadStep> stretch = steps.subList(from, to + 1);
    return new GaugeFault(
        saturated ? GaugeFaultFinding.SATURATED : GaugeFaultFinding.STUCK,
        where(record, slope, steps.get(from), steps.get(to)),
        record.run().name(),
        slope.gauge(),
        String.format(
            Locale.ROOT,
            "stays at %.5g (SI) for %d steps while the load goes through %.0f %% of its range; a"
                + " movement of %.2g is missing, %.0f times its noise",
            value,
            stretch.size(),
            100 * range(stretch) / range(steps),
            missed,
            missed / noise.noise(slope.gauge())),
        RunVerdict.REPEAT);
  }
}
