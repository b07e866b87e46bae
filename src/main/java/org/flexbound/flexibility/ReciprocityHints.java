package org.flexbound.flexibility;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.LoadPoint;
import org.flexbound.statistics.Quantiles;

/**
 * Tries what could be wrong with a matrix that is not reciprocal: each gauge reversed, each gauge out
 * by a unit's factor, each two gauges exchanged, each load off its line towards another load at the
 * same point. The guess is told only where it brings the matrix within its uncertainty and clearly
 * better (a likelihood ratio of a hundred) than every other kind of guess.
 */
final class ReciprocityHints {
  /** More points than this are not searched: the gain pattern stands for them. */
  private static final int MOST_POINTS = 24;

  /** With more points than this, faults under one load only are not searched. */
  private static final int MOST_SINGLE = 10;

  /** A guess must take away at least this share of the misfit. */
  private static final double TAKEN = 0.75;

  /** Lines further off than this are no guess any more, rad. */
  private static final double MOST_ANGLE = 0.5;

  private static final double LEVEL = 1e-3;

  private final List<CollocatedPoint> points;
  private final AbsoluteMeans means;
  private final double single;

  private ReciprocityHints(List<CollocatedPoint> points, AbsoluteMeans means, double single) {
    this.points = points;
    this.means = means;
    this.single = single;
  }

  /** A guess with what it would leave. */
  private record Guess(
      Optional<Hint.Kind> kind, List<Integer> gauges, String what, String detail, Score score) {}

  /** Sum of z² of pairs and broken bounds, and over how many pairs. */
  private record Score(double misfit, int pairs) {}

  static List<Hint> of(List<CollocatedPoint> all, AbsoluteMeans means, double single) {
    List<CollocatedPoint> points = all.stream().filter(p -> !p.isPattern()).toList();
    if (points.size() > MOST_POINTS) {
      return List.of();
    }
    return new ReciprocityHints(points, means, single).search();
  }

  private Score score(AbsoluteMeans changed) {
    List<ReciprocityTable.Pair> pairs =
        ReciprocityTable.pairs(points, changed, single, new ArrayList<>());
    double misfit = 0;
    for (ReciprocityTable.Pair pair : pairs) {
      double z = pair.z().orElse(0);
      misfit += z * z;
    }
    for (Bound bound : Bound.of(points, changed, single)) {
      double z = Math.max(0, bound.z().orElse(0));
      misfit += z * z;
    }
    return new Score(misfit, pairs.size());
  }

  private List<Hint> search() {
    Score before = score(means);
    if (before.misfit() == 0) {
      return List.of();
    }
    List<Guess> guesses = new ArrayList<>();
    for (CollocatedPoint point : points) {
      guessOf(point, guesses);
    }
    exchanged(guesses);
    if (points.size() <= MOST_SINGLE) {
      underOneLoad(guesses);
    }
    offLine(guesses);
    guesses.removeIf(guess -> guess.score().pairs() < before.pairs());
    guesses.sort(Comparator.comparingDouble(guess -> guess.score().misfit()));
    Optional<Guess> first = guesses.stream().filter(g -> g.kind().isPresent()).findFirst();
    if (first.isEmpty()) {
      return List.of();
    }
    Guess best = first.get();
    double after = best.score().misfit();
    int freedom = Math.max(1, before.pairs());
    boolean good =
        after < (1 - TAKEN) * before.misfit()
            && Quantiles.fTail(after / freedom, freedom, means.measured().scatterDegreesOfFreedom())
                > LEVEL;
    List<Guess> ties =
        guesses.stream()
            .filter(g -> g.kind().isPresent() || best.kind().equals(Optional.of(Hint.Kind.OFF_LINE)))
            .filter(guess -> guess.score().misfit() < after + GainPattern.CLEARLY_BETTER)
            .toList();
    boolean one =
        ties.stream().allMatch(g -> g.kind().equals(best.kind()))
            && ties.stream().map(g -> g.gauges().stream().sorted().toList()).distinct().count() <= 2;
    return good && one ? List.of(told(best, ties, before.misfit())) : List.of();
  }

