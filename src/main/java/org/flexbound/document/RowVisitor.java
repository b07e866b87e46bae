package org.flexbound.document;

/** Sees the rows of a sheet one after another. */
@FunctionalInterface
public interface RowVisitor {
  /**
   * Sees one row.
   *
   * @param row the row; reused, so it may not be kept
   * @return true to go on, false to stop reading
   */
  boolean visit(Row row);
}
