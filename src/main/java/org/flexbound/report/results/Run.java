package org.flexbound.report.results;

import java.util.List;
import java.util.OptionalDouble;

/**
 * One recorded sequence of load steps, with its verdict.
 *
 * @param configuration the configuration
 * @param name its name
 * @param verdict accept, doubtful or repeat
 * @param reasons why, one sentence each; empty where nothing speaks against it
 * @param date when, or empty
 * @param temperature temperature, K
 * @param used false where it was left out
 * @param loads the loads that were varied
 * @param peakLoad largest load reached, in loadUnit
 * @param loadUnit the SI unit of the load: N or N·m
 * @param steps number of held load steps
 * @param cycles number of load cycles
 * @param remark the remark of the log
 * @param where sheet or rows
 */
public record Run(
    String configuration,
    String name,
    String verdict,
    List<String> reasons,
    String date,
    OptionalDouble temperature,
    boolean used,
    List<String> loads,
    OptionalDouble peakLoad,
    String loadUnit,
    int steps,
    int cycles,
    String remark,
    String where) {
  /** Copies the lists. */
  public Run {
    reasons = List.copyOf(reasons);
    loads = List.copyOf(loads);
  }
}
