package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.finding.Where;
import org.flexbound.testlog.Reading;
import org.flexbound.testlog.Run;

/**
 * Groups the readings of a run into steps: rows in sequence with one step label, or, without labels,
 * at one held load; the ramps between held loads are told apart by {@link HeldSteps}. Streams; keeps
 * a mean and a scatter for each step and gauge.
 */
final class StepGrouping {
  /** Loads within this share of the run's range are one held load. */
  private static final double HELD = 0.01;

  /** Or within so many times its noise from row to row, as long as that is small. */
  private static final double NOISE = 4;

  /** Larger than this share of the range it is no noise, but the steps themselves, read row by row. */
  private static final double LARGEST_NOISE = 0.025;

  /** Below this share of the largest range a column may be an idle cell's noise alone. */
  private static final double SMALL = 0.05;

  /** And it is, where so many times its noise make up this share of its own range. */
  private static final double ALL_NOISE = 0.4;

  /** A load whose range is below this share of the largest did not vary: an idle cell wanders. */
  static final double VARIED = 1e-2;

  private final Run run;
  private final double[] tolerance;
  private final List<RawStep> steps = new ArrayList<>();
  private final List<Exclusion> excluded = new ArrayList<>();
  private final RunWatch watch;

  /** A step of all channels. */
  static final class RawStep {
    final String label;
    final double[] load;
    final double[] largestLoad;
    final double[] loadSquares;
    final double[] trend;
    final double[] motion;
    final double[] squares;
    final double[] timeMotion;
    final int[] counts;
    final Where[] where;
    double time;
    double timeSquares;
    final Where whereLoad;
    int readings;

    RawStep(String label, Where whereLoad, int loads, int gauges) {
      this.label = label;
      this.whereLoad = whereLoad;
      this.trend = new double[loads];
      this.load = new double[loads];
      this.largestLoad = new double[loads];
      this.loadSquares = new double[loads];
      this.motion = new double[gauges];
      this.squares = new double[gauges];
      this.timeMotion = new double[gauges];
      this.counts = new int[gauges];
      this.where = new Where[gauges];
    }

    /** Welford's updating of mean and sum of squares (Technometrics 4, 1962, 419). */
    void add(Reading reading) {
      readings++;
      double moment = Double.isNaN(reading.time()) ? reading.row() : reading.time();
      double earlier = moment - time;
      time += earlier / readings;
      timeSquares += earlier * (moment - time);
      for (int l = 0; l < load.length; l++) {
        double off = reading.load(l) - load[l];
        load[l] += off / readings;
        loadSquares[l] += off * (reading.load(l) - load[l]);
        // sum of products of row number and load, each about its mean
        trend[l] += off * (readings - 1) / 2.0;
        largestLoad[l] = Math.max(largestLoad[l], Math.abs(reading.load(l)));
      }
      for (int g = 0; g < motion.length; g++) {
        double value = reading.gauge(g);
        if (Double.isNaN(value)) {
          continue;
        }
        if (counts[g]++ == 0) {
          where[g] = reading.whereGauge(g);
        }
        double before = value - motion[g];
        motion[g] += before / counts[g];
        squares[g] += before * (value - motion[g]);
        timeMotion[g] += before * (moment - time);
      }
    }

    /** Load per row, by least squares; 0 for one row. */
    double rate(int channel) {
      return readings < 2 ? 0 : trend[channel] * 12.0 / (readings * (Math.pow(readings, 2) - 1));
    }

    double motion(int gauge) {
      return counts[gauge] == 0 ? Double.NaN : motion[gauge];
    }

    /**
     * How fast a gauge moved while the load was held, per unit of time (or row), and its standard error; NaN with fewer than four readings.
     */
    double[] creep(int gauge) {
      int n = counts[gauge];
      if (n < 4 || n != readings || !(timeSquares > 0)) {
        return new double[] {Double.NaN, Double.NaN};
      }
      double rate = timeMotion[gauge] / timeSquares;
      double left = Math.max(0, squares[gauge] - rate * timeMotion[gauge]);
      return new double[] {rate, Math.sqrt(left / (n - 2) / timeSquares)};
    }

