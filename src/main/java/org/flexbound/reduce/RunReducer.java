package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.reduce.LoadStep.Fate;
import org.flexbound.setup.BeddingIn;
import org.flexbound.setup.FitRange;
import org.flexbound.setup.Load;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.SlopeFit;
import org.flexbound.statistics.GroupedLine;
import org.flexbound.statistics.Regression;
import org.flexbound.testlog.Channel;
import org.flexbound.testlog.Run;

/** Reduces one run: steps, branches, a slope for every gauge and varied load. */
final class RunReducer {
  /** Loads whose correlation leaves less than this unexplained moved in proportion. */
  private static final double PROPORTIONAL = 1e-4;

  private final Run run;
  private final Map<String, Load> loads;
  private final ReductionOptions options;
  private final Map<String, Double> resolutions;
  private final Findings findings;
  private final List<StepGrouping.RawStep> steps;
  private final List<Exclusion> excluded = new ArrayList<>();
  private final List<RunSlope> slopes = new ArrayList<>();
  private final List<Integer> varied = new ArrayList<>();
  private final RunWatch watch;
  private double peak;
  private int cycles;

  RunReducer(
      Run run,
      Map<String, Load> loads,
      ReductionOptions options,
      Map<String, Double> resolutions,
      Findings findings) {
    this.run = run;
    this.loads = loads;
    this.options = options;
    this.resolutions = resolutions;
    this.findings = findings;
    boolean[] moment = moments();
    StepGrouping grouping = StepGrouping.of(run, moment);
    this.excluded.addAll(grouping.excluded());
    this.watch = grouping.watch();
    this.steps = held(grouping.steps(), moment);
  }

  /** Leaves out the ramps between held loads, and says so. */
  private List<StepGrouping.RawStep> held(List<StepGrouping.RawStep> groups, boolean[] moment) {
    HeldSteps held = HeldSteps.of(groups, varies(groups, moment));
    if (!held.ramps().isEmpty()) {
      int rows = held.ramps().stream().mapToInt(ramp -> ramp.readings).sum();
      Where first = held.ramps().get(0).whereLoad;
      findings.add(
          ReduceFinding.RAMPS_LEFT_OUT,
          first,
          "run '"
              + run.name()
              + "': "
              + rows
              + " readings, the first of them here, were taken while the load went from one held value to the next; they are left out");
      excluded.add(new Exclusion(run.name(), "rows between held loads", first, "the load was on its way", false, rows));
    }
    if (!held.everHeld()) {
      findings.add(
          ReduceFinding.NEVER_HELD,
          run.where(),
          "the load stood still nowhere in run '"
              + run.name()
              + "'; its readings were gathered into "
              + groups.size()
              + " steps of about the same load");
    }
    return held.held();
  }

  private static boolean[] varies(List<StepGrouping.RawStep> groups, boolean[] moment) {
    double[] low = new double[moment.length];
    double[] high = new double[moment.length];
    for (int l = 0; l < moment.length; l++) {
      int load = l;
      low[l] = groups.stream().mapToDouble(group -> group.load[load]).min().orElse(0);
      high[l] = groups.stream().mapToDouble(group -> group.load[load]).max().orElse(0);
    }
    double[] shares = StepGrouping.shares(low, high, moment);
    boolean[] varies = new boolean[moment.length];
    for (int l = 0; l < moment.length; l++) {
      varies[l] = shares[l] >= StepGrouping.VARIED;
    }
    return varies;
  }

  List<RunSlope> slopes() {
    return List.copyOf(slopes);
  }

  List<Exclusion> excluded() {
    return List.copyOf(excluded);
  }

  /** What was kept of the run, for the judgement of its readings. */
  RunRecord record() {
    return new RunRecord(run, watch, slopes);
  }

  /** Fits the slopes. */
  void reduce() {
    varied.addAll(varied());
    for (int l : varied) {
      for (StepGrouping.RawStep step : steps) {
        peak = Math.max(peak, Math.abs(step.load[l]));
      }
    }
    if (varied.isEmpty()) {
      findings.add(ReduceFinding.NO_LOAD, run.where(), "no load varied in run '" + run.name() + "'");
    } else if (!proportional(varied)) {
      for (int g = 0; g < run.gauges().size(); g++) {
        if (varied.size() == 1) {
          slopes.add(single(g, varied.get(0)));
        } else {
          slopes.addAll(several(g, varied));
        }
      }
    }
  }

  /** Judges the run, once all runs of the test are reduced. */
  RunResult judge(GaugeNoise noise, List<GaugeFault> faults) {
    RunJudgement judgement =
        new RunJudgement(options.qualityLimits(), noise, faults, findings);
    return judgement.judge(
        run,
        varied.stream().map(l -> run.loads().get(l).name()).toList(),
        peak,
        steps.size(),
        cycles,
        slopes);
  }

