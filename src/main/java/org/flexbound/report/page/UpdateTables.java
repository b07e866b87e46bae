package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.ConfigurationFit;
import org.flexbound.report.results.Fit;
import org.flexbound.report.results.Group;
import org.flexbound.report.results.Misfit;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.ParameterWithout;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.Start;
import org.flexbound.report.results.Update;
import org.flexbound.report.results.WithoutCase;

/** The tables that say how far an update can be trusted, and what its answer hangs on. */
final class UpdateTables {
  /** A shift by more than this many posterior standard deviations is marked (common practice). */
  private static final double FAR = 2;

  private static final int MOST_PULLED = 3;

  /** A pull below this share of a posterior standard deviation is not named. */
  private static final double NO_PULL = 0.1;

  private final Results results;
  private final Shown shown;
  private final boolean several;

  UpdateTables(Results results, Shown shown) {
    this.results = results;
    this.shown = shown;
    this.several = results.configurations().size() > 1;
  }

  void add(List<Block> blocks) {
    if (results.update().isEmpty()) {
      return;
    }
    Update update = results.update().get();
    if (results.plan().isEmpty()) {
      add(blocks, ending(update));
      add(blocks, configurations(update));
    }
    add(blocks, groups(update));
    add(blocks, without(update));
    add(blocks, pulls(update));
  }

  private static void add(List<Block> blocks, TableMaker table) {
    if (!table.isEmpty()) {
      blocks.add(table.make());
    }
  }

  private TableMaker ending(Update update) {
    TableMaker table = new TableMaker("How the update ended").text("What", "Value");
    table.row("Rule", update.rule() + ", weight of the prior " + Rounded.significant(update.weight(), 3));
    table.row("Outcome", update.verdict());
    table.row(
        "Distance of the point shown from the estimate at weight 1",
        Rounded.significant(update.distanceFromPrior(), 3) + " prior standard deviations");
    table.row("Misfit of the nominal model", misfit(update.nominal()));
    table.row("Misfit of the point shown", misfit(update.shown()));
    table.row("Misfit of the best fit within the bounds", misfit(update.best()));
    if (update.widening() > 1) {
      table.row(
          "All intervals are widened by the factor", Rounded.significant(update.widening(), 3));
      table.row(
          "Smallest correction of the flexibility matrix itself that would bring the misfit to its"
              + " limit (a yardstick without physical meaning)",
          Rounded.percent(update.unexplained().correctionSize())
              + " of the matrix; missed most: "
              + String.join("; ", update.unexplained().worst()));
    }
    table.row(
        "Combinations that stand above the noise",
        update.rank() + " of " + results.parameters().size());
    table.row(
        "Solver",
        (update.converged() ? "converged" : "not converged")
            + " after "
            + Shown.count(update.iterations(), "iteration", "iterations")
            + ": "
            + update.reason()
            + " (projected gradient "
            + Rounded.significant(update.projectedGradient(), 2)
            + " of the first)");
    if (update.starts().size() > 1) {
      table.row("Starts", starts(update.starts(), update.startsAgree()));
    }
    return table;
  }

  private static String misfit(Misfit m) {
    return Rounded.significant(m.value(), 3)
        + " (up to "
        + Rounded.significant(m.limit(), 3)
        + " is explained by the test's uncertainty; degrees of freedom "
        + Rounded.significant(m.degreesOfFreedom(), 3)
        + ")"
        + (m.worstCase().isEmpty()
            ? ""
            : "; worst: "
                + m.worstCase()
                + ", "
                + Rounded.significant(m.worstResidual(), 3)
                + " (limit "
                + Rounded.significant(m.residualLimit(), 3)
                + ")");
  }

  private static String starts(List<Start> starts, boolean agree) {
    long converged = starts.stream().filter(Start::converged).count();
    double furthest = starts.stream().filter(Start::converged).mapToDouble(Start::distance).max().orElse(0);
    return converged
        + " of "
        + starts.size()
        + " converged"
        + (agree
            ? ", all to the same point"
            : ", not to one point: up to "
                + Rounded.significant(furthest, 2)
                + " posterior standard deviations apart");
  }

