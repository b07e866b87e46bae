package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.CoefficientUncertainty;
import org.flexbound.flexibility.Gain;
import org.flexbound.flexibility.LinearMap;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.setup.DirectionText;
import org.flexbound.setup.FitRange;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Instrument;
import org.flexbound.setup.Load;
import org.flexbound.testlog.Run;
import org.flexbound.testlog.TestLog;

/**
 * Works out before a test what it would measure and how well, if a computed flexibility were true.
 *
 * <p>Every gauge is taken to be read under every load. Scatter is the stated repeatability (of the
 * coefficient, or of a twentieth of the largest one beside it) over the square root of the runs; floors and resolution act at both ends of the fitted range of load, as in
 * the reduction; calibrations are gains; base motion is taken out by the base gauges' own errors.
 */
public final class TestPlanner {
  /** Where the log states none: half of the usual limit for repeatability (common practice). */
  private static final double REPEATABILITY = 0.01;

  /** Where the log names no runs (common practice: a pooled scatter needs repeats). */
  private static final int RUNS = 3;

  /** Below this share of the largest, a coefficient repeats no better (common practice). */
  private static final double SMALL = 0.05;

  private final String configuration;
  private final TestLog log;
  private final Places places;
  private final Findings findings = new Findings();
  private final List<Gain> gains = new ArrayList<>();
  private final Map<String, Integer> gainIndex = new LinkedHashMap<>();
  private final Map<String, Instrument> instruments = new LinkedHashMap<>();

  private TestPlanner(String configuration, TestLog log, Places places) {
    this.configuration = configuration;
    this.log = log;
    this.places = places;
    log.instruments().forEach(i -> instruments.put(i.name(), i));
  }

  /**
   * The flexibility as a planned test would show it.
   *
   * @param problem the plan: a log, with or without readings
   * @param computed the absolute coefficients that are expected, gauges × loads, SI
   * @return what would be measured, with everything that was assumed; no value where a load's size is
   *     not stated
   */
  public static Outcome<PlannedFlexibility> plan(ReductionProblem problem, double[][] computed) {
    return new TestPlanner(problem.configuration(), problem.log(), problem.places())
        .plan(computed);
  }

  private Outcome<PlannedFlexibility> plan(double[][] computed) {
    List<PlannedLoad> loads = loads();
    if (findings.hasErrors()) {
      return Outcome.none(findings.list());
    }
    List<AbsoluteCoefficient> absolute = new ArrayList<>();
    for (int g = 0; g < log.gauges().size(); g++) {
      for (int l = 0; l < loads.size(); l++) {
        absolute.add(absolute(g, l, loads.get(l), computed[g][l], atLeast(g, l, computed)));
      }
    }
    List<int[]> names = new ArrayList<>();
    List<int[]> columns = new ArrayList<>();
    List<double[]> weights = new ArrayList<>();
    boolean correct =
        log.options().takeOutBaseMotion() && log.gauges().stream().anyMatch(Gauge::base);
    for (int g = 0; g < log.gauges().size(); g++) {
      if (correct && log.gauges().get(g).base()) {
        continue;
      }
      Map<Integer, Double> base = correct ? base(log.gauges().get(g)) : Map.of();
      for (int l = 0; l < loads.size(); l++) {
        Map<Integer, Double> row = new LinkedHashMap<>();
        row.put(g * loads.size() + l, 1.0);
        int load = l;
        base.forEach((b, weight) -> row.put(b * loads.size() + load, -weight));
        names.add(new int[] {g, l});
        columns.add(row.keySet().stream().mapToInt(Integer::intValue).toArray());
        weights.add(row.values().stream().mapToDouble(Double::doubleValue).toArray());
      }
    }
    LinearMap map =
        new LinearMap(
            absolute.size(), columns.toArray(int[][]::new), weights.toArray(double[][]::new));
    return Outcome.of(
        new PlannedFlexibility(
            loads,
            new MeasuredFlexibility(
                configuration,
                log.gauges(),
                log.loads(),
                absolute,
                gains,
                Double.POSITIVE_INFINITY,
                map,
                coefficients(names, absolute, map))),
        findings.list());
  }

  /** The compared coefficients; what is stated has infinite degrees of freedom. */
  private List<Coefficient> coefficients(
      List<int[]> names, List<AbsoluteCoefficient> absolute, LinearMap map) {
    double[] values = map.apply(absolute.stream().mapToDouble(AbsoluteCoefficient::value).toArray());
    double[] variances =
        absolute.stream()
            .mapToDouble(a -> square(a.scatterUncertainty()) + square(a.floorUncertainty()))
            .toArray();
    double[] total = new double[values.length];
    double[][] independent = map.covariance(variances);
    for (int row = 0; row < total.length; row++) {
      total[row] = independent[row][row];
    }
    for (int g = 0; g < gains.size(); g++) {
      double[] effect = CoefficientUncertainty.effect(g, gains, absolute, map);
      for (int row = 0; row < total.length; row++) {
        total[row] += square(effect[row]);
      }
    }
    List<Coefficient> result = new ArrayList<>();
    for (int row = 0; row < total.length; row++) {
      result.add(
          new Coefficient(
              names.get(row)[0],
              names.get(row)[1],
              values[row],
              Math.sqrt(total[row]),
              Double.POSITIVE_INFINITY));
    }
    return result;
  }

  private static double square(double value) {
    return value * value;
  }

