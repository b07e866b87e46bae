package org.flexbound.report.gather;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.flexbound.reduce.LoadStep;
import org.flexbound.reduce.Reduction;
import org.flexbound.reduce.RunSlope;
import org.flexbound.report.results.Curve;
import org.flexbound.report.results.CurvePoint;
import org.flexbound.report.results.Energy;
import org.flexbound.report.results.Line;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.testlog.TestLog;

/** Load-deflection curves, and the energy that runs stored. */
final class CurvePart {
  private final Reduction reduction;
  private final TestLog log;

  CurvePart(Reduction reduction, TestLog log) {
    this.reduction = reduction;
    this.log = log;
  }

  List<Curve> curves() {
    Map<String, Gauge> gauges = new LinkedHashMap<>();
    log.gauges().forEach(g -> gauges.put(g.name(), g));
    Map<String, Load> loads = new LinkedHashMap<>();
    log.loads().forEach(l -> loads.put(l.name(), l));
    List<Curve> result = new ArrayList<>();
    for (RunSlope slope : reduction.slopes()) {
      Gauge gauge = gauges.get(slope.gauge());
      Load load = loads.get(slope.load());
      if (slope.isFitted() && gauge != null && load != null) {
        result.add(curve(slope, gauge, load));
      }
    }
    return result;
  }

  private Curve curve(RunSlope slope, Gauge gauge, Load load) {
    List<CurvePoint> points = new ArrayList<>();
    Map<Integer, LoadStep> branches = new TreeMap<>();
    // Unused branches have no line; their steps are drawn from that of the first branch that has one.
    double fallback =
        slope.intercepts().entrySet().stream()
            .min(Map.Entry.comparingByKey())
            .map(Map.Entry::getValue)
            .orElse(0.0);
    double sign = 1;
    double largest = 0;
    double tare = tare(slope);
    for (LoadStep step : slope.steps()) {
      if (!Double.isFinite(step.motion()) || !Double.isFinite(step.load())) {
        continue;
      }
      branches.putIfAbsent(step.branch(), step);
      double intercept = slope.intercepts().getOrDefault(step.branch(), fallback);
      points.add(
          new CurvePoint(
              step.load(),
              step.motion() - tare,
              step.rising() ? "loading" : "unloading",
              step.cycle(),
              step.fate() == LoadStep.Fate.FITTED,
              step.motion() - intercept - slope.slope() * step.load(),
              step.where().toString()));
      if (Math.abs(step.load()) > largest) {
        largest = Math.abs(step.load());
        sign = Math.signum(step.load());
      }
    }
    List<Line> lines = new ArrayList<>();
    branches.forEach(
        (branch, step) -> {
          Double intercept = slope.intercepts().get(branch);
          if (intercept != null) {
            lines.add(
                new Line(
                    step.rising() ? "loading" : "unloading", step.cycle(), intercept - tare));
          }
        });
    return new Curve(
        reduction.flexibility().configuration(),
        slope.run(),
        slope.gauge(),
        slope.load(),
        Values.loadUnit(load),
        Values.motionUnit(gauge),
        slope.slope(),
        Values.orZero(slope.standardError()),
        lines,
        sign * slope.fitFrom(),
        sign * slope.fitTo(),
        points);
  }

  /** The reading at the first of the steps with the least load: the opening zero, where there is one. */
  private static double tare(RunSlope slope) {
    double least = Double.POSITIVE_INFINITY;
    double largest = 0;
    for (LoadStep step : slope.steps()) {
      if (Double.isFinite(step.motion())) {
        least = Math.min(least, Math.abs(step.load()));
        largest = Math.max(largest, Math.abs(step.load()));
      }
    }
    for (LoadStep step : slope.steps()) {
      if (Double.isFinite(step.motion()) && Math.abs(step.load()) <= least + 0.01 * largest) {
        return step.motion();
      }
    }
    return 0;
  }

  /** Half the load times the motion along it, where a gauge reads it. */
  List<Energy> energy() {
    List<Energy> result = new ArrayList<>();
    for (Load load : log.loads()) {
      Optional<Gauge> along = along(load);
      double most = 0;
      String run = "";
      for (RunSlope slope : reduction.slopes()) {
        if (slope.load().equals(load.name())
            && along.isPresent()
            && slope.gauge().equals(along.get().name())) {
          double tare = tare(slope);
          for (LoadStep step : slope.steps()) {
            double energy = 0.5 * Math.abs(step.load() * (step.motion() - tare));
            if (energy > most) {
              most = energy;
              run = slope.run();
            }
          }
        }
      }
      if (most > 0) {
        result.add(new Energy(reduction.flexibility().configuration(), run, most, true));
      }
    }
    return result;
  }

  /** The gauge that reads at the load's own point along its own line. */
  private Optional<Gauge> along(Load load) {
    if (load.isPattern()) {
      return Optional.empty();
    }
    LoadPoint point = load.points().get(0);
    return log.gauges().stream()
        .filter(g -> g.direction().rotation() == point.direction().rotation())
        .filter(
            g ->
                Math.abs(g.direction().vector().dot(point.direction().vector())) > 0.999
                    && (g.station().equals(point.station())
                        || (g.coordinates().isPresent()
                            && point.coordinates().isPresent()
                            && g.coordinates().get().minus(point.coordinates().get()).norm()
                                < 1e-3)))
        .findFirst();
  }
}
