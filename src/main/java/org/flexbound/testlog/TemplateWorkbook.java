package org.flexbound.testlog;

import java.io.IOException;
import java.io.OutputStream;
import java.util.List;
import java.util.Map;
import org.apache.poi.ss.usermodel.CellStyle;
import org.apache.poi.ss.usermodel.DataValidation;
import org.apache.poi.ss.usermodel.DataValidationConstraint;
import org.apache.poi.ss.usermodel.DataValidationHelper;
import org.apache.poi.ss.usermodel.FillPatternType;
import org.apache.poi.ss.usermodel.Font;
import org.apache.poi.ss.usermodel.IndexedColors;
import org.apache.poi.ss.usermodel.Row;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.ss.util.CellRangeAddressList;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.Units;

/** Writes the blank load-test workbook from the definitions that the reader uses. */
public final class TemplateWorkbook {
  /** Rows below the header that get drop-down lists. */
  private static final int ROWS = 200;

  private static final List<String> CAUTIONS =
      List.of(
          "Load tests can kill. A competent person is in charge; local codes and licensed practice"
              + " come first.",
          "A loaded structure stores energy and may let go without warning: keep everybody out of"
              + " the danger zone and out of line with rods, cables and jacks; read from afar.",
          "Hold the load below the stated limit at all times; fit a relief valve or load limiter.",
          "Catch the structure and the weights close below; use rated rigging only.",
          "Agree in writing on load stages, hold times and stop criteria before force is applied.",
          "Stop when a deflection passes its prediction, the slope softens, a reading drifts at held"
              + " load, something slips, cracks or is heard, or a gauge that guards a limit is"
              + " lost.",
          "A fitted stiffness is no proof of strength.");

  private final XSSFWorkbook workbook = new XSSFWorkbook();
  private final CellStyle header;
  private final CellStyle help;

  private TemplateWorkbook() {
    Font bold = workbook.createFont();
    bold.setBold(true);
    header = workbook.createCellStyle();
    header.setFont(bold);
    header.setFillForegroundColor(IndexedColors.GREY_25_PERCENT.getIndex());
    header.setFillPattern(FillPatternType.SOLID_FOREGROUND);
    header.setWrapText(true);
    Font italic = workbook.createFont();
    italic.setItalic(true);
    help = workbook.createCellStyle();
    help.setFont(italic);
    help.setWrapText(true);
  }

  /**
   * Writes the blank workbook.
   *
   * @param out where to; not closed
   * @throws IOException where the system refuses
   */
  public static void write(OutputStream out) throws IOException {
    TemplateWorkbook template = new TemplateWorkbook();
    try (XSSFWorkbook workbook = template.workbook) {
      for (SheetLayout layout : SheetLayout.ALL) {
        template.entrySheet(layout);
      }
      template.readings();
      template.examples();
      workbook.write(out);
    }
  }

  private void entrySheet(SheetLayout layout) {
    Sheet sheet = workbook.createSheet(layout.name());
    Row row = sheet.createRow(0);
    for (int c = 0; c < layout.columns().size(); c++) {
      SheetLayout.Column column = layout.columns().get(c);
      row.createCell(c).setCellValue(column.name());
      row.getCell(c).setCellStyle(header);
      sheet.setColumnWidth(c, width(column.name()));
      choices(sheet, c, offered(layout, column));
    }
    sheet.createFreezePane(1, 1);
    if (layout.equals(SheetLayout.TEST)) {
      items(sheet, SheetLayout.TEST_ITEMS);
      sheet.setColumnWidth(1, 60 * 256);
    } else if (layout.equals(SheetLayout.OPTIONS)) {
      items(sheet, List.copyOf(OptionsReader.ITEMS.keySet()));
      sheet.setColumnWidth(0, 24 * 256);
    }
  }

  private static int width(String name) {
    return Math.max(12, name.length() + 3) * 256;
  }

  private static void items(Sheet sheet, List<String> items) {
    for (int k = 0; k < items.size(); k++) {
      sheet.createRow(k + 1).createCell(0).setCellValue(items.get(k));
    }
    sheet.setColumnWidth(0, 24 * 256);
  }

