package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import tools.jackson.core.util.DefaultIndenter;
import tools.jackson.core.util.DefaultPrettyPrinter;
import tools.jackson.databind.SerializationFeature;
import tools.jackson.databind.json.JsonMapper;

/** Makes the published schema of a log's description from the definitions that the reader uses. */
final class DescriptionSchema {
  /** Columns that hold a number, or a number with its unit as text. */
  private static final List<String> NUMBERS =
      List.of(
          "Uncertainty of reading (%)",
          "Uncertainty fixed",
          "Resolution",
          "Range",
          "Share",
          "Limit",
          "X",
          "Y",
          "Z",
          "Position uncertainty",
          "Angle uncertainty",
          "At",
          "Temperature",
          "Lower",
          "Upper",
          "Value",
          "Standard uncertainty",
          "Degrees of freedom");

  private DescriptionSchema() {}

  static String text() {
    DefaultIndenter lines = new DefaultIndenter("  ", "\n");
    return JsonMapper.builder()
            .enable(SerializationFeature.INDENT_OUTPUT)
            .defaultPrettyPrinter(new DefaultPrettyPrinter().withObjectIndenter(lines))
            .build()
            .writeValueAsString(schema())
        + "\n";
  }

  private static Map<String, Object> schema() {
    Map<String, Object> properties = new LinkedHashMap<>();
    properties.put("$schema", described("This schema.", "type", "string"));
    properties.put(
        "test", items(SheetLayout.TEST, DescriptionKeys.byKey(SheetLayout.TEST_ITEMS), Map.of()));
    for (SheetLayout layout : DescriptionKeys.LISTS) {
      properties.put(DescriptionKeys.of(layout.name()), list(layout));
    }
    properties.put("coefficients", coefficients());
    properties.put("readings", readings());
    properties.put("runs", list(SheetLayout.RUNS_IN_FILES));
    properties.put("options", options());
    Map<String, Object> ordered = new LinkedHashMap<>();
    DescriptionKeys.top().forEach(key -> ordered.put(key, properties.remove(key)));
    if (!properties.isEmpty()) {
      throw new IllegalStateException("keys that the reader does not know: " + properties.keySet());
    }
    Map<String, Object> schema = new LinkedHashMap<>();
    schema.put("$schema", "https://json-schema.org/draft/2020-12/schema");
    schema.put("$id", "https://flexbound.org/schema/log-description.schema.json");
    schema.put("title", "Description of a load-test log of flexbound");
    schema.put(
        "description",
        "Says what the sheets of the load-test workbook say, and names the files, sheets and"
            + " columns in which the readings stand. File names are relative to the folder of the"
            + " description. A value with a unit may be a text such as \"0.5 mm\".");
    schema.putAll(object(ordered, List.of("loadPoints", "gauges")));
    schema.put(
        "oneOf",
        List.of(
            Map.of("required", List.of("readings")), Map.of("required", List.of("coefficients"))));
    return schema;
  }

  private static Map<String, Object> described(String text, Object... pairs) {
    Map<String, Object> map = new LinkedHashMap<>();
    for (int k = 0; k < pairs.length; k += 2) {
      map.put(String.valueOf(pairs[k]), pairs[k + 1]);
    }
    map.put("description", text.substring(0, 1).toUpperCase(java.util.Locale.ROOT) + text.substring(1));
    return map;
  }

  private static Map<String, Object> object(Map<String, Object> properties, List<String> required) {
    Map<String, Object> map = new LinkedHashMap<>();
    map.put("type", "object");
    map.put("additionalProperties", false);
    if (!required.isEmpty()) {
      map.put("required", required);
    }
    map.put("properties", properties);
    return map;
  }

  private static Map<String, Object> items(
      SheetLayout layout, Map<String, String> byKey, Map<String, String> help) {
    Map<String, Object> properties = new LinkedHashMap<>();
    byKey.forEach(
        (key, name) ->
            properties.put(
                key, described(help.getOrDefault(name, name + "."), "type", List.of("string", "number"))));
    Map<String, Object> map = object(properties, List.of());
    map.put("description", layout.help());
    return map;
  }

  private static Map<String, Object> options() {
    Map<String, Object> map =
        items(
            SheetLayout.OPTIONS,
            DescriptionKeys.byKey(OptionsReader.ITEMS.keySet()),
            OptionsReader.ITEMS);
    @SuppressWarnings("unchecked") // made so above
    Map<String, Object> properties = (Map<String, Object>) map.get("properties");
    Map<String, String> own = new LinkedHashMap<>();
    OptionsReader.OF_A_GAUGE.forEach(name -> own.put(name, OptionsReader.ITEMS.get(name)));
    Map<String, Object> gauge =
        items(SheetLayout.OPTIONS, DescriptionKeys.byKey(OptionsReader.OF_A_GAUGE), own);
    gauge.put("description", "Options of one gauge.");
    properties.put(
        "gauges",
        described("options by the gauge's name", "type", "object", "additionalProperties", gauge));
    return map;
  }

