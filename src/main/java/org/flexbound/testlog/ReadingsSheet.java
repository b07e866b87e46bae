package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.flexbound.document.CellKind;
import org.flexbound.document.EntryTable;
import org.flexbound.document.Row;
import org.flexbound.document.Sheet;
import org.flexbound.finding.Where;

/**
 * The header of a sheet of readings: the first row that names at least one load column and one gauge
 * column, and the units row that may follow it.
 */
final class ReadingsSheet {
  private final Sheet sheet;
  private final Map<String, HeaderCell> columns;
  private final int firstDataRow;

  private ReadingsSheet(Sheet sheet, Map<String, HeaderCell> columns, int firstDataRow) {
    this.sheet = sheet;
    this.columns = columns;
    this.firstDataRow = firstDataRow;
  }

  /**
   * One header cell.
   *
   * @param text the header without its unit
   * @param index the column, from 0
   * @param unit the unit in brackets or in the units row, or empty
   * @param where the header's cell
   * @param unitWhere the cell in which the unit stands
   */
  record HeaderCell(String text, int index, String unit, Where where, Where unitWhere) {}

  Sheet sheet() {
    return sheet;
  }

  /** The first row below header and units. */
  int firstDataRow() {
    return firstDataRow;
  }

  Optional<HeaderCell> column(String text) {
    return Optional.ofNullable(columns.get(key(text)));
  }

  List<HeaderCell> columns() {
    return List.copyOf(columns.values());
  }

  static String key(String text) {
    return text.strip().toLowerCase(Locale.ROOT);
  }

  /** Finds the header; empty where the sheet has none. */
  static Optional<ReadingsSheet> find(Sheet sheet, Set<String> loadColumns, Set<String> gaugeColumns) {
    Finder finder = new Finder(loadColumns, gaugeColumns);
    sheet.forEachRow(finder::visit);
    if (finder.header.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new ReadingsSheet(sheet, finder.header, finder.firstDataRow));
  }

  private static final class Finder {
    private final Set<String> loads;
    private final Set<String> gauges;
    private Map<String, HeaderCell> header = new LinkedHashMap<>();
    private int firstDataRow;
    private int rowsSeen;

    Finder(Set<String> loads, Set<String> gauges) {
      this.loads = loads;
      this.gauges = gauges;
    }

    boolean visit(Row row) {
      if (!header.isEmpty()) {
        unitsRow(row);
        return false;
      }
      boolean load = false;
      boolean gauge = false;
      List<HeaderCell> cells = new ArrayList<>();
      for (int column = 0; column < row.width(); column++) {
        if (row.kind(column) != CellKind.TEXT) {
          continue;
        }
        String[] parts = EntryTable.nameAndUnit(row.text(column));
        load |= loads.contains(key(parts[0]));
        gauge |= gauges.contains(key(parts[0]));
        cells.add(
            new HeaderCell(parts[0], column, parts[1], row.where(column), row.where(column)));
      }
      if (load && gauge) {
        cells.forEach(cell -> header.putIfAbsent(key(cell.text()), cell));
        firstDataRow = row.number() + 1;
      }
      return ++rowsSeen < 200;
    }

    /** A row right under the header with texts and no numbers states units. */
    private void unitsRow(Row row) {
      boolean texts = false;
      for (HeaderCell cell : header.values()) {
        if (!loads.contains(key(cell.text())) && !gauges.contains(key(cell.text()))) {
          continue;
        }
        if (row.kind(cell.index()) == CellKind.NUMBER
            || EntryCells.numberIn(row.text(cell.index())).isPresent()) {
          return;
        }
        texts |= row.kind(cell.index()) == CellKind.TEXT;
      }
      if (!texts) {
        return;
      }
      Map<String, HeaderCell> withUnits = new LinkedHashMap<>();
      header.forEach(
          (key, cell) -> {
            String unit = row.text(cell.index());
            String bare =
                unit.startsWith("[") && unit.endsWith("]")
                    ? unit.substring(1, unit.length() - 1).strip()
                    : unit;
            withUnits.put(
                key,
                bare.isEmpty()
                    ? cell
                    : new HeaderCell(
                        cell.text(), cell.index(), bare, cell.where(), row.where(cell.index())));
          });
      header = withUnits;
      firstDataRow = row.number() + 1;
    }
  }
}
