package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.CoefficientUncertainty;
import org.flexbound.flexibility.Gain;
import org.flexbound.flexibility.LinearMap;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Instrument;
import org.flexbound.setup.Load;
import org.flexbound.testlog.TestLog;

/** Makes the measured flexibility of pooled slopes: gains, floors, base motion, averages. */
final class FlexibilityBuilder {
  /** Base motion below this share of the largest motion under a load is not told (no source). */
  private static final double NOTHING = 0.05;

  private final ReductionProblem problem;
  private final TestLog log;
  private final Findings findings;
  private final Map<String, Instrument> instruments = new LinkedHashMap<>();
  private final List<Gain> gains = new ArrayList<>();
  private final Map<String, Integer> gainIndex = new LinkedHashMap<>();
  private final Map<String, Double> baseShares = new LinkedHashMap<>();
  private boolean calibrationIncluded = true;

  FlexibilityBuilder(ReductionProblem problem, Findings findings) {
    this.problem = problem;
    this.log = problem.log();
    this.findings = findings;
    log.instruments().forEach(instrument -> instruments.put(instrument.name(), instrument));
  }

  boolean calibrationIncluded() {
    return calibrationIncluded;
  }

  Map<String, Double> baseShares() {
    return baseShares;
  }

  MeasuredFlexibility build(RunPooling pooling) {
    List<AbsoluteCoefficient> absolute = new ArrayList<>();
    for (SlopeCell cell : pooling.cells()) {
      absolute.add(absolute(cell, pooling));
    }
    return build(absolute, pooling.degreesOfFreedom());
  }

  /** Takes out base motion and averages; the gains are those gathered so far. */
  MeasuredFlexibility build(List<AbsoluteCoefficient> absolute, double scatterFreedom) {
    List<int[]> columns = new ArrayList<>();
    List<double[]> weights = new ArrayList<>();
    List<int[]> names = new ArrayList<>();
    for (int load = 0; load < log.loads().size(); load++) {
      for (int gauge = 0; gauge < log.gauges().size(); gauge++) {
        Map<Integer, Double> row = row(gauge, load, absolute);
        if (!row.isEmpty()) {
          names.add(new int[] {gauge, load});
          columns.add(row.keySet().stream().mapToInt(Integer::intValue).toArray());
          weights.add(row.values().stream().mapToDouble(Double::doubleValue).toArray());
        }
      }
    }
    LinearMap map =
        new LinearMap(
            absolute.size(), columns.toArray(int[][]::new), weights.toArray(double[][]::new));
    return new MeasuredFlexibility(
        problem.configuration(),
        log.gauges(),
        log.loads(),
        absolute,
        gains,
        scatterFreedom,
        map,
        CoefficientUncertainty.coefficients(
            names.toArray(int[][]::new), absolute, gains, map));
  }

  private AbsoluteCoefficient absolute(SlopeCell cell, RunPooling pooling) {
    double mean = cell.mean();
    double span = loadSpan(cell);
    List<Integer> acting = new ArrayList<>();
    double floor = 0;
    Optional<Instrument> gauge = cell.gaugeInstrument().map(instruments::get);
    Optional<Instrument> load = cell.loadInstrument().map(instruments::get);
    if (gauge.isEmpty() || gauge.get().uncalibrated()) {
      calibrationIncluded = false;
    } else {
      Instrument found = gauge.get();
      found.gainUncertainty().ifPresent(u -> acting.add(gain(found, u)));
      // two readings, each with the floor, over the load between them
      floor = Math.sqrt(2) * found.floorUncertainty().orElse(0) / span;
    }
    floor = Math.hypot(Math.hypot(floor, rounding(gauge, cell)), treatment(cell));
    if (load.isEmpty() || load.get().uncalibrated()) {
      calibrationIncluded = false;
    } else {
      Instrument found = load.get();
      found.gainUncertainty().ifPresent(u -> acting.add(gain(found, u)));
      double relative = Math.hypot(Math.sqrt(2) * found.floorUncertainty().orElse(0) / span, rounding(load, cell));
      if (relative > 0) {
        acting.add(
            index(
                new Gain(
                    found.gainKey() + " / floor at " + cell.load(),
                    "fixed uncertainty of " + found.name() + " at " + cell.load(),
                    relative)));
      }
    }
    double common = pooling.commonUncertainty(cell.load());
    if (common > 0) {
      acting.add(
          index(
              new Gain(
                  "scatter of runs / " + problem.configuration() + " / " + cell.load(),
                  "scatter from run to run that all gauges under " + cell.load() + " share",
                  common,
                  true)));
    }
    return new AbsoluteCoefficient(
        indexOfGauge(cell.gauge()),
        indexOfLoad(cell.load()),
        mean,
        pooling.uncertainty(cell),
        floor,
        acting,
        cell.slopes().size(),
        pooling.degreesOfFreedom(cell));
  }

