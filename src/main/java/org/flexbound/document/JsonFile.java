package org.flexbound.document;

import java.io.IOException;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;
import tools.jackson.core.JacksonException;
import tools.jackson.core.JsonParser;
import tools.jackson.core.JsonToken;
import tools.jackson.core.ObjectReadContext;
import tools.jackson.core.StreamReadFeature;
import tools.jackson.core.json.JsonFactory;

/** Reads a JSON file (RFC 8259, UTF-8) into values that know their line and JSON pointer. */
public final class JsonFile {
  private static final JsonFactory FACTORY =
      JsonFactory.builder().enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION).build();

  private final String name;

  private JsonFile(String name) {
    this.name = name;
  }

  /**
   * Reads a file.
   *
   * @param file where it lies
   * @param shownName its name in messages
   * @return the value, or the findings that say why there is none
   */
  public static Outcome<Json> read(Path file, String shownName) {
    Findings findings = new Findings();
    Where whole = Where.file(shownName);
    if (!Files.exists(file)) {
      findings.add(DocumentFinding.MISSING, whole, "there is no such file");
      return Outcome.none(findings.list());
    }
    if (!Files.isRegularFile(file)) {
      findings.add(DocumentFinding.UNREADABLE, whole, "found a folder; expected a JSON file");
      return Outcome.none(findings.list());
    }
    String text;
    try {
      text = Files.readString(file, StandardCharsets.UTF_8);
    } catch (CharacterCodingException notUtf8) {
      findings.add(
          DocumentFinding.UNREADABLE, whole, "found bytes that are not UTF-8; expected JSON");
      return Outcome.none(findings.list());
    } catch (IOException refused) {
      throw new java.io.UncheckedIOException(refused);
    }
    return parse(text, shownName);
  }

  /**
   * Reads a text.
   *
   * @param text the JSON text
   * @param shownName the file's name in messages
   * @return the value, or the findings that say why there is none
   */
  public static Outcome<Json> parse(String text, String shownName) {
    Findings findings = new Findings();
    String body = text.startsWith("\uFEFF") ? text.substring(1) : text;
    if (body.isBlank()) {
      findings.add(
          DocumentFinding.UNREADABLE, Where.file(shownName), "the file is empty; expected JSON");
      return Outcome.none(findings.list());
    }
    try (JsonParser parser = FACTORY.createParser(ObjectReadContext.empty(), body)) {
      parser.nextToken();
      Json value = new JsonFile(shownName).value(parser, "");
      if (parser.nextToken() != null) {
        findings.add(
            DocumentFinding.JSON_SYNTAX,
            Where.line(shownName, parser.currentTokenLocation().getLineNr()),
            "found more text after the end of the value; expected the end of the file");
      }
      return Outcome.of(value, findings.list());
    } catch (JacksonException broken) {
      int line = broken.getLocation() == null ? 1 : Math.max(1, broken.getLocation().getLineNr());
      findings.add(
          DocumentFinding.JSON_SYNTAX, Where.line(shownName, line), broken.getOriginalMessage());
      return Outcome.none(findings.list());
    }
  }

  private Json value(JsonParser parser, String pointer) {
    JsonToken token = parser.currentToken();
    Where where = Where.json(name, pointer, parser.currentTokenLocation().getLineNr());
    return switch (token) {
      case START_OBJECT -> members(parser, pointer, where);
      case START_ARRAY -> items(parser, pointer, where);
      case VALUE_STRING -> new Json.Text(where, parser.getString());
      case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT ->
          new Json.Numeral(where, Double.parseDouble(parser.getString()));
      case VALUE_TRUE -> new Json.Truth(where, true);
      case VALUE_FALSE -> new Json.Truth(where, false);
      default -> new Json.Nothing(where);
    };
  }

  private Json members(JsonParser parser, String pointer, Where where) {
    Map<String, Json> members = new LinkedHashMap<>();
    while (parser.nextToken() != JsonToken.END_OBJECT) {
      String key = parser.currentName();
      parser.nextToken();
      members.put(key, value(parser, pointer + "/" + key.replace("~", "~0").replace("/", "~1")));
    }
    return new Json.Members(where, members);
  }

  private Json items(JsonParser parser, String pointer, Where where) {
    List<Json> items = new ArrayList<>();
    while (parser.nextToken() != JsonToken.END_ARRAY) {
      items.add(value(parser, pointer + "/" + items.size()));
    }
    return new Json.Items(where, items);
  }
}
