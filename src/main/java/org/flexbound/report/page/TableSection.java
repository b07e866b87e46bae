package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.Coefficient;
import org.flexbound.report.results.Comparison;
import org.flexbound.report.results.GainEstimate;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.Reciprocity;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.Run;
import org.flexbound.report.results.Update;
import org.flexbound.report.results.Validation;

/** The tables: values and uncertainties rounded together, in the reader's units. */
final class TableSection {
  private static final double FAR = 1.96;
  private static final double VERY_FAR = 3.3;

  private final Results results;
  private final Shown shown;
  private final boolean several;

  TableSection(Results results, Shown shown) {
    this.results = results;
    this.shown = shown;
    this.several = results.configurations().size() > 1;
  }

  Section make() {
    List<Block> blocks = new ArrayList<>();
    results.plan().ifPresent(plan -> new PlanTables(plan, shown, several).add(blocks));
    add(blocks, runs());
    matrices(blocks);
    add(blocks, coefficients());
    add(blocks, quality());
    add(blocks, reciprocity());
    new MatrixTables(results).add(blocks);
    add(blocks, comparison());
    add(blocks, parameters());
    add(blocks, priors());
    new UpdateTables(results, shown).add(blocks);
    add(blocks, gains());
    add(blocks, validation());
    return new Section("tables", "Tables", blocks);
  }

  private static void add(List<Block> blocks, TableMaker table) {
    if (!table.isEmpty()) {
      blocks.add(table.make());
    }
  }

  private String name(String configuration, String name) {
    return several ? configuration + ": " + name : name;
  }

  private TableMaker runs() {
    TableMaker table =
        new TableMaker("Runs and their verdicts")
            .text("Run", "Loads", "Verdict")
            .number("Steps", "Cycles", "Peak load")
            .text("Reasons and remarks");
    for (Run run : results.runs()) {
      Tone tone =
          switch (run.verdict()) {
            case "accept" -> Tone.GOOD;
            case "repeat" -> Tone.BAD;
            default -> Tone.WARN;
          };
      List<String> why = new ArrayList<>(run.reasons());
      if (!run.remark().isEmpty()) {
        why.add("“" + run.remark() + "”");
      }
      table.row(
          List.of(
              Block.Cell.of(name(run.configuration(), run.name())),
              Block.Cell.of(String.join(", ", run.loads())),
              new Block.Cell(run.verdict() + (run.used() ? "" : ", not used"), tone),
              Block.Cell.of(String.valueOf(run.steps())),
              Block.Cell.of(String.valueOf(run.cycles())),
              Block.Cell.of(
                  run.peakLoad().isPresent()
                      ? shown.withUnit(run.peakLoad().getAsDouble(), run.loadUnit())
                      : "–"),
              Block.Cell.of(String.join("; ", why))));
    }
    return table;
  }

  /** The matrix itself, one table for each configuration and unit. */
  private void matrices(List<Block> blocks) {
    Map<String, List<Coefficient>> groups = new LinkedHashMap<>();
    for (Coefficient c : results.coefficients()) {
      groups
          .computeIfAbsent(c.configuration() + "\u0000" + c.unit(), unused -> new ArrayList<>())
          .add(c);
    }
    for (List<Coefficient> group : groups.values()) {
      Coefficient first = group.get(0);
      List<String> loads = group.stream().map(Coefficient::load).distinct().toList();
      TableMaker table =
          new TableMaker(
                  "Flexibility matrix, "
                      + shown.symbol(first.unit())
                      + (several ? ", " + first.configuration() : "")
                      + " (value ± standard uncertainty)")
              .text("Gauge \\ load");
      loads.forEach(table::number);
      for (String gauge : group.stream().map(Coefficient::gauge).distinct().toList()) {
        List<Block.Cell> row = new ArrayList<>();
        row.add(Block.Cell.of(gauge));
        for (String load : loads) {
          row.add(
              Block.Cell.of(
                  group.stream()
                      .filter(c -> c.gauge().equals(gauge) && c.load().equals(load))
                      .findFirst()
                      .map(
                          c ->
                              shown.value(c.value(), c.standardUncertainty(), c.unit())
                                  + " ± "
                                  + shown.uncertainty(c.standardUncertainty(), c.unit()))
                      .orElse("–")));
        }
        table.row(row);
      }
      blocks.add(table.make());
    }
  }

  private TableMaker coefficients() {
    TableMaker table =
        new TableMaker("Flexibility coefficients with the parts of their standard uncertainty (k = 1)")
            .text("Gauge", "Load")
            .number("Value", "u", "u scatter", "u floor", "u gains", "ν", "Runs")
            .text("Unit");
    for (Coefficient c : results.coefficients()) {
      table.row(
          name(c.configuration(), c.gauge()),
          c.load(),
          shown.value(c.value(), c.standardUncertainty(), c.unit()),
          shown.uncertainty(c.standardUncertainty(), c.unit()),
          shown.uncertainty(c.scatter(), c.unit()),
          shown.uncertainty(c.floor(), c.unit()),
          shown.uncertainty(c.gain(), c.unit()),
          Shown.freedom(c.degreesOfFreedom()),
          String.valueOf(c.runs()),
          shown.symbol(c.unit()));
    }
    return table;
  }

