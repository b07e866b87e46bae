package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.flexibility.UnitFactor;
import org.flexbound.statistics.RepeatedMedianLine;

/**
 * Holds each run of a load against the other runs of the same load, gauge by gauge: a gauge (or, where
 * all gauges agree, the load) that is reversed, out by a unit's factor, or exchanged with another in
 * that run only. Guesses with their evidence, never applied; with two runs the fault may lie in
 * either.
 */
final class RunsCompared {
  /** A ratio counts as what it looks like within this share (no source). */
  private static final double CLOSE = 0.05;

  /** A coefficient must move the gauge by so many noises for its ratio to mean anything. */
  private static final double CLEAR = 20;

  private final List<RunRecord> records;
  private final GaugeNoise noise;
  private final Findings findings;

  RunsCompared(List<RunRecord> records, GaugeNoise noise, Findings findings) {
    this.records = records;
    this.noise = noise;
    this.findings = findings;
  }

  /** A gauge's slope in a run and in the others. */
  private record Pair(RunSlope slope, double others) {
    double ratio() {
      return slope.slope() / others;
    }
  }

  void tell() {
    Map<String, List<RunRecord>> byLoad = new LinkedHashMap<>();
    for (RunRecord record : records) {
      if (record.single()) {
        byLoad
            .computeIfAbsent(record.slopes().get(0).load(), key -> new ArrayList<>())
            .add(record);
      }
    }
    for (List<RunRecord> runs : byLoad.values()) {
      // of two runs, the later one is named, and that it may be the other
      for (RunRecord record : runs.size() == 2 ? runs.subList(1, 2) : runs) {
        if (runs.size() > 1) {
          judge(record, pairs(record, runs), runs.size() == 2);
        }
      }
    }
  }

  private List<Pair> pairs(RunRecord record, List<RunRecord> runs) {
    List<Pair> pairs = new ArrayList<>();
    for (RunSlope slope : record.slopes()) {
      double[] others =
          runs.stream()
              .filter(r -> !r.run().name().equals(record.run().name()))
              .flatMap(r -> r.slopes().stream())
              .filter(s -> s.gauge().equals(slope.gauge()) && s.isFitted())
              .mapToDouble(RunSlope::slope)
              .toArray();
      double usual = RepeatedMedianLine.median(others);
      double peak = slope.steps().stream().mapToDouble(s -> Math.abs(s.load())).max().orElse(0);
      if (slope.isFitted() && Math.abs(usual) * peak > CLEAR * noise.noise(slope.gauge())) {
        pairs.add(new Pair(slope, usual));
      }
    }
    return pairs;
  }

  private void judge(RunRecord record, List<Pair> pairs, boolean either) {
    List<Pair> off =
        pairs.stream().filter(p -> !close(p.ratio(), 1)).toList();
    if (off.isEmpty()) {
      return;
    }
    String end = either ? ", or the other run of this load the other way round" : "";
    if (off.size() == pairs.size() && pairs.size() > 1) {
      double ratio = off.get(0).ratio();
      if (off.stream().allMatch(p -> close(p.ratio(), ratio))) {
        factor(ratio)
            .ifPresent(
                looks ->
                    tell(
                        looks.kind(), record, off.get(0).slope(),
                        "load '" + off.get(0).slope().load() + "' " + looks.ofLoad(),
                        "all " + off.size() + " gauges move " + times(ratio), end));
      }
      return;
    }
    if (off.size() == 2) {
      Pair a = off.get(0);
      Pair b = off.get(1);
      if (close(a.slope().slope(), b.others()) && close(b.slope().slope(), a.others())) {
        findings.add(
            MatrixFinding.LOOKS_EXCHANGED,
            where(a.slope()),
            "run '" + record.run().name() + "' looks like the columns of '" + a.slope().gauge()
                + "' and '" + b.slope().gauge()
                + "' exchanged, because each shows what the other shows in the other runs of load '"
                + a.slope().load() + "'" + end);
        return;
      }
    }
    for (Pair pair : off) {
      double ratio = pair.ratio();
      factor(ratio)
          .ifPresent(
              looks ->
                  tell(
                      looks.kind(), record, pair.slope(),
                      "gauge '" + pair.slope().gauge() + "' " + looks.ofGauge(),
                      "under load '" + pair.slope().load() + "' it moves " + times(ratio), end));
    }
  }

  private static String times(double ratio) {
    return String.format(Locale.ROOT, "%.4g times as in the other runs", ratio);
  }

  private void tell(
      MatrixFinding kind,
      RunRecord record,
      RunSlope slope,
      String what,
      String because,
      String end) {
    findings.add(
        kind,
        where(slope),
        "run '" + record.run().name() + "' looks like " + what + ", because " + because + end);
  }

  private static Where where(RunSlope slope) {
    return slope.steps().get(0).where();
  }

  private static boolean close(double value, double wanted) {
    return Math.abs(value - wanted) <= CLOSE * Math.abs(wanted);
  }

  /** What a ratio looks like. */
  private record Looks(MatrixFinding kind, String ofGauge, String ofLoad) {}

  private static Optional<Looks> factor(double ratio) {
    if (close(ratio, -1)) {
      return Optional.of(new Looks(MatrixFinding.LOOKS_REVERSED, "reversed", "reversed"));
    }
    for (UnitFactor unit : UnitFactor.USUAL) {
      String text = String.format(Locale.ROOT, "%.4g", unit.value());
      if (close(ratio, unit.value())) {
        return Optional.of(
            new Looks(
                MatrixFinding.LOOKS_LIKE_UNIT,
                text + " times too large (" + unit.words() + ")",
                text + " times too small (" + unit.words() + ")"));
      }
      if (close(ratio, 1 / unit.value())) {
        return Optional.of(
            new Looks(
                MatrixFinding.LOOKS_LIKE_UNIT,
                text + " times too small (" + unit.words() + ")",
                text + " times too large (" + unit.words() + ")"));
      }
    }
    return Optional.empty();
  }
}
