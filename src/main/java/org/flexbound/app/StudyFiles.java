package org.flexbound.app;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.flexbound.compare.OutsideTable;
import org.flexbound.document.InputFolder;
import org.flexbound.document.Json;
import org.flexbound.document.JsonFile;
import org.flexbound.document.ReadProgress;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.flexbound.finding.Where;
import org.flexbound.flexibility.MeasuredModes;
import org.flexbound.flexibility.OutsideFlexibility;
import org.flexbound.flexibility.OutsideTableReader;
import org.flexbound.frame.FrameChanges;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.reduce.Places;
import org.flexbound.solve.FrameFlexibility;
import org.flexbound.study.Configuration;
import org.flexbound.study.Parameter;
import org.flexbound.study.Study;
import org.flexbound.study.StudyFinding;
import org.flexbound.study.StudyReader;
import org.flexbound.testlog.InputFile;
import org.flexbound.testlog.LogContext;
import org.flexbound.testlog.LogFile;
import org.flexbound.testlog.TestLog;
import org.flexbound.testlog.WorkbookLog;

/**
 * A study with all files that it names, read together: the problems of all of them come in one
 * answer.
 *
 * @param study the study
 * @param frame its frame model; empty where the model is held elsewhere
 * @param tables the tables of a model held elsewhere; none where the frame model is used
 * @param tested one for each configuration
 * @param modes the table of measured modes, where the study names one
 * @param inputs the files that were read
 * @param findings what was noticed, no errors
 */
record StudyFiles(
    Study study,
    Optional<FrameModel> frame,
    List<OutsideTable> tables,
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
   * @param frame the model with the configuration's changes; empty where the model is held
   *     elsewhere
   * @param changes those changes, as text
   */
  record Tested(
      String configuration,
      String file,
      TestLog log,
      Optional<FrameModel> frame,
      List<String> changes) {
    /** The model, which there is unless it is held elsewhere. */
    FrameModel model() {
      return frame.orElseThrow(() -> new IllegalStateException("the model is held elsewhere"));
    }

    /** Where stations are: in the model, or as the log states. */
    Places places() {
      return frame.<Places>map(ModelPlaces::new).orElse(Places.STATED);
    }
  }

  /** The frame model, which there is unless it is held elsewhere. */
  FrameModel model() {
    return frame.orElseThrow(() -> new IllegalStateException("the model is held elsewhere"));
  }

  /**
   * Reads a study.
   *
   * @param file the study's file
   * @param progress is told how far the reading of a long log has come
   * @return the study with its files
   * @throws Refusal with the problems of all files, where there are any
   */
  static StudyFiles read(Path file, ReadProgress progress) {
    return read(file, progress, false);
  }

  /**
   * Reads a study.
   *
   * @param file the study's file
   * @param progress is told how far the reading of a long file has come
   * @param planned whether its tests are only planned, so that readings may be missing
   * @return the study with its files
   * @throws Refusal with the problems of all files, where there are any
   */
  static StudyFiles read(Path file, ReadProgress progress, boolean planned) {
    Findings findings = new Findings();
    String name = String.valueOf(file.getFileName());
    Outcome<Study> read = JsonFile.read(file, name).then(StudyReader::read);
    findings.addAll(read.findings());
    Study study = read.value().orElseThrow(() -> new Refusal(findings.list()));
    Path folder = Optional.ofNullable(file.toAbsolutePath().getParent()).orElse(Path.of("."));
    List<InputFile> inputs = new ArrayList<>();
    inputs.add(new InputFile(name, WorkbookLog.sha256(file)));
    Optional<FrameModel> model = model(study, folder, inputs, findings);
    List<Tested> tested = new ArrayList<>();
    for (Configuration configuration : study.configurations()) {
      LogContext context = new LogContext(study.reduction(), study.limits(), planned, progress);
      tested(configuration, model, folder, context, inputs, findings).ifPresent(tested::add);
    }
    Optional<MeasuredModes> modes = modes(study, tested, folder, inputs, findings);
    List<OutsideTable> tables = tables(study, file, name, inputs, findings);
    findings.refuseIfErrors();
    return new StudyFiles(
        study,
        model,
        tables,
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

  /** Whether a file is a study: JSON with a key that only a study has. */
  static boolean isStudy(Path file) {
    String name = String.valueOf(file.getFileName());
    if (!name.toLowerCase(Locale.ROOT).endsWith(".json")) {
      return false;
    }
    Optional<Json> json = JsonFile.read(file, name).value();
    return json.isEmpty()
        || (json.get() instanceof Json.Members members
            && (members.get("model").isPresent()
                || members.get("outsideFlexibility").isPresent()
                || members.get("log").isPresent()
                || members.get("configurations").isPresent()
                || members.get("parameters").isPresent()));
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

  private static List<OutsideTable> tables(
      Study study, Path file, String name, List<InputFile> inputs, Findings findings) {
    InputFolder folder = InputFolder.of(file, name);
    List<String> parameters = study.parameters().stream().map(Parameter::name).toList();
    List<OutsideTable> tables = new ArrayList<>();
    for (Study.OutsideTable stated : study.outsideFlexibility()) {
      Optional<Path> path = folder.resolve(stated.file(), stated.where(), findings);
      if (path.isEmpty()) {
        continue;
      }
      Outcome<OutsideFlexibility> read =
          OutsideTableReader.read(path.get(), folder.shown(stated.file()), parameters);
      findings.addAll(read.findings());
      read.value().ifPresent(found -> tables.add(new OutsideTable(found, stated.at())));
      if (Files.isReadable(path.get())) {
        inputs.add(new InputFile(stated.file(), WorkbookLog.sha256(path.get())));
      }
    }
    return tables;
  }

  private static Optional<Tested> tested(
      Configuration configuration,
      Optional<FrameModel> model,
      Path folder,
      LogContext context,
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
    Outcome<TestLog> read = LogFile.read(folder.resolve(name), name, context);
    read.findings().stream()
        .filter(finding -> !findings.list().contains(finding))
        .forEach(finding -> findings.addAll(List.of(finding)));
    read.value().ifPresent(log -> inputs.addAll(log.inputs()));
    Optional<FrameModel> changed = model;
    if (model.isPresent() && configuration.changes().isPresent()) {
      Outcome<FrameModel> applied =
          FrameChanges.apply(model.get(), configuration.changes().get());
      findings.addAll(applied.findings());
      changed = applied.value();
    }
    if (model.isEmpty() && configuration.changes().isPresent()) {
      findings.add(
          StudyFinding.KEYS_DISAGREE,
          configuration.where(),
          "the configuration '"
              + configuration.name()
              + "' changes a model that is held elsewhere; put its coefficients into the table's"
              + " column Configuration");
    }
    if (read.value().isEmpty() || (model.isPresent() && changed.isEmpty())) {
      return Optional.empty();
    }
    TestLog log = read.value().get();
    // The cross-check of gauges and loads against the model runs on what could be made out.
    if (findings.hasErrors() && changed.isPresent()) {
      findings.addAll(
          FrameFlexibility.prepare(changed.get(), log.gauges(), log.loads(), List.of())
              .findings());
    }
    return Optional.of(
        new Tested(
            configuration.name(),
            name,
            log,
            changed,
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
