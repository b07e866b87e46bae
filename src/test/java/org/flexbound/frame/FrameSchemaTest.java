package org.flexbound.frame;

import static org.assertj.core.api.Assertions.assertThat;

import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.Set;
import java.util.TreeSet;
import org.flexbound.document.JsonFile;
import org.flexbound.finding.Severity;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The published schema and the reader say the same of sound and of broken models. */
class FrameSchemaTest {
  private static String text;
  private static Schema schema;

  @BeforeAll
  static void read() throws IOException {
    try (InputStream in = FrameSchemaTest.class.getResourceAsStream("/schema/frame-model.schema.json")) {
      text = new String(in.readAllBytes(), StandardCharsets.UTF_8);
    }
    schema = SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12).getSchema(text);
  }

  /** Every key and every kind of section once. */
  static final String WHOLE =
      """
      {"$schema": "https://flexbound.org/schema/frame-model.schema.json", "title": "invented",
       "notes": "none", "units": {"length": "mm", "force": "kN", "mass": "kg", "angle": "rad"},
       "up": "+z",
       "nodes": {"a": [0, 0, 0], "b": [0, 0, "3 m"], "c": [2000, 0, 3000], "d": [2000, 10, 3000],
                 "e": [0, 0, 3000]},
       "materials": {"steel": {"E": "210 GPa", "nu": 0.3, "density": "7850 kg/m3",
                               "factors": {"E": 1.05}},
                     "alloy": {"E": 70, "G": 26}},
       "sections": {
         "numbers": {"A": 4000, "Iy": 2e7, "Iz": "1e7 mm^4", "J": 1.5e7, "Ay": 2000, "Az": 1800},
         "round": {"shape": "solid round", "diameter": 50},
         "tube": {"shape": "tube", "diameter": 114.3, "wall": 5},
         "small": {"shape": "tube", "diameter": 80, "wall": 4},
         "plate": {"shape": "rectangle", "depth": 100, "width": 20},
         "box": {"shape": "rectangular hollow", "depth": 100, "width": 60, "wall": 5},
         "i": {"shape": "I", "depth": 200, "width": 100, "web": 5.6, "flange": 8.5, "radius": 12},
         "c": {"shape": "channel", "depth": 200, "width": 75, "web": 8.5, "flange": 11.5},
         "l": {"shape": "angle", "depth": 100, "width": 75, "wall": 8},
         "t": {"shape": "T", "depth": 100, "width": 100, "web": 6, "flange": 9}},
       "joints": {"knee": {"ry": "2 MN·m/rad", "rx": "rigid", "rz": "free", "factors": {"ry": 0.8}},
                  "full": {"matrix": [[1, 0, 0, 0, 0, 0], [0, 1, 0, 0, 0, 0], [0, 0, 1, 0, 0, 0],
                                      [0, 0, 0, 1, 0, 0], [0, 0, 0, 0, 1, 0], [0, 0, 0, 0, 0, 1]]}},
       "members": {"post": {"nodes": ["a", "b"], "section": "tube", "endSection": "small",
                            "material": "steel", "reference": [1, 0, 0],
                            "offsets": {"start": [0, 0, 10], "end": ["0.01 m", 0, 0]},
                            "joints": {"start": "knee", "end": "full"}, "massPerLength": 0.002,
                            "factors": {"EIy": 1.1, "GAz": "5e7 N"}},
                   "arm": {"nodes": ["b", "c"], "section": "i", "material": "alloy"}},
       "connections": {"pad": {"nodes": ["c", "d"], "joint": "full",
                               "axes": {"x": [0, 1, 0], "y": "+z"}, "at": [2000, 5, 3000],
                               "factors": {"x": 2}}},
       "supports": {"a": {"x": "fixed", "y": "fixed", "z": 100, "rx": "fixed", "ry": "free",
                          "rz": "fixed", "axes": {"x": "+x", "y": "+y"}, "factors": {"z": 0.5}},
                    "d": {"y": "fixed"}},
       "rigidLinks": [{"from": "b", "to": "e"}],
       "masses": [{"node": "c", "mass": 12, "inertia": [1, 2, 3], "offset": [0, 0, 50]}]}
      """;

  private static boolean taken(String json) {
    return schema.validate(json, InputFormat.JSON).isEmpty();
  }

  private static boolean read(String json) {
    return !FrameReader.read(JsonFile.parse(json, "model.json").orRefuse()).hasErrors();
  }

  @Test
  void bothTakeAModelWithEveryKeyAndEveryShape() {
    assertThat(FrameReader.read(JsonFile.parse(WHOLE, "model.json").orRefuse()).findings())
        .filteredOn(finding -> finding.severity() != Severity.NOTE)
        .isEmpty();
    assertThat(schema.validate(WHOLE, InputFormat.JSON)).isEmpty();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '~',
      value = {
        "\"nodes\": {|\"points\": {",
        "[0, 0, \"3 m\"]|[0, 0]",
        "[0, 0, \"3 m\"]|3",
        "\"up\": \"+z\"|\"up\": \"upwards\"",
        "\"up\": \"+z\"|\"up\": [0, 1]",
        "\"nu\": 0.3|\"poisson\": 0.3",
        "{\"E\": 70, \"G\": 26}|{\"G\": 26}",
        "\"tube\", \"diameter\": 114.3, \"wall\": 5|\"pipe\", \"diameter\": 114.3, \"wall\": 5",
        "\"tube\", \"diameter\": 114.3, \"wall\": 5|\"tube\", \"diameter\": 114.3",
        "\"shape\": \"rectangle\", \"depth\": 100|\"shape\": \"rectangle\", \"height\": 100",
        "\"J\": 1.5e7, |",
        "\"factors\": {\"EIy\": 1.1|\"factors\": {\"EI\": 1.1",
        "\"factors\": {\"ry\": 0.8}|\"factors\": {\"theta\": 0.8}",
        "\"section\": \"i\", |",
        "\"nodes\": [\"b\", \"c\"]|\"nodes\": [\"b\"]",
        "\"offsets\": {\"start\"|\"offsets\": {\"begin\"",
        "\"joints\": {\"start\"|\"joints\": {\"first\"",
        "[0, 0, 0, 0, 1, 0], [0, 0, 0, 0, 0, 1]]|[0, 0, 0, 0, 1, 0]]",
        "\"joint\": \"full\",|",
        "\"axes\": {\"x\": [0, 1, 0], \"y\": \"+z\"}|\"axes\": {\"x\": [0, 1, 0]}",
        "{\"from\": \"b\", \"to\": \"e\"}|{\"from\": \"b\"}",
        "\"node\": \"c\", \"mass\": 12|\"node\": \"c\"",
        "\"mass\": 12|\"mass\": [12]",
        "\"d\": {\"y\": \"fixed\"}|\"d\": \"fixed\"",
        "\"title\": \"invented\"|\"heading\": \"invented\""
      })
  void bothRefuseWhatHasTheWrongForm(String sound, String broken) {
    assertThat(WHOLE).contains(sound);
    String json = WHOLE.replace(sound, broken == null ? "" : broken);
    assertThat(taken(json)).as("schema").isFalse();
    assertThat(read(json)).as("reader").isFalse();
  }

  @Test
  void theSchemaHasTheKeysOfTheReader() {
    JsonNode properties = JsonMapper.shared().readTree(text).get("properties");
    Set<String> keys = new TreeSet<>(properties.propertyNames());
    keys.removeAll(Set.of("$schema", "title", "notes"));
    assertThat(keys).isEqualTo(new TreeSet<>(FrameReader.KEYS));
  }
}
