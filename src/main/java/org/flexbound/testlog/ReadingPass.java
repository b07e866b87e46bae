package org.flexbound.testlog;

import java.time.DateTimeException;
import java.time.LocalDateTime;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.flexbound.document.CellKind;
import org.flexbound.document.ReadProgress;
import org.flexbound.document.Row;
import org.flexbound.document.Sheet;
import org.flexbound.document.StatedNumber;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;

/**
 * Reads the rows of a run once: every cell that is no number is named, and the others are kept as
 * numbers in SI.
 */
final class ReadingPass {
  /** After so many bad cells of one column the rest are counted, not named. */
  private static final int NAMED = 10;

  /** Progress is told after so many rows, less one: a power of two. */
  private static final int TOLD = (1 << 12) - 1;

  private static final Pattern CLOCK =
      Pattern.compile("(\\d{1,3}):([0-5]?\\d):([0-5]?\\d(?:[.,]\\d+)?)");

  private final ReadingsLayout layout;
  private final ReadingColumns columns;
  private final Findings findings;
  private final Column[] cells;
  private final double[] values;
  private final ReadingStore store;
  private long usable;
  private int strangeTimes;
  private Where firstStrangeTime = Where.nowhere();

  private ReadingPass(
      ReadingStore store, ReadingsLayout layout, ReadingColumns columns, Findings findings) {
    this.store = store;
    this.layout = layout;
    this.columns = columns;
    this.findings = findings;
    this.cells = new Column[columns.loads().size() + columns.gauges().size()];
    for (int k = 0; k < cells.length; k++) {
      int gauge = k - columns.loads().size();
      cells[k] = new Column(gauge < 0 ? columns.loads().get(k) : columns.gauges().get(gauge));
    }
    this.values = new double[cells.length];
  }

  /**
   * Reads a run.
   *
   * @param sheet its sheet
   * @param layout how it lies
   * @param firstRow its first row
   * @param lastRow its last row
   * @param columns its columns
   * @param memory where the readings are kept
   * @param progress is told how far it has come
   * @param findings gets what is no number
   * @return the pass, with the readings
   */
  static ReadingPass read(
      Sheet sheet,
      ReadingsLayout layout,
      int firstRow,
      int lastRow,
      ReadingColumns columns,
      ReadingMemory memory,
      ReadProgress progress,
      Findings findings) {
    ReadingPass pass =
        new ReadingPass(
            new ReadingStore(sheet, columns, memory), layout, columns, findings);
    String file = sheet.where().file().orElse("");
    sheet.forEachRow(
        row -> {
          if (row.number() > lastRow) {
            return false;
          }
          if (row.number() >= firstRow) {
            pass.row(row);
          }
          if ((row.number() & TOLD) == 0) {
            progress.read(file, sheet.shareRead());
          }
          return true;
        });
    pass.store.close();
    pass.close();
    return pass;
  }

  /** The readings. */
  ReadingStore readings() {
    return store;
  }

  /** How many rows hold a number and are not left out by the user. */
  long usable() {
    return usable;
  }

  private void row(Row row) {
    boolean use = use(row);
    boolean any = false;
    boolean number = false;
    for (int k = 0; k < cells.length; k++) {
      Column cell = cells[k];
      CellKind kind = row.kind(cell.index);
      if (kind == CellKind.BLANK) {
        values[k] = Double.NaN;
        continue;
      }
      any = true;
      values[k] = cell.value(row, kind, use);
      number |= !Double.isNaN(values[k]);
    }
    if (!any) {
      return;
    }
    usable += use && number ? 1 : 0;
    CellKind step = columns.step() < 0 ? CellKind.BLANK : row.kind(columns.step());
    store.add(
        row.number(),
        time(row),
        step == CellKind.NUMBER ? row.number(columns.step()) : Double.NaN,
        step == CellKind.NUMBER || step == CellKind.BLANK ? "" : row.text(columns.step()),
        use,
        columns.remark() < 0 ? "" : row.text(columns.remark()),
        values);
  }

  private boolean use(Row row) {
    if (columns.use() < 0 || row.kind(columns.use()) == CellKind.BLANK) {
      return true;
    }
    String text = row.text(columns.use()).toLowerCase(Locale.ROOT);
    return !(text.equals("no") || text.equals("false"));
  }

  /** A time of day or a date counts in days; a clock's text in hours, minutes and seconds. */
  private double time(Row row) {
    if (columns.time() < 0) {
      return Double.NaN;
    }
    return switch (row.kind(columns.time())) {
      case BLANK -> Double.NaN;
      case NUMBER -> columns.timeUnit().toSi(row.number(columns.time()));
      case DATE -> row.number(columns.time()) * 86400;
      default -> clock(row);
    };
  }

  private double clock(Row row) {
    String text = row.text(columns.time());
    Matcher clock = CLOCK.matcher(text);
    if (clock.matches()) {
      return 3600 * Double.parseDouble(clock.group(1))
          + 60 * Double.parseDouble(clock.group(2))
          + Double.parseDouble(clock.group(3).replace(',', '.'));
    }
    OptionalDouble number = StatedNumber.plain(text);
    if (number.isPresent()) {
      return columns.timeUnit().toSi(number.getAsDouble());
    }
    try {
      LocalDateTime moment = LocalDateTime.parse(text.replace(' ', 'T').replace(',', '.'));
      return 86400.0 * moment.toLocalDate().toEpochDay()
          + 1e-9 * moment.toLocalTime().toNanoOfDay();
    } catch (DateTimeException strange) {
      if (strangeTimes++ == 0) {
        firstStrangeTime = row.where(columns.time());
      }
      return Double.NaN;
    }
  }

  private void close() {
    for (Column cell : cells) {
      cell.close();
    }
    if (strangeTimes > 0) {
      findings.add(
          TestlogFinding.TIME_NOT_READ,
          firstStrangeTime,
          strangeTimes
              + (strangeTimes == 1 ? " time" : " times")
              + " from here on could not be read; expected a number, a clock such as 12:05:10, or a"
              + " date and time such as 2026-03-02 12:05:10");
    }
  }

  /** One column of numbers, with what is odd about it. */
  private final class Column {
    private final ReadingsSheet.HeaderCell header;
    private final int index;
    private final double factor;
    private final double offset;
    private int bad;
    private int asText;
    private int missing;
    private Where firstAsText = Where.nowhere();
    private Where firstMissing = Where.nowhere();

    Column(ReadingColumns.Column column) {
      this.header = column.header();
      this.index = header.index();
      this.factor = column.unit().siFactor();
      this.offset = column.unit().siOffset();
    }

    double value(Row row, CellKind kind, boolean use) {
      if (layout.isNoReading(row, index)) {
        if (use && missing++ == 0) {
          firstMissing = row.where(index);
        }
        return Double.NaN;
      }
      if (kind == CellKind.NUMBER) {
        double number = row.number(index);
        if (Double.isFinite(number)) {
          return number * factor + offset;
        }
      }
      OptionalDouble number =
          kind == CellKind.TEXT ? StatedNumber.plain(row.text(index)) : OptionalDouble.empty();
      if (number.isPresent()) {
        if (use && asText++ == 0) {
          firstAsText = row.where(index);
        }
        return number.getAsDouble() * factor + offset;
      }
      if (use && bad++ < NAMED) {
        findings.add(
            TestlogFinding.NOT_A_NUMBER,
            row.where(index),
            "found "
                + EntryCells.show(kind, row.text(index))
                + " in the column '"
                + header.text()
                + "'; expected a number");
      }
      return Double.NaN;
    }

    void close() {
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
