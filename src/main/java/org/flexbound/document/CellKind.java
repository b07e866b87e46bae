package org.flexbound.document;

/** What a cell of a sheet holds; a formula counts as its cached value. */
public enum CellKind {
  /** Nothing, or only blanks. */
  BLANK,
  /** Text. */
  TEXT,
  /** A number. */
  NUMBER,
  /** A date or a time, stored as a number of days. */
  DATE,
  /** TRUE or FALSE. */
  TRUTH,
  /** An error value such as #DIV/0!. */
  ERROR
}