  private Hint told(Guess best, List<Guess> ties, double before) {
    String what = best.what();
    List<Integer> gauges = new ArrayList<>(best.gauges());
    if (ties.size() > 1) {
      what += ", or " + ties.get(1).what() + " (the data cannot tell which)";
      gauges.addAll(ties.get(1).gauges());
    }
    return new Hint(
        best.kind().orElseThrow(),
        gauges.stream().distinct().toList(),
        what,
        String.format(
            Locale.ROOT,
            "with %s the sum of z² of the reciprocal pairs and bounds goes from %.0f to %.1f",
            best.detail(),
            before,
            best.score().misfit()),
        before,
        best.score().misfit());
  }

  private void guessOf(CollocatedPoint point, List<Guess> guesses) {
    int gauge = point.gauges().get(0);
    String name = point.gaugeName(means);
    String load = point.loadName(means);
    guesses.add(
        new Guess(
            Optional.of(Hint.Kind.REVERSED),
            List.of(gauge),
            "gauge '" + name + "' or load '" + load + "' reversed",
            "the sign of '" + name + "' turned",
            score(means.scaled(gauge, -1))));
    freeGain(point, gauge, guesses);
    for (UnitFactor factor : UnitFactor.USUAL) {
      for (boolean large : new boolean[] {true, false}) {
        double by = large ? 1 / factor.value() : factor.value();
        String text = String.format(Locale.ROOT, "%.4g", factor.value());
        guesses.add(
            new Guess(
                Optional.of(Hint.Kind.UNIT),
                List.of(gauge),
                "gauge '" + name + "' " + text + " times too " + (large ? "large" : "small")
                    + ", or load '" + load + "' so much too " + (large ? "small" : "large")
                    + " (" + factor.words() + ")",
                "'" + name + "' " + (large ? "divided" : "multiplied") + " by " + text,
                score(means.scaled(gauge, by))));
      }
    }
  }

  /** Any factor at all: told by the gain pattern, here only to stand against a load off its line. */
  private void freeGain(CollocatedPoint point, int gauge, List<Guess> guesses) {
    double sum = 0;
    double weights = 0;
    for (CollocatedPoint other : points) {
      Optional<Combination> own = point.under(other.load(), means);
      Optional<Combination> reciprocal = other.under(point.load(), means);
      if (other.load() == point.load()
          || own.isEmpty()
          || reciprocal.isEmpty()
          || !GainPattern.isClear(own.get(), means)
          || !GainPattern.isClear(reciprocal.get(), means)) {
        continue;
      }
      double a = means.value(own.get());
      double b = means.value(reciprocal.get());
      Combination logarithm =
          new Combination.Sum().add(own.get(), 1 / a).add(reciprocal.get(), -1 / b).made();
      double variance = means.covariance(logarithm, logarithm);
      if (variance > 0) {
        sum += Math.log(Math.abs(b / a)) / variance;
        weights += 1 / variance;
      }
    }
    if (weights > 0) {
      guesses.add(
          new Guess(
              Optional.empty(),
              List.of(gauge),
              "",
              "",
              score(means.scaled(gauge, Math.exp(sum / weights)))));
    }
  }

  private void exchanged(List<Guess> guesses) {
    List<Gauge> gauges = means.measured().gauges();
    for (int g = 0; g < gauges.size(); g++) {
      for (int h = 0; h < g; h++) {
        int first = h;
        int second = g;
        boolean matters =
            points.stream()
                .anyMatch(p -> p.gauges().get(0) == first || p.gauges().get(0) == second);
        if (matters && gauges.get(g).kind() == gauges.get(h).kind()) {
          String names = "'" + gauges.get(h).name() + "' and '" + gauges.get(g).name() + "'";
          guesses.add(
              new Guess(
                  Optional.of(Hint.Kind.EXCHANGED),
                  List.of(h, g),
                  "the columns of " + names + " (or of the loads there) exchanged",
                  names + " exchanged",
                  score(means.exchanged(h, g))));
        }
      }
    }
  }

