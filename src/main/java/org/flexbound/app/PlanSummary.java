package org.flexbound.app;

import java.io.PrintWriter;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.Group;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.Plan;
import org.flexbound.report.results.PlannedLoad;
import org.flexbound.report.results.Results;

/** Prints what a planned test would tell. */
final class PlanSummary {
  private final Terminal terminal;
  private final PrintWriter out;
  private final Results results;
  private final Plan plan;
  private final UnitSystem units;

  PlanSummary(Terminal terminal, Results results, Plan plan, UnitSystem units) {
    this.terminal = terminal;
    this.out = terminal.out();
    this.results = results;
    this.plan = plan;
    this.units = units;
  }

  void print() {
    boolean several = results.configurations().size() > 1;
    heading("Planned loads");
    TextTable loads =
        new TextTable().text("load").number("largest").text("unit").number("runs")
            .number("repeat within").text("from");
    for (PlannedLoad load : plan.loads()) {
      loads.row(
          several ? load.configuration() + ": " + load.load() : load.load(),
          Rounded.significant(units.shown(load.largest(), load.unit()), 3),
          units.symbol(load.unit()),
          String.valueOf(load.runs()),
          Rounded.percent(load.repeatability()),
          load.basis());
    }
    loads.print(out);
    heading("What the test would tell, if the nominal model were true");
    TextTable table =
        new TextTable().text("parameter").text("status").text("95 % interval").text("unit")
            .number("prior sd").number("sd after").number("variance removed");
    for (Parameter p : results.parameters()) {
      table.row(
          p.name(),
          p.status(),
          Stiffnesses.interval(p, units),
          p.unit().equals("1") ? "× nominal" : units.symbol(p.unit()),
          Rounded.significant(p.priorStandardDeviation(), 2),
          Rounded.significant(p.posteriorStandardDeviation(), 2),
          Rounded.percent(p.varianceRemoved()));
    }
    table.print(out);
    results
        .update()
        .ifPresent(
            update -> {
              for (Group group : update.groups()) {
                out.println("  only together: " + PlainText.of(group.inWords()));
              }
            });
  }

  private void heading(String text) {
    out.println();
    out.println(terminal.bold(text));
  }
}
