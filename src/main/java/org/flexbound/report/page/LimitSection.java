package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.report.Rounded;
import org.flexbound.report.figures.LimitFigure;
import org.flexbound.report.results.FixtureShare;
import org.flexbound.report.results.Limit;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.UncertaintyShare;

/** Acceptance limits, what was measured of them, and the decisions. */
final class LimitSection {
  static final String RULE =
      "A limit passes where the true value lies beyond it with at most the stated probability, fails"
          + " where it lies within it with at most that probability, and is undecided between"
          + " (guarded acceptance and guarded rejection, JCGM 106:2012). The probability is that of"
          + " Student's t about the measured value, or of χ² for a repeatability; nothing else is"
          + " taken to be known. With the simple rule the value alone decides. The probability holds"
          + " for each limit by itself.";

  private static final int SOURCES_SHOWN = 3;

  private final Results results;
  private final Shown shown;

  LimitSection(Results results, Shown shown) {
    this.results = results;
    this.shown = shown;
  }

  Optional<Section> make() {
    if (results.limits().isEmpty() && results.fixture().isEmpty()) {
      return Optional.empty();
    }
    List<Block> blocks = new ArrayList<>();
    if (!results.limits().isEmpty()) {
      blocks.add(new Block.Text(RULE));
      blocks.add(table(results.limits(), Integer.MAX_VALUE).make());
      blocks.add(sources().make());
      LimitFigure.draw(results.limits())
          .ifPresent(figure -> blocks.add(new Block.Figures(List.of(figure), false)));
    }
    if (!results.fixture().isEmpty()) {
      blocks.add(
          new Block.Text(
              "How much of what a gauge showed was the motion of base and fixture, from the gauges"
                  + " that measure them, and what is left as the article's own. The uncertainty of"
                  + " what is left is larger: that is the price of taking them out."));
      blocks.add(fixture().make());
    }
    return Optional.of(new Section("limits", "Limits and decisions", blocks));
  }

  /** The answer of the first page. */
  static Optional<Block.Answer> answer(Results results) {
    if (results.limits().isEmpty()) {
      return Optional.empty();
    }
    List<String> details = new ArrayList<>();
    for (Limit limit : results.limits()) {
      details.add(
          limit.name()
              + ": "
              + limit.decision()
              + (limit.value().isPresent()
                  ? ", "
                      + value(limit)
                      + " ± "
                      + uncertainty(limit)
                      + " "
                      + limit.statedUnit()
                      + " against "
                      + bounds(limit)
                  : "")
              + (limit.advice().isEmpty() ? "" : ". " + capital(limit.advice()))
              + ".");
    }
    return Optional.of(
        new Block.Answer(
            "Are the limits met?", verdict(results.limits()), tone(results.limits()), details));
  }

  private static String capital(String text) {
    return text.substring(0, 1).toUpperCase(Locale.ROOT) + text.substring(1);
  }

  static long count(List<Limit> limits, String decision) {
    return limits.stream().filter(l -> l.decision().equals(decision)).count();
  }

  static String verdict(List<Limit> limits) {
    long failed = count(limits, "fail");
    long open = count(limits, "undecided");
    if (failed > 0) {
      return "No: "
          + failed
          + " of "
          + Shown.count(limits.size(), "limit", "limits")
          + (failed == 1 ? " is" : " are")
          + " broken"
          + (open > 0 ? ", and " + open + " cannot be decided" : "")
          + ".";
    }
    return open > 0
        ? "Not decided: this test cannot decide "
            + open
            + " of "
            + Shown.count(limits.size(), "limit", "limits")
            + "."
        : limits.size() == 1
            ? "Yes: the limit is met."
            : "Yes: all " + limits.size() + " limits are met.";
  }

  static Tone tone(List<Limit> limits) {
    return count(limits, "fail") > 0
        ? Tone.BAD
        : count(limits, "undecided") > 0 ? Tone.WARN : Tone.GOOD;
  }

  static Tone tone(Limit limit) {
    return tone(List.of(limit));
  }

  static String value(Limit limit) {
    return limit.value().isEmpty()
        ? "–"
        : Rounded.value(
            limit.stated(limit.value().getAsDouble()),
            limit.stated(limit.standardUncertainty().orElse(0)));
  }

