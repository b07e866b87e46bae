package org.flexbound.acceptance;

import org.flexbound.finding.FindingKind;
import org.flexbound.finding.Severity;

/** What can be found when limits are judged and tests are compared with earlier ones. */
public enum AcceptanceFinding implements FindingKind {
  /** Nothing to check against. */
  NO_LIMITS(
      "ACCEPT-NO-LIMITS",
      Severity.ERROR,
      "No acceptance limit is stated, so that there is nothing to check.",
      "Fill in the sheet Limits of the workbook, or the key 'limits' of the study."),
  /** A limit on something that was not measured. */
  UNMEASURED(
      "ACCEPT-UNMEASURED",
      Severity.ERROR,
      "A limit names something that this test did not measure.",
      "Correct the name, measure it, or take the limit out."),
  /** A limit that lacks a name it needs. */
  INCOMPLETE(
      "ACCEPT-INCOMPLETE",
      Severity.ERROR,
      "A limit does not say what it is set on.",
      "Fill in the cells that the message names."),
  /** A unit of another dimension. */
  UNIT(
      "ACCEPT-UNIT",
      Severity.ERROR,
      "The unit of a limit is not of the kind of what it is set on.",
      "State the limit in a unit that fits."),
  /** Limits the wrong way round. */
  ORDER(
      "ACCEPT-ORDER",
      Severity.ERROR,
      "The lower value of a limit is above its upper one.",
      "Exchange or correct them."),
  /** A point whose coefficients contradict each other. */
  NOT_RECIPROCAL(
      "ACCEPT-NOT-RECIPROCAL",
      Severity.WARNING,
      "The coefficients at a point disagree with reciprocity beyond chance, so that no compliance is"
          + " made of them.",
      "Find the reason first: a gauge's scale, its place or its direction."),
  /** Base motion taken out of some coefficients at a point and not of others. */
  PARTLY_CORRECTED(
      "ACCEPT-PARTLY-CORRECTED",
      Severity.WARNING,
      "Base motion is taken out of some of the coefficients at a point and not of others, so that"
          + " they make no symmetric compliance.",
      "Add base gauges, or leave base motion in (sheet Options)."),
  /** A softest direction among fewer than three. */
  FEWER_DIRECTIONS(
      "ACCEPT-FEWER-DIRECTIONS",
      Severity.WARNING,
      "A softest direction was sought among fewer than three directions, because no others were"
          + " loaded and measured at the point.",
      "Load and measure the point in three directions, or accept what was not looked at."),
  /** Two softest directions that cannot be told apart. */
  ALIKE_DIRECTIONS(
      "ACCEPT-ALIKE-DIRECTIONS",
      Severity.NOTE,
      "The two softest directions at a point are alike within their uncertainty; the direction is"
          + " then not determined and its compliance comes out a little too large.",
      "Nothing, unless the direction matters."),
  /** No spread from run to run. */
  WITHOUT_SPREAD(
      "ACCEPT-WITHOUT-SPREAD",
      Severity.WARNING,
      "There is one run and no stated repeatability, so that a guarded decision is not possible.",
      "Repeat the run, or state the repeatability on the sheet Options."),
  /** Calibration missing from a decision. */
  WITHOUT_CALIBRATION(
      "ACCEPT-WITHOUT-CALIBRATION",
      Severity.WARNING,
      "Limits are judged although some instrument's calibration is not stated: the probabilities"
          + " leave it out.",
      "State the uncertainty of every instrument on the sheet Instruments."),
  /** A large part of a deflection is base or fixture. */
  FIXTURE_LARGE(
      "ACCEPT-FIXTURE-LARGE",
      Severity.WARNING,
      "The base and the fixture carry a large part of a deflection.",
      "Stiffen the fixture, or let the gauge stand on it; judge the article by its own flexibility."),
  /** An earlier result that cannot be used. */
  BASELINE(
      "ACCEPT-BASELINE",
      Severity.ERROR,
      "The earlier results cannot be used.",
      "Name a results.json that this program wrote."),
  /** Coefficients without a partner in the earlier test. */
  NOT_COMPARABLE(
      "ACCEPT-NOT-COMPARABLE",
      Severity.WARNING,
      "A coefficient has no partner in the other test, or gauge or load were elsewhere then.",
      "Use the same names, places and directions in every test of one fixture."),
  /** Nothing in common. */
  NOTHING_IN_COMMON(
      "ACCEPT-NOTHING-IN-COMMON",
      Severity.ERROR,
      "The two tests have no coefficient in common.",
      "Compare tests of the same gauges and loads."),
  /** Calibration that is not known to be the same. */
  CALIBRATION_NOT_SHARED(
      "ACCEPT-CALIBRATION-NOT-SHARED",
      Severity.NOTE,
      "An instrument was used in both tests but under another calibration, or none is named, so that"
          + " its error does not cancel.",
      "State serial number, certificate and date of calibration in both logs."),
  /** A file of a history that was left out. */
  HISTORY_FILE(
      "ACCEPT-HISTORY-FILE",
      Severity.WARNING,
      "A file of the history was left out.",
      "Take it out of the folder, or put a results.json with a date in its place."),
  /** Too few tests. */
  HISTORY_SHORT(
      "ACCEPT-HISTORY-SHORT",
      Severity.ERROR,
      "A history of fewer than three dated tests says nothing of a trend.",
      "Collect the results.json of at least three tests."),
  /** A series that not every test has. */
  HISTORY_GAPS(
      "ACCEPT-HISTORY-GAPS",
      Severity.NOTE,
      "A coefficient or parameter was not measured in every test.",
      "Use the same names in every test of one fixture.");

  private final Definition definition;

  AcceptanceFinding(String code, Severity severity, String meaning, String remedy) {
    this.definition = new Definition(code, severity, meaning, remedy);
  }

  @Override
  public Definition definition() {
    return definition;
  }
}
