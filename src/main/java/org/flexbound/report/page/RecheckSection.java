package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.ChangeExplanation;
import org.flexbound.report.results.ChangeSubset;
import org.flexbound.report.results.CoefficientChange;
import org.flexbound.report.results.ParameterChange;
import org.flexbound.report.results.Recheck;
import org.flexbound.report.results.Results;

/** This test against an earlier one. */
final class RecheckSection {
  private static final int NAMED = 6;

  private final Results results;
  private final Shown shown;

  RecheckSection(Results results, Shown shown) {
    this.results = results;
    this.shown = shown;
  }

  Optional<Section> make() {
    return results.recheck().map(this::section);
  }

  private Section section(Recheck recheck) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        new Block.Text(
            "Differences to "
                + recheck.baseline()
                + (recheck.baselineDate().isEmpty() ? "" : " of " + recheck.baselineDate())
                + ". Scatter and fixed parts of the two tests are independent; the error of a"
                + " calibration that both used cancels"
                + (recheck.shared().isEmpty()
                    ? " (there is none here)"
                    : " (here: " + String.join("; ", recheck.shared()) + ")")
                + ". P is the probability of so large a difference by chance; the adjusted one allows"
                + " for all coefficients (Holm 1979)."));
    blocks.add(table(recheck).make());
    recheck.explanation().ifPresent(e -> blocks.add(explanation(e).make()));
    return new Section("recheck", "Change since the earlier test", blocks);
  }

  private TableMaker table(Recheck recheck) {
    TableMaker table =
        new TableMaker("Change of each coefficient, most certain first")
            .text("Gauge", "Load")
            .number("Before", "Now", "Difference", "±")
            .text("Unit")
            .number("Change", "P", "P adjusted")
            .text("");
    List<CoefficientChange> sorted =
        recheck.changes().stream()
            .sorted(Comparator.comparingDouble(CoefficientChange::probability))
            .toList();
    for (CoefficientChange c : sorted) {
      table.row(
          List.of(
              Block.Cell.of(c.gauge()),
              Block.Cell.of(c.load()),
              Block.Cell.of(shown.value(c.before(), c.standardUncertainty(), c.unit())),
              Block.Cell.of(shown.value(c.now(), c.standardUncertainty(), c.unit())),
              Block.Cell.of(shown.value(c.difference(), c.standardUncertainty(), c.unit())),
              Block.Cell.of(shown.uncertainty(c.standardUncertainty(), c.unit())),
              Block.Cell.of(shown.symbol(c.unit())),
              Block.Cell.of(relative(c)),
              Block.Cell.of(probability(c.probability())),
              Block.Cell.of(probability(c.adjusted())),
              new Block.Cell(
                  c.significant() ? "changed" : "", c.significant() ? Tone.WARN : Tone.PLAIN)));
    }
    return table;
  }

  private static String relative(CoefficientChange c) {
    return Math.abs(c.before()) > 2 * c.standardUncertainty()
        ? Rounded.percent(c.difference() / Math.abs(c.before()))
        : "–";
  }

  private static String probability(double p) {
    return p < 1e-6 ? "< 1e-6" : Rounded.significant(p, 2);
  }

  private static TableMaker explanation(ChangeExplanation e) {
    TableMaker table =
        new TableMaker(
                e.explained()
                    ? "What explains the change with the fewest parameters"
                    : "What comes nearest to explaining the change")
            .text("Parameters")
            .number("Left over", "Limit");
    for (ChangeSubset s : e.subsets()) {
      table.row(words(s), Rounded.significant(s.misfit(), 3), Rounded.significant(s.limit(), 3));
    }
    return table;
  }

  static String words(ChangeSubset subset) {
    List<String> parts = new ArrayList<>();
    for (ParameterChange p : subset.parameters()) {
      parts.add(
          p.name()
              + (p.factor().isPresent()
                  ? " × " + Rounded.significant(p.factor().getAsDouble(), 2)
                  : " (was rigid or free)"));
    }
    return String.join(" and ", parts);
  }

  /** The answer of the first page. */
  static Optional<Block.Answer> answer(Results results) {
    return results.recheck().map(RecheckSection::answer);
  }

  private static Block.Answer answer(Recheck recheck) {
    List<CoefficientChange> changed =
        recheck.changes().stream()
            .filter(CoefficientChange::significant)
            .sorted(Comparator.comparingDouble(CoefficientChange::probability))
            .toList();
    List<String> details = new ArrayList<>();
    for (CoefficientChange c : changed.subList(0, Math.min(NAMED, changed.size()))) {
      details.add(c.gauge() + " under " + c.load() + ": " + relative(c) + ".");
    }
    if (changed.size() > NAMED) {
      details.add((changed.size() - NAMED) + " more stand in the table.");
    }
    recheck
        .explanation()
        .ifPresent(
            e -> {
              if (e.explained()) {
                details.add(
                    "Explained by a change of "
                        + String.join(
                            ", or as well of ",
                            e.subsets().stream().map(RecheckSection::words).toList())
                        + ".");
              } else {
                details.add("No change of one or two parameters of the model explains it.");
              }
            });
    details.add(
        "All coefficients together: "
            + Rounded.significant(recheck.statistic(), 3)
            + " with "
            + recheck.degreesOfFreedom()
            + " degrees of freedom, probability by chance "
            + probability(recheck.probability())
            + ".");
    String since = recheck.baselineDate().isEmpty() ? "the earlier test" : recheck.baselineDate();
    return new Block.Answer(
        "Has it changed?",
        recheck.changed()
            ? "Yes, since "
                + since
                + ": "
                + (changed.isEmpty()
                    ? "all coefficients together, though no single one stands out."
                    : changed.size()
                        + " of "
                        + recheck.changes().size()
                        + (changed.size() == 1
                            ? " coefficients has changed."
                            : " coefficients have changed."))
            : "No change since " + since + " that is more than chance.",
        recheck.changed() ? Tone.WARN : Tone.GOOD,
        details);
  }
}