  private static Map<String, Object> list(SheetLayout layout) {
    boolean runs = layout.equals(SheetLayout.RUNS_IN_FILES);
    Map<String, Object> properties = new LinkedHashMap<>();
    List<String> required = new ArrayList<>();
    for (SheetLayout.Column column : layout.columns()) {
      String key = DescriptionKeys.of(column.name());
      if (runs && (column.name().equals("Column") || column.name().equals("Load or gauge"))) {
        properties.putIfAbsent(
            DescriptionKeys.COLUMNS,
            described(
                "what columns read in this run: the load or gauge by the column's header",
                "type",
                "object",
                "additionalProperties",
                Map.of("type", "string")));
        continue;
      }
      // a log of coefficients has no columns of readings
      if (column.required() && !column.name().equals("Column")) {
        required.add(key);
      }
      properties.put(key, column(column));
    }
    Map<String, Object> map = new LinkedHashMap<>();
    map.put("type", "array");
    map.put("description", layout.help());
    map.put("items", object(properties, required));
    return map;
  }

  private static Map<String, Object> coefficients() {
    Map<String, Object> file = new LinkedHashMap<>();
    DescribedFiles.OF_A_TABLE.forEach(
        key -> file.put(key, reading(key, DescriptionKeys.OF_READINGS.get(key))));
    Map<String, Object> elsewhere = object(file, List.of("file"));
    elsewhere.put("description", "The file that holds the table.");
    return described(
        SheetLayout.COEFFICIENTS.help(),
        "oneOf",
        List.of(list(SheetLayout.COEFFICIENTS), elsewhere));
  }

  private static Map<String, Object> column(SheetLayout.Column column) {
    String name = column.name();
    if (column.choices().equals(List.of("yes", "no"))) {
      return described(column.help(), "enum", List.of("yes", "no", true, false));
    }
    if (!column.choices().isEmpty()) {
      List<String> words = new ArrayList<>(column.choices());
      if (words.contains("limits ±")) {
        words.add("limits");
      }
      return described(column.help(), "enum", words);
    }
    if (name.endsWith(" row")) {
      return described(column.help(), "type", "integer", "minimum", 1);
    }
    if (name.equals("Direction") || name.equals("Section point")) {
      return described(
          column.help(),
          "oneOf",
          List.of(
              Map.of("type", "string"),
              described(
                  "Its numbers.", "type", "array", "items", Map.of("type", "number"))));
    }
    return NUMBERS.contains(name)
        ? described(column.help(), "type", List.of("number", "string"))
        : described(column.help(), "type", List.of("string", "number"));
  }

  private static Map<String, Object> readings() {
    Map<String, Object> properties = new LinkedHashMap<>();
    DescriptionKeys.OF_READINGS.forEach((key, help) -> properties.put(key, reading(key, help)));
    Map<String, Object> items = object(properties, List.of());
    items.put("anyOf", List.of(Map.of("required", List.of("file")), Map.of("required", List.of("files"))));
    Map<String, Object> map = new LinkedHashMap<>();
    map.put("type", "array");
    map.put("minItems", 1);
    map.put("description", "The files with readings, and how each is written.");
    map.put("items", items);
    return map;
  }

  private static Map<String, Object> reading(String key, String help) {
    Map<String, Object> scaled = new LinkedHashMap<>();
    scaled.put("unit", described("The unit of the scaled numbers.", "type", "string"));
    scaled.put("scale", described("What each number is multiplied by, not 0.", "type", "number"));
    return switch (key) {
      case "headerRow", "unitsRow", "firstRow", "lastRow" ->
          described(help, "type", "integer", "minimum", 1);
      case "files", "sheets", "columnNames" ->
          described(help, "type", "array", "items", Map.of("type", "string"));
      case "decimalSign" -> described(help, "enum", List.of(".", ","));
      case "noReading" ->
          described(
              help,
              "oneOf",
              List.of(
                  described("One of them.", "type", List.of("string", "number")),
                  described(
                      "Several.", "type", "array", "items",
                      Map.of("type", List.of("string", "number")))));
      case "columns" ->
          described(
              help,
              "type",
              "object",
              "additionalProperties",
              described(
                  "A unit, or unit and scale.",
                  "oneOf",
                  List.of(
                      described("The unit.", "type", "string"),
                      object(scaled, List.of()))));
      default -> described(help, "type", "string");
    };
  }
}
