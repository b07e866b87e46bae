package org.flexbound.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class RepeatedMedianLineTest {
  @Test
  void fourOfTenBadPointsDoNotMoveTheLine() {
    double[] x = new double[10];
    double[] y = new double[10];
    for (int k = 0; k < 10; k++) {
      x[k] = k;
      y[k] = k < 4 ? 100 - 7 * k : 3 + 2 * k;
    }
    RepeatedMedianLine line = RepeatedMedianLine.fit(x, y);
    assertThat(line.slope()).isCloseTo(2, within(1e-12));
    assertThat(line.intercept()).isCloseTo(3, within(1e-12));
    assertThat(line.at(5)).isCloseTo(13, within(1e-12));
  }

  @Test
  void neighboursAtOneLoadSayNothingOfTheSlope() {
    double[] x = {0, 0.001, 0.002, 5, 5.001, 10};
    double[] y = {0, 0.3, -0.3, 5, 5.3, 10};
    assertThat(RepeatedMedianLine.fit(x, y).slope()).isCloseTo(1, within(0.1));
  }

  @Test
  void withoutAnySpreadThereIsNoSlope() {
    assertThat(RepeatedMedianLine.fit(new double[] {1, 1}, new double[] {2, 3}).slope()).isNaN();
  }
}
