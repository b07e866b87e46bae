package org.flexbound.study;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.flexbound.document.Json;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;

/**
 * Reads a study from its JSON value.
 *
 * <p>Every problem becomes a finding with its place; what could be made out is returned beside them,
 * so that the files it names can be checked in the same go.
 */
public final class StudyReader {
  private static final List<String> KEYS =
      List.of(
          "$schema",
          "title",
          "model",
          "log",
          "configurations",
          "flexibility",
          "parameters",
          "rule",
          "heldOut",
          "reduction",
          "limits",
          "measuredModes",
          "outsideFlexibility",
          "starts");

  private final Findings findings = new Findings();

  private StudyReader() {}

  /**
   * Reads a study.
   *
   * @param json the whole file
   * @return the study as far as it could be made out, with all findings
   */
  public static Outcome<Study> read(Json json) {
    return new StudyReader().study(json);
  }

  private Outcome<Study> study(Json json) {
    JsonEntries entries = new JsonEntries(findings);
    Optional<Json.Members> top = entries.members(json, "a study");
    if (top.isEmpty()) {
      return Outcome.none(findings.list());
    }
    Json.Members study = top.get();
    entries.refuseOtherKeys(study, KEYS);
    Optional<String> model = entries.text(study, "model");
    OutsideTables tables = new OutsideTables(entries, findings);
    List<Study.OutsideTable> outside = tables.read(study);
    Optional<Study.Table> modes = table(entries, study, "measuredModes");
    if (model.isEmpty()
        && study.get("outsideFlexibility").isEmpty()
        && study.get("model").isEmpty()) {
      findings.add(
          StudyFinding.MISSING_KEY,
          study.where(),
          "the study names no model; expected the key 'model' with a frame model's file (or"
              + " 'outsideFlexibility' with a table)");
    }
    List<Configuration> configurations = configurations(entries, study);
    List<Parameter> parameters = parameters(entries, study);
    tables.refuseUnknown(outside, parameters);
    Study result =
        new Study(
            entries.text(study, "title").orElse(""),
            model,
            configurations,
            flexibility(entries, study),
            parameters,
            rule(study),
            heldOut(entries, study),
            study.get("reduction"),
            study.get("limits"),
            modes,
            outside,
            starts(entries, study),
            study.where());
    return Outcome.of(result, findings.list());
  }

  private static Optional<Study.Table> table(JsonEntries entries, Json.Members study, String key) {
    return entries
        .text(study, key)
        .map(file -> new Study.Table(file, study.get(key).orElse(study).where()));
  }

  private List<Configuration> configurations(JsonEntries entries, Json.Members study) {
    Optional<Json> list = study.get("configurations");
    Optional<String> log = entries.text(study, "log");
    if (list.isEmpty()) {
      if (log.isEmpty() && study.get("log").isEmpty()) {
        findings.add(
            StudyFinding.MISSING_KEY,
            study.where(),
            "the study names no test; expected the key 'log' with a load-test log's file, or"
                + " 'configurations'");
      }
      return List.of(
          new Configuration(
              Study.ONLY_CONFIGURATION,
              log,
              Optional.empty(),
              study.get("log").orElse(study).where()));
    }
    study
        .get("log")
        .ifPresent(
            both ->
                findings.add(
                    StudyFinding.KEYS_DISAGREE,
                    both.where(),
                    "'log' stands beside 'configurations', where each configuration names its own"
                        + " log"));
    List<Configuration> result = new ArrayList<>();
    Set<String> names = new HashSet<>();
    for (Json item : entries.items(list.get(), "a list of configurations")) {
      Optional<Json.Members> members = entries.members(item, "a configuration");
      if (members.isEmpty()) {
        continue;
      }
      Json.Members entry = members.get();
      entries.refuseOtherKeys(entry, List.of("name", "log", "changes"));
      Optional<String> name = entries.needText(entry, "name", "the configuration");
      Optional<String> ownLog = entries.needText(entry, "log", "the configuration");
      if (name.isPresent() && !names.add(name.get())) {
        findings.add(
            StudyFinding.KEYS_DISAGREE,
            entry.where(),
            "a second configuration is called '" + name.get() + "'; each needs a name of its own");
      }
      name.ifPresent(
          found ->
              result.add(new Configuration(found, ownLog, entry.get("changes"), entry.where())));
    }
    if (result.isEmpty()) {
      findings.add(
          StudyFinding.MISSING_KEY, list.get().where(), "'configurations' has no usable entry");
      result.add(
          new Configuration(
              Study.ONLY_CONFIGURATION, Optional.empty(), Optional.empty(), list.get().where()));
    }
    return result;
  }

