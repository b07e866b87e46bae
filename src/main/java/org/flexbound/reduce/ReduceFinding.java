package org.flexbound.reduce;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What a reduction can find. */
public enum ReduceFinding implements FindingKind {
  /** No load varied in a run. */
  NO_LOAD(
      "RED-NO-LOAD",
      Severity.WARNING,
      "No load varied in a run.",
      "Check the load column, or say no in the column Use of the sheet Runs."),
  /** Readings on the way from one held load to the next. */
  RAMPS_LEFT_OUT(
      "RED-RAMPS-LEFT-OUT",
      Severity.NOTE,
      "Readings taken while the load went from one held value to the next are left out.",
      "Nothing needs to be done. To choose the steps yourself, fill in a column Step."),
  /** No held load. */
  NEVER_HELD(
      "RED-NEVER-HELD",
      Severity.WARNING,
      "The load stood still nowhere, so no reading was taken at rest.",
      "Hold each load until the readings stand still; if the loads were held, fill in a column Step that says which"
          + " rows belong together."),
  /** Two loads moved in proportion. */
  PROPORTIONAL(
      "RED-PROPORTIONAL",
      Severity.ERROR,
      "Two loads that are to be told apart moved in fixed proportion.",
      "Enter them as one load pattern (two rows of one name on the sheet Load points), or load them"
          + " one at a time."),
  /** A slope could not be fitted. */
  TOO_FEW_STEPS(
      "RED-TOO-FEW-STEPS",
      Severity.WARNING,
      "Too few load steps for a slope.",
      "Take at least five steps up and five down (common practice)."),
  /** Coefficients were stated in place of readings. */
  STATED(
      "RED-STATED",
      Severity.WARNING,
      "Coefficients that were reduced elsewhere were taken as they are stated.",
      "Give the readings instead where there are any; else make sure that the stated uncertainties"
          + " include all that is known."),
  /** Only one run and no stated repeatability. */
  ONE_RUN(
      "RED-ONE-RUN",
      Severity.WARNING,
      "Intervals are without run-to-run spread.",
      "Repeat the run at least twice, or state the repeatability known from earlier tests on the"
          + " sheet Options."),
  /** The gauge's response bends. */
  CURVED(
      "RED-CURVED",
      Severity.WARNING,
      "A response is curved, significantly and by more than its limit.",
      "Look for slip, gaps or large deflection; fit a narrower range, or do not use this"
          + " coefficient."),
  /** Pull and push differ. */
  PULL_PUSH(
      "RED-PULL-PUSH",
      Severity.WARNING,
      "Slopes under pull and under push differ, significantly and by more than the limit of repeatability.",
      "Look for gaps and for bolted joints that open; take one direction alone by its own runs."),
  /** Scatter about the line is large. */
  NOT_LINEAR(
      "RED-NOT-LINEAR",
      Severity.WARNING,
      "Steps depart from the line by more than the limit.",
      "Look at the plot; check the gauge and its stand."),
  /** Loading and unloading differ. */
  HYSTERESIS(
      "RED-HYSTERESIS",
      Severity.WARNING,
      "Loading and unloading differ by more than the limit.",
      "Look for friction or slip; bed the structure in by another cycle."),
  /** The reading does not come back. */
  ZERO_RETURN(
      "RED-ZERO-RETURN",
      Severity.WARNING,
      "A reading does not come back to its opening zero.",
      "Look for set, slip or drift; repeat the run."),
  /** Runs scatter more than their limit. */
  NOT_REPEATABLE(
      "RED-NOT-REPEATABLE",
      Severity.WARNING,
      "Slopes of repeated runs differ by more than the limit.",
      "Look for slip between runs; repeat."),
  /** A gauge scatters unlike the others. */
  SCATTER_APART(
      "RED-SCATTER-APART",
      Severity.NOTE,
      "A gauge's slopes scatter from run to run significantly more or less than those of the others; it has a"
          + " scatter of its own.",
      "Look at its stand and its tip if it scatters more."),
  /** No repeat of a kind of coefficient. */
  SCATTER_BORROWED(
      "RED-SCATTER-BORROWED",
      Severity.WARNING,
      "A kind of coefficient was measured in one run only; its relative scatter was taken from coefficients"
          + " that were repeated.",
      "Repeat the run, or state the repeatability on the sheet Options."),
  /** Repeats agree exactly. */
  NO_SCATTER(
      "RED-NO-SCATTER",
      Severity.WARNING,
      "Repeated runs agree to the last digit, which no real test does.",
      "Check that the runs are not copies of one; state the resolution of the instruments, so that it enters the"
          + " uncertainty."),
  /** Measured scatter contradicts the stated repeatability. */
  SCATTER_ABOVE_STATED(
      "RED-SCATTER-ABOVE-STATED",
      Severity.WARNING,
      "Repeated runs scatter significantly more than the stated repeatability.",
      "Look for slip between runs; correct the repeatability on the sheet Options."),
  /** Measured scatter beside a stated repeatability. */
  SCATTER_AND_STATED(
      "RED-SCATTER-AND-STATED",
      Severity.NOTE,
      "Runs were repeated and a repeatability is stated: the larger of the two is used.",
      "Nothing needs to be done."),
  /** A base motion cannot be taken out. */
  BASE_MOTION_LEFT(
      "RED-BASE-MOTION-LEFT",
      Severity.WARNING,
      "Base motion was not taken out of a gauge.",
      "Add the base gauge that the message names, or state the places of all gauges."),
  /** Base motion makes up most of a reading. */
  BASE_MOTION_LARGE(
      "RED-BASE-MOTION-LARGE",
      Severity.WARNING,
      "Most of a reading is base motion.",
      "Stiffen the base, or measure from a stand on it."),
  /** Something was not measured. */
  NOT_MEASURED(
      "RED-NOT-MEASURED",
      Severity.WARNING,
      "A load or a gauge was described but no run measured it.",
      "Add the run, or remove the row."),
  /** A plan that lacks what the forecast needs. */
  PLAN_INCOMPLETE(
      "RED-PLAN-INCOMPLETE",
      Severity.ERROR,
      "A planned load has no size.",
      "State its Limit on the sheet Load points, or write the planned load steps on a readings"
          + " sheet."),
  /** A plan for which something was assumed. */
  PLAN_ASSUMED(
      "RED-PLAN-ASSUMED",
      Severity.WARNING,
      "Something that a forecast needs is not stated and was assumed.",
      "State the repeatability on the sheet Options (or under 'reduction' in the study), and the"
          + " runs on the sheet Runs."),
  /** No slope at all. */
  NOTHING_MEASURED(
      "RED-NOTHING-MEASURED",
      Severity.ERROR,
      "No flexibility coefficient could be found.",
      "Check that loads vary and gauges are read within the fit range.");

  private final Definition definition;

  ReduceFinding(String code, Severity severity, String meaning, String remedy) {
    this.definition = new Definition(code, severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
