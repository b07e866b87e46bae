package org.flexbound.report;

import static org.assertj.core.api.Assertions.assertThat;

import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.InputStream;
import java.lang.reflect.ParameterizedType;
import java.lang.reflect.RecordComponent;
import java.lang.reflect.Type;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.TrendResults;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The published schema of results.json says what the program writes, and explains all of it. */
class ResultsSchemaTest {
  private static String text;
  private static JsonNode schema;

  @BeforeAll
  static void read() throws Exception {
    try (InputStream stream =
        ResultsSchemaTest.class.getResourceAsStream("/schema/results.schema.json")) {
      text = new String(stream.readAllBytes(), StandardCharsets.UTF_8);
    }
    schema = JsonMapper.shared().readTree(text);
  }

  @Test
  void everyFieldOfEveryRecordStandsInTheSchemaWithItsTypeAndAnExplanation() {
    List<String> problems = new ArrayList<>();
    check(Results.class, schema, schema.path("$defs"), problems, new TreeSet<>());
    assertThat(problems).isEmpty();
  }

  @Test
  void whatIsWrittenObeysTheSchema() {
    Schema checker =
        SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12).getSchema(text);
    String results =
        new String(ResultsJson.bytes(InventedResults.small()), StandardCharsets.UTF_8);
    assertThat(checker.validate(results, InputFormat.JSON)).isEmpty();
    assertThat(
            checker.validate(
                results.replace("\"standardUncertainty\"", "\"uncertainty\""), InputFormat.JSON))
        .isNotEmpty();
  }

  @Test
  void theTrendsSchemaExplainsEveryFieldToo() throws Exception {
    try (InputStream stream =
        ResultsSchemaTest.class.getResourceAsStream("/schema/trend.schema.json")) {
      JsonNode trend =
          JsonMapper.shared()
              .readTree(new String(stream.readAllBytes(), StandardCharsets.UTF_8));
      List<String> problems = new ArrayList<>();
      check(TrendResults.class, trend, trend.path("$defs"), problems, new TreeSet<>());
      assertThat(problems).isEmpty();
    }
  }

  private static void check(
      Class<?> type,
      JsonNode definition,
      JsonNode known,
      List<String> problems, Set<String> seen) {
    if (!seen.add(type.getSimpleName())) {
      return;
    }
    List<String> required = new ArrayList<>();
    List<String> names = new ArrayList<>();
    for (RecordComponent component : type.getRecordComponents()) {
      String where = type.getSimpleName() + "." + component.getName();
      names.add(component.getName());
      JsonNode property = definition.path("properties").path(component.getName());
      if (property.path("description").asString("").length() < 2) {
        problems.add(where + " is not explained");
      }
      Type inner = component.getGenericType();
      if (component.getType() == Optional.class || component.getType() == OptionalDouble.class) {
        inner = component.getType() == OptionalDouble.class ? double.class : argument(inner);
      } else {
        required.add(component.getName());
      }
      shape(inner, property, known, where, problems, seen);
    }
    if (!names.equals(new ArrayList<>(definition.path("properties").propertyNames()))) {
      problems.add(type.getSimpleName() + " has other fields than " + names);
    }
    List<String> stated = new ArrayList<>();
    definition.path("required").forEach(node -> stated.add(node.asString()));
    if (!required.equals(stated)) {
      problems.add(type.getSimpleName() + " requires " + required + ", not " + stated);
    }
  }

  private static Type argument(Type type) {
    return ((ParameterizedType) type).getActualTypeArguments()[0];
  }

  private static void shape(
      Type type, JsonNode property, JsonNode known, String where, List<String> problems, Set<String> seen) {
    if (type instanceof ParameterizedType list) {
      expect("array", property, where, problems);
      shape(argument(list), property.path("items"), known, where, problems, seen);
    } else if (type == String.class) {
      expect("string", property, where, problems);
    } else if (type == double.class || type == Double.class) {
      expect("number", property, where, problems);
    } else if (type == int.class) {
      expect("integer", property, where, problems);
    } else if (type == boolean.class) {
      expect("boolean", property, where, problems);
    } else {
      Class<?> record = (Class<?>) type;
      if (!property.path("$ref").asString("").equals("#/$defs/" + record.getSimpleName())) {
        problems.add(where + " does not refer to " + record.getSimpleName());
      }
      check(record, known.path(record.getSimpleName()), known, problems, seen);
    }
  }

  private static void expect(String kind, JsonNode property, String where, List<String> problems) {
    if (!property.path("type").asString("").equals(kind)) {
      problems.add(where + " is no " + kind);
    }
  }
}
