package org.flexbound.report.gather;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.acceptance.Advice;
import org.flexbound.acceptance.Budget;
import org.flexbound.acceptance.Decision;
import org.flexbound.acceptance.Quantity;
import org.flexbound.quantity.Dimension;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.FixtureShare;
import org.flexbound.report.results.Limit;
import org.flexbound.report.results.UncertaintyShare;

/** Acceptance limits with their decisions, as results. */
final class LimitPart {
  private static final Map<Dimension, String> MOTIONS = motions();
  private static final Map<Dimension, String> LOADS = loads();

  private LimitPart() {}

  private static Map<Dimension, String> motions() {
    Map<Dimension, String> motions = new LinkedHashMap<>();
    motions.put(Dimension.LENGTH, "m");
    motions.put(Dimension.ANGLE, "rad");
    motions.put(Dimension.NUMBER, "1");
    return motions;
  }

  private static Map<Dimension, String> loads() {
    Map<Dimension, String> loads = new LinkedHashMap<>();
    loads.put(Dimension.FORCE, "N");
    loads.put(Dimension.MOMENT, "N·m");
    return loads;
  }

  /** The SI unit of a limit, as results.json spells it. */
  static String unit(Dimension dimension) {
    for (Map.Entry<Dimension, String> motion : MOTIONS.entrySet()) {
      for (Map.Entry<Dimension, String> load : LOADS.entrySet()) {
        if (dimension.equals(motion.getKey().per(load.getKey()))) {
          return UnitSystem.per(motion.getValue(), load.getValue());
        }
        if (dimension.equals(load.getKey().per(motion.getKey()))) {
          return motion.getValue().equals("1")
              ? load.getValue()
              : load.getValue() + "/" + motion.getValue();
        }
      }
    }
    return "1";
  }

  static Limit limit(Decision decision) {
    Optional<Quantity> quantity = decision.quantity();
    boolean guarded = decision.rule().guarded();
    return new Limit(
        decision.configuration(),
        decision.limit().name(),
        Values.word(decision.limit().kind()),
        quantity.map(Quantity::subject).orElse(""),
        number(quantity.map(Quantity::value)),
        number(quantity.map(q -> q.budget().standardUncertainty())),
        number(quantity.map(q -> q.budget().degreesOfFreedom())),
        decision.lower(),
        decision.upper(),
        unit(decision.limit().unit().dimension()),
        decision.limit().unit().symbol(),
        decision.limit().unit().siFactor(),
        decision.judged(),
        guarded ? "guarded" : "simple",
        decision.rule().largestProbability(),
        Values.finite(decision.guard()),
        Values.finite(decision.probability()),
        Values.word(decision.verdict()),
        Values.finite(decision.wrong()),
        decision.advice().map(Advice::words).orElse(""),
        quantity.map(q -> sources(q.budget())).orElse(List.of()));
  }

  private static OptionalDouble number(Optional<Double> value) {
    return value.map(Values::finite).orElse(OptionalDouble.empty());
  }

  private static List<UncertaintyShare> sources(Budget budget) {
    double total = Math.pow(budget.standardUncertainty(), 2);
    if (!(total > 0)) {
      return List.of();
    }
    List<UncertaintyShare> result = new ArrayList<>();
    if (budget.scatter() > 0) {
      result.add(
          new UncertaintyShare(
              "scatter from run to run", budget.scatter() * budget.scatter() / total));
    }
    for (Budget.Source source : budget.fixed()) {
      if (source.uncertainty() > 0) {
        result.add(
            new UncertaintyShare(
                source.name(), source.uncertainty() * source.uncertainty() / total));
      }
    }
    result.sort(Comparator.comparingDouble(s -> -s.share()));
    return result;
  }

  static FixtureShare fixture(org.flexbound.acceptance.FixtureShare share, String unit) {
    return new FixtureShare(
        share.configuration(),
        share.gauge(),
        share.load(),
        unit,
        share.total(),
        share.totalUncertainty(),
        share.own(),
        share.ownUncertainty(),
        Values.finite(share.share()),
        Values.finite(share.shareUncertainty()));
  }
}
