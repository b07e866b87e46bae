package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Collectors;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.Unit;

/** Makes a run of a readings sheet: settles what each column means and in which unit. */
final class RunBuilder {
  private final List<Claim> claims;
  private final double gravity;
  private final Findings findings;
  private final EntryCells cells;

  RunBuilder(List<Claim> claims, double gravity, Findings findings) {
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
        SheetLayout.READING_COLUMNS.stream().map(ReadingsSheet::key).collect(Collectors.toSet());
    for (ReadingsSheet.HeaderCell cell : sheet.columns()) {
      String key = ReadingsSheet.key(cell.text());
      Claim claim = byColumn.get(key);
      if (claim != null) {
        Optional<Unit> unit = unit(claim, cell);
        sound &= unit.isPresent();
        unit.ifPresent(found -> settled.add(new Settled(claim, cell, found)));
      } else if (!extras.contains(key)) {
        findings.add(
            TestlogFinding.COLUMN_NOT_USED,
            cell.where(),
            "the column '" + cell.text() + "' is neither a load nor a gauge in run '"
                + run.name() + "'");
      }
    }
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
    Readings readings =
        new SheetReadings(
            sheet.sheet(),
            Math.max(run.firstRow(), sheet.firstDataRow()),
            run.lastRow(),
            loads.stream().mapToInt(s -> s.cell().index()).toArray(),
            loads.stream().map(Settled::unit).toArray(Unit[]::new),
            gauges.stream().mapToInt(s -> s.cell().index()).toArray(),
            gauges.stream().map(Settled::unit).toArray(Unit[]::new),
            extras(sheet));
    return Optional.of(
        new Run(
            run.name(),
            run.date(),
            run.temperature(),
            run.use(),
            run.remark(),
            loads.stream().map(Settled::channel).toList(),
            gauges.stream().map(Settled::channel).toList(),
            readings,
            sheet.sheet().where()));
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
            "found '" + meaning.name() + "'; expected a name of the sheets Load points or Gauges");
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
                + "'");
        sound = false;
      } else {
        byColumn.put(entry.getKey(), claim.get());
      }
    }
    Map<String, List<Claim>> standing =
        claims.stream()
            .collect(
                Collectors.groupingBy(
                    claim -> ReadingsSheet.key(claim.column()),
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
                  + first.where());
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

  private Optional<Unit> unit(Claim claim, ReadingsSheet.HeaderCell cell) {
    if (cell.unit().isEmpty()) {
      if (claim.unit().isEmpty()) {
        findings.add(
            TestlogFinding.NO_UNIT,
            cell.where(),
            "found no unit for the column '" + cell.text() + "', nor at " + claim.where());
      }
      return claim.unit();
    }
    List<Dimension> wanted =
        claim.isLoad()
            ? List.of(Dimension.FORCE, Dimension.MASS, Dimension.MOMENT)
            : List.of(Dimension.LENGTH, Dimension.ANGLE, Dimension.NUMBER);
    Optional<Unit> unit =
        cells
            .unit(cell.unit(), cell.unitWhere(), wanted, claim.isLoad() ? "force" : "motion")
            .map(found -> claim.isLoad() ? LoadsReader.weight(found, gravity) : found);
    if (unit.isPresent()
        && claim.unit().isPresent()
        && (unit.get().siFactor() != claim.unit().get().siFactor()
            || !unit.get().dimension().equals(claim.unit().get().dimension()))) {
      findings.add(
          TestlogFinding.UNITS_DISAGREE,
          cell.unitWhere(),
          "found '"
              + cell.unit()
              + "' here but '"
              + claim.unit().get().symbol()
              + "' at "
              + claim.where()
              + " for '"
              + claim.name()
              + "'; expected one unit");
      return Optional.empty();
    }
    return unit;
  }

  private SheetReadings.Extras extras(ReadingsSheet sheet) {
    Unit seconds = new Unit("s", Dimension.TIME, 1, 0);
    Unit timeUnit =
        sheet
            .column("Time")
            .filter(cell -> !cell.unit().isEmpty())
            .flatMap(
                cell -> cells.unit(cell.unit(), cell.unitWhere(), List.of(Dimension.TIME), "time"))
            .orElse(seconds);
    return new SheetReadings.Extras(
        index(sheet, "Time"),
        timeUnit,
        index(sheet, "Step"),
        index(sheet, "Use"),
        index(sheet, "Remark"));
  }

  private static int index(ReadingsSheet sheet, String column) {
    return sheet.column(column).map(ReadingsSheet.HeaderCell::index).orElse(-1);
  }

  /** The run that a readings sheet is where the sheet Runs does not say otherwise. */
  static RunRows.RunRow whole(ReadingsSheet sheet) {
    Where where = sheet.sheet().where();
    return new RunRows.RunRow(
        sheet.sheet().name(),
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
