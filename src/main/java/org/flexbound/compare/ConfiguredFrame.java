package org.flexbound.compare;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.frame.FrameChanges;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.flexbound.solve.ComputedFlexibility;
import org.flexbound.solve.FrameFlexibility;
import org.flexbound.solve.PreparedFlexibility;
import org.flexbound.solve.TruncatedFlexibility;
import org.flexbound.study.Configuration;
import org.flexbound.study.FlexibilityChoice;
import org.flexbound.study.Parameter;
import org.flexbound.study.Study;

/**
 * One configuration's frame, made ready for the gauges and loads of its test and for the stiffnesses
 * that the study's parameters scale.
 */
public final class ConfiguredFrame {
  private final FrameModel model;
  private final MeasuredFlexibility measured;
  private final PreparedFlexibility flexibility;
  private final List<StiffnessPath> paths;

  private ConfiguredFrame(
      FrameModel model,
      MeasuredFlexibility measured,
      PreparedFlexibility flexibility,
      List<StiffnessPath> paths) {
    this.model = model;
    this.measured = measured;
    this.flexibility = flexibility;
    this.paths = List.copyOf(paths);
  }

  /**
   * Makes the frames of all configurations ready.
   *
   * @param study the study
   * @param model its frame model, without any configuration's changes
   * @param measured what was measured, found by the configuration's name; configurations without are
   *     left out
   * @return one for each configuration measured, in the order of the study, with all findings; no
   *     value where anything is in error
   */
  public static Outcome<List<ConfiguredFrame>> prepare(
      Study study, FrameModel model, List<MeasuredFlexibility> measured) {
    Findings findings = new Findings();
    List<ConfiguredFrame> result = new ArrayList<>();
    boolean complete = true;
    for (Configuration configuration : study.configurations()) {
      Optional<MeasuredFlexibility> own =
          measured.stream()
              .filter(m -> m.configuration().equals(configuration.name()))
              .findFirst();
      if (own.isEmpty()) {
        continue;
      }
      refuseWeightless(own.get(), configuration, findings);
      Optional<ConfiguredFrame> made = prepare(study, configuration, model, own.get(), findings);
      made.ifPresent(result::add);
      complete &= made.isPresent();
    }
    findings.addAll(missingParts(study, model, result));
    return complete && !findings.hasErrors()
        ? Outcome.of(List.copyOf(result), findings.list())
        : Outcome.none(findings.list());
  }

  /**
   * Holds gauges and loads of a log against the model, without any measurement.
   *
   * @param study the study
   * @param configuration the configuration whose log it is
   * @param model the study's frame model
   * @param gauges the log's gauges
   * @param loads the log's loads
   * @return what is wrong or was left out
   */
  public static List<Finding> crossCheck(
      Study study,
      Configuration configuration,
      FrameModel model,
      List<Gauge> gauges,
      List<Load> loads) {
    Outcome<FrameModel> changed = changed(configuration, model);
    List<Finding> findings = new ArrayList<>(changed.findings());
    changed
        .value()
        .ifPresent(
            frame ->
                findings.addAll(
                    FrameFlexibility.prepare(frame, gauges, loads, known(study, frame))
                        .findings()));
    return findings;
  }

  /**
   * The nominal flexibility of a configuration for some gauges and loads, without any measurement.
   *
   * @param frame the frame model with the configuration's changes
   * @param gauges the gauges
   * @param loads the loads
   * @return gauges × loads, SI, with all findings; no value where anything is in error
   */
  public static Outcome<double[][]> nominal(
      FrameModel frame, List<Gauge> gauges, List<Load> loads) {
    return FrameFlexibility.prepare(frame, gauges, loads, List.of())
        .then(ready -> Outcome.of(ready.solve(List.of()).values(), List.of()));
  }

  private static Outcome<FrameModel> changed(Configuration configuration, FrameModel model) {
    return configuration
        .changes()
        .map(changes -> FrameChanges.apply(model, changes))
        .orElseGet(() -> Outcome.of(model, List.of()));
  }

  private static Optional<ConfiguredFrame> prepare(
      Study study,
      Configuration configuration,
      FrameModel model,
      MeasuredFlexibility measured,
      Findings findings) {
    Outcome<FrameModel> changed = changed(configuration, model);
    findings.addAll(changed.findings());
    if (changed.value().isEmpty() || changed.hasErrors()) {
      return Optional.empty();
    }
    FrameModel frame = changed.value().get();
    List<StiffnessPath> paths = known(study, frame);
    return ready(study, frame, measured, paths, findings)
        .map(r -> new ConfiguredFrame(frame, measured, r, paths));
  }

