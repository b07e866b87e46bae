package org.flexbound.app;

import java.io.PrintWriter;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** A table of aligned columns for the terminal. */
final class TextTable {
  private final List<String> headings = new ArrayList<>();
  private final List<Boolean> right = new ArrayList<>();
  private final List<List<String>> rows = new ArrayList<>();

  /** Adds a column of texts. */
  TextTable text(String heading) {
    headings.add(heading);
    right.add(false);
    return this;
  }

  /** Adds a column of numbers, aligned to the right. */
  TextTable number(String heading) {
    headings.add(heading);
    right.add(true);
    return this;
  }

  /**
   * Adds a row.
   *
   * @param cells one text for each column
   */
  void row(String... cells) {
    if (cells.length != headings.size()) {
      throw new IllegalArgumentException(
          cells.length + " cells for " + headings.size() + " columns");
    }
    rows.add(Arrays.stream(cells).map(PlainText::of).toList());
  }

  boolean isEmpty() {
    return rows.isEmpty();
  }

  /** Prints headings and rows, each line indented by two blanks. */
  void print(PrintWriter out) {
    int[] widths = new int[headings.size()];
    for (int column = 0; column < widths.length; column++) {
      widths[column] = PlainText.width(headings.get(column));
      for (List<String> row : rows) {
        widths[column] = Math.max(widths[column], PlainText.width(row.get(column)));
      }
    }
    out.println(line(headings, widths));
    for (List<String> row : rows) {
      out.println(line(row, widths));
    }
  }

  private String line(List<String> cells, int[] widths) {
    StringBuilder line = new StringBuilder();
    for (int column = 0; column < widths.length; column++) {
      String cell = cells.get(column);
      String blanks = " ".repeat(widths[column] - PlainText.width(cell));
      line.append("  ").append(right.get(column) ? blanks + cell : cell + blanks);
    }
    return line.toString().stripTrailing();
  }
}
