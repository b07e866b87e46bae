package org.flexbound.document;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
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
import tools.jackson.core.StreamReadConstraints;
import tools.jackson.core.exc.StreamConstraintsException;
import tools.jackson.core.json.JsonFactory;

/**
 * Reads a JSON file (RFC 8259, UTF-8, with or without byte order mark) into values that know their
 * line and JSON pointer. Keys that stand twice, numbers beyond the largest double, comments and text
 * after the end are refused.
 */
public final class JsonFile {
  private static final String EXPECTED = "a JSON file (UTF-8)";

  private final String name;
  private final Findings findings = new Findings();

  private JsonFile(String name) {
    this.name = name;
  }

  /**
   * Reads a file within the usual limits.
   *
   * @param file where it lies
   * @param shownName its name in messages
   * @return the value, or the findings that say why there is none
   * @throws UncheckedIOException where the system does not let it be read
   */
  public static Outcome<Json> read(Path file, String shownName) {
    return read(file, shownName, ReadLimits.USUAL);
  }

  /**
   * Reads a file.
   *
   * @param file where it lies
   * @param shownName its name in messages
   * @param limits how much is read at most
   * @return the value, or the findings that say why there is none
   * @throws UncheckedIOException where the system does not let it be read
   */
  public static Outcome<Json> read(Path file, String shownName, ReadLimits limits) {
    Findings findings = new Findings();
    Where whole = Where.file(shownName);
    InputFileCheck.Kind kind =
        InputFileCheck.kind(file, shownName, EXPECTED, findings).orElse(null);
    if (kind == null) {
      return Outcome.none(findings.list());
    }
    if (kind != InputFileCheck.Kind.TEXT) {
      findings.add(
          DocumentFinding.UNREADABLE, whole, "found " + kind.words() + "; expected " + EXPECTED);
      return Outcome.none(findings.list());
    }
    try {
      if (Files.size(file) > limits.jsonBytes()) {
        findings.add(
            DocumentFinding.LIMIT, whole, LimitedStream.message("json-bytes", limits.jsonBytes()));
        return Outcome.none(findings.list());
      }
      byte[] bytes = Files.readAllBytes(file);
      String text = StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes)).toString();
      return parse(text, shownName, limits);
    } catch (CharacterCodingException notUtf8) {
      findings.add(
          DocumentFinding.UNREADABLE,
          whole,
          "found bytes that are not UTF-8; expected " + EXPECTED);
      return Outcome.none(findings.list());
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    }
  }

  /**
   * Reads a text within the usual limits.
   *
   * @param text the JSON text
   * @param shownName the file's name in messages
   * @return the value, or the findings that say why there is none
   */
  public static Outcome<Json> parse(String text, String shownName) {
    return parse(text, shownName, ReadLimits.USUAL);
  }

  private static Outcome<Json> parse(String text, String shownName, ReadLimits limits) {
    return new JsonFile(shownName).value(text, limits);
  }

  private Outcome<Json> value(String text, ReadLimits limits) {
    String body = text.startsWith("\uFEFF") ? text.substring(1) : text;
    if (body.isBlank()) {
      findings.add(
          DocumentFinding.UNREADABLE,
          Where.file(name),
          "the file holds nothing but blanks; expected " + EXPECTED);
      return Outcome.none(findings.list());
    }
    try (JsonParser parser = factory(limits).createParser(ObjectReadContext.empty(), body)) {
      parser.nextToken();
      Json value = value(parser, "");
      if (parser.nextToken() != null) {
        findings.add(
            DocumentFinding.JSON_SYNTAX,
            Where.line(name, parser.currentTokenLocation().getLineNr()),
            "found more text after the end of the value; expected the end of the file");
      }
      return Outcome.of(value, findings.list());
    } catch (StreamConstraintsException passed) {
      findings.add(DocumentFinding.LIMIT, Where.line(name, line(passed)), limit(passed, limits));
    } catch (JacksonException broken) {
      int line = line(broken);
      findings.add(
          DocumentFinding.JSON_SYNTAX, Where.line(name, line), JsonSyntax.words(broken, body, line));
    }
    return Outcome.none(findings.list());
  }

  private static JsonFactory factory(ReadLimits limits) {
    return JsonFactory.builder()
        .streamReadConstraints(
            StreamReadConstraints.builder()
                .maxNestingDepth(limits.jsonDepth())
                .maxStringLength(limits.textLength())
                .maxNameLength(50_000)
                .maxNumberLength(1_000)
                .build())
        .build();
  }

  private static int line(JacksonException problem) {
    return problem.getLocation() == null ? 1 : Math.max(1, problem.getLocation().getLineNr());
  }

  private static String limit(StreamConstraintsException passed, ReadLimits limits) {
    String message = String.valueOf(passed.getOriginalMessage());
    if (message.contains("nesting depth")) {
      return LimitedStream.message("json-depth", limits.jsonDepth());
    }
    if (message.contains("String value length")) {
      return LimitedStream.message("text-length", limits.textLength());
    }
    return "found a name or a number longer than any that makes sense";
  }

  private Json value(JsonParser parser, String pointer) {
    JsonToken token = parser.currentToken();
    Where where = Where.json(name, pointer, parser.currentTokenLocation().getLineNr());
    return switch (token) {
      case START_OBJECT -> members(parser, pointer, where);
      case START_ARRAY -> items(parser, pointer, where);
      case VALUE_STRING -> new Json.Text(where, parser.getString());
      case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> number(parser.getString(), where);
      case VALUE_TRUE -> new Json.Truth(where, true);
      case VALUE_FALSE -> new Json.Truth(where, false);
      default -> new Json.Nothing(where);
    };
  }

  private Json number(String text, Where where) {
    double value = Double.parseDouble(text);
    if (Double.isInfinite(value)) {
      findings.add(
          DocumentFinding.WRONG_KIND,
          where,
          "found " + text + "; expected a number that 64 bits hold (up to about 1.8e308)");
    }
    return new Json.Numeral(where, value);
  }

  private Json members(JsonParser parser, String pointer, Where where) {
    Map<String, Json> members = new LinkedHashMap<>();
    while (parser.nextToken() != JsonToken.END_OBJECT) {
      String key = parser.currentName();
      parser.nextToken();
      Json value = value(parser, pointer + "/" + key.replace("~", "~0").replace("/", "~1"));
      Json before = members.putIfAbsent(key, value);
      if (before != null) {
        findings.add(
            DocumentFinding.DUPLICATE_KEY,
            value.where(),
            "found the key '"
                + key
                + "' a second time; it stands already at line "
                + before.where().line().orElse(1));
      }
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
