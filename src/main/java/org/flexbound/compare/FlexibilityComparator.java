package org.flexbound.compare;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Consumer;
import org.apache.commons.statistics.distribution.ChiSquaredDistribution;
import org.apache.commons.statistics.distribution.FDistribution;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.flexibility.MeasuredModes;
import org.flexbound.frame.FrameModel;
import org.flexbound.solve.ComputedFlexibility;
import org.flexbound.solve.PartContribution;
import org.flexbound.study.Study;

/** Compares measured with computed flexibility. */
public final class FlexibilityComparator {
  /** The contributions shown with a coefficient. */
  private static final int PARTS_SHOWN = 8;

  private static final double LEVEL = 0.95;

  /** A part that would have to change by more than this factor explains nothing (no source). */
  private static final double WILD = 20;

  private FlexibilityComparator() {}

  /**
   * Compares the nominal model of a study.
   *
   * @param study the study
   * @param model its frame model
   * @param measured what was measured, by configuration
   * @return the comparison, with all findings; no value where anything is in error
   */
  public static Outcome<Comparison> compare(
      Study study, FrameModel model, List<MeasuredFlexibility> measured) {
    return compare(study, model, measured, Optional.empty());
  }

  /**
   * Compares the nominal model of a study, and a table of measured modes beside it.
   *
   * @param study the study
   * @param model its frame model
   * @param measured what was measured, by configuration
   * @param modes the table of measured modes, if there is one
   * @return the comparison, with all findings; no value where anything is in error
   */
  public static Outcome<Comparison> compare(
      Study study,
      FrameModel model,
      List<MeasuredFlexibility> measured,
      Optional<MeasuredModes> modes) {
    return ConfiguredFrame.prepare(study, model, measured)
        .then(
            frames -> {
              Comparison comparison = compare(frames, modes);
              return Outcome.of(comparison, comparison.findings());
            });
  }

  /**
   * Compares the nominal frames.
   *
   * @param frames one for each configuration
   * @return the comparison
   */
  public static Comparison compare(List<ConfiguredFrame> frames) {
    return compare(frames, Optional.empty());
  }

  private static Comparison compare(List<ConfiguredFrame> frames, Optional<MeasuredModes> modes) {
    Findings findings = new Findings();
    List<ConfigurationComparison> result = new ArrayList<>();
    for (ConfiguredFrame frame : frames) {
      ComputedFlexibility solution = frame.nominal();
      result.add(
          compare(
              frame.measured(),
              frame.absolute(solution.values()),
              PlacingEffects.of(frame, solution),
              parts(frame.measured(), solution),
              table -> new ComparisonHints(frame, solution, table, findings).tell(),
              frame.truncated().map(truncated -> new TruncationEffect(frame, truncated)),
              modes,
              findings));
    }
    return new Comparison(result, findings.list());
  }

  /**
   * Compares a model held elsewhere, at its nominal stiffnesses.
   *
   * @param table its flexibility and sensitivities, computed at the nominal stiffnesses or carried
   *     there from where they were
   * @param parameters the parameters' names; what they contribute is what their sensitivities say
   * @param measured what was measured, by configuration
   * @return the comparison, with all findings; no value where the table lacks a coefficient
   */
  public static Outcome<Comparison> compareOutside(
      OutsideTable table, List<String> parameters, List<MeasuredFlexibility> measured) {
    Findings findings = new Findings();
    List<ConfigurationComparison> result = new ArrayList<>();
    for (MeasuredFlexibility m : measured) {
      Optional<OutsideModel> model =
          OutsideModel.of(table, List.of(m), parameters, findings);
      if (model.isEmpty()) {
        continue;
      }
      double[] nominal = new double[parameters.size()];
      double[][] derivatives = model.get().derivatives(nominal);
      Map<String, double[]> parts = new LinkedHashMap<>();
      for (int k = 0; k < nominal.length; k++) {
        double[] part = new double[derivatives.length];
        for (int i = 0; i < part.length; i++) {
          part[i] = -derivatives[i][k];
        }
        parts.put(parameters.get(k), m.map().apply(part));
      }
      // without a model there are no other nodes or directions to guess at
      result.add(
          compare(
              m,
              model.get().coefficients(nominal),
              List.of(),
              parts,
              unused -> {},
              Optional.empty(),
              Optional.empty(),
              findings));
    }
    return findings.hasErrors()
        ? Outcome.none(findings.list())
        : Outcome.of(new Comparison(result, findings.list()), findings.list());
  }

