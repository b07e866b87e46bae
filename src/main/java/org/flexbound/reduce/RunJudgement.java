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

  private static final double SIGNIFICANT = 0.001;

  private final QualityLimits limits;
  private final Findings findings;
  private final List<String> reasons = new ArrayList<>();
  private RunVerdict verdict = RunVerdict.ACCEPT;

  RunJudgement(QualityLimits limits, Findings findings) {
    this.limits = limits;
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
    if (quality.span() == 0) {
      found(ReduceFinding.STUCK, run, slope, "shows one value at every step", RunVerdict.DOUBTFUL);
      return;
    }
    if (quality.span() < MOVED * largest) {
      return;
    }
    double noise = Double.isNaN(quality.resolution()) ? 0 : quality.resolution();
    over(ReduceFinding.COARSE, run, slope, "resolution", quality.resolution(), limits.resolution());
    over(
        ReduceFinding.NOT_LINEAR,
        run,
        slope,
        "departure from the line",
        quality.linearity(),
        Math.max(limits.linearity(), noise));
    over(
        ReduceFinding.HYSTERESIS,
        run,
        slope,
        "gap between loading and unloading",
        quality.hysteresis(),
        Math.max(limits.hysteresis(), noise));
    over(
        ReduceFinding.ZERO_RETURN,
        run,
        slope,
        "reading that does not come back",
        Math.abs(quality.zeroReturn()),
        Math.max(limits.zeroReturn(), noise));
    if (quality.curvatureProbability() < SIGNIFICANT) {
      over(
          ReduceFinding.CURVED,
          run,
          slope,
          "curvature",
          Math.abs(quality.curvature()),
          Math.max(limits.curvature(), noise));
    }
  }

  private void over(
      ReduceFinding kind, Run run, RunSlope slope, String what, double value, double limit) {
    if (!(value > limit)) {
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
