package org.flexbound.testlog;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.reduce.Places;
import org.flexbound.reduce.Reducer;
import org.flexbound.reduce.Reduction;
import org.flexbound.reduce.ReductionProblem;
import org.flexbound.setup.StatedCoefficient;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Coefficients that were reduced elsewhere, in place of readings. */
class StatedCoefficientsTest {
  private static final String DESCRIPTION =
      """
      {
        "test": {"lengthUnit": "mm"},
        "loadPoints": [
          {"load": "mid down", "node": "mid", "direction": "-z", "x": 500},
          {"load": "tip down", "node": "tip", "direction": "-z", "x": 1000}
        ],
        "gauges": [
          {"gauge": "mid", "node": "mid", "direction": "-z", "x": 500},
          {"gauge": "tip", "node": "tip", "direction": "-z", "x": 1000}
        ],
        "coefficients": %s
      }
      """;

  @TempDir Path folder;

  private static WorkbookMaker workbook() {
    WorkbookMaker maker = new WorkbookMaker();
    maker.row("Test", "Item", "Entry").row("Test", "Length unit", "mm");
    maker.row("Load points", "Load", "Node", "Direction", "X");
    maker.row("Load points", "mid down", "mid", "-z", 500);
    maker.row("Load points", "tip down", "tip", "-z", 1000);
    maker.row("Gauges", "Gauge", "Node", "Direction", "X");
    maker.row("Gauges", "mid", "mid", "-z", 500).row("Gauges", "tip", "tip", "-z", 1000);
    maker.row("Coefficients", "Gauge", "Load", "Value [mm/kN]", "Standard uncertainty", "Degrees of freedom");
    maker.row("Coefficients", "mid", "mid down", 2.34, 0.01, 12);
    maker.row("Coefficients", "tip", "mid down", 4.95, "0.4 %", null);
    maker.row("Coefficients", "mid", "tip down", 4.94, "20 µm/kN", 8);
    maker.row("Coefficients", "tip", "tip down", 11.55, 0.04, null);
    return maker;
  }

  private Outcome<TestLog> read(WorkbookMaker maker) {
    return LogFile.read(maker.write(folder.resolve("log.xlsx")), "log.xlsx");
  }

  private Outcome<TestLog> read(String coefficients) throws IOException {
    Path file = folder.resolve("log.json");
    Files.writeString(file, DESCRIPTION.formatted(coefficients), StandardCharsets.UTF_8);
    return LogFile.read(file, "log.json");
  }

  private static List<String> problems(Outcome<TestLog> outcome) {
    return outcome.findings().stream()
        .map(finding -> finding.code() + " " + finding.where() + ": " + finding.message())
        .toList();
  }

  @Test
  void aSheetOfCoefficientsGivesAMeasuredMatrixWithTheirUncertainties() {
    Outcome<TestLog> outcome = read(workbook());
    assertThat(outcome.findings()).isEmpty();
    Reduction reduction =
        Reducer.reduce(new ReductionProblem("as tested", outcome.orRefuse(), Places.STATED))
            .orRefuse();
    MeasuredFlexibility flexibility = reduction.flexibility();
    assertThat(flexibility.coefficients()).hasSize(4);
    Coefficient first = flexibility.coefficients().get(0);
    assertThat(first.value()).isCloseTo(2.34e-6, within(1e-20));
    assertThat(first.standardUncertainty()).isCloseTo(1e-8, within(1e-22));
    assertThat(first.degreesOfFreedom()).isEqualTo(12);
    Coefficient cross = flexibility.coefficients().get(1);
    assertThat(cross.standardUncertainty()).isCloseTo(0.004 * 4.95e-6, within(1e-20));
    assertThat(cross.degreesOfFreedom()).isInfinite();
    assertThat(flexibility.scatterDegreesOfFreedom()).isEqualTo(8);
    assertThat(reduction.reciprocity().pairs()).hasSize(1);
    assertThat(reduction.findings()).extracting(Finding::code).containsExactly("RED-STATED");
    assertThat(reduction.findings().get(0).message()).contains("linearity", "faults of gauges");
  }

