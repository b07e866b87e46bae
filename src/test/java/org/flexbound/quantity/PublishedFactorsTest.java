package org.flexbound.quantity;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.ObjectMapper;

/** Conversion factors against a published table; the source stands in the check file. */
class PublishedFactorsTest {
  private static final JsonNode TABLE =
      new ObjectMapper()
          .readTree(Path.of("src/test/resources/checks/nist-sp-811-appendix-b8.json").toFile());

  static List<JsonNode> factors() {
    List<JsonNode> all = new ArrayList<>();
    TABLE.get("factors").forEach(all::add);
    assertThat(all).hasSizeGreaterThan(30);
    return all;
  }

  @ParameterizedTest
  @MethodSource("factors")
  void theFactorIsThePublishedOne(JsonNode factor) throws UnitException {
    double published = factor.get("si").asDouble();
    double tolerance =
        factor.get("exact").asBoolean()
            ? 4 * Math.ulp(published)
            : published * TABLE.get("relativeToleranceOfRounded").asDouble();
    assertThat(Units.parse(factor.get("spelling").asString()).siFactor())
        .isCloseTo(published, within(tolerance));
  }
}
