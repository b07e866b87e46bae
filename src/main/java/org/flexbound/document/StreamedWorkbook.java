package org.flexbound.document;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.apache.poi.UnsupportedFileFormatException;
import org.apache.poi.openxml4j.exceptions.OpenXML4JException;
import org.apache.poi.openxml4j.opc.OPCPackage;
import org.apache.poi.openxml4j.opc.PackageAccess;
import org.apache.poi.openxml4j.opc.PackagePart;
import org.apache.poi.xssf.eventusermodel.ReadOnlySharedStringsTable;
import org.apache.poi.xssf.eventusermodel.XSSFReader;
import org.apache.poi.xssf.model.SharedStrings;
import org.apache.poi.xssf.usermodel.XSSFRelation;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;
import org.xml.sax.SAXException;

/**
 * An .xlsx workbook of which only the shared texts are held in memory; the sheets are streamed anew
 * for each visit.
 */
final class StreamedWorkbook implements SheetFile {
  private static final String MACROS = "application/vnd.ms-office.vbaProject";

  private final String name;
  private final List<Sheet> sheets;

  private StreamedWorkbook(String name, List<Sheet> sheets) {
    this.name = name;
    this.sheets = List.copyOf(sheets);
  }

  static Outcome<SheetFile> open(Path file, String name, ReadLimits limits, Findings findings) {
    Where whole = Where.file(name);
    try (OPCPackage opened = OPCPackage.open(file.toFile(), PackageAccess.READ)) {
      List<Sheet> sheets = sheets(opened, file, name, limits, findings);
      if (sheets.isEmpty() && !findings.hasErrors()) {
        findings.add(DocumentFinding.UNREADABLE, whole, "the workbook has no sheet with cells");
      }
      if (!findings.hasErrors()) {
        return Outcome.of(new StreamedWorkbook(name, sheets), findings.list());
      }
    } catch (LimitedStream.Passed passed) {
      findings.add(DocumentFinding.LIMIT, whole, WorkbookFile.words(passed));
    } catch (UnsupportedFileFormatException other) {
      findings.add(
          DocumentFinding.UNREADABLE,
          whole,
          "found a zip archive that is not an .xlsx workbook (perhaps an .ods, a text document or a"
              + " plain archive); expected a workbook (.xlsx)");
    } catch (SheetXml.Damaged damaged) {
      findings.add(
          DocumentFinding.UNREADABLE, whole, "the workbook is damaged: " + damaged.getMessage());
    } catch (IOException | OpenXML4JException | SAXException | RuntimeException damaged) {
      findings.add(
          limit(damaged) ? DocumentFinding.LIMIT : DocumentFinding.UNREADABLE,
          whole,
          limit(damaged)
              ? "the archive unpacks to far more than its size, or has more parts than is read:"
                  + " "
                  + LimitedStream.message("inflated-bytes", limits.inflatedBytes())
              : "the workbook is damaged, cut short or not a workbook at all; expected a whole"
                  + " workbook (.xlsx)");
    }
    return Outcome.none(findings.list());
  }

  /** Whether the library's own guard against packed bombs spoke. */
  private static boolean limit(Exception problem) {
    for (Throwable cause = problem; cause != null; cause = cause.getCause()) {
      String message = String.valueOf(cause.getMessage());
      if (message.contains("Zip bomb") || message.contains("more internal file entries")) {
        return true;
      }
    }
    return false;
  }

  private static List<Sheet> sheets(
      OPCPackage opened, Path file, String name, ReadLimits limits, Findings findings)
      throws IOException, OpenXML4JException, SAXException {
    XSSFReader reader = new XSSFReader(opened);
    WorkbookParts parts = new WorkbookParts();
    try (InputStream in = limited(reader.getWorkbookData(), limits)) {
      SheetXml.parse(in, parts);
    }
    CellFormats formats = new CellFormats();
    for (PackagePart part : opened.getPartsByContentType(XSSFRelation.STYLES.getContentType())) {
      try (InputStream in = limited(part.getInputStream(), limits)) {
        SheetXml.parse(in, formats);
      }
    }
    SharedStrings strings = new ReadOnlySharedStringsTable(InputStream.nullInputStream());
    for (PackagePart part :
        opened.getPartsByContentType(XSSFRelation.SHARED_STRINGS.getContentType())) {
      try (InputStream in = limited(part.getInputStream(), limits)) {
        strings = new ReadOnlySharedStringsTable(in, false);
      }
    }
    notes(opened, parts, Where.file(name), findings);
    StreamedSheet.Shared shared =
        new StreamedSheet.Shared(strings, formats.looks(), parts.from1904(), limits);
    List<Sheet> sheets = new ArrayList<>();
    XSSFReader.SheetIterator all = reader.getSheetIterator();
    while (all.hasNext()) {
      all.next().close();
      String sheet = all.getSheetName();
      String part = all.getSheetPart().getPartName().getName().substring(1);
      sheets.add(new StreamedSheet(file, name, sheet, part, parts.isHidden(sheet), shared));
      if (sheets.size() > limits.sheets()) {
        findings.add(
            DocumentFinding.LIMIT,
            Where.file(name),
            LimitedStream.message("sheets", limits.sheets()));
        return List.of();
      }
    }
    return sheets;
  }

  /** A part that is held in memory. */
  private static InputStream limited(InputStream part, ReadLimits limits) {
    return new LimitedStream(part, limits.sharedTextBytes(), "shared-text-bytes");
  }

  private static void notes(
      OPCPackage opened, WorkbookParts parts, Where whole, Findings findings) {
    if (!opened.getPartsByContentType(MACROS).isEmpty()) {
      findings.add(DocumentFinding.MACROS, whole, "the workbook holds macros; they were not run");
    }
    if (parts.external()) {
      findings.add(
          DocumentFinding.EXTERNAL_LINKS,
          whole,
          "the workbook takes values from other workbooks; the values last stored were used");
    }
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
    // no file stays open between visits
  }
}