  /** What a drop-down list of the column offers; empty for none. */
  private static List<String> offered(SheetLayout layout, SheetLayout.Column column) {
    if (!column.choices().isEmpty()) {
      return column.choices();
    }
    return switch (column.name()) {
      case "Direction" -> List.of("+x", "-x", "+y", "-y", "+z", "-z", "rx", "ry", "rz");
      case "Unit" ->
          layout.equals(SheetLayout.LOAD_POINTS)
              ? Units.spellings(Dimension.FORCE)
              : layout.equals(SheetLayout.GAUGES)
                  ? Units.spellings(Dimension.LENGTH)
                  : List.of();
      default -> List.of();
    };
  }

  private static void choices(Sheet sheet, int column, List<String> words) {
    if (words.isEmpty()) {
      return;
    }
    DataValidationHelper helper = sheet.getDataValidationHelper();
    DataValidationConstraint constraint =
        helper.createExplicitListConstraint(words.toArray(String[]::new));
    DataValidation validation =
        helper.createValidation(
            constraint, new CellRangeAddressList(1, ROWS, column, column));
    // the list offers; other spellings that the program knows are allowed
    validation.setErrorStyle(DataValidation.ErrorStyle.INFO);
    validation.setSuppressDropDownArrow(true);
    sheet.addValidationData(validation);
  }

  private void readings() {
    Sheet sheet = workbook.createSheet("Readings");
    Row row = sheet.createRow(0);
    List<String> columns = List.of("Time [s]", "Step", "Use", "Remark");
    for (int c = 0; c < columns.size(); c++) {
      row.createCell(c).setCellValue(columns.get(c));
      row.getCell(c).setCellStyle(header);
      sheet.setColumnWidth(c, 12 * 256);
    }
    choices(sheet, 2, List.of("yes", "no"));
    sheet.createFreezePane(0, 1);
  }

  private void examples() {
    Sheet sheet = workbook.createSheet("Examples");
    sheet.setColumnWidth(0, 28 * 256);
    sheet.setColumnWidth(1, 90 * 256);
    int next = 0;
    next = title(sheet, next, "This sheet is not read.");
    next = title(sheet, next, "Before the test");
    for (String caution : CAUTIONS) {
      next = line(sheet, next, "", caution);
    }
    for (SheetLayout layout : SheetLayout.ALL) {
      next = title(sheet, next + 1, "Sheet " + layout.name());
      next = line(sheet, next, "", layout.help());
      for (SheetLayout.Column column : layout.columns()) {
        next =
            line(
                sheet,
                next,
                column.name() + (column.required() ? " (needed)" : ""),
                column.help()
                    + (column.choices().isEmpty()
                        ? ""
                        : ": " + String.join(", ", column.choices())));
      }
      if (layout.equals(SheetLayout.OPTIONS)) {
        for (Map.Entry<String, String> item : OptionsReader.ITEMS.entrySet()) {
          next = line(sheet, next, item.getKey(), item.getValue());
        }
      }
    }
    next = title(sheet, next + 1, "Sheets of readings");
    next =
        line(
            sheet,
            next,
            "any other name",
            "A header row that names at least one load column and one gauge column, as on the sheets"
                + " Load points and Gauges, with units in brackets or in the row below; then one row"
                + " a reading. The columns Time, Step, Use and Remark are optional.");
    next = title(sheet, next + 1, "An example: a cantilever pulled down at its tip");
    for (String[] example : EXAMPLE) {
      next = line(sheet, next, example[0], example[1]);
    }
  }

  private static final String[][] EXAMPLE = {
    {"Instruments", "Cell 1 | load cell | 1001 | C-17 | 2026-01-10 | 0.5 | 2 | N | k=2 | 1"},
    {"Instruments", "Dial 1 | dial gauge | 2001 | C-18 | 2026-01-10 | 0.2 | 0.002 | mm | k=2 | 0.001"},
    {"Load points", "tip down | tip | -z | Jack | kN | Cell 1"},
    {"Gauges", "tip | displacement | tip | | -z | Dial tip | mm | Dial 1 | article | ground"},
    {"Readings", "Step | Jack [kN] | Dial tip [mm]"},
    {"Readings", "0 | 0.00 | 0.000"},
    {"Readings", "1 | 0.50 | 1.271"},
  };

  private int title(Sheet sheet, int row, String text) {
    Row created = sheet.createRow(row);
    created.createCell(0).setCellValue(text);
    created.getCell(0).setCellStyle(header);
    return row + 1;
  }

  private int line(Sheet sheet, int row, String name, String text) {
    Row created = sheet.createRow(row);
    created.createCell(0).setCellValue(name);
    created.createCell(1).setCellValue(text);
    created.getCell(1).setCellStyle(help);
    return row + 1;
  }
}
