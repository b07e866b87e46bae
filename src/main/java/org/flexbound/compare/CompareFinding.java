package org.flexbound.compare;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What can be found when measured and computed flexibility are brought together. */
public enum CompareFinding implements FindingKind {
  /** A scaled part that a configuration does not have. */
  PART_NOT_IN_CONFIGURATION(
      "COMPARE-PART-NOT-IN-CONFIGURATION",
      Severity.NOTE,
      "A part that a parameter scales is not there in one configuration.",
      "Nothing, if the configuration is meant so."),
  /** A parameter that no configuration has. */
  PART_NOWHERE(
      "COMPARE-PART-NOWHERE",
      Severity.ERROR,
      "A part that a parameter scales is in no configuration.",
      "Correct the name, or the changes of the configurations."),
  /** A coefficient without any scatter or floor. */
  NO_SCATTER(
      "COMPARE-NO-SCATTER",
      Severity.ERROR,
      "A coefficient has neither scatter nor a fixed floor, so that it would weigh infinitely.",
      "State the repeatability in the options of the log."),
  /** Nothing to compare. */
  NOTHING_MEASURED(
      "COMPARE-NOTHING-MEASURED",
      Severity.ERROR,
      "No coefficient of a configuration can be compared with the model.",
      "Look at the verdicts of its runs and at the findings about base motion."),
  /** What truncation alone explains. */
  TRUNCATION(
      "COMPARE-TRUNCATION",
      Severity.NOTE,
      "The computed flexibility is that of the lowest modes only, which leave a part of it out.",
      "Compare with the full flexibility, unless the model is known by its modes only."),
  /** A measured coefficient that a table from outside lacks. */
  NOT_IN_TABLE(
      "COMPARE-NOT-IN-TABLE",
      Severity.ERROR,
      "A table computed elsewhere lacks a coefficient that was measured.",
      "Add its row, with the sensitivities to all parameters."),
  /** A sign that disagrees, far outside of the uncertainty. */
  OPPOSITE_SIGN(
      "COMPARE-OPPOSITE-SIGN",
      Severity.WARNING,
      "A measured coefficient has the sign opposite to the computed one.",
      "Look at the direction of the gauge and of the load.");

  private final Definition definition;

  CompareFinding(String code, Severity severity, String meaning, String remedy) {
    this.definition = new Definition(code, severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
