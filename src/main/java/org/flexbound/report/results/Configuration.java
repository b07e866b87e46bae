package org.flexbound.report.results;

import java.util.List;

/**
 * One arrangement of supports, parts and loads, with its log.
 *
 * @param name its name
 * @param log the file of its readings, relative; empty where there is none
 * @param test what that log says of the test
 * @param changes what differs from the model as described, one sentence each
 */
public record Configuration(
    String name,
    String log,
    Test test,
    List<String> changes) {
  /** Copies the lists. */
  public Configuration {
    changes = List.copyOf(changes);
  }
}
