package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Findings;
import org.flexbound.setup.QualityLimits;
import org.flexbound.testlog.Run;

/**
 * Judges a run by its quality figures. Only gauges that moved by more than a small share of the
 * largest motion of their kind count: a gauge that hardly moves has large shares of nothing.
 */
final class RunJudgement {
  /** Gauges below this share of the largest span of the run are not judged by shares of span. */
  private static final double MOVED = 0.02;

  /** Several times a limit: not doubtful any more, but to be repeated (common practice). */
  private static final double FAR = 3;

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
    double largest =
        slopes.stream()
            .flatMap(slope -> slope.quality().stream())
            .mapToDouble(SlopeQuality::span)
            .max()
            .orElse(0);
    for (GaugeFault fault : faults) {
      if (fault.weight() != RunVerdict.ACCEPT) {
        worse(fault.weight(), fault.column() + " " + fault.text());
      }
    }
    for (RunSlope slope : slopes) {
      slope.quality().ifPresent(quality -> judge(run, slope, quality, largest));
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

  private void judge(Run run, RunSlope slope, SlopeQuality quality, double largest) {
    boolean explained =
        faults.stream()
            .anyMatch(
                fault ->
                    fault.explainsDepartures()
                        && (fault.column().equals(slope.gauge())
                            || fault.column().equals(slope.load())));
    if (explained || quality.span() < MOVED * largest) {
      return;
    }
    over(
        ReduceFinding.NOT_LINEAR,
        run,
        slope,
        "departure from the line",
        quality.linearity(),
        limits.linearity());
    over(
        ReduceFinding.HYSTERESIS,
        run,
        slope,
        "gap between loading and unloading",
        quality.hysteresis(),
        limits.hysteresis());
    over(
        ReduceFinding.ZERO_RETURN,
        run,
        slope,
        "reading that does not come back",
        Math.abs(quality.zeroReturn()),
        limits.zeroReturn());
    if (quality.curvatureProbability() < noise.levelOfOneSlope()) {
      over(
          ReduceFinding.CURVED,
          run,
          slope,
          "curvature",
          Math.abs(quality.curvature()),
          limits.curvature());
    }
  }

  /** Tells a share of span that is over its limit and more than the gauge's noise makes. */
  private void over(
      ReduceFinding kind, Run run, RunSlope slope, String what, double value, double limit) {
    double span = slope.quality().map(SlopeQuality::span).orElse(0.0);
    if (!(value > limit) || !(value * span > noise.allowance(slope.gauge(), limit))) {
      return;
    }
    found(
        kind,
        run,
        slope,
        String.format(
            Locale.ROOT, "%s %.1f %%, limit %.1f %%", what, 100 * value, 100 * limit),
        value > FAR * limit ? RunVerdict.REPEAT : RunVerdict.DOUBTFUL);
  }

  private void found(
      FindingKind kind, Run run, RunSlope slope, String text, RunVerdict weight) {
    findings.add(
        kind,
        slope.steps().isEmpty() ? run.where() : slope.steps().get(0).where(),
        "'" + slope.gauge() + "' under '" + slope.load() + "' in run '" + run.name() + "': " + text);
    worse(weight, slope.gauge() + ": " + text);
  }
}
