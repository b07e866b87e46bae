package org.flexbound.document;

/** Is told how far the reading of a long file has come. */
@FunctionalInterface
public interface ReadProgress {
  /** Tells nobody. */
  ReadProgress NONE = (file, share) -> {};

  /**
   * Some more was read; called every few thousand rows.
   *
   * @param file the file's name as the user gave it
   * @param share how much of the sheet or text file has been read, 0 to 1
   */
  void read(String file, double share);
}
