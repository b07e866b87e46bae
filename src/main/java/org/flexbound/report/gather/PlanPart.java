package org.flexbound.report.gather;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.reduce.PlannedFlexibility;
import org.flexbound.report.results.Plan;
import org.flexbound.report.results.PlannedCoefficient;
import org.flexbound.report.results.PlannedLoad;
import org.flexbound.testlog.TestLog;

/** A planned test. */
final class PlanPart {
  private final TestLog log;
  private final PlannedFlexibility planned;

  PlanPart(TestLog log, PlannedFlexibility planned) {
    this.log = log;
    this.planned = planned;
  }

  Plan plan() {
    MeasuredFlexibility flexibility = planned.flexibility();
    List<PlannedLoad> loads = new ArrayList<>();
    for (int l = 0; l < planned.loads().size(); l++) {
      org.flexbound.reduce.PlannedLoad load = planned.loads().get(l);
      loads.add(
          new PlannedLoad(
              flexibility.configuration(),
              load.load(),
              load.largest(),
              load.runs(),
              load.repeatability(),
              load.basis(),
              Values.loadUnit(log.loads().get(l))));
    }
    List<PlannedCoefficient> coefficients = new ArrayList<>();
    for (Coefficient c : flexibility.coefficients()) {
      coefficients.add(
          new PlannedCoefficient(
              flexibility.configuration(),
              log.gauges().get(c.gauge()).name(),
              log.loads().get(c.load()).name(),
              c.value(),
              c.standardUncertainty(),
              c.value() * planned.loads().get(c.load()).largest(),
              Values.coefficientUnit(log.gauges().get(c.gauge()), log.loads().get(c.load()))));
    }
    return new Plan(loads, coefficients);
  }

  static Plan joined(Plan first, Plan second) {
    List<PlannedLoad> loads = new ArrayList<>(first.loads());
    loads.addAll(second.loads());
    List<PlannedCoefficient> coefficients = new ArrayList<>(first.coefficients());
    coefficients.addAll(second.coefficients());
    return new Plan(loads, coefficients);
  }
}
