package org.flexbound.frame;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.apache.poi.ss.usermodel.CellStyle;
import org.apache.poi.ss.usermodel.DataValidation;
import org.apache.poi.ss.usermodel.DataValidationHelper;
import org.apache.poi.ss.usermodel.FillPatternType;
import org.apache.poi.ss.usermodel.Font;
import org.apache.poi.ss.usermodel.IndexedColors;
import org.apache.poi.ss.usermodel.Row;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.ss.util.CellRangeAddressList;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.document.Json;
import org.flexbound.document.WorkbookBytes;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;

/**
 * Writes a model as a workbook, one sheet for each key: the user's own entries and units as they were
 * read, factors where stiffnesses were set. {@link FrameReader} reads it back to an equal model.
 *
 * <p>What a cell cannot hold is told: notes that are not a text. Empty objects ({@code "offsets": {}})
 * are left out, which means the same.
 */
public final class FrameWorkbook {
  private static final int ROWS = 500;

  private final XSSFWorkbook workbook = new XSSFWorkbook();
  private final Findings findings = new Findings();
  private final Json.Members tree;
  private final DeclaredUnits units;
  private final CellStyle header;

  private FrameWorkbook(FrameModel model) {
    tree = FrameWriter.tree(model);
    units = model.units();
    Font bold = workbook.createFont();
    bold.setBold(true);
    header = workbook.createCellStyle();
    header.setFont(bold);
    header.setFillForegroundColor(IndexedColors.GREY_25_PERCENT.getIndex());
    header.setFillPattern(FillPatternType.SOLID_FOREGROUND);
    header.setWrapText(true);
  }

  /**
   * A workbook's bytes.
   *
   * @param bytes of the .xlsx file; the same model gives the same bytes
   * @param findings what could not be written
   */
  @SuppressWarnings("ArrayRecordComponent") // handed over once, to be written
  public record Written(byte[] bytes, List<Finding> findings) {
    /** Copies the list. */
    public Written {
      findings = List.copyOf(findings);
    }
  }

  /**
   * Writes a model.
   *
   * @param model the model
   * @return the workbook, with what a cell cannot hold
   */
  public static Written write(FrameModel model) {
    return new FrameWorkbook(model).write();
  }

  private Written write() {
    try (XSSFWorkbook open = workbook) {
      units();
      ModelSheet.ALL.forEach(this::table);
      return new Written(WorkbookBytes.of(open), findings.list());
    } catch (IOException memory) {
      throw new UncheckedIOException(memory);
    }
  }

  private Sheet sheet(String name, List<String> headers) {
    Sheet sheet = workbook.createSheet(name);
    Row row = sheet.createRow(0);
    for (int c = 0; c < headers.size(); c++) {
      row.createCell(c).setCellValue(headers.get(c));
      row.getCell(c).setCellStyle(header);
      sheet.setColumnWidth(c, Math.max(10, headers.get(c).length() + 2) * 256);
    }
    sheet.createFreezePane(1, 1);
    return sheet;
  }

  private void units() {
    Sheet sheet = sheet(ModelSheet.UNITS, List.of(ModelSheet.ITEM, ModelSheet.ENTRY));
    sheet.setColumnWidth(1, 40 * 256);
    int next = 1;
    Optional<Json> stated = tree.get(ModelSheet.UNITS);
    for (String item : ModelSheet.UNIT_ITEMS) {
      Optional<Json> entry =
          stated.flatMap(u -> u instanceof Json.Members m ? m.get(item) : Optional.empty());
      Row row = sheet.createRow(next++);
      row.createCell(0).setCellValue(item);
      entry.ifPresent(value -> cell(row, 1, value));
    }
    for (String item : ModelSheet.OTHER_ITEMS) {
      Row row = sheet.createRow(next++);
      row.createCell(0).setCellValue(item);
      tree.get(item)
          .ifPresent(
              value -> {
                if (value instanceof Json.Text text && !text.text().isBlank()) {
                  cell(row, 1, value);
                } else if (item.equals("up")) {
                  directionCell(row, 1, value);
                } else {
                  lost(value.where(), "'" + item + "' is not a text");
                }
              });
    }
  }

  private void lost(Where where, String what) {
    findings.add(
        FrameFinding.NOT_IN_WORKBOOK, where, what + ", which a cell cannot hold: left out");
  }

