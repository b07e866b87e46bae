package org.flexbound.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.flexbound.statistics.PublishedFitsTest.numbers;

import java.io.IOException;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.hipparchus.linear.MatrixUtils;
import org.hipparchus.linear.RealMatrix;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import tools.jackson.databind.JsonNode;

/** Weighted fits and fits with correlated errors against the standard for calibration lines and against each other. */
class CalibrationLinesTest {
  static List<JsonNode> weighted() throws IOException {
    return PublishedFitsTest.of("weighted-line");
  }

  static List<JsonNode> correlated() throws IOException {
    return PublishedFitsTest.of("correlated-line");
  }

  private static double[] exact(int n) {
    double[] weights = new double[n];
    Arrays.fill(weights, Double.POSITIVE_INFINITY);
    return weights;
  }

  private static RealMatrix matrix(JsonNode rows) {
    RealMatrix matrix = MatrixUtils.createRealMatrix(rows.size(), rows.size());
    for (int r = 0; r < rows.size(); r++) {
      for (int c = 0; c < rows.size(); c++) {
        matrix.setEntry(r, c, rows.get(r).get(c).asDouble());
      }
    }
    return matrix;
  }

  @ParameterizedTest
  @MethodSource("weighted")
  void weightedLineOfTheStandardIsReproduced(JsonNode check) {
    for (JsonNode example : check.get("examples")) {
      double[] x = numbers(example.get("x"));
      double[] weightY = Arrays.stream(numbers(example.get("standardUncertaintyY"))).map(u -> 1 / (u * u)).toArray();
      YorkLine line = YorkLine.fit(x, numbers(example.get("y")), exact(x.length), weightY);
      double tolerance = check.get("tolerance").asDouble();
      assertThat(line.slope()).isCloseTo(example.get("slope").asDouble(), within(tolerance));
      assertThat(line.intercepts().get(0)).isCloseTo(example.get("intercept").asDouble(), within(tolerance));
      assertThat(line.slopeStandardError()).isCloseTo(example.get("slopeStandardError").asDouble(), within(tolerance));
      assertThat(line.interceptStandardErrors().get(0))
          .isCloseTo(example.get("interceptStandardError").asDouble(), within(tolerance));
      assertThat(line.sumOfSquares()).isCloseTo(example.get("sumOfSquares").asDouble(), within(tolerance));
    }
  }

  @ParameterizedTest
  @MethodSource("correlated")
  void theReferenceReproducesTheCorrelatedLineOfTheStandard(JsonNode check) {
    double[] x = numbers(check.get("x"));
    RealMatrix errors = MatrixUtils.createRealMatrix(2 * x.length, 2 * x.length);
    errors.setSubMatrix(matrix(check.get("covarianceX")).getData(), 0, 0);
    errors.setSubMatrix(matrix(check.get("covarianceY")).getData(), x.length, x.length);
    CorrelatedLine line = CorrelatedLine.fit(x, numbers(check.get("y")), errors);
    double tolerance = check.get("tolerance").asDouble();
    assertThat(line.slope()).isCloseTo(check.get("slope").asDouble(), within(tolerance));
    assertThat(line.intercept()).isCloseTo(check.get("intercept").asDouble(), within(tolerance));
    assertThat(Math.sqrt(line.covariance().getEntry(1, 1)))
        .isCloseTo(check.get("slopeStandardError").asDouble(), within(tolerance));
    assertThat(Math.sqrt(line.covariance().getEntry(0, 0)))
        .isCloseTo(check.get("interceptStandardError").asDouble(), within(tolerance));
    assertThat(line.covariance().getEntry(0, 1)).isCloseTo(check.get("covariance").asDouble(), within(tolerance));
    assertThat(line.sumOfSquares()).isCloseTo(check.get("sumOfSquares").asDouble(), within(tolerance));
  }

  @Test
  void aLineWithErrorsInBothVariablesAgreesWithTheReference() {
    Random random = new Random(11);
    for (int trial = 0; trial < 20; trial++) {
      int n = 8;
      double[] x = new double[n];
      double[] y = new double[n];
      double[] weightX = new double[n];
      double[] weightY = new double[n];
      RealMatrix errors = MatrixUtils.createRealMatrix(2 * n, 2 * n);
      for (int i = 0; i < n; i++) {
        double ux = 0.02 + 0.2 * random.nextDouble();
        double uy = 0.02 + 0.5 * random.nextDouble();
        x[i] = i + ux * random.nextGaussian();
        y[i] = 1.5 - 2 * i + uy * random.nextGaussian();
        weightX[i] = 1 / (ux * ux);
        weightY[i] = 1 / (uy * uy);
        errors.setEntry(i, i, ux * ux);
        errors.setEntry(n + i, n + i, uy * uy);
      }
      YorkLine line = YorkLine.fit(x, y, weightX, weightY);
      CorrelatedLine reference = CorrelatedLine.fit(x, y, errors);
      assertThat(line.slope()).isCloseTo(reference.slope(), within(1e-10));
      assertThat(line.intercepts().get(0)).isCloseTo(reference.intercept(), within(1e-9));
      assertThat(line.sumOfSquares()).isCloseTo(reference.sumOfSquares(), within(1e-8));
      assertThat(line.slopeStandardError()).isCloseTo(Math.sqrt(reference.covariance().getEntry(1, 1)), within(1e-8));
    }
  }
}
