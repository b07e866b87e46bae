package org.flexbound.report.workbook;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.Row;
import org.apache.poi.ss.util.CellRangeAddress;
import org.apache.poi.xssf.usermodel.XSSFCell;
import org.apache.poi.xssf.usermodel.XSSFRow;
import org.apache.poi.xssf.usermodel.XSSFSheet;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;

/** Fills one sheet: a header row that stays in view, then rows of texts and numbers. */
final class SheetWriter {
  private static final int LONGEST_TEXT = 32767;
  private static final int WIDEST = 60;

  private final XSSFSheet sheet;
  private final Styles styles;
  private final SharedTexts texts;
  private final List<Integer> widths = new ArrayList<>();
  private final int columns;
  private int rows = 1;

  SheetWriter(XSSFWorkbook workbook, Styles styles, String name, String... headings) {
    this.sheet = workbook.createSheet(name);
    this.styles = styles;
    this.texts = styles.texts();
    this.columns = headings.length;
    Row row = sheet.createRow(0);
    for (int column = 0; column < headings.length; column++) {
      Cell cell = row.createCell(column);
      cell.setCellValue(safe(headings[column]));
      cell.setCellStyle(styles.header());
      widths.add(headings[column].length());
    }
    sheet.createFreezePane(0, 1);
  }

  XSSFSheet sheet() {
    return sheet;
  }

  /** The number of rows so far, header included. */
  int rows() {
    return rows;
  }

  /**
   * Adds a row.
   *
   * @param values String, Double, Integer, Boolean or OptionalDouble, one for each column
   */
  void row(Object... values) {
    if (values.length != columns) {
      throw new IllegalArgumentException(
          values.length + " values for " + columns + " columns of " + sheet.getSheetName());
    }
    XSSFRow row = sheet.createRow(rows++);
    for (int column = 0; column < values.length; column++) {
      fill(row.createCell(column), values[column], column);
    }
  }

  private void fill(XSSFCell cell, Object value, int column) {
    if (value instanceof OptionalDouble optional) {
      if (optional.isPresent()) {
        number(cell, optional.getAsDouble());
      }
    } else if (value instanceof Integer count) {
      cell.setCellValue(count);
      cell.setCellStyle(styles.count());
    } else if (value instanceof Double number) {
      number(cell, number);
    } else if (value instanceof Boolean truth) {
      cell.setCellValue(truth ? "yes" : "no");
      cell.setCellStyle(styles.text());
    } else {
      String text = safe(String.valueOf(value));
      texts.fill(cell, text);
      cell.setCellStyle(styles.text());
      widths.set(column, Math.max(widths.get(column), Math.min(WIDEST, text.length())));
    }
  }

  private void number(Cell cell, double value) {
    if (Double.isFinite(value)) {
      cell.setCellValue(value);
      cell.setCellStyle(styles.number(value));
    }
  }

  /** A text that the format can hold: no character that XML forbids, not too long. */
  private static String safe(String text) {
    String clean = org.flexbound.report.figures.XmlText.clean(text);
    return clean.length() > LONGEST_TEXT ? clean.substring(0, LONGEST_TEXT) : clean;
  }

  /** Sets widths and filter once all rows are in. */
  void finish() {
    for (int column = 0; column < columns; column++) {
      sheet.setColumnWidth(column, 256 * Math.max(9, widths.get(column) + 3));
    }
    if (rows > 1) {
      sheet.setAutoFilter(new CellRangeAddress(0, rows - 1, 0, columns - 1));
    }
  }
}
