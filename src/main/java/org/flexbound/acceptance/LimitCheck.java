package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;
import org.flexbound.setup.DecisionRule;
import org.flexbound.setup.LimitKind;
import org.flexbound.setup.LimitSpec;

/** Judges what was measured against its limits. */
public final class LimitCheck {
  /** Motions below this share of a gauge's largest are not warned about (ours; no source). */
  private static final double SMALL = 0.05;

  private LimitCheck() {}

  /**
   * Judges all limits of all configurations. A limit that several configurations share is judged in
   * each that measured it, and refused only where none did.
   *
   * @param tested the configurations
   * @return the decisions in the order of the limits; errors where a limit names something unmeasured
   *     or there is none
   */
  public static Outcome<List<Decision>> check(List<CheckedConfiguration> tested) {
    Findings findings = new Findings();
    Set<LimitSpec> limits = new LinkedHashSet<>();
    tested.forEach(t -> limits.addAll(t.limits()));
    if (limits.isEmpty()) {
      findings.add(
          AcceptanceFinding.NO_LIMITS, Where.nowhere(), "found no limit in any log of the test");
    }
    List<Decision> decisions = new ArrayList<>();
    for (LimitSpec limit : limits) {
      decisions.addAll(judge(limit, tested, findings));
    }
    warn(tested, findings);
    return findings.hasErrors()
        ? Outcome.none(findings.list())
        : Outcome.of(List.copyOf(decisions), findings.list());
  }

  private static void warn(List<CheckedConfiguration> tested, Findings findings) {
    for (CheckedConfiguration t : tested) {
      if (!t.limits().isEmpty() && !t.reduction().calibrationIncluded()) {
        findings.add(
            AcceptanceFinding.WITHOUT_CALIBRATION,
            Where.nowhere(),
            "the probabilities of '" + t.name() + "' leave out the calibration that is not stated");
      }
      if (!t.limits().isEmpty() && t.reduction().withoutSpread() && t.rule().guarded()) {
        findings.add(
            AcceptanceFinding.WITHOUT_SPREAD,
            Where.nowhere(),
            "the runs of '" + t.name() + "' show no spread from run to run");
      }
    }
  }

  private static List<Decision> judge(
      LimitSpec limit, List<CheckedConfiguration> tested, Findings findings) {
    OptionalDouble lower = lower(limit);
    if (lower.isPresent()
        && limit.upper().isPresent()
        && lower.getAsDouble() > limit.upper().getAsDouble()) {
      findings.add(
          AcceptanceFinding.ORDER,
          limit.where(),
          "found a lower value above the upper one of the limit '" + limit.name() + "'");
      return List.of();
    }
    List<Decision> decisions = new ArrayList<>();
    List<String> missing = new ArrayList<>();
    for (CheckedConfiguration t : tested) {
      if (!t.limits().contains(limit)) {
        continue;
      }
      Resolved resolved = new LimitResolver(t, findings).resolve(limit);
      if (resolved.doubt().isPresent()) {
        decisions.add(doubtful(limit, lower, t, resolved.doubt().get()));
      } else if (resolved.quantities().isEmpty()) {
        missing.add(resolved.missing());
      } else {
        decisions.add(worst(limit, lower, t, resolved.quantities()));
      }
    }
    if (decisions.isEmpty()) {
      missing.stream()
          .filter(text -> !text.isEmpty())
          .findFirst()
          .ifPresent(text -> findings.add(AcceptanceFinding.UNMEASURED, limit.where(), text));
    }
    return decisions;
  }

  /** A departure is limited to both sides by its size. */
  private static OptionalDouble lower(LimitSpec limit) {
    boolean departure =
        limit.kind() == LimitKind.MODEL_AGREEMENT || limit.kind() == LimitKind.RECIPROCITY;
    return departure && limit.lower().isEmpty() && limit.upper().isPresent()
        ? OptionalDouble.of(-limit.upper().getAsDouble())
        : limit.lower();
  }

  private static Decision doubtful(
      LimitSpec limit, OptionalDouble lower, CheckedConfiguration t, String why) {
    return new Decision(
        t.name(),
        limit,
        lower,
        limit.upper(),
        Optional.empty(),
        0,
        Double.NaN,
        Double.NaN,
        Verdict.UNDECIDED,
        t.rule(),
        Optional.of(Advice.because(why + ": find the reason first")));
  }

