package org.flexbound.testlog;

/** Sees the readings of a run one after another. */
@FunctionalInterface
public interface ReadingVisitor {
  /**
   * Sees one row of readings.
   *
   * @param reading the row; reused, so it may not be kept
   */
  void visit(Reading reading);
}
