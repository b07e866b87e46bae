package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.finding.Findings;
import org.flexbound.quantity.Dimension;
import org.flexbound.setup.QualityLimits;
import org.flexbound.testlog.Run;

/**
 * Judges a run by the faults of its columns and by the quality figures of its slopes. Only gauges
 * that moved by more than a small share of the largest motion of their kind count: a gauge that
 * hardly moves has large shares of nothing.
 */
final class RunJudgement {
  /** Gauges below this share of the largest span of their kind are not judged by shares of span. */
  private static final double MOVED = 0.02;

  private final QualityLimits limits;
  private final GaugeNoise noise;
  private final List<GaugeFault> faults;
  private final Findings findings;
  private final List<String> reasons = new ArrayList<>();
  private RunVerdict verdict = RunVerdict.ACCEPT;

  RunJudgement(
      QualityLimits limits, GaugeNoise noise, List<GaugeFault> faults, Findings findings) {
    this.limits = limits;
    this.noise = noise;
    this.faults = List.copyOf(faults);
    this.findings = findings;
  }

  RunResult judge(
      Run run, List<String> loads, double peak, int steps, int cycles, List<RunSlope> slopes) {
    Map<String, Dimension> kinds = new LinkedHashMap<>();
    run.gauges().forEach(gauge -> kinds.put(gauge.name(), gauge.unit().dimension()));
    Map<Dimension, Double> largest = new LinkedHashMap<>();
    for (RunSlope slope : slopes) {
      largest.merge(kinds.getOrDefault(slope.gauge(), Dimension.NUMBER), span(slope), Math::max);
    }
    for (GaugeFault fault : faults) {
      if (fault.weight() != RunVerdict.ACCEPT) {
        worse(fault.weight(), fault.column() + " " + fault.text());
      }
    }
    for (RunSlope slope : slopes) {
      Dimension kind = kinds.getOrDefault(slope.gauge(), Dimension.NUMBER);
      if (!explained(slope) && span(slope) >= MOVED * largest.getOrDefault(kind, 0.0)) {
        new SlopeJudgement(run, slope, limits, noise, findings).judge().forEach(this::worse);
      }
    }
    if (!slopes.isEmpty() && slopes.stream().noneMatch(RunSlope::isFitted)) {
      worse(RunVerdict.REPEAT, "no slope could be fitted");
    }
    if (loads.isEmpty()) {
      worse(RunVerdict.REPEAT, "no load varied");
    }
    return new RunResult(
        run.name(),
        verdict,
        reasons,
        run.date(),
        run.temperature(),
        run.use(),
        loads,
        peak,
        steps,
        cycles,
        run.remark(),
        run.where());
  }

  private void worse(RunVerdict found, String reason) {
    if (found.compareTo(verdict) > 0) {
      verdict = found;
    }
    reasons.add(reason);
  }

  private void worse(SlopeJudgement.Reason reason) {
    worse(reason.weight(), reason.text());
  }

  private static double span(RunSlope slope) {
    return slope.quality().map(SlopeQuality::span).orElse(0.0);
  }

  /** Whether a fault of the gauge or of the load column explains whatever departs from the line. */
  private boolean explained(RunSlope slope) {
    return faults.stream()
        .anyMatch(
            fault ->
                fault.explainsDepartures()
                    && (fault.column().equals(slope.gauge()) || fault.column().equals(slope.load())));
  }
}
