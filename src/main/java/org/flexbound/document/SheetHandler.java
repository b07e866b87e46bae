package org.flexbound.document;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.apache.poi.xssf.model.SharedStrings;
import org.jspecify.annotations.Nullable;
import org.xml.sax.Attributes;
import org.xml.sax.SAXException;
import org.xml.sax.helpers.DefaultHandler;

/** Turns the XML of one sheet (ECMA-376, 18.3) into rows, shown to a visitor one by one. */
final class SheetHandler extends DefaultHandler {
  private static final int LAST_COLUMN = 16_383;
  private static final int LAST_ROW = 1_048_576;

  private final CellRow row;
  private final SharedStrings strings;
  private final CellFormats.Look[] looks;
  private final ReadLimits limits;
  private final RowVisitor visitor;

  private final List<String> hiddenColumns = new ArrayList<>();
  private final List<String> mergedRanges = new ArrayList<>();
  private int hiddenRows;
  private int firstHiddenRow;

  private int rowNumber;
  private boolean rowHidden;
  private int column;
  private String type = "n";
  private CellFormats.Look look = CellFormats.Look.PLAIN;
  private boolean formula;
  private boolean valued;
  private boolean collecting;
  private int phonetic;
  private char[] text = new char[256];
  private int length;
  private byte[] digits = new byte[64];
  private long rows;
  private long cells;
  private boolean visiting;

  SheetHandler(
      CellRow row,
      SharedStrings strings,
      List<CellFormats.Look> looks,
      ReadLimits limits,
      RowVisitor visitor) {
    this.row = row;
    this.strings = strings;
    this.looks = looks.toArray(CellFormats.Look[]::new);
    this.limits = limits;
    this.visitor = visitor;
  }

  /** Whether the visitor is at work: an exception then is its own, not the file's. */
  boolean isVisiting() {
    return visiting;
  }

  /** What was noticed so far. */
  SheetNotes notes(boolean hiddenSheet) {
    return new SheetNotes(hiddenSheet, hiddenRows, firstHiddenRow, hiddenColumns, mergedRanges);
  }

  @Override
  public void startElement(String uri, String name, String qualified, Attributes attributes)
      throws SAXException {
    switch (SheetXml.local(qualified)) {
      case "c" -> beginCell(attributes);
      case "v", "t" -> {
        collecting = phonetic == 0;
        valued = true;
      }
      case "f" -> formula = true;
      case "rPh" -> phonetic++;
      case "row" -> beginRow(attributes);
      case "mergeCell" -> {
        String range = attributes.getValue("ref");
        if (range != null && mergedRanges.size() < 10_000) {
          mergedRanges.add(range);
        }
      }
      case "col" -> hiddenColumn(attributes);
      default -> {
        // layout, comments, printing: nothing to read
      }
    }
  }

  @Override
  public void characters(char[] source, int start, int count) throws SAXException {
    if (!collecting) {
      return;
    }
    if (length + count > text.length) {
      if (length + count > limits.textLength()) {
        throw new LimitPassed("text-length", limits.textLength());
      }
      text = Arrays.copyOf(text, Math.max(2 * text.length, length + count));
    }
    System.arraycopy(source, start, text, length, count);
    length += count;
  }

  @Override
  public void endElement(String uri, String name, String qualified) throws SAXException {
    switch (SheetXml.local(qualified)) {
      case "v", "t" -> collecting = false;
      case "rPh" -> phonetic--;
      case "c" -> endCell();
      case "row" -> endRow();
      default -> {
        // nothing was begun
      }
    }
  }

  /** A limit on reading was passed. */
  static final class LimitPassed extends SAXException {
    private static final long serialVersionUID = 1L;

    LimitPassed(String name, long limit) {
      super(LimitedStream.message(name, limit));
    }
  }

  private void beginRow(Attributes attributes) throws SAXException {
    String number = attributes.getValue("r");
    rowNumber = number == null ? rowNumber + 1 : whole(number, LAST_ROW, "row");
    String hidden = attributes.getValue("hidden");
    rowHidden = hidden != null && (hidden.equals("1") || hidden.equals("true"));
    row.begin(rowNumber, rowHidden);
    column = -1;
    if (++rows > limits.rows()) {
      throw new LimitPassed("rows", limits.rows());
    }
  }

