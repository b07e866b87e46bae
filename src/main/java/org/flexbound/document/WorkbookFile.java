package org.flexbound.document;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;

/**
 * Opens a workbook: .xlsx (and .xlsm) streamed, .xls in memory. Formulas count by the value stored
 * with them; macros are never run and links to other files never followed.
 *
 * <p>No file stays open between visits of its sheets.
 */
public final class WorkbookFile {
  private static final String EXPECTED = "a workbook (.xlsx)";

  private WorkbookFile() {}

  /**
   * Opens a workbook within the usual limits.
   *
   * @param file where it lies
   * @param shownName its name in messages
   * @return the sheets, or the findings that say why there are none
   * @throws java.io.UncheckedIOException where the system does not let it be read
   */
  public static Outcome<SheetFile> open(Path file, String shownName) {
    return open(file, shownName, ReadLimits.USUAL);
  }

  /**
   * Opens a workbook.
   *
   * @param file where it lies
   * @param shownName its name in messages
   * @param limits how much is read at most
   * @return the sheets, or the findings that say why there are none
   * @throws java.io.UncheckedIOException where the system does not let it be read
   */
  public static Outcome<SheetFile> open(Path file, String shownName, ReadLimits limits) {
    Findings findings = new Findings();
    return InputFileCheck.kind(file, shownName, EXPECTED, findings)
        .map(
            kind ->
                switch (kind) {
                  case ZIP -> StreamedWorkbook.open(file, shownName, limits, findings);
                  case COMPOUND -> LegacyWorkbook.open(file, shownName, limits, findings);
                  default -> wrongKind(kind, shownName, findings);
                })
        .map(
            outcome -> {
              if (outcome.value().isEmpty() || !openElsewhere(file)) {
                return outcome;
              }
              Findings more = new Findings();
              more.addAll(outcome.findings());
              more.add(
                  DocumentFinding.OPEN_ELSEWHERE,
                  Where.file(shownName),
                  "a lock file of a spreadsheet program lies beside the workbook");
              return new Outcome<>(outcome.value(), more.list());
            })
        .orElseGet(() -> Outcome.none(findings.list()));
  }

  private static Outcome<SheetFile> wrongKind(
      InputFileCheck.Kind kind, String shownName, Findings findings) {
    findings.add(
        DocumentFinding.UNREADABLE,
        Where.file(shownName),
        "found "
            + kind.words()
            + "; expected "
            + EXPECTED
            + (kind == InputFileCheck.Kind.TEXT
                ? ". A text file does not become a workbook by its name: open it in a spreadsheet"
                    + " program and save it as .xlsx"
                : ""));
    return Outcome.none(findings.list());
  }

  private static boolean openElsewhere(Path file) {
    Path name = file.getFileName();
    return name != null
        && (Files.exists(file.resolveSibling("~$" + name))
            || Files.exists(file.resolveSibling(".~lock." + name + "#")));
  }

  /** What an I/O problem says, in words: without the name of its class. */
  static String words(IOException problem) {
    String message = problem.getMessage();
    return message == null || message.isBlank() ? "no more is known" : message;
  }
}
