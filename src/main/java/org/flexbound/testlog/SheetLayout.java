package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.List;

/**
 * The layout of one sheet of the load-test workbook: one definition for the reader and for the blank
 * template, so that they cannot drift apart.
 *
 * @param name the sheet's name
 * @param columns its columns
 * @param help what the sheet is for, as a note to the user
 */
record SheetLayout(String name, List<Column> columns, String help) {
  SheetLayout {
    columns = List.copyOf(columns);
  }

  /**
   * One column.
   *
   * @param name its header
   * @param required whether it must be there
   * @param choices what a cell may say; empty for free text or numbers
   * @param help what belongs in it
   */
  record Column(String name, boolean required, List<String> choices, String help) {
    Column {
      choices = List.copyOf(choices);
    }
  }

  List<String> required() {
    return columns.stream().filter(Column::required).map(Column::name).toList();
  }

  List<String> optional() {
    return columns.stream().filter(column -> !column.required()).map(Column::name).toList();
  }

  private static Column need(String name, String help, String... choices) {
    return new Column(name, true, List.of(choices), help);
  }

  private static Column may(String name, String help, String... choices) {
    return new Column(name, false, List.of(choices), help);
  }

  static final SheetLayout TEST =
      new SheetLayout(
          "Test",
          List.of(need("Item", "what the entry is"), need("Entry", "your entry")),
          "What was tested, when, where and by whom.");

  static final List<String> TEST_ITEMS =
      List.of(
          "Title",
          "Article",
          "Fixture",
          "Date",
          "Place",
          "Tested by",
          "Ambient temperature",
          "Length unit",
          "Notes");

  static final SheetLayout INSTRUMENTS =
      new SheetLayout(
          "Instruments",
          List.of(
              need("Instrument", "a name of your own, used on the other sheets"),
              may("Kind", "load cell, dial gauge, displacement transducer, …"),
              may("Serial", "serial number"),
              may("Calibration reference", "number of the certificate"),
              may("Calibration date", "date of the certificate"),
              may("Uncertainty of reading (%)", "the part that grows with the reading"),
              may("Uncertainty fixed", "the part that does not, in the unit of this row"),
              may("Unit", "unit of the fixed part, the resolution and the range"),
              may(
                  "As stated",
                  "how the certificate states it: standard, expanded, or limits",
                  "k=1",
                  "k=2",
                  "limits ±"),
              may("Resolution", "the smallest step it shows"),
              may("Range", "the largest reading it can show")),
          "The load cells and transducers, from their calibration certificates.");

  static final SheetLayout LOAD_POINTS =
      new SheetLayout(
          "Load points",
          List.of(
              need("Load", "a name; several rows of one name are a load pattern"),
              may("Node", "a node of the frame model, or member @ share"),
              need("Direction", "+x, -z, (0, 0.7, -0.7), rx, …"),
              need("Column", "the header of its column on the readings sheets"),
              may("Unit", "unit of that column"),
              may("Instrument", "a name of the sheet Instruments"),
              may("Share", "its part of the pattern's total"),
              may("Limit", "the load that must not be passed"),
              may("X", "place"),
              may("Y", "place"),
              may("Z", "place"),
              may("Position uncertainty", "standard uncertainty of the place"),
              may("Angle uncertainty", "standard uncertainty of the line, degrees unless stated"),
              may("Remark", "anything")),
          "Where the structure is loaded.");

  static final SheetLayout GAUGES =
      new SheetLayout(
          "Gauges",
          List.of(
              need("Gauge", "a name"),
              may("Kind", "what it reads", "displacement", "rotation", "relative", "strain"),
              may("Node", "a node of the frame model, or member @ share"),
              may("Node 2", "the second node of a relative gauge"),
              may("Direction", "+x, -z, (0, 0.7, -0.7), rx, …; not for strain"),
              need("Column", "the header of its column on the readings sheets"),
              may("Unit", "unit of that column"),
              may("Instrument", "a name of the sheet Instruments"),
              may("Measures", "what it touches", "article", "fixture", "ground"),
              may("Stands on", "what carries it", "article", "fixture", "ground"),
              may("Base", "yes where its motion is taken out of the others", "yes", "no"),
              may("Member", "the member it sits on"),
              may("At", "where along the member, 0 to 1"),
              may("Section point", "for strain: y, z from the centroid, e.g. (0, 50)"),
              may("X", "place"),
              may("Y", "place"),
              may("Z", "place"),
              may("Position uncertainty", "standard uncertainty of the place"),
              may("Angle uncertainty", "standard uncertainty of the direction"),
              may("Remark", "anything")),
          "Where motion is read.");

