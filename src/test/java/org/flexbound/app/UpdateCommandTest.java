package org.flexbound.app;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.report.ResultsJson;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.Results;
import org.flexbound.solve.Derivative;
import org.flexbound.solve.FlexibilitySolution;
import org.flexbound.solve.FrameFlexibility;
import org.flexbound.testlog.LogFile;
import org.flexbound.testlog.LogSheets;
import org.flexbound.testlog.TestLog;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The command update in an empty folder, from the templates. */
class UpdateCommandTest {
  @TempDir private Path folder;

  private StringWriter out = new StringWriter();
  private StringWriter err = new StringWriter();

  private int run(String... words) {
    out = new StringWriter();
    err = new StringWriter();
    return Flexbound.run(words, new PrintWriter(out), new PrintWriter(err));
  }

  @BeforeEach
  void templates() {
    run("template", folder.toString());
  }

  /** Writes the template's study with something put before its key {@code rule}. */
  private String study(String name, String more) throws IOException {
    String text = Files.readString(folder.resolve("study.json"));
    assertThat(text).contains("\"rule\"");
    Files.writeString(folder.resolve(name), text.replace("\"rule\"", more + "\"rule\""));
    return folder.resolve(name).toString();
  }

  private Results results(String folderName) throws IOException {
    return ResultsJson.parse(
        Files.readAllBytes(folder.resolve(folderName).resolve("results.json")));
  }

  @Test
  void beforeTheTestItSaysWhatEachParameterWouldGet() throws IOException {
    String out1 = folder.resolve("one").toString();
    assertThat(run("update", "--before-test", study("a.json", ""), "--out", out1)).isZero();
    assertThat(out.toString())
        .contains("What the test would tell, if the nominal model were true", "wall plate")
        .contains("no repeatability is stated");
    Results results = results("one");
    assertThat(results.coefficients()).isEmpty();
    assertThat(results.plan().orElseThrow().loads()).hasSize(2);
    assertThat(results.parameters()).extracting(Parameter::status).contains("identified");
    assertThat(Files.readString(folder.resolve("one/report.html")))
        .contains("Before the test", "This is a forecast");
    assertThat(folder.resolve("one/updated-model.json")).doesNotExist();
  }

  @Test
  void aPlanNeedsNoReadingsButTheSizeOfItsLoads() throws IOException {
    LogSheets.withoutReadings(
        folder.resolve("example-log.xlsx"), folder.resolve("plan.xlsx"), true);
    LogSheets.withoutReadings(
        folder.resolve("example-log.xlsx"), folder.resolve("unsized.xlsx"), false);
    String study =
        study("a.json", "\"reduction\": {\"statedRepeatability\": 0.5}, ");
    String text = Files.readString(Path.of(study));
    Files.writeString(Path.of(study), text.replace("example-log.xlsx", "plan.xlsx"));
    assertThat(run("update", study, "--out", folder.resolve("no").toString())).isEqualTo(3);
    assertThat(err.toString()).contains("LOG-NO-READINGS");
    assertThat(run("update", "--before-test", study, "--out", folder.resolve("one").toString()))
        .isZero();
    assertThat(out.toString()).contains("stated limit, runs assumed, repeatability stated");
    Files.writeString(Path.of(study), text.replace("example-log.xlsx", "unsized.xlsx"));
    assertThat(run("update", "--before-test", study, "--out", folder.resolve("no").toString()))
        .isEqualTo(3);
    assertThat(err.toString()).contains("RED-PLAN-INCOMPLETE").contains("tip down");
    assertThat(folder.resolve("no")).doesNotExist();
  }

  @Test
  void whatTheStudyStatesOverridesTheLogWithAFinding() throws IOException {
    String study =
        study(
            "a.json",
            "\"reduction\": {\"fitRangeLower\": 30, \"gauges\": {\"tip\": {\"fitRangeLower\": 25}}},");
    assertThat(run("update", study, "--out", folder.resolve("one").toString())).isZero();
    Results results = results("one");
    assertThat(results.options())
        .anySatisfy(
            option -> assertThat(option.value()).contains("30"));
    LogSheets.withOption(
        folder.resolve("example-log.xlsx"), folder.resolve("stated.xlsx"), "Fit range lower", 5);
    Files.writeString(
        Path.of(study),
        Files.readString(Path.of(study)).replace("example-log.xlsx", "stated.xlsx"));
    assertThat(run("update", study, "--out", folder.resolve("one").toString())).isZero();
    assertThat(out.toString())
        .contains("LOG-OVERRIDDEN")
        .contains("'Fit range lower' takes the place of what stated.xlsx, sheet Options")
        .contains("(30 in place of 5)");
  }

  @Test
  void severalStartsHeldOutLoadCasesAndTheTableWithoutEachAreReachable() throws IOException {
    String study = study("a.json", "\"starts\": 3, \"heldOut\": [\"mid down\"], ");
    assertThat(run("update", study, "--out", folder.resolve("one").toString())).isZero();
    assertThat(out.toString()).contains("3 starts agree").contains("validated: held-out");
    Results results = results("one");
    assertThat(results.update().orElseThrow().starts()).hasSize(3);
    assertThat(results.validation()).hasSize(2);
    assertThat(run("update", study("b.json", ""), "--out", folder.resolve("two").toString()))
        .isZero();
    assertThat(results("two").update().orElseThrow().withoutLoadCase())
        .hasSize(2)
        .allSatisfy(left -> assertThat(left.parameters()).hasSize(2));
    String page = Files.readString(folder.resolve("two/report.html"));
    assertThat(page)
        .contains("The estimate without each load case", "Which coefficient pulls what")
        .contains("How the update ended");
  }

