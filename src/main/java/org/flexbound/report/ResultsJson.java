package org.flexbound.report;

import com.fasterxml.jackson.annotation.JsonInclude;
import com.fasterxml.jackson.annotation.JsonSetter;
import com.fasterxml.jackson.annotation.Nulls;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.TrendResults;
import tools.jackson.core.JacksonException;
import tools.jackson.core.util.DefaultIndenter;
import tools.jackson.core.util.DefaultPrettyPrinter;
import tools.jackson.databind.DeserializationFeature;
import tools.jackson.databind.MapperFeature;
import tools.jackson.databind.SerializationFeature;
import tools.jackson.databind.json.JsonMapper;

/**
 * results.json, written and read back: fields in the order of the records, UTF-8, line feeds, SI,
 * no timestamps, so that the same results give the same bytes.
 */
public final class ResultsJson {
  private static final JsonMapper MAPPER =
      JsonMapper.builder()
          .disable(MapperFeature.SORT_PROPERTIES_ALPHABETICALLY)
          .disable(DeserializationFeature.FAIL_ON_UNKNOWN_PROPERTIES)
          .enable(SerializationFeature.INDENT_OUTPUT)
          .changeDefaultPropertyInclusion(
              include -> include.withValueInclusion(JsonInclude.Include.NON_ABSENT))
          // a list that an earlier version did not write is an empty one
          .withConfigOverride(
              List.class,
              list -> list.setNullHandling(JsonSetter.Value.forValueNulls(Nulls.AS_EMPTY)))
          .defaultPrettyPrinter(printer())
          .build();

  private ResultsJson() {}

  private static DefaultPrettyPrinter printer() {
    return new DefaultPrettyPrinter().withObjectIndenter(new DefaultIndenter("  ", "\n"));
  }

  /**
   * The bytes of results.json.
   *
   * @param results what was found
   * @return UTF-8, ending in a line feed
   */
  public static byte[] bytes(Results results) {
    return (MAPPER.writeValueAsString(results) + "\n").getBytes(StandardCharsets.UTF_8);
  }

  /**
   * The bytes of trend.json.
   *
   * @param trend the history
   * @return UTF-8, ending in a line feed
   */
  public static byte[] bytes(TrendResults trend) {
    return (MAPPER.writeValueAsString(trend) + "\n").getBytes(StandardCharsets.UTF_8);
  }

  /**
   * Reads results back. Fields that this version does not know are passed over.
   *
   * @param bytes the file's content
   * @return the results
   * @throws IllegalArgumentException where it is not a results.json that this version can read
   */
  public static Results parse(byte[] bytes) {
    Results results;
    try {
      results = MAPPER.readValue(bytes, Results.class);
    } catch (JacksonException notReadable) {
      throw new IllegalArgumentException(
          "not a results.json: " + notReadable.getOriginalMessage(), notReadable);
    }
    if (results.format() < 1 || results.format() > Results.FORMAT) {
      throw new IllegalArgumentException(
          "the results have format "
              + results.format()
              + ", and this program reads format 1 to "
              + Results.FORMAT
              + "; use the version of the program that wrote them, or a later one");
    }
    return results;
  }
}