  private FlexibilityChoice flexibility(JsonEntries entries, Json.Members study) {
    Optional<Json> value = study.get("flexibility");
    if (value.isEmpty()) {
      return new FlexibilityChoice.Full();
    }
    if (value.get() instanceof Json.Members members) {
      entries.refuseOtherKeys(members, List.of("modes"));
      OptionalDouble modes = entries.number(members, "modes");
      if (modes.isPresent() && modes.getAsDouble() >= 1 && isWhole(modes.getAsDouble())) {
        return new FlexibilityChoice.Truncated((int) modes.getAsDouble());
      }
    } else if (value.get() instanceof Json.Text text && text.text().equals("full")) {
      return new FlexibilityChoice.Full();
    }
    findings.add(
        StudyFinding.WRONG_KIND,
        value.get().where(),
        "found " + value.get().shown() + "; expected \"full\" or {\"modes\": 6}");
    return new FlexibilityChoice.Full();
  }

  private static boolean isWhole(double value) {
    return value == Math.rint(value) && value <= Integer.MAX_VALUE;
  }

  private List<Parameter> parameters(JsonEntries entries, Json.Members study) {
    Optional<Json> value = study.get("parameters");
    if (value.isEmpty()) {
      return List.of();
    }
    List<Parameter> result = new ArrayList<>();
    ParameterReader reader = new ParameterReader(entries, findings, study.get("outsideFlexibility").isPresent());
    Optional<Json.Members> named = entries.members(value.get(), "parameters by name");
    if (named.isPresent()) {
      for (Map.Entry<String, Json> entry : named.get().members().entrySet()) {
        reader.read(entry.getKey(), entry.getValue()).ifPresent(result::add);
      }
    }
    reader.refuseScaledTwice(result);
    return result;
  }

  private Rule rule(Json.Members study) {
    Optional<Json> value = study.get("rule");
    if (value.isEmpty()) {
      return new Rule.Prior();
    }
    if (value.get() instanceof Json.Numeral number && number.value() > 0) {
      return new Rule.Stated(number.value());
    }
    if (value.get() instanceof Json.Text text) {
      Optional<Rule> named =
          switch (text.text()) {
            case "prior" -> Optional.of(new Rule.Prior());
            case "discrepancy" -> Optional.of(new Rule.Discrepancy());
            case "curve-corner" -> Optional.of(new Rule.CurveCorner());
            default -> Optional.empty();
          };
      if (named.isPresent()) {
        return named.get();
      }
    }
    findings.add(
        StudyFinding.WRONG_KIND,
        value.get().where(),
        "found "
            + value.get().shown()
            + "; expected \"prior\", \"discrepancy\", \"curve-corner\" or a weight above 0");
    return new Rule.Prior();
  }

  private List<HeldOutCase> heldOut(JsonEntries entries, Json.Members study) {
    Optional<Json> value = study.get("heldOut");
    if (value.isEmpty()) {
      return List.of();
    }
    List<HeldOutCase> result = new ArrayList<>();
    for (Json item : entries.items(value.get(), "a list of load cases")) {
      if (item instanceof Json.Text text) {
        result.add(new HeldOutCase(Optional.empty(), text.text(), item.where()));
      } else if (item instanceof Json.Members members) {
        entries.refuseOtherKeys(members, List.of("configuration", "load"));
        Optional<String> configuration = entries.text(members, "configuration");
        entries
            .needText(members, "load", "the held-out load case")
            .ifPresent(
                load -> result.add(new HeldOutCase(configuration, load, item.where())));
      } else {
        findings.add(
            StudyFinding.WRONG_KIND,
            item.where(),
            "found "
                + item.shown()
                + "; expected the name of a load, or {\"configuration\": …, \"load\": …}");
      }
    }
    return result;
  }

  private int starts(JsonEntries entries, Json.Members study) {
    OptionalDouble starts = entries.number(study, "starts");
    if (starts.isEmpty()) {
      return 1;
    }
    if (!(starts.getAsDouble() >= 1 && starts.getAsDouble() <= 100 && isWhole(starts.getAsDouble()))) {
      findings.add(
          StudyFinding.WRONG_KIND,
          study.get("starts").orElse(study).where(),
          "found "
              + Json.plain(starts.getAsDouble())
              + " starts; expected a whole number from 1 to 100");
      return 1;
    }
    return (int) starts.getAsDouble();
  }
}
