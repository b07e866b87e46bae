package org.flexbound.samples;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.acceptance.ChangeModel;
import org.flexbound.acceptance.ChangeReport;
import org.flexbound.acceptance.Explanation;
import org.flexbound.acceptance.KeptTest;
import org.flexbound.acceptance.Recheck;
import org.flexbound.acceptance.Trend;
import org.flexbound.document.JsonFile;
import org.flexbound.finding.Severity;
import org.flexbound.reduce.Places;
import org.flexbound.reduce.Reducer;
import org.flexbound.reduce.Reduction;
import org.flexbound.reduce.ReductionProblem;
import org.flexbound.report.ResultsJson;
import org.flexbound.report.gather.Gathering;
import org.flexbound.report.gather.HistoryPart;
import org.flexbound.setup.Station;
import org.flexbound.study.Study;
import org.flexbound.study.StudyReader;
import org.flexbound.testlog.LogFile;
import org.flexbound.testlog.TestLog;
import org.flexbound.update.StudyUpdate;
import org.flexbound.update.UpdateProblem;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Twelve dated tests of a fixture, the last with a loosened clamp: the program must name it. */
class ClampingFixtureTest {
  private static final List<KeptTest> KEPT = new ArrayList<>();
  private static Reduction last;

  @TempDir Path folder;

  private static Reduction reduction(String date, TestLog log) {
    Places places =
        station ->
            station instanceof Station.AtNode
                ? Optional.empty()
                : Places.STATED.of(station);
    Reduction reduction =
        Reducer.reduce(new ReductionProblem(Study.ONLY_CONFIGURATION, log, places)).orRefuse();
    assertThat(reduction.findings())
        .as(date)
        .filteredOn(f -> f.severity() == Severity.ERROR)
        .isEmpty();
    return reduction;
  }

  @BeforeAll
  static void reduce() {
    for (String date : ClampingFixture.DATES) {
      Path file = ClampingFixture.FOLDER.resolve("tests").resolve(date).resolve("log.json");
      TestLog log = LogFile.read(file, "log.json").orRefuse();
      last = reduction(date, log);
      Gathering gathering = new Gathering("reduce");
      gathering.configuration(log, "log.json", last, List.of());
      // through the file, as a user would
      KEPT.add(
          HistoryPart.kept(
              date + ".json", ResultsJson.parse(ResultsJson.bytes(gathering.results()))));
    }
  }

  @Test
  void theGeneratorMakesTheTestsAgainByteForByte() throws IOException {
    ClampingFixture.write(folder);
    for (String date : ClampingFixture.DATES) {
      for (String name : List.of("log.json", "readings.csv")) {
        assertThat(Files.readAllBytes(folder.resolve(date).resolve(name)))
            .as(date + " " + name)
            .isEqualTo(
                Files.readAllBytes(
                    ClampingFixture.FOLDER.resolve("tests").resolve(date).resolve(name)));
      }
    }
  }

  @Test
  void theTrendNamesTheLastTestAtTheLooseClampAndNoEarlierOneThere() {
    Trend trend = Trend.of(KEPT, 8).orRefuse();
    Trend.Series clamp =
        trend.series().stream()
            .filter(s -> s.name().equals("clamp B under push z"))
            .findFirst()
            .orElseThrow();
    assertThat(clamp.outside()).extracting(Trend.Point::date).containsExactly("2026-01-13");
    long outside =
        trend.series().stream()
            .filter(s -> s.outside().stream().anyMatch(p -> p.date().equals("2026-01-13")))
            .count();
    long before =
        trend.series().stream()
            .flatMap(s -> s.outside().stream())
            .filter(p -> !p.date().equals("2026-01-13"))
            .count();
    assertThat(outside).isGreaterThan(8);
    assertThat(before).isLessThan(6);
  }

  private static ChangeReport recheck(int before, int now, Optional<ChangeModel> model) {
    return Recheck.compare(KEPT.get(before), KEPT.get(now), model).orRefuse();
  }

  @Test
  void theRecheckNamesTheCoefficientsOfTheLooseClamp() {
    ChangeReport report = recheck(10, 11, Optional.empty());
    assertThat(report.changed()).isTrue();
    assertThat(report.changes())
        .filteredOn(c -> c.now().name().equals("clamp B under push z"))
        .allMatch(c -> c.significant() && c.difference() > 0)
        .hasSize(1);
    assertThat(report.shared()).hasSize(17);
  }

  @Test
  void aNewCalibrationOfTheCellDoesNotCancelAndIsSaid() {
    ChangeReport report = recheck(5, 11, Optional.empty());
    assertThat(report.shared()).hasSize(16).noneMatch(text -> text.startsWith("cell"));
    assertThat(
            Recheck.compare(KEPT.get(5), KEPT.get(11), Optional.empty()).findings())
        .extracting("code")
        .contains("ACCEPT-CALIBRATION-NOT-SHARED");
  }

  @Test
  void withTheModelTheLooseClampAloneExplainsTheChange() {
    Study study =
        StudyReader.read(
                JsonFile.read(ClampingFixture.FOLDER.resolve("study.json"), "study.json")
                    .orRefuse())
            .orRefuse();
    UpdateProblem problem =
        StudyUpdate.problem(study, ClampingFixture.model(), List.of(last.flexibility()))
            .orRefuse();
    ChangeReport report =
        recheck(10, 11, Optional.of(new ChangeModel(problem, KEPT.get(10))));
    Explanation explanation = report.explanation().orElseThrow();
    assertThat(explanation.subsets().get(0).parameters()).contains("clamp B");
    int place = explanation.subsets().get(0).parameters().indexOf("clamp B");
    assertThat(explanation.subsets().get(0).factors().get(place)).isBetween(0.40, 0.50);
  }
}
