package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.flexbound.statistics.RepeatedMedianLine;

/**
 * Finds readings that were lost: nought, one value again and again, or blank between good ones; and
 * single readings that leave their neighbours and come back. All judged against a line that half of
 * the steps cannot spoil.
 */
final class LostReadings {
  /** How far a reading must lie off, in noises and in shares of the movement (no source). */
  private static final double FAR = 8;

  private static final double SHARE = 0.05;

  private final GaugeNoise noise;

  LostReadings(GaugeNoise noise) {
    this.noise = noise;
  }

  List<GaugeFault> find(RunRecord record) {
    List<GaugeFault> faults = new ArrayList<>();
    for (RunSlope slope : record.slopes()) {
      ColumnWatch watch = record.gauge(slope.gauge());
      if (watch.readings() < 4 || watch.differentValues() < 2) {
        continue;
      }
      blanks(record, slope, watch, faults);
      if (record.single()) {
        List<LoadStep> steps =
            slope.steps().stream().filter(s -> !Double.isNaN(s.motion())).toList();
        RepeatedMedianLine line =
            RepeatedMedianLine.fit(
                steps.stream().mapToDouble(LoadStep::load).toArray(),
                steps.stream().mapToDouble(LoadStep::motion).toArray());
        if (!Double.isNaN(line.slope())) {
          Judge judge = new Judge(record, slope, watch, line, far(slope, steps, line));
          if (!judge.zeros(faults)) {
            judge.excursions(faults);
          }
        }
      }
    }
    return faults;
  }

  /** The distance from which a reading is off. */
  private double far(RunSlope slope, List<LoadStep> steps, RepeatedMedianLine line) {
    double low = steps.stream().mapToDouble(s -> line.at(s.load())).min().orElse(0);
    double high = steps.stream().mapToDouble(s -> line.at(s.load())).max().orElse(0);
    // readings scatter more than the means of their steps
    double within =
        RepeatedMedianLine.median(
            steps.stream().filter(s -> s.readings() > 1).mapToDouble(LoadStep::scatter).toArray());
    double sigma = Math.max(noise.noise(slope.gauge()), line.scale());
    sigma = Double.isNaN(within) ? sigma : Math.max(sigma, within);
    return Math.max(
        Math.max(FAR, noise.quantile()) * sigma + 2 * noise.resolution(slope.gauge()),
        SHARE * (high - low));
  }

  private static void blanks(
      RunRecord record, RunSlope slope, ColumnWatch watch, List<GaugeFault> faults) {
    // a gauge that is read at some steps only is meant so
    if (watch.blanks() > 0 && watch.blanks() < watch.readings()) {
      faults.add(
          new GaugeFault(
              GaugeFaultFinding.DROPPED_OUT,
              watch.rows(watch.firstBlank(), watch.lastBlank()),
              record.run().name(),
              slope.gauge(),
              "is blank in " + watch.blanks() + " rows between " + watch.readings() + " readings",
              RunVerdict.DOUBTFUL));
    }
  }

  /** One gauge of one run, with its line. */
  private record Judge(
      RunRecord record, RunSlope slope, ColumnWatch watch, RepeatedMedianLine line, double far) {

    /** Readings of exactly nought where the line is elsewhere. */
    boolean zeros(List<GaugeFault> faults) {
      List<ColumnWatch.Zero> off =
          watch.zeros().stream().filter(z -> Math.abs(line.at(z.load())) > far).toList();
      if (off.isEmpty()) {
        return false;
      }
      double largest = off.stream().mapToDouble(z -> Math.abs(line.at(z.load()))).max().orElse(0);
      faults.add(
          fault(
              GaugeFaultFinding.DROPPED_OUT,
              off.get(0).row(),
              off.get(off.size() - 1).row(),
              String.format(
                  Locale.ROOT,
                  "reads exactly nought in %d %s where its line says up to %.2g (SI)",
                  off.size(),
                  off.size() == 1 ? "row" : "rows",
                  largest)));
      return true;
    }

    /** Readings off the line, before and after and at their own load. */
    void excursions(List<GaugeFault> faults) {
      Map<Double, List<ColumnWatch.Excursion>> byValue = new LinkedHashMap<>();
      for (ColumnWatch.Excursion found : watch.excursions()) {
        double own = found.value() - line.at(found.load());
        double before =
            found.value() - found.before() - line.slope() * (found.load() - found.beforeLoad());
        double after =
            found.value() - found.after() - line.slope() * (found.load() - found.afterLoad());
        double least =
            Math.min(Math.abs(own), Math.min(Math.abs(before), Math.abs(after)));
        // a reading held back at the end of its range lies below the line, yet above the one before
        boolean leaves = (found.value() - found.before()) * own > 0;
        if (least > far && leaves && own * before > 0 && own * after > 0) {
          byValue.computeIfAbsent(found.value(), key -> new ArrayList<>()).add(found);
        }
      }
      byValue.forEach((value, list) -> excursion(value, list, faults));
    }

    private void excursion(
        double value, List<ColumnWatch.Excursion> list, List<GaugeFault> faults) {
      ColumnWatch.Excursion first = list.get(0);
      ColumnWatch.Excursion last = list.get(list.size() - 1);
      boolean repeated = list.size() > 1 || first.lastRow() > first.firstRow();
      faults.add(
          fault(
              repeated ? GaugeFaultFinding.DROPPED_OUT : GaugeFaultFinding.SPIKE,
              first.firstRow(),
              last.lastRow(),
              (repeated ? "drops to " : "reads ")
                  + String.format(
                      Locale.ROOT,
                      "%.4g (SI), %.2g off its line",
                      value,
                      Math.abs(value - line.at(first.load())))
                  + (repeated
                      ? " and comes back, " + list.size() + (list.size() == 1 ? " time" : " times")
                      : " and off the readings before and after")));
    }

    private GaugeFault fault(GaugeFaultFinding kind, int from, int to, String text) {
      return new GaugeFault(
          kind, watch.rows(from, to), record.run().name(), slope.gauge(), text,
          RunVerdict.DOUBTFUL);
    }
  }
}
