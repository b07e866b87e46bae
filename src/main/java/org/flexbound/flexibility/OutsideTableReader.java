package org.flexbound.flexibility;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import org.flexbound.document.CsvLayout;
import org.flexbound.document.EntryTable;
import org.flexbound.document.ReadLimits;
import org.flexbound.document.Sheet;
import org.flexbound.document.SheetFile;
import org.flexbound.document.TableFile;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.NearestWord;
import org.flexbound.quantity.Unit;

/**
 * Reads tables of flexibility from elsewhere, from a workbook or a text file of separated values. The
 * first sheet whose header names the needed columns is read; a unit may stand in a header in
 * brackets, in a column Unit, or with the number.
 *
 * <p><b>Computed flexibility</b>: Gauge, Load, Value (absolute coefficient: motion at the gauge per
 * unit load, base motion not taken out), one column for each parameter under its name (the derivative
 * of Value by the natural logarithm of that stiffness, in the unit of Value), and where wanted
 * Configuration and Unit.
 *
 * <p><b>Measured modes</b>: Mode, Frequency (Hz where no unit is stated), one column for each gauge
 * and each load under its name (the shape's component along its direction), and where wanted Modal
 * mass (kg; without it shapes are mass-normalised), Frequency uncertainty (%) and Configuration.
 */
public final class OutsideTableReader {
  private static final String COEFFICIENT = "a motion per force or moment with its unit, as 1.2 mm/kN";

  private final List<String> needed;
  private final List<String> allowed;
  private final Findings findings = new Findings();

  private OutsideTableReader(List<String> needed, List<String> allowed) {
    this.needed = List.copyOf(needed);
    this.allowed = List.copyOf(allowed);
  }

  /**
   * Reads a table of computed flexibility.
   *
   * @param file a workbook or a text file of separated values
   * @param shownName its name as the user gave it
   * @param parameters the parameters' names, a column each
   * @return the table as far as it could be made out, with all findings
   */
  public static Outcome<OutsideFlexibility> read(
      Path file, String shownName, List<String> parameters) {
    return open(file, shownName, sheets -> read(sheets, parameters));
  }

  /**
   * Reads a table of computed flexibility.
   *
   * @param sheets an open file, not closed here
   * @param parameters the parameters' names, a column each
   * @return the table as far as it could be made out, with all findings
   */
  public static Outcome<OutsideFlexibility> read(SheetFile sheets, List<String> parameters) {
    List<String> needed = new ArrayList<>(List.of("Gauge", "Load", "Value"));
    needed.addAll(parameters);
    OutsideTableReader reader = new OutsideTableReader(needed, List.of("Configuration", "Unit"));
    return reader.table(sheets, table -> reader.computed(table, parameters));
  }

  /**
   * Reads a table of measured modes.
   *
   * @param file a workbook or a text file of separated values
   * @param shownName its name as the user gave it
   * @param gauges the gauges' names: the columns that must be there
   * @param loads the loads' names: likewise
   * @return the modes as far as they could be made out, with all findings
   */
  public static Outcome<MeasuredModes> readModes(
      Path file, String shownName, List<String> gauges, List<String> loads) {
    return open(file, shownName, sheets -> readModes(sheets, gauges, loads));
  }

  /**
   * Reads a table of measured modes.
   *
   * @param sheets an open file, not closed here
   * @param gauges the gauges' names: the columns that must be there
   * @param loads the loads' names: likewise
   * @return the modes as far as they could be made out, with all findings
   */
  public static Outcome<MeasuredModes> readModes(
      SheetFile sheets, List<String> gauges, List<String> loads) {
    List<String> points = new ArrayList<>(gauges);
    points.addAll(loads);
    List<String> needed = new ArrayList<>(List.of("Mode", "Frequency"));
    needed.addAll(points);
    OutsideTableReader reader =
        new OutsideTableReader(
            needed, List.of("Configuration", "Modal mass", "Frequency uncertainty"));
    return reader.table(sheets, table -> reader.modes(table, points));
  }

  private static <T> Outcome<T> open(
      Path file, String shownName, Function<SheetFile, Outcome<T>> step) {
    return TableFile.open(file, shownName, CsvLayout.FOUND_BY_ITSELF, ReadLimits.USUAL)
        .then(
            sheets -> {
              try (SheetFile open = sheets) {
                return step.apply(open);
              }
            });
  }

  /** Reads the first sheet with all needed columns; where none has all, tells of the best one. */
  private <T> Outcome<T> table(SheetFile sheets, Function<EntryTable, T> step) {
    List<String> missing = needed;
    Where best = Where.file(sheets.name());
    List<String> there = List.of();
    for (Sheet sheet : sheets.sheets()) {
      Findings own = new Findings();
      Optional<EntryTable> table = EntryTable.read(sheet, needed, allowed, own);
      if (table.isEmpty()) {
        continue;
      }
      List<String> lacking =
          needed.stream().filter(column -> table.get().header(column).isEmpty()).toList();
      if (lacking.isEmpty()) {
        findings.addAll(own.list());
        return Outcome.of(step.apply(table.get()), findings.list());
      }
      if (lacking.size() < missing.size()) {
        missing = lacking;
        best = table.get().where();
        there =
            own.list().stream().map(finding -> finding.message()).toList();
      }
    }
    List<String> columns = there;
    findings.add(
        OutsideTableFinding.NO_TABLE,
        best,
        "found no header row with the columns "
            + String.join(", ", needed)
            + "; not there: "
            + String.join(", ", missing)
            + (columns.isEmpty() ? "" : NearestWord.question(missing.get(0), words(columns))));
    return Outcome.none(findings.list());
  }

