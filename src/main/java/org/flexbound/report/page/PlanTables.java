package org.flexbound.report.page;

import java.util.List;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.Plan;
import org.flexbound.report.results.PlannedCoefficient;
import org.flexbound.report.results.PlannedLoad;

/** The tables of a planned test. */
final class PlanTables {
  private final Plan plan;
  private final Shown shown;
  private final boolean several;

  PlanTables(Plan plan, Shown shown, boolean several) {
    this.plan = plan;
    this.shown = shown;
    this.several = several;
  }

  void add(List<Block> blocks) {
    TableMaker loads =
        new TableMaker("The loads as planned")
            .text("Load")
            .number("Largest", "Runs", "Slopes repeat within")
            .text("Taken from");
    for (PlannedLoad load : plan.loads()) {
      loads.row(
          name(load.configuration(), load.load()),
          shown.withUnit(load.largest(), load.unit()),
          String.valueOf(load.runs()),
          Rounded.percent(load.repeatability()),
          load.basis());
    }
    blocks.add(loads.make());
    TableMaker coefficients =
        new TableMaker("What would be measured, if the nominal model were true")
            .text("Gauge", "Load")
            .number("Motion at the largest load", "Coefficient", "u", "u, share")
            .text("Unit");
    for (PlannedCoefficient c : plan.coefficients()) {
      coefficients.row(
          name(c.configuration(), c.gauge()),
          c.load(),
          shown.withUnit(c.motion(), c.unit().substring(0, Math.max(1, c.unit().indexOf('/')))),
          shown.value(c.expected(), c.standardUncertainty(), c.unit()),
          shown.uncertainty(c.standardUncertainty(), c.unit()),
          c.expected() == 0
              ? "–"
              : Rounded.percent(c.standardUncertainty() / Math.abs(c.expected())),
          shown.symbol(c.unit()));
    }
    blocks.add(coefficients.make());
  }

  private String name(String configuration, String name) {
    return several ? configuration + ": " + name : name;
  }
}
