package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.document.EntryTable;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.Units;

/** Reads the sheet Runs: what each run's columns mean. */
final class RunRows {
  private RunRows() {}

  /**
   * A run as the sheet describes it.
   *
   * @param name its name
   * @param file the file of its readings; empty for a sheet of the log's own workbook
   * @param sheet the sheet of its readings; empty where the file has only one
   * @param firstRow its first row; 0 for the first below the header
   * @param lastRow its last row; the largest integer for the sheet's last
   * @param meanings column header to name of load or gauge
   * @param date when
   * @param temperature K
   * @param use whether it is used
   * @param remark the remark
   * @param where its first row on the sheet Runs
   */
  record RunRow(
      String name,
      String file,
      String sheet,
      int firstRow,
      int lastRow,
      Map<String, Meaning> meanings,
      String date,
      OptionalDouble temperature,
      boolean use,
      String remark,
      Where where) {}

  /**
   * What a column reads.
   *
   * @param name the load's or the gauge's name
   * @param column the header text as written
   * @param where the cell that says so
   */
  record Meaning(String name, String column, Where where) {}

  /**
   * Reads the table.
   *
   * @param files whether its rows name files and not only sheets
   */
  static List<RunRow> read(
      EntryTable table, boolean files, EntryCells cells, Findings findings) {
    Map<String, List<EntryTable.Entry>> byName = new LinkedHashMap<>();
    for (EntryTable.Entry entry : table.entries()) {
      cells
          .need(entry, "Run")
          .ifPresent(name -> byName.computeIfAbsent(name, key -> new ArrayList<>()).add(entry));
    }
    List<RunRow> runs = new ArrayList<>();
    byName.forEach(
        (name, rows) ->
            run(table, files, name, rows, cells, findings).ifPresent(runs::add));
    return runs;
  }

  private static Optional<RunRow> run(
      EntryTable table,
      boolean files,
      String name,
      List<EntryTable.Entry> rows,
      EntryCells cells,
      Findings findings) {
    EntryTable.Entry first = rows.get(0);
    Map<String, Meaning> meanings = new LinkedHashMap<>();
    for (EntryTable.Entry row : rows) {
      Optional<String> column = EntryCells.name(row, "Column");
      Optional<String> meaning = EntryCells.name(row, "Load or gauge");
      if (column.isPresent() != meaning.isPresent()) {
        findings.add(
            TestlogFinding.MISSING_ENTRY,
            row.get(column.isPresent() ? "Load or gauge" : "Column").where(),
            "found nothing; expected both a column and the load or gauge it reads, or neither");
      } else if (column.isPresent()) {
        Meaning earlier =
            meanings.putIfAbsent(
                HeaderText.claimedKey(column.get()),
                new Meaning(meaning.get(), column.get(), row.get("Load or gauge").where()));
        if (earlier != null) {
          findings.add(
              TestlogFinding.COLUMN_CLAIMED_TWICE,
              row.get("Column").where(),
              "found the column '" + column.get() + "' again in run '" + name + "', first at "
                  + earlier.where());
        }
      }
      for (String place : files ? List.of("File", "Sheet") : List.of("Sheet")) {
        if (!EntryCells.text(row, place).equals(EntryCells.text(first, place))
            && !row.get(place).isBlank()) {
          findings.add(
              TestlogFinding.TWICE,
              row.get(place).where(),
              "found another " + place.toLowerCase(Locale.ROOT) + " for the run '" + name
                  + "'; expected '" + EntryCells.text(first, place)
                  + "', or another name for the run");
        }
      }
    }
    Optional<String> sheet =
        files ? Optional.of(EntryCells.text(first, "Sheet")) : cells.need(first, "Sheet");
    Optional<String> file = files ? cells.need(first, "File") : Optional.of("");
    Unit celsius = Units.known("°C");
    OptionalDouble temperature =
        cells.si(table, first, "Temperature", celsius, Dimension.TEMPERATURE, "temperature");
    int from = cells.row(first, "First row").orElse(0);
    int to = cells.row(first, "Last row").orElse(Integer.MAX_VALUE);
    if (from > to) {
      findings.add(
          TestlogFinding.OUT_OF_RANGE,
          first.get("Last row").where(),
          "found the last row " + to + " above the first row " + from);
    }
    if (sheet.isEmpty() || file.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new RunRow(
            name,
            file.get(),
            sheet.get(),
            from,
            to,
            meanings,
            EntryCells.text(first, "Date").replace("T00:00", ""),
            temperature,
            cells.yes(first, "Use", true),
            EntryCells.text(first, "Remark"),
            first.get("Run").where()));
  }
}
