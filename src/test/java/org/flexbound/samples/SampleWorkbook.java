package org.flexbound.samples;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Date;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.FillPatternType;
import org.apache.poi.ss.usermodel.IndexedColors;
import org.apache.poi.ss.usermodel.Row;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.xssf.usermodel.XSSFCellStyle;
import org.apache.poi.xssf.usermodel.XSSFFont;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;

/** A workbook of rows of texts and numbers with a header row each, as somebody would fill it in. */
final class SampleWorkbook {
  private final Map<String, List<Object[]>> sheets = new LinkedHashMap<>();

  /**
   * Adds a row; the first of a sheet is its header.
   *
   * @param sheet the sheet
   * @param cells String, Number or null for blank
   */
  void row(String sheet, Object... cells) {
    sheets.computeIfAbsent(sheet, unused -> new ArrayList<>()).add(cells);
  }

  void write(Path file) {
    try (XSSFWorkbook workbook = new XSSFWorkbook();
        OutputStream out = Files.newOutputStream(file)) {
      XSSFCellStyle header = header(workbook);
      sheets.forEach((name, rows) -> fill(workbook.createSheet(name), rows, header));
      workbook
          .getProperties()
          .getCoreProperties()
          .setCreated(Optional.of(Date.from(Instant.EPOCH)));
      workbook.write(out);
    } catch (IOException refused) {
      throw new java.io.UncheckedIOException(refused);
    }
  }

  private static XSSFCellStyle header(XSSFWorkbook workbook) {
    XSSFFont bold = workbook.createFont();
    bold.setBold(true);
    XSSFCellStyle style = workbook.createCellStyle();
    style.setFont(bold);
    style.setFillForegroundColor(IndexedColors.GREY_25_PERCENT.getIndex());
    style.setFillPattern(FillPatternType.SOLID_FOREGROUND);
    return style;
  }

  private static void fill(Sheet sheet, List<Object[]> rows, XSSFCellStyle header) {
    int[] widths = new int[rows.get(0).length];
    for (int r = 0; r < rows.size(); r++) {
      Row row = sheet.createRow(r);
      for (int c = 0; c < rows.get(r).length; c++) {
        Object value = rows.get(r)[c];
        if (value == null) {
          continue;
        }
        Cell cell = row.createCell(c);
        if (value instanceof Number number) {
          cell.setCellValue(number.doubleValue());
        } else {
          cell.setCellValue((String) value);
        }
        if (r == 0) {
          cell.setCellStyle(header);
        }
        widths[c] = Math.max(widths[c], Math.min(60, value.toString().length()));
      }
    }
    for (int c = 0; c < widths.length; c++) {
      sheet.setColumnWidth(c, 256 * (widths[c] + 3));
    }
    sheet.createFreezePane(0, 1);
  }

  /**
   * What a workbook holds, without its looks.
   *
   * @param file the workbook
   * @return the rows of each sheet, as texts and numbers
   */
  static Map<String, List<List<Object>>> content(Path file) throws IOException {
    Map<String, List<List<Object>>> result = new LinkedHashMap<>();
    try (InputStream in = Files.newInputStream(file);
        XSSFWorkbook workbook = new XSSFWorkbook(in)) {
      for (Sheet sheet : workbook) {
        List<List<Object>> rows = new ArrayList<>();
        for (Row row : sheet) {
          List<Object> cells = new ArrayList<>();
          for (int c = 0; c < row.getLastCellNum(); c++) {
            Cell cell = row.getCell(c);
            cells.add(
                cell == null
                    ? ""
                    : switch (cell.getCellType()) {
                      case NUMERIC -> cell.getNumericCellValue();
                      case STRING -> cell.getStringCellValue();
                      default -> cell.toString();
                    });
          }
          rows.add(cells);
        }
        result.put(sheet.getSheetName(), rows);
      }
    }
    return result;
  }
}
