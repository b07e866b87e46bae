package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.reduce.LoadStep.Fate;
import org.flexbound.statistics.GroupedLine;
import org.flexbound.statistics.Regression;

/** Finds the zeros of a run and tells drift from set. */
final class ZeroReadings {
  /** Steps below this share of the peak load count as unloaded. */
  private static final double UNLOADED = 0.02;

  /** A creep at no load below this many standard errors is not told from none. */
  private static final double SEEN = 4;

  /** Evidence of drift must make up this share of the difference of zeros. */
  private static final double EXPLAINS = 0.5;

  private final List<LoadStep> steps;
  private final List<StepGrouping.RawStep> raw;
  private final int gauge;
  private final List<Integer> zeros = new ArrayList<>();

  /**
   * Looks for the zeros.
   *
   * @param steps the steps of a gauge against one load
   * @param raw the same steps of all channels
   * @param gauge which gauge
   */
  ZeroReadings(List<LoadStep> steps, List<StepGrouping.RawStep> raw, int gauge) {
    this.steps = steps;
    this.raw = raw;
    this.gauge = gauge;
    double peak = steps.stream().mapToDouble(step -> Math.abs(step.load())).max().orElse(0);
    for (int k = 0; k < steps.size(); k++) {
      if (!Double.isNaN(steps.get(k).motion()) && Math.abs(steps.get(k).load()) <= UNLOADED * peak) {
        zeros.add(k);
      }
    }
  }

  private boolean hasBoth() {
    if (zeros.size() < 2) {
      return false;
    }
    int first = zeros.get(0);
    int last = zeros.get(zeros.size() - 1);
    boolean opens = steps.subList(0, first).stream().allMatch(step -> Double.isNaN(step.motion()));
    boolean closes = steps.subList(last + 1, steps.size()).stream().allMatch(step -> Double.isNaN(step.motion()));
    return opens && closes && last - first > 1;
  }

  /** The difference of the zeros, and what the other treatment would make of a slope. */
  ZeroReturn of(double slope) {
    if (!hasBoth()) {
      return new ZeroReturn(ZeroReturn.Kind.NOT_READ, Double.NaN, Double.NaN);
    }
    int first = zeros.get(0);
    int last = zeros.get(zeros.size() - 1);
    double opening = steps.get(first).motion();
    double difference = steps.get(last).motion() - opening;
    double largest = steps.stream().mapToDouble(step -> Math.abs(step.motion() - opening)).filter(value -> !Double.isNaN(value)).max().orElse(0);
    double share = largest > 0 ? difference / largest : 0;
    boolean drift = goesOn(difference) || movesFromCycleToCycle(difference);
    double without = withoutDrift(first, last, difference);
    return new ZeroReturn(drift ? ZeroReturn.Kind.DRIFT : ZeroReturn.Kind.SET, share, drift ? slope : without);
  }

  /** The slope with the difference of the zeros taken out evenly in time; NaN where it cannot be fitted. */
  double withoutDrift() {
    int first = zeros.get(0);
    int last = zeros.get(zeros.size() - 1);
    return withoutDrift(first, last, steps.get(last).motion() - steps.get(first).motion());
  }

  /** Whether the gauge creeps while the load is held at nothing, fast enough to make up the difference in the time of the run. */
  private boolean goesOn(double difference) {
    double duration = raw.get(zeros.get(zeros.size() - 1)).time - raw.get(zeros.get(0)).time;
    double sum = 0;
    int count = 0;
    for (int zero : zeros) {
      double[] creep = raw.get(zero).creep(gauge);
      if (!Double.isNaN(creep[0]) && Math.abs(creep[0]) > SEEN * creep[1]) {
        sum += creep[0] * duration;
        count++;
      } else if (!Double.isNaN(creep[0])) {
        count++;
      }
    }
    return count > 0 && sum / count * Math.signum(difference) > EXPLAINS * Math.abs(difference);
  }

  /** Whether the zeros between later cycles move as much as after the first, on or back. */
  private boolean movesFromCycleToCycle(double difference) {
    List<Double> ofCycles = new ArrayList<>();
    int before = -2;
    for (int zero : zeros) {
      // zeros in sequence are one zero; the last of them counts
      if (zero == before + 1 && !ofCycles.isEmpty()) {
        ofCycles.set(ofCycles.size() - 1, steps.get(zero).motion());
      } else {
        ofCycles.add(steps.get(zero).motion());
      }
      before = zero;
    }
    if (ofCycles.size() < 3) {
      return false;
    }
    double after = ofCycles.get(1) - ofCycles.get(0);
    double later = ofCycles.get(ofCycles.size() - 1) - ofCycles.get(1);
    return Math.abs(later) > EXPLAINS * Math.max(Math.abs(after), Math.abs(difference));
  }

  private double withoutDrift(int first, int last, double difference) {
    double duration = raw.get(last).time - raw.get(first).time;
    List<double[]> points = new ArrayList<>();
    List<Integer> branches = new ArrayList<>();
    for (int k = 0; k < steps.size(); k++) {
      LoadStep step = steps.get(k);
      if (step.fate() == Fate.FITTED && duration > 0) {
        points.add(new double[] {step.load(), step.motion() - difference * (raw.get(k).time - raw.get(first).time) / duration});
        branches.add(step.branch());
      }
    }
    try {
      return GroupedLine.fit(points.stream().mapToDouble(p -> p[0]).toArray(), points.stream().mapToDouble(p -> p[1]).toArray(),
              branches.stream().mapToInt(Integer::intValue).toArray()).slope();
    } catch (Regression.DependentColumns | IllegalArgumentException tooFew) {
      return Double.NaN;
    }
  }
}
