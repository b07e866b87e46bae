package org.flexbound.app;

import java.nio.file.Path;
import java.util.Set;

/** Tells when somebody saved one of some files. */
interface SaveEvents extends AutoCloseable {
  /**
   * Waits until one of the files was saved and nothing more happened to them for a moment.
   *
   * @param files the files
   * @return true after a save; false once this was closed
   */
  boolean await(Set<Path> files);

  /** Ends the waiting. */
  @Override
  void close();
}
