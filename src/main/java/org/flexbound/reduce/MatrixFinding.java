package org.flexbound.reduce;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What the matrix as a whole can show to be wrong. */
public enum MatrixFinding implements FindingKind {
  /** Reciprocity fails. */
  NOT_RECIPROCAL(
      "RED-NOT-RECIPROCAL",
      Severity.WARNING,
      "Two coefficients that should be equal are not.",
      "Check gains, directions and places of the two gauges and the two loads."),
  /** Reciprocity fails for all pairs together. */
  NOT_RECIPROCAL_TOGETHER(
      "RED-NOT-RECIPROCAL-TOGETHER",
      Severity.WARNING,
      "All reciprocal pairs together differ by more than chance explains, though none does alone.",
      "Look at the table of pairs for a gauge or load that is in most of the larger differences."),
  /** A bound is broken. */
  NOT_POSITIVE(
      "RED-NOT-POSITIVE",
      Severity.WARNING,
      "A coefficient breaks a bound that every elastic structure keeps.",
      "Check directions, columns and units of the gauges and loads named."),
  /** The square part is indefinite. */
  INDEFINITE(
      "RED-INDEFINITE",
      Severity.WARNING,
      "The square part of the matrix is not positive definite.",
      "Some combination of loads would give work instead of taking it: look for a gauge that is"
          + " misplaced, reversed or exchanged, or for base motion that was not taken out."),
  /** One gain stands out. */
  GAIN_STANDS_OUT(
      "RED-GAIN-STANDS-OUT",
      Severity.WARNING,
      "One point's gauge or load is out of scale with the others.",
      "Check the unit and the calibration of the gauge and of the load at that point."),
  /** A triple product fails. */
  TRIPLE_PRODUCT(
      "RED-TRIPLE-PRODUCT",
      Severity.WARNING,
      "Coefficients round three points disagree in a way that no wrong gain explains.",
      "Look for a misplaced gauge, seating, or a response that is not linear."),
  /** A guess: reversed. */
  LOOKS_REVERSED(
      "RED-LOOKS-REVERSED",
      Severity.WARNING,
      "A gauge or a load looks reversed. A guess, not applied.",
      "Check the direction on the sheets Gauges and Load points against the rig."),
  /** A guess: exchanged. */
  LOOKS_EXCHANGED(
      "RED-LOOKS-EXCHANGED",
      Severity.WARNING,
      "Two columns look exchanged. A guess, not applied.",
      "Check the cables and the column names."),
  /** A guess: a unit. */
  LOOKS_LIKE_UNIT(
      "RED-LOOKS-LIKE-UNIT",
      Severity.WARNING,
      "A factor looks like a unit mistaken for another. A guess, not applied.",
      "Check the units of the columns and the scale of the channel."),
  /** A guess: off line. */
  LOOKS_OFF_LINE(
      "RED-LOOKS-OFF-LINE",
      Severity.WARNING,
      "A load looks as if it had been applied off its line. A guess, not applied.",
      "Check the line of the jack; repeat with it in line, or enter the line as it was.");

  private final Definition definition;

  MatrixFinding(String code, Severity severity, String meaning, String remedy) {
    this.definition = new Definition(code, severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
