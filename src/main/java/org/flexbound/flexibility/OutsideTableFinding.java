package org.flexbound.flexibility;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What can be found in a table of flexibility coefficients from outside. */
public enum OutsideTableFinding implements FindingKind {
  /** A cell that is not what its column asks for. */
  WRONG_CELL(
      "OUTSIDE-WRONG-CELL",
      Severity.ERROR,
      "A cell of a table from outside is not what its column asks for.",
      "Correct the cell."),
  /** No sheet with the columns asked for. */
  NO_TABLE(
      "OUTSIDE-NO-TABLE",
      Severity.ERROR,
      "No sheet of the file has the columns Gauge, Load, Value and one for each parameter.",
      "Give the table a header row with these names."),
  /** A coefficient stated twice. */
  STATED_TWICE(
      "OUTSIDE-STATED-TWICE",
      Severity.ERROR,
      "A coefficient is stated twice for one configuration.",
      "Keep one of the rows.");

  private final Definition definition;

  OutsideTableFinding(String code, Severity severity, String meaning, String remedy) {
    this.definition = new Definition(code, severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