  /** The columns that a header has and that are not known, out of the findings about them. */
  private static List<String> words(List<String> messages) {
    return messages.stream()
        .filter(text -> text.startsWith("found the column '"))
        .map(text -> text.substring(18, text.indexOf('\'', 18)))
        .toList();
  }

  private OutsideFlexibility computed(EntryTable table, List<String> parameters) {
    OutsideCells cells = new OutsideCells(table, findings);
    Map<List<String>, Where> seen = new LinkedHashMap<>();
    List<OutsideFlexibility.Entry> result = new ArrayList<>();
    for (EntryTable.Entry row : table.entries()) {
      String gauge = cells.name(row, "Gauge");
      String load = cells.name(row, "Load");
      Optional<String> configuration = cells.optionalName(row, "Configuration");
      double value = coefficient(cells, table, row, "Value");
      Map<String, Double> derivatives = new LinkedHashMap<>();
      for (String parameter : parameters) {
        derivatives.put(parameter, coefficient(cells, table, row, parameter));
      }
      Where first =
          seen.putIfAbsent(List.of(configuration.orElse(""), gauge, load), row.where());
      if (first != null) {
        findings.add(
            OutsideTableFinding.STATED_TWICE,
            row.where(),
            "gauge '" + gauge + "' under load '" + load + "' stands at " + first + " already");
      }
      result.add(
          new OutsideFlexibility.Entry(
              configuration, gauge, load, value, derivatives, row.where()));
    }
    refuseEmpty(table);
    return new OutsideFlexibility(result, table.where());
  }

  /** A coefficient or a derivative; where its header states no unit, that of Value holds. */
  private double coefficient(
      OutsideCells cells, EntryTable table, EntryTable.Entry row, String column) {
    if (row.get(column).isBlank()) {
      cells.wrong(row.get(column), COEFFICIENT);
      return 0;
    }
    Optional<Unit> ofValue =
        table
            .header("Value")
            .filter(header -> !header.unit().isEmpty() && !column.equals("Value"))
            .flatMap(header -> OutsideCells.known(header.unit()));
    return cells
        .si(row, column, Optional.of("Unit"), ofValue, OutsideCells::isMotionPerLoad, COEFFICIENT)
        .orElse(0);
  }

  private MeasuredModes modes(EntryTable table, List<String> points) {
    OutsideCells cells = new OutsideCells(table, findings);
    List<MeasuredModes.Mode> result = new ArrayList<>();
    for (EntryTable.Entry row : table.entries()) {
      OptionalDouble angular = frequency(cells, row);
      OptionalDouble mass = mass(cells, row);
      OptionalDouble uncertainty = OptionalDouble.empty();
      if (cells.has("Frequency uncertainty")) {
        uncertainty =
            cells.si(
                row,
                "Frequency uncertainty",
                Optional.empty(),
                OutsideCells.known("%"),
                Dimension.NUMBER::fits,
                "a share such as 0.1 %");
      }
      Map<String, Double> shape = new LinkedHashMap<>();
      for (String point : points) {
        if (row.get(point).isBlank()) {
          cells.wrong(row.get(point), "the shape's component at '" + point + "'");
        }
        cells
            .si(
                row,
                point,
                Optional.empty(),
                Optional.of(Unit.ONE),
                OutsideCells::isMotion,
                "the shape's component at '" + point + "', a number or a motion")
            .ifPresent(value -> shape.put(point, value));
      }
      if (angular.isPresent() && mass.isPresent()) {
        result.add(
            new MeasuredModes.Mode(
                cells.optionalName(row, "Configuration"),
                cells.name(row, "Mode"),
                angular.getAsDouble(),
                uncertainty,
                mass.getAsDouble(),
                shape,
                row.where()));
      }
    }
    refuseEmpty(table);
    return new MeasuredModes(result, table.where());
  }

  private static OptionalDouble frequency(OutsideCells cells, EntryTable.Entry row) {
    String expected = "a frequency above 0, in Hz where no unit is stated";
    OptionalDouble si =
        cells.si(
            row,
            "Frequency",
            Optional.empty(),
            OutsideCells.known("Hz"),
            OutsideCells::isFrequency,
            expected);
    if (si.isEmpty() || !(si.getAsDouble() > 0)) {
      if (si.isPresent() || row.get("Frequency").isBlank()) {
        cells.wrong(row.get("Frequency"), expected);
      }
      return OptionalDouble.empty();
    }
    return OptionalDouble.of(2 * Math.PI * si.getAsDouble());
  }

  private static OptionalDouble mass(OutsideCells cells, EntryTable.Entry row) {
    if (!cells.has("Modal mass") || row.get("Modal mass").isBlank()) {
      return OptionalDouble.of(1);
    }
    OptionalDouble mass =
        cells.si(
            row,
            "Modal mass",
            Optional.empty(),
            OutsideCells.known("kg"),
            Dimension.MASS::fits,
            "a mass above 0, in kg where no unit is stated");
    if (mass.isPresent() && !(mass.getAsDouble() > 0)) {
      cells.wrong(row.get("Modal mass"), "a mass above 0");
      return OptionalDouble.empty();
    }
    return mass;
  }

  private void refuseEmpty(EntryTable table) {
    if (table.entries().isEmpty()) {
      findings.add(
          OutsideTableFinding.NO_TABLE, table.where(), "the table has no row below its header");
    }
  }
}
