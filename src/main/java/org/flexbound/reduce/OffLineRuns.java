package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.statistics.Quantiles;

/**
 * Finds a run in which the load was off its line: among at least three runs of one load, the one in
 * which the gauges across the load moved otherwise than in the others while the gauges along it did
 * not. A load that was off its line in all of its runs alike cannot be seen this way.
 */
final class OffLineRuns {
  /** Gauges within this cosine of the normal plane lie across, beyond the other along. */
  private static final double ACROSS = 0.2;

  private static final double ALONG = 0.8;

  private static final double LEVEL = 0.01;

  /** A change below this share of the largest movement is not worth telling: one degree. */
  private static final double LEAST = 0.017;

  private final Map<String, Load> loads;
  private final Map<String, Gauge> gauges;
  private final GaugeNoise noise;

  OffLineRuns(Map<String, Load> loads, Map<String, Gauge> gauges, GaugeNoise noise) {
    this.loads = loads;
    this.gauges = gauges;
    this.noise = noise;
  }

  List<GaugeFault> find(List<RunRecord> records) {
    Map<String, List<RunRecord>> byLoad = new LinkedHashMap<>();
    for (RunRecord record : records) {
      if (record.single()) {
        byLoad
            .computeIfAbsent(record.slopes().get(0).load(), key -> new ArrayList<>())
            .add(record);
      }
    }
    List<GaugeFault> faults = new ArrayList<>();
    int runs = byLoad.values().stream().filter(l -> l.size() > 2).mapToInt(List::size).sum();
    byLoad.forEach(
        (load, list) -> {
          Load known = loads.get(load);
          if (list.size() > 2 && known != null && !known.isPattern() && !known.isMoment()) {
            for (RunRecord record : list) {
              judge(record, list, known, runs, faults);
            }
          }
        });
    return faults;
  }

  /** How far a gauge's slope in one run lies from the others', and how far they lie apart. */
  private record Departure(String gauge, boolean across, double by, double spread, double size) {}

  private void judge(
      RunRecord record, List<RunRecord> all, Load load, int runs, List<GaugeFault> faults) {
    List<Departure> departures = new ArrayList<>();
    double largest = 0;
    for (RunSlope slope : record.slopes()) {
      Gauge gauge = gauges.get(slope.gauge());
      if (gauge == null || gauge.kind() != GaugeKind.DISPLACEMENT || !slope.isFitted()) {
        continue;
      }
      double cosine =
          Math.abs(gauge.direction().vector().dot(load.points().get(0).direction().vector()));
      double[] others =
          all.stream()
              .filter(r -> !r.run().name().equals(record.run().name()))
              .flatMap(r -> r.slopes().stream())
              .filter(s -> s.gauge().equals(slope.gauge()) && s.isFitted())
              .mapToDouble(RunSlope::slope)
              .toArray();
      if (others.length < 2 || (cosine > ACROSS && cosine < ALONG)) {
        continue;
      }
      double mean = java.util.Arrays.stream(others).average().orElse(0);
      double variance = 0;
      for (double other : others) {
        variance += (other - mean) * (other - mean) / (others.length - 1);
      }
      largest = Math.max(largest, Math.abs(mean));
      departures.add(
          new Departure(
              slope.gauge(),
              cosine <= ACROSS,
              slope.slope() - mean,
              variance * (1 + 1.0 / others.length),
              mean));
    }
    // a factor common to all gauges of the run is a load read wrong, not a load off its line
    double shared = departures.stream().mapToDouble(d -> d.by() * d.size()).sum();
    double squares = departures.stream().mapToDouble(d -> d.size() * d.size()).sum();
    double factor = squares > 0 ? shared / squares : 0;
    departures.replaceAll(
        d ->
            new Departure(
                d.gauge(), d.across(), d.by() - factor * d.size(), d.spread(), d.size()));
    double across = statistic(departures, true);
    double along = statistic(departures, false);
    int n = (int) departures.stream().filter(Departure::across).count();
    int m = departures.size() - n;
    if (n < 2 || m < 1) {
      return;
    }
    int degrees = (all.size() - 2) * n;
    double tail = Quantiles.fTail(across, n, degrees);
    double tailAlong = Quantiles.fTail(along, m, (all.size() - 2.0) * m);
    Departure worst =
        departures.stream()
            .filter(Departure::across)
            .max(java.util.Comparator.comparingDouble(d -> Math.abs(d.by())))
            .orElseThrow();
    double reach = noise.quantile() * noise.noise(worst.gauge());
    double peak =
        record.slopes().get(0).steps().stream()
            .mapToDouble(s -> Math.abs(s.load()))
            .max()
            .orElse(0);
    if (tail < Quantiles.sidak(LEVEL, runs)
        && tailAlong > LEVEL
        && Math.abs(worst.by()) > LEAST * largest
        && Math.abs(worst.by()) * peak > reach) {
      faults.add(
          new GaugeFault(
              GaugeFaultFinding.OFF_LINE,
              record.run().where(),
              record.run().name(),
              load.name(),
              String.format(
                  Locale.ROOT,
                  "moved the %d gauges across its line otherwise than in the other %d runs ('%s' by"
                      + " %+.1f %% of the largest coefficient), those along it as before",
                  n,
                  all.size() - 1,
                  worst.gauge(),
                  100 * worst.by() / largest),
              RunVerdict.DOUBTFUL));
    }
  }

  /** Mean of the squared departures over the mean of their variances, each pooled. */
  private double statistic(List<Departure> departures, boolean across) {
    double squares = 0;
    double variances = 0;
    for (Departure d : departures) {
      if (d.across() == across) {
        squares += d.by() * d.by();
        variances += d.spread();
      }
    }
    return variances > 0 ? squares / variances : squares > 0 ? Double.MAX_VALUE : 0;
  }
}
