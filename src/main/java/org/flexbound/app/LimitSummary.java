package org.flexbound.app;

import java.io.PrintWriter;
import java.util.OptionalDouble;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.Limit;
import org.flexbound.report.results.Results;

/** Prints the decisions on acceptance limits. */
final class LimitSummary {
  private final Terminal terminal;
  private final PrintWriter out;
  private final Results results;

  LimitSummary(Terminal terminal, Results results) {
    this.terminal = terminal;
    this.out = terminal.out();
    this.results = results;
  }

  void print() {
    if (results.limits().isEmpty()) {
      return;
    }
    out.println();
    out.println(terminal.bold("Limits"));
    TextTable table =
        new TextTable().text("limit").text("quantity").number("result").number("±").text("allowed")
            .text("unit").number("P within").text("decision");
    for (Limit l : results.limits()) {
      double u = l.stated(l.standardUncertainty().orElse(0));
      table.row(
          l.name(),
          l.subject() + (l.judged() > 1 ? " (worst of " + l.judged() + ")" : ""),
          l.value().isPresent() ? Rounded.value(l.stated(l.value().getAsDouble()), u) : "–",
          l.value().isPresent() ? Rounded.uncertainty(u) : "–",
          allowed(l),
          l.statedUnit(),
          l.probability().isPresent()
              ? Rounded.fixed(100 * l.probability().getAsDouble(), 1) + " %"
              : "–",
          l.decision() + (l.rule().equals("simple") ? " (simple rule)" : ""));
    }
    table.print(out);
    for (Limit l : results.limits()) {
      if (!l.advice().isEmpty()) {
        out.println(
            terminal.warn(
                "  " + PlainText.of(l.name()) + ": cannot decide with this test; "
                    + PlainText.of(l.advice())));
      }
    }
    long failed = results.limits().stream().filter(l -> l.decision().equals("fail")).count();
    long open = results.limits().stream().filter(l -> l.decision().equals("undecided")).count();
    String words =
        "  "
            + (results.limits().size() - failed - open)
            + " passed, "
            + failed
            + " failed, "
            + open
            + " undecided";
    out.println(
        failed > 0 ? terminal.bad(words) : open > 0 ? terminal.warn(words) : terminal.good(words));
  }

  private static String allowed(Limit limit) {
    if (limit.lower().isEmpty()) {
      return "≤ " + number(limit, limit.upper());
    }
    return limit.upper().isEmpty()
        ? "≥ " + number(limit, limit.lower())
        : number(limit, limit.lower()) + " … " + number(limit, limit.upper());
  }

  private static String number(Limit limit, OptionalDouble si) {
    return Rounded.significant(limit.stated(si.orElse(Double.NaN)), 4);
  }
}
