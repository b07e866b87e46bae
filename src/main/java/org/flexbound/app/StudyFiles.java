package org.flexbound.app;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.document.Json;
import org.flexbound.document.JsonFile;
import org.flexbound.document.ReadProgress;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.flexbound.finding.Where;
import org.flexbound.flexibility.MeasuredModes;
import org.flexbound.flexibility.OutsideTableReader;
import org.flexbound.frame.FrameChanges;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.solve.FrameFlexibility;
import org.flexbound.study.Configuration;
import org.flexbound.study.Study;
import org.flexbound.study.StudyFinding;
import org.flexbound.study.StudyReader;
import org.flexbound.testlog.InputFile;
import org.flexbound.testlog.LogFile;
import org.flexbound.testlog.TestLog;
import org.flexbound.testlog.WorkbookLog;

/**
 * A study with all files that it names, read together: the problems of all of them come in one
 * answer.
 *
 * @param study the study
 * @param model its frame model
 * @param tested one for each configuration
 * @param modes the table of measured modes, where the study names one
 * @param inputs the files that were read
 * @param findings what was noticed, no errors
 */
record StudyFiles(
    Study study,
    FrameModel model,
    List<Tested> tested,
    Optional<MeasuredModes> modes,
    List<InputFile> inputs,
    List<Finding> findings) {

  /**
   * A configuration with its log.
   *
   * @param configuration its name
   * @param file the log's file, as the study names it
   * @param log the log
   * @param model the model with the configuration's changes
   * @param changes those changes, as text
   */
  record Tested(
      String configuration, String file, TestLog log, FrameModel model, List<String> changes) {}

  /**
   * Reads a study.
   *
   * @param file the study's file
   * @param progress is told how far the reading of a long log has come
   * @return the study with its files
   * @throws Refusal with the problems of all files, where there are any
   */
  static StudyFiles read(Path file, ReadProgress progress) {
    Findings findings = new Findings();
    String name = String.valueOf(file.getFileName());
    Outcome<Study> read = JsonFile.read(file, name).then(StudyReader::read);
    findings.addAll(read.findings());
    Study study = read.value().orElseThrow(() -> new Refusal(findings.list()));
    refuseUnsupported(study, findings);
    Path folder = Optional.ofNullable(file.toAbsolutePath().getParent()).orElse(Path.of("."));
    List<InputFile> inputs = new ArrayList<>();
    inputs.add(new InputFile(name, WorkbookLog.sha256(file)));
    Optional<FrameModel> model = model(study, folder, inputs, findings);
    List<Tested> tested = new ArrayList<>();
    for (Configuration configuration : study.configurations()) {
      tested(configuration, model, folder, progress, inputs, findings).ifPresent(tested::add);
    }
    Optional<MeasuredModes> modes = modes(study, tested, folder, inputs, findings);
    findings.refuseIfErrors();
    return new StudyFiles(
        study,
        model.orElseThrow(() -> new Refusal(findings.list())),
        tested,
        modes,
        inputs,
        findings.list());
  }

  private static Optional<MeasuredModes> modes(
      Study study,
      List<Tested> tested,
      Path folder,
      List<InputFile> inputs,
      Findings findings) {
    if (study.measuredModes().isEmpty()) {
      return Optional.empty();
    }
    String name = study.measuredModes().get().file();
    Path file = folder.resolve(name);
    List<String> gauges =
        tested.stream()
            .flatMap(t -> t.log().gauges().stream())
            .map(gauge -> gauge.name())
            .distinct()
            .toList();
    List<String> loads =
        tested.stream()
            .flatMap(t -> t.log().loads().stream())
            .map(load -> load.name())
            .distinct()
            .toList();
    Outcome<MeasuredModes> read = OutsideTableReader.readModes(file, name, gauges, loads);
    findings.addAll(read.findings());
    if (Files.isReadable(file)) {
      inputs.add(new InputFile(name, WorkbookLog.sha256(file)));
    }
    return read.value();
  }

  private static void refuseUnsupported(Study study, Findings findings) {
    study.reduction().ifPresent(json -> later(json, "reduction", findings));
    study.limits().ifPresent(json -> later(json, "limits", findings));
    if (study.model().isEmpty()) {
      findings.add(
          StudyFinding.NOT_SUPPORTED_YET,
          study.where(),
          "a study without the key 'model' is not supported yet");
    }
    study
        .outsideFlexibility()
        .ifPresent(table -> tableLater(table.where(), "outsideFlexibility", findings));
  }

  private static void tableLater(Where where, String key, Findings findings) {
    findings.add(
        StudyFinding.NOT_SUPPORTED_YET, where, "the key '" + key + "' is not supported yet");
  }

  private static void later(Json json, String key, Findings findings) {
    findings.add(
        StudyFinding.NOT_SUPPORTED_YET,
        json.where(),
        "the key '" + key + "' is not supported yet; use the sheet of the log instead");
  }

  private static Optional<FrameModel> model(
      Study study, Path folder, List<InputFile> inputs, Findings findings) {
    if (study.model().isEmpty()) {
      return Optional.empty();
    }
    String name = study.model().get();
    Path file = folder.resolve(name);
    Outcome<FrameModel> read = FrameReader.read(file, name);
    findings.addAll(read.findings());
    if (Files.isReadable(file)) {
      inputs.add(new InputFile(name, WorkbookLog.sha256(file)));
    }
    return read.value();
  }

  private static Optional<Tested> tested(
      Configuration configuration,
      Optional<FrameModel> model,
      Path folder,
      ReadProgress progress,
      List<InputFile> inputs,
      Findings findings) {
    if (configuration.log().isEmpty()) {
      findings.add(
          StudyFinding.NOT_SUPPORTED_YET,
          configuration.where(),
          "a configuration without the key 'log' is not supported yet");
      return Optional.empty();
    }
    String name = configuration.log().get();
    Outcome<TestLog> read = LogFile.read(folder.resolve(name), name, progress);
    findings.addAll(read.findings());
    read.value().ifPresent(log -> inputs.addAll(log.inputs()));
    Optional<FrameModel> changed = model;
    if (model.isPresent() && configuration.changes().isPresent()) {
      Outcome<FrameModel> applied =
          FrameChanges.apply(model.get(), configuration.changes().get());
      findings.addAll(applied.findings());
      changed = applied.value();
    }
    if (read.value().isEmpty() || changed.isEmpty()) {
      return Optional.empty();
    }
    TestLog log = read.value().get();
    // The cross-check of gauges and loads against the model runs on what could be made out.
    if (findings.hasErrors()) {
      findings.addAll(
          FrameFlexibility.prepare(changed.get(), log.gauges(), log.loads(), List.of())
              .findings());
    }
    return Optional.of(
        new Tested(
            configuration.name(),
            name,
            log,
            changed.get(),
            configuration.changes().map(StudyFiles::words).orElse(List.of())));
  }

  /** The changes of a configuration, one text for each group of entries. */
  private static List<String> words(Json changes) {
    List<String> result = new ArrayList<>();
    if (changes instanceof Json.Members kinds) {
      kinds
          .members()
          .forEach(
              (kind, groups) -> {
                if (groups instanceof Json.Members named) {
                  named
                      .members()
                      .forEach((group, entries) -> result.add(kind + " " + group + names(entries)));
                }
              });
    }
    return result;
  }

  private static String names(Json entries) {
    List<String> names = new ArrayList<>();
    if (entries instanceof Json.Members members) {
      names.addAll(members.members().keySet());
    } else if (entries instanceof Json.Items items) {
      items
          .items()
          .forEach(
              item -> {
                if (item instanceof Json.Text text) {
                  names.add(text.text());
                }
              });
    }
    return names.isEmpty() ? "" : ": " + String.join(", ", names);
  }
}
