package org.flexbound.app;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.acceptance.ChangeModel;
import org.flexbound.acceptance.ChangeReport;
import org.flexbound.acceptance.Decision;
import org.flexbound.acceptance.FixtureShare;
import org.flexbound.acceptance.KeptTest;
import org.flexbound.acceptance.LimitCheck;
import org.flexbound.acceptance.Recheck;
import org.flexbound.compare.Comparison;
import org.flexbound.compare.ConfiguredFrame;
import org.flexbound.compare.FlexibilityComparator;
import org.flexbound.compare.OutsideModel;
import org.flexbound.document.OutputFolder;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameWriter;
import org.flexbound.reduce.Places;
import org.flexbound.reduce.PlannedFlexibility;
import org.flexbound.reduce.Reducer;
import org.flexbound.reduce.Reduction;
import org.flexbound.reduce.ReductionProblem;
import org.flexbound.reduce.TestPlanner;
import org.flexbound.report.ReportFiles;
import org.flexbound.report.gather.Gathering;
import org.flexbound.report.gather.HistoryPart;
import org.flexbound.report.results.Results;
import org.flexbound.study.Study;
import org.flexbound.testlog.TestLog;
import org.flexbound.testlog.LogFile;
import org.flexbound.study.Parameter;
import org.flexbound.update.OutsideUpdate;
import org.flexbound.update.StudyUpdate;
import org.flexbound.update.UpdateSettings;
import org.flexbound.update.UpdateResult;

/** The steps of the commands that read a test. */
final class Work {
  private final Terminal terminal;
  private final OutputOptions output;

  Work(Terminal terminal, OutputOptions output) {
    this.terminal = terminal;
    this.output = output;
  }

  ExitCode reduce(Path file) {
    return finish(reduced(file), new OutputFolder(output.folder), ExitCode.DONE);
  }

  /** Reads a log and reduces it; nothing is written or printed. */
  Results reduced(Path file) {
    return reduced("reduce", file).gathering().results();
  }

  /** A log, read and reduced. */
  private ReducedTest reduced(String command, Path file) {
    String name = String.valueOf(file.getFileName());
    Findings findings = new Findings();
    Outcome<TestLog> read =
        terminal.withProgress(progress -> LogFile.read(file, name, progress));
    findings.addAll(read.findings());
    findings.refuseIfErrors();
    TestLog log = read.orRefuse();
    Outcome<Reduction> reduced =
        Reducer.reduce(new ReductionProblem(Study.ONLY_CONFIGURATION, log, Places.STATED));
    findings.addAll(reduced.findings());
    findings.refuseIfErrors();
    Reduction reduction = reduced.value().orElseThrow(() -> new Refusal(findings.list()));
    Gathering gathering = new Gathering(command);
    log.inputs().forEach(gathering::input);
    gathering.configuration(log, name, reduction, List.of());
    gathering.findings(findings.list());
    return new ReducedTest(
        gathering,
        List.of(new ReducedTest.Reduced(log, reduction, Places.STATED)),
        Optional.empty());
  }

  /** Writes the outputs of results that bring nothing else. */
  List<Path> write(Results results) {
    OutputFolder folder = new OutputFolder(output.folder);
    ReportFiles.add(folder, results, output.units);
    return folder.write();
  }

  /** Writes and prints. */
  void show(Results results) {
    finish(results, new OutputFolder(output.folder), ExitCode.DONE);
  }

  ExitCode compare(Path file) {
    ReducedTest prepared = prepare("compare", read(file));
    return finish(
        prepared.gathering().results(), new OutputFolder(output.folder), ExitCode.DONE);
  }

  private StudyFiles read(Path file) {
    return terminal.withProgress(progress -> StudyFiles.read(file, progress));
  }

