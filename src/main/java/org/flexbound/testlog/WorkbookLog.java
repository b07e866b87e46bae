package org.flexbound.testlog;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.flexbound.document.ReadProgress;
import org.flexbound.document.Sheet;
import org.flexbound.document.SheetFile;
import org.flexbound.document.WorkbookFile;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;

/** Reads a load-test workbook; all its problems come in one answer. */
public final class WorkbookLog {
  private WorkbookLog() {}

  /**
   * Reads a workbook.
   *
   * @param path where it lies
   * @param shownName its name in messages and results
   * @return the log as far as it could be made out, with everything found
   */
  public static Outcome<TestLog> read(Path path, String shownName) {
    return read(path, shownName, LogContext.NONE);
  }

  static Outcome<TestLog> read(Path path, String shownName, LogContext context) {
    return WorkbookFile.open(path, shownName)
        .then(file -> log(file, shownName, Checksum.begin(path), context));
  }

  private static Outcome<TestLog> log(
      SheetFile file, String shownName, Checksum sum, LogContext context) {
    Findings findings = new Findings();
    List<ReadingsSource> sources = new ArrayList<>();
    for (Sheet sheet : file.sheets()) {
      String key = HeaderText.key(sheet.name());
      if (SheetLayout.known().stream()
          .anyMatch(layout -> HeaderText.key(layout.name()).equals(key))) {
        note(sheet, findings);
      } else if (!key.equals("examples")) {
        sources.add(
            new ReadingsSource(sheet, "", sheet.name(), ReadingsLayout.OPEN, false));
      }
    }
    TestLog log =
        new LogReader(new WorkbookTables(file, findings), sources, context, findings)
            .log(() -> List.of(new InputFile(shownName, sum.digits())));
    return Outcome.of(log, findings.list());
  }

  /** What is hidden or merged; a damaged sheet is told when its table is read. */
  private static void note(Sheet sheet, Findings findings) {
    try {
      sheet.notes().report(sheet.where(), findings);
    } catch (Refusal damaged) {
      // its table says so
    }
  }

  /**
   * The checksum of a file.
   *
   * @param path the file
   * @return SHA-256 in lower-case hexadecimal digits
   */
  public static String sha256(Path path) {
    return Checksum.of(path);
  }
}
