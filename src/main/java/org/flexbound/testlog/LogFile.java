package org.flexbound.testlog;

import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.flexbound.document.DocumentFinding;
import org.flexbound.document.ReadProgress;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;

/**
 * Reads a load-test log in either form: the workbook, or a JSON description of foreign spreadsheets
 * and logger exports. All problems of all its files come in one answer.
 */
public final class LogFile {
  private LogFile() {}

  /**
   * Reads a log. Its files stay open for as long as its readings are used.
   *
   * @param path where it lies
   * @param shownName its name in messages and results
   * @return the log as far as it could be made out, with everything found
   */
  public static Outcome<TestLog> read(Path path, String shownName) {
    return read(path, shownName, LogContext.NONE);
  }

  /**
   * Reads a log. Its files stay open for as long as its readings are used.
   *
   * @param path where it lies
   * @param shownName its name in messages and results
   * @param progress is told how far the reading of a long file has come
   * @return the log as far as it could be made out, with everything found
   */
  public static Outcome<TestLog> read(Path path, String shownName, ReadProgress progress) {
    return read(path, shownName, LogContext.NONE.with(progress));
  }

  /**
   * Reads a log of which more is known.
   *
   * @param path where it lies
   * @param shownName its name in messages and results
   * @param context what is stated elsewhere
   * @return the log as far as it could be made out, with everything found
   */
  public static Outcome<TestLog> read(Path path, String shownName, LogContext context) {
    String name = shownName.toLowerCase(Locale.ROOT);
    if (name.endsWith(".json")) {
      return DescribedLog.read(path, shownName, context);
    }
    if (name.endsWith(".csv") || name.endsWith(".txt") || name.endsWith(".asc")) {
      return Outcome.none(
          List.of(
              new Finding(
                  DocumentFinding.UNREADABLE,
                  Where.file(shownName),
                  "found a text file; expected a workbook (.xlsx), or a description (.json) that"
                      + " names this file and says what its columns mean, as log-description.json"
                      + " of the templates does")));
    }
    return WorkbookLog.read(path, shownName, context);
  }
}
