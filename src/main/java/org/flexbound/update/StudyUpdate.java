package org.flexbound.update;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.compare.ConfiguredFrame;
import org.flexbound.compare.PlacingEffects;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.study.HeldOutCase;
import org.flexbound.study.Study;
import org.flexbound.study.StudyFinding;
import org.flexbound.study.Working;

/** Updates the frame model of a study. */
public final class StudyUpdate {
  private StudyUpdate() {}

  /**
   * Updates with all evidence.
   *
   * @param study the study
   * @param model its frame model
   * @param measured what was measured, by configuration
   * @return the result (its findings among those of the outcome); no value where anything is in error
   */
  public static Outcome<UpdateResult> run(
      Study study, FrameModel model, List<MeasuredFlexibility> measured) {
    return run(study, model, measured, UpdateSettings.FULL);
  }

  /**
   * Updates.
   *
   * @param study the study
   * @param model its frame model
   * @param measured what was measured, by configuration
   * @param settings how much of the evidence is worked out
   * @return the result (its findings among those of the outcome); no value where anything is in error
   */
  public static Outcome<UpdateResult> run(
      Study study, FrameModel model, List<MeasuredFlexibility> measured, UpdateSettings settings) {
    return problem(study, model, measured)
        .then(
            problem -> {
              UpdateResult result = new UpdateSolver(settings).solve(problem);
              return Outcome.of(result, result.findings());
            });
  }

  /**
   * Puts the problem together.
   *
   * @param study the study
   * @param model its frame model
   * @param measured what was measured, by configuration
   * @return the problem; no value where anything is in error
   */
  public static Outcome<UpdateProblem> problem(
      Study study, FrameModel model, List<MeasuredFlexibility> measured) {
    Findings findings = new Findings();
    List<WorkingParameter> parameters = new ParameterMaker(model, findings).of(study);
    if (study.parameters().isEmpty()) {
      findings.add(
          StudyFinding.MISSING_KEY,
          study.where(),
          "the study has no 'parameters', so that nothing may change");
    }
    refuseUnknownCases(study, measured, findings);
    Outcome<List<ConfiguredFrame>> frames = ConfiguredFrame.prepare(study, model, measured);
    findings.addAll(frames.findings());
    if (frames.value().isEmpty() || findings.hasErrors()) {
      return Outcome.none(findings.list());
    }
    List<ConfiguredFrame> ready = frames.value().get();
    return Outcome.of(
        new UpdateProblem(
            parameters,
            ready.stream().map(ConfiguredFrame::measured).toList(),
            new FrameFunction(ready, parameters),
            study.rule(),
            study.heldOut(),
            placingEffects(ready),
            study.starts()),
        findings.list());
  }

  /** The effects of uncertain places, each padded over all configurations. */
  private static List<List<Double>> placingEffects(List<ConfiguredFrame> frames) {
    int size = frames.stream().mapToInt(f -> f.measured().absolute().size()).sum();
    List<List<Double>> result = new ArrayList<>();
    int offset = 0;
    for (ConfiguredFrame frame : frames) {
      for (double[] effect : PlacingEffects.of(frame, frame.nominal())) {
        Double[] padded = new Double[size];
        Arrays.fill(padded, 0.0);
        for (int i = 0; i < effect.length; i++) {
          padded[offset + i] = effect[i];
        }
        result.add(List.of(padded));
      }
      offset += frame.measured().absolute().size();
    }
    return result;
  }

  /**
   * Says before any test what status each parameter would get, if the nominal model were true.
   *
   * @param study the study
   * @param model its frame model
   * @param expected what the planned tests would measure of the nominal model, by configuration
   * @return the forecast: statuses, standard deviations and intervals about the nominal model
   */
  public static Outcome<UpdateResult> beforeTest(
      Study study, FrameModel model, List<MeasuredFlexibility> expected) {
    return run(study, model, expected, UpdateSettings.ESTIMATES);
  }

  static void refuseUnknownCases(
      Study study, List<MeasuredFlexibility> measured, Findings findings) {
    for (HeldOutCase heldOut : study.heldOut()) {
      boolean known =
          measured.stream()
              .anyMatch(
                  m ->
                      m.loads().stream()
                          .anyMatch(load -> heldOut.matches(m.configuration(), load.name())));
      if (!known) {
        findings.add(
            StudyFinding.NO_SUCH_CASE,
            heldOut.where(),
            "found the held-out load '"
                + heldOut.load()
                + "'"
                + heldOut.configuration().map(c -> " of the configuration '" + c + "'").orElse("")
                + ", which no log of the study has");
      }
    }
    boolean anythingLeft =
        measured.isEmpty()
            || measured.stream()
                .anyMatch(
                    m ->
                        m.coefficients().stream()
                            .anyMatch(
                                c ->
                                    study.heldOut().stream()
                                        .noneMatch(
                                            h ->
                                                h.matches(
                                                    m.configuration(),
                                                    m.loads().get(c.load()).name()))));
    if (!anythingLeft) {
      findings.add(
          StudyFinding.NO_SUCH_CASE,
          study.where(),
          "every load case is held out, so that none is left to fit");
    }
  }

  /**
   * The model with the stiffnesses of the point shown.
   *
   * @param model the study's frame model
   * @param result the update
   * @return the changed model; parameters that did not change are not touched
   */
  public static FrameModel updatedModel(FrameModel model, UpdateResult result) {
    Map<StiffnessPath, StiffnessSetting> settings = new java.util.LinkedHashMap<>();
    for (ParameterResult parameter : result.parameters()) {
      if (parameter.workingValue() == parameter.priorMean()) {
        continue;
      }
      StiffnessSetting setting =
          parameter.working() == Working.LN
              ? new StiffnessSetting.Factor(parameter.factor())
              : new StiffnessSetting.Value(parameter.updated());
      for (String scale : parameter.scales()) {
        Optional<StiffnessPath> path = StiffnessPath.parse(scale);
        path.filter(p -> model.stiffness(p).isPresent()).ifPresent(p -> settings.put(p, setting));
      }
    }
    return model.with(settings);
  }
}