  private static ConfigurationComparison compare(
      MeasuredFlexibility measured,
      double[] absolute,
      List<double[]> placing,
      Map<String, double[]> parts,
      Consumer<HintTable> hints,
      Optional<TruncationEffect> effect,
      Optional<MeasuredModes> modes,
      Findings findings) {
    double[] computed = measured.map().apply(absolute);
    double[] values = measured.values();
    double[] differences = new double[values.length];
    for (int r = 0; r < values.length; r++) {
      differences[r] = values[r] - computed[r];
    }
    double[][] covariance =
        DifferenceCovariance.of(measured, absolute, placing);
    List<CoefficientComparison.Truncated> truncated =
        effect.map(TruncationEffect::coefficients).orElse(List.of());
    Optional<OptionalDouble[]> fromModes =
        modes.map(table -> ModeTable.coefficients(measured, table));
    List<CoefficientComparison> coefficients = new ArrayList<>();
    for (int r = 0; r < values.length; r++) {
      Coefficient coefficient = measured.coefficients().get(r);
      double u = Math.sqrt(covariance[r][r]);
      int row = r;
      String gauge = measured.gauges().get(coefficient.gauge()).name();
      String load = measured.loads().get(coefficient.load()).name();
      if (values[r] * computed[r] < 0 && Math.min(Math.abs(values[r]), Math.abs(computed[r])) > 3 * u) {
        findings.add(
            CompareFinding.OPPOSITE_SIGN,
            measured.gauges().get(coefficient.gauge()).where(),
            "gauge "
                + gauge
                + " moves the other way under load "
                + load
                + " in the model ("
                + measured.configuration()
                + ")");
      }
      coefficients.add(
          new CoefficientComparison(
              measured.configuration(),
              gauge,
              load,
              values[r],
              computed[r],
              differences[r],
              Math.abs(computed[r]) > u
                  ? OptionalDouble.of(values[r] / computed[r])
                  : OptionalDouble.empty(),
              u,
              differences[r] / u,
              truncated.isEmpty() ? Optional.empty() : Optional.of(truncated.get(r)),
              fromModes.map(all -> all[row]).orElse(OptionalDouble.empty()),
              largest(parts, r)));
    }
    double[] uncertainty = new double[values.length];
    for (int r = 0; r < values.length; r++) {
      uncertainty[r] = Math.sqrt(covariance[r][r]);
    }
    hints.accept(new HintTable(measured, values, computed, uncertainty));
    WeightedSquares squares = new WeightedSquares(covariance);
    double misfit = squares.product(differences, differences);
    effect.ifPresent(told -> told.tell(misfit, squares, uncertainty, findings));
    return new ConfigurationComparison(
        measured.configuration(),
        coefficients,
        misfit,
        limit(squares.rank(), measured.scatterDegreesOfFreedom()),
        shares(parts, differences, squares));
  }

  /** Each part's contribution to every compared coefficient. */
  private static Map<String, double[]> parts(
      MeasuredFlexibility measured, ComputedFlexibility solution) {
    Map<String, double[]> absolute = new LinkedHashMap<>();
    int size = measured.absolute().size();
    for (int i = 0; i < size; i++) {
      AbsoluteCoefficient a = measured.absolute().get(i);
      for (PartContribution part : solution.contributions(a.gauge(), a.load())) {
        absolute.computeIfAbsent(part.part().toString(), unused -> new double[size])[i] +=
            part.value();
      }
    }
    Map<String, double[]> result = new LinkedHashMap<>();
    absolute.forEach((part, values) -> result.put(part, measured.map().apply(values)));
    return result;
  }

  private static List<CoefficientComparison.Contribution> largest(
      Map<String, double[]> parts, int row) {
    return parts.entrySet().stream()
        .map(e -> new CoefficientComparison.Contribution(e.getKey(), e.getValue()[row]))
        .filter(c -> c.value() != 0)
        .sorted(
            Comparator.comparingDouble(
                    (CoefficientComparison.Contribution c) -> -Math.abs(c.value()))
                .thenComparing(CoefficientComparison.Contribution::part))
        .limit(PARTS_SHOWN)
        .toList();
  }

  private static List<ConfigurationComparison.PartShare> shares(
      Map<String, double[]> parts, double[] differences, WeightedSquares squares) {
    List<ConfigurationComparison.PartShare> result = new ArrayList<>();
    parts.forEach(
        (part, values) -> {
          double own = squares.product(values, values);
          double shared = squares.product(values, differences);
          double factor = 1 + shared / own;
          if (own > 1e-6 && factor > 1 / WILD && factor < WILD) {
            result.add(
                new ConfigurationComparison.PartShare(part, factor, shared * shared / own));
          }
        });
    result.sort(
        Comparator.comparingDouble(
                (ConfigurationComparison.PartShare s) -> -s.misfitTakenAway())
            .thenComparing(ConfigurationComparison.PartShare::part));
    return result;
  }

  private static double limit(int degrees, double scatterDegrees) {
    if (degrees == 0) {
      return Double.POSITIVE_INFINITY;
    }
    return Double.isInfinite(scatterDegrees)
        ? ChiSquaredDistribution.of(degrees).inverseCumulativeProbability(LEVEL)
        : degrees
            * FDistribution.of(degrees, scatterDegrees).inverseCumulativeProbability(LEVEL);
  }
}
