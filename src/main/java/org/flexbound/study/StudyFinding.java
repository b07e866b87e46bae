package org.flexbound.study;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What can be found in a study file. */
public enum StudyFinding implements FindingKind {
  /** A value of the wrong kind. */
  WRONG_KIND(
      "STUDY-WRONG-KIND",
      Severity.ERROR,
      "A value is not of the kind that its key asks for.",
      "Correct the value."),
  /** A key that is not known. */
  UNKNOWN_KEY(
      "STUDY-UNKNOWN-KEY",
      Severity.ERROR,
      "The study has a key that is not known.",
      "Correct the spelling, or take the key out."),
  /** A key that must be there is not. */
  MISSING_KEY(
      "STUDY-MISSING-KEY",
      Severity.ERROR,
      "A key that is needed is missing.",
      "Add it."),
  /** Keys that exclude each other. */
  KEYS_DISAGREE(
      "STUDY-KEYS-DISAGREE",
      Severity.ERROR,
      "Two keys exclude each other, or say different things.",
      "Keep one of them."),
  /** A key that has a meaning but does not work yet. */
  NOT_SUPPORTED_YET(
      "STUDY-NOT-SUPPORTED-YET",
      Severity.ERROR,
      "The key is part of the format, but does not work yet.",
      "Take it out."),
  /** A part that is scaled by no known path. */
  BAD_SCALE(
      "STUDY-BAD-SCALE",
      Severity.ERROR,
      "A parameter scales something that is not a stiffness of the model.",
      "Write kind, name and component, such as joints.knee.rz or members.post.EIy."),
  /** Bounds that leave nothing. */
  BAD_BOUNDS(
      "STUDY-BAD-BOUNDS",
      Severity.ERROR,
      "The bounds of a parameter are not in order, or cannot be worked in its variable.",
      "State a lower bound below the upper one."),
  /** One stiffness scaled twice. */
  SCALED_TWICE(
      "STUDY-SCALED-TWICE",
      Severity.ERROR,
      "One stiffness is scaled more than once.",
      "Leave it to one parameter."),
  /** A held-out load case that no log has. */
  NO_SUCH_CASE(
      "STUDY-NO-SUCH-CASE",
      Severity.ERROR,
      "A held-out load case is in no log of the study.",
      "Correct the name of the load or of the configuration.");

  private final Definition definition;

  StudyFinding(String code, Severity severity, String meaning, String remedy) {
    this.definition = new Definition(code, severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