  /** The same faults in the runs of one load only. */
  private void underOneLoad(List<Guess> guesses) {
    List<Gauge> gauges = means.measured().gauges();
    for (CollocatedPoint point : points) {
      int gauge = point.gauges().get(0);
      String name = "'" + point.gaugeName(means) + "'";
      for (CollocatedPoint loaded : points) {
        int load = loaded.load();
        if (!means.has(gauge, load)) {
          continue;
        }
        String under = " under load '" + loaded.loadName(means) + "' only";
        guesses.add(
            new Guess(
                Optional.of(Hint.Kind.REVERSED),
                List.of(gauge),
                "gauge " + name + " reversed" + under,
                "the sign of " + name + " turned" + under,
                score(means.scaled(gauge, load, -1))));
        for (UnitFactor factor : UnitFactor.USUAL) {
          for (boolean large : new boolean[] {true, false}) {
            String text = String.format(Locale.ROOT, "%.4g", factor.value());
            guesses.add(
                new Guess(
                    Optional.of(Hint.Kind.UNIT),
                    List.of(gauge),
                    "gauge " + name + " " + text + " times too " + (large ? "large" : "small") + under
                        + " (" + factor.words() + ")",
                    name + " " + (large ? "divided" : "multiplied") + " by " + text + under,
                    score(
                        means.scaled(
                            gauge, load, large ? 1 / factor.value() : factor.value()))));
          }
        }
        for (int other = 0; other < gauges.size(); other++) {
          if (other != gauge
              && means.has(other, load)
              && gauges.get(other).kind() == gauges.get(gauge).kind()) {
            String names = name + " and '" + gauges.get(other).name() + "'";
            guesses.add(
                new Guess(
                    Optional.of(Hint.Kind.EXCHANGED),
                    List.of(gauge, other),
                    "the columns of " + names + " exchanged" + under,
                    names + " exchanged" + under,
                    score(means.exchanged(gauge, other, load))));
          }
        }
      }
    }
  }

  private void offLine(List<Guess> guesses) {
    for (CollocatedPoint main : points) {
      for (CollocatedPoint side : points) {
        if (main.load() != side.load() && isAcross(main, side)) {
          double share = share(main, side);
          if (share != 0 && Math.abs(share) < Math.tan(MOST_ANGLE)) {
            String name = main.loadName(means);
            guesses.add(
                new Guess(
                    Optional.of(Hint.Kind.OFF_LINE),
                    List.of(main.gauges().get(0)),
                    String.format(
                        Locale.ROOT,
                        "load '%s' applied %.1f° off its line, towards '%s'",
                        name,
                        Math.toDegrees(Math.atan(share)),
                        side.loadName(means)),
                    String.format(
                        Locale.ROOT,
                        "%.1f %% of the column of '%s' taken off that of '%s'",
                        100 * share,
                        side.loadName(means),
                        name),
                    score(means.without(main.load(), side.load(), share))));
          }
        }
      }
    }
  }

  /** Whether two forces act at one place and across each other. */
  private boolean isAcross(CollocatedPoint main, CollocatedPoint side) {
    LoadPoint a = means.measured().loads().get(main.load()).points().get(0);
    LoadPoint b = means.measured().loads().get(side.load()).points().get(0);
    return a.direction().rotation() == b.direction().rotation()
        && a.station().equals(b.station())
        && Math.abs(a.direction().vector().dot(b.direction().vector())) < 1e-3;
  }

  /** The share of the side load that fits the pairs of the main load best. */
  private double share(CollocatedPoint main, CollocatedPoint side) {
    double above = 0;
    double below = 0;
    for (CollocatedPoint other : points) {
      Optional<Combination> measured = other.under(main.load(), means);
      Optional<Combination> reciprocal = main.under(other.load(), means);
      Optional<Combination> along = other.under(side.load(), means);
      if (other.load() == main.load()
          || measured.isEmpty()
          || reciprocal.isEmpty()
          || along.isEmpty()) {
        continue;
      }
      Combination difference =
          new Combination.Sum().add(measured.get(), 1).add(reciprocal.get(), -1).made();
      double variance = means.covariance(difference, difference);
      if (variance > 0) {
        above += means.value(along.get()) * means.value(difference) / variance;
        below += means.value(along.get()) * means.value(along.get()) / variance;
      }
    }
    return below > 0 ? above / below : 0;
  }
}