  private List<PlannedLoad> loads() {
    OptionalDouble stated = log.options().statedRepeatability();
    if (stated.isEmpty() && !log.loads().isEmpty()) {
      findings.add(
          ReduceFinding.PLAN_ASSUMED,
          log.loads().get(0).where().file().map(Where::file).orElseGet(Where::nowhere),
          String.format(
              java.util.Locale.ROOT,
              "no repeatability is stated; slopes are taken to repeat within %.0f %%",
              100 * REPEATABILITY));
    }
    List<PlannedLoad> result = new ArrayList<>();
    for (Load load : log.loads()) {
      List<Run> runs =
          log.runs().stream()
              .filter(
                  run ->
                      run.use() && run.loads().stream().anyMatch(c -> c.name().equals(load.name())))
              .toList();
      double inRuns = runs.stream().mapToDouble(run -> largest(run, load.name())).max().orElse(0);
      if (!(inRuns > 0) && load.limit().isEmpty()) {
        findings.add(
            ReduceFinding.PLAN_INCOMPLETE,
            load.where(),
            "found neither a limit nor planned steps of the load '"
                + load.name()
                + "'; expected one of them, since the larger the load the less the floors weigh");
        continue;
      }
      if (runs.isEmpty()) {
        findings.add(
            ReduceFinding.PLAN_ASSUMED,
            load.where(),
            "no run of the load '" + load.name() + "' is described; " + RUNS + " are assumed");
      }
      result.add(
          new PlannedLoad(
              load.name(),
              inRuns > 0 ? inRuns : load.limit().orElse(0),
              runs.isEmpty() ? RUNS : runs.size(),
              stated.orElse(REPEATABILITY),
              (inRuns > 0 ? "steps of the runs" : "stated limit")
                  + (runs.isEmpty() ? ", runs assumed" : ", runs of the log")
                  + (stated.isPresent() ? ", repeatability stated" : ", repeatability assumed")));
    }
    return result;
  }

  private static double largest(Run run, String load) {
    double[] most = new double[1];
    for (int c = 0; c < run.loads().size(); c++) {
      if (run.loads().get(c).name().equals(load)) {
        int channel = c;
        run.readings()
            .forEach(
                reading -> {
                  double value = Math.abs(reading.load(channel));
                  if (reading.use() && value > most[0]) {
                    most[0] = value;
                  }
                });
      }
    }
    return most[0];
  }

  /** What counts as the size of a coefficient near nought: a share of the largest of its kind. */
  private double atLeast(int gauge, int load, double[][] computed) {
    double largest = 0;
    for (int g = 0; g < computed.length; g++) {
      if (log.gauges().get(g).kind() == log.gauges().get(gauge).kind()) {
        largest = Math.max(largest, Math.abs(computed[g][load]));
      }
    }
    return SMALL * largest;
  }

  private AbsoluteCoefficient absolute(
      int g, int l, PlannedLoad plan, double value, double atLeast) {
    Gauge gauge = log.gauges().get(g);
    Load load = log.loads().get(l);
    FitRange range = log.options().fitRange(gauge.name());
    double span = plan.largest() * (range.upper() - range.lower());
    List<Integer> acting = new ArrayList<>();
    double fixed = 0;
    Optional<Instrument> own = gauge.instrument().map(instruments::get);
    if (own.isPresent()) {
      own.get()
          .gainUncertainty()
          .ifPresent(u -> acting.add(gain(own.get().gainKey(), own.get().name(), u)));
      double resolution = own.get().resolution().orElse(0) / Math.sqrt(12);
      // two readings, each with floor and resolution, over the load between them
      fixed =
          Math.sqrt(2) * Math.hypot(own.get().floorUncertainty().orElse(0), resolution) / span;
    }
    load.instrument()
        .map(instruments::get)
        .ifPresent(
            cell -> {
              cell.gainUncertainty()
                  .ifPresent(u -> acting.add(gain(cell.gainKey(), cell.name(), u)));
              double relative = Math.sqrt(2) * cell.floorUncertainty().orElse(0) / span;
              if (relative > 0) {
                acting.add(
                    gain(
                        cell.gainKey() + " / floor at " + load.name(),
                        "fixed uncertainty of " + cell.name() + " at " + load.name(),
                        relative));
              }
            });
    return new AbsoluteCoefficient(
        g,
        l,
        value,
        plan.repeatability() * Math.max(Math.abs(value), atLeast) / Math.sqrt(plan.runs()),
        fixed,
        acting,
        plan.runs());
  }

  private int gain(String key, String description, double uncertainty) {
    return gainIndex.computeIfAbsent(
        key,
        fresh -> {
          gains.add(new Gain(key, description, uncertainty));
          return gains.size() - 1;
        });
  }

  /** The weights of the base gauges in what moves a gauge with the base, by the gauges' indices. */
  private Map<Integer, Double> base(Gauge gauge) {
    if (!BaseMotion.concerns(gauge)) {
      return Map.of();
    }
    List<Gauge> bases = new ArrayList<>();
    List<Integer> indices = new ArrayList<>();
    for (int b = 0; b < log.gauges().size(); b++) {
      if (log.gauges().get(b).base()) {
        bases.add(log.gauges().get(b));
        indices.add(b);
      }
    }
    Optional<double[]> weights = new BaseMotion(places).weights(gauge, bases);
    if (weights.isEmpty()) {
      findings.add(
          ReduceFinding.BASE_MOTION_LEFT,
          gauge.where(),
          "the base gauges do not determine how the base moves '"
              + gauge.name()
              + "': a base gauge along "
              + DirectionText.print(gauge.direction())
              + ", or more of them about it, is missing");
      return Map.of();
    }
    Map<Integer, Double> result = new LinkedHashMap<>();
    for (int b = 0; b < indices.size(); b++) {
      result.put(indices.get(b), weights.get()[b]);
    }
    return result;
  }
}
