package org.flexbound.testlog;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.document.InputFolder;
import org.flexbound.document.Json;
import org.flexbound.document.JsonFile;
import org.flexbound.document.JsonKeys;
import org.flexbound.document.ReadProgress;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;

/**
 * Reads a description of a log: a JSON file that says what the workbook's sheets say, and names the
 * files, sheets and columns in which the readings stand.
 */
final class DescribedLog {
  private final Findings findings = new Findings();
  private final List<InputFile> inputs = new ArrayList<>();

  private DescribedLog() {}

  static Outcome<TestLog> read(Path path, String shownName, LogContext context) {
    return JsonFile.read(path, shownName)
        .then(json -> new DescribedLog().log(json, path, shownName, context));
  }

  private Outcome<TestLog> log(
      Json json, Path path, String shownName, LogContext context) {
    JsonKeys keys = new JsonKeys(findings);
    Optional<Json.Members> top = keys.members(json, "a description of a log");
    if (top.isEmpty()) {
      return Outcome.none(findings.list());
    }
    keys.refuseOthers(top.get(), DescriptionKeys.top());
    inputs.add(new InputFile(shownName, WorkbookLog.sha256(path)));
    DescribedFiles files =
        new DescribedFiles(
            InputFolder.of(path, shownName),
            keys,
            // the files of a planned test need not be there yet
            context.planned() ? new Findings() : findings);
    List<ReadingsSource> sources = files.sources(top.get());
    LogReader reader =
        new LogReader(
            new DescribedTables(top.get(), files, findings), sources, context, findings);
    TestLog log = reader.log(() -> inputs(files));
    return Outcome.of(log, findings.list());
  }

  /** The description and the files that were opened for it. */
  private List<InputFile> inputs(DescribedFiles files) {
    inputs.addAll(files.inputs());
    return inputs;
  }
}
