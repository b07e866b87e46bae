package org.flexbound.app;

import java.nio.file.Path;
import java.util.List;
import org.flexbound.document.OutputFolder;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.flexbound.reduce.Places;
import org.flexbound.reduce.Reducer;
import org.flexbound.reduce.Reduction;
import org.flexbound.reduce.ReductionProblem;
import org.flexbound.report.ReportFiles;
import org.flexbound.report.gather.Gathering;
import org.flexbound.report.results.Results;
import org.flexbound.study.Study;
import org.flexbound.testlog.TestLog;
import org.flexbound.testlog.WorkbookLog;

/** The steps of the commands that read a test. */
final class Work {
  private final Terminal terminal;
  private final OutputOptions output;

  Work(Terminal terminal, OutputOptions output) {
    this.terminal = terminal;
    this.output = output;
  }

  ExitCode reduce(Path file) {
    String name = String.valueOf(file.getFileName());
    Findings findings = new Findings();
    Outcome<TestLog> read = WorkbookLog.read(file, name);
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
    return finish(gathering.results(), new OutputFolder(output.folder));
  }

  ExitCode compare(Path study) {
    return refuse(study);
  }

  ExitCode update(Path study) {
    return refuse(study);
  }

  private ExitCode refuse(Path file) {
    terminal.err().println("flexbound: reading " + file + " is not supported yet");
    return ExitCode.COMMAND_LINE;
  }

  /** Writes, prints, and says how the command ended. */
  private ExitCode finish(Results results, OutputFolder folder) {
    ReportFiles.add(folder, results, output.units);
    List<Path> written = folder.write();
    Summary summary = new Summary(terminal, results, output.units);
    summary.print();
    summary.written(written);
    return ExitCode.DONE;
  }
}
