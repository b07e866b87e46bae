package org.flexbound.document;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.NearestWord;

/** Takes values out of JSON objects by their keys, with a finding for each that is not as expected. */
public final class JsonKeys {
  private final Findings findings;

  /**
   * For one file.
   *
   * @param findings gets what is not as expected
   */
  public JsonKeys(Findings findings) {
    this.findings = findings;
  }

  /**
   * An object.
   *
   * @param value the value
   * @param expected what it is, for the message
   * @return the object; empty, with a finding, where the value is something else
   */
  public Optional<Json.Members> members(Json value, String expected) {
    if (value instanceof Json.Members members) {
      return Optional.of(members);
    }
    wrong(value, expected + " as an object in braces");
    return Optional.empty();
  }

  /**
   * A list.
   *
   * @param value the value
   * @param expected what it holds, for the message
   * @return the items; none, with a finding, where the value is something else
   */
  public List<Json> items(Json value, String expected) {
    if (value instanceof Json.Items items) {
      return items.items();
    }
    wrong(value, expected + " as a list in brackets");
    return List.of();
  }

  /**
   * A text.
   *
   * @param members the object
   * @param key the key
   * @return the text; empty where there is none, with a finding where something else stands there
   */
  public Optional<String> text(Json.Members members, String key) {
    return members.get(key).flatMap(value -> text(value, key));
  }

  private Optional<String> text(Json value, String key) {
    if (value instanceof Json.Text text) {
      return Optional.of(text.text());
    }
    wrong(value, "a text for '" + key + "'");
    return Optional.empty();
  }

  /**
   * A text, or a list of texts.
   *
   * @param members the object
   * @param key the key
   * @return the texts, each with its place
   */
  public List<Json.Text> texts(Json.Members members, String key) {
    List<Json.Text> texts = new ArrayList<>();
    members
        .get(key)
        .ifPresent(
            value -> {
              List<Json> items =
                  value instanceof Json.Items list ? list.items() : List.of(value);
              for (Json item : items) {
                text(item, key).ifPresent(text -> texts.add(new Json.Text(item.where(), text)));
              }
            });
    return texts;
  }

  /**
   * A number.
   *
   * @param members the object
   * @param key the key
   * @return the number; empty where there is none, with a finding where something else stands there
   */
  public OptionalDouble number(Json.Members members, String key) {
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

  /**
   * A whole number from 1, as the number of a row.
   *
   * @param members the object
   * @param key the key
   * @return the number; empty where there is none, with a finding where something else stands there
   */
  public OptionalInt row(Json.Members members, String key) {
    OptionalDouble number = number(members, key);
    if (number.isEmpty()) {
      return OptionalInt.empty();
    }
    double value = number.getAsDouble();
    if (!(value >= 1 && value <= Integer.MAX_VALUE && value == Math.rint(value))) {
      members
          .get(key)
          .ifPresent(found -> wrong(found, "the number of a row, from 1, for '" + key + "'"));
      return OptionalInt.empty();
    }
    return OptionalInt.of((int) value);
  }

  /**
   * Refuses every key that is not known, with the nearest one that is.
   *
   * @param members the object
   * @param known the keys that are known
   */
  public void refuseOthers(Json.Members members, Collection<String> known) {
    members
        .members()
        .forEach(
            (key, value) -> {
              if (!known.contains(key)) {
                findings.add(
                    DocumentFinding.UNKNOWN_KEY,
                    value.where(),
                    "found the key '"
                        + key
                        + "'; expected one of "
                        + String.join(", ", known)
                        + NearestWord.question(key, known));
              }
            });
  }

  /**
   * Says that a value is not there.
   *
   * @param where the place that should hold it
   * @param message what was found and what was expected
   */
  public void absent(Where where, String message) {
    findings.add(DocumentFinding.ABSENT, where, message);
  }

  /**
   * Says that a value is not of the kind that is needed.
   *
   * @param value the value
   * @param expected what was expected
   */
  public void wrong(Json value, String expected) {
    findings.add(
        DocumentFinding.WRONG_KIND,
        value.where(),
        "found " + value.shown() + "; expected " + expected);
  }
}
