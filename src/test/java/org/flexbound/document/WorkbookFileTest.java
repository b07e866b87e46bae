package org.flexbound.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.catchThrowable;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;
import java.util.function.UnaryOperator;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;
import org.apache.poi.hssf.usermodel.HSSFWorkbook;
import org.apache.poi.poifs.crypt.EncryptionInfo;
import org.apache.poi.poifs.crypt.EncryptionMode;
import org.apache.poi.poifs.crypt.Encryptor;
import org.apache.poi.poifs.filesystem.POIFSFileSystem;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.CellStyle;
import org.apache.poi.ss.usermodel.FormulaError;
import org.apache.poi.ss.usermodel.Workbook;
import org.apache.poi.ss.util.CellRangeAddress;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class WorkbookFileTest {
  @TempDir Path folder;

  private Path write(String name, Workbook workbook) throws IOException {
    Path file = folder.resolve(name);
    try (OutputStream out = Files.newOutputStream(file);
        workbook) {
      workbook.write(out);
    }
    return file;
  }

  private static Workbook everyKindOfCell(Workbook workbook) {
    CellStyle date = workbook.createCellStyle();
    date.setDataFormat(workbook.createDataFormat().getFormat("dd.mm.yyyy"));
    CellStyle percent = workbook.createCellStyle();
    percent.setDataFormat(workbook.createDataFormat().getFormat("0.0%"));
    org.apache.poi.ss.usermodel.Sheet sheet = workbook.createSheet("Kraftmessung Süd");
    org.apache.poi.ss.usermodel.Row first = sheet.createRow(2);
    first.createCell(0).setCellValue("  text ");
    first.createCell(1).setCellValue(-0.1);
    Cell day = first.createCell(2);
    day.setCellValue(45000.5);
    day.setCellStyle(date);
    Cell share = first.createCell(3);
    share.setCellValue(0.125);
    share.setCellStyle(percent);
    first.createCell(4).setCellValue(true);
    first.createCell(5).setCellErrorValue(FormulaError.DIV0.getCode());
    Cell formula = first.createCell(6);
    formula.setCellFormula("B3*2");
    workbook.getCreationHelper().createFormulaEvaluator().evaluateFormulaCell(formula);
    first.createCell(30).setCellValue("12,5");
    sheet.createRow(3).createCell(1).setCellValue("   ");
    org.apache.poi.ss.usermodel.Row second = sheet.createRow(9);
    second.createCell(1).setCellValue(7);
    second.setZeroHeight(true);
    sheet.setColumnHidden(4, true);
    sheet.addMergedRegion(new CellRangeAddress(2, 2, 0, 1));
    workbook.createSheet("leer");
    workbook.createSheet("hidden one").createRow(0).createCell(0).setCellValue(1);
    workbook.setSheetHidden(2, true);
    return workbook;
  }

  private static List<String> cells(Sheet sheet) {
    List<String> all = new ArrayList<>();
    sheet.forEachRow(
        row -> {
          for (int column = 0; column < row.width(); column++) {
            if (row.kind(column) != CellKind.BLANK) {
              all.add(
                  row.where(column).cells().orElseThrow()
                      + " "
                      + row.kind(column)
                      + " "
                      + row.text(column)
                      + (row.isPercent(column) ? " percent" : "")
                      + (row.isHidden() ? " hidden" : ""));
            }
          }
          return true;
        });
    return all;
  }

  @ParameterizedTest
  @ValueSource(strings = {"log.xlsx", "Meßreihe № 1.xls"})
  void everyKindOfCellIsReadWithItsPlace(String name) throws IOException {
    Workbook made = name.endsWith("x") ? new XSSFWorkbook() : new HSSFWorkbook();
    Path file = write(name, everyKindOfCell(made));

    SheetFile read = WorkbookFile.open(file, name).orRefuse();

    assertThat(read.sheets()).extracting(Sheet::name)
        .containsExactly("Kraftmessung Süd", "leer", "hidden one");
    Sheet sheet = read.sheet(" kraftmessung süd").orElseThrow();
    assertThat(cells(sheet))
        .containsExactly(
            "A3 TEXT text",
            "B3 NUMBER -0.1",
            "C3 DATE 2023-03-15T12:00",
            "D3 NUMBER 0.125 percent",
            "E3 TRUTH TRUE",
            "F3 ERROR #DIV/0!",
            "G3 NUMBER -0.2",
            "AE3 TEXT 12,5",
            "B10 NUMBER 7 hidden");
    assertThat(cells(sheet)).as("a second visit reads the same").hasSize(9);
    assertThat(sheet.notes())
        .isEqualTo(new SheetNotes(false, 1, 10, List.of("E"), List.of("A3:B3")));
    assertThat(read.sheets().get(2).notes().hiddenSheet()).isTrue();
    Findings findings = new Findings();
    sheet.notes().report(sheet.where(), findings);
    assertThat(findings.list()).extracting(Finding::message)
        .containsExactly(
            "1 hidden row was read, the first of them row 10",
            "hidden columns were read: E",
            "found merged cells: A3:B3");
  }

  @Test
  void aVisitorMayStopAndTheFileIsFreeAfterwards() throws IOException {
    Path file = write("log.xlsx", everyKindOfCell(new XSSFWorkbook()));
    Sheet sheet = WorkbookFile.open(file, "log.xlsx").orRefuse().sheets().get(0);
    List<Integer> seen = new ArrayList<>();
    sheet.forEachRow(
        row -> {
          seen.add(row.number());
          return false;
        });
    assertThat(seen).containsExactly(3);
    Files.delete(file);
    assertThatThrownBy(() -> sheet.forEachRow(row -> true))
        .isInstanceOf(java.io.UncheckedIOException.class);
  }

  @Test
  void aFormulaThatWasNeverCalculatedIsAnErrorCell() throws IOException {
    XSSFWorkbook workbook = new XSSFWorkbook();
    workbook.createSheet("s").createRow(0).createCell(0).setCellFormula("1+1");
    Path file = write("f.xlsx", workbook);
    file = edited(file, "xl/worksheets/sheet1.xml", xml -> xml.replaceAll("<v>[^<]*</v>", ""));
    assertThat(cells(WorkbookFile.open(file, "f.xlsx").orRefuse().sheets().get(0)))
        .containsExactly("A1 ERROR (formula without a stored value)");
  }

  private void refused(Path file, DocumentFinding kind, String words) {
    Outcome<SheetFile> outcome = WorkbookFile.open(file, "given.xlsx");
    assertThat(outcome.value()).isEmpty();
    assertThat(outcome.findings()).hasSize(1);
    assertThat(outcome.findings().get(0).kind()).isEqualTo(kind);
    assertThat(outcome.findings().get(0).where()).hasToString("given.xlsx");
    assertThat(outcome.findings().get(0).message()).contains(words);
  }

  private Path bytes(byte[] content) throws IOException {
    return Files.write(folder.resolve("given.xlsx"), content);
  }

  @Test
  void whatIsNotAWorkbookIsRefusedInPlainWords() throws IOException {
    refused(folder.resolve("none.xlsx"), DocumentFinding.MISSING, "there is no such file");
    refused(folder, DocumentFinding.UNREADABLE, "found a folder; expected a workbook (.xlsx)");
    refused(bytes(new byte[0]), DocumentFinding.UNREADABLE, "the file is empty (0 bytes)");
    refused(
        bytes("Load;D1\n1;2\n".getBytes(StandardCharsets.UTF_8)),
        DocumentFinding.UNREADABLE,
        "found text; expected a workbook (.xlsx). A text file does not become a workbook");
    refused(bytes("%PDF-1.7".getBytes(StandardCharsets.UTF_8)), DocumentFinding.UNREADABLE, "found a PDF");
    refused(bytes(new byte[] {0, 1, 2, 3}), DocumentFinding.UNREADABLE, "neither text nor a workbook");
  }

  @Test
  void aZipThatIsNoWorkbookAndAHalfOneAreRefused() throws IOException {
    Path zip = folder.resolve("a.zip");
    try (ZipOutputStream out = new ZipOutputStream(Files.newOutputStream(zip))) {
      out.putNextEntry(new ZipEntry("readme.txt"));
      out.write(65);
    }
    refused(zip, DocumentFinding.UNREADABLE, "expected a w");
    byte[] whole = Files.readAllBytes(write("log.xlsx", everyKindOfCell(new XSSFWorkbook())));
    refused(bytes(java.util.Arrays.copyOf(whole, whole.length / 2)), DocumentFinding.UNREADABLE, "cut short");
    byte[] old = Files.readAllBytes(write("log.xls", everyKindOfCell(new HSSFWorkbook())));
    refused(bytes(java.util.Arrays.copyOf(old, 700)), DocumentFinding.UNREADABLE, "compound file");
  }

  @Test
  void anEncryptedWorkbookIsRefusedAsSuch() throws Exception {
    Path plain = write("log.xlsx", everyKindOfCell(new XSSFWorkbook()));
    Path secret = folder.resolve("secret.xlsx");
    try (POIFSFileSystem system = new POIFSFileSystem();
        OutputStream out = Files.newOutputStream(secret)) {
      Encryptor encryptor = new EncryptionInfo(EncryptionMode.standard).getEncryptor();
      encryptor.confirmPassword("invented");
      try (OutputStream data = encryptor.getDataStream(system)) {
        Files.copy(plain, data);
      }
      system.writeFilesystem(out);
    }
    refused(secret, DocumentFinding.PROTECTED, "is encrypted and asks for a password");
  }

  /** The same workbook with the XML of one part changed. */
  private Path edited(Path file, String part, UnaryOperator<String> change) throws IOException {
    Path changed = folder.resolve("changed.xlsx");
    try (ZipInputStream in = new ZipInputStream(Files.newInputStream(file));
        ZipOutputStream out = new ZipOutputStream(Files.newOutputStream(changed))) {
      for (ZipEntry entry = in.getNextEntry(); entry != null; entry = in.getNextEntry()) {
        out.putNextEntry(new ZipEntry(entry.getName()));
        byte[] content = in.readAllBytes();
        out.write(
            entry.getName().equals(part)
                ? change.apply(new String(content, StandardCharsets.UTF_8)).getBytes(StandardCharsets.UTF_8)
                : content);
      }
    }
    return changed;
  }

  private void sheetRefused(UnaryOperator<String> change, DocumentFinding kind, String words)
      throws IOException {
    Path file = write("log.xlsx", everyKindOfCell(new XSSFWorkbook()));
    Path changed = edited(file, "xl/worksheets/sheet1.xml", change);
    Sheet sheet = WorkbookFile.open(changed, "log.xlsx").orRefuse().sheets().get(0);
    assertThat(catchThrowable(() -> sheet.forEachRow(row -> true)))
        .as(words)
        .isInstanceOfSatisfying(
            Refusal.class,
            refusal -> {
              assertThat(refusal.findings()).hasSize(1);
              assertThat(refusal.findings().get(0).kind()).isEqualTo(kind);
              assertThat(refusal.findings().get(0).message()).contains(words);
              assertThat(refusal.findings().get(0).where())
                  .hasToString("log.xlsx, sheet Kraftmessung Süd");
            });
  }

  @Test
  void entitiesAndBrokenXmlInASheetAreRefused() throws IOException {
    sheetRefused(
        xml ->
            xml.replaceFirst(
                "<worksheet",
                "<!DOCTYPE w [<!ENTITY x SYSTEM \"file:///etc/hostname\">]><worksheet"),
        DocumentFinding.UNREADABLE,
        "declares a document type");
    sheetRefused(
        xml -> xml.substring(0, xml.length() / 2), DocumentFinding.UNREADABLE, "not well-formed");
    sheetRefused(
        xml -> xml.replace(" r=\"A3\"", " r=\"33\""), DocumentFinding.UNREADABLE, "'33' is not the name");
    sheetRefused(
        xml -> xml.replaceFirst("t=\"s\" s=\"0\"><v>\\d+", "t=\"s\"><v>999"),
        DocumentFinding.UNREADABLE,
        "names a text that is not there");
  }

  @Test
  void limitsAreNamed() throws IOException {
    Path file = write("log.xlsx", everyKindOfCell(new XSSFWorkbook()));
    assertThat(WorkbookFile.open(file, "log.xlsx", limit("sheets", 2)).findings())
        .extracting(Finding::message)
        .containsExactly("found more than the limit 'sheets' = 2 lets through");
    assertThat(WorkbookFile.open(file, "log.xlsx", limit("shared-text-bytes", 20)).findings())
        .extracting(Finding::message)
        .containsExactly("found more than the limit 'shared-text-bytes' = 20 lets through");
    for (String name : List.of("rows", "cells", "text-length", "inflated-bytes")) {
      Sheet sheet = WorkbookFile.open(file, "log.xlsx", limit(name, 1)).orRefuse().sheets().get(0);
      assertThatThrownBy(() -> sheet.forEachRow(row -> true))
          .isInstanceOf(Refusal.class)
          .hasMessageContaining("limit '" + name + "' = 1 ");
    }
  }

  private static ReadLimits limit(String name, long value) {
    return ReadLimits.USUAL.with(name, value).orElseThrow();
  }

  @Test
  void aPackedBombIsStopped() throws IOException {
    XSSFWorkbook workbook = new XSSFWorkbook();
    workbook.createSheet("s").createRow(0).createCell(0).setCellValue(1);
    Path file = write("bomb.xlsx", workbook);
    String blanks = " ".repeat(4_000_000);
    Path bomb = edited(file, "xl/worksheets/sheet1.xml", xml -> xml.replace("</worksheet>", blanks + "</worksheet>"));
    Sheet sheet =
        WorkbookFile.open(bomb, "bomb.xlsx", limit("inflated-bytes", 1_000_000)).orRefuse().sheets().get(0);
    assertThatThrownBy(() -> sheet.forEachRow(row -> true))
        .isInstanceOf(Refusal.class)
        .hasMessageContaining("limit 'inflated-bytes' = 1000000");
  }

  @Test
  void macrosLinksAndALockFileAreNoted() throws IOException {
    Path file = write("log.xlsx", everyKindOfCell(new XSSFWorkbook()));
    Path linked =
        edited(
            file,
            "xl/workbook.xml",
            xml ->
                xml.replace(
                    "</sheets>",
                    "</sheets><externalReferences><externalReference/></externalReferences>"));
    Files.createFile(folder.resolve("~$changed.xlsx"));
    assertThat(WorkbookFile.open(linked, "changed.xlsx").findings())
        .extracting(Finding::kind)
        .containsExactly(DocumentFinding.EXTERNAL_LINKS, DocumentFinding.OPEN_ELSEWHERE);
  }

  @Test
  void aFaultOfTheVisitorIsNotTakenForADamagedFile() throws IOException {
    Path file = write("log.xlsx", everyKindOfCell(new XSSFWorkbook()));
    Sheet sheet = WorkbookFile.open(file, "log.xlsx").orRefuse().sheets().get(0);
    assertThatThrownBy(
            () ->
                sheet.forEachRow(
                    row -> {
                      throw new IllegalStateException("the visitor's own");
                    }))
        .isInstanceOf(IllegalStateException.class)
        .hasMessage("the visitor's own");
  }

  @Test
  void numbersAreReadToTheLastBit() throws IOException {
    XSSFWorkbook workbook = new XSSFWorkbook();
    org.apache.poi.ss.usermodel.Row row = workbook.createSheet("s").createRow(0);
    double[] values = {0.1, 1.0 / 3, 1e308, 4.9e-324, -0.0, 123456789.12345679, 1e22, 1.2345e23};
    for (int i = 0; i < values.length; i++) {
      row.createCell(i).setCellValue(values[i]);
    }
    Sheet sheet = WorkbookFile.open(write("n.xlsx", workbook), "n.xlsx").orRefuse().sheets().get(0);
    Consumer<Row> check =
        read -> {
          for (int i = 0; i < values.length; i++) {
            assertThat(read.number(i)).isEqualTo(values[i]);
          }
        };
    sheet.forEachRow(
        read -> {
          check.accept(read);
          return true;
        });
  }

  @Test
  void aNumberBeyondTheLargestIsText() throws IOException {
    XSSFWorkbook workbook = new XSSFWorkbook();
    workbook.createSheet("s").createRow(0).createCell(0).setCellValue(5);
    Path file = write("n.xlsx", workbook);
    Path changed = edited(file, "xl/worksheets/sheet1.xml", xml -> xml.replace("<v>5.0</v>", "<v>1e999</v>"));
    assertThat(cells(WorkbookFile.open(changed, "n.xlsx").orRefuse().sheets().get(0)))
        .containsExactly("A1 TEXT 1e999");
  }

  @Test
  void theProgramHoldsNoStreamOpenOnItsInput() throws IOException {
    Path file = write("log.xlsx", everyKindOfCell(new XSSFWorkbook()));
    long before = handles(file);
    for (int i = 0; i < 20; i++) {
      WorkbookFile.open(file, "log.xlsx").orRefuse().sheets().get(0).forEachRow(row -> false);
    }
    assertThat(handles(file)).isEqualTo(before);
  }

  private static long handles(Path file) throws IOException {
    Path self = Path.of("/proc/self/fd");
    if (!Files.isDirectory(self)) {
      return 0;
    }
    try (java.util.stream.Stream<Path> open = Files.list(self)) {
      return open.filter(
              descriptor -> {
                try {
                  return Files.readSymbolicLink(descriptor).toString().contains(file.toString());
                } catch (IOException gone) {
                  return false;
                }
              })
          .count();
    }
  }

  @Test
  void aWorkbookFromAStreamOfAnotherWriterWithoutReferencesIsRead() throws IOException {
    XSSFWorkbook workbook = new XSSFWorkbook();
    org.apache.poi.ss.usermodel.Row row = workbook.createSheet("s").createRow(0);
    row.createCell(0).setCellValue(1);
    row.createCell(1).setCellValue("inline");
    Path file = write("n.xlsx", workbook);
    Path bare =
        edited(
            file,
            "xl/worksheets/sheet1.xml",
            xml ->
                xml.replaceAll(" r=\"[A-Z]*1\"", "")
                    .replaceFirst("t=\"s\" s=\"0\"><v>0</v>", "t=\"inlineStr\"><is><t>inl</t><r><t>ine</t></r></is>"));
    try (InputStream any = Files.newInputStream(bare)) {
      assertThat(any.read()).isEqualTo('P');
    }
    assertThat(cells(WorkbookFile.open(bare, "n.xlsx").orRefuse().sheets().get(0)))
        .containsExactly("A1 NUMBER 1", "B1 TEXT inline");
  }
}
