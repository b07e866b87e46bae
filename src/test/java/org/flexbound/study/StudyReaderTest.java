package org.flexbound.study;

import static org.assertj.core.api.Assertions.assertThat;

import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import org.flexbound.document.Json;
import org.flexbound.document.JsonFile;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.junit.jupiter.api.Test;

class StudyReaderTest {
  private static final String WHOLE =
      """
      {
        "title": "Invented bracket",
        "model": "frame.json",
        "configurations": [
          {"name": "braced", "log": "a.xlsx"},
          {"name": "unbraced", "log": "b.xlsx", "changes": {"remove": {"members": ["brace"]}}}
        ],
        "flexibility": "full",
        "parameters": {
          "base": {"scales": ["supports.base.ry"], "lower": 0.1, "upper": 10,
                   "priorStandardDeviation": 0.6, "justification": "grout unknown"},
          "knee": {"scales": "joints.knee.rz", "lower": "100 kN·m/rad", "upper": "rigid",
                   "priorStandardDeviation": "1e-8 rad/(N·m)", "working": "compliance"},
          "column": {"scales": ["members.post.EIy", "members.post.EIz"], "lower": 0.8, "upper": 1.2}
        },
        "rule": "discrepancy",
        "heldOut": ["P1", {"configuration": "braced", "load": "P2"}],
        "starts": 3
      }
      """;

  private static Outcome<Study> read(String text) {
    Json json = JsonFile.parse(text, "study.json").orRefuse();
    return StudyReader.read(json);
  }

  @Test
  void readsEveryKeyOfAStudy() {
    Study study = read(WHOLE).orRefuse();
    assertThat(study.model()).contains("frame.json");
    assertThat(study.configurations()).extracting(Configuration::name).containsExactly("braced", "unbraced");
    assertThat(study.configurations().get(1).changes()).isPresent();
    assertThat(study.rule()).isEqualTo(new Rule.Discrepancy());
    assertThat(study.starts()).isEqualTo(3);
    assertThat(study.parameters()).extracting(Parameter::name).containsExactly("base", "knee", "column");
    Parameter knee = study.parameters().get(1);
    assertThat(knee.lower()).isEqualTo(new Level.Stiffness(1e5));
    assertThat(knee.upper()).isEqualTo(new Level.Rigid());
    assertThat(knee.priorStandardDeviation()).contains(new Spread.OfCompliance(1e-8));
    assertThat(knee.working()).isEqualTo(Working.COMPLIANCE);
    assertThat(study.parameters().get(2).priorStandardDeviation()).isEmpty();
    assertThat(study.heldOut().get(0).matches("unbraced", "P1")).isTrue();
    assertThat(study.heldOut().get(1).matches("unbraced", "P2")).isFalse();
  }

  @Test
  void aStudyWithOneLogHasOneConfiguration() {
    Study study = read("{\"model\": \"m.json\", \"log\": \"l.xlsx\"}").orRefuse();
    assertThat(study.configurations()).hasSize(1);
    assertThat(study.configurations().get(0).log()).contains("l.xlsx");
    assertThat(study.rule()).isEqualTo(new Rule.Prior());
  }

  @Test
  void allProblemsComeInOneAnswerEachWithItsPlace() {
    Outcome<Study> outcome =
        read(
            """
            {
              "modle": "frame.json",
              "log": 7,
              "parameters": {
                "a": {"scales": ["joints.knee.q"], "lower": 2, "upper": 1},
                "b": {"scales": ["joints.knee.rz"], "lower": "rigid", "upper": 3},
                "c": {"scales": ["joints.knee.rz"], "lower": "3 kN", "upper": 3},
                "d": {"scales": ["joints.knee.rz"], "lower": 0.5, "upper": 3, "working": "fixity"}
              },
              "rule": "best",
              "flexibility": {"modes": 0}
            }
            """);
    List<String> places =
        outcome.findings().stream().map(f -> f.where().path().orElse("")).toList();
    assertThat(places)
        .contains(
            "/modle",
            "/log",
            "/parameters/a/scales/0",
            "/parameters/a",
            "/parameters/b/lower",
            "/parameters/c/lower",
            "/parameters/d",
            "/rule",
            "/flexibility");
    assertThat(outcome.findings()).extracting(Finding::code).contains("STUDY-MISSING-KEY");
    assertThat(outcome.findings())
        .extracting(Finding::message)
        .anyMatch(m -> m.equals("found \"best\"; expected \"prior\", \"discrepancy\", \"curve-corner\" or a weight above 0"));
  }

  @Test
  void oneStiffnessIsScaledByOneParameterOnly() {
    Outcome<Study> outcome =
        read(
            """
            {"model": "m.json", "log": "l.xlsx", "parameters": {
              "a": {"scales": ["joints.knee.rz"], "lower": 0.5, "upper": 2},
              "b": {"scales": ["joints.knee.rz"], "lower": 0.5, "upper": 2}}}
            """);
    assertThat(outcome.findings()).extracting(Finding::code).containsExactly("STUDY-SCALED-TWICE");
    assertThat(outcome.value()).isPresent();
  }

  @Test
  void theSchemaTakesTheWholeStudyAndRefusesAWrongOne() throws IOException {
    try (InputStream in = StudyReaderTest.class.getResourceAsStream("/schema/study.schema.json")) {
      String text = new String(in.readAllBytes(), StandardCharsets.UTF_8);
      Schema schema =
          SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12).getSchema(text);
      assertThat(schema.validate(WHOLE, com.networknt.schema.InputFormat.JSON)).isEmpty();
      assertThat(
              schema.validate(
                  WHOLE.replace("supports.base.ry", "supports.base.EI"),
                  com.networknt.schema.InputFormat.JSON))
          .isNotEmpty();
    }
  }
}
