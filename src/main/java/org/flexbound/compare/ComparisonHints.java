package org.flexbound.compare;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.flexibility.UnitFactor;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.solve.ComputedFlexibility;
import org.flexbound.statistics.Assignment;

/**
 * What a test looks like beside its model where they are far apart: everything out by a unit's factor;
 * a load reversed, out by a factor or off its line; gauges exchanged (the cheapest assignment of rows
 * to the model's); a gauge reversed, out by a factor or at another node. Each guess with the misfit
 * before and after it; told only where it takes away most of the misfit of what it concerns and every
 * other guess leaves clearly more (a likelihood ratio of a hundred); never applied.
 */
final class ComparisonHints {
  private static final double CLEARLY_BETTER = 9.2;

  /** A guess must leave no more than this share of the misfit of what it concerns. */
  private static final double LEFT = 0.25;

  /** Mean squared distance from which a gauge or load is looked at at all. */
  private static final double FAR = 9;

  /** The same for guesses with a number or a place of their own, which a wrong model bends to. */
  private static final double VERY_FAR = 25;

  /** Mean squared distance that a guess may leave: the model's usual disagreement. */
  private static final double NEAR = 4;

  private final ConfiguredFrame frame;
  private final MeasuredFlexibility test;
  private final HintTable table;
  private final ComputedFlexibility solution;
  private final Findings findings;
  private final Set<Integer> explained = new LinkedHashSet<>();

  ComparisonHints(
      ConfiguredFrame frame, ComputedFlexibility solution, HintTable table, Findings findings) {
    this.frame = frame;
    this.test = frame.measured();
    this.solution = solution;
    this.table = table;
    this.findings = findings;
  }

  /** A guess with what it leaves. */
  private record Guess(CompareHintFinding kind, String what, double left) {}

  void tell() {
    if (test.coefficients().size() < 2 || everything()) {
      return;
    }
    table.byLoad().forEach(this::load);
    exchanged();
    for (int gauge : table.byGauge().keySet()) {
      gauge(gauge);
    }
  }

  private List<Integer> open(List<Integer> rows) {
    return rows.stream().filter(r -> !explained.contains(r)).toList();
  }

  private static String number(double value) {
    return String.format(Locale.ROOT, "%.4g", value);
  }

  /** One factor over the whole test: only the model can show it. */
  private boolean everything() {
    List<Guess> guesses = new ArrayList<>();
    double now = table.disagreement();
    for (UnitFactor unit : UnitFactor.USUAL) {
      for (boolean large : new boolean[] {true, false}) {
        double factor = large ? unit.value() : 1 / unit.value();
        guesses.add(
            new Guess(
                CompareHintFinding.LOOKS_LIKE_UNIT,
                "everything measured " + number(unit.value()) + " times too "
                    + (large ? "large" : "small") + " (" + unit.words() + ")",
                table.disagreement(factor)));
      }
    }
    guesses.sort(Comparator.comparingDouble(Guess::left));
    Guess best = guesses.get(0);
    if (test.coefficients().size() < 3
        || now < 0.6
        || best.left() > LEFT * now
        || guesses.get(1).left() < 2 * best.left()) {
      return false;
    }
    findings.add(
        best.kind(),
        Where.nowhere(),
        String.format(
            Locale.ROOT,
            "%s looks like %s, because the usual disagreement with the model goes from %.0f %% to"
                + " %.0f %%",
            test.configuration(),
            best.what(),
            100 * now,
            100 * best.left()));
    return true;
  }

  private void load(int load, List<Integer> rows) {
    Load known = test.loads().get(load);
    double before = table.sum(rows);
    if (rows.size() < 2 || before < FAR * rows.size()) {
      return;
    }
    List<Guess> guesses = factors("load '" + known.name() + "'", rows, false);
    offLine(load, rows, guesses);
    if (told(guesses, before, rows.size(), known.where())) {
      explained.addAll(rows);
    }
  }

  /** Reversed, and each unit's factor. */
  private List<Guess> factors(String name, List<Integer> rows, boolean ofGauge) {
    List<Guess> guesses = new ArrayList<>();
    guesses.add(
        new Guess(
            CompareHintFinding.LOOKS_REVERSED, name + " reversed", table.scaled(rows, -1)));
    for (UnitFactor unit : UnitFactor.USUAL) {
      for (boolean large : new boolean[] {true, false}) {
        double factor = large == ofGauge ? unit.value() : 1 / unit.value();
        guesses.add(
            new Guess(
                CompareHintFinding.LOOKS_LIKE_UNIT,
                name + " " + number(unit.value()) + " times too " + (large ? "large" : "small")
                    + " (" + unit.words() + ")",
                table.scaled(rows, factor)));
      }
    }
    return guesses;
  }

  /** The three small turns of a load's line that fit its column best, one at a time. */
  private void offLine(int load, List<Integer> rows, List<Guess> guesses) {
    Load known = test.loads().get(load);
    if (known.isPattern() || rows.size() < 3 || table.sum(rows) < VERY_FAR * rows.size()) {
      return;
    }
    double[][] derivatives = solution.byLoadPlace(load)[0];
    for (int axis = 0; axis < 3; axis++) {
      double above = 0;
      double below = 0;
      for (int r : rows) {
        double w = 1 / Math.max(Double.MIN_NORMAL, Math.pow(table.uncertainty(r), 2));
        double d = derivatives[table.gauge(r)][3 + axis];
        above += w * d * (table.measured(r) - table.computed(r));
        below += w * d * d;
      }
      double angle = below > 0 ? above / below : 0;
      if (Math.abs(angle) < Math.toRadians(1) || Math.abs(angle) > Math.toRadians(25)) {
        continue;
      }
      double left = 0;
      for (int r : rows) {
        left +=
            table.squared(
                r, table.computed(r) + angle * derivatives[table.gauge(r)][3 + axis]);
      }
      guesses.add(
          new Guess(
              CompareHintFinding.LOOKS_OFF_LINE,
              String.format(
                  Locale.ROOT,
                  "load '%s' applied %.0f° off its line, turned about %s",
                  known.name(),
                  Math.toDegrees(Math.abs(angle)),
                  "xyz".charAt(axis)),
              left));
    }
  }

