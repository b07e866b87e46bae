package org.flexbound.document;

import java.util.Arrays;
import java.util.OptionalInt;
import org.flexbound.finding.Where;
import java.util.Optional;

/**
 * A record of a CSV file: the places of its fields in the bytes read, made into numbers and texts
 * when asked for; or its fields as texts, where any was quoted.
 */
final class CsvRow implements Row {
  private final String file;
  private final CsvDialect dialect;
  private final byte decimalSign;
  private byte[] bytes = new byte[0];
  private String[] quoted = new String[0];
  private boolean isQuoted;
  private int[] from = new int[32];
  private int[] to = new int[32];
  private double[] numbers = new double[32];
  private CellKind[] kinds = new CellKind[32];
  private boolean[] looked = new boolean[32];
  private int fields;
  private int width;
  private int line;

  CsvRow(String file, CsvDialect dialect) {
    this.file = file;
    this.dialect = dialect;
    this.decimalSign = (byte) dialect.decimalSign();
  }

  void begin(byte[] buffer, int lineNumber) {
    bytes = buffer;
    isQuoted = false;
    fields = 0;
    line = lineNumber;
  }

  void field(int start, int end) {
    if (fields == from.length) {
      grow();
    }
    int first = start;
    int last = end;
    while (first < last && bytes[first] <= ' ' && bytes[first] >= 0) {
      first++;
    }
    while (last > first && bytes[last - 1] <= ' ' && bytes[last - 1] >= 0) {
      last--;
    }
    from[fields] = first;
    to[fields] = last;
    looked[fields] = false;
    fields++;
  }

  void texts(String[] all) {
    isQuoted = true;
    quoted = all.clone();
    fields = 0;
    for (int i = 0; i < all.length; i++) {
      if (fields == from.length) {
        grow();
      }
      quoted[i] = all[i].strip();
      from[fields] = 0;
      to[fields] = quoted[i].length();
      looked[fields] = false;
      fields++;
    }
  }

  /** Ends the row; true if any field holds something. */
  boolean end() {
    width = fields;
    while (width > 0 && from[width - 1] == to[width - 1]) {
      width--;
    }
    return width > 0;
  }

  private void grow() {
    int size = 2 * from.length;
    from = Arrays.copyOf(from, size);
    to = Arrays.copyOf(to, size);
    numbers = Arrays.copyOf(numbers, size);
    kinds = Arrays.copyOf(kinds, size);
    looked = Arrays.copyOf(looked, size);
  }

  private void look(int column) {
    looked[column] = true;
    if (from[column] == to[column]) {
      kinds[column] = CellKind.BLANK;
      return;
    }
    double value;
    if (isQuoted) {
      byte[] text = quoted[column].getBytes(java.nio.charset.StandardCharsets.UTF_8);
      value = DecimalText.parse(text, 0, text.length, decimalSign);
    } else {
      value = DecimalText.parse(bytes, from[column], to[column], decimalSign);
    }
    numbers[column] = value;
    kinds[column] = Double.isNaN(value) ? CellKind.TEXT : CellKind.NUMBER;
  }

  @Override
  public int number() {
    return line;
  }

  @Override
  public int width() {
    return width;
  }

  @Override
  public CellKind kind(int column) {
    if (column >= width) {
      return CellKind.BLANK;
    }
    if (!looked[column]) {
      look(column);
    }
    return kinds[column];
  }

  @Override
  public double number(int column) {
    return kind(column) == CellKind.NUMBER ? numbers[column] : Double.NaN;
  }

  @Override
  public String text(int column) {
    return switch (kind(column)) {
      case BLANK -> "";
      case NUMBER -> DecimalText.shortest(numbers[column]);
      default ->
          isQuoted
              ? quoted[column]
              : new String(
                      bytes, from[column], to[column] - from[column], dialect.byteCharset())
                  .strip();
    };
  }

  @Override
  public Where where(int column) {
    return place(file, line, column);
  }

  /** The place of a field. */
  static Where place(String file, int line, int column) {
    return new Where(
        Optional.of(file),
        Optional.empty(),
        Optional.of(CellRow.columnName(column) + line),
        Optional.empty(),
        OptionalInt.of(line));
  }
}
