package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Collectors;
import org.flexbound.document.ReadProgress;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.NearestWord;
import org.flexbound.quantity.Unit;

/** Makes a run of a readings sheet: settles what each column means and in which unit. */
final class RunBuilder {
  private final List<Claim> claims;
  private final double gravity;
  private final Findings findings;
  private final EntryCells cells;
  private final ReadingMemory memory = new ReadingMemory();
  private final ReadProgress progress;

  RunBuilder(
      List<Claim> claims, double gravity, ReadProgress progress, Findings findings) {
    this.progress = progress;
    this.claims = List.copyOf(claims);
    this.gravity = gravity;
    this.findings = findings;
    this.cells = new EntryCells(findings);
  }

  /** A claim settled on a column. */
  private record Settled(Claim claim, ReadingsSheet.HeaderCell cell, Unit unit) {
    Channel channel() {
      return new Channel(claim.name(), cell.text(), unit, claim.instrument(), cell.where());
    }
  }

  Optional<Run> build(RunRows.RunRow run, ReadingsSheet sheet) {
    Map<String, Claim> byColumn = new LinkedHashMap<>();
    boolean sound = meanings(run, sheet, byColumn);
    List<Settled> settled = new ArrayList<>();
    Set<String> extras =
        SheetLayout.READING_COLUMNS.stream()
            .map(word -> HeaderText.claimedKey(sheet.layout().extra(word)))
            .collect(Collectors.toSet());
    List<ReadingsSheet.HeaderCell> idle = new ArrayList<>();
    for (ReadingsSheet.HeaderCell cell : sheet.columns()) {
      String key = HeaderText.key(cell.text());
      Claim claim = byColumn.get(key);
      if (claim != null) {
        Optional<Unit> unit = unit(claim, cell, sheet.layout());
        sound &= unit.isPresent();
        unit.ifPresent(found -> settled.add(new Settled(claim, cell, found)));
      } else if (!extras.contains(key)) {
        idle.add(cell);
      }
    }
    noteIdle(run, idle);
    List<Settled> loads = settled.stream().filter(s -> s.claim().isLoad()).toList();
    List<Settled> gauges = settled.stream().filter(s -> !s.claim().isLoad()).toList();
    if (sound && loads.isEmpty()) {
      findings.add(
          TestlogFinding.MISSING_COLUMN,
          sheet.sheet().where(),
          "found no load column for run '" + run.name() + "'; expected at least one");
      sound = false;
    }
    if (!sound || loads.isEmpty()) {
      return Optional.empty();
    }
    ReadingPass pass =
        ReadingPass.read(
            sheet.sheet(),
            sheet.layout(),
            Math.max(run.firstRow(), sheet.firstDataRow()),
            Math.min(run.lastRow(), sheet.lastRow()),
            columns(loads, gauges, sheet),
            memory,
            progress,
            findings);
    if (pass.usable() == 0) {
      findings.add(
          TestlogFinding.NO_READINGS,
          sheet.sheet().where(),
          "found no readings for run '" + run.name() + "'");
    }
    return Optional.of(
        new Run(
            run.name(),
            run.date(),
            run.temperature(),
            run.use(),
            run.remark(),
            loads.stream().map(Settled::channel).toList(),
            gauges.stream().map(Settled::channel).toList(),
            pass.readings(),
            sheet.sheet().where()));
  }

  private void noteIdle(RunRows.RunRow run, List<ReadingsSheet.HeaderCell> idle) {
    if (!idle.isEmpty()) {
      findings.add(
          TestlogFinding.COLUMN_NOT_USED,
          idle.get(0).where(),
          (idle.size() == 1 ? "the column " : "the columns ")
              + idle.stream().map(cell -> "'" + cell.text() + "'").collect(Collectors.joining(", "))
              + (idle.size() == 1 ? " is" : " are")
              + " neither a load nor a gauge in run '"
              + run.name()
              + "'");
    }
  }

  /** Which load or gauge each column reads in this run; false where that cannot be settled. */
  private boolean meanings(
      RunRows.RunRow run, ReadingsSheet sheet, Map<String, Claim> byColumn) {
    boolean sound = true;
    for (Map.Entry<String, RunRows.Meaning> entry : run.meanings().entrySet()) {
      RunRows.Meaning meaning = entry.getValue();
      Optional<Claim> claim =
          claims.stream().filter(found -> found.name().equals(meaning.name())).findFirst();
      if (claim.isEmpty()) {
        findings.add(
            TestlogFinding.UNKNOWN_NAME,
            meaning.where(),
            "found '"
                + meaning.name()
                + "'; expected the name of a load point or of a gauge"
                + NearestWord.question(
                    meaning.name(), claims.stream().map(Claim::name).toList()));
        sound = false;
      } else if (sheet.column(entry.getKey()).isEmpty()) {
        findings.add(
            TestlogFinding.MISSING_COLUMN,
            sheet.sheet().where(),
            "found no column '"
                + meaning.column()
                + "', which "
                + meaning.where()
                + " names for run '"
                + run.name()
                + "'"
                + nearest(meaning.column(), sheet));
        sound = false;
      } else {
        byColumn.put(entry.getKey(), claim.get());
      }
    }
    Map<String, List<Claim>> standing =
        claims.stream()
            .collect(
                Collectors.groupingBy(
                    claim -> claim.key(),
                    LinkedHashMap::new,
                    Collectors.toList()));
    for (Map.Entry<String, List<Claim>> entry : standing.entrySet()) {
      if (run.meanings().containsKey(entry.getKey())) {
        continue;
      }
      List<Claim> claimants = entry.getValue();
      Claim first = claimants.get(0);
      if (sheet.column(entry.getKey()).isEmpty()) {
        if (!first.isLoad()) {
          findings.add(
              TestlogFinding.MISSING_COLUMN,
              sheet.sheet().where(),
              "found no column '"
                  + first.column()
                  + "' in run '"
                  + run.name()
                  + "'; expected it for the gauge '"
                  + first.name()
                  + "' of "
                  + first.where()
                  + nearest(first.column(), sheet));
          sound = false;
        }
      } else if (claimants.size() > 1) {
        findings.add(
            TestlogFinding.COLUMN_CLAIMED_TWICE,
            sheet.column(entry.getKey()).get().where(),
            "the column '"
                + first.column()
                + "' may read "
                + claimants.stream().map(Claim::name).collect(Collectors.joining(" or "))
                + " in run '"
                + run.name()
                + "'");
        sound = false;
      } else {
        byColumn.put(entry.getKey(), first);
      }
    }
    return sound;
  }

