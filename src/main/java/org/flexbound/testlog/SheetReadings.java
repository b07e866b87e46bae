package org.flexbound.testlog;

import java.util.Locale;
import org.flexbound.document.CellKind;
import org.flexbound.document.Row;
import org.flexbound.document.Sheet;
import org.flexbound.document.StatedNumber;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Unit;

/** Streams the rows of a run off its sheet, in SI units. */
final class SheetReadings implements Readings {
  private final Sheet sheet;
  private final int firstRow;
  private final int lastRow;
  private final int[] loadColumns;
  private final Unit[] loadUnits;
  private final int[] gaugeColumns;
  private final Unit[] gaugeUnits;
  private final Extras extras;
  private final ReadingsLayout layout;

  /**
   * The columns beside loads and gauges; −1 where there is none.
   *
   * @param time the column Time
   * @param timeUnit its unit
   * @param step the column Step
   * @param use the column Use
   * @param remark the column Remark
   */
  record Extras(int time, Unit timeUnit, int step, int use, int remark) {}

  SheetReadings(
      Sheet sheet,
      int firstRow,
      int lastRow,
      int[] loadColumns,
      Unit[] loadUnits,
      int[] gaugeColumns,
      Unit[] gaugeUnits,
      Extras extras,
      ReadingsLayout layout) {
    this.layout = layout;
    this.sheet = sheet;
    this.firstRow = firstRow;
    this.lastRow = lastRow;
    this.loadColumns = loadColumns.clone();
    this.loadUnits = loadUnits.clone();
    this.gaugeColumns = gaugeColumns.clone();
    this.gaugeUnits = gaugeUnits.clone();
    this.extras = extras;
  }

  @Override
  public void forEach(ReadingVisitor visitor) {
    Cursor cursor = new Cursor();
    sheet.forEachRow(
        row -> {
          if (row.number() > lastRow) {
            return false;
          }
          if (row.number() >= firstRow && cursor.on(row)) {
            visitor.visit(cursor);
          }
          return true;
        });
  }

  private double value(Row row, int column) {
    if (layout.isNoReading(row, column)) {
      return Double.NaN;
    }
    CellKind kind = row.kind(column);
    if (kind == CellKind.NUMBER) {
      return row.number(column);
    }
    return kind == CellKind.TEXT
        ? StatedNumber.plain(row.text(column)).orElse(Double.NaN)
        : Double.NaN;
  }

  private static String at(Row row, int column) {
    return column < 0 ? "" : row.text(column);
  }

  /** One row; lives as long as its visit. */
  private final class Cursor implements Reading {
    @SuppressWarnings("NullAway.Init") // set by on(row) before anybody sees the cursor
    private Row row;

    /** Sets the row; false where nothing stands under the loads and gauges. */
    boolean on(Row next) {
      row = next;
      for (int column : loadColumns) {
        if (row.kind(column) != CellKind.BLANK) {
          return true;
        }
      }
      for (int column : gaugeColumns) {
        if (row.kind(column) != CellKind.BLANK) {
          return true;
        }
      }
      return false;
    }

    @Override
    public int row() {
      return row.number();
    }

    @Override
    public double load(int channel) {
      return loadUnits[channel].toSi(value(row, loadColumns[channel]));
    }

    @Override
    public double gauge(int channel) {
      return gaugeUnits[channel].toSi(value(row, gaugeColumns[channel]));
    }

    @Override
    public double time() {
      if (extras.time() < 0) {
        return Double.NaN;
      }
      // a time of day or a date counts in days, whatever the header says
      return row.kind(extras.time()) == CellKind.DATE
          ? row.number(extras.time()) * 86400
          : extras.timeUnit().toSi(value(row, extras.time()));
    }

    @Override
    public String step() {
      return at(row, extras.step());
    }

    @Override
    public boolean use() {
      String text = at(row, extras.use()).toLowerCase(Locale.ROOT);
      return !(text.equals("no") || text.equals("false"));
    }

    @Override
    public String remark() {
      return at(row, extras.remark());
    }

    @Override
    public Where whereLoad(int channel) {
      return row.where(loadColumns[channel]);
    }

    @Override
    public Where whereGauge(int channel) {
      return row.where(gaugeColumns[channel]);
    }
  }
}
