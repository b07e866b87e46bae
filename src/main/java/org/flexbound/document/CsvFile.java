package org.flexbound.document;

import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.apache.commons.io.input.ReaderInputStream;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.flexbound.finding.Where;
import org.jspecify.annotations.Nullable;

/**
 * Opens a text file of separated values (RFC 4180, with any separator and either decimal sign) as a
 * file of one sheet. Rows are streamed; lines above the header are rows like the others.
 */
public final class CsvFile implements SheetFile {
  private static final String EXPECTED = "a text file of separated values (.csv)";
  private static final int HEAD = 1 << 16;

  private final Path path;
  private final String name;
  private final CsvDialect dialect;
  private final ReadLimits limits;

  private CsvFile(Path path, String name, CsvDialect dialect, ReadLimits limits) {
    this.path = path;
    this.name = name;
    this.dialect = dialect;
    this.limits = limits;
  }

  /**
   * Opens a file within the usual limits.
   *
   * @param file where it lies
   * @param shownName its name in messages
   * @param layout what is known about how it is written
   * @return the file with one sheet, or the findings that say why there is none
   * @throws UncheckedIOException where the system does not let it be read
   */
  public static Outcome<SheetFile> open(Path file, String shownName, CsvLayout layout) {
    return open(file, shownName, layout, ReadLimits.USUAL);
  }

  /**
   * Opens a file.
   *
   * @param file where it lies
   * @param shownName its name in messages
   * @param layout what is known about how it is written
   * @param limits how much is read at most
   * @return the file with one sheet, or the findings that say why there is none
   * @throws UncheckedIOException where the system does not let it be read
   */
  public static Outcome<SheetFile> open(
      Path file, String shownName, CsvLayout layout, ReadLimits limits) {
    Findings findings = new Findings();
    InputFileCheck.Kind kind =
        InputFileCheck.kind(file, shownName, EXPECTED, findings).orElse(null);
    if (kind == null) {
      return Outcome.none(findings.list());
    }
    if (kind != InputFileCheck.Kind.TEXT) {
      findings.add(
          DocumentFinding.UNREADABLE,
          Where.file(shownName),
          "found "
              + kind.words()
              + "; expected "
              + EXPECTED
              + (kind == InputFileCheck.Kind.ZIP
                  ? ". If it is a workbook, give it its own ending (.xlsx)"
                  : ""));
      return Outcome.none(findings.list());
    }
    try (InputStream in = Files.newInputStream(file)) {
      byte[] head = in.readNBytes(HEAD);
      CsvDialect dialect = CsvDialect.of(head, head.length < HEAD, layout);
      if (layout.charset().isPresent() && !dialect.canDecode(head, head.length < HEAD)) {
        findings.add(
            DocumentFinding.UNREADABLE,
            Where.file(shownName),
            "found bytes that are not "
                + dialect.charset().name().toLowerCase(Locale.ROOT)
                + ", the encoding that is stated; another is windows-1252");
        return Outcome.none(findings.list());
      }
      if (layout.separator().isEmpty()
          || layout.decimalSign().isEmpty()
          || layout.charset().isEmpty()) {
        findings.add(
            DocumentFinding.CSV_LAYOUT, Where.file(shownName), "read with " + dialect.words());
      }
      return Outcome.of(new CsvFile(file, shownName, dialect, limits), findings.list());
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    }
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public List<Sheet> sheets() {
    return List.of(new Rows());
  }

  @Override
  public void close() {
    // no file stays open between visits
  }

  private final class Rows implements Sheet {
    private @Nullable LimitedStream reading;
    private long size;

    @Override
    public String name() {
      String last = name.substring(Math.max(name.lastIndexOf('/'), name.lastIndexOf('\\')) + 1);
      int point = last.lastIndexOf('.');
      return point > 0 ? last.substring(0, point) : last;
    }

    @Override
    public Where where() {
      return Where.file(name);
    }

    @Override
    public Where cell(int row, int column) {
      return CsvRow.place(name, row, column);
    }

    @Override
    public double shareRead() {
      LimitedStream stream = reading;
      return stream == null || size <= 0 ? 0 : (double) stream.count() / size;
    }

    @Override
    public void forEachRow(RowVisitor visitor) {
      try (InputStream in = stream()) {
        new CsvScanner(in, dialect, limits, new CsvRow(name, dialect)).forEachRow(visitor);
      } catch (LimitedStream.Passed passed) {
        throw refusal(DocumentFinding.LIMIT, where(), WorkbookFile.words(passed));
      } catch (CsvScanner.BadQuotes bad) {
        throw refusal(
            DocumentFinding.UNREADABLE, Where.line(name, bad.line()), WorkbookFile.words(bad));
      } catch (IOException refused) {
        throw new UncheckedIOException(refused);
      }
    }

    private InputStream stream() throws IOException {
      LimitedStream in =
          new LimitedStream(Files.newInputStream(path), limits.inflatedBytes(), "inflated-bytes");
      reading = in;
      size = Files.size(path);
      in.skipNBytes(dialect.markBytes());
      return dialect.isByteWise()
          ? in
          : ReaderInputStream.builder()
              .setReader(new InputStreamReader(in, dialect.charset()))
              .setCharset(StandardCharsets.UTF_8)
              .get();
    }

    private Refusal refusal(DocumentFinding kind, Where where, String message) {
      return new Refusal(List.of(new Finding(kind, where, message)));
    }
  }
}
