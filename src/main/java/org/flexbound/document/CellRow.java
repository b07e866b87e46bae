package org.flexbound.document;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.finding.Where;

/** A row that is filled anew for every visit. */
final class CellRow implements Row {
  private final String file;
  private final String sheet;
  private final List<CellKind> kinds = new ArrayList<>();
  private final List<String> texts = new ArrayList<>();
  private double[] numbers = new double[32];
  private int number;

  CellRow(String file, String sheet) {
    this.file = file;
    this.sheet = sheet;
  }

  void begin(int rowNumber) {
    number = rowNumber;
    kinds.clear();
    texts.clear();
  }

  void set(int column, CellKind kind, String text, double value) {
    while (kinds.size() <= column) {
      kinds.add(CellKind.BLANK);
      texts.add("");
    }
    if (numbers.length < kinds.size()) {
      numbers = java.util.Arrays.copyOf(numbers, 2 * kinds.size());
    }
    kinds.set(column, kind);
    texts.set(column, text);
    numbers[column] = value;
  }

  boolean isBlank() {
    return kinds.stream().allMatch(kind -> kind == CellKind.BLANK);
  }

  @Override
  public int number() {
    return number;
  }

  @Override
  public int width() {
    return kinds.size();
  }

  @Override
  public CellKind kind(int column) {
    return column < kinds.size() ? kinds.get(column) : CellKind.BLANK;
  }

  @Override
  public double number(int column) {
    CellKind kind = kind(column);
    return kind == CellKind.NUMBER || kind == CellKind.DATE ? numbers[column] : Double.NaN;
  }

  @Override
  public String text(int column) {
    return column < texts.size() ? texts.get(column) : "";
  }

  @Override
  public Where where(int column) {
    return Where.cells(file, sheet, columnName(column) + number);
  }

  static String columnName(int column) {
    StringBuilder name = new StringBuilder();
    for (int rest = column; rest >= 0; rest = rest / 26 - 1) {
      name.insert(0, (char) ('A' + rest % 26));
    }
    return name.toString();
  }
}