  ExitCode update(Path file) {
    StudyFiles files = read(file);
    ReducedTest prepared = prepare("update", files);
    Outcome<UpdateResult> updated =
        files.tables().isEmpty()
            ? StudyUpdate.run(files.study(), files.model(), prepared.measured())
            : OutsideUpdate.run(
                files.study(), files.tables(), prepared.measured(), UpdateSettings.FULL);
    prepared.gathering().findings(updated.findings());
    if (updated.hasErrors() || updated.value().isEmpty()) {
      throw new Refusal(updated.findings());
    }
    UpdateResult result = updated.value().get();
    prepared.gathering().update(result);
    OutputFolder folder = new OutputFolder(output.folder);
    if (files.tables().isEmpty()) {
      FrameModel model = StudyUpdate.updatedModel(files.model(), result);
      folder.add("updated-model.json", FrameWriter.write(model).getBytes(StandardCharsets.UTF_8));
    }
    return finish(
        prepared.gathering().results(),
        folder,
        result.undecided() ? ExitCode.UNDECIDED : ExitCode.DONE);
  }

  /** Says which status each parameter would get, before any reading exists. */
  ExitCode beforeTest(Path file) {
    StudyFiles files =
        terminal.withProgress(progress -> StudyFiles.read(file, progress, true));
    Findings findings = new Findings();
    findings.addAll(files.findings());
    Gathering gathering = new Gathering("update --before-test");
    gathering.title(files.study().title());
    files.inputs().forEach(gathering::input);
    files.frame().ifPresent(model -> gathering.model(model, files.study().model().orElse("")));
    List<MeasuredFlexibility> expected = new ArrayList<>();
    for (StudyFiles.Tested tested : files.tested()) {
      TestLog log = tested.log();
      Outcome<PlannedFlexibility> planned =
          computed(files, tested)
              .then(
                  computed ->
                      TestPlanner.plan(
                          new ReductionProblem(tested.configuration(), log, tested.places()),
                          computed));
      findings.addAll(planned.findings());
      planned
          .value()
          .ifPresent(
              plan -> {
                expected.add(plan.flexibility());
                gathering.planned(log, tested.file(), plan, tested.changes());
              });
    }
    findings.refuseIfErrors();
    Outcome<UpdateResult> forecast =
        files.tables().isEmpty()
            ? StudyUpdate.beforeTest(files.study(), files.model(), expected)
            : OutsideUpdate.run(
                files.study(), files.tables(), expected, UpdateSettings.ESTIMATES);
    findings.addAll(forecast.findings());
    findings.refuseIfErrors();
    gathering.findings(findings.list());
    UpdateResult result = forecast.value().orElseThrow(() -> new Refusal(findings.list()));
    gathering.update(result);
    return finish(
        gathering.results(),
        new OutputFolder(output.folder),
        result.convergence().converged() ? ExitCode.DONE : ExitCode.UNDECIDED);
  }

  /** The computed coefficients of a planned test, gauges × loads. */
  private static Outcome<double[][]> computed(StudyFiles files, StudyFiles.Tested tested) {
    TestLog log = tested.log();
    return files.tables().isEmpty()
        ? ConfiguredFrame.nominal(tested.model(), log.gauges(), log.loads())
        : OutsideModel.matrix(
            files.tables().get(0), tested.configuration(), log.gauges(), log.loads());
  }

  ExitCode check(Path file) {
    ReducedTest test = test("check", file);
    List<Decision> decisions = judge(test);
    OutputFolder folder = new OutputFolder(output.folder);
    Results results = test.gathering().results();
    ReportFiles.addCertificate(folder, results);
    return finish(results, folder, code(decisions));
  }

