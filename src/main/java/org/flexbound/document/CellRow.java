package org.flexbound.document;

import java.time.LocalDateTime;
import java.util.Arrays;
import java.util.BitSet;
import org.apache.poi.ss.usermodel.DateUtil;
import org.flexbound.finding.Where;

/** A row of a workbook's sheet that is filled anew for every visit. */
final class CellRow implements Row {
  /** 31 December 9999, the last day a workbook can show. */
  private static final double LAST_DAY = 2_958_465;

  private final String file;
  private final String sheet;
  private final boolean from1904;
  private CellKind[] kinds = new CellKind[32];
  private String[] texts = new String[32];
  private double[] numbers = new double[32];
  private final BitSet percent = new BitSet();
  private int width;
  private int number;
  private boolean hidden;

  /**
   * An empty row.
   *
   * @param file the workbook's name in messages
   * @param sheet the sheet's name
   * @param from1904 whether days are counted from 1904
   */
  CellRow(String file, String sheet, boolean from1904) {
    this.file = file;
    this.sheet = sheet;
    this.from1904 = from1904;
    Arrays.fill(kinds, CellKind.BLANK);
    Arrays.fill(texts, "");
  }

  void begin(int rowNumber, boolean isHidden) {
    Arrays.fill(kinds, 0, width, CellKind.BLANK);
    percent.clear();
    width = 0;
    number = rowNumber;
    hidden = isHidden;
  }

  void number(int column, double value, boolean asPercent) {
    put(column, CellKind.NUMBER);
    numbers[column] = value;
    if (asPercent) {
      percent.set(column);
    }
  }

  void date(int column, double days) {
    put(column, CellKind.DATE);
    numbers[column] = days;
  }

  /** Text; blank where it holds nothing but blanks. */
  void text(int column, String text) {
    String stripped = text.strip();
    if (!stripped.isEmpty()) {
      put(column, CellKind.TEXT);
      texts[column] = stripped;
    }
  }

  void truth(int column, boolean value) {
    put(column, CellKind.TRUTH);
    texts[column] = value ? "TRUE" : "FALSE";
  }

  void error(int column, String text) {
    put(column, CellKind.ERROR);
    texts[column] = text;
  }

  private void put(int column, CellKind kind) {
    if (column >= kinds.length) {
      int old = kinds.length;
      int size = Math.max(column + 1, 2 * old);
      kinds = Arrays.copyOf(kinds, size);
      texts = Arrays.copyOf(texts, size);
      numbers = Arrays.copyOf(numbers, size);
      Arrays.fill(kinds, old, size, CellKind.BLANK);
      Arrays.fill(texts, old, size, "");
    }
    kinds[column] = kind;
    width = Math.max(width, column + 1);
  }

  boolean isBlank() {
    return width == 0;
  }

  @Override
  public int number() {
    return number;
  }

  @Override
  public int width() {
    return width;
  }

  @Override
  public boolean isHidden() {
    return hidden;
  }

  @Override
  public CellKind kind(int column) {
    return column < width ? kinds[column] : CellKind.BLANK;
  }

  @Override
  public double number(int column) {
    CellKind kind = kind(column);
    return kind == CellKind.NUMBER || kind == CellKind.DATE ? numbers[column] : Double.NaN;
  }

  @Override
  public boolean isPercent(int column) {
    return percent.get(column);
  }

  @Override
  public String text(int column) {
    return switch (kind(column)) {
      case BLANK -> "";
      case NUMBER -> DecimalText.shortest(numbers[column]);
      case DATE -> date(numbers[column]);
      case TEXT, TRUTH, ERROR -> texts[column];
    };
  }

  @Override
  public Where where(int column) {
    return place(file, sheet, number, column);
  }

  private String date(double days) {
    if (days > LAST_DAY) {
      return DecimalText.shortest(days);
    }
    LocalDateTime date = DateUtil.getLocalDateTime(days, from1904);
    return date == null ? DecimalText.shortest(days) : date.toString();
  }

  /** The place of a cell of a workbook. */
  static Where place(String file, String sheet, int row, int column) {
    return Where.cells(file, sheet, columnName(column) + row);
  }

  /** The letters of a column, from 0 for A. */
  static String columnName(int column) {
    StringBuilder name = new StringBuilder();
    for (int rest = column; rest >= 0; rest = rest / 26 - 1) {
      name.insert(0, (char) ('A' + rest % 26));
    }
    return name.toString();
  }
}