  private double[] column(int load) {
    return steps.stream().mapToDouble(step -> step.load[load]).toArray();
  }

  private List<Integer> varied() {
    boolean[] varies = varies(steps, moments());
    return java.util.stream.IntStream.range(0, varies.length).filter(l -> varies[l]).boxed().toList();
  }

  private boolean[] moments() {
    boolean[] moment = new boolean[run.loads().size()];
    for (int l = 0; l < moment.length; l++) {
      Load known = loads.get(run.loads().get(l).name());
      moment[l] = known != null && known.isMoment();
    }
    return moment;
  }

  /** Two loads that moved in proportion cannot be told apart. */
  private boolean proportional(List<Integer> varied) {
    boolean any = false;
    for (int i = 0; i < varied.size(); i++) {
      for (int j = i + 1; j < varied.size(); j++) {
        double[] a = column(varied.get(i));
        double[] b = column(varied.get(j));
        if (unexplained(a, b) < PROPORTIONAL) {
          any = true;
          findings.add(
              ReduceFinding.PROPORTIONAL,
              run.where(),
              "'"
                  + run.loads().get(varied.get(i)).name()
                  + "' and '"
                  + run.loads().get(varied.get(j)).name()
                  + "' moved in fixed proportion in run '"
                  + run.name()
                  + "': only their sum's effect can be found");
        }
      }
    }
    return any;
  }

  /** 1 − r², r the correlation. */
  private static double unexplained(double[] a, double[] b) {
    double meanA = java.util.Arrays.stream(a).average().orElse(0);
    double meanB = java.util.Arrays.stream(b).average().orElse(0);
    double aa = 0;
    double bb = 0;
    double ab = 0;
    for (int k = 0; k < a.length; k++) {
      aa += (a[k] - meanA) * (a[k] - meanA);
      bb += (b[k] - meanB) * (b[k] - meanB);
      ab += (a[k] - meanA) * (b[k] - meanB);
    }
    return 1 - ab * ab / (aa * bb);
  }

  /** The steps of a gauge against one load, each with its fate. */
  private List<LoadStep> fated(int gauge, double[] load, Branches branches, FitRange range) {
    double peak = java.util.Arrays.stream(load).map(Math::abs).max().orElse(0);
    boolean leaveOutFirst =
        options.beddingIn() == BeddingIn.LEAVE_OUT_WHERE_OTHERS && branches.cycles() > 1;
    List<LoadStep> list = new ArrayList<>();
    for (int k = 0; k < steps.size(); k++) {
      StepGrouping.RawStep raw = steps.get(k);
      double magnitude = Math.abs(load[k]);
      Fate fate = Fate.FITTED;
      if (raw.counts[gauge] == 0) {
        fate = Fate.NOT_READ;
      } else if (leaveOutFirst && branches.cycle(k) == 1) {
        fate = Fate.BEDDING_IN;
      } else if (magnitude < range.lower() * peak * (1 - 1e-9)
          || magnitude > range.upper() * peak * (1 + 1e-9)) {
        fate = Fate.OUTSIDE_RANGE;
      }
      Where where = raw.counts[gauge] == 0 ? run.where() : raw.where[gauge];
      list.add(
          new LoadStep(
              load[k],
              raw.motion(gauge),
              raw.readings,
              raw.scatter(gauge),
              branches.rising(k),
              branches.cycle(k),
              branches.branch(k),
              fate,
              where));
    }
    return list;
  }

  private RunSlope single(int gauge, int load) {
    Channel gaugeChannel = run.gauges().get(gauge);
    double[] column = column(load);
    Branches branches = Branches.of(column);
    cycles = Math.max(cycles, branches.cycles());
    FitRange range = options.fitRange(gaugeChannel.name());
    List<LoadStep> list = fated(gauge, column, branches, range);
    double peak = java.util.Arrays.stream(column).map(Math::abs).max().orElse(0);
    noteExcluded(gaugeChannel, list);
    return fitted(gauge, run.loads().get(load), load, list, range, peak);
  }

  private void noteExcluded(Channel gauge, List<LoadStep> list) {
    Map<Fate, List<LoadStep>> byFate = new LinkedHashMap<>();
    for (LoadStep step : list) {
      if (step.fate() != Fate.FITTED) {
        byFate.computeIfAbsent(step.fate(), key -> new ArrayList<>()).add(step);
      }
    }
    byFate.forEach(
        (fate, left) ->
            excluded.add(
                new Exclusion(
                    run.name(),
                    left.size() + " steps of " + gauge.name(),
                    left.get(0).where(),
                    fate.words(),
                    fate == Fate.LEFT_OUT,
                    left.stream().mapToInt(LoadStep::readings).sum())));
  }

