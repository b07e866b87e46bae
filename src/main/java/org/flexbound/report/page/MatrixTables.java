package org.flexbound.report.page;

import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.BoundCheck;
import org.flexbound.report.results.Hint;
import org.flexbound.report.results.MatrixCheck;
import org.flexbound.report.results.PointGain;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.TripleProduct;

/** The tables of what every elastic structure's matrix keeps. */
final class MatrixTables {
  /** So many triples and bounds are shown, those furthest off first; all are in the workbook. */
  private static final int MOST_ROWS = 12;

  private final Results results;

  MatrixTables(Results results) {
    this.results = results;
  }

  void add(List<Block> blocks) {
    for (TableMaker table : List.of(hints(), bounds(), gains(), triples())) {
      if (!table.isEmpty()) {
        blocks.add(table.make());
      }
    }
  }

  private String name(MatrixCheck check, String text) {
    return results.configurations().size() > 1 ? check.configuration() + ": " + text : text;
  }

  private static Block.Cell z(OptionalDouble z, boolean passed) {
    String text = z.isPresent() ? Rounded.fixed(z.getAsDouble(), 1) : "–";
    return passed ? Block.Cell.of(text) : new Block.Cell(text + " !!", Tone.BAD);
  }

  private TableMaker hints() {
    TableMaker table =
        new TableMaker("What it looks like (guesses with their evidence; nothing was changed)")
            .text("Looks like", "Because");
    for (MatrixCheck check : results.matrixChecks()) {
      for (Hint hint : check.hints()) {
        table.row(name(check, hint.looksLike()), hint.because());
      }
    }
    return table;
  }

  private TableMaker bounds() {
    TableMaker table =
        new TableMaker(
                "Bounds of an elastic structure, nearest or furthest past them first: a cross"
                    + " coefficient is at most the geometric mean of its direct ones (ratio 1), a"
                    + " direct one and the smallest eigenvalue are above nought")
            .text("Of", "Bound")
            .number("Value", "z past the bound", "Limit");
    for (MatrixCheck check : results.matrixChecks()) {
      check
          .eigenvalue()
          .ifPresent(
              e ->
                  table.row(
                      List.of(
                          Block.Cell.of(name(check, e.points().size() + " points together")),
                          Block.Cell.of("smallest eigenvalue, unit diagonal"),
                          Block.Cell.of(Rounded.significant(e.value(), 3)),
                          z(
                              e.z().isPresent()
                                  ? OptionalDouble.of(-e.z().getAsDouble())
                                  : OptionalDouble.empty(),
                              e.passed()),
                          Block.Cell.of(Rounded.fixed(e.limit(), 1)))));
      check.bounds().stream()
          .sorted(
              Comparator.comparingDouble(
                  (BoundCheck b) -> -b.z().orElse(Double.NEGATIVE_INFINITY)))
          .limit(MOST_ROWS)
          .forEach(
              b ->
                  table.row(
                      List.of(
                          Block.Cell.of(name(check, b.name())),
                          Block.Cell.of(b.direct() ? "direct" : "cross, ratio"),
                          Block.Cell.of(
                              b.direct() ? "" : Rounded.significant(b.ratio(), 3)),
                          z(b.z(), b.passed()),
                          Block.Cell.of(Rounded.fixed(b.limit(), 1)))));
    }
    return table;
  }

  private TableMaker gains() {
    TableMaker table =
        new TableMaker(
                "Gain pattern: how many times too much each point's gauge reads, or too little its"
                    + " load, against the other points; a factor common to all cannot be seen")
            .text("Gauge", "Load")
            .number("Factor", "u, %", "z", "Limit");
    for (MatrixCheck check : results.matrixChecks()) {
      for (PointGain g : check.gains()) {
        table.row(
            List.of(
                Block.Cell.of(name(check, g.gauge())),
                Block.Cell.of(g.load()),
                Block.Cell.of(Rounded.significant(g.factor(), 4)),
                Block.Cell.of(Rounded.significant(100 * g.standardUncertainty(), 2)),
                z(g.z(), !g.suspect()),
                Block.Cell.of(Rounded.fixed(g.limit(), 1))));
      }
    }
    return table;
  }

  private TableMaker triples() {
    TableMaker table =
        new TableMaker(
                "Products round three points, furthest off first: no gain can make their ratio"
                    + " differ from one; a misplaced gauge, seating or a curved response can")
            .text("Points")
            .number("Ratio", "z", "Limit");
    for (MatrixCheck check : results.matrixChecks()) {
      for (TripleProduct t :
          check.triples().subList(0, Math.min(MOST_ROWS, check.triples().size()))) {
        table.row(
            List.of(
                Block.Cell.of(name(check, String.join(", ", t.points()))),
                Block.Cell.of(Rounded.significant(t.ratio(), 4)),
                z(t.z(), t.passed()),
                Block.Cell.of(Rounded.fixed(t.limit(), 1))));
      }
    }
    return table;
  }
}
