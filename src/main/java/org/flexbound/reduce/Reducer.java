package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.flexibility.MatrixChecks;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Instrument;
import org.flexbound.setup.Load;
import org.flexbound.testlog.Run;
import org.flexbound.testlog.TestLog;

/** Reduces a test log to flexibility coefficients. */
public final class Reducer {
  private Reducer() {}

  /**
   * Reduces.
   *
   * @param problem the log, the configuration's name and where stations are
   * @return the reduction, with everything found; an error where loads cannot be told apart or
   *     nothing was measured
   */
  public static Outcome<Reduction> reduce(ReductionProblem problem) {
    TestLog log = problem.log();
    Findings findings = new Findings();
    if (!log.coefficients().isEmpty()) {
      Reduction stated = new StatedReduction(problem, findings).reduce();
      return Outcome.of(stated, findings.list());
    }
    Map<String, Load> loads = new LinkedHashMap<>();
    log.loads().forEach(load -> loads.put(load.name(), load));
    Map<String, Double> resolutions = new HashMap<>();
    for (Instrument instrument : log.instruments()) {
      instrument.resolution().ifPresent(value -> resolutions.put(instrument.name(), value));
    }
    List<RunResult> runs = new ArrayList<>();
    List<RunReducer> reducers = new ArrayList<>();
    List<RunSlope> slopes = new ArrayList<>();
    List<Exclusion> excluded = new ArrayList<>();
    for (Run run : log.runs()) {
      if (!run.use()) {
        excluded.add(
            new Exclusion(
                run.name(),
                "the run",
                run.where(),
                run.remark().isEmpty() ? "sheet Runs says no" : run.remark(),
                true,
                0));
        continue;
      }
      RunReducer reducer =
          new RunReducer(run, loads, log.options(), resolutions, findings);
      reducer.reduce();
      reducers.add(reducer);
      slopes.addAll(reducer.slopes());
      excluded.addAll(reducer.excluded());
    }
    List<RunRecord> records = reducers.stream().map(RunReducer::record).toList();
    GaugeNoise noise = new GaugeNoise(slopes, resolutions);
    GaugeFaults faults =
        new GaugeFaults(log, records, noise);
    faults.tell(findings);
    new RunsCompared(records, noise, findings).tell();
    for (RunReducer reducer : reducers) {
      runs.add(reducer.judge(noise, faults.of(reducer.record().run().name())));
    }
    noteUnmeasured(log, slopes, findings);
    if (slopes.stream().noneMatch(RunSlope::isFitted)) {
      findings.add(
          ReduceFinding.NOTHING_MEASURED,
          log.runs().isEmpty()
              ? org.flexbound.finding.Where.nowhere()
              : log.runs().get(0).where(),
          "no slope could be fitted in any run");
      return Outcome.none(findings.list());
    }
    RunPooling pooling = new RunPooling(log, slopes, findings);
    FlexibilityBuilder builder = new FlexibilityBuilder(problem, findings);
    MeasuredFlexibility flexibility = builder.build(pooling);
    MatrixChecks checks =
        MatrixChecks.of(
            flexibility,
            problem.places()::of,
            log.options().qualityLimits().reciprocityZ());
    new MatrixJudgement(log.gauges(), findings).judge(checks);
    return Outcome.of(
        new Reduction(
            flexibility,
            runs,
            slopes,
            pooling.scatter(),
            pooling.stated(),
            pooling.withoutSpread(),
            builder.calibrationIncluded(),
            pooling.repeatability(),
            builder.baseShares(),
            checks,
            excluded,
            findings.list()),
        findings.list());
  }

  private static void noteUnmeasured(TestLog log, List<RunSlope> slopes, Findings findings) {
    for (Load load : log.loads()) {
      if (slopes.stream().noneMatch(s -> s.isFitted() && s.load().equals(load.name()))) {
        findings.add(
            ReduceFinding.NOT_MEASURED,
            load.where(),
            "no run measured the load '" + load.name() + "'");
      }
    }
    for (Gauge gauge : log.gauges()) {
      if (slopes.stream().noneMatch(s -> s.isFitted() && s.gauge().equals(gauge.name()))) {
        findings.add(
            ReduceFinding.NOT_MEASURED,
            gauge.where(),
            "no run measured the gauge '" + gauge.name() + "'");
      }
    }
  }
}
