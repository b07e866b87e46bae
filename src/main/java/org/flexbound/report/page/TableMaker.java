package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Puts a table together row by row. */
final class TableMaker {
  private final String caption;
  private final List<Block.Column> columns = new ArrayList<>();
  private final List<List<Block.Cell>> rows = new ArrayList<>();

  TableMaker(String caption) {
    this.caption = caption;
  }

  TableMaker text(String... headings) {
    Arrays.stream(headings).forEach(heading -> columns.add(new Block.Column(heading, false)));
    return this;
  }

  TableMaker number(String... headings) {
    Arrays.stream(headings).forEach(heading -> columns.add(new Block.Column(heading, true)));
    return this;
  }

  void row(String... cells) {
    row(Arrays.stream(cells).map(Block.Cell::of).toList());
  }

  void row(List<Block.Cell> cells) {
    if (cells.size() != columns.size()) {
      throw new IllegalArgumentException(
          cells.size() + " cells for " + columns.size() + " columns of '" + caption + "'");
    }
    rows.add(cells);
  }

  boolean isEmpty() {
    return rows.isEmpty();
  }

  Block.Table make() {
    return new Block.Table(caption, columns, rows);
  }
}
