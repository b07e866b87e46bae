package org.flexbound.update;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What an update can find. */
public enum UpdateFinding implements FindingKind {
  /** A change without a reason. */
  NEEDS_REASON(
      "UPDATE-NEEDS-REASON",
      Severity.WARNING,
      "A parameter moved far, or ended on a bound, without a justification.",
      "It needs a reason before this model is used: state it under 'justification'."),
  /** The best fit does not agree with the data. */
  MISFITS_EVEN_AT_BEST(
      "UPDATE-MISFITS",
      Severity.WARNING,
      "Even the best fit within the bounds does not agree with the data.",
      "Look at the load cases named: a fault of the test, or a part that the model lacks."),
  /** The solver stopped before it converged. */
  NOT_CONVERGED(
      "UPDATE-NOT-CONVERGED",
      Severity.WARNING,
      "The solver did not converge.",
      "Tighten the bounds, or fix parameters that the test cannot see."),
  /** Starts came to different points. */
  STARTS_DISAGREE(
      "UPDATE-STARTS-DISAGREE",
      Severity.WARNING,
      "Different starting points came to different answers.",
      "Treat the estimate as one of several, and add load cases that tell them apart."),
  /** Held-out load cases are predicted badly. */
  NOT_VALIDATED(
      "UPDATE-NOT-VALIDATED",
      Severity.WARNING,
      "Held-out load cases are predicted worse than their uncertainty allows.",
      "Do not use the updated model for load cases of that kind before the reason is found."),
  /** A coefficient does not fit with the others. */
  OUTLYING_COEFFICIENT(
      "UPDATE-OUTLYING-COEFFICIENT",
      Severity.WARNING,
      "A coefficient lies further from the fit than its uncertainty allows.",
      "Look at its runs before relying on the parameters that it pulls."),
  /** A configuration disagrees. */
  CONFIGURATION_DISAGREES(
      "UPDATE-CONFIGURATION-DISAGREES",
      Severity.WARNING,
      "One configuration fits worse than its uncertainty allows.",
      "Look at how that configuration was set up."),
  /** The tests cannot see a parameter. */
  NOT_IDENTIFIABLE(
      "UPDATE-NOT-IDENTIFIABLE",
      Severity.NOTE,
      "The tests say next to nothing of a parameter.",
      "Its value is the prior's; load or measure where it deforms if it matters."),
  /** A table from outside is only the first step. */
  LINEAR_STEP(
      "UPDATE-LINEAR-STEP",
      Severity.NOTE,
      "The flexibility comes from a table and is carried on from it linearly in each compliance.",
      "Compute a new table at the updated parameters and add it under 'outsideFlexibility' with"
          + " its 'at', until the estimate stays where the last table was computed."),
  /** How good a linear step was. */
  STEP_FORETOLD(
      "UPDATE-STEP-FORETOLD",
      Severity.NOTE,
      "A table computed elsewhere is compared with what the table before it foretold.",
      "Nothing to do where the difference is small against the uncertainty of the test."),
  /** The cut of a truncated flexibility lies in a gap of the frequencies. */
  CUT_MOVED(
      "UPDATE-CUT-MOVED",
      Severity.NOTE,
      "The number of modes was moved to the nearest gap in the frequencies.",
      "State that number of modes.");

  private final Definition definition;

  UpdateFinding(String code, Severity severity, String meaning, String remedy) {
    this.definition = new Definition(code, severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
