package org.flexbound.compare;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What a test can look like beside its model: guesses with their evidence, never applied. */
public enum CompareHintFinding implements FindingKind {
  /** Reversed. */
  LOOKS_REVERSED(
      "COMPARE-LOOKS-REVERSED",
      Severity.WARNING,
      "Beside the model a gauge or a load looks reversed. A guess, not applied.",
      "Check the direction of the gauge or load against the rig."),
  /** Columns exchanged. */
  LOOKS_EXCHANGED(
      "COMPARE-LOOKS-EXCHANGED",
      Severity.WARNING,
      "Beside the model some gauges' columns look exchanged. A guess, not applied.",
      "Check the cables and the column names."),
  /** A unit mistaken for another. */
  LOOKS_LIKE_UNIT(
      "COMPARE-LOOKS-LIKE-UNIT",
      Severity.WARNING,
      "Beside the model a factor looks like a unit mistaken for another. A guess, not applied.",
      "Check the units of the log and of the model."),
  /** A gauge elsewhere. */
  LOOKS_MISPLACED(
      "COMPARE-LOOKS-MISPLACED",
      Severity.WARNING,
      "Beside the model a gauge looks as if it sat at another node. A guess, not applied.",
      "Check where the gauge sits and which node its row names."),
  /** A load off its line. */
  LOOKS_OFF_LINE(
      "COMPARE-LOOKS-OFF-LINE",
      Severity.WARNING,
      "Beside the model a load looks as if it had been applied off its line. A guess, not applied.",
      "Check the line of the jack, or enter the line as it was.");

  private final Definition definition;

  CompareHintFinding(String code, Severity severity, String meaning, String remedy) {
    this.definition = new Definition(code, severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
