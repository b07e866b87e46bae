package org.flexbound.report.workbook;

import java.util.ArrayList;
import java.util.List;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.ConfigurationFit;
import org.flexbound.report.results.Fit;
import org.flexbound.report.results.GainEstimate;
import org.flexbound.report.results.Group;
import org.flexbound.report.results.Misfit;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.ParameterWithout;
import org.flexbound.report.results.Plan;
import org.flexbound.report.results.PlannedCoefficient;
import org.flexbound.report.results.PlannedLoad;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.TradeOff;
import org.flexbound.report.results.Update;
import org.flexbound.report.results.Validation;
import org.flexbound.report.results.WithoutCase;

/** The sheets of an update: how it ended, and what its answer hangs on; those of a planned test. */
final class UpdateSheets {
  private final XSSFWorkbook workbook;
  private final Styles styles;
  private final Results results;
  private final UnitSystem units;

  UpdateSheets(XSSFWorkbook workbook, Styles styles, Results results, UnitSystem units) {
    this.workbook = workbook;
    this.styles = styles;
    this.results = results;
    this.units = units;
  }

  void write() {
    results.plan().ifPresent(this::plan);
    results.update().ifPresent(this::update);
    if (!results.validation().isEmpty()) {
      heldOut();
    }
  }

  private SheetWriter sheet(String name, String... headings) {
    return new SheetWriter(workbook, styles, name, headings);
  }

  private void plan(Plan plan) {
    SheetWriter loads =
        sheet(
            "Planned loads", "Configuration", "Load", "Largest", "Unit", "Runs",
            "Repeatability, relative", "Taken from");
    for (PlannedLoad load : plan.loads()) {
      loads.row(
          load.configuration(), load.load(), units.shown(load.largest(), load.unit()),
          units.symbol(load.unit()), load.runs(), load.repeatability(), load.basis());
    }
    loads.finish();
    SheetWriter coefficients =
        sheet(
            "Planned coefficients", "Configuration", "Gauge", "Load", "Expected",
            "Standard uncertainty", "Unit");
    for (PlannedCoefficient c : plan.coefficients()) {
      coefficients.row(
          c.configuration(), c.gauge(), c.load(), units.shown(c.expected(), c.unit()),
          units.shown(c.standardUncertainty(), c.unit()), units.symbol(c.unit()));
    }
    coefficients.finish();
  }

  private void update(Update update) {
    ending(update);
    SheetWriter groups =
        sheet(
            "Combinations", "Parameters", "In words", "Determined", "Value", "Lower 95 %",
            "Upper 95 %", "Standard deviation");
    for (Group g : update.groups()) {
      groups.row(
          String.join(", ", g.parameters()), g.inWords(), g.determined(), g.value(), g.lower95(),
          g.upper95(), g.standardDeviation());
    }
    groups.finish();
    if (results.plan().isEmpty()) {
      without(update);
      influence(update);
      curve(update);
      SheetWriter configurations =
          sheet("Configurations", "Configuration", "Coefficients", "Misfit", "Limit", "Agrees");
      for (ConfigurationFit fit : update.configurations()) {
        configurations.row(
            fit.configuration(), fit.coefficients(), fit.misfit(), fit.limit(), fit.agrees());
      }
      configurations.finish();
    }
    SheetWriter gains =
        sheet("Gains", "Instrument", "Stated u, relative", "Fitted, relative", "Standard deviation after");
    for (GainEstimate gain : update.gains()) {
      gains.row(
          gain.description().isEmpty() ? gain.key() : gain.description(), gain.priorUncertainty(),
          gain.fitted(), gain.standardDeviation());
    }
    gains.finish();
  }