  private static Decision worst(
      LimitSpec limit, OptionalDouble lower, CheckedConfiguration t, List<Quantity> quantities) {
    Decision worst = decide(limit, lower, t, quantities.get(0), quantities.size());
    for (Quantity quantity : quantities.subList(1, quantities.size())) {
      Decision next = decide(limit, lower, t, quantity, quantities.size());
      boolean graver = rank(next.verdict()) > rank(worst.verdict());
      boolean asGrave = rank(next.verdict()) == rank(worst.verdict());
      if (graver || (asGrave && next.probability() < worst.probability())) {
        worst = next;
      }
    }
    return worst;
  }

  private static int rank(Verdict verdict) {
    return switch (verdict) {
      case PASS -> 0;
      case UNDECIDED -> 1;
      case FAIL -> 2;
    };
  }

  private static Decision decide(
      LimitSpec limit, OptionalDouble lower, CheckedConfiguration t, Quantity quantity, int judged) {
    DecisionRule rule = t.rule();
    double probability = Conformity.probability(quantity, lower, limit.upper());
    boolean blind = rule.guarded() && t.reduction().withoutSpread() && scatters(limit.kind());
    Verdict verdict =
        blind
            ? Verdict.UNDECIDED
            : rule.guarded()
                ? guarded(probability, rule.largestProbability())
                : simple(quantity.value(), lower, limit.upper());
    Optional<Advice> advice = Optional.empty();
    if (verdict == Verdict.UNDECIDED) {
      advice =
          Optional.of(
              blind
                  ? Advice.because(
                      "one run shows no spread: repeat it twice or more, or state the"
                          + " repeatability known from earlier tests")
                  : new Settling(quantity, lower, limit.upper(), rule.largestProbability())
                      .advice());
    }
    return new Decision(
        t.name(),
        limit,
        lower,
        limit.upper(),
        Optional.of(quantity),
        judged,
        probability,
        rule.guarded() ? Conformity.guard(quantity, rule.largestProbability()) : Double.NaN,
        verdict,
        rule,
        advice);
  }

  /** Whether the quantities of a kind scatter from run to run; figures of the runs are observed. */
  private static boolean scatters(LimitKind kind) {
    return kind != LimitKind.LINEARITY
        && kind != LimitKind.HYSTERESIS
        && kind != LimitKind.SET;
  }

  /** Guarded acceptance and guarded rejection (JCGM 106:2012, 8.3.2 and 8.3.3). */
  static Verdict guarded(double probability, double largest) {
    if (1 - probability <= largest) {
      return Verdict.PASS;
    }
    return probability <= largest ? Verdict.FAIL : Verdict.UNDECIDED;
  }

  /** Simple acceptance (JCGM 106:2012, 8.2). */
  static Verdict simple(double value, OptionalDouble lower, OptionalDouble upper) {
    boolean within =
        !(lower.isPresent() && value < lower.getAsDouble())
            && !(upper.isPresent() && value > upper.getAsDouble());
    return within ? Verdict.PASS : Verdict.FAIL;
  }

  /**
   * Parts fixture and article in every configuration.
   *
   * @param tested the configurations, each with the largest share that passes without a warning
   * @param largestShare that share, 0 to 1
   * @return one entry for each gauge and load where it can be told, with a finding where the share is
   *     larger
   */
  public static Outcome<List<FixtureShare>> fixture(
      List<CheckedConfiguration> tested, double largestShare) {
    Findings findings = new Findings();
    List<FixtureShare> all = new ArrayList<>();
    for (CheckedConfiguration t : tested) {
      all.addAll(new FixtureMotion(t).table());
    }
    for (FixtureShare share : all) {
      // a motion near nothing has a large share of nothing
      boolean seen = Math.abs(share.total()) > SMALL * largest(all, share);
      if (seen && Math.abs(share.share()) > largestShare) {
        findings.add(
            AcceptanceFinding.FIXTURE_LARGE,
            Where.nowhere(),
            String.format(
                Locale.ROOT,
                "%.0f %% of what '%s' showed under '%s' was base or fixture, limit %.0f %%",
                100 * share.share(),
                share.gauge(),
                share.load(),
                100 * largestShare));
      }
    }
    return Outcome.of(List.copyOf(all), findings.list());
  }

  /** The largest motion of one gauge under any load. */
  private static double largest(List<FixtureShare> all, FixtureShare of) {
    return all.stream()
        .filter(
            s -> s.configuration().equals(of.configuration()) && s.gauge().equals(of.gauge()))
        .mapToDouble(s -> Math.abs(s.total()))
        .max()
        .orElse(0);
  }
}
