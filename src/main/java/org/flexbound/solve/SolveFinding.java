package org.flexbound.solve;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What may be found when gauges and loads meet a model, and when it is solved. */
public enum SolveFinding implements FindingKind {
  /** A gauge or load at a node the model lacks. */
  UNKNOWN_NODE(
      Severity.ERROR,
      "A gauge or a load names a node that the model does not have.",
      "Correct the name, or add the node to the model."),
  /** A gauge or load on a member the model lacks. */
  UNKNOWN_MEMBER(
      Severity.ERROR,
      "A gauge or a load names a member that the model does not have.",
      "Correct the name, or add the member to the model."),
  /** A place in space where the model has nothing. */
  NOTHING_THERE(
      Severity.ERROR,
      "A gauge or a load stands at a place where the model has no node and no member.",
      "Correct the coordinates, or state a node or a member."),
  /** Coordinates that do not fit the node or member. */
  PLACES_DISAGREE(
      Severity.ERROR,
      "The coordinates of a gauge or a load are not those of its node or member in the model.",
      "Correct the coordinates or the name."),
  /** A strain gauge without a member. */
  STRAIN_WITHOUT_MEMBER(
      Severity.ERROR,
      "A strain gauge does not say on which member it sits.",
      "State the member and the place along it."),
  /** A section point outside of the section. */
  POINT_OFF_SECTION(
      Severity.WARNING,
      "The point of a strain gauge lies outside of the member's section.",
      "Correct the section point; it is measured from the centroid."),
  /** A plane model, held in its plane. */
  HELD_IN_PLANE(
      Severity.NOTE,
      "The model lies in a plane and nothing acts out of it: it is held in its plane.",
      "Support it out of its plane to have it worked in space."),
  /** A freedom without stiffness that nothing acts on. */
  HELD_FREEDOM(
      Severity.NOTE,
      "A node has a freedom that nothing resists and nothing acts on: it is held.",
      "Nothing, if the node is a pin."),
  /** A structure that can move freely. */
  MECHANISM(
      Severity.ERROR,
      "The structure can move without resistance.",
      "Add the support, member or joint stiffness that is missing."),
  /** Supports or rigid parts that hold the same motion twice. */
  HELD_TWICE(
      Severity.NOTE,
      "A rigid part or a fixed support holds a motion that is held already.",
      "Nothing, if that is how the structure is built."),
  /** Digits are lost. */
  NEARLY_SINGULAR(
      Severity.WARNING,
      "The stiffnesses of the model lie so far apart that digits are lost.",
      "Look for a part that is far too stiff or far too soft; use rigid or free instead."),
  /** A free structure. */
  FREE_STRUCTURE(
      Severity.NOTE,
      "The structure has no support: loads must balance, and motions are relative.",
      "Read gauges relative to base gauges."),
  /** A load on a free structure that does not balance. */
  LOAD_NOT_BALANCED(
      Severity.ERROR,
      "A load on a structure without supports does not balance itself.",
      "Make it a load pattern whose forces and moments sum to zero, or add supports."),
  /** Modes cannot be found. */
  NO_MASS(
      Severity.ERROR,
      "The model has no mass, so that it has no modes.",
      "State the density of a material, or masses."),
  /** A cut between modes that cannot be told apart. */
  CUT_MOVED(
      Severity.WARNING,
      "The modes were to be cut between two of nearly the same frequency: the cut is moved.",
      "Nothing, or state a number of modes that ends at a gap."),
  /** Modes that did not settle. */
  MODES_NOT_SETTLED(
      Severity.WARNING,
      "Not all of the modes asked for were found to full accuracy.",
      "Ask for fewer modes, or look for parts that are far too stiff or far too soft.");

  private final Definition definition;

  SolveFinding(Severity severity, String meaning, String remedy) {
    this.definition =
        new Definition("SOLVE-" + name().replace('_', '-'), severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
