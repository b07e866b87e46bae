package org.flexbound.flexibility;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.flexbound.document.CellKind;
import org.flexbound.document.EntryTable;
import org.flexbound.document.Sheet;
import org.flexbound.document.SheetFile;
import org.flexbound.document.WorkbookFile;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.UnitException;
import org.flexbound.quantity.Units;

/**
 * Reads a table of flexibility coefficients computed elsewhere.
 *
 * <p>Columns: Gauge, Load, Value (absolute coefficient: motion at the gauge per unit load, base motion
 * not taken out), one column for each parameter under its name (the derivative of Value by the natural
 * logarithm of that stiffness, in the unit of Value), and where wanted Configuration and Unit. The
 * unit may stand in Value's header in brackets, e.g. {@code Value [mm/kN]}. The first sheet with these
 * columns is read.
 */
public final class OutsideTableReader {
  private final List<String> parameters;
  private final Findings findings = new Findings();

  private OutsideTableReader(List<String> parameters) {
    this.parameters = List.copyOf(parameters);
  }

  /**
   * Reads a table.
   *
   * @param file the workbook
   * @param shownName its name as the user gave it
   * @param parameters the parameters' names, a column each
   * @return the table as far as it could be made out, with all findings
   */
  public static Outcome<OutsideFlexibility> read(
      Path file, String shownName, List<String> parameters) {
    return WorkbookFile.open(file, shownName)
        .then(
            sheets -> {
              try (SheetFile open = sheets) {
                return new OutsideTableReader(parameters).table(open);
              }
            });
  }

  /**
   * Reads a table.
   *
   * @param sheets the workbook, not closed here
   * @param parameters the parameters' names, a column each
   * @return the table as far as it could be made out, with all findings
   */
  public static Outcome<OutsideFlexibility> read(SheetFile sheets, List<String> parameters) {
    return new OutsideTableReader(parameters).table(sheets);
  }

  private Outcome<OutsideFlexibility> table(SheetFile sheets) {
    List<String> required = new ArrayList<>(List.of("Gauge", "Load", "Value"));
    required.addAll(parameters);
    for (Sheet sheet : sheets.sheets()) {
      Findings own = new Findings();
      Optional<EntryTable> table =
          EntryTable.read(sheet, required, List.of("Configuration", "Unit"), own);
      if (table.isPresent()) {
        findings.addAll(own.list());
        if (findings.hasErrors()) {
          return Outcome.none(findings.list());
        }
        List<OutsideFlexibility.Entry> entries = entries(table.get());
        return Outcome.of(new OutsideFlexibility(entries, table.get().where()), findings.list());
      }
    }
    findings.add(
        OutsideTableFinding.NO_TABLE,
        Where.file(sheets.name()),
        "expected a header row with " + String.join(", ", required));
    return Outcome.none(findings.list());
  }

  private List<OutsideFlexibility.Entry> entries(EntryTable table) {
    String common = table.header("Value").map(EntryTable.Header::unit).orElse("");
    boolean ownUnits = table.header("Unit").isPresent();
    boolean configured = table.header("Configuration").isPresent();
    Set<String> seen = new HashSet<>();
    List<OutsideFlexibility.Entry> result = new ArrayList<>();
    for (EntryTable.Entry row : table.entries()) {
      String gauge = name(row, "Gauge");
      String load = name(row, "Load");
      String configuration = configured ? row.get("Configuration").text() : "";
      String unitText = ownUnits && !row.get("Unit").isBlank() ? row.get("Unit").text() : common;
      Where unitPlace =
          ownUnits
              ? row.get("Unit").where()
              : table.header("Value").map(EntryTable.Header::where).orElse(row.where());
      double factor = factor(unitText, unitPlace);
      double value = factor * number(row.get("Value"), "Value");
      Map<String, Double> derivatives = new LinkedHashMap<>();
      for (String parameter : parameters) {
        derivatives.put(parameter, factor * number(row.get(parameter), parameter));
      }
      if (!seen.add(configuration + "\n" + gauge + "\n" + load)) {
        findings.add(
            OutsideTableFinding.STATED_TWICE,
            row.where(),
            "gauge " + gauge + " under load " + load + " stands in a row above already");
      }
      result.add(
          new OutsideFlexibility.Entry(
              configuration.isEmpty() ? Optional.empty() : Optional.of(configuration),
              gauge,
              load,
              value,
              derivatives,
              row.where()));
    }
    return result;
  }

  private String name(EntryTable.Entry row, String column) {
    EntryTable.Value value = row.get(column);
    if (value.isBlank()) {
      wrong(value, "the name of a " + column.toLowerCase(java.util.Locale.ROOT));
    }
    return value.text();
  }

  private double number(EntryTable.Value value, String column) {
    if (value.kind() == CellKind.NUMBER) {
      return value.number();
    }
    wrong(value, "a number for " + column);
    return 0;
  }

  private double factor(String text, Where where) {
    if (text.isEmpty()) {
      findings.add(
          OutsideTableFinding.WRONG_CELL,
          where,
          "no unit is stated for Value; expected one such as mm/kN");
      return 1;
    }
    try {
      Unit unit = Units.parse(text);
      boolean perForce = unit.dimension().mass() == -1 && unit.dimension().time() == 2;
      if (!perForce) {
        findings.add(
            OutsideTableFinding.WRONG_CELL,
            where,
            "found the unit " + text + "; expected a motion per force or moment, such as mm/kN");
      }
      return unit.siFactor();
    } catch (UnitException bad) {
      findings.add(OutsideTableFinding.WRONG_CELL, where, String.valueOf(bad.getMessage()));
      return 1;
    }
  }

  private void wrong(EntryTable.Value value, String expected) {
    findings.add(
        OutsideTableFinding.WRONG_CELL,
        value.where(),
        "found " + (value.isBlank() ? "nothing" : "'" + value.text() + "'") + "; expected " + expected);
  }
}