  private RunSlope fitted(
      int index, Channel load, int loadIndex, List<LoadStep> list, FitRange range, double peak) {
    Channel gauge = run.gauges().get(index);
    List<LoadStep> used = new ArrayList<>();
    List<StepGrouping.RawStep> usedRaw = new ArrayList<>();
    for (int k = 0; k < list.size(); k++) {
      if (list.get(k).fate() == Fate.FITTED) {
        used.add(list.get(k));
        usedRaw.add(steps.get(k));
      }
    }
    double[] x = used.stream().mapToDouble(LoadStep::load).toArray();
    double[] y = used.stream().mapToDouble(LoadStep::motion).toArray();
    int[] branch = used.stream().mapToInt(LoadStep::branch).toArray();
    SlopeFitter.Fit fit =
        new SlopeFitter.Fit(SlopeFit.ORDINARY, Double.NaN, Double.NaN, Map.of());
    Optional<SlopeQuality> quality = Optional.empty();
    double other = 0;
    try {
      GroupedLine line = GroupedLine.fit(x, y, branch);
      double resolution = resolutions.getOrDefault(gauge.instrument().orElse(""), Double.NaN);
      double ofLoad = resolutions.getOrDefault(load.instrument().orElse(""), Double.NaN);
      fit =
          new SlopeFitter(
                  x,
                  y,
                  branch,
                  new HeldScatter(steps, step -> step.readings, step -> step.loadSquares[loadIndex], ofLoad).variances(usedRaw),
                  new HeldScatter(steps, step -> step.counts[index], step -> step.squares[index], resolution).variances(usedRaw),
                  line)
              .fit(options.slopeFit());
      ZeroReadings zeros = new ZeroReadings(list, steps, index);
      ZeroReturn zero = zeros.of(line.slope());
      quality =
          Optional.of(
              QualityFigures.of(zero, used, line, GroupedLine.curvature(x, y, branch), resolution));
      if (zero.kind() != ZeroReturn.Kind.NOT_READ) {
        double without = zeros.withoutDrift();
        double change = Double.isNaN(without) ? 0 : without - line.slope();
        other = Math.abs(change);
        if (zero.kind() == ZeroReturn.Kind.DRIFT) {
          fit = new SlopeFitter.Fit(fit.how(), fit.slope() + change, fit.standardError(), fit.intercepts());
        }
      }
    } catch (Regression.DependentColumns | IllegalArgumentException tooFew) {
      findings.add(
          ReduceFinding.TOO_FEW_STEPS,
          gauge.where(),
          used.size() + " steps of '" + gauge.name() + "' in run '" + run.name()
              + "' lie in the fit range at too few different loads");
    }
    return new RunSlope(
        run.name(),
        gauge.name(),
        load.name(),
        gauge.instrument(),
        load.instrument(),
        list,
        fit.slope(),
        fit.standardError(),
        fit.intercepts(),
        range.lower() * peak,
        range.upper() * peak,
        quality,
        fit.how(),
        other);
  }

  /** Several loads that move independently: one regression, then a slope for each with the others' parts taken out. */
  private List<RunSlope> several(int gauge, List<Integer> varied) {
    Channel gaugeChannel = run.gauges().get(gauge);
    List<double[]> columns = varied.stream().map(this::column).toList();
    double[] share = SeveralLoads.share(columns);
    Branches branches = Branches.of(share);
    cycles = Math.max(cycles, branches.cycles());
    FitRange range = options.fitRange(gaugeChannel.name());
    List<LoadStep> list = fated(gauge, share, branches, range);
    noteExcluded(gaugeChannel, list);
    List<RunSlope> result = new ArrayList<>();
    try {
      SeveralLoads fit = SeveralLoads.fit(columns, list);
      for (int k = 0; k < varied.size(); k++) {
        double peak = java.util.Arrays.stream(columns.get(k)).map(Math::abs).max().orElse(0);
        RunSlope alone = fitted(gauge, run.loads().get(varied.get(k)), varied.get(k), fit.steps(k), range, peak);
        result.add(alone.withStandardError(fit.standardError(k)));
      }
    } catch (Regression.DependentColumns | IllegalArgumentException tooFew) {
      findings.add(
          ReduceFinding.TOO_FEW_STEPS,
          gaugeChannel.where(),
          list.stream().filter(step -> step.fate() == Fate.FITTED).count() + " steps of '" + gaugeChannel.name() + "' in run '" + run.name()
              + "' are too few to tell " + varied.size() + " loads apart");
    }
    return result;
  }
}