  private TableMaker quality() {
    TableMaker table = new TableMaker("Quality figures").text("Gauge", "Load");
    List<String> names =
        results.coefficients().stream()
            .flatMap(c -> c.quality().stream())
            .map(q -> q.name())
            .distinct()
            .toList();
    if (names.isEmpty()) {
      return table;
    }
    names.forEach(table::number);
    for (Coefficient c : results.coefficients()) {
      List<Block.Cell> row = new ArrayList<>();
      row.add(Block.Cell.of(name(c.configuration(), c.gauge())));
      row.add(Block.Cell.of(c.load()));
      for (String name : names) {
        row.add(
            c.quality().stream()
                .filter(q -> q.name().equals(name))
                .findFirst()
                .map(
                    q ->
                        new Block.Cell(
                            Rounded.percent(q.value()) + (q.passed() ? "" : " !"),
                            q.passed() ? Tone.PLAIN : Tone.WARN))
                .orElse(Block.Cell.of("–")));
      }
      table.row(row);
    }
    return table;
  }

  private TableMaker reciprocity() {
    TableMaker table =
        new TableMaker("Reciprocal pairs of absolute coefficients")
            .text("First", "Second")
            .number("First value", "Second value", "Difference", "u", "z")
            .text("Unit");
    for (Reciprocity p : results.reciprocity()) {
      table.row(
          List.of(
              Block.Cell.of(name(p.configuration(), p.first())),
              Block.Cell.of(p.second()),
              Block.Cell.of(shown.value(p.firstValue(), p.standardUncertainty(), p.unit())),
              Block.Cell.of(shown.value(p.secondValue(), p.standardUncertainty(), p.unit())),
              Block.Cell.of(shown.value(p.difference(), p.standardUncertainty(), p.unit())),
              Block.Cell.of(shown.uncertainty(p.standardUncertainty(), p.unit())),
              p.z().isPresent() ? z(p.z().getAsDouble()) : Block.Cell.of("–"),
              Block.Cell.of(shown.symbol(p.unit()))));
    }
    return table;
  }

  /** z with a mark where it is far, so that it is seen without colour. */
  private static Block.Cell z(double z) {
    double size = Math.abs(z);
    if (size > VERY_FAR) {
      return new Block.Cell(Rounded.fixed(z, 1) + " !!", Tone.BAD);
    }
    return size > FAR
        ? new Block.Cell(Rounded.fixed(z, 1) + " !", Tone.WARN)
        : Block.Cell.of(Rounded.fixed(z, 1));
  }

  private TableMaker comparison() {
    boolean updated = results.comparison().stream().anyMatch(c -> c.updated().isPresent());
    TableMaker table =
        new TableMaker("Measured against computed (z is marked ! beyond 2 and !! beyond 3.3)")
            .text("Gauge", "Load")
            .number("Measured", "u", "Nominal", "Ratio", "z");
    if (updated) {
      table.number("Updated", "Ratio", "z");
    }
    boolean modal = results.comparison().stream().anyMatch(c -> c.full().isPresent());
    if (modal) {
      table.number("All modes", "n to 10 %", "n to 5 %", "n to 1 %");
    }
    boolean measuredModes =
        results.comparison().stream().anyMatch(c -> c.measuredModes().isPresent());
    if (measuredModes) {
      table.number("Measured modes");
    }
    table.text("Unit");
    for (Comparison c : results.comparison()) {
      List<Block.Cell> row = new ArrayList<>();
      row.add(Block.Cell.of(name(c.configuration(), c.gauge())));
      row.add(Block.Cell.of(c.load() + (c.heldOut() ? " (held out)" : "")));
      row.add(Block.Cell.of(shown.value(c.measured(), c.standardUncertainty(), c.unit())));
      row.add(Block.Cell.of(shown.uncertainty(c.standardUncertainty(), c.unit())));
      row.add(Block.Cell.of(shown.value(c.computed(), c.standardUncertainty(), c.unit())));
      row.add(Block.Cell.of(ratio(c.ratio())));
      row.add(z(c.z()));
      if (updated) {
        row.add(
            Block.Cell.of(
                c.updated().isPresent()
                    ? shown.value(c.updated().getAsDouble(), c.standardUncertainty(), c.unit())
                    : "–"));
        row.add(Block.Cell.of(ratio(c.updatedRatio())));
        row.add(c.updatedZ().isPresent() ? z(c.updatedZ().getAsDouble()) : Block.Cell.of("–"));
      }
      if (modal) {
        row.add(other(c.full(), c));
        row.add(modes(c.modesWithin10()));
        row.add(modes(c.modesWithin5()));
        row.add(modes(c.modesWithin1()));
      }
      if (measuredModes) {
        row.add(other(c.measuredModes(), c));
      }
      row.add(Block.Cell.of(shown.symbol(c.unit())));
      table.row(row);
    }
    return table;
  }

