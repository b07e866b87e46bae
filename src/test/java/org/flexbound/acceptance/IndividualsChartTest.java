package org.flexbound.acceptance;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.flexbound.finding.Outcome;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

class IndividualsChartTest {
  @Test
  void thePublishedChartHasItsMeanRangeAndLimits() {
    JsonNode check =
        JsonMapper.shared()
            .readTree(Path.of("src/test/resources/checks/nist-individuals-chart.json").toFile());
    JsonNode data = check.get("values");
    double[] values =
        IntStream.range(0, data.size()).mapToDouble(k -> data.get(k).asDouble()).toArray();
    IndividualsChart chart = IndividualsChart.of(values, values.length);
    double half = check.get("roundedTo").asDouble();
    assertThat(IndividualsChart.D2).isEqualTo(check.get("d2").asDouble());
    assertThat(3 / IndividualsChart.D2).isCloseTo(2.66, within(0.0005));
    assertThat(chart.centre()).isCloseTo(check.get("mean").asDouble(), within(half));
    assertThat(chart.meanRange())
        .isCloseTo(check.get("meanMovingRange").asDouble(), within(half));
    // the handbook rounds the mean range before it multiplies
    assertThat(chart.upper()).isCloseTo(check.get("upper").asDouble(), within(4 * half));
    assertThat(chart.lower()).isCloseTo(check.get("lower").asDouble(), within(4 * half));
    assertThat(chart.predicted()).isFalse();
  }

  @Test
  void fewerThanEightGiveThePredictionIntervalOfOneFurtherValue() {
    IndividualsChart chart = IndividualsChart.of(new double[] {1, 2, 3, 4, 5}, 5);
    assertThat(chart.predicted()).isTrue();
    // s² = 2.5; t(0.99865; 4) = 6.62 (tables of 3-sigma t factors)
    assertThat(chart.upper()).isCloseTo(3 + 6.62 * Math.sqrt(2.5 * 1.2), within(0.01));
  }

  private static KeptTest kept(String date, double value) {
    return new KeptTest(
        date + ".json",
        date,
        List.of(new KeptTest.Value("as tested", "g", "p", "", value, "m/N", 0.1, 0.1)),
        List.of(),
        List.of());
  }

  @Test
  void testsAreSortedByDateAndTheLastOneIsNamedWhereItJumps() {
    List<KeptTest> tests = new ArrayList<>();
    tests.add(kept("2025-12-01", 6));
    for (int k = 1; k <= 9; k++) {
      tests.add(kept("2025-0" + k + "-01", 3 + 0.1 * (k % 3)));
    }
    Outcome<Trend> outcome = Trend.of(tests, 8);
    Trend.Series series = outcome.orRefuse().series().get(0);
    assertThat(series.outside()).extracting(Trend.Point::date).containsExactly("2025-12-01");
    assertThat(series.outside().get(0).jump()).isTrue();
    assertThat(series.chart().baseline()).isEqualTo(8);
  }

  @Test
  void aTestWithoutADateIsLeftOutWithAFindingAndTwoTestsAreTooFew() {
    Outcome<Trend> outcome =
        Trend.of(List.of(kept("", 1), kept("2025-01-01", 1), kept("2025-02-01", 1)), 8);
    assertThat(outcome.findings())
        .extracting("code")
        .containsExactly("ACCEPT-HISTORY-FILE", "ACCEPT-HISTORY-SHORT");
    assertThat(outcome.value()).isEmpty();
  }
}