  private void endRow() throws SAXException {
    if (row.isBlank()) {
      return;
    }
    if (rowHidden && hiddenRows++ == 0) {
      firstHiddenRow = rowNumber;
    }
    visiting = true;
    boolean more = visitor.visit(row);
    visiting = false;
    if (!more) {
      throw new SheetXml.Enough();
    }
  }

  private void beginCell(Attributes attributes) throws SAXException {
    String reference = attributes.getValue("r");
    column = reference == null ? column + 1 : column(reference);
    if (column > LAST_COLUMN) {
      throw new SheetXml.Damaged("a cell stands beyond the last column a sheet can have");
    }
    String kind = attributes.getValue("t");
    type = kind == null ? "n" : kind;
    look = look(attributes.getValue("s"));
    formula = false;
    valued = false;
    length = 0;
    if (++cells > limits.cells()) {
      throw new LimitPassed("cells", limits.cells());
    }
  }

  private void endCell() throws SAXException {
    if (length == 0) {
      if (formula && !valued) {
        row.error(column, "(formula without a stored value)");
      }
      return;
    }
    switch (type) {
      case "n" -> number();
      case "s" -> row.text(column, shared());
      case "b" -> row.truth(column, length == 1 && text[0] == '1');
      case "e" -> row.error(column, new String(text, 0, length).strip());
      case "d" -> row.text(column, new String(text, 0, length));
      default -> row.text(column, new String(text, 0, length));
    }
  }

  private void number() {
    if (digits.length < length) {
      digits = new byte[2 * length];
    }
    int from = 0;
    int to = length;
    while (from < to && text[from] <= ' ') {
      from++;
    }
    while (to > from && text[to - 1] <= ' ') {
      to--;
    }
    for (int i = from; i < to; i++) {
      digits[i] = (byte) (text[i] < 128 ? text[i] : '?');
    }
    double value = DecimalText.parse(digits, from, to, (byte) '.');
    if (Double.isNaN(value)) {
      row.text(column, new String(text, 0, length));
    } else if (look == CellFormats.Look.DATE) {
      row.date(column, value);
    } else {
      row.number(column, value, look == CellFormats.Look.PERCENT);
    }
  }

  private String shared() throws SAXException {
    int index = whole(new String(text, 0, length).strip(), Integer.MAX_VALUE, "shared text");
    if (index >= strings.getUniqueCount()) {
      throw new SheetXml.Damaged(
          "cell " + CellRow.columnName(column) + rowNumber + " names a text that is not there");
    }
    String found = strings.getItemAt(index).getString();
    if (found.length() > limits.textLength()) {
      throw new LimitPassed("text-length", limits.textLength());
    }
    return found;
  }

  private CellFormats.Look look(@Nullable String style) throws SAXException {
    if (style == null) {
      return CellFormats.Look.PLAIN;
    }
    int index = whole(style, Integer.MAX_VALUE, "style");
    return index < looks.length ? looks[index] : CellFormats.Look.PLAIN;
  }

  private void hiddenColumn(Attributes attributes) throws SAXException {
    String hidden = attributes.getValue("hidden");
    String min = attributes.getValue("min");
    String max = attributes.getValue("max");
    if (hidden == null || min == null || max == null) {
      return;
    }
    if (hidden.equals("1") || hidden.equals("true")) {
      String first = CellRow.columnName(Math.max(0, whole(min, LAST_COLUMN + 1, "column") - 1));
      String last = CellRow.columnName(Math.max(0, whole(max, LAST_COLUMN + 1, "column") - 1));
      hiddenColumns.add(first.equals(last) ? first : first + ":" + last);
    }
  }

  private static int column(String reference) throws SAXException {
    int value = 0;
    int at = 0;
    for (; at < reference.length() && at < 4; at++) {
      char c = reference.charAt(at);
      if (c < 'A' || c > 'Z') {
        break;
      }
      value = 26 * value + (c - 'A' + 1);
    }
    if (at == 0) {
      throw new SheetXml.Damaged("'" + reference + "' is not the name of a cell");
    }
    return value - 1;
  }

  private static int whole(String text, int largest, String what) throws SAXException {
    long value = 0;
    for (int i = 0; i < text.length(); i++) {
      int digit = text.charAt(i) - '0';
      if (digit < 0 || digit > 9 || value > largest) {
        throw new SheetXml.Damaged("'" + text + "' is not the number of a " + what);
      }
      value = 10 * value + digit;
    }
    if (text.isEmpty() || value > largest) {
      throw new SheetXml.Damaged("'" + text + "' is not the number of a " + what);
    }
    return (int) value;
  }
}
