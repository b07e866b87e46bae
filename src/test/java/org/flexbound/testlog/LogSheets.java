package org.flexbound.testlog;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.Row;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;

/** Changes copies of a log's workbook, for tests. */
public final class LogSheets {
  private static final List<String> DESCRIBING =
      List.of("Test", "Instruments", "Load points", "Gauges", "Options");

  private LogSheets() {}

  /** A change of a workbook. */
  @FunctionalInterface
  private interface Change {
    void make(XSSFWorkbook workbook);
  }

  private static void copy(Path from, Path to, Change change) throws IOException {
    try (InputStream in = Files.newInputStream(from);
        XSSFWorkbook workbook = new XSSFWorkbook(in);
        OutputStream out = Files.newOutputStream(to)) {
      change.make(workbook);
      workbook.write(out);
    }
  }

  /** The log as it stands before its test: no sheet of readings, no runs; limits of loads if wanted. */
  public static void withoutReadings(Path from, Path to, boolean limits) throws IOException {
    copy(
        from,
        to,
        workbook -> {
          for (int i = workbook.getNumberOfSheets() - 1; i >= 0; i--) {
            if (!DESCRIBING.contains(workbook.getSheetName(i))) {
              workbook.removeSheetAt(i);
            }
          }
          if (!limits) {
            Sheet loads = workbook.getSheet("Load points");
            int column = column(loads.getRow(0), "Limit");
            for (int r = 1; r <= loads.getLastRowNum(); r++) {
              Row row = loads.getRow(r);
              if (row != null && row.getCell(column) != null) {
                row.removeCell(row.getCell(column));
              }
            }
          }
        });
  }

  /** A log without options, with one stated. */
  public static void withOption(Path from, Path to, String item, double entry)
      throws IOException {
    copy(
        from,
        to,
        workbook -> {
          Sheet options = workbook.createSheet("Options");
          Row header = options.createRow(0);
          header.createCell(0).setCellValue("Item");
          header.createCell(1).setCellValue("Entry");
          Row row = options.createRow(1);
          row.createCell(0).setCellValue(item);
          row.createCell(1).setCellValue(entry);
        });
  }

  private static int column(Row header, String name) {
    for (Cell cell : header) {
      if (cell.getStringCellValue()
          .toLowerCase(Locale.ROOT)
          .startsWith(name.toLowerCase(Locale.ROOT))) {
        return cell.getColumnIndex();
      }
    }
    throw new IllegalArgumentException("no column " + name);
  }
}
