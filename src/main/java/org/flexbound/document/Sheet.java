package org.flexbound.document;

import org.flexbound.finding.Where;

/** One sheet of a workbook, or a CSV file as a single sheet; its rows are streamed. */
public interface Sheet {
  /**
   * The sheet's name; for a CSV file the file's name without its ending.
   *
   * @return the name
   */
  String name();

  /**
   * The place of the whole sheet.
   *
   * @return file and sheet
   */
  Where where();

  /**
   * Shows the rows that are not wholly blank, from the top. May be called again; each call reads
   * from the beginning.
   *
   * @param visitor sees the rows
   * @throws org.flexbound.finding.Refusal where the sheet turns out to be damaged, or passes a limit
   * @throws java.io.UncheckedIOException where the system does not let it be read
   */
  void forEachRow(RowVisitor visitor);

  /**
   * The place of a cell, whether or not anything stands there.
   *
   * @param row the row's number, from 1 (in a CSV file: the line at which it begins)
   * @param column the column, from 0
   * @return file, sheet and cell (CSV: file, line and column)
   */
  Where cell(int row, int column);

  /**
   * How much of the sheet the visit that goes on has read.
   *
   * @return 0 to 1; 0 where it is not known
   */
  default double shareRead() {
    return 0;
  }

  /**
   * What is hidden or merged. Known after a visit of all rows; before one, this reads the sheet.
   *
   * @return the notes
   */
  default SheetNotes notes() {
    return SheetNotes.NONE;
  }
}
