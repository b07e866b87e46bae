package org.flexbound.testlog;

import java.util.Optional;
import org.flexbound.document.Json;
import org.flexbound.document.ReadProgress;

/**
 * What is known of a log outside of it.
 *
 * @param options entries of the sheet Options that are stated elsewhere and override the log's, an
 *     object with the keys of a description of a log
 * @param limits rows of the sheet Limits that are stated elsewhere; one of the same name takes the
 *     place of the log's
 * @param planned whether the test is only planned: readings may be missing, and none are used but the
 *     planned loads
 * @param progress is told how far the reading of a long file has come
 */
public record LogContext(
    Optional<Json> options, Optional<Json> limits, boolean planned, ReadProgress progress) {
  /** A log that stands for itself. */
  public static final LogContext NONE =
      new LogContext(Optional.empty(), Optional.empty(), false, ReadProgress.NONE);

  /**
   * The same, watched.
   *
   * @param other is told how far the reading of a long file has come
   * @return the context
   */
  public LogContext with(ReadProgress other) {
    return new LogContext(options, limits, planned, other);
  }
}
