package org.flexbound.testlog;

/** The rows of readings of a run, streamed from where they lie or held in memory. */
@FunctionalInterface
public interface Readings {
  /**
   * Shows every row from the first. May be called again.
   *
   * @param visitor sees the rows
   */
  void forEach(ReadingVisitor visitor);
}