  /** In full, or from the lowest modes; a structure that moves freely is refused either way. */
  private static Optional<? extends PreparedFlexibility> ready(
      Study study,
      FrameModel frame,
      MeasuredFlexibility measured,
      List<StiffnessPath> paths,
      Findings findings) {
    Outcome<FrameFlexibility> full =
        FrameFlexibility.prepare(frame, measured.gauges(), measured.loads(), paths);
    findings.addAll(full.findings());
    if (full.value().isEmpty()
        || !(study.flexibility() instanceof FlexibilityChoice.Truncated truncated)) {
      return full.value();
    }
    Outcome<TruncatedFlexibility> modes =
        TruncatedFlexibility.prepare(
            frame, measured.gauges(), measured.loads(), paths, truncated.modes());
    modes.findings().stream()
        .filter(finding -> !full.findings().contains(finding))
        .forEach(finding -> findings.addAll(List.of(finding)));
    return modes.value();
  }

  /** The scaled stiffnesses that a frame has. */
  private static List<StiffnessPath> known(Study study, FrameModel frame) {
    return study.parameters().stream()
        .flatMap(p -> p.scales().stream())
        .map(StiffnessPath::parse)
        .flatMap(Optional::stream)
        .filter(path -> frame.stiffness(path).isPresent())
        .distinct()
        .toList();
  }

  private static List<Finding> missingParts(
      Study study, FrameModel model, List<ConfiguredFrame> frames) {
    Findings findings = new Findings();
    for (Parameter parameter : study.parameters()) {
      for (String scale : parameter.scales()) {
        Optional<StiffnessPath> path = StiffnessPath.parse(scale);
        if (path.isEmpty()) {
          continue;
        }
        List<String> without =
            frames.stream()
                .filter(f -> !f.paths.contains(path.get()))
                .map(f -> f.measured.configuration())
                .toList();
        boolean somewhere =
            without.size() < frames.size() || model.stiffness(path.get()).isPresent();
        if (!somewhere) {
          findings.addAll(model.resolve(path.get(), parameter.where()));
        } else if (!without.isEmpty() && frames.size() == without.size()) {
          findings.add(
              CompareFinding.PART_NOWHERE,
              parameter.where(),
              scale + " is taken out of every configuration");
        } else if (!without.isEmpty()) {
          findings.add(
              CompareFinding.PART_NOT_IN_CONFIGURATION,
              parameter.where(),
              scale + " is not there in the configuration " + String.join(", ", without));
        }
      }
    }
    return findings.list();
  }

  private static void refuseWeightless(
      MeasuredFlexibility measured, Configuration configuration, Findings findings) {
    if (measured.coefficients().isEmpty()) {
      findings.add(
          CompareFinding.NOTHING_MEASURED,
          configuration.where(),
          "the log of the configuration '"
              + configuration.name()
              + "' gives no coefficient that can be compared");
    }
    double[][] covariance = measured.scatterCovariance();
    for (int r = 0; r < covariance.length; r++) {
      if (!(covariance[r][r] > 0)) {
        int gauge = measured.coefficients().get(r).gauge();
        int load = measured.coefficients().get(r).load();
        findings.add(
            CompareFinding.NO_SCATTER,
            measured.gauges().get(gauge).where(),
            "gauge "
                + measured.gauges().get(gauge).name()
                + " under load "
                + measured.loads().get(load).name()
                + " has no uncertainty from scatter or floor");
      }
    }
  }

  /**
   * The configuration's name.
   *
   * @return as in the study
   */
  public String name() {
    return measured.configuration();
  }

  /**
   * The frame with the configuration's changes.
   *
   * @return the model
   */
  public FrameModel model() {
    return model;
  }

  /**
   * What was measured.
   *
   * @return the measured flexibility
   */
  public MeasuredFlexibility measured() {
    return measured;
  }

  /**
   * The scaled stiffnesses that this configuration has.
   *
   * @return in the order of the parameters
   */
  public List<StiffnessPath> paths() {
    return paths;
  }

  /**
   * Solves with some stiffnesses set.
   *
   * @param settings by path; those not named stay nominal, those not there are passed over
   * @return the solution
   */
  public ComputedFlexibility solve(Map<StiffnessPath, StiffnessSetting> settings) {
    return flexibility.solve(
        paths.stream()
            .map(path -> settings.getOrDefault(path, StiffnessSetting.nominal()))
            .toList());
  }

  /**
   * Solves the nominal frame.
   *
   * @return the solution
   */
  public ComputedFlexibility nominal() {
    return solve(new LinkedHashMap<>());
  }

  /**
   * The modes that the flexibility is made of.
   *
   * @return the truncated flexibility; empty where it is the whole
   */
  public Optional<TruncatedFlexibility> truncated() {
    return flexibility instanceof TruncatedFlexibility modes
        ? Optional.of(modes)
        : Optional.empty();
  }

  /**
   * Takes the absolute coefficients that were measured out of a whole matrix.
   *
   * @param matrix gauges × loads
   * @return in the order of {@code MeasuredFlexibility.absolute()}
   */
  public double[] absolute(double[][] matrix) {
    double[] result = new double[measured.absolute().size()];
    for (int i = 0; i < result.length; i++) {
      AbsoluteCoefficient a = measured.absolute().get(i);
      result[i] = matrix[a.gauge()][a.load()];
    }
    return result;
  }
}
