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
   * What is hidden or merged. Known after a visit of all rows; before one, this reads the sheet.
   *
   * @return the notes
   */
  default SheetNotes notes() {
    return SheetNotes.NONE;
  }
}
