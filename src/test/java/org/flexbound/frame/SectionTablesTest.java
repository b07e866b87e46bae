package org.flexbound.frame;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.stream.Stream;
import org.flexbound.document.Json;
import org.flexbound.document.JsonFile;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Sections by shape against published tables. */
class SectionTablesTest {
  private static final String FILE = "section-tables.json";

  static Stream<Json.Members> cases() throws Exception {
    Path file =
        Path.of(
            Objects.requireNonNull(SectionTablesTest.class.getResource("/checks/" + FILE)).toURI());
    Json.Members top = (Json.Members) JsonFile.read(file, FILE).orRefuse();
    return ((Json.Items) top.get("cases").orElseThrow())
        .items().stream().map(item -> (Json.Members) item);
  }

  private static SectionProperties properties(Json.Members section) {
    Map<String, Json> top = new LinkedHashMap<>();
    top.put(
        "units",
        JsonFile.parse(
                "{\"length\": \"mm\", \"force\": \"N\", \"mass\": \"kg\", \"angle\": \"rad\"}", "")
            .orRefuse());
    top.put("nodes", JsonFile.parse("{\"a\": [0, 0, 0]}", "").orRefuse());
    top.put("sections", new Json.Members(section.where(), Map.of("s", section)));
    FrameModel model = FrameReader.read(new Json.Members(section.where(), top)).orRefuse();
    return Objects.requireNonNull(model.sections().get("s")).shape().properties(0.3);
  }

  @ParameterizedTest
  @MethodSource("cases")
  void sectionsByShapeHaveThePublishedProperties(Json.Members check) {
    SectionProperties p = properties((Json.Members) check.get("section").orElseThrow());
    Json.Members expected = (Json.Members) check.get("expected").orElseThrow();
    assertThat(check.get("source")).isPresent();
    double cm4 = 1e-8;
    expected
        .members()
        .forEach(
            (key, value) -> {
              List<Json> pair = ((Json.Items) value).items();
              double wanted = ((Json.Numeral) pair.get(0)).value();
              double allowed = ((Json.Numeral) pair.get(1)).value();
              double found =
                  switch (key) {
                    case "A" -> p.area() / 1e-4;
                    case "Iy", "Iu" -> p.iy() / cm4;
                    case "Iz", "Iv" -> p.iz() / cm4;
                    case "J" -> p.j() / cm4;
                    case "shearCentre" ->
                        Math.hypot(p.shearCentreY(), p.shearCentreZ()) / 1e-2;
                    case "tan" -> Math.abs(Math.tan(p.principalAngle()));
                    default -> throw new IllegalArgumentException(key);
                  };
              assertThat(found)
                  .as("%s of %s", key, check.get("name").orElseThrow())
                  .isCloseTo(wanted, within(allowed));
            });
  }

  @org.junit.jupiter.api.Test
  void theShearCentreOfAThinChannelIsWhereTheClosedFormPutsIt() {
    // e = 3 b² t_f/(h t_w + 6 b t_f) from the centre line of the web (Timoshenko, Strength of
    // Materials, part I), b and h between centre lines.
    ThinChain channel =
        new ThinChain(
            new double[][] {{0.08, -0.1}, {0, -0.1}, {0, 0.1}, {0.08, 0.1}},
            new double[] {0.002, 0.001, 0.002});
    double e = 3 * 0.08 * 0.08 * 0.002 / (0.2 * 0.001 + 6 * 0.08 * 0.002);
    assertThat(channel.shearCentreY()).isCloseTo(-e, within(1e-12));
    assertThat(channel.shearCentreZ()).isCloseTo(0, within(1e-12));
  }

  @org.junit.jupiter.api.Test
  void theShearCentreOfAThinAngleIsItsCorner() {
    ThinChain angle =
        new ThinChain(
            new double[][] {{0, 0.15}, {0, 0}, {0.1, 0}}, new double[] {0.002, 0.002});
    assertThat(angle.shearCentreY()).isCloseTo(0, within(1e-12));
    assertThat(angle.shearCentreZ()).isCloseTo(0, within(1e-12));
  }
}
