package org.flexbound.testlog;

import java.util.List;
import java.util.Locale;
import org.flexbound.document.CellKind;
import org.flexbound.document.Row;
import org.flexbound.document.StatedNumber;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;

/** Looks through the cells of a run once, so that every bad one is named before anything is reduced. */
final class ReadingCheck {
  /** After so many bad cells of one column the rest are counted, not named. */
  private static final int NAMED = 10;

  private ReadingCheck() {}

  /**
   * Checks a run's cells.
   *
   * @return the number of rows that hold a reading
   */
  static int check(Run run, ReadingsSheet sheet, int firstRow, int lastRow, Findings findings) {
    int[] rows = {0};
    int use = sheet.extra("Use").map(ReadingsSheet.HeaderCell::index).orElse(-1);
    List<ReadingsSheet.HeaderCell> cells =
        java.util.stream.Stream.concat(run.loads().stream(), run.gauges().stream())
            .flatMap(channel -> sheet.column(channel.column()).stream())
            .toList();
    Column[] columns =
        cells.stream().map(cell -> new Column(cell, sheet.layout())).toArray(Column[]::new);
    sheet
        .sheet()
        .forEachRow(
            row -> {
              if (row.number() > lastRow) {
                return false;
              }
              String used = use < 0 ? "" : row.text(use).toLowerCase(Locale.ROOT);
              if (row.number() >= firstRow && !used.equals("no") && !used.equals("false")) {
                boolean any = false;
                for (Column column : columns) {
                  any |= column.look(row, findings);
                }
                rows[0] += any ? 1 : 0;
              }
              return true;
            });
    for (Column column : columns) {
      column.close(findings);
    }
    return rows[0];
  }

  private static final class Column {
    private final ReadingsSheet.HeaderCell header;
    private final ReadingsLayout layout;
    private int bad;
    private int missing;
    private Where firstMissing = Where.nowhere();
    private int asText;
    private Where firstAsText = Where.nowhere();

    Column(ReadingsSheet.HeaderCell header, ReadingsLayout layout) {
      this.header = header;
      this.layout = layout;
    }

    boolean look(Row row, Findings findings) {
      int column = header.index();
      CellKind kind = row.kind(column);
      if (kind == CellKind.BLANK) {
        return false;
      }
      if (layout.isNoReading(row, column)) {
        if (missing++ == 0) {
          firstMissing = row.where(column);
        }
        return false;
      }
      if (kind == CellKind.NUMBER && Double.isFinite(row.number(column))) {
        return true;
      }
      if (kind == CellKind.TEXT && StatedNumber.plain(row.text(column)).isPresent()) {
        if (asText++ == 0) {
          firstAsText = row.where(column);
        }
        return true;
      }
      if (bad++ < NAMED) {
        findings.add(
            TestlogFinding.NOT_A_NUMBER,
            row.where(column),
            "found "
                + EntryCells.show(kind, row.text(column))
                + " in the column '"
                + header.text()
                + "'; expected a number");
      }
      return false;
    }

    void close(Findings findings) {
      if (missing > 0) {
        findings.add(
            TestlogFinding.READINGS_MISSING,
            firstMissing,
            missing
                + (missing == 1 ? " cell" : " cells")
                + " of the column '"
                + header.text()
                + "', from here on, stand for a missing reading as the description says");
      }
      if (bad > NAMED) {
        findings.add(
            TestlogFinding.NOT_A_NUMBER,
            header.where(),
            (bad - NAMED) + " more cells of the column '" + header.text() + "' hold no number");
      }
      if (asText > 0) {
        findings.add(
            TestlogFinding.NUMBER_AS_TEXT,
            firstAsText,
            asText
                + (asText == 1 ? " number" : " numbers")
                + " of the column '"
                + header.text()
                + "' stored as text, from here on, read as numbers");
      }
    }
  }
}
