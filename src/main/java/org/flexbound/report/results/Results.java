package org.flexbound.report.results;

import java.util.List;
import java.util.Optional;

/**
 * Everything that a command found: the content of results.json.
 *
 * @param format the version of this format
 * @param program the program and its version
 * @param command the command that made it
 * @param title the title of the test or study
 * @param test what the first log says of the test
 * @param configurations the configurations
 * @param inputs the files that were read
 * @param instruments the instruments
 * @param loads the loads
 * @param gauges the gauges
 * @param options the rules and options in force
 * @param findings the findings, worst first
 * @param runs the runs with their verdicts
 * @param excluded what was left out, and by whom
 * @param coefficients the measured coefficients
 * @param covariance their covariance, one entry for each configuration
 * @param absolute the absolute coefficients
 * @param baseMotion the base-motion operator: how the coefficients come from the absolute ones
 * @param reciprocity pairs that should be equal
 * @param jointTests tests of several quantities together
 * @param matrixChecks what every elastic structure keeps, held against the matrices
 * @param structure the frame model, for its drawing
 * @param comparison measured against computed
 * @param modelTests the model against all coefficients of a configuration together
 * @param contributions what each part adds to each computed coefficient
 * @param parameters the stiffnesses that the update may change
 * @param update how the update ended
 * @param validation held-out coefficients
 * @param plan the planned test, where nothing has been measured yet
 * @param limits acceptance limits and decisions
 * @param fixture how much of the motions is that of base and fixture
 * @param recheck this test against an earlier one; left out where there was no such question
 * @param energy stored energy of the runs
 * @param curves load-deflection curves
 */
public record Results(
    int format,
    String program,
    String command,
    String title,
    Test test,
    List<Configuration> configurations,
    List<Input> inputs,
    List<Instrument> instruments,
    List<Load> loads,
    List<Gauge> gauges,
    List<Option> options,
    List<Finding> findings,
    List<Run> runs,
    List<Exclusion> excluded,
    List<Coefficient> coefficients,
    List<Covariance> covariance,
    List<Absolute> absolute,
    List<OperatorRow> baseMotion,
    List<Reciprocity> reciprocity,
    List<JointTest> jointTests,
    List<MatrixCheck> matrixChecks,
    Optional<Structure> structure,
    List<Comparison> comparison,
    List<JointTest> modelTests,
    List<Contribution> contributions,
    List<Parameter> parameters,
    Optional<Update> update,
    List<Validation> validation,
    Optional<Plan> plan,
    List<Limit> limits,
    List<FixtureShare> fixture,
    Optional<Recheck> recheck,
    List<Energy> energy,
    List<Curve> curves) {
  /** The version of the format that is written now. */
  public static final int FORMAT = 1;

  /** Copies the lists. */
  public Results {
    configurations = List.copyOf(configurations);
    inputs = List.copyOf(inputs);
    instruments = List.copyOf(instruments);
    loads = List.copyOf(loads);
    gauges = List.copyOf(gauges);
    options = List.copyOf(options);
    findings = List.copyOf(findings);
    runs = List.copyOf(runs);
    excluded = List.copyOf(excluded);
    coefficients = List.copyOf(coefficients);
    covariance = List.copyOf(covariance);
    absolute = List.copyOf(absolute);
    baseMotion = List.copyOf(baseMotion);
    reciprocity = List.copyOf(reciprocity);
    jointTests = List.copyOf(jointTests);
    matrixChecks = List.copyOf(matrixChecks);
    comparison = List.copyOf(comparison);
    modelTests = List.copyOf(modelTests);
    contributions = List.copyOf(contributions);
    parameters = List.copyOf(parameters);
    validation = List.copyOf(validation);
    limits = List.copyOf(limits);
    fixture = List.copyOf(fixture);
    energy = List.copyOf(energy);
    curves = List.copyOf(curves);
  }
}
