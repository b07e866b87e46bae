package org.flexbound.app;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.Set;
import org.flexbound.reduce.RunVerdict;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.Coefficient;
import org.flexbound.report.results.Comparison;
import org.flexbound.report.results.ConfigurationFit;
import org.flexbound.report.results.Finding;
import org.flexbound.report.results.Group;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.Reciprocity;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.Run;
import org.flexbound.report.results.Update;

/** Prints results as compact, aligned tables. */
final class Summary {
  /** More rows than this scroll the answer off the screen; the report has them all. */
  private static final int MOST_ROWS = 40;

  private static final double FAR = 1.96;

  private final Terminal terminal;
  private final PrintWriter out;
  private final Results results;
  private final UnitSystem units;
  private final boolean several;

  Summary(Terminal terminal, Results results, UnitSystem units) {
    this.terminal = terminal;
    this.out = terminal.out();
    this.results = results;
    this.units = units;
    this.several = results.configurations().size() > 1;
  }

  void print() {
    out.println(terminal.bold(PlainText.of(results.title())));
    if (results.plan().isPresent()) {
      new PlanSummary(terminal, results, results.plan().get(), units).print();
      findings();
      return;
    }
    runs();
    coefficients();
    reciprocity();
    comparison();
    parameters();
    new RecheckSummary(terminal, results, units).print();
    new LimitSummary(terminal, results).print();
    findings();
  }

  /** Says what was written, and where. */
  void written(List<Path> files) {
    heading("Written");
    files.forEach(file -> out.println("  " + PlainText.of(file.toString())));
  }

  private void heading(String text) {
    out.println();
    out.println(terminal.bold(text));
  }

  private String name(String configuration, String name) {
    return several ? configuration + ": " + name : name;
  }

  private void runs() {
    heading("Runs");
    TextTable table = new TextTable().text("run").text("loads").text("verdict").number("steps");
    Set<String> given = new LinkedHashSet<>();
    for (Run run : results.runs()) {
      given.add(run.verdict());
      table.row(
          name(run.configuration(), run.name()),
          String.join(", ", run.loads()),
          run.verdict() + (run.used() ? "" : ", not used"),
          String.valueOf(run.steps()));
    }
    table.print(out);
    for (Run run : results.runs()) {
      if (!run.reasons().isEmpty()) {
        String words = "  " + PlainText.of(name(run.configuration(), run.name())) + ": " + run.verdict() + ", because";
        out.println(run.verdict().equals("repeat") ? terminal.bad(words) : terminal.warn(words));
        run.reasons().forEach(reason -> out.println("    " + PlainText.of(reason)));
      }
    }
    for (RunVerdict verdict : RunVerdict.values()) {
      String word = verdict.name().toLowerCase(Locale.ROOT);
      if (verdict != RunVerdict.ACCEPT && given.contains(word)) {
        out.println("  rule for " + word + ": " + verdict.rule());
      }
    }
  }

  private void coefficients() {
    heading("Flexibility coefficients (value ± standard uncertainty)");
    TextTable table =
        new TextTable().text("gauge").text("load").number("value").text("±").text("unit").number("ν");
    int rows = 0;
    for (Coefficient c : results.coefficients()) {
      if (rows++ == MOST_ROWS) {
        break;
      }
      double value = units.shown(c.value(), c.unit());
      double u = units.shown(c.standardUncertainty(), c.unit());
      table.row(
          name(c.configuration(), c.gauge()),
          c.load(),
          Rounded.value(value, u),
          Rounded.uncertainty(u),
          units.symbol(c.unit()),
          freedom(c.degreesOfFreedom()));
    }
    table.print(out);
    more(results.coefficients().size());
  }

  /** Degrees of freedom; from a thousand on they make no difference. */
  private static String freedom(OptionalDouble degrees) {
    return degrees.isPresent() && degrees.getAsDouble() < 1000 ? Rounded.significant(degrees.getAsDouble(), 2) : "∞";
  }

  private void more(int all) {
    if (all > MOST_ROWS) {
      out.println("  … and " + (all - MOST_ROWS) + " more in the report");
    }
  }

  private static String optional(OptionalDouble value, int digits, String missing) {
    return value.isPresent() ? Rounded.significant(value.getAsDouble(), digits) : missing;
  }

  private void reciprocity() {
    if (results.reciprocity().isEmpty()) {
      return;
    }
    heading("Reciprocity");
    TextTable table =
        new TextTable().text("first").text("second").number("difference").text("±").text("unit")
            .number("z").text("");
    for (Reciprocity p : results.reciprocity()) {
      double d = units.shown(p.difference(), p.unit());
      double u = units.shown(p.standardUncertainty(), p.unit());
      table.row(
          name(p.configuration(), p.first()),
          p.second(),
          Rounded.value(d, u),
          Rounded.uncertainty(u),
          units.symbol(p.unit()),
          p.z().isPresent() ? Rounded.fixed(p.z().getAsDouble(), 1) : "–",
          Math.abs(p.z().orElse(0)) > FAR ? "!" : "");
    }
    table.print(out);
  }