  private void ending(Update update) {
    SheetWriter sheet = sheet("Update", "What", "Value", "Limit", "Remark");
    sheet.row("Rule", update.rule(), "", "");
    sheet.row("Weight of the prior", update.weight(), "", "");
    sheet.row("Outcome", update.verdict(), "", "");
    sheet.row(
        "Distance from the estimate at weight 1", update.distanceFromPrior(), "",
        "prior standard deviations");
    misfit(sheet, "Misfit of the nominal model", update.nominal());
    misfit(sheet, "Misfit of the point shown", update.shown());
    misfit(sheet, "Misfit of the best fit", update.best());
    sheet.row("Intervals widened by", update.widening(), "", "");
    sheet.row(
        "Smallest correction of the matrix itself", update.unexplained().correctionSize(), "",
        "share of the matrix, without physical meaning; missed most: "
            + String.join("; ", update.unexplained().worst()));
    sheet.row("Rank", update.rank(), "", "combinations that stand above the noise");
    sheet.row("Converged", update.converged(), "", update.reason());
    sheet.row("Iterations", update.iterations(), "", "");
    sheet.row("Projected gradient", update.projectedGradient(), "", "relative to the first");
    sheet.row("Starts", update.starts().size(), "", update.startsAgree() ? "all agree" : "they disagree");
    sheet.finish();
  }

  private static void misfit(SheetWriter sheet, String name, Misfit m) {
    sheet.row(name, m.value(), m.limit(), m.worstCase().isEmpty() ? "" : "worst: " + m.worstCase());
  }

  private void without(Update update) {
    List<String> headings = new ArrayList<>(List.of("Configuration", "Left out"));
    for (Parameter p : results.parameters()) {
      headings.add(
          p.name() + (p.unit().equals("1") ? ", × nominal" : ", " + units.symbol(p.unit())));
      headings.add(p.name() + ", shift");
    }
    headings.addAll(List.of("Misfit of its prediction", "Limit", "Predicted"));
    SheetWriter sheet = sheet("Without each case", headings.toArray(new String[0]));
    for (WithoutCase left : update.withoutLoadCase()) {
      List<Object> row = new ArrayList<>(List.of(left.configuration(), left.load()));
      for (int k = 0; k < left.parameters().size(); k++) {
        ParameterWithout p = left.parameters().get(k);
        String unit = results.parameters().get(k).unit();
        row.add(
            p.value().isEmpty()
                ? "rigid"
                : unit.equals("1")
                    ? p.value().getAsDouble()
                    : units.shown(p.value().getAsDouble(), unit));
        row.add(p.shift());
      }
      row.addAll(List.of(left.misfit(), left.limit(), left.predicted()));
      sheet.row(row.toArray());
    }
    sheet.finish();
  }

  private void influence(Update update) {
    List<String> headings =
        new ArrayList<>(
            List.of(
                "Configuration", "Gauge", "Load", "Leverage", "Studentised residual", "Outlying"));
    results.parameters().forEach(p -> headings.add("moves " + p.name()));
    SheetWriter sheet = sheet("Influence", headings.toArray(new String[0]));
    for (Fit fit : update.fits()) {
      List<Object> row =
          new ArrayList<>(
              List.of(
                  fit.configuration(), fit.gauge(), fit.load(), fit.leverage(),
                  fit.studentisedResidual(), fit.outlying()));
      row.addAll(fit.influence());
      sheet.row(row.toArray());
    }
    sheet.finish();
  }

  private void curve(Update update) {
    SheetWriter sheet =
        sheet("Trade-off", "Weight of the prior", "Misfit", "Change", "Effective parameters");
    for (TradeOff point : update.tradeOff()) {
      sheet.row(point.weight(), point.misfit(), point.change(), point.effectiveParameters());
    }
    sheet.finish();
  }

  private void heldOut() {
    SheetWriter sheet =
        sheet(
            "Held out", "Configuration", "Gauge", "Load", "Measured", "Predicted",
            "Standard uncertainty", "Lower 95 %", "Upper 95 %", "z", "Within", "Unit");
    for (Validation v : results.validation()) {
      sheet.row(
          v.configuration(), v.gauge(), v.load(), units.shown(v.measured(), v.unit()),
          units.shown(v.predicted(), v.unit()), units.shown(v.standardUncertainty(), v.unit()),
          units.shown(v.lower95(), v.unit()), units.shown(v.upper95(), v.unit()), v.z(), v.within(),
          units.symbol(v.unit()));
    }
    sheet.finish();
  }
}
