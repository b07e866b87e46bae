package org.flexbound.report.gather;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.flexbound.acceptance.ChangeReport;
import org.flexbound.acceptance.Decision;
import org.flexbound.finding.Finding;
import org.flexbound.frame.FrameModel;
import org.flexbound.reduce.PlannedFlexibility;
import org.flexbound.reduce.Reduction;
import org.flexbound.report.Program;
import org.flexbound.report.results.Absolute;
import org.flexbound.report.results.Coefficient;
import org.flexbound.report.results.Comparison;
import org.flexbound.report.results.Configuration;
import org.flexbound.report.results.Contribution;
import org.flexbound.report.results.Covariance;
import org.flexbound.report.results.Curve;
import org.flexbound.report.results.Energy;
import org.flexbound.report.results.Exclusion;
import org.flexbound.report.results.FixtureShare;
import org.flexbound.report.results.Gauge;
import org.flexbound.report.results.Input;
import org.flexbound.report.results.Instrument;
import org.flexbound.report.results.JointTest;
import org.flexbound.report.results.Limit;
import org.flexbound.report.results.Load;
import org.flexbound.report.results.MatrixCheck;
import org.flexbound.report.results.OperatorRow;
import org.flexbound.report.results.Option;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.Plan;
import org.flexbound.report.results.Recheck;
import org.flexbound.report.results.Reciprocity;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.Run;
import org.flexbound.report.results.Test;
import org.flexbound.report.results.Validation;
import org.flexbound.testlog.InputFile;
import org.flexbound.testlog.TestLog;
import org.flexbound.update.UpdateResult;

/** Collects what a command found, piece by piece, and puts it together as results. */
public final class Gathering {
  private final String command;
  private final List<Input> inputs = new ArrayList<>();
  private final List<Finding> findings = new ArrayList<>();
  private final List<Configuration> configurations = new ArrayList<>();
  private final List<Instrument> instruments = new ArrayList<>();
  private final List<Load> loads = new ArrayList<>();
  private final List<Gauge> gauges = new ArrayList<>();
  private final List<Option> options = new ArrayList<>();
  private final List<Run> runs = new ArrayList<>();
  private final List<Exclusion> excluded = new ArrayList<>();
  private final List<Coefficient> coefficients = new ArrayList<>();
  private final List<Covariance> covariance = new ArrayList<>();
  private final List<Absolute> absolute = new ArrayList<>();
  private final List<OperatorRow> baseMotion = new ArrayList<>();
  private final List<Reciprocity> reciprocity = new ArrayList<>();
  private final List<JointTest> jointTests = new ArrayList<>();
  private final List<MatrixCheck> matrixChecks = new ArrayList<>();
  private final List<Limit> limits = new ArrayList<>();
  private Optional<Recheck> recheck = Optional.empty();
  private final List<FixtureShare> fixture = new ArrayList<>();
  private final List<Energy> energy = new ArrayList<>();
  private final List<Curve> curves = new ArrayList<>();
  private final Map<String, String> units = new LinkedHashMap<>();
  private String title = "";
  private Optional<FrameModel> model = Optional.empty();
  private String modelFile = "";
  private Optional<org.flexbound.compare.Comparison> comparison = Optional.empty();
  private Optional<UpdateResult> update = Optional.empty();
  private Optional<Plan> plan = Optional.empty();

  /**
   * Begins with nothing.
   *
   * @param command the command that asks
   */
  public Gathering(String command) {
    this.command = command;
  }

  /**
   * A title that takes the place of the log's.
   *
   * @param text the title, or empty
   */
  public void title(String text) {
    title = text;
  }

  /**
   * A file that was read.
   *
   * @param input the file with its checksum
   */
  public void input(InputFile input) {
    Input entry = new Input(input.file(), input.sha256());
    if (!inputs.contains(entry)) {
      inputs.add(entry);
    }
  }

  /**
   * Findings.
   *
   * @param some findings in their order; those that are there already are passed over
   */
  public void findings(List<Finding> some) {
    for (Finding finding : some) {
      if (!findings.contains(finding)) {
        findings.add(finding);
      }
    }
  }

  /**
   * The frame model, for places and the drawing.
   *
   * @param frame the nominal model
   * @param file its file
   */
  public void model(FrameModel frame, String file) {
    model = Optional.of(frame);
    modelFile = file;
  }

