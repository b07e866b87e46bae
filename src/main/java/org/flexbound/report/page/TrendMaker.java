package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.figures.Figure;
import org.flexbound.report.figures.TrendFigure;
import org.flexbound.report.results.Finding;
import org.flexbound.report.results.TrendPoint;
import org.flexbound.report.results.TrendResults;
import org.flexbound.report.results.TrendSeries;
import org.flexbound.report.results.TrendTest;

/** Makes the content of a trend report. */
public final class TrendMaker {
  /** More figures than this make a file that nobody scrolls through; those outside come first. */
  private static final int MOST_FIGURES = 60;

  private static final int NAMED = 8;

  private final TrendResults trend;
  private final UnitSystem units;

  private TrendMaker(TrendResults trend, UnitSystem units) {
    this.trend = trend;
    this.units = units;
  }

  /**
   * Words, rounds and draws a history.
   *
   * @param trend the history
   * @param units the units to show
   * @return the report's content
   */
  public static ReportPage make(TrendResults trend, UnitSystem units) {
    return new TrendMaker(trend, units).page();
  }

  private ReportPage page() {
    List<Section> sections = new ArrayList<>();
    sections.add(
        new Section(
            "answer",
            "The answer",
            List.of(
                new Block.Answers(List.of(answer())),
                new Block.Text(
                    "A point outside says that something changed, not what: look at clamps, bolts,"
                        + " seats, and at the calibration of the instruments, before the fixture is"
                        + " blamed. A stiffness is no proof of strength."))));
    if (!trend.findings().isEmpty()) {
      sections.add(new Section("findings", "Findings", List.of(findings())));
    }
    List<Figure> figures = new ArrayList<>();
    List<TrendSeries> sorted = new ArrayList<>(trend.series());
    sorted.sort(java.util.Comparator.comparing(s -> s.outside().isEmpty()));
    for (TrendSeries series : sorted.subList(0, Math.min(MOST_FIGURES, sorted.size()))) {
      figures.add(TrendFigure.draw("trend-" + (figures.size() + 1), series, units));
    }
    sections.add(
        new Section("trends", "Over time", List.of(new Block.Figures(figures, true))));
    sections.add(new Section("tables", "Tables", List.of(limits(), tests(), outside())));
    sections.add(new Section("method", "How it was done", List.of(method())));
    return new ReportPage(
        "Trend of "
            + (trend.title().isEmpty() ? "a fixture" : trend.title()),
        trend.tests().get(0).date()
            + " to "
            + trend.tests().get(trend.tests().size() - 1).date()
            + " · "
            + Shown.count(trend.tests().size(), "test", "tests"),
        trend.program(),
        sections);
  }

  private Block.Answer answer() {
    List<String> details = new ArrayList<>();
    long outside = trend.series().stream().filter(s -> !s.outside().isEmpty()).count();
    List<TrendSeries> named =
        trend.series().stream().filter(s -> !s.outside().isEmpty()).toList();
    for (TrendSeries series : named.subList(0, Math.min(NAMED, named.size()))) {
      details.add(series.name() + ": " + points(series) + ".");
    }
    if (named.size() > NAMED) {
      details.add((named.size() - NAMED) + " more stand in the table.");
    }
    TrendTest latest = trend.tests().get(trend.tests().size() - 1);
    long now =
        trend.series().stream()
            .filter(s -> s.outside().stream().anyMatch(p -> p.test().equals(latest.name())))
            .count();
    details.add(
        "The latest test, "
            + latest.date()
            + ", is outside in "
            + now
            + " of "
            + trend.series().size()
            + " charts.");
    return new Block.Answer(
        "Has it stayed as it was?",
        outside == 0
            ? "Yes: every value lies within its limits."
            : "No: "
                + outside
                + " of "
                + trend.series().size()
                + " charts have points outside of their limits.",
        outside == 0 ? Tone.GOOD : Tone.WARN,
        details);
  }

  private static String points(TrendSeries series) {
    return String.join(
        ", ",
        series.outside().stream()
            .map(
                p ->
                    p.date()
                        + (p.outside()
                            ? p.value() > series.upper() ? " above" : " below"
                            : " jumped"))
            .toList());
  }

