package org.flexbound.document;

import java.nio.file.Path;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;

/** Opens a file of tables by what it holds, whatever its ending: a workbook, or separated values. */
public final class TableFile {
  private static final String EXPECTED =
      "a workbook (.xlsx, .xls) or a text file of separated values (.csv)";

  private TableFile() {}

  /**
   * Opens a file.
   *
   * @param file where it lies
   * @param shownName its name in messages
   * @param layout how it is written, if it is text
   * @param limits how much is read at most
   * @return the sheets, or the findings that say why there are none
   * @throws java.io.UncheckedIOException where the system does not let it be read
   */
  public static Outcome<SheetFile> open(
      Path file, String shownName, CsvLayout layout, ReadLimits limits) {
    Findings findings = new Findings();
    Optional<InputFileCheck.Kind> kind =
        InputFileCheck.kind(file, shownName, EXPECTED, findings);
    if (kind.isEmpty()) {
      return Outcome.none(findings.list());
    }
    return switch (kind.get()) {
      case ZIP, COMPOUND -> WorkbookFile.open(file, shownName, limits);
      case TEXT -> CsvFile.open(file, shownName, layout, limits);
      default -> {
        findings.add(
            DocumentFinding.UNREADABLE,
            Where.file(shownName),
            "found " + kind.get().words() + "; expected " + EXPECTED);
        yield Outcome.none(findings.list());
      }
    };
  }

  /**
   * Whether a file's rows are lines of text.
   *
   * @param file an open file
   * @return true for separated values, false for a workbook
   */
  public static boolean isText(SheetFile file) {
    return file instanceof CsvFile;
  }
}
