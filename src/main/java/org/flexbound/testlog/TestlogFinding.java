package org.flexbound.testlog;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What can be found in a load-test log. */
public enum TestlogFinding implements FindingKind {
  /** A sheet that must be there is not. */
  MISSING_SHEET(
      "LOG-MISSING-SHEET",
      Severity.ERROR,
      "A sheet that a load-test log must have is not there.",
      "Add the sheet as in the blank template."),
  /** A sheet has a header and nothing below. */
  EMPTY_SHEET(
      "LOG-EMPTY-SHEET",
      Severity.ERROR,
      "A sheet that must be filled in is empty.",
      "Fill it in; the sheet Examples shows how."),
  /** An entry is missing. */
  MISSING_ENTRY(
      "LOG-MISSING-ENTRY", Severity.ERROR, "An entry that is needed is blank.", "Fill it in."),
  /** A cell that must hold a number does not. */
  NOT_A_NUMBER(
      "LOG-NOT-A-NUMBER",
      Severity.ERROR,
      "A cell that must hold a number holds something else.",
      "Enter a number, or clear the cell, or say no in the column Use of that row; in a description,"
          + " state firstRow, lastRow or noReading."),
  /** A number was stored as text. */
  NUMBER_AS_TEXT(
      "LOG-NUMBER-AS-TEXT",
      Severity.NOTE,
      "Numbers stored as text were read as numbers.",
      "Check that they were meant so."),
  /** A unit is not known, or not of the right kind. */
  UNIT(
      "LOG-UNIT",
      Severity.ERROR,
      "A unit is not known or does not fit what is measured.",
      "Correct the unit."),
  /** Two places state different units. */
  UNITS_DISAGREE(
      "LOG-UNITS-DISAGREE",
      Severity.ERROR,
      "Two places state different units for one column.",
      "Correct the one that is wrong."),
  /** No unit is stated anywhere. */
  NO_UNIT(
      "LOG-NO-UNIT",
      Severity.ERROR,
      "A column has no unit.",
      "State it with the load point or the gauge, in brackets in the header, or in a units row."),
  /** A direction cannot be read. */
  DIRECTION(
      "LOG-DIRECTION", Severity.ERROR, "A direction cannot be read.", "Write it as in the message."),
  /** A choice is not one of those offered. */
  CHOICE(
      "LOG-CHOICE",
      Severity.ERROR,
      "An entry is not one of those that are offered.",
      "Choose one of those named."),
  /** A name is used twice. */
  TWICE("LOG-TWICE", Severity.ERROR, "A name stands twice.", "Rename or remove one."),
  /** A name is not known. */
  UNKNOWN_NAME(
      "LOG-UNKNOWN-NAME",
      Severity.ERROR,
      "A name is used that stands nowhere else.",
      "Correct the name, or add what it names."),
  /** An entry is out of its range. */
  OUT_OF_RANGE(
      "LOG-OUT-OF-RANGE",
      Severity.ERROR,
      "A number is outside what it can be.",
      "Correct the number."),
  /** A readings sheet lacks a column. */
  MISSING_COLUMN(
      "LOG-MISSING-COLUMN",
      Severity.ERROR,
      "A readings sheet lacks a column that its run needs.",
      "Add the column, or correct its name where the load points, gauges and runs are described."),
  /** Coefficients and readings. */
  BOTH(
      "LOG-BOTH",
      Severity.ERROR,
      "A log has both coefficients and sheets that may hold readings.",
      "Keep one of the two: coefficients stand in place of readings."),
  /** Two rows may be the header. */
  HEADER_UNCERTAIN(
      "LOG-HEADER-UNCERTAIN",
      Severity.ERROR,
      "Two rows of a sheet may name its columns.",
      "Say in a description of the log which row it is (headerRow), or remove the other."),
  /** A row between header and readings. */
  ROW_NOT_USED(
      "LOG-ROW-NOT-USED",
      Severity.NOTE,
      "A row between the header and the readings was not used.",
      "Nothing to do, unless it was meant to be the units or readings."),
  /** Cells that stand for no reading. */
  READINGS_MISSING(
      "LOG-READINGS-MISSING",
      Severity.NOTE,
      "Cells hold a text that the description of the log gives for a missing reading.",
      "Nothing to do, unless readings were lost that are needed."),
  /** Times that cannot be read. */
  TIME_NOT_READ(
      "LOG-TIME-NOT-READ",
      Severity.NOTE,
      "Times in the column Time could not be read, and count as not stated.",
      "Write them as seconds or as a clock, where drift is to be judged."),
  /** Numbers are scaled. */
  SCALED(
      "LOG-SCALED",
      Severity.NOTE,
      "The numbers of a column are multiplied by a factor that the description of the log states.",
      "Check the factor against the logger's settings."),
  /** Two entries claim one column. */
  COLUMN_CLAIMED_TWICE(
      "LOG-COLUMN-CLAIMED-TWICE",
      Severity.ERROR,
      "Two loads or gauges claim one column in one run.",
      "Say on the sheet Runs which of them the column reads in that run."),
  /** An entry that is stated elsewhere takes the place of the log's. */
  OVERRIDDEN(
      "LOG-OVERRIDDEN",
      Severity.NOTE,
      "What the study states takes the place of what the log states.",
      "Nothing to do, if that is meant; else take it out of the study."),
  /** No readings at all. */
  NO_READINGS(
      "LOG-NO-READINGS",
      Severity.ERROR,
      "No sheet holds readings.",
      "Add a sheet with a header row that names at least one load column and one gauge column."),
  /** A sheet is nothing that is known. */
  SHEET_NOT_USED(
      "LOG-SHEET-NOT-USED",
      Severity.NOTE,
      "A sheet was not used.",
      "Nothing to do, unless it was meant to hold readings."),
  /** A column on a readings sheet is not used. */
  COLUMN_NOT_USED(
      "LOG-COLUMN-NOT-USED",
      Severity.NOTE,
      "A column of a readings sheet was not used.",
      "Nothing to do, unless it was meant to be a load or a gauge."),
  /** No calibration is stated. */
  NO_CALIBRATION(
      "LOG-NO-CALIBRATION",
      Severity.WARNING,
      "The uncertainty of an instrument is not stated; results are marked calibration not included.",
      "Enter it from the certificate."),
  /** No instrument is named. */
  NO_INSTRUMENT(
      "LOG-NO-INSTRUMENT",
      Severity.WARNING,
      "No instrument is named; results are marked calibration not included.",
      "Name it, and enter it on the sheet Instruments."),
  /** An option is not known. */
  OPTION("LOG-OPTION", Severity.ERROR, "An option is not known.", "Choose one of those named."),
  /** Something of the format that does not work yet. */
  NOT_SUPPORTED_YET(
      "LOG-NOT-SUPPORTED-YET",
      Severity.ERROR,
      "The log asks for something that the program cannot do yet.",
      "Remove the entry."),
  /** A pattern does not hang together. */
  PATTERN(
      "LOG-PATTERN",
      Severity.ERROR,
      "The rows of a load pattern do not agree.",
      "Give them one column and unit, and shares that do not sum to zero."),
  /** The place of a load or gauge is not stated. */
  NO_PLACE(
      "LOG-NO-PLACE",
      Severity.ERROR,
      "A load or a gauge has no place.",
      "State a node, a member and where along it, or X, Y and Z.");

  private final Definition definition;

  TestlogFinding(String code, Severity severity, String meaning, String remedy) {
    this.definition = new Definition(code, severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
