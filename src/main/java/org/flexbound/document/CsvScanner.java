package org.flexbound.document;

import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import java.io.IOException;
import java.io.InputStream;
import java.util.Arrays;

/**
 * Splits the bytes of a CSV file into records and fields. Records without quotes are split where
 * they lie, without a copy; a record in which a field begins with a quote goes to the library.
 */
final class CsvScanner {
  private static final int NOT_ENDED = -1;

  private final InputStream in;
  private final CsvDialect dialect;
  private final ReadLimits limits;
  private final CsvRow row;
  private final byte separator;
  private final byte lineEnd;
  private byte[] buffer = new byte[1 << 18];
  private int start;
  private int end;
  private boolean ended;
  private int line = 1;
  private int nextLine = 1;
  private long rows;
  private long cells;

  CsvScanner(InputStream in, CsvDialect dialect, ReadLimits limits, CsvRow row) {
    this.in = in;
    this.dialect = dialect;
    this.limits = limits;
    this.row = row;
    this.separator = (byte) dialect.separator();
    this.lineEnd = (byte) dialect.lineEnd();
  }

  /** The quotes of a record do not fit together. */
  static final class BadQuotes extends IOException {
    private static final long serialVersionUID = 1L;

    private final int line;

    BadQuotes(String message, int line) {
      super(message);
      this.line = line;
    }

    /** The line at which the record begins. */
    int line() {
      return line;
    }
  }

  void forEachRow(RowVisitor visitor) throws IOException {
    boolean skip = dialect.statedInFile();
    fill();
    while (start < end) {
      int next = record();
      boolean filled = row.end();
      if (filled && !skip) {
        count();
        if (!visitor.visit(row)) {
          return;
        }
      }
      skip = false;
      start = next;
      line = nextLine;
      if (start >= end && !ended) {
        fill();
      }
    }
  }

  private void count() throws IOException {
    rows++;
    cells += row.width();
    if (rows > limits.rows()) {
      throw new LimitedStream.Passed(LimitedStream.message("rows", limits.rows()));
    }
    if (cells > limits.cells()) {
      throw new LimitedStream.Passed(LimitedStream.message("cells", limits.cells()));
    }
  }

  /** Splits the record at the start; gives where the next one begins. */
  private int record() throws IOException {
    while (true) {
      int next = plain();
      if (next != NOT_ENDED) {
        return next;
      }
      if (ended) {
        throw new IllegalStateException("a record has an end once all is read");
      }
      fill();
    }
  }

  private int plain() throws IOException {
    row.begin(buffer, line);
    int field = start;
    byte[] bytes = buffer;
    int last = end;
    for (int at = start; at < last; at++) {
      byte b = bytes[at];
      if (b == separator) {
        row.field(field, at);
        field = at + 1;
      } else if (b == lineEnd) {
        row.field(field, at);
        nextLine = line + 1;
        return at + 1;
      } else if (b == '"' && at == field) {
        return quoted();
      }
    }
    if (!ended) {
      return NOT_ENDED;
    }
    row.field(field, last);
    return last;
  }

  private int quoted() throws IOException {
    boolean inside = false;
    boolean fieldStart = true;
    int lines = 1;
    for (int at = start; at < end; at++) {
      byte b = buffer[at];
      lines += b == lineEnd ? 1 : 0;
      if (inside) {
        inside = b != '"';
      } else if (b == '"' && (fieldStart || buffer[at - 1] == '"')) {
        inside = true;
      } else if (b == lineEnd) {
        split(at);
        nextLine = line + lines - 1;
        return at + 1;
      }
      fieldStart = !inside && b == separator;
    }
    if (!ended) {
      return NOT_ENDED;
    }
    if (inside) {
      throw new BadQuotes(
          "a quote that begins in this line is never closed; expected a second one", line);
    }
    split(end);
    return end;
  }

  private void split(int recordEnd) throws IOException {
    String text = new String(buffer, start, recordEnd - start, dialect.byteCharset());
    try (CsvReader<CsvRecord> reader =
        CsvReader.builder().fieldSeparator(dialect.separator()).ofCsvRecord(text)) {
      for (CsvRecord record : reader) {
        row.texts(record.getFields().toArray(new String[0]));
        return;
      }
    } catch (CsvParseException mixed) {
      throw new BadQuotes(
          "found text right after a closing quote; expected the separator or the end of the line",
          line);
    }
    row.texts(new String[0]);
  }

  /** Reads on; the record begun moves to the front. */
  private void fill() throws IOException {
    int kept = end - start;
    if (kept > limits.textLength()) {
      throw new LimitedStream.Passed(LimitedStream.message("text-length", limits.textLength()));
    }
    byte[] target = kept > buffer.length / 2 ? Arrays.copyOf(buffer, 2 * buffer.length) : buffer;
    System.arraycopy(buffer, start, target, 0, kept);
    buffer = target;
    start = 0;
    end = kept;
    int n = in.readNBytes(buffer, end, buffer.length - end);
    end += n;
    ended = end < buffer.length;
  }
}
