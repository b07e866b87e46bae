package org.flexbound.testlog;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.Row;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;

/** Writes small workbooks for tests and samples: sheets of rows of texts, numbers and nulls. */
public final class WorkbookMaker {
  private final Map<String, List<Object[]>> sheets = new LinkedHashMap<>();

  /**
   * Adds a row to a sheet.
   *
   * @param sheet the sheet's name
   * @param cells String, Number, Boolean or null for blank
   * @return this
   */
  public WorkbookMaker row(String sheet, Object... cells) {
    sheets.computeIfAbsent(sheet, name -> new ArrayList<>()).add(cells.clone());
    return this;
  }

  /**
   * Replaces a cell.
   *
   * @param sheet the sheet's name
   * @param row from 0
   * @param column from 0
   * @param value the new value
   * @return this
   */
  public WorkbookMaker set(String sheet, int row, int column, Object value) {
    sheets.get(sheet).get(row)[column] = value;
    return this;
  }

  /**
   * Writes the workbook.
   *
   * @param file where to
   * @return the file
   */
  public Path write(Path file) {
    try (XSSFWorkbook workbook = new XSSFWorkbook();
        OutputStream out = Files.newOutputStream(file)) {
      sheets.forEach(
          (name, rows) -> {
            Sheet sheet = workbook.createSheet(name);
            for (int r = 0; r < rows.size(); r++) {
              Row row = sheet.createRow(r);
              Object[] cells = rows.get(r);
              for (int c = 0; c < cells.length; c++) {
                fill(row, c, cells[c]);
              }
            }
          });
      workbook.getProperties().getCoreProperties().setCreated("2026-01-01T00:00:00Z");
      workbook.write(out);
    } catch (IOException | org.apache.poi.openxml4j.exceptions.InvalidFormatException refused) {
      throw new IllegalStateException(refused);
    }
    return file;
  }

  private static void fill(Row row, int column, Object value) {
    if (value == null) {
      return;
    }
    Cell cell = row.createCell(column);
    if (value instanceof Number number) {
      cell.setCellValue(number.doubleValue());
    } else if (value instanceof Boolean truth) {
      cell.setCellValue(truth);
    } else {
      cell.setCellValue(value.toString());
    }
  }
}
