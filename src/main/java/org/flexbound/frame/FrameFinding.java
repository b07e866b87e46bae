package org.flexbound.frame;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What may be found in a frame model. */
public enum FrameFinding implements FindingKind {
  /** A key that means nothing here. */
  UNKNOWN_KEY(
      Severity.ERROR,
      "A key that a frame model does not have at this place.",
      "Correct the spelling or take the key out."),
  /** A key that must be there is not. */
  MISSING_KEY(Severity.ERROR, "A key that is needed is missing.", "Add it."),
  /** A value of the wrong kind. */
  WRONG_KIND(
      Severity.ERROR,
      "A value is not of the kind that is expected at this place.",
      "Write what is expected there."),
  /** A unit that cannot be read, or that measures something else. */
  WRONG_UNIT(
      Severity.ERROR,
      "A unit is unknown or measures something else than is expected.",
      "Write the value with a unit of the right kind, or as a number in the declared units."),
  /** A number that makes no sense. */
  OUT_OF_RANGE(
      Severity.ERROR,
      "A number lies outside of what is possible.",
      "Correct the number or its unit."),
  /** A name that is not in its table. */
  UNKNOWN_NAME(
      Severity.ERROR,
      "An entry names another one that the model does not have.",
      "Correct the name or add the entry."),
  /** A member without length, axes that are none. */
  BAD_GEOMETRY(
      Severity.ERROR,
      "The geometry of an entry makes no sense.",
      "Correct the nodes, offsets or directions."),
  /** Rigid parts that close a circle. */
  RIGID_CIRCLE(
      Severity.ERROR,
      "Rigid links or rigid connections tie nodes together that are tied already.",
      "Take out one of the circle."),
  /** A stiffness path that leads nowhere. */
  BAD_PATH(
      Severity.ERROR,
      "A path to a stiffness leads to nothing in the model.",
      "Name a stiffness of the model, such as joints.knee.rz."),
  /** A change of a configuration that cannot be made. */
  BAD_CHANGE(
      Severity.ERROR,
      "A change of a configuration cannot be made to the model.",
      "Name an entry of the model to remove or replace, a new one to add."),
  /** What is not worked yet. */
  NOT_SUPPORTED(
      Severity.ERROR,
      "Something that this version does not work with.",
      "Take it out, or describe the part in another way."),
  /** No units declared. */
  UNITS_ASSUMED(
      Severity.WARNING,
      "The model declares no unit for numbers that stand alone; SI is taken.",
      "Add the key 'units' with length, force, mass and angle."),
  /** The reference direction was chosen by the program. */
  REFERENCE_CHOSEN(
      Severity.NOTE,
      "A member parallel to up states no reference direction; a global axis is taken.",
      "State 'reference' where the section is not round."),
  /** Torsion of an open section without warping. */
  WARPING_LEFT_OUT(
      Severity.NOTE,
      "The shear centre of a section lies off its centroid: twist and bending go together by"
          + " Saint-Venant's torsion; restrained warping is not included.",
      "Judge twist of such members with care."),
  /** Shear deformation of a shape without a published coefficient. */
  SHEAR_BY_FLOW(
      Severity.NOTE,
      "Shear areas of a section come from the shear flow of its thin walls.",
      "State Ay and Az if others are wanted."),
  /** A row of a workbook that is there already. */
  STATED_TWICE(
      Severity.ERROR,
      "A workbook states an entry of the model twice.",
      "Keep one of the rows, or give the other a name of its own."),
  /** A sheet without a meaning. */
  SHEET_NOT_READ(
      Severity.WARNING,
      "A sheet of a model workbook has no name of a model's key and is not read.",
      "Correct its name, or call it Examples."),
  /** What a cell cannot hold. */
  NOT_IN_WORKBOOK(
      Severity.WARNING,
      "Something of the model file has no place in a workbook.",
      "Keep the JSON file where it matters."),
  /** An entry that nothing uses. */
  UNUSED(
      Severity.NOTE,
      "An entry of the model is used by nothing.",
      "Take it out, or use it, if that was not meant.");

  private final Definition definition;

  FrameFinding(Severity severity, String meaning, String remedy) {
    this.definition =
        new Definition("FRAME-" + name().replace('_', '-'), severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
