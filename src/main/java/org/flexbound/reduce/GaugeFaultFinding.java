package org.flexbound.reduce;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What readings show of faults of gauges, instruments and the load column. */
public enum GaugeFaultFinding implements FindingKind {
  /** A gauge does not move while the load does. */
  STUCK(
      "RED-STUCK",
      Severity.WARNING,
      "A gauge shows one value while the load goes on.",
      "Check that it touches, is free and is not out of travel; repeat the run."),
  /** A gauge stays at its end. */
  SATURATED(
      "RED-SATURATED",
      Severity.WARNING,
      "A gauge stays at the end of its readings while the load goes on, and comes back with it.",
      "Reset the gauge so that its travel, or the logger's range, suits the movement; repeat."),
  /** A reading past the stated range. */
  OUT_OF_RANGE(
      "RED-OUT-OF-RANGE",
      Severity.WARNING,
      "A reading passes the range stated for its instrument, where its calibration does not hold.",
      "Check the range on the sheet Instruments, or use an instrument of larger range."),
  /** A reading steps and stays. */
  JUMPED(
      "RED-JUMPED",
      Severity.WARNING,
      "A gauge steps to another level and stays there, which no load explains.",
      "Look whether the gauge or its stand was touched; repeat the run."),
  /** Several gauges step at once. */
  SLIPPED(
      "RED-SLIPPED",
      Severity.WARNING,
      "Several gauges step at once and stay there, which no load explains.",
      "Look for slip or set in a joint or in the clamping; bed the structure in and repeat."),
  /** A drift. */
  DRIFT(
      "RED-DRIFT",
      Severity.WARNING,
      "A gauge drifts through a run.",
      "Let temperatures settle; look at the gauge's stand; repeat the run."),
  /** A kink. */
  KINK(
      "RED-KINK",
      Severity.WARNING,
      "A gauge's slope changes at one load.",
      "Look for a joint that slips or a gap that closes there; fit the range below or above it."),
  /** One bad step. */
  OUTLIER(
      "RED-OUTLIER",
      Severity.WARNING,
      "One step of a gauge lies off its line.",
      "Look at its rows; say no in their column Use if they are a mistake: nothing was left out."),
  /** Readings lost. */
  DROPPED_OUT(
      "RED-DROPPED-OUT",
      Severity.WARNING,
      "Readings of a gauge drop to nought, to one value or to nothing and come back.",
      "Check plug and cable; say no in the column Use for these rows, or repeat the run."),
  /** A single reading off its neighbours. */
  SPIKE(
      "RED-SPIKE",
      Severity.WARNING,
      "A reading leaves the readings around it and comes back, which no load explains.",
      "Look at the row; say no in its column Use if it is a mistake."),
  /** Too coarse. */
  COARSE(
      "RED-COARSE",
      Severity.WARNING,
      "A gauge is coarse against the largest movement it saw.",
      "Use a finer gauge, or more load within the limit."),
  /** The load column does not return to zero. */
  LOAD_ZERO(
      "RED-LOAD-ZERO",
      Severity.WARNING,
      "The load column does not return to its opening zero although the gauges do.",
      "Check the cell's zero before and after; repeat the run."),
  /** The run ends under load. */
  LOAD_LEFT(
      "RED-LOAD-LEFT",
      Severity.NOTE,
      "Some load was left on at the end of a run, and the gauges show it.",
      "Nothing, if the load was meant to stay; unload fully to see the zero come back."),
  /** The load passed its limit. */
  LOAD_LIMIT(
      "RED-LOAD-LIMIT",
      Severity.WARNING,
      "The load passed its stated limit.",
      "Stop, and have a competent person decide before going on."),
  /** The load was off its line in one run. */
  OFF_LINE(
      "RED-OFF-LINE",
      Severity.WARNING,
      "In one run the gauges across the load moved otherwise than in the other runs of that load.",
      "Check the line of the jack in that run; repeat it.");

  private final Definition definition;

  GaugeFaultFinding(String code, Severity severity, String meaning, String remedy) {
    this.definition = new Definition(code, severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