  /**
   * What remains open between drift and set: the difference of the two slopes is the half width of an even distribution (JCGM 100:2008, 4.3.7),
   * the mean over runs, since runs are treated alike.
   */
  private static double treatment(SlopeCell cell) {
    return cell.slopes().stream().mapToDouble(RunSlope::otherTreatment).average().orElse(0) / Math.sqrt(3);
  }

  /**
   * What rounding to an instrument's resolution does to a slope, per unit of the load (relative, for the load's instrument): an error of
   * resolution/√12 in each step (JCGM 100:2008, F.2.2.1), once a step however many rows it has. Repeating does not reduce it, since the same
   * loads are rounded the same way.
   */
  private static double rounding(Optional<Instrument> instrument, SlopeCell cell) {
    double resolution = instrument.map(found -> found.resolution().orElse(0)).orElse(0.0);
    if (!(resolution > 0)) {
      return 0;
    }
    double spread = cell.slopes().stream().mapToDouble(FlexibilityBuilder::spread).average().orElse(0);
    return spread > 0 ? resolution / Math.sqrt(12 * spread) : 0;
  }

  /** Σ (load less its branch's mean)² over the fitted steps. */
  private static double spread(RunSlope slope) {
    Map<Integer, double[]> branches = new LinkedHashMap<>();
    for (LoadStep step : slope.steps()) {
      if (step.fate() == LoadStep.Fate.FITTED) {
        double[] sums = branches.computeIfAbsent(step.branch(), key -> new double[3]);
        sums[0]++;
        sums[1] += step.load();
        sums[2] += step.load() * step.load();
      }
    }
    double spread = 0;
    for (double[] sums : branches.values()) {
      spread += sums[2] - sums[1] * sums[1] / sums[0];
    }
    return spread;
  }

  /** Largest less smallest fitted load of the cell's runs, on the average. */
  private static double loadSpan(SlopeCell cell) {
    return cell.slopes().stream()
        .mapToDouble(
            slope -> {
              double low = Double.POSITIVE_INFINITY;
              double high = Double.NEGATIVE_INFINITY;
              for (LoadStep step : slope.steps()) {
                if (step.fate() == LoadStep.Fate.FITTED) {
                  low = Math.min(low, step.load());
                  high = Math.max(high, step.load());
                }
              }
              return high - low;
            })
        .average()
        .orElse(Double.NaN);
  }

  private int gain(Instrument instrument, double uncertainty) {
    return index(
        new Gain(
            instrument.gainKey(),
            instrument.name()
                + instrument.certificate().map(text -> ", certificate " + text).orElse(""),
            uncertainty));
  }

  private int index(Gain gain) {
    Integer known = gainIndex.get(gain.key());
    if (known != null) {
      return known;
    }
    gainIndex.put(gain.key(), gains.size());
    gains.add(gain);
    return gains.size() - 1;
  }

  private int indexOfGauge(String name) {
    for (int k = 0; k < log.gauges().size(); k++) {
      if (log.gauges().get(k).name().equals(name)) {
        return k;
      }
    }
    throw new IllegalStateException("a slope of the unknown gauge " + name);
  }

  private int indexOfLoad(String name) {
    for (int k = 0; k < log.loads().size(); k++) {
      if (log.loads().get(k).name().equals(name)) {
        return k;
      }
    }
    throw new IllegalStateException("a slope of the unknown load " + name);
  }

