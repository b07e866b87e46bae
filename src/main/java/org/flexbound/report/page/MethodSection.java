package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.report.results.Configuration;
import org.flexbound.report.results.Exclusion;
import org.flexbound.report.results.Input;
import org.flexbound.report.results.Instrument;
import org.flexbound.report.results.Option;
import org.flexbound.report.results.Results;

/** How it was done: rules, formulas with their sources, inputs, what was left out, signatures. */
final class MethodSection {
  private final Results results;

  MethodSection(Results results) {
    this.results = results;
  }

  Section make() {
    List<Block> blocks = new ArrayList<>();
    blocks.add(new Block.Text("Made by " + results.program() + ", command " + results.command() + "."));
    blocks.add(formulas());
    add(blocks, inputs());
    add(blocks, configurations());
    add(blocks, options());
    add(blocks, instruments());
    TableMaker excluded = excluded();
    if (excluded.isEmpty()) {
      blocks.add(new Block.Text("No reading was left out."));
    } else {
      blocks.add(excluded.make());
    }
    blocks.add(new Block.Signatures(List.of("Tested by", "Reduced by", "Checked by")));
    return new Section("method", "How it was done", blocks);
  }

  private static void add(List<Block> blocks, TableMaker table) {
    if (!table.isEmpty()) {
      blocks.add(table.make());
    }
  }

  private Block formulas() {
    List<String> items = new ArrayList<>();
    items.add(
        "Readings at one held load are one load step: their mean. The opening zero readings are the"
            + " tare.");
    items.add(
        "Slopes in two stages: in each run a line with an intercept for each branch; then over runs."
            + " Random error of the load, where it matters, enters by errors in both variables"
            + " (York et al. 2004, Am. J. Phys. 72, 367). Scatter is pooled over the coefficients;"
            + " quantiles are Student's t with the pooled degrees of freedom ν"
            + " (JCGM 100:2008, annex G).");
    items.add(
        "The calibration of an instrument is a gain that all its readings share; its fixed part u₀"
            + " gives a slope of √2·u₀/ΔP.");
    items.add(
        "The motion of the base is taken out of a gauge only where the base gauges determine it.");
    items.add(
        "Reciprocity (Maxwell 1864, Betti 1872): a motion at i by a unit load at j equals a motion"
            + " at j by a unit load at i; judged on coefficients before base motion is taken out.");
    if (!results.limits().isEmpty()) {
      items.add(LimitSection.RULE);
    }
    if (!results.comparison().isEmpty()) {
      items.add(
          "Computed flexibility: G = Bᵀ K⁻¹ C, of a frame of members with shear deformation, joints"
              + " and supports; z is measured less computed over the combined standard uncertainty.");
      items.add(
          "Contributions: −∂a/∂ln θ of each part; for displacement gauges they sum to the"
              + " coefficient, since stiffness is homogeneous of degree one.");
    }
    results
        .update()
        .ifPresent(
            update -> {
              items.add(
                  "Update: least squares of residuals under their covariance, plus gains and changes"
                      + " in units of their prior standard deviations, within the bounds, by"
                      + " Gauss–Newton steps, each a bounded linear problem (Stark & Parker 1995,"
                      + " Comput. Stat. 10, 129). Rule for the weight of the prior: "
                      + update.rule()
                      + ".");
              items.add(
                  "Intervals, share of variance removed and status are those at weight 1; an interval"
                      + " is a quantile of the posterior within the bounds, or comes from the profile"
                      + " where that is not parabolic"
                      + (update.widening() > 1.0000001
                          ? "; intervals are widened by a factor of "
                              + org.flexbound.report.Rounded.significant(update.widening(), 3)
                              + ", since the best fit misfits."
                          : "."));
            });
    return new Block.Bullets(items);
  }

  private TableMaker inputs() {
    TableMaker table = new TableMaker("Input files").text("File", "SHA-256");
    for (Input input : results.inputs()) {
      table.row(input.file(), input.sha256());
    }
    return table;
  }

  private TableMaker configurations() {
    TableMaker table =
        new TableMaker("Configurations").text("Configuration", "Log", "Test", "Changes of the model");
    for (Configuration c : results.configurations()) {
      table.row(
          c.name(),
          c.log(),
          String.join(
              ", ",
              List.of(c.test().title(), c.test().date()).stream()
                  .filter(s -> !s.isEmpty())
                  .toList()),
          c.changes().isEmpty() ? "none" : String.join("; ", c.changes()));
    }
    return table;
  }

  private TableMaker options() {
    TableMaker table = new TableMaker("Rules and options in force").text("Option", "Value", "Stated in");
    for (Option option : results.options()) {
      table.row(option.name(), option.value(), option.source());
    }
    return table;
  }

  private TableMaker instruments() {
    TableMaker table =
        new TableMaker("Instruments")
            .text("Instrument", "Kind", "Serial", "Calibration", "Date")
            .number("Gain u");
    for (Instrument i : results.instruments()) {
      table.row(
          i.name(),
          i.kind(),
          i.serial(),
          i.calibrationReference(),
          i.calibrationDate(),
          i.gainUncertainty().isPresent()
              ? org.flexbound.report.Rounded.significant(100 * i.gainUncertainty().getAsDouble(), 2)
                  + " %"
              : "not included");
    }
    return table;
  }

  private TableMaker excluded() {
    TableMaker table =
        new TableMaker("What was left out, and by whom")
            .text("Run", "What", "Cells", "Reason", "Decided by")
            .number("Readings");
    // One row for the same decision on several gauges of a run; results.json has each of them.
    Map<String, List<Exclusion>> decisions = new LinkedHashMap<>();
    for (Exclusion e : results.excluded()) {
      decisions
          .computeIfAbsent(
              e.configuration() + "\u0000" + e.run() + "\u0000" + e.reason() + "\u0000" + e.by(),
              unused -> new ArrayList<>())
          .add(e);
    }
    for (List<Exclusion> same : decisions.values()) {
      Exclusion first = same.get(0);
      int readings = same.stream().mapToInt(Exclusion::readings).sum();
      table.row(
          first.run(),
          first.what() + (same.size() > 1 ? " and " + (same.size() - 1) + " more like it" : ""),
          first.where(),
          first.reason(),
          first.by(),
          String.valueOf(readings));
    }
    return table;
  }
}