  private Block findings() {
    List<Block.Noted> noted = new ArrayList<>();
    for (Finding f : trend.findings()) {
      noted.add(
          new Block.Noted(
              f.severity(),
              f.severity().equals("note") ? Tone.PLAIN : Tone.WARN,
              f.code(),
              f.message(),
              f.where(),
              f.remedy()));
    }
    return new Block.FindingList(noted);
  }

  private Block limits() {
    TableMaker table =
        new TableMaker("Limits")
            .text("Coefficient or parameter")
            .number("Mean of baseline", "Lower", "Upper", "Mean range", "Upper range", "Latest")
            .text("Unit", "Outside");
    for (TrendSeries s : trend.series()) {
      TrendPoint latest = s.points().get(s.points().size() - 1);
      double reach = (s.upper() - s.lower()) / 6;
      table.row(
          List.of(
              Block.Cell.of(s.name()),
              Block.Cell.of(number(s, s.centre(), reach)),
              Block.Cell.of(number(s, s.lower(), reach)),
              Block.Cell.of(number(s, s.upper(), reach)),
              Block.Cell.of(number(s, s.meanRange(), reach)),
              Block.Cell.of(
                  s.upperRange().isPresent()
                      ? number(s, s.upperRange().getAsDouble(), reach)
                      : "–"),
              Block.Cell.of(number(s, latest.value(), reach)),
              Block.Cell.of(symbol(s)),
              new Block.Cell(
                  s.outside().isEmpty() ? "none" : points(s),
                  s.outside().isEmpty() ? Tone.GOOD : Tone.WARN)));
    }
    return table.make();
  }

  private String number(TrendSeries s, double si, double reach) {
    return factor(s)
        ? Rounded.value(si, reach)
        : Rounded.value(units.shown(si, s.unit()), Math.abs(units.shown(reach, s.unit())));
  }

  private String symbol(TrendSeries s) {
    return factor(s) ? "× nominal" : units.symbol(s.unit());
  }

  private static boolean factor(TrendSeries s) {
    return s.kind().equals("parameter") && s.unit().equals("1");
  }

  private Block tests() {
    TableMaker table = new TableMaker("Tests").text("Date", "Results", "");
    for (int k = 0; k < trend.tests().size(); k++) {
      table.row(
          trend.tests().get(k).date(),
          trend.tests().get(k).name(),
          k < trend.baseline() ? "baseline" : "");
    }
    return table.make();
  }

  private Block outside() {
    TableMaker table =
        new TableMaker("Points outside")
            .text("Coefficient or parameter", "Date")
            .number("Value", "Lower", "Upper", "Moving range")
            .text("Unit", "What");
    for (TrendSeries s : trend.series()) {
      double reach = (s.upper() - s.lower()) / 6;
      for (TrendPoint p : s.outside()) {
        table.row(
            s.name(),
            p.date(),
            number(s, p.value(), reach),
            number(s, s.lower(), reach),
            number(s, s.upper(), reach),
            p.range().isPresent() ? number(s, p.range().getAsDouble(), reach) : "–",
            symbol(s),
            p.outside() ? "outside of the limits" : "jumped");
      }
    }
    return table.isEmpty() ? new Block.Text("No point lies outside.") : table.make();
  }

  private Block method() {
    boolean predicted =
        trend.series().stream().anyMatch(s -> s.method().startsWith("prediction"));
    List<String> items = new ArrayList<>();
    items.add(
        "The first " + trend.baseline() + " tests in order of their dates are the baseline.");
    if (predicted) {
      items.add(
          "Fewer than eight: limits are the prediction interval of one further value,"
              + " mean ± t s √(1 + 1/n), at a two-sided probability of 0.27 %. Only tests after the"
              + " baseline are judged.");
    } else {
      items.add(
          "Limits are Shewhart's for individuals, mean ± 2.66 times the mean moving range (3/d₂, d₂ ="
              + " 1.128), and 3.267 times it for the range itself (NIST/SEMATECH e-Handbook of"
              + " Statistical Methods, 6.3.2.2).");
    }
    items.add(
        "A stable fixture still gives a point outside about once in 370 tests and chart, more often"
            + " where the baseline is short: one point among many charts is no proof, several charts"
            + " at one date are.");
    items.add(
        "The limits come from how the values varied, calibration changes between the tests of the"
            + " baseline included; the uncertainty of the single test does not enter them.");
    return new Block.Bullets(items);
  }
}