  static String uncertainty(Limit limit) {
    return limit.standardUncertainty().isEmpty()
        ? "–"
        : Rounded.uncertainty(limit.stated(limit.standardUncertainty().getAsDouble()));
  }

  /** The limit in words, in the unit in which it was stated. */
  static String bounds(Limit limit) {
    String unit = " " + limit.statedUnit();
    if (limit.lower().isEmpty()) {
      return "at most " + number(limit, limit.upper()) + unit;
    }
    return limit.upper().isEmpty()
        ? "at least " + number(limit, limit.lower()) + unit
        : number(limit, limit.lower()) + " to " + number(limit, limit.upper()) + unit;
  }

  private static String number(Limit limit, OptionalDouble si) {
    double stated = limit.stated(si.orElse(Double.NaN));
    String four = Rounded.significant(stated, 4);
    return four.contains(".") ? four.replaceFirst("\\.?0+$", "") : four;
  }

  static String percent(OptionalDouble probability) {
    if (probability.isEmpty()) {
      return "–";
    }
    double p = probability.getAsDouble();
    if (p < 0.001) {
      return "< 0.1 %";
    }
    return p > 0.999 ? "> 99.9 %" : Rounded.fixed(100 * p, 1) + " %";
  }

  /** The table; names longer than so much are cut. */
  static TableMaker table(List<Limit> limits, int longest) {
    TableMaker table =
        new TableMaker("Limits and decisions")
            .text("Limit", "Quantity")
            .number("Result", "±")
            .text("Allowed")
            .number("Guard band", "P within")
            .text("Decision")
            .number("P wrong");
    for (Limit limit : limits) {
      table.row(
          List.of(
              Block.Cell.of(cut(limit.name(), longest)),
              Block.Cell.of(
                  cut(limit.subject(), longest)
                      + (limit.judged() > 1 ? " (the worst of " + limit.judged() + ")" : "")),
              Block.Cell.of(value(limit)),
              Block.Cell.of(uncertainty(limit)),
              Block.Cell.of(bounds(limit)),
              Block.Cell.of(
                  limit.guard().isPresent()
                      ? Rounded.uncertainty(limit.stated(limit.guard().getAsDouble()))
                      : "–"),
              Block.Cell.of(percent(limit.probability())),
              new Block.Cell(
                  limit.decision() + (limit.rule().equals("simple") ? " (simple rule)" : ""),
                  tone(limit)),
              Block.Cell.of(percent(limit.wrong()))));
    }
    return table;
  }

  static String cut(String text, int longest) {
    return text.length() > longest ? text.substring(0, longest - 1) + "…" : text;
  }

  private TableMaker sources() {
    TableMaker table =
        new TableMaker("Where the uncertainty comes from, and what would settle what is undecided")
            .text("Limit", "Largest sources (share of the variance)", "What would settle it");
    for (Limit limit : results.limits()) {
      List<String> parts = new ArrayList<>();
      for (UncertaintyShare source :
          limit.sources().subList(0, Math.min(SOURCES_SHOWN, limit.sources().size()))) {
        parts.add(source.source() + " " + Rounded.percent(source.share()));
      }
      table.row(
          limit.name(),
          String.join("; ", parts),
          limit.advice().isEmpty() ? "–" : limit.advice());
    }
    return table;
  }

  private TableMaker fixture() {
    TableMaker table =
        new TableMaker("Fixture against article")
            .text("Gauge", "Load")
            .number("As read", "±", "Article's own", "±")
            .text("Unit")
            .number("Base and fixture", "±");
    for (FixtureShare f : results.fixture()) {
      table.row(
          f.gauge(),
          f.load(),
          shown.value(f.total(), f.totalUncertainty(), f.unit()),
          shown.uncertainty(f.totalUncertainty(), f.unit()),
          shown.value(f.own(), f.ownUncertainty(), f.unit()),
          shown.uncertainty(f.ownUncertainty(), f.unit()),
          shown.symbol(f.unit()),
          f.share().isPresent() ? Rounded.percent(f.share().getAsDouble()) : "–",
          f.shareUncertainty().isPresent()
              ? Rounded.percent(f.shareUncertainty().getAsDouble())
              : "–");
    }
    return table;
  }
}