  private Block.Cell other(java.util.OptionalDouble value, Comparison c) {
    return Block.Cell.of(
        value.isPresent()
            ? shown.value(value.getAsDouble(), c.standardUncertainty(), c.unit())
            : "–");
  }

  private static Block.Cell modes(java.util.OptionalDouble count) {
    return Block.Cell.of(count.isPresent() ? Rounded.fixed(count.getAsDouble(), 0) : "more");
  }

  private static String ratio(java.util.OptionalDouble ratio) {
    return ratio.isPresent() ? Rounded.fixed(ratio.getAsDouble(), 3) : "–";
  }

  private TableMaker parameters() {
    TableMaker table =
        new TableMaker(
                results.plan().isPresent()
                    ? "What the test would tell of each parameter, if the nominal model were true"
                    : "Parameters")
            .text("Parameter")
            .number("Nominal", "Updated", "Factor")
            .text("95 % interval", "Status")
            .number("Variance removed");
    for (Parameter p : results.parameters()) {
      table.row(
          List.of(
              Block.Cell.of(p.name()),
              Block.Cell.of(shown.stiffness(p, p.nominal(), "rigid")),
              Block.Cell.of(shown.stiffness(p, p.updated(), "rigid")),
              Block.Cell.of(Shown.optional(p.factor(), 3)),
              Block.Cell.of(shown.interval(p)),
              new Block.Cell(
                  p.status() + (p.onBound() ? ", on its bound" : ""),
                  p.status().equals("identified") && !p.onBound() ? Tone.GOOD : Tone.WARN),
              Block.Cell.of(Rounded.percent(p.varianceRemoved()))));
    }
    return table;
  }

  /** What was laid down before the test, and the reasons. */
  private TableMaker priors() {
    TableMaker table =
        new TableMaker("Parameters: bounds, prior and reasons (standard deviations in the working variable)")
            .text("Parameter", "Scales", "Bounds")
            .number("Prior sd", "Posterior sd")
            .text("Justification and notes");
    for (Parameter p : results.parameters()) {
      List<String> notes = new ArrayList<>();
      if (!p.justification().isEmpty()) {
        notes.add("“" + p.justification() + "”");
      }
      if (p.needsReason()) {
        notes.add("needs a reason");
      }
      p.classBefore()
          .ifPresent(
              before ->
                  notes.add(
                      "EN 1993-1-8: "
                          + before.en1993()
                          + p.classAfter().map(after -> " → " + after.en1993()).orElse("")
                          + "; AISC 360: "
                          + before.aisc360()
                          + p.classAfter().map(after -> " → " + after.aisc360()).orElse("")));
      notes.addAll(p.notes());
      table.row(
          List.of(
              Block.Cell.of(p.name()),
              Block.Cell.of(String.join(", ", p.scales())),
              Block.Cell.of(
                  shown.stiffness(p, p.lowerBound(), "free")
                      + " to "
                      + shown.stiffness(p, p.upperBound(), "rigid")),
              Block.Cell.of(Rounded.significant(p.priorStandardDeviation(), 2)),
              Block.Cell.of(Rounded.significant(p.posteriorStandardDeviation(), 2)),
              Block.Cell.of(String.join("; ", notes))));
    }
    return table;
  }

  private TableMaker gains() {
    TableMaker table =
        new TableMaker(
                results.plan().isPresent()
                    ? "Gains of the instruments, as the test would know them"
                    : "Gains of the instruments, as the fit found them")
            .text("Instrument and calibration")
            .number("Stated u", "Fitted", "Standard deviation after");
    for (GainEstimate gain :
        results.update().map(Update::gains).orElse(List.<GainEstimate>of())) {
      table.row(
          gain.description().isEmpty() ? gain.key() : gain.description(),
          Rounded.fixed(100 * gain.priorUncertainty(), 2) + " %",
          Rounded.fixed(100 * gain.fitted(), 2) + " %",
          Rounded.fixed(100 * gain.standardDeviation(), 2) + " %");
    }
    return table;
  }

  private TableMaker validation() {
    TableMaker table =
        new TableMaker("Held-out load cases")
            .text("Gauge", "Load")
            .number("Measured", "Predicted", "u", "z")
            .text("Within 95 %", "Unit");
    for (Validation v : results.validation()) {
      table.row(
          List.of(
              Block.Cell.of(name(v.configuration(), v.gauge())),
              Block.Cell.of(v.load()),
              Block.Cell.of(shown.value(v.measured(), v.standardUncertainty(), v.unit())),
              Block.Cell.of(shown.value(v.predicted(), v.standardUncertainty(), v.unit())),
              Block.Cell.of(shown.uncertainty(v.standardUncertainty(), v.unit())),
              z(v.z()),
              new Block.Cell(v.within() ? "yes" : "no", v.within() ? Tone.GOOD : Tone.WARN),
              Block.Cell.of(shown.symbol(v.unit()))));
    }
    return table;
  }
}
