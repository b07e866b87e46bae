package org.flexbound.document;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.apache.poi.EncryptedDocumentException;
import org.apache.poi.hssf.OldExcelFormatException;
import org.apache.poi.hssf.usermodel.HSSFWorkbook;
import org.apache.poi.poifs.filesystem.POIFSFileSystem;
import org.apache.poi.ss.usermodel.Workbook;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;

/** An .xls workbook (65 536 rows at most), held in memory. */
final class LegacyWorkbook implements SheetFile {
  private final String name;
  private final List<Sheet> sheets;

  private LegacyWorkbook(String name, List<Sheet> sheets) {
    this.name = name;
    this.sheets = List.copyOf(sheets);
  }

  static Outcome<SheetFile> open(Path file, String name, ReadLimits limits, Findings findings) {
    Where whole = Where.file(name);
    try (POIFSFileSystem system = new POIFSFileSystem(file.toFile(), true)) {
      if (system.getRoot().hasEntry("EncryptedPackage")) {
        findings.add(
            DocumentFinding.PROTECTED, whole, "the workbook is encrypted and asks for a password");
        return Outcome.none(findings.list());
      }
      try (Workbook workbook = new HSSFWorkbook(system)) {
        if (workbook.getNumberOfSheets() > limits.sheets()) {
          findings.add(
              DocumentFinding.LIMIT, whole, LimitedStream.message("sheets", limits.sheets()));
          return Outcome.none(findings.list());
        }
        if (system.getRoot().hasEntry("_VBA_PROJECT_CUR")) {
          findings.add(
              DocumentFinding.MACROS, whole, "the workbook holds macros; they were not run");
        }
        List<Sheet> sheets = new ArrayList<>();
        for (int i = 0; i < workbook.getNumberOfSheets(); i++) {
          boolean hidden = workbook.isSheetHidden(i) || workbook.isSheetVeryHidden(i);
          sheets.add(new LegacySheet(name, workbook.getSheetAt(i), hidden));
        }
        return Outcome.of(new LegacyWorkbook(name, sheets), findings.list());
      }
    } catch (EncryptedDocumentException encrypted) {
      findings.add(
          DocumentFinding.PROTECTED, whole, "the workbook is encrypted and asks for a password");
    } catch (OldExcelFormatException old) {
      findings.add(
          DocumentFinding.UNREADABLE,
          whole,
          "found a workbook in a format older than 1997; expected .xlsx");
    } catch (IOException | RuntimeException damaged) {
      findings.add(
          DocumentFinding.UNREADABLE,
          whole,
          "found a compound file that is not a whole .xls workbook; expected a workbook (.xlsx)");
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
}