  private void comparison() {
    if (results.comparison().isEmpty()) {
      return;
    }
    boolean updated = results.update().isPresent();
    heading("Measured over computed");
    TextTable table = new TextTable().text("gauge").text("load").number("nominal").number("z");
    if (updated) {
      table.number("updated").number("z");
    }
    int rows = 0;
    for (Comparison c : results.comparison()) {
      if (rows++ == MOST_ROWS) {
        break;
      }
      String gauge = name(c.configuration(), c.gauge());
      String load = c.load() + (c.heldOut() ? " (held out)" : "");
      if (updated) {
        table.row(
            gauge, load, ratio(c.ratio()), Rounded.fixed(c.z(), 1), ratio(c.updatedRatio()),
            c.updatedZ().isPresent() ? Rounded.fixed(c.updatedZ().getAsDouble(), 1) : "–");
      } else {
        table.row(gauge, load, ratio(c.ratio()), Rounded.fixed(c.z(), 1));
      }
    }
    table.print(out);
    more(results.comparison().size());
  }

  private static String ratio(OptionalDouble ratio) {
    return ratio.isPresent() ? Rounded.fixed(ratio.getAsDouble(), 3) : "–";
  }

  private void parameters() {
    if (results.update().isEmpty()) {
      return;
    }
    Update update = results.update().get();
    heading("Parameters");
    TextTable table =
        new TextTable().text("parameter").number("nominal").number("updated").text("unit")
            .number("factor").text("95 % interval").text("status");
    for (Parameter p : results.parameters()) {
      boolean factor = p.unit().equals("1");
      table.row(
          p.name(),
          Stiffnesses.text(p, p.nominal(), units),
          Stiffnesses.text(p, p.updated(), units),
          factor ? "× nominal" : units.symbol(p.unit()),
          optional(p.factor(), 3, "–"),
          Stiffnesses.interval(p, units),
          p.status() + (p.onBound() ? ", on its bound" : ""));
    }
    table.print(out);
    String words =
        "  "
            + update.verdict()
            + ": misfit "
            + Rounded.significant(update.nominal().value(), 3)
            + " before, "
            + Rounded.significant(update.shown().value(), 3)
            + " after; up to "
            + Rounded.significant(update.shown().limit(), 3)
            + " is explained by the uncertainty of the test";
    out.println(
        update.verdict().startsWith("misfits") || update.verdict().startsWith("not")
            ? terminal.bad(words)
            : update.shown().agrees() ? terminal.good(words) : terminal.warn(words));
    for (Group group : update.groups()) {
      out.println("  only together: " + PlainText.of(group.inWords()));
    }
    if (update.configurations().size() > 1) {
      for (ConfigurationFit fit : update.configurations()) {
        String how =
            "  configuration "
                + PlainText.of(fit.configuration())
                + (fit.agrees() ? " agrees" : " disagrees")
                + misfit(fit.misfit(), fit.limit());
        out.println(fit.agrees() ? how : terminal.bad(how));
      }
    }
    if (update.starts().size() > 1) {
      String how = "  " + update.starts().size() + " starts ";
      out.println(
          update.startsAgree() ? how + "agree" : terminal.warn(how + "came to different points"));
    }
    update
        .validation()
        .ifPresent(
            v ->
                out.println(
                    v.passed()
                        ? terminal.good(
                            "  validated: held-out load cases are predicted within their uncertainty"
                                + misfit(v.statistic(), v.limit().orElse(0)))
                        : terminal.bad(
                            "  not validated: held-out load cases are predicted worse than their"
                                + " uncertainty allows"
                                + misfit(v.statistic(), v.limit().orElse(0)))));
  }

  private static String misfit(double value, double limit) {
    return " (misfit "
        + Rounded.significant(value, 3)
        + ", limit "
        + Rounded.significant(limit, 3)
        + ")";
  }

  private void findings() {
    if (results.findings().isEmpty()) {
      return;
    }
    heading("Findings");
    for (Finding f : results.findings()) {
      String severity =
          switch (f.severity()) {
            case "error" -> terminal.bad("error  ");
            case "warning" -> terminal.warn("warning");
            default -> "note   ";
          };
      out.println(
          "  "
              + severity
              + (f.where().isEmpty() ? "" : "  " + PlainText.of(f.where()))
              + "  ["
              + f.code()
              + "]");
      out.println("           " + PlainText.of(f.message()));
      out.println("           " + PlainText.of(f.remedy()));
    }
  }
}