  static final SheetLayout RUNS =
      new SheetLayout(
          "Runs",
          List.of(
              need("Run", "a name; several rows of one name describe one run"),
              need("Sheet", "the sheet with its readings"),
              may("First row", "first row of the run on that sheet"),
              may("Last row", "last row of the run on that sheet"),
              may("Column", "a column whose meaning is given here for this run"),
              may("Load or gauge", "what that column reads in this run"),
              may("Date", "when"),
              may("Temperature", "temperature"),
              may("Use", "no leaves the run out", "yes", "no"),
              may("Remark", "anything")),
          "What the columns mean in each run, where a cell or a dial is moved about.");

  /** The same in a description of a log, where a run may lie in another file. */
  static final SheetLayout RUNS_IN_FILES = inFiles();

  private static SheetLayout inFiles() {
    List<Column> columns = new ArrayList<>();
    for (Column column : RUNS.columns()) {
      if (column.name().equals("Sheet")) {
        columns.add(need("File", "the file with its readings"));
        columns.add(may("Sheet", "its sheet, where that file has several"));
      } else {
        columns.add(column);
      }
    }
    return new SheetLayout(RUNS.name(), columns, RUNS.help());
  }

  static final SheetLayout OPTIONS =
      new SheetLayout(
          "Options",
          List.of(
              need("Item", "the option"),
              need("Entry", "your entry"),
              may("Unit", "its unit"),
              may("Gauge", "a gauge, where the entry is for it alone")),
          "How the readings are to be reduced.");

  static final SheetLayout LIMITS =
      new SheetLayout(
          "Limits",
          List.of(
              need("Limit", "a name"),
              need(
                  "On",
                  "what it is set on",
                  "coefficient",
                  "direct stiffness",
                  "compliance",
                  "softest compliance",
                  "fixture share",
                  "model agreement",
                  "reciprocity",
                  "linearity",
                  "hysteresis",
                  "repeatability",
                  "set"),
              may("Gauge", "the gauge"),
              may("Load", "the load"),
              may("Node", "the point, for a compliance"),
              may("Direction", "the direction, for a compliance"),
              may("Lower", "smallest allowed value"),
              may("Upper", "largest allowed value"),
              may("Unit", "unit of the values"),
              may("Remark", "anything")),
          "Acceptance limits for a check.");

  static final SheetLayout COEFFICIENTS =
      new SheetLayout(
          "Coefficients",
          List.of(
              need("Gauge", "a name of the gauges"),
              need("Load", "a name of the load points"),
              need("Value", "absolute coefficient: motion per load, base motion not taken out"),
              may("Unit", "its unit, such as mm/kN"),
              may("Standard uncertainty", "of the value (k=1), in its unit or in %"),
              may("Degrees of freedom", "of the uncertainty; blank where it is well known"),
              may("Remark", "anything")),
          "Coefficients that were reduced elsewhere, in place of readings.");

  /** All sheets that are known by name and hold entries. */
  static List<SheetLayout> known() {
    List<SheetLayout> known = new ArrayList<>(ALL);
    known.add(COEFFICIENTS);
    return known;
  }

  /** The same where a column may be missing. */
  SheetLayout without(String column) {
    return new SheetLayout(
        name,
        columns.stream()
            .map(c -> c.name().equals(column) ? may(column, c.help()) : c)
            .toList(),
        help);
  }

  /** All entry sheets, in the order of the template. */
  static final List<SheetLayout> ALL =
      List.of(TEST, INSTRUMENTS, LOAD_POINTS, GAUGES, RUNS, OPTIONS, LIMITS);

  /** The optional columns of a readings sheet. */
  static final List<String> READING_COLUMNS = List.of("Time", "Step", "Use", "Remark");
}
