package org.flexbound.reduce;

import org.flexbound.finding.Where;

/**
 * A fault of a gauge or a load column in a run.
 *
 * @param kind what it is
 * @param where its rows
 * @param run the run; empty where it concerns the whole test
 * @param column the gauge or the load
 * @param text what was seen, with numbers, as it follows the name of the column
 * @param weight what it makes of the run
 */
record GaugeFault(
    GaugeFaultFinding kind,
    Where where,
    String run,
    String column,
    String text,
    RunVerdict weight) {
  /** Whether curvature, hysteresis and the like of this gauge in this run are only its symptoms. */
  boolean explainsDepartures() {
    return switch (kind) {
      case STUCK, SATURATED, JUMPED, SLIPPED, DROPPED_OUT, SPIKE, LOAD_ZERO, DRIFT, KINK, OUTLIER -> true;
      case OUT_OF_RANGE, COARSE, LOAD_LEFT, LOAD_LIMIT, OFF_LINE -> false;
    };
  }

  String sentence() {
    return "'" + column + "'" + (run.isEmpty() ? "" : " in run '" + run + "'") + " " + text;
  }
}