  ExitCode recheck(Path baseline, Path file) {
    Results kept = HistoryWork.baseline(baseline);
    KeptTest before = HistoryPart.kept(String.valueOf(baseline.getFileName()), kept);
    ReducedTest test;
    Optional<ChangeModel> model = Optional.empty();
    if (StudyFiles.isStudy(file)) {
      StudyFiles files = read(file);
      test = prepare("recheck", files);
      // a change is explained by the frame solver; tables of a model held elsewhere cannot be asked for it
      if (!files.study().parameters().isEmpty() && files.tables().isEmpty()) {
        model =
            Optional.of(
                new ChangeModel(
                    StudyUpdate.problem(files.study(), files.model(), test.measured()).orRefuse(),
                    before));
      }
    } else {
      test = reduced("recheck", file);
    }
    KeptTest now = HistoryPart.kept("this test", test.gathering().results());
    Outcome<ChangeReport> compared = Recheck.compare(before, now, model);
    test.gathering().findings(compared.findings());
    test.gathering().recheck(compared.orRefuse(), kept.title());
    boolean limited = test.configurations().stream().anyMatch(c -> !c.log().limits().isEmpty());
    List<Decision> decisions = limited ? judge(test) : List.of();
    OutputFolder folder = new OutputFolder(output.folder);
    return finish(test.gathering().results(), folder, code(decisions));
  }

  /** A log or a study, read, reduced and, where there is a model, compared. */
  private ReducedTest test(String command, Path file) {
    return StudyFiles.isStudy(file)
        ? prepare(command, read(file))
        : reduced(command, file);
  }

  /** Judges a test against its limits. */
  private static List<Decision> judge(ReducedTest test) {
    Outcome<List<Decision>> judged = LimitCheck.check(test.checked());
    List<Decision> decisions = judged.orRefuse();
    Outcome<List<FixtureShare>> fixture =
        LimitCheck.fixture(test.checked(), test.largestShare());
    test.gathering().findings(judged.findings());
    test.gathering().findings(fixture.findings());
    test.gathering().acceptance(decisions, fixture.orRefuse());
    return decisions;
  }

  private static ExitCode code(List<Decision> decisions) {
    return switch (Decision.worst(decisions)) {
      case PASS -> ExitCode.DONE;
      case FAIL -> ExitCode.LIMIT_FAILED;
      case UNDECIDED -> ExitCode.UNDECIDED;
    };
  }

  /** What the commands on a study come to before they part. */
  private static ReducedTest prepare(String command, StudyFiles files) {
    Findings findings = new Findings();
    findings.addAll(files.findings());
    Gathering gathering = new Gathering(command);
    gathering.title(files.study().title());
    files.inputs().forEach(gathering::input);
    files.frame().ifPresent(model -> gathering.model(model, files.study().model().orElse("")));
    List<ReducedTest.Reduced> configurations = new ArrayList<>();
    for (StudyFiles.Tested tested : files.tested()) {
      Places places = tested.places();
      Outcome<Reduction> reduced =
          Reducer.reduce(new ReductionProblem(tested.configuration(), tested.log(), places));
      findings.addAll(reduced.findings());
      reduced
          .value()
          .ifPresent(
              reduction -> {
                configurations.add(
                    new ReducedTest.Reduced(tested.log(), reduction, places));
                gathering.configuration(
                    tested.log(), tested.file(), reduction, tested.changes());
              });
    }
    findings.refuseIfErrors();
    ReducedTest test = new ReducedTest(gathering, configurations, Optional.empty());
    Outcome<Comparison> compared =
        files.tables().isEmpty()
            ? FlexibilityComparator.compare(
                files.study(), files.model(), test.measured(), files.modes())
            : FlexibilityComparator.compareOutside(
                files.tables().get(0),
                files.study().parameters().stream().map(Parameter::name).toList(),
                test.measured());
    findings.addAll(compared.findings());
    findings.refuseIfErrors();
    compared.value().ifPresent(gathering::comparison);
    gathering.findings(findings.list());
    return new ReducedTest(gathering, configurations, compared.value());
  }

  /** Writes, prints, and says how the command ended. */
  private ExitCode finish(Results results, OutputFolder folder, ExitCode code) {
    ReportFiles.add(folder, results, output.units);
    List<Path> written = folder.write();
    Summary summary = new Summary(terminal, results, output.units);
    summary.print();
    summary.written(written);
    return code;
  }
}