  @Test
  void aModelThatCannotReachTheTestEndsUndecidedAndSaysWhy() throws IOException {
    String study = study("a.json", "");
    Files.writeString(
        Path.of(study),
        Files.readString(Path.of(study))
            .replace("\"lower\": 0.2", "\"lower\": 0.95")
            .replace("\"upper\": 5", "\"upper\": 1.05"));
    assertThat(run("update", study, "--out", folder.resolve("one").toString())).isEqualTo(5);
    assertThat(out.toString()).contains("misfits even at best").contains("on its bound");
    assertThat(results("one").update().orElseThrow().unexplained().correctionSize())
        .isGreaterThan(0);
  }

  /** Writes the flexibility of the template's frame as a table from elsewhere, at some factors. */
  private void table(String name, double plate, double arm) throws IOException {
    FrameModel frame =
        FrameReader.read(folder.resolve("frame-model.json"), "frame-model.json").orRefuse();
    TestLog log = LogFile.read(folder.resolve("example-log.xlsx"), "example-log.xlsx").orRefuse();
    List<StiffnessPath> paths =
        Stream.of("supports.wall.ry", "members.inner.EIy", "members.outer.EIy")
            .map(path -> StiffnessPath.parse(path).orElseThrow())
            .toList();
    FlexibilitySolution solution =
        FrameFlexibility.prepare(frame, log.gauges(), log.loads(), paths)
            .orRefuse()
            .solve(
                List.of(
                    new StiffnessSetting.Factor(plate),
                    new StiffnessSetting.Factor(arm),
                    new StiffnessSetting.Factor(arm)));
    StringBuilder text = new StringBuilder("Gauge;Load;Value [mm/kN];wall plate;arm bending\n");
    for (int g = 0; g < log.gauges().size(); g++) {
      for (int l = 0; l < log.loads().size(); l++) {
        text.append(log.gauges().get(g).name() + ";" + log.loads().get(l).name());
        text.append(";" + 1e6 * solution.value(g, l));
        text.append(";" + 1e6 * solution.derivative(0, Derivative.LOGARITHM)[g][l]);
        text.append(
            ";"
                + 1e6
                    * (solution.derivative(1, Derivative.LOGARITHM)[g][l]
                        + solution.derivative(2, Derivative.LOGARITHM)[g][l]));
        text.append("\n");
      }
    }
    Files.writeString(folder.resolve(name), text);
  }

  @Test
  void aModelHeldElsewhereIsUpdatedByItsTableOneStepOrSeveral() throws IOException {
    assertThat(run("update", study("a.json", ""), "--out", folder.resolve("frame").toString()))
        .isZero();
    List<Parameter> frame = results("frame").parameters();
    table("table.csv", 1, 1);
    String text =
        Files.readString(folder.resolve("study.json"))
            .replace("\"model\": \"frame-model.json\",", "\"outsideFlexibility\": \"table.csv\",");
    assertThat(text).contains("outsideFlexibility");
    String study = folder.resolve("b.json").toString();
    Files.writeString(Path.of(study), text);
    assertThat(run("update", study, "--out", folder.resolve("one").toString())).isZero();
    assertThat(out.toString()).contains("UPDATE-LINEAR-STEP");
    Results one = results("one");
    assertThat(one.comparison()).hasSameSizeAs(results("frame").comparison());
    assertThat(one.inputs()).anySatisfy(i -> assertThat(i.file()).isEqualTo("table.csv"));
    assertThat(folder.resolve("one/updated-model.json")).doesNotExist();
    for (int k = 0; k < 2; k++) {
      // a cantilever is determinate: its flexibility is exactly linear in every compliance
      assertThat(one.parameters().get(k).factor().orElseThrow())
          .isCloseTo(frame.get(k).factor().orElseThrow(), within(1e-6));
      assertThat(one.parameters().get(k).status()).isEqualTo(frame.get(k).status());
    }
    double plate = frame.get(0).factor().orElseThrow();
    double arm = frame.get(1).factor().orElseThrow();
    table("second.csv", plate, arm);
    Files.writeString(
        Path.of(study),
        text.replace(
            "\"table.csv\"",
            "[\"table.csv\", {\"table\": \"second.csv\", \"at\": {\"wall plate\": "
                + plate
                + ", \"arm bending\": "
                + arm
                + "}}]"));
    assertThat(run("update", study, "--out", folder.resolve("two").toString())).isZero();
    assertThat(out.toString())
        .contains("UPDATE-STEP-FORETOLD")
        .doesNotContain("UPDATE-LINEAR-STEP");
    assertThat(results("two").parameters().get(0).factor().orElseThrow())
        .isCloseTo(plate, within(1e-6));
    assertThat(run("update", "--before-test", study, "--out", folder.resolve("p").toString()))
        .isZero();
    Files.writeString(
        Path.of(study), text.replace("\"table.csv\"", "{\"table\": \"table.csv\", \"at\": {\"plate\": 2}}"));
    assertThat(run("update", study, "--out", folder.resolve("no").toString())).isEqualTo(3);
    assertThat(err.toString()).contains("'plate' under 'at'");
  }
}
