package org.flexbound.document;

import org.flexbound.finding.Where;

/**
 * One row of a sheet or of a CSV file, as seen during a visit.
 *
 * <p>Columns count from 0. A row is reused by its sheet: it may not be kept after the visit ends.
 */
public interface Row {
  /**
   * The row's number as the user sees it, from 1 (in a CSV file: the line at which it begins).
   *
   * @return the row number
   */
  int number();

  /**
   * One past the last column that is not blank.
   *
   * @return the number of columns to look at
   */
  int width();

  /**
   * What a cell holds.
   *
   * @param column the column, from 0; beyond the width all is blank
   * @return the kind
   */
  CellKind kind(int column);

  /**
   * The number in a cell of kind NUMBER or DATE.
   *
   * @param column the column, from 0
   * @return the number; NaN where the cell holds none
   */
  double number(int column);

  /**
   * What a cell shows, for every kind (a number in its shortest decimal form), without blanks
   * around it.
   *
   * @param column the column, from 0
   * @return the text, empty for a blank cell
   */
  String text(int column);

  /**
   * The place of a cell.
   *
   * @param column the column, from 0
   * @return file, sheet and cell (CSV: file, line and column)
   */
  Where where(int column);

  /**
   * Whether a number is shown in percent: the cell shows 12 % where the number is 0.12.
   *
   * @param column the column, from 0
   * @return true for a number in percent format
   */
  default boolean isPercent(int column) {
    return false;
  }

  /**
   * Whether the row is hidden in its workbook; it is read like the others.
   *
   * @return true for a hidden row
   */
  default boolean isHidden() {
    return false;
  }
}
