package org.flexbound.update;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.flexbound.compare.OutsideModel;
import org.flexbound.compare.OutsideTable;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.study.Parameter;
import org.flexbound.study.Study;
import org.flexbound.study.StudyFinding;
import org.flexbound.study.Working;

/**
 * Updates a model held elsewhere, known by tables of its flexibility and sensitivities: one linear step
 * from one table, or several, each table computed at the estimate that the one before led to.
 */
public final class OutsideUpdate {
  /** A factor that differs less than this from the table's point is taken as arrived (no source). */
  private static final double ARRIVED = 0.01;

  private OutsideUpdate() {}

  /**
   * Updates.
   *
   * @param study the study; every parameter is worked in its logarithm, with bounds as factors
   * @param tables the tables in the order in which they were computed; the last one counts, the others
   *     show how good a linear step is
   * @param measured what was measured, by configuration
   * @param settings how much of the evidence is worked out
   * @return the result, parameters as factors; no value where anything is in error
   */
  public static Outcome<UpdateResult> run(
      Study study,
      List<OutsideTable> tables,
      List<MeasuredFlexibility> measured,
      UpdateSettings settings) {
    Findings findings = new Findings();
    List<WorkingParameter> parameters = parameters(study, findings);
    StudyUpdate.refuseUnknownCases(study, measured, findings);
    List<OutsideModel> models = new ArrayList<>();
    List<String> names = parameters.stream().map(WorkingParameter::name).toList();
    for (OutsideTable table : tables) {
      OutsideModel.of(table, measured, names, findings).ifPresent(models::add);
    }
    if (models.isEmpty() || findings.hasErrors()) {
      return Outcome.none(findings.list());
    }
    for (int t = 1; t < models.size(); t++) {
      findings.add(
          UpdateFinding.STEP_FORETOLD,
          tables.get(t).flexibility().where(),
          String.format(
              Locale.ROOT,
              "the table before foretold this one within %.2g %% of the largest coefficient",
              100 * models.get(t - 1).departure(models.get(t))));
    }
    OutsideModel last = models.get(models.size() - 1);
    UpdateResult result =
        new UpdateSolver(settings)
            .solve(
                new UpdateProblem(
                    parameters,
                    measured,
                    new OutsideFunction(last),
                    study.rule(),
                    study.heldOut(),
                    study.starts()));
    moved(result, last.point())
        .ifPresent(
            where ->
                findings.add(
                    UpdateFinding.LINEAR_STEP,
                    tables.get(tables.size() - 1).flexibility().where(),
                    "the computed flexibility is carried on from the table linearly in each"
                        + " compliance, to the factors "
                        + where));
    findings.addAll(result.findings());
    return Outcome.of(result.with(findings.list()), findings.list());
  }

  private static List<WorkingParameter> parameters(Study study, Findings findings) {
    List<WorkingParameter> parameters = new ArrayList<>();
    if (study.parameters().isEmpty()) {
      findings.add(
          StudyFinding.MISSING_KEY,
          study.where(),
          "the study has no 'parameters', so that nothing may change");
    }
    for (Parameter parameter : study.parameters()) {
      if (parameter.working() != Working.LN) {
        findings.add(
            StudyFinding.KEYS_DISAGREE,
            parameter.where(),
            "the parameter '"
                + parameter.name()
                + "' is of a model held elsewhere, which is worked in the logarithm only");
      } else {
        WorkingParameter.of(parameter, 1, "1", Double.NaN, findings).ifPresent(parameters::add);
      }
    }
    return parameters;
  }

  /** The factors at the estimate, where any has moved away from where the table was computed. */
  private static Optional<String> moved(UpdateResult result, double[] point) {
    List<String> words = new ArrayList<>();
    boolean moved = false;
    for (int k = 0; k < point.length; k++) {
      ParameterResult parameter = result.parameters().get(k);
      moved |= Math.abs(parameter.workingEstimate() - point[k]) > ARRIVED;
      words.add(
          String.format(
              Locale.ROOT,
              "\"%s\": %.4g",
              parameter.name(),
              Math.exp(parameter.workingEstimate())));
    }
    return moved ? Optional.of(String.join(", ", words)) : Optional.empty();
  }
}