  private void table(ModelSheet layout) {
    List<String> headers = new ArrayList<>();
    for (String name : layout.headers()) {
      headers.add(name);
    }
    int first = headers.size() - layout.columns().size();
    for (int c = 0; c < layout.columns().size(); c++) {
      String unit = layout.columns().get(c).measure().declaredSymbol(units);
      if (!unit.isEmpty() && layout.columns().get(c).form() == ModelSheet.Form.VALUE) {
        headers.set(first + c, headers.get(first + c) + " [" + unit + "]");
      }
    }
    Sheet sheet = sheet(layout.key(), headers);
    for (int c = 0; c < layout.columns().size(); c++) {
      choices(sheet, first + c, layout.columns().get(c).choices());
    }
    if (layout.holdsMatrices()) {
      choices(sheet, 1, SpringReader.keys());
    }
    Optional<Json> table = tree.get(layout.key());
    int next = 1;
    if (table.isPresent() && table.get() instanceof Json.Members named) {
      for (Map.Entry<String, Json> entry : named.members().entrySet()) {
        next = named(sheet, next, layout, first, entry.getKey(), entry.getValue());
      }
    } else if (table.isPresent() && table.get() instanceof Json.Items items) {
      for (Json item : items.items()) {
        entry(sheet.createRow(next++), layout, first, item);
      }
    }
  }

  private int named(
      Sheet sheet, int next, ModelSheet layout, int first, String name, Json entry) {
    int at = next;
    boolean matrix = layout.holdsMatrices() && follow(entry, List.of("matrix")).isPresent();
    boolean factors = matrix && follow(entry, List.of("factors")).isPresent();
    if (!matrix || factors) {
      Row row = sheet.createRow(at++);
      row.createCell(0).setCellValue(name);
      entry(row, layout, first, entry);
    }
    for (int r = 0; matrix && r < 6; r++) {
      Row row = sheet.createRow(at++);
      row.createCell(0).setCellValue(name);
      row.createCell(1).setCellValue(SpringReader.keys().get(r));
      for (int c = 0; c < 6; c++) {
        int column = first + c;
        follow(entry, List.of("matrix", String.valueOf(r), String.valueOf(c)))
            .ifPresent(value -> cell(row, column, value));
      }
    }
    return at;
  }

  private void entry(Row row, ModelSheet layout, int first, Json entry) {
    for (int c = 0; c < layout.columns().size(); c++) {
      ModelSheet.Column column = layout.columns().get(c);
      int at = first + c;
      follow(entry, column.path())
          .ifPresent(
              value -> {
                if (column.form() == ModelSheet.Form.DIRECTION) {
                  directionCell(row, at, value);
                } else {
                  cell(row, at, value);
                }
              });
    }
  }

  private static Optional<Json> follow(Json from, List<String> path) {
    Json at = from;
    for (String step : path) {
      Optional<Json> next = Optional.empty();
      if (at instanceof Json.Members members) {
        next = members.get(step);
      } else if (at instanceof Json.Items items && Branch.isPlace(step)) {
        int index = Integer.parseInt(step);
        next =
            index < items.items().size() ? Optional.of(items.items().get(index)) : Optional.empty();
      }
      if (next.isEmpty()) {
        return Optional.empty();
      }
      at = next.get();
    }
    return Optional.of(at);
  }

  private static void cell(Row row, int column, Json value) {
    if (value instanceof Json.Numeral number) {
      row.createCell(column).setCellValue(number.value());
    } else if (value instanceof Json.Text text) {
      row.createCell(column).setCellValue(text.text());
    }
  }

  private static void directionCell(Row row, int column, Json value) {
    if (value instanceof Json.Items items) {
      List<String> parts = new ArrayList<>();
      for (Json item : items.items()) {
        parts.add(item instanceof Json.Text text ? text.text() : item.shown());
      }
      row.createCell(column).setCellValue("(" + String.join(", ", parts) + ")");
    } else {
      cell(row, column, value);
    }
  }

  private static void choices(Sheet sheet, int column, List<String> words) {
    if (words.isEmpty()) {
      return;
    }
    DataValidationHelper helper = sheet.getDataValidationHelper();
    DataValidation validation =
        helper.createValidation(
            helper.createExplicitListConstraint(words.toArray(String[]::new)),
            new CellRangeAddressList(1, ROWS, column, column));
    // The list offers; numbers and texts with a unit are taken as well.
    validation.setErrorStyle(DataValidation.ErrorStyle.INFO);
    validation.setShowErrorBox(false);
    validation.setSuppressDropDownArrow(true);
    sheet.addValidationData(validation);
  }
}
