package org.flexbound.app;

import java.io.PrintWriter;
import java.util.Comparator;
import java.util.List;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.ChangeSubset;
import org.flexbound.report.results.CoefficientChange;
import org.flexbound.report.results.ParameterChange;
import org.flexbound.report.results.Recheck;
import org.flexbound.report.results.Results;

/** Prints how a test differs from an earlier one. */
final class RecheckSummary {
  private static final int MOST_ROWS = 20;

  private final Terminal terminal;
  private final PrintWriter out;
  private final Results results;
  private final UnitSystem units;

  RecheckSummary(Terminal terminal, Results results, UnitSystem units) {
    this.terminal = terminal;
    this.out = terminal.out();
    this.results = results;
    this.units = units;
  }

  void print() {
    results.recheck().ifPresent(this::print);
  }

  private void print(Recheck recheck) {
    out.println();
    out.println(
        terminal.bold(
            "Change since "
                + PlainText.of(
                    recheck.baselineDate().isEmpty() ? recheck.baseline() : recheck.baselineDate())));
    List<CoefficientChange> changed =
        recheck.changes().stream()
            .filter(CoefficientChange::significant)
            .sorted(Comparator.comparingDouble(CoefficientChange::probability))
            .toList();
    if (!changed.isEmpty()) {
      TextTable table =
          new TextTable().text("gauge").text("load").number("before").number("now")
              .number("difference").number("±").text("unit").number("P adjusted");
      for (CoefficientChange c : changed.subList(0, Math.min(MOST_ROWS, changed.size()))) {
        double u = units.shown(c.standardUncertainty(), c.unit());
        table.row(
            c.gauge(),
            c.load(),
            Rounded.value(units.shown(c.before(), c.unit()), u),
            Rounded.value(units.shown(c.now(), c.unit()), u),
            Rounded.value(units.shown(c.difference(), c.unit()), u),
            Rounded.uncertainty(u),
            units.symbol(c.unit()),
            Rounded.significant(c.adjusted(), 2));
      }
      table.print(out);
      if (changed.size() > MOST_ROWS) {
        out.println("  … and " + (changed.size() - MOST_ROWS) + " more in the report");
      }
    }
    String words =
        "  "
            + changed.size()
            + " of "
            + recheck.changes().size()
            + " coefficients changed beyond chance; all together: probability by chance "
            + Rounded.significant(recheck.probability(), 2);
    out.println(recheck.changed() ? terminal.warn(words) : terminal.good(words));
    recheck
        .explanation()
        .ifPresent(
            e ->
                out.println(
                    terminal.warn(
                        e.explained()
                            ? "  explained by "
                                + PlainText.of(
                                    String.join(
                                        ", or as well by ",
                                        e.subsets().stream().map(RecheckSummary::words).toList()))
                            : "  no change of one or two parameters explains it; nearest: "
                                + PlainText.of(
                                    String.join(
                                        "",
                                        e.subsets().stream()
                                            .map(RecheckSummary::words)
                                            .toList())))));
  }

  private static String words(ChangeSubset subset) {
    return String.join(
        " and ",
        subset.parameters().stream()
            .map(
                (ParameterChange p) ->
                    p.name()
                        + (p.factor().isPresent()
                            ? " × " + Rounded.significant(p.factor().getAsDouble(), 2)
                            : ""))
            .toList());
  }
}
