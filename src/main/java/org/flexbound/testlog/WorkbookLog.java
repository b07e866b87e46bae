package org.flexbound.testlog;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import org.flexbound.document.ReadProgress;
import org.flexbound.document.Sheet;
import org.flexbound.document.SheetFile;
import org.flexbound.document.WorkbookFile;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;

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
    return read(path, shownName, ReadProgress.NONE);
  }

  static Outcome<TestLog> read(Path path, String shownName, ReadProgress progress) {
    return WorkbookFile.open(path, shownName)
        .then(file -> log(file, new InputFile(shownName, sha256(path)), progress));
  }

  private static Outcome<TestLog> log(SheetFile file, InputFile input, ReadProgress progress) {
    Findings findings = new Findings();
    List<ReadingsSource> sources = new ArrayList<>();
    for (Sheet sheet : file.sheets()) {
      String key = HeaderText.key(sheet.name());
      if (SheetLayout.known().stream().anyMatch(layout -> HeaderText.key(layout.name()).equals(key))) {
        sheet.notes().report(sheet.where(), findings);
      } else if (!key.equals("examples")) {
        sources.add(
            new ReadingsSource(sheet, "", sheet.name(), ReadingsLayout.OPEN, false));
      }
    }
    TestLog log =
        new LogReader(new WorkbookTables(file, findings), sources, progress, findings)
            .log(() -> List.of(input));
    return Outcome.of(log, findings.list());
  }

  /**
   * The checksum of a file.
   *
   * @param path the file
   * @return SHA-256 in lower-case hexadecimal digits
   */
  public static String sha256(Path path) {
    try (InputStream in = Files.newInputStream(path)) {
      MessageDigest digest = MessageDigest.getInstance("SHA-256");
      try (DigestInputStream through = new DigestInputStream(in, digest)) {
        through.transferTo(java.io.OutputStream.nullOutputStream());
      }
      return HexFormat.of().formatHex(digest.digest());
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    } catch (NoSuchAlgorithmException impossible) {
      throw new IllegalStateException("every Java platform has SHA-256", impossible);
    }
  }
}