  /**
   * One configuration with its log and reduction; the model, if any, comes first.
   *
   * @param log the log
   * @param file the log's file
   * @param reduction what came of it
   * @param changes how the configuration differs from the model, one sentence each
   */
  public void configuration(TestLog log, String file, Reduction reduction, List<String> changes) {
    setup(log, file, reduction.flexibility().configuration(), changes);
    ReductionPart part = new ReductionPart(reduction, log);
    runs.addAll(part.runs());
    excluded.addAll(part.excluded());
    coefficients.addAll(part.coefficients());
    covariance.add(part.covariance());
    absolute.addAll(part.absolute());
    baseMotion.addAll(part.baseMotion());
    reciprocity.addAll(part.reciprocity());
    jointTests.addAll(part.jointTests());
    matrixChecks.add(MatrixPart.of(part.configuration(), reduction.matrix()));
    units.putAll(part.units());
    CurvePart curvePart = new CurvePart(reduction, log);
    curves.addAll(curvePart.curves());
    energy.addAll(curvePart.energy());
  }

  private void setup(TestLog log, String file, String name, List<String> changes) {
    SetupPart setup = new SetupPart(model, name);
    configurations.add(new Configuration(name, file, SetupPart.test(log.information()), changes));
    instruments.addAll(setup.instruments(log));
    loads.addAll(setup.loads(log));
    gauges.addAll(setup.gauges(log));
    for (Option option : SetupPart.options(log.options())) {
      if (!options.contains(option)) {
        options.add(option);
      }
    }
  }

  /**
   * One configuration whose test is only planned; the model, if any, comes first.
   *
   * @param log the log, with or without readings
   * @param file the log's file
   * @param planned what the test would measure
   * @param changes how the configuration differs from the model, one sentence each
   */
  public void planned(
      TestLog log, String file, PlannedFlexibility planned, List<String> changes) {
    setup(log, file, planned.flexibility().configuration(), changes);
    PlanPart part = new PlanPart(log, planned);
    plan =
        Optional.of(
            plan.map(before -> PlanPart.joined(before, part.plan())).orElseGet(part::plan));
  }

  /**
   * Measured against computed.
   *
   * @param result the comparison
   */
  public void comparison(org.flexbound.compare.Comparison result) {
    comparison = Optional.of(result);
  }

  /**
   * The update.
   *
   * @param result the update
   */
  public void update(UpdateResult result) {
    update = Optional.of(result);
  }

  /**
   * Decisions on acceptance limits, and how much of the motions is that of the fixture.
   *
   * @param decisions the decisions
   * @param shares the fixture's shares
   */
  public void acceptance(
      List<Decision> decisions, List<org.flexbound.acceptance.FixtureShare> shares) {
    decisions.forEach(decision -> limits.add(LimitPart.limit(decision)));
    for (org.flexbound.acceptance.FixtureShare share : shares) {
      String key = ComparisonPart.key(share.configuration(), share.gauge(), share.load());
      fixture.add(LimitPart.fixture(share, units.getOrDefault(key, "m/N")));
    }
  }

  /**
   * This test against an earlier one.
   *
   * @param report how it differs
   * @param title the title of the earlier test
   */
  public void recheck(ChangeReport report, String title) {
    recheck = Optional.of(HistoryPart.recheck(report, title));
  }

  /**
   * Everything together.
   *
   * @return the results
   */
  public Results results() {
    Test test =
        configurations.isEmpty()
            ? new Test("", "", "", "", "", "", "", "")
            : configurations.get(0).test();
    ComparisonPart part = new ComparisonPart(units, update);
    String first = configurations.isEmpty() ? "" : configurations.get(0).name();
    return new Results(
        Results.FORMAT,
        Program.NAME + " " + Program.VERSION,
        command,
        title.isEmpty() ? test.title() : title,
        test,
        configurations,
        inputs,
        instruments,
        loads,
        gauges,
        options,
        noted(),
        runs,
        excluded,
        coefficients,
        covariance,
        absolute,
        baseMotion,
        reciprocity,
        jointTests,
        matrixChecks,
        model.map(m -> StructurePart.of(m, modelFile)),
        comparison.map(part::comparison).orElse(List.<Comparison>of()),
        comparison.map(ComparisonPart::tests).orElse(List.<JointTest>of()),
        comparison.map(part::contributions).orElse(List.<Contribution>of()),
        update.map(UpdatePart::parameters).orElse(List.<Parameter>of()),
        update.map(UpdatePart::update),
        update
            .map(
                u ->
                    UpdatePart.validation(
                        u,
                        (gauge, load) ->
                            units.getOrDefault(ComparisonPart.key(first, gauge, load), "m/N")))
            .orElse(List.<Validation>of()),
        plan,
        limits,
        fixture,
        recheck,
        energy,
        curves);
  }

  private List<org.flexbound.report.results.Finding> noted() {
    return findings.stream()
        .sorted(Comparator.comparing(Finding::severity))
        .map(
            f ->
                new org.flexbound.report.results.Finding(
                    f.severity().name().toLowerCase(Locale.ROOT),
                    f.code(),
                    f.message(),
                    f.where().toString(),
                    f.kind().remedy()))
        .toList();
  }
}
