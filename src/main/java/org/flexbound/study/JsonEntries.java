package org.flexbound.study;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.document.Json;
import org.flexbound.finding.Findings;

/** Takes entries out of JSON objects, with a finding for each that is not what was expected. */
final class JsonEntries {
  private final Findings findings;

  JsonEntries(Findings findings) {
    this.findings = findings;
  }

  Optional<Json.Members> members(Json value, String expected) {
    if (value instanceof Json.Members members) {
      return Optional.of(members);
    }
    wrong(value, expected + " as an object in braces");
    return Optional.empty();
  }

  List<Json> items(Json value, String expected) {
    if (value instanceof Json.Items items) {
      return items.items();
    }
    wrong(value, expected + " in brackets");
    return List.of();
  }

  Optional<String> text(Json.Members members, String key) {
    Optional<Json> value = members.get(key);
    if (value.isEmpty()) {
      return Optional.empty();
    }
    if (value.get() instanceof Json.Text text) {
      return Optional.of(text.text());
    }
    wrong(value.get(), "a text for '" + key + "'");
    return Optional.empty();
  }

  Optional<String> needText(Json.Members members, String key, String owner) {
    if (members.get(key).isEmpty()) {
      findings.add(
          StudyFinding.MISSING_KEY, members.where(), owner + " has no key '" + key + "'");
    }
    return text(members, key);
  }

  OptionalDouble number(Json.Members members, String key) {
    Optional<Json> value = members.get(key);
    if (value.isEmpty()) {
      return OptionalDouble.empty();
    }
    if (value.get() instanceof Json.Numeral numeral) {
      return OptionalDouble.of(numeral.value());
    }
    wrong(value.get(), "a number for '" + key + "'");
    return OptionalDouble.empty();
  }

  void refuseOtherKeys(Json.Members members, List<String> known) {
    members
        .members()
        .forEach(
            (key, value) -> {
              if (!known.contains(key)) {
                findings.add(
                    StudyFinding.UNKNOWN_KEY,
                    value.where(),
                    "found the key '" + key + "'; expected one of " + String.join(", ", known));
              }
            });
  }

  void wrong(Json value, String expected) {
    findings.add(
        StudyFinding.WRONG_KIND, value.where(), "found " + value.shown() + "; expected " + expected);
  }
}
