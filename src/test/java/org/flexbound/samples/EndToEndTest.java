package org.flexbound.samples;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.apache.poi.ss.usermodel.Row;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.app.Flexbound;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.report.ResultsJson;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.Results;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Whole commands on the samples, as a new user would run them. */
class EndToEndTest {
  private static final String STUDY = SignGantry.FOLDER.resolve("study.json").toString();

  @TempDir static Path shared;
  @TempDir Path folder;

  private static int code;
  private static String printed;
  private static Results results;

  private final StringWriter out = new StringWriter();
  private final StringWriter err = new StringWriter();

  private int run(String... words) {
    return Flexbound.run(words, new PrintWriter(out), new PrintWriter(err));
  }

  @BeforeAll
  static void updateTheGantry() throws IOException {
    StringWriter out = new StringWriter();
    StringWriter err = new StringWriter();
    code =
        Flexbound.run(
            new String[] {"update", STUDY, "--out", shared.toString()},
            new PrintWriter(out),
            new PrintWriter(err));
    printed = out + "\n" + err;
    if (code == 0) {
      results = ResultsJson.parse(Files.readAllBytes(shared.resolve("results.json")));
    }
  }

  private static Parameter parameter(String name) {
    return results.parameters().stream()
        .filter(p -> p.name().equals(name))
        .findFirst()
        .orElseThrow();
  }

  @Test
  void theMainJobEndsWellAndSaysWhereTheReportLies() {
    assertThat(code).as(printed).isZero();
    assertThat(printed).contains(shared.resolve("report.html").toString());
    for (String file :
        List.of(
            "results.json", "results.xlsx", "report.html", "report.pdf", "updated-model.json")) {
      assertThat(shared.resolve(file)).isNotEmptyFile();
    }
    try (Stream<Path> files = Files.list(shared)) {
      assertThat(files).noneMatch(file -> file.toString().endsWith(".part"));
    } catch (IOException refused) {
      throw new java.io.UncheckedIOException(refused);
    }
  }

  @Test
  void identifiedParametersLieWithinTwoPosteriorStandardDeviationsOfTheTruth() {
    Map<String, Double> truth = SignGantry.truth();
    int identified = 0;
    for (Parameter p : results.parameters()) {
      if (p.status().equals("identified")) {
        identified++;
        double expected = Math.log(truth.get(p.scales().get(0)));
        assertThat(Math.abs(p.workingValue() - expected))
            .as(p.name())
            .isLessThan(2 * p.posteriorStandardDeviation());
      }
    }
    assertThat(identified).isGreaterThanOrEqualTo(2);
  }

  @Test
  void theBaseIsKnownWithinTenPerCentAndFoundAtAboutHalf() {
    for (String base : List.of("base, in plane", "base, sideways")) {
      assertThat(parameter(base).status()).isEqualTo("identified");
      assertThat(parameter(base).posteriorStandardDeviation()).isLessThan(0.10);
      assertThat(parameter(base).factor().getAsDouble()).isBetween(0.45, 0.65);
    }
  }

  @Test
  void theJointThatTheTestCannotSeeIsReportedAsNotIdentifiable() {
    assertThat(parameter("sign bracket").status()).isEqualTo("not identifiable from this test");
    assertThat(parameter("sign bracket").varianceRemoved()).isLessThan(0.05);
  }

  @Test
  void theUpdatedModelIsReadBackWithTheFactorsThatWereFound() {
    FrameModel model =
        FrameReader.read(shared.resolve("updated-model.json"), "updated-model.json").orRefuse();
    for (Parameter p : results.parameters()) {
      StiffnessPath path = StiffnessPath.parse(p.scales().get(0)).orElseThrow();
      assertThat(model.stiffness(path).orElseThrow().value())
          .isCloseTo(
              p.updated().getAsDouble(),
              org.assertj.core.api.Assertions.withinPercentage(1e-9));
    }
  }

  @Test
  void theSameInputGivesTheSameBytes() throws IOException {
    assertThat(run("update", STUDY, "--out", folder.toString())).isZero();
    assertThat(folder.resolve("results.json"))
        .hasSameBinaryContentAs(shared.resolve("results.json"));
    assertThat(folder.resolve("updated-model.json"))
        .hasSameBinaryContentAs(shared.resolve("updated-model.json"));
    assertThat(Files.readString(folder.resolve("results.json")))
        .doesNotContain(folder.toString())
        .doesNotContain(System.getProperty("user.dir"));
  }

  /** A change of one sheet. */
  @FunctionalInterface
  private interface Change {
    void make(XSSFWorkbook workbook);
  }

  private void spoil(Change change) throws IOException {
    for (String file : List.of("model.json", "study.json")) {
      Files.copy(SignGantry.FOLDER.resolve(file), folder.resolve(file));
    }
    try (InputStream in = Files.newInputStream(SignGantry.FOLDER.resolve(SignGantry.LOG));
        XSSFWorkbook workbook = new XSSFWorkbook(in)) {
      change.make(workbook);
      try (OutputStream to = Files.newOutputStream(folder.resolve(SignGantry.LOG))) {
        workbook.write(to);
      }
    }
  }

