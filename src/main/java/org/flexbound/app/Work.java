package org.flexbound.app;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
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
    return finish(reduced(file), new OutputFolder(output.folder), false);
  }

  /** Reads a log and reduces it; nothing is written or printed. */
  Results reduced(Path file) {
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
    Gathering gathering = new Gathering("reduce");
    log.inputs().forEach(gathering::input);
    gathering.configuration(
        log, name, reduced.value().orElseThrow(() -> new Refusal(findings.list())), List.of());
    gathering.findings(findings.list());
    return gathering.results();
  }

  /** Writes the outputs of results that bring nothing else. */
  List<Path> write(Results results) {
    OutputFolder folder = new OutputFolder(output.folder);
    ReportFiles.add(folder, results, output.units);
    return folder.write();
  }

  /** Writes and prints. */
  void show(Results results) {
    finish(results, new OutputFolder(output.folder), false);
  }

  ExitCode compare(Path file) {
    StudyFiles files = terminal.withProgress(progress -> StudyFiles.read(file, progress));
    Prepared prepared = prepare("compare", files);
    return finish(prepared.gathering().results(), new OutputFolder(output.folder), false);
  }

  ExitCode update(Path file) {
    StudyFiles files = terminal.withProgress(progress -> StudyFiles.read(file, progress));
    Prepared prepared = prepare("update", files);
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
    return finish(prepared.gathering().results(), folder, result.undecided());
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
        gathering.results(), new OutputFolder(output.folder), !result.convergence().converged());
  }

  /** The computed coefficients of a planned test, gauges × loads. */
  private static Outcome<double[][]> computed(StudyFiles files, StudyFiles.Tested tested) {
    TestLog log = tested.log();
    return files.tables().isEmpty()
        ? ConfiguredFrame.nominal(tested.model(), log.gauges(), log.loads())
        : OutsideModel.matrix(
            files.tables().get(0), tested.configuration(), log.gauges(), log.loads());
  }

  /** What both commands on a study come to before they part. */
  private record Prepared(Gathering gathering, List<MeasuredFlexibility> measured) {}

  private static Prepared prepare(String command, StudyFiles files) {
    Findings findings = new Findings();
    findings.addAll(files.findings());
    Gathering gathering = new Gathering(command);
    gathering.title(files.study().title());
    files.inputs().forEach(gathering::input);
    files.frame().ifPresent(model -> gathering.model(model, files.study().model().orElse("")));
    List<MeasuredFlexibility> measured = new ArrayList<>();
    for (StudyFiles.Tested tested : files.tested()) {
      Outcome<Reduction> reduced =
          Reducer.reduce(
              new ReductionProblem(
                  tested.configuration(), tested.log(), tested.places()));
      findings.addAll(reduced.findings());
      reduced
          .value()
          .ifPresent(
              reduction -> {
                measured.add(reduction.flexibility());
                gathering.configuration(
                    tested.log(), tested.file(), reduction, tested.changes());
              });
    }
    findings.refuseIfErrors();
    Outcome<Comparison> compared =
        files.tables().isEmpty()
            ? FlexibilityComparator.compare(
                files.study(), files.model(), measured, files.modes())
            : FlexibilityComparator.compareOutside(
                files.tables().get(0),
                files.study().parameters().stream().map(Parameter::name).toList(),
                measured);
    findings.addAll(compared.findings());
    findings.refuseIfErrors();
    compared.value().ifPresent(gathering::comparison);
    gathering.findings(findings.list());
    return new Prepared(gathering, measured);
  }

  /** Writes, prints, and says how the command ended. */
  private ExitCode finish(Results results, OutputFolder folder, boolean undecided) {
    ReportFiles.add(folder, results, output.units);
    List<Path> written = folder.write();
    Summary summary = new Summary(terminal, results, output.units);
    summary.print();
    summary.written(written);
    return undecided ? ExitCode.UNDECIDED : ExitCode.DONE;
  }
}
