package org.flexbound.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class RobustLineTest {
  /**
   * International telephone calls from Belgium, tens of millions, 1950 to 1973; six years were counted in minutes (Rousseeuw &amp; Leroy, Robust
   * Regression and Outlier Detection, 1987, table 2.3; numbers quoted from memory). Published bisquare fits have a slope of 1.10 (Venables &amp;
   * Ripley, Modern Applied Statistics with S, 4th ed., 6.5; from memory).
   */
  private static final double[] CALLS = {4.4, 4.7, 4.7, 5.9, 6.6, 7.3, 8.1, 8.8, 10.6, 12.0, 13.5, 14.9, 16.1, 21.2, 119.0, 124.0, 142.0, 159.0,
      182.0, 212.0, 43.0, 24.0, 27.0, 29.0};

  @Test
  void sixYearsCountedInMinutesDoNotMoveTheTelephoneCalls() {
    double[] years = new double[CALLS.length];
    Arrays.setAll(years, k -> 50 + k);
    RobustLine line = RobustLine.fit(years, CALLS, new int[CALLS.length]);
    assertThat(line.slope()).isCloseTo(1.10, within(0.02));
    assertThat(GroupedLine.fit(years, CALLS, new int[CALLS.length]).slope()).isCloseTo(5.04, within(0.01));
    assertThat(line.weights().subList(14, 20)).allMatch(weight -> weight == 0);
  }

  @Test
  void anExactLineIsFoundExactlyInEveryGroup() {
    double[] x = {0, 1, 2, 3, 3, 2, 1, 0};
    double[] y = {1, 3, 5, 7, 8, 6, 4, 2};
    RobustLine line = RobustLine.fit(x, y, new int[] {0, 0, 0, 0, 1, 1, 1, 1});
    assertThat(line.slope()).isCloseTo(2, within(1e-14));
    assertThat(line.intercepts()).containsEntry(0, 1.0).containsEntry(1, 2.0);
    assertThat(line.slopeStandardError()).isZero();
  }

  @Test
  void itsStandardErrorIsThatOfItsScatter() {
    Random random = new Random(5);
    int n = 40;
    int tests = 1000;
    double squares = 0;
    double expected = 0;
    double[] x = new double[n];
    Arrays.setAll(x, k -> k);
    for (int test = 0; test < tests; test++) {
      double[] y = new double[n];
      Arrays.setAll(y, k -> 3 * k + random.nextGaussian());
      RobustLine line = RobustLine.fit(x, y, new int[n]);
      squares += (line.slope() - 3) * (line.slope() - 3) / tests;
      expected += line.slopeStandardError() * line.slopeStandardError() / tests;
    }
    // the ratio of two variances of 1000 values each has a standard error of some 5 %
    assertThat(squares / expected).isCloseTo(1, within(0.2));
  }
}