  private static Row rowOf(Sheet sheet, String text) {
    for (Row row : sheet) {
      for (org.apache.poi.ss.usermodel.Cell cell : row) {
        if (cell.toString().equals(text)) {
          return row;
        }
      }
    }
    throw new IllegalArgumentException(text);
  }

  private static int column(Sheet sheet, String heading) {
    for (org.apache.poi.ss.usermodel.Cell cell : sheet.getRow(0)) {
      if (cell.getStringCellValue().equals(heading)) {
        return cell.getColumnIndex();
      }
    }
    throw new IllegalArgumentException(heading);
  }

  @Test
  void fourProblemsComeInOneAnswerAndTheOutputFolderIsNotTouched() throws IOException {
    spoil(
        workbook -> {
          Sheet gauges = workbook.getSheet("Gauges");
          rowOf(gauges, "D1").getCell(column(gauges, "Unit")).setCellValue("furlong");
          rowOf(gauges, "D3").getCell(column(gauges, "Node")).setCellValue("splize");
          workbook.getSheet("pull arm down 2").getRow(4).getCell(5).setCellValue("about nine");
          Sheet run = workbook.getSheet("pull knee side 3");
          run.getRow(0).getCell(column(run, "D6 [mm]")).setCellValue("D66 [mm]");
        });
    Path outputs = Files.createDirectory(folder.resolve("outputs"));
    Files.writeString(outputs.resolve("results.json"), "earlier");
    int code = run("update", folder.resolve("study.json").toString(), "--out", outputs.toString());
    assertThat(code).as(err.toString()).isEqualTo(3);
    assertThat(err.toString())
        .contains("sheet Gauges, cell F2")
        .contains("furlong")
        .contains("splize")
        .contains("sheet pull arm down 2, cell F5")
        .contains("about nine")
        .contains("sheet pull knee side 3")
        .contains("D6")
        .contains("Nothing was written");
    assertThat(out.toString()).isEmpty();
    assertThat(outputs.resolve("results.json")).hasContent("earlier");
    try (Stream<Path> files = Files.list(outputs)) {
      assertThat(files).hasSize(1);
    }
  }

  @Test
  void aMissingFileIsRefusedByName() {
    assertThat(run("reduce", folder.resolve("nothing.xlsx").toString())).isEqualTo(3);
    assertThat(err.toString()).contains("nothing.xlsx");
  }

  @Test
  void aFolderThatCannotBeWrittenToIsASystemProblem() throws IOException {
    Path file = Files.writeString(folder.resolve("a-file"), "");
    int code =
        run(
            "reduce",
            LoadCellRecord.FOLDER.resolve(LoadCellRecord.LOG).toString(),
            "--out",
            file.resolve("below").toString());
    assertThat(code).as(err.toString()).isEqualTo(6);
    assertThat(err.toString()).contains("a-file");
  }

  @Test
  void theLoadCellRecordIsReducedAndItsCurvatureIsFound() throws IOException {
    int code =
        run(
            "reduce",
            LoadCellRecord.FOLDER.resolve(LoadCellRecord.LOG).toString(),
            "--out",
            folder.toString());
    assertThat(code).as(err.toString()).isZero();
    Results record = ResultsJson.parse(Files.readAllBytes(folder.resolve("results.json")));
    assertThat(record.coefficients()).hasSize(1);
    // 0.723 is the slope of the certified quadratic at the middle of the range, per 10^6 N.
    assertThat(record.coefficients().get(0).value())
        .isCloseTo(0.7222e-9, org.assertj.core.api.Assertions.within(0.002e-9));
  }

  @Test
  void theTemplatesExampleRunsAsItStandsAndTheBlankLogSaysWhatToFillIn() {
    Path templates = folder.resolve("my-test");
    assertThat(run("template", templates.toString())).isZero();
    assertThat(templates.resolve("load-test-log.xlsx")).isNotEmptyFile();
    int code =
        run(
            "update",
            templates.resolve("study.json").toString(),
            "--out",
            folder.resolve("out").toString());
    assertThat(code).as(out + "\n" + err).isZero();
    int blank = run("reduce", templates.resolve("load-test-log.xlsx").toString());
    assertThat(blank).isEqualTo(3);
    assertThat(err.toString()).contains("load-test-log.xlsx").contains("Gauges");
  }

  @Test
  void templatesThatAreThereAlreadyAreLeftAsTheyAre() throws IOException {
    Files.writeString(folder.resolve("study.json"), "mine");
    assertThat(run("template", folder.toString())).isZero();
    assertThat(folder.resolve("study.json")).hasContent("mine");
    assertThat(out.toString()).contains("left as it is");
  }
}
