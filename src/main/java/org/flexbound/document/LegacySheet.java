package org.flexbound.document;

import java.util.ArrayList;
import java.util.List;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.CellType;
import org.apache.poi.ss.usermodel.DateUtil;
import org.apache.poi.ss.usermodel.FormulaError;
import org.apache.poi.ss.util.CellRangeAddress;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Refusal;
import org.flexbound.finding.Where;

/** A sheet of an .xls workbook. */
final class LegacySheet implements Sheet {
  private final String file;
  private final org.apache.poi.ss.usermodel.Sheet sheet;
  private final boolean hidden;

  LegacySheet(String file, org.apache.poi.ss.usermodel.Sheet sheet, boolean hidden) {
    this.file = file;
    this.sheet = sheet;
    this.hidden = hidden;
  }

  @Override
  public String name() {
    return sheet.getSheetName();
  }

  @Override
  public Where where() {
    return Where.sheet(file, sheet.getSheetName());
  }

  @Override
  public Where cell(int row, int column) {
    return CellRow.place(file, sheet.getSheetName(), row, column);
  }

  @Override
  public SheetNotes notes() {
    try {
      return known();
    } catch (RuntimeException damaged) {
      // the layout is damaged though the values are not: there is nothing to note
      return new SheetNotes(hidden, 0, 0, List.of(), List.of());
    }
  }

  private SheetNotes known() {
    int hiddenRows = 0;
    int first = 0;
    int width = 0;
    for (org.apache.poi.ss.usermodel.Row row : sheet) {
      width = Math.max(width, row.getLastCellNum());
      if (row.getZeroHeight() && row.getPhysicalNumberOfCells() > 0 && hiddenRows++ == 0) {
        first = row.getRowNum() + 1;
      }
    }
    List<String> columns = new ArrayList<>();
    for (int column = 0; column < width; column++) {
      if (sheet.isColumnHidden(column)) {
        columns.add(CellRow.columnName(column));
      }
    }
    List<String> merged =
        sheet.getMergedRegions().stream().map(CellRangeAddress::formatAsString).toList();
    return new SheetNotes(hidden, hiddenRows, first, columns, merged);
  }

  @Override
  public void forEachRow(RowVisitor visitor) {
    CellRow row = new CellRow(file, sheet.getSheetName(), false);
    for (org.apache.poi.ss.usermodel.Row source : sheet) {
      try {
        row.begin(source.getRowNum() + 1, source.getZeroHeight());
        for (Cell cell : source) {
          fill(row, cell);
        }
      } catch (RuntimeException damaged) {
        throw new Refusal(
            List.of(
                new Finding(
                    DocumentFinding.UNREADABLE,
                    where(),
                    "the sheet is damaged at row " + (source.getRowNum() + 1))));
      }
      if (!row.isBlank() && !visitor.visit(row)) {
        return;
      }
    }
  }

  private static void fill(CellRow row, Cell cell) {
    int column = cell.getColumnIndex();
    CellType type =
        cell.getCellType() == CellType.FORMULA
            ? cell.getCachedFormulaResultType()
            : cell.getCellType();
    switch (type) {
      case NUMERIC -> {
        double value = cell.getNumericCellValue();
        if (!Double.isFinite(value)) {
          row.error(column, "(no number)");
        } else if (DateUtil.isCellDateFormatted(cell)) {
          row.date(column, value);
        } else {
          row.number(column, value, cell.getCellStyle().getDataFormatString().indexOf('%') >= 0);
        }
      }
      case STRING -> row.text(column, cell.getStringCellValue());
      case BOOLEAN -> row.truth(column, cell.getBooleanCellValue());
      case ERROR -> row.error(column, FormulaError.forInt(cell.getErrorCellValue()).getString());
      default -> {
        // blank
      }
    }
  }
}