  /** Tells the best guess, where it is good and clearly better than any of another kind. */
  private boolean told(List<Guess> guesses, double before, int rows, Where where) {
    List<Guess> sorted = new ArrayList<>(guesses);
    sorted.sort(Comparator.comparingDouble(Guess::left));
    if (sorted.isEmpty()) {
      return false;
    }
    Guess best = sorted.get(0);
    boolean good = best.left() < LEFT * before && best.left() < NEAR * rows;
    List<Guess> ties =
        sorted.stream().filter(g -> g.left() < best.left() + CLEARLY_BETTER).toList();
    boolean places =
        ties.stream().allMatch(g -> g.kind() == CompareHintFinding.LOOKS_MISPLACED);
    if (!good || (ties.size() > 1 && !places)) {
      return false;
    }
    String what = best.what();
    if (ties.size() > 1) {
      what += " (or " + (ties.size() - 1) + " more that fit nearly as well)";
    }
    findings.add(
        best.kind(),
        where,
        String.format(
            Locale.ROOT,
            "%slooks like %s, because the sum of squared distances from the model goes from %.0f to"
                + " %.1f over %d coefficients",
            test.configuration().isEmpty() ? "" : test.configuration() + ": ",
            what,
            before,
            best.left(),
            rows));
    return true;
  }

  /** Exchanged gauges of one kind, by the cheapest assignment of measured to computed rows. */
  private void exchanged() {
    for (GaugeKind kind : GaugeKind.values()) {
      List<Integer> gauges =
          table.byGauge().keySet().stream()
              .filter(g -> test.gauges().get(g).kind() == kind)
              .filter(g -> open(rows(g)).size() > 1)
              .toList();
      if (gauges.size() < 2) {
        continue;
      }
      double[][] cost = new double[gauges.size()][gauges.size()];
      for (int i = 0; i < cost.length; i++) {
        for (int k = 0; k < cost.length; k++) {
          for (int r : open(rows(gauges.get(i)))) {
            cost[i][k] +=
                i == k ? table.squared(r) : table.squared(r, computed(gauges.get(k), r));
          }
        }
      }
      int[] best = Assignment.cheapest(cost);
      for (int i = 0; i < best.length; i++) {
        int k = best[i];
        // two that changed places; longer rings are told as they come
        if (k > i && best[k] == i) {
          pair(gauges.get(i), gauges.get(k), cost[i][i] + cost[k][k], cost[i][k] + cost[k][i]);
        }
      }
    }
  }

  private void pair(int first, int second, double before, double after) {
    List<Integer> rows = new ArrayList<>(open(rows(first)));
    int ofFirst = rows.size();
    rows.addAll(open(rows(second)));
    if (before < FAR * rows.size()) {
      return;
    }
    Gauge a = test.gauges().get(first);
    Gauge b = test.gauges().get(second);
    List<Guess> guesses = new ArrayList<>();
    guesses.add(
        new Guess(
            CompareHintFinding.LOOKS_EXCHANGED,
            "the columns of '" + a.name() + "' and '" + b.name() + "' exchanged",
            after));
    // what each gauge's own best guess would leave, both together
    double apart =
        factors("", rows.subList(0, ofFirst), true).stream().mapToDouble(Guess::left).min().orElse(0)
            + factors("", rows.subList(ofFirst, rows.size()), true).stream()
                .mapToDouble(Guess::left)
                .min()
                .orElse(0);
    guesses.add(new Guess(CompareHintFinding.LOOKS_LIKE_UNIT, "", apart));
    if (guesses.get(0).left() < apart && told(guesses, before, rows.size(), a.where())) {
      explained.addAll(rows);
    }
  }

  private List<Integer> rows(int gauge) {
    return table.byGauge().getOrDefault(gauge, List.of());
  }

  /** What the model computes for another gauge in place of a row's own; base motion stays as it is. */
  private double computed(int gauge, int row) {
    int load = table.load(row);
    return table.computed(row)
        - solution.value(table.gauge(row), load)
        + solution.value(gauge, load);
  }

  private void gauge(int gauge) {
    List<Integer> rows = open(rows(gauge));
    double before = table.sum(rows);
    if (rows.isEmpty() || before < FAR * rows.size()) {
      return;
    }
    Gauge known = test.gauges().get(gauge);
    List<Guess> guesses = factors("gauge '" + known.name() + "'", rows, true);
    if (rows.size() > 1 && before > VERY_FAR * rows.size()) {
      new OtherNodes(frame, gauge)
          .computed()
          .forEach(
              (node, values) -> {
                double left = 0;
                for (int r : rows) {
                  int load = table.load(r);
                  left +=
                      table.squared(
                          r, table.computed(r) - solution.value(gauge, load) + values[load]);
                }
                guesses.add(
                    new Guess(
                        CompareHintFinding.LOOKS_MISPLACED,
                        "gauge '" + known.name() + "' at node '" + node + "'",
                        left));
              });
    }
    told(guesses, before, rows.size(), known.where());
  }
}
