package org.flexbound.reduce;

import java.util.List;
import java.util.OptionalDouble;
import org.flexbound.finding.Where;

/**
 * A run with its verdict.
 *
 * @param name its name
 * @param verdict what may be done with it
 * @param reasons why, one sentence each; empty where nothing speaks against it
 * @param date when, or empty
 * @param temperature K, where stated
 * @param use false where the user left it out
 * @param loads the loads that were varied
 * @param peakLoad the largest magnitude reached, N or N·m
 * @param steps number of load steps
 * @param cycles number of load cycles
 * @param remark the user's remark
 * @param where its place
 */
public record RunResult(
    String name,
    RunVerdict verdict,
    List<String> reasons,
    String date,
    OptionalDouble temperature,
    boolean use,
    List<String> loads,
    double peakLoad,
    int steps,
    int cycles,
    String remark,
    Where where) {
  /** Copies the lists. */
  public RunResult {
    reasons = List.copyOf(reasons);
    loads = List.copyOf(loads);
  }
}