  private TableMaker configurations(Update update) {
    TableMaker table =
        new TableMaker("How each configuration fits")
            .text("Configuration")
            .number("Coefficients", "Misfit", "Limit")
            .text("Agrees");
    if (update.configurations().size() > 1) {
      for (ConfigurationFit fit : update.configurations()) {
        table.row(
            List.of(
                Block.Cell.of(fit.configuration()),
                Block.Cell.of(String.valueOf(fit.coefficients())),
                Block.Cell.of(Rounded.significant(fit.misfit(), 3)),
                Block.Cell.of(Rounded.significant(fit.limit(), 3)),
                new Block.Cell(fit.agrees() ? "yes" : "no", fit.agrees() ? Tone.GOOD : Tone.BAD)));
      }
    }
    return table;
  }

  private static TableMaker groups(Update update) {
    TableMaker table =
        new TableMaker("Parameters that cannot be told apart, and what of them is determined")
            .text("Parameters", "Combination");
    for (Group group : update.groups()) {
      table.row(String.join(", ", group.parameters()), group.inWords());
    }
    return table;
  }

  private TableMaker without(Update update) {
    TableMaker table =
        new TableMaker(
                "The estimate without each load case (in brackets: shift in posterior standard"
                    + " deviations, marked ! beyond 2)")
            .text("Left out");
    results.parameters().forEach(p -> table.number(p.name()));
    table.text("Predicted by the others");
    if (!update.withoutLoadCase().isEmpty()) {
      List<Block.Cell> all = new ArrayList<>();
      all.add(Block.Cell.of("nothing (weight 1)"));
      results.parameters().forEach(p -> all.add(Block.Cell.of(atOne(p))));
      all.add(Block.Cell.of(""));
      table.row(all);
    }
    for (WithoutCase left : update.withoutLoadCase()) {
      List<Block.Cell> row = new ArrayList<>();
      row.add(Block.Cell.of(several ? left.configuration() + ": " + left.load() : left.load()));
      for (int k = 0; k < left.parameters().size(); k++) {
        ParameterWithout p = left.parameters().get(k);
        boolean far = Math.abs(p.shift()) > FAR;
        row.add(
            new Block.Cell(
                shown.stiffness(results.parameters().get(k), p.value(), "rigid")
                    + " ("
                    + Rounded.fixed(p.shift(), 1)
                    + (far ? " !" : "")
                    + ")",
                far ? Tone.WARN : Tone.PLAIN));
      }
      row.add(
          new Block.Cell(
              (left.predicted() ? "yes" : "no")
                  + " (misfit "
                  + Rounded.significant(left.misfit(), 3)
                  + ", limit "
                  + Rounded.significant(left.limit(), 3)
                  + ")",
              left.predicted() ? Tone.GOOD : Tone.WARN));
      table.row(row);
    }
    return table;
  }

  /** The estimate at weight 1; the working variable where the point shown is another. */
  private String atOne(Parameter p) {
    return p.workingEstimate() == p.workingValue()
        ? shown.stiffness(p, p.updated(), "rigid")
        : p.working() + " " + Rounded.significant(p.workingEstimate(), 3);
  }

  private TableMaker pulls(Update update) {
    TableMaker table =
        new TableMaker(
                "Which coefficient pulls what: how far the parameters would move without it, in"
                    + " posterior standard deviations; those that pull most first")
            .text("Gauge", "Load")
            .number("Own say (leverage)", "Studentised residual")
            .text("Pulls");
    update.fits().stream()
        .sorted(Comparator.comparingDouble((Fit f) -> -most(f)))
        .forEach(
            fit ->
                table.row(
                    List.of(
                        Block.Cell.of(
                            several ? fit.configuration() + ": " + fit.gauge() : fit.gauge()),
                        Block.Cell.of(fit.load()),
                        Block.Cell.of(Rounded.percent(fit.leverage())),
                        new Block.Cell(
                            Rounded.fixed(fit.studentisedResidual(), 1)
                                + (fit.outlying() ? " outlying" : ""),
                            fit.outlying() ? Tone.BAD : Tone.PLAIN),
                        Block.Cell.of(pulled(fit)))));
    return table;
  }

  private static double most(Fit fit) {
    return fit.influence().stream().mapToDouble(Math::abs).max().orElse(0);
  }

  private String pulled(Fit fit) {
    List<String> words =
        IntStream.range(0, fit.influence().size())
            .boxed()
            .sorted(Comparator.comparingDouble((Integer k) -> -Math.abs(fit.influence().get(k))))
            .filter(k -> Math.abs(fit.influence().get(k)) >= NO_PULL)
            .limit(MOST_PULLED)
            .map(
                k ->
                    results.parameters().get(k).name()
                        + " "
                        + Rounded.fixed(fit.influence().get(k), 1))
            .toList();
    return words.isEmpty() ? "nothing much" : String.join(", ", words);
  }
}
