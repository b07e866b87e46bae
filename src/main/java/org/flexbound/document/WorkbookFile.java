package org.flexbound.document;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.apache.poi.EmptyFileException;
import org.apache.poi.EncryptedDocumentException;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.CellType;
import org.apache.poi.ss.usermodel.DateUtil;
import org.apache.poi.ss.usermodel.FormulaError;
import org.apache.poi.ss.usermodel.Workbook;
import org.apache.poi.ss.usermodel.WorkbookFactory;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;

/** Opens a workbook (.xlsx or .xls); formulas count by their cached value. */
public final class WorkbookFile implements SheetFile {
  private final String name;
  private final List<Sheet> sheets;

  private WorkbookFile(String name, Workbook workbook) {
    this.name = name;
    List<Sheet> list = new ArrayList<>();
    for (org.apache.poi.ss.usermodel.Sheet sheet : workbook) {
      list.add(new PoiSheet(name, sheet));
    }
    this.sheets = List.copyOf(list);
  }

  /**
   * Opens a workbook.
   *
   * @param file where it lies
   * @param shownName its name in messages
   * @return the sheets, or the findings that say why there are none
   */
  public static Outcome<SheetFile> open(Path file, String shownName) {
    Findings findings = new Findings();
    Where whole = Where.file(shownName);
    if (!Files.exists(file)) {
      findings.add(DocumentFinding.MISSING, whole, "there is no such file");
      return Outcome.none(findings.list());
    }
    if (!Files.isRegularFile(file)) {
      findings.add(DocumentFinding.UNREADABLE, whole, "found a folder; expected a workbook");
      return Outcome.none(findings.list());
    }
    try (Workbook workbook = WorkbookFactory.create(file.toFile(), null, true)) {
      return Outcome.of(new WorkbookFile(shownName, workbook), findings.list());
    } catch (EmptyFileException empty) {
      findings.add(
          DocumentFinding.UNREADABLE, whole, "the file is empty; expected a workbook (.xlsx)");
    } catch (EncryptedDocumentException encrypted) {
      findings.add(
          DocumentFinding.UNREADABLE, whole, "the workbook is protected by a password");
    } catch (IOException refused) {
      if (!Files.isReadable(file)) {
        throw new UncheckedIOException(refused);
      }
      findings.add(
          DocumentFinding.UNREADABLE,
          whole,
          "this is not a workbook that can be read (" + refused.getMessage() + ")");
    } catch (RuntimeException damaged) {
      findings.add(
          DocumentFinding.UNREADABLE, whole, "the workbook is damaged (" + damaged + ")");
    }
    return Outcome.none(findings.list());
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public List<Sheet> sheets() {
    return sheets;
  }

  @Override
  public void close() {
    // everything was read at opening
  }

  private record PoiSheet(String file, org.apache.poi.ss.usermodel.Sheet sheet) implements Sheet {
    @Override
    public String name() {
      return sheet.getSheetName();
    }

    @Override
    public Where where() {
      return Where.sheet(file, sheet.getSheetName());
    }

    @Override
    public void forEachRow(RowVisitor visitor) {
      CellRow row = new CellRow(file, sheet.getSheetName());
      for (org.apache.poi.ss.usermodel.Row source : sheet) {
        row.begin(source.getRowNum() + 1);
        for (Cell cell : source) {
          fill(row, cell);
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
          if (DateUtil.isCellDateFormatted(cell)) {
            row.set(column, CellKind.DATE, cell.getLocalDateTimeCellValue().toString(), value);
          } else {
            row.set(column, CellKind.NUMBER, number(value), value);
          }
        }
        case STRING -> {
          String text = cell.getStringCellValue().strip();
          if (!text.isEmpty()) {
            row.set(column, CellKind.TEXT, text, Double.NaN);
          }
        }
        case BOOLEAN ->
            row.set(
                column, CellKind.TRUTH, cell.getBooleanCellValue() ? "TRUE" : "FALSE", Double.NaN);
        case ERROR ->
            row.set(
                column,
                CellKind.ERROR,
                FormulaError.forInt(cell.getErrorCellValue()).getString(),
                Double.NaN);
        default -> {
          // blank
        }
      }
    }

    private static String number(double value) {
      return value == Math.rint(value) && Math.abs(value) < 1e15
          ? String.valueOf((long) value)
          : String.valueOf(value);
    }
  }
}
