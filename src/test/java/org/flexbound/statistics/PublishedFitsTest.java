package org.flexbound.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.assertj.core.data.Percentage;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.ObjectMapper;

/** Line fits against published values; the sources stand in the check files. */
class PublishedFitsTest {
  private static final Path CHECKS = Path.of("src/test/resources/checks");

  static List<JsonNode> of(String kind) throws IOException {
    ObjectMapper mapper = new ObjectMapper();
    try (Stream<Path> files = Files.list(CHECKS)) {
      List<JsonNode> found =
          files
              .filter(file -> file.toString().endsWith(".json"))
              .sorted()
              .map(file -> mapper.readTree(file.toFile()))
              .filter(node -> node.path("kind").asString().equals(kind))
              .toList();
      assertThat(found).as("check files of kind " + kind).isNotEmpty();
      return found;
    }
  }

  static List<JsonNode> regressions() throws IOException {
    return of("regression");
  }

  static List<JsonNode> rounded() throws IOException {
    return of("regression-rounded");
  }

  static List<JsonNode> bothVariables() throws IOException {
    return of("both-variables");
  }

  static List<JsonNode> angleSections() throws IOException {
    return of("angle-section");
  }

  static double[] numbers(JsonNode node) {
    return IntStream.range(0, node.size()).mapToDouble(k -> node.get(k).asDouble()).toArray();
  }

  private static Regression fit(JsonNode check) {
    double[] x = numbers(check.get("x"));
    double[] powers = numbers(check.get("powers"));
    double[][] design = new double[x.length][powers.length];
    for (int row = 0; row < x.length; row++) {
      for (int c = 0; c < powers.length; c++) {
        design[row][c] = Math.pow(x[row], powers[c]);
      }
    }
    return Regression.fit(design, numbers(check.get("y")));
  }

  @ParameterizedTest
  @MethodSource("regressions")
  void certifiedRegressionIsReproduced(JsonNode check) {
    Regression fit = fit(check);
    Percentage close = Percentage.withPercentage(100 * check.get("relativeTolerance").asDouble());
    double[] coefficients = numbers(check.get("coefficients"));
    double[] errors = numbers(check.get("standardErrors"));
    for (int c = 0; c < coefficients.length; c++) {
      assertThat(fit.coefficients()[c]).isCloseTo(coefficients[c], close);
      assertThat(fit.standardError(c)).isCloseTo(errors[c], close);
    }
    assertThat(fit.residualStandardDeviation())
        .isCloseTo(check.get("residualStandardDeviation").asDouble(), close);
  }

  @ParameterizedTest
  @MethodSource("rounded")
  void printedRegressionIsReproducedToItsDigits(JsonNode check) {
    Regression fit = fit(check);
    double[] half = numbers(check.get("halfLastDigits"));
    for (int c = 0; c < 2; c++) {
      assertThat(fit.coefficients()[c])
          .isCloseTo(numbers(check.get("coefficients"))[c], within(half[c]));
      assertThat(fit.standardError(c))
          .isCloseTo(numbers(check.get("standardErrors"))[c], within(half[2 + c]));
    }
    assertThat(fit.residualStandardDeviation())
        .isCloseTo(check.get("residualStandardDeviation").asDouble(), within(half[4]));
    assertThat(fit.covariance()[0][1] / fit.standardError(0) / fit.standardError(1))
        .isCloseTo(check.get("correlation").asDouble(), within(half[5]));
  }

  @ParameterizedTest
  @MethodSource("bothVariables")
  void lineWithErrorsInBothVariablesIsReproduced(JsonNode check) {
    YorkLine line =
        YorkLine.fit(
            numbers(check.get("x")),
            numbers(check.get("y")),
            numbers(check.get("weightX")),
            numbers(check.get("weightY")));
    double tolerance = check.get("tolerance").asDouble();
    assertThat(line.slope()).isCloseTo(check.get("slope").asDouble(), within(tolerance));
    assertThat(line.intercepts().get(0)).isCloseTo(check.get("intercept").asDouble(), within(tolerance));
    assertThat(line.slopeStandardError())
        .isCloseTo(check.get("slopeStandardError").asDouble(), within(tolerance));
    assertThat(line.interceptStandardErrors().get(0))
        .isCloseTo(check.get("interceptStandardError").asDouble(), within(tolerance));
    assertThat(line.sumOfSquares())
        .isCloseTo(check.get("sumOfSquares").asDouble(), within(100 * tolerance));
  }

  @ParameterizedTest
  @MethodSource("angleSections")
  void measuredAngleSectionGivesItsPublishedSlopesAndItsCurvature(JsonNode check) {
    double[] load = numbers(check.get("load"));
    for (JsonNode direction : check.get("directions")) {
      double[] left = numbers(direction.get("left"));
      double[] right = numbers(direction.get("right"));
      double[] u = new double[load.length];
      double[] v = new double[load.length];
      for (int k = 0; k < load.length; k++) {
        u[k] = (left[k] + right[k]) / Math.sqrt(2);
        v[k] = (left[k] - right[k]) / Math.sqrt(2);
      }
      int[] one = new int[load.length];
      assertThat(GroupedLine.fit(load, u, one).slope())
          .isCloseTo(
              direction.get("slopeU").asDouble(), within(check.get("tolerance").asDouble()));
      assertThat(GroupedLine.fit(load, v, one).slope())
          .isCloseTo(
              direction.get("slopeV").asDouble(), within(check.get("tolerance").asDouble()));
      double f = GroupedLine.curvature(load, u, one).f();
      double printed = direction.get("quadraticF").asDouble();
      assertThat(f).isCloseTo(printed, within(0.5 * (printed < 1 ? 0.1 : 1)));
    }
  }
}