  private static String nearest(String column, ReadingsSheet sheet) {
    return NearestWord.question(
        column, sheet.columns().stream().map(ReadingsSheet.HeaderCell::text).toList());
  }

  /**
   * The unit of a column, in which its scale is included: that of the claim, of the layout and of
   * the sheet, where all that state one must agree. The sheet's unit is that of the numbers before
   * they are scaled, and says nothing about what they are afterwards.
   */
  private Optional<Unit> unit(
      Claim claim, ReadingsSheet.HeaderCell cell, ReadingsLayout layout) {
    Optional<ReadingsLayout.StatedColumn> stated =
        Optional.ofNullable(layout.columns().get(HeaderText.key(cell.text())));
    double scale = stated.map(ReadingsLayout.StatedColumn::scale).orElse(1.0);
    List<Statement> statements = new ArrayList<>();
    claim.unit().ifPresent(unit -> statements.add(new Statement(unit, claim.where())));
    stated
        .flatMap(ReadingsLayout.StatedColumn::unit)
        .ifPresent(unit -> statements.add(new Statement(meant(claim, unit), stated.get().where())));
    if (!cell.unit().isEmpty() && scale == 1) {
      Optional<Unit> own =
          cells.unit(
              cell.unit(), cell.unitWhere(), dimensions(claim), claim.isLoad() ? "force" : "motion");
      if (own.isEmpty()) {
        return Optional.empty();
      }
      statements.add(new Statement(meant(claim, own.get()), cell.unitWhere()));
    }
    if (statements.isEmpty()) {
      findings.add(
          TestlogFinding.NO_UNIT,
          cell.where(),
          "found no unit for "
              + (scale == 1 ? "" : "the scaled numbers of ")
              + "the column '"
              + cell.text()
              + "', nor at "
              + claim.where());
      return Optional.empty();
    }
    Statement last = statements.get(statements.size() - 1);
    for (Statement other : statements) {
      if (!same(other.unit(), last.unit())) {
        findings.add(
            TestlogFinding.UNITS_DISAGREE,
            last.where(),
            "found '"
                + last.unit().symbol()
                + "' here but '"
                + other.unit().symbol()
                + "' at "
                + other.where()
                + " for '"
                + claim.name()
                + "'; expected one unit");
        return Optional.empty();
      }
    }
    Unit unit = last.unit();
    return Optional.of(
        scale == 1
            ? unit
            : new Unit(unit.symbol(), unit.dimension(), unit.siFactor() * scale, unit.siOffset()));
  }

  /** A unit and the place that states it. */
  private record Statement(Unit unit, Where where) {}

  private static boolean same(Unit one, Unit other) {
    return one.siFactor() == other.siFactor() && one.dimension().equals(other.dimension());
  }

  private Unit meant(Claim claim, Unit unit) {
    return claim.isLoad() ? LoadsReader.weight(unit, gravity) : unit;
  }

  private static List<Dimension> dimensions(Claim claim) {
    return claim.isLoad()
        ? List.of(Dimension.FORCE, Dimension.MASS, Dimension.MOMENT)
        : List.of(Dimension.LENGTH, Dimension.ANGLE, Dimension.NUMBER);
  }

  private ReadingColumns columns(
      List<Settled> loads, List<Settled> gauges, ReadingsSheet sheet) {
    Unit seconds = new Unit("s", Dimension.TIME, 1, 0);
    Unit timeUnit =
        sheet
            .extra("Time")
            .filter(cell -> !cell.unit().isEmpty())
            .flatMap(
                cell -> cells.unit(cell.unit(), cell.unitWhere(), List.of(Dimension.TIME), "time"))
            .orElse(seconds);
    return new ReadingColumns(
        loads.stream().map(s -> new ReadingColumns.Column(s.cell(), s.unit())).toList(),
        gauges.stream().map(s -> new ReadingColumns.Column(s.cell(), s.unit())).toList(),
        index(sheet, "Time"),
        timeUnit,
        index(sheet, "Step"),
        index(sheet, "Use"),
        index(sheet, "Remark"));
  }

  private static int index(ReadingsSheet sheet, String column) {
    return sheet.extra(column).map(ReadingsSheet.HeaderCell::index).orElse(-1);
  }

  /** The run that a readings sheet is where the sheet Runs does not say otherwise. */
  static RunRows.RunRow whole(ReadingsSheet sheet) {
    Where where = sheet.sheet().where();
    return new RunRows.RunRow(
        sheet.source().runName(),
        sheet.source().file(),
        sheet.sheet().name(),
        0,
        Integer.MAX_VALUE,
        Map.of(),
        "",
        OptionalDouble.empty(),
        true,
        "",
        where);
  }
}