  @Test
  void baseMotionIsTakenOutOfStatedCoefficientsToo() {
    WorkbookMaker maker = workbook();
    maker.set("Gauges", 0, 3, "Base").set("Gauges", 1, 3, "yes").set("Gauges", 2, 3, null);
    Reduction reduction =
        Reducer.reduce(
                new ReductionProblem("as tested", read(maker).orRefuse(), Places.STATED))
            .orRefuse();
    assertThat(reduction.findings()).extracting(Finding::code)
        .contains("RED-STATED", "RED-BASE-MOTION-LEFT");
  }

  @Test
  void aDescriptionStatesThemItselfOrNamesTheFileThatDoes() throws IOException {
    List<StatedCoefficient> listed =
        read(
                """
                [{"gauge": "mid", "load": "mid down", "value": "2.34 mm/kN", "standardUncertainty": "1 %"},
                 {"gauge": "tip", "load": "tip down", "value": 11.55, "unit": "mm/kN",
                  "standardUncertainty": 0.04, "degreesOfFreedom": 6}]
                """)
            .orRefuse()
            .coefficients();
    Files.writeString(
        folder.resolve("table.csv"),
        """
        Reduced elsewhere; invented
        Gauge;Load;Value [mm/kN];Standard uncertainty [µm/kN];Degrees of freedom
        mid;mid down;2,34;23,4;
        tip;tip down;11,55;40;6
        """,
        StandardCharsets.UTF_8);
    TestLog log =
        read("{\"file\": \"table.csv\", \"separator\": \";\", \"decimalSign\": \",\"}").orRefuse();
    assertThat(log.coefficients())
        .usingRecursiveFieldByFieldElementComparatorIgnoringFields("where")
        .usingComparatorForType((a, b) -> Math.abs(a - b) < 1e-18 ? 0 : Double.compare(a, b), Double.class)
        .isEqualTo(listed);
    assertThat(log.inputs()).extracting(InputFile::file).containsExactly("log.json", "table.csv");
  }

  @Test
  void everyProblemIsNamedWithItsCellInOneAnswer() {
    WorkbookMaker maker = workbook();
    maker.set("Coefficients", 1, 0, "midd").set("Coefficients", 2, 3, null);
    maker.set("Coefficients", 3, 2, "4.94 kN").set("Coefficients", 4, 3, -1);
    maker.row("Coefficients", "tip", "mid down", 5, 0.1, 0);
    assertThat(problems(read(maker)))
        .extracting(text -> text.substring(0, text.indexOf(':')))
        .containsExactly(
            "LOG-UNKNOWN-NAME log.xlsx, sheet Coefficients, cell A2",
            "LOG-MISSING-ENTRY log.xlsx, sheet Coefficients, cell D3",
            "LOG-UNIT log.xlsx, sheet Coefficients, cell C4",
            "LOG-OUT-OF-RANGE log.xlsx, sheet Coefficients, cell D5",
            "LOG-TWICE log.xlsx, sheet Coefficients, cell A6");
    assertThat(problems(read(maker)).get(0)).contains("Did you mean 'mid'?");
  }

  @Test
  void aStatedRepeatabilityStandsInForAMissingUncertainty() {
    WorkbookMaker maker = workbook();
    maker.set("Coefficients", 2, 3, null);
    maker.row("Options", "Item", "Entry").row("Options", "Stated repeatability", 2);
    assertThat(read(maker).orRefuse().coefficients().get(1).standardUncertainty())
        .isCloseTo(0.02 * 4.95e-6, within(1e-20));
  }

  @Test
  void coefficientsBesideReadingsAreRefused() {
    WorkbookMaker maker = workbook();
    maker.row("Run 1", "Jack [kN]", "D [mm]").row("Run 1", 0, 0);
    assertThat(problems(read(maker))).singleElement().asString()
        .startsWith("LOG-BOTH log.xlsx, sheet Coefficients").contains("sheet Run 1");
  }

  @Test
  void aTableWithoutAnyUnitIsRefused() {
    WorkbookMaker maker = workbook().set("Coefficients", 0, 2, "Value");
    assertThat(problems(read(maker))).isNotEmpty().allSatisfy(
        text -> assertThat(text).startsWith("LOG-NO-UNIT"));
  }
}
