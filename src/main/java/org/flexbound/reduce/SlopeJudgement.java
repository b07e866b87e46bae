package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.setup.QualityLimits;
import org.flexbound.testlog.Run;

/**
 * Judges the quality figures of one slope against their limits. What can be tested must be both
 * significant and large: curvature, a difference of pull and push.
 */
final class SlopeJudgement {
  /** So many times a limit: not doubtful any more, but to be repeated (common practice). */
  static final double FAR = 3;

  private final Run run;
  private final RunSlope slope;
  private final QualityLimits limits;
  private final GaugeNoise noise;
  private final Findings findings;
  private final List<Reason> reasons = new ArrayList<>();

  /**
   * Why a run is not simply accepted.
   *
   * @param weight what follows from it
   * @param text the reason
   */
  record Reason(RunVerdict weight, String text) {}

  SlopeJudgement(Run run, RunSlope slope, QualityLimits limits, GaugeNoise noise, Findings findings) {
    this.run = run;
    this.slope = slope;
    this.limits = limits;
    this.noise = noise;
    this.findings = findings;
  }

  List<Reason> judge() {
    slope.quality().ifPresent(this::judge);
    return List.copyOf(reasons);
  }

  private void judge(SlopeQuality q) {
    over(ReduceFinding.NOT_LINEAR, "departure from the line", "of span", q.linearity(), limits.linearity(), "");
    over(
        ReduceFinding.HYSTERESIS,
        "gap between loading and unloading",
        "of span",
        q.hysteresis(),
        limits.hysteresis(),
        q.branches()
            .map(pair -> words("; their slopes differ by %.1f %%, z %.1f", 100 * pair.share(), pair.z()))
            .orElse(""));
    over(
        ReduceFinding.ZERO_RETURN,
        q.zero() == ZeroReturn.Kind.DRIFT ? "drift of the zero" : "set, which does not come back,",
        "of the peak reading",
        Math.abs(q.zeroReturn()),
        limits.zeroReturn(),
        "");
    if (q.curvatureProbability() < noise.levelOfOneSlope()) {
      over(ReduceFinding.CURVED, "curvature", "of span", Math.abs(q.curvature()), limits.curvature(), "");
    }
    q.pullPush()
        .filter(pair -> pair.probability() < noise.levelOfOneSlope())
        .filter(pair -> Math.abs(pair.share()) > limits.repeatability())
        .ifPresent(
            pair ->
                found(
                    ReduceFinding.PULL_PUSH,
                    first(),
                    words(
                        "the slope under pull differs from that under push by %.1f %% (z %.1f), limit %.1f %%",
                        100 * pair.share(), pair.z(), 100 * limits.repeatability()),
                    weight(Math.abs(pair.share()), limits.repeatability())));
  }

  private static String words(String format, Object... values) {
    return String.format(Locale.ROOT, format, values);
  }

  private Where first() {
    return slope.steps().isEmpty() ? run.where() : slope.steps().get(0).where();
  }

  private static RunVerdict weight(double value, double limit) {
    return value > FAR * limit ? RunVerdict.REPEAT : RunVerdict.DOUBTFUL;
  }

  /** Whether a share of span is over its limit and more than the gauge's noise makes. */
  private boolean large(double value, double limit) {
    double span = slope.quality().map(SlopeQuality::span).orElse(0.0);
    return value > limit && value * span > noise.allowance(slope.gauge(), limit);
  }

  private void over(ReduceFinding kind, String what, String of, double value, double limit, String more) {
    if (large(value, limit)) {
      found(
          kind,
          first(),
          words("%s %.1f %% %s, limit %.1f %%%s", what, 100 * value, of, 100 * limit, more),
          weight(value, limit));
    }
  }

  private void found(FindingKind kind, Where where, String text, RunVerdict weight) {
    findings.add(kind, where, "'" + slope.gauge() + "' under '" + slope.load() + "' in run '" + run.name() + "': " + text);
    reasons.add(new Reason(weight, slope.gauge() + ": " + text));
  }
}