    double scatter(int gauge) {
      return counts[gauge] < 2 ? 0 : Math.sqrt(squares[gauge] / (counts[gauge] - 1));
    }
  }

  private StepGrouping(Run run, double[] tolerance) {
    this.run = run;
    this.tolerance = tolerance;
    this.watch = new RunWatch(run);
  }

  /**
   * Groups.
   *
   * @param run the run
   * @param moment for each of its loads whether it is a moment
   */
  static StepGrouping of(Run run, boolean[] moment) {
    int loads = run.loads().size();
    double[] low = new double[loads];
    double[] high = new double[loads];
    java.util.Arrays.fill(low, Double.POSITIVE_INFINITY);
    java.util.Arrays.fill(high, Double.NEGATIVE_INFINITY);
    RowNoise[] noise = new RowNoise[loads];
    java.util.Arrays.setAll(noise, l -> new RowNoise());
    run.readings()
        .forEach(
            reading -> {
              for (int l = 0; l < loads; l++) {
                double value = reading.load(l);
                if (reading.use() && !Double.isNaN(value)) {
                  low[l] = Math.min(low[l], value);
                  high[l] = Math.max(high[l], value);
                  noise[l].see(value);
                }
              }
            });
    double[] shares = shares(low, high, moment);
    double[] tolerance = new double[loads];
    for (int l = 0; l < loads; l++) {
      double range = high[l] - low[l];
      double wide = NOISE * noise[l].standardDeviation();
      boolean idle = shares[l] < VARIED || (shares[l] < SMALL && wide > ALL_NOISE * range);
      // the noise of a cell that only idles must not part the steps of another
      tolerance[l] =
          idle
              ? Double.POSITIVE_INFINITY
              : Math.max(HELD * range, wide <= LARGEST_NOISE * range ? wide : 0);
    }
    StepGrouping grouping = new StepGrouping(run, tolerance);
    run.readings()
        .forEach(
            reading -> {
              grouping.watch.see(reading);
              grouping.add(reading);
            });
    return grouping;
  }

  /** The range of each load as a share of the largest one, forces and moments apart. */
  static double[] shares(double[] low, double[] high, boolean[] moment) {
    double[] largest = new double[2];
    for (int l = 0; l < low.length; l++) {
      int kind = moment[l] ? 1 : 0;
      largest[kind] = Math.max(largest[kind], high[l] - low[l]);
    }
    double[] shares = new double[low.length];
    for (int l = 0; l < low.length; l++) {
      double all = largest[moment[l] ? 1 : 0];
      shares[l] = all > 0 ? Math.max(0, high[l] - low[l]) / all : 0;
    }
    return shares;
  }

  private void add(Reading reading) {
    for (int l = 0; l < run.loads().size(); l++) {
      if (Double.isNaN(reading.load(l)) && reading.use()) {
        excluded.add(
            new Exclusion(
                run.name(), "row", reading.whereLoad(l), "no load was read", false, 1));
        return;
      }
    }
    if (!reading.use()) {
      String reason = reading.remark().isEmpty() ? "column Use says no" : reading.remark();
      Where where =
          run.gauges().isEmpty() ? reading.whereLoad(0) : reading.whereGauge(0);
      excluded.add(new Exclusion(run.name(), "row", where, reason, true, 1));
      return;
    }
    RawStep last = steps.isEmpty() ? null : steps.get(steps.size() - 1);
    if (last == null || !belongs(last, reading)) {
      last = new RawStep(reading.step(), reading.whereLoad(0), run.loads().size(), run.gauges().size());
      steps.add(last);
    }
    last.add(reading);
  }

  private boolean belongs(RawStep step, Reading reading) {
    if (!step.label.isEmpty() || !reading.step().isEmpty()) {
      return step.label.equals(reading.step());
    }
    for (int l = 0; l < step.load.length; l++) {
      if (Math.abs(reading.load(l) - step.load[l]) > tolerance[l]) {
        return false;
      }
    }
    return true;
  }

  /** What was kept of the readings themselves. */
  RunWatch watch() {
    return watch;
  }

  List<RawStep> steps() {
    return steps;
  }

  List<Exclusion> excluded() {
    return excluded;
  }
}
