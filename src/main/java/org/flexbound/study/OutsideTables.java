package org.flexbound.study;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.document.Json;
import org.flexbound.finding.Findings;
import org.flexbound.quantity.NearestWord;

/**
 * Reads the key {@code outsideFlexibility}: a file's name, an object of {@code table} and {@code at},
 * or a list of such.
 */
final class OutsideTables {
  private static final String KEY = "outsideFlexibility";

  private final JsonEntries entries;
  private final Findings findings;

  OutsideTables(JsonEntries entries, Findings findings) {
    this.entries = entries;
    this.findings = findings;
  }

  List<Study.OutsideTable> read(Json.Members study) {
    Optional<Json> value = study.get(KEY);
    if (value.isEmpty()) {
      return List.of();
    }
    List<Json> items =
        value.get() instanceof Json.Items list ? list.items() : List.of(value.get());
    List<Study.OutsideTable> result = new ArrayList<>();
    for (Json item : items) {
      if (item instanceof Json.Text text) {
        result.add(new Study.OutsideTable(text.text(), Map.of(), item.where()));
      } else {
        entries
            .members(item, "the name of a table's file, or {\"table\": …, \"at\": {…}}")
            .flatMap(this::pointed)
            .ifPresent(result::add);
      }
    }
    if (items.isEmpty()) {
      findings.add(StudyFinding.MISSING_KEY, value.get().where(), "the list of tables is empty");
    }
    return result;
  }

  private Optional<Study.OutsideTable> pointed(Json.Members members) {
    entries.refuseOtherKeys(members, List.of("table", "at"));
    Map<String, Double> at = new LinkedHashMap<>();
    members
        .get("at")
        .flatMap(json -> entries.members(json, "factors on the nominal stiffnesses by parameter"))
        .ifPresent(
            factors ->
                factors
                    .members()
                    .forEach(
                        (name, factor) -> {
                          if (factor instanceof Json.Numeral number && number.value() > 0) {
                            at.put(name, number.value());
                          } else {
                            findings.add(
                                StudyFinding.WRONG_KIND,
                                factor.where(),
                                "found "
                                    + factor.shown()
                                    + "; expected the factor on the nominal stiffness of '"
                                    + name
                                    + "', above 0");
                          }
                        }));
    return entries
        .needText(members, "table", "the entry of '" + KEY + "'")
        .map(file -> new Study.OutsideTable(file, at, members.where()));
  }

  void refuseUnknown(List<Study.OutsideTable> tables, List<Parameter> parameters) {
    List<String> known = parameters.stream().map(Parameter::name).toList();
    for (Study.OutsideTable table : tables) {
      for (String name : table.at().keySet()) {
        if (!known.contains(name)) {
          findings.add(
              StudyFinding.WRONG_KIND,
              table.where(),
              "found '"
                  + name
                  + "' under 'at'; expected the name of a parameter"
                  + NearestWord.question(name, known));
        }
      }
    }
  }
}
