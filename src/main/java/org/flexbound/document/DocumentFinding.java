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
  /** JSON syntax. */
  JSON_SYNTAX("DOC-JSON-SYNTAX", "A JSON file breaks the rules of JSON.", "Mend the line named."),
  /** A key that is not known. */
  UNKNOWN_KEY("DOC-UNKNOWN-KEY", "A key is not one of those known here.", "Correct or remove it."),
  /** A value is missing. */
  ABSENT("DOC-ABSENT", "A value that is needed is not there.", "Add it."),
  /** A value of the wrong kind. */
  WRONG_KIND(
      "DOC-WRONG-KIND", "A value is not of the kind that is needed.", "Write it as described.");

  private final String code;
  private final String meaning;
  private final String remedy;

  DocumentFinding(String code, String meaning, String remedy) {
    this.code = code;
    this.meaning = meaning;
    this.remedy = remedy;
  }

  @Override
  public String code() {
    return code;
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String meaning() {
    return meaning;
  }

  @Override
  public String remedy() {
    return remedy;
  }
}
