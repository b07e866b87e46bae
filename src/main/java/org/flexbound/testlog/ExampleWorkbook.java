package org.flexbound.testlog;

import java.io.IOException;
import java.io.OutputStream;
import java.util.List;
import org.apache.poi.ss.usermodel.Row;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;

/**
 * Writes a small filled load-test workbook that reads as it stands: a bracket arm on a bolted wall
 * plate, one jack moved between two points. The readings are invented, and say so.
 */
public final class ExampleWorkbook {
  /** Invented flexibility, mm/kN: gauges mid and tip, loads mid and tip. */
  private static final double[][] FLEXIBILITY = {{2.337, 4.949}, {4.949, 11.552}};

  private static final double[] LOADS = {0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.4, 0.3, 0.2, 0.1, 0};

  private ExampleWorkbook() {}

  /**
   * Writes the workbook.
   *
   * @param out where to; not closed
   * @throws IOException where the system refuses
   */
  public static void write(OutputStream out) throws IOException {
    try (XSSFWorkbook workbook = new XSSFWorkbook()) {
      table(
          workbook,
          SheetLayout.TEST,
          List.of(
              new Object[] {"Title", "Bracket arm on a wall plate (invented readings)"},
              new Object[] {"Article", "bracket arm"},
              new Object[] {"Fixture", "concrete wall"},
              new Object[] {"Date", "2026-01-15"},
              new Object[] {"Length unit", "mm"},
              new Object[] {"Notes", "Invented: an example to start from."}),
          "Item",
          "Entry");
      table(
          workbook,
          SheetLayout.INSTRUMENTS,
          List.of(
              new Object[] {"Cell", "load cell", "1001", "C-17", 0.5, 0.4, "N", "k=2", 0.1},
              new Object[] {"Dials", "dial gauge", "2001", "C-18", 0.4, 0.002, "mm", "k=2", 0.001}),
          "Instrument",
          "Kind",
          "Serial",
          "Calibration reference",
          "Uncertainty of reading (%)",
          "Uncertainty fixed",
          "Unit",
          "As stated",
          "Resolution");
      table(
          workbook,
          SheetLayout.LOAD_POINTS,
          List.of(
              new Object[] {"mid down", "mid", "-z", "Jack", "kN", "Cell", 0.6, 500, 0, 0},
              new Object[] {"tip down", "tip", "-z", "Jack", "kN", "Cell", 0.6, 1000, 0, 0}),
          "Load",
          "Node",
          "Direction",
          "Column",
          "Unit",
          "Instrument",
          "Limit",
          "X",
          "Y",
          "Z");
      table(
          workbook,
          SheetLayout.GAUGES,
          List.of(
              new Object[] {"mid", "displacement", "mid", "-z", "Dial mid", "mm", "Dials"},
              new Object[] {"tip", "displacement", "tip", "-z", "Dial tip", "mm", "Dials"}),
          "Gauge",
          "Kind",
          "Node",
          "Direction",
          "Column",
          "Unit",
          "Instrument");
      table(
          workbook,
          SheetLayout.LIMITS,
          List.of(
              new Object[] {"tip not too soft", "coefficient", "tip", "tip down", 12, "mm/kN"},
              new Object[] {"no play", "hysteresis", "", "", 5, "%"}),
          "Limit",
          "On",
          "Gauge",
          "Load",
          "Upper",
          "Unit");
      runs(workbook);
      for (int run = 0; run < 6; run++) {
        readings(workbook, run);
      }
      workbook.write(out);
    }
  }

  private static String sheetName(int run) {
    return (run % 2 == 0 ? "Mid " : "Tip ") + (run / 2 + 1);
  }

  private static void runs(XSSFWorkbook workbook) {
    Sheet sheet = workbook.createSheet(SheetLayout.RUNS.name());
    fill(sheet, 0, "Run", "Sheet", "Column", "Load or gauge");
    for (int run = 0; run < 6; run++) {
      String load = run % 2 == 0 ? "mid down" : "tip down";
      fill(sheet, run + 1, sheetName(run), sheetName(run), "Jack", load);
    }
  }

  private static void readings(XSSFWorkbook workbook, int run) {
    Sheet sheet = workbook.createSheet(sheetName(run));
    fill(sheet, 0, "Step", "Jack [kN]", "Dial mid [mm]", "Dial tip [mm]");
    int load = run % 2;
    double share = 1 + 0.003 * Math.sin(2.1 * run + 0.4);
    for (int k = 0; k < LOADS.length; k++) {
      double noise = 0.002 * Math.sin(5.3 * k + 1.7 * run);
      fill(
          sheet,
          k + 1,
          k,
          LOADS[k],
          thousandths(0.112 + FLEXIBILITY[0][load] * share * LOADS[k] + noise),
          thousandths(0.254 + FLEXIBILITY[1][load] * share * LOADS[k] - noise));
    }
  }

  private static double thousandths(double value) {
    return Math.rint(value * 1000) / 1000;
  }

  private static void table(
      XSSFWorkbook workbook, SheetLayout layout, List<Object[]> rows, String... columns) {
    Sheet sheet = workbook.createSheet(layout.name());
    fill(sheet, 0, (Object[]) columns);
    for (int r = 0; r < rows.size(); r++) {
      fill(sheet, r + 1, rows.get(r));
    }
  }

  private static void fill(Sheet sheet, int number, Object... cells) {
    Row row = sheet.createRow(number);
    for (int c = 0; c < cells.length; c++) {
      if (cells[c] instanceof Number value) {
        row.createCell(c).setCellValue(value.doubleValue());
      } else {
        row.createCell(c).setCellValue(String.valueOf(cells[c]));
      }
      sheet.setColumnWidth(c, 16 * 256);
    }
    if (number == 0) {
      sheet.createFreezePane(0, 1);
    }
  }
}
