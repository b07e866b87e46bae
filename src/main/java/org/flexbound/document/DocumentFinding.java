package org.flexbound.document;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What can be wrong with a file as such, whatever it is about. */
public enum DocumentFinding implements FindingKind {
  /** There is no such file. */
  MISSING("DOC-MISSING", "A file that is named does not exist.", "Check the name and the folder."),
  /** It cannot be read as the kind of file it should be. */
  UNREADABLE(
      "DOC-UNREADABLE",
      "A file is not of the kind it should be, or is damaged.",
      "Save it again from the program that made it."),
  /** Protected by a password, or encrypted. */
  PROTECTED(
      "DOC-PROTECTED",
      "A file is encrypted or protected by a password.",
      "Save a copy without the password."),
  /** More than is read. */
  LIMIT(
      "DOC-LIMIT",
      "A file holds more than is read; the limit is named.",
      "Check that it is the right file; split it, or raise the limit named."),
  /** A file that is named lies elsewhere. */
  OUTSIDE_FOLDER(
      "DOC-OUTSIDE-FOLDER",
      "A file is named that does not lie in the folder of the file that names it.",
      "Put it there, and name it relative to that folder."),
  /** JSON syntax. */
  JSON_SYNTAX("DOC-JSON-SYNTAX", "A JSON file breaks the rules of JSON.", "Mend the line named."),
  /** The same key twice in one object. */
  DUPLICATE_KEY(
      "DOC-DUPLICATE-KEY",
      "A key stands twice in one object, and which of them is meant cannot be told.",
      "Remove one of the two, or give it another name."),
  /** A key that is not known. */
  UNKNOWN_KEY("DOC-UNKNOWN-KEY", "A key is not one of those known here.", "Correct or remove it."),
  /** A value is missing. */
  ABSENT("DOC-ABSENT", "A value that is needed is not there.", "Add it."),
  /** A value of the wrong kind. */
  WRONG_KIND(
      "DOC-WRONG-KIND", "A value is not of the kind that is needed.", "Write it as described."),
  /** Hidden rows, columns or sheets were read. */
  HIDDEN(
      "DOC-HIDDEN",
      Severity.NOTE,
      "Hidden rows, columns or sheets of a workbook were read like the others.",
      "Look at what is hidden; delete it if it is not meant."),
  /** Merged cells. */
  MERGED(
      "DOC-MERGED",
      Severity.NOTE,
      "Merged cells: the value belongs to the first cell, the others count as blank.",
      "Unmerge the cells if each should hold the value."),
  /** Macros. */
  MACROS(
      "DOC-MACROS",
      Severity.NOTE,
      "A workbook holds macros; they are not run.",
      "Nothing, if the values stored in the cells are those that are meant."),
  /** Links to other workbooks. */
  EXTERNAL_LINKS(
      "DOC-EXTERNAL-LINKS",
      Severity.NOTE,
      "A workbook takes values from other workbooks; the values last stored are used.",
      "Update the links and save the workbook if they may be out of date."),
  /** Open in another program. */
  OPEN_ELSEWHERE(
      "DOC-OPEN-ELSEWHERE",
      Severity.NOTE,
      "A workbook seems to be open in another program; what was last saved is read.",
      "Save the workbook there if the last changes should count."),
  /** The layout of a CSV file was found out from its text. */
  CSV_LAYOUT(
      "DOC-CSV-LAYOUT",
      Severity.NOTE,
      "How a CSV file is written (separator, decimal sign, encoding) was found out from its text.",
      "State it in the description of the log if it was found wrongly.");

  private final Definition definition;

  DocumentFinding(String code, String meaning, String remedy) {
    this(code, Severity.ERROR, meaning, remedy);
  }

  DocumentFinding(String code, Severity severity, String meaning, String remedy) {
    this.definition = new Definition(code, severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