  /** The weights of the absolute coefficients that make one compared coefficient; empty for none. */
  private Map<Integer, Double> row(int gauge, int load, List<AbsoluteCoefficient> absolute) {
    Gauge row = log.gauges().get(gauge);
    boolean correct = log.options().takeOutBaseMotion() && hasBases();
    Map<Integer, Double> own = mean(gauge, load, absolute);
    if (own.isEmpty() || (correct && row.base())) {
      return Map.of();
    }
    if (!correct || !BaseMotion.concerns(row)) {
      return own;
    }
    List<Gauge> bases = new ArrayList<>();
    List<Map<Integer, Double>> readings = new ArrayList<>();
    for (int b = 0; b < log.gauges().size(); b++) {
      Map<Integer, Double> reading = mean(b, load, absolute);
      if (log.gauges().get(b).base() && !reading.isEmpty()) {
        bases.add(log.gauges().get(b));
        readings.add(reading);
      }
    }
    BaseMotion motion = new BaseMotion(problem.places());
    Optional<double[]> weights =
        bases.isEmpty() ? Optional.empty() : motion.weights(row, bases);
    if (weights.isEmpty()) {
      Load column = log.loads().get(load);
      findings.add(
          ReduceFinding.BASE_MOTION_LEFT,
          row.where(),
          motion.knows(row)
              ? "the base gauges read under '"
                  + column.name()
                  + "' do not determine how the base moves '"
                  + row.name()
                  + "': a base gauge along "
                  + org.flexbound.setup.DirectionText.print(row.direction())
                  + ", or more of them about it, is missing"
              : "the place of '" + row.name() + "' or of a base gauge is not known");
      return own;
    }
    Map<Integer, Double> corrected = new LinkedHashMap<>(own);
    double base = 0;
    for (int b = 0; b < readings.size(); b++) {
      double weight = weights.get()[b];
      for (Map.Entry<Integer, Double> entry : readings.get(b).entrySet()) {
        corrected.merge(entry.getKey(), -weight * entry.getValue(), Double::sum);
        base += weight * entry.getValue() * absolute.get(entry.getKey()).value();
      }
    }
    share(row, log.loads().get(load), own, absolute, base);
    return corrected;
  }

  private void share(
      Gauge gauge,
      Load load,
      Map<Integer, Double> own,
      List<AbsoluteCoefficient> absolute,
      double base) {
    double total = 0;
    for (Map.Entry<Integer, Double> entry : own.entrySet()) {
      total += entry.getValue() * absolute.get(entry.getKey()).value();
    }
    if (base == 0 || total == 0) {
      return;
    }
    double share = Math.abs(base / total);
    baseShares.put(Reduction.key(gauge.name(), load.name()), share);
    double limit = log.options().qualityLimits().baseMotionShare();
    if (share > limit && Math.abs(base) > NOTHING * largestMotion(load, absolute)) {
      findings.add(
          ReduceFinding.BASE_MOTION_LARGE,
          gauge.where(),
          String.format(
              java.util.Locale.ROOT,
              "%.0f %% of what '%s' showed under '%s' was base motion, limit %.0f %%",
              100 * share,
              gauge.name(),
              load.name(),
              100 * limit));
    }
  }

  /** The largest coefficient under a load: a small share of it is nothing to worry about. */
  private double largestMotion(Load load, List<AbsoluteCoefficient> absolute) {
    return absolute.stream()
        .filter(a -> log.loads().get(a.load()).equals(load))
        .filter(a -> !log.gauges().get(a.gauge()).readsAngle())
        .mapToDouble(a -> Math.abs(a.value()))
        .max()
        .orElse(0);
  }

  private boolean hasBases() {
    return log.gauges().stream().anyMatch(Gauge::base);
  }

  /** The mean over instruments, weighted by the number of runs. */
  private static Map<Integer, Double> mean(
      int gauge, int load, List<AbsoluteCoefficient> absolute) {
    Map<Integer, Double> weights = new LinkedHashMap<>();
    int runs = 0;
    for (int k = 0; k < absolute.size(); k++) {
      AbsoluteCoefficient found = absolute.get(k);
      if (found.gauge() == gauge && found.load() == load) {
        weights.put(k, (double) found.runs());
        runs += found.runs();
      }
    }
    double total = runs;
    weights.replaceAll((index, weight) -> weight / total);
    return weights;
  }
}
