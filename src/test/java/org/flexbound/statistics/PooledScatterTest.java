package org.flexbound.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class PooledScatterTest {
  @Test
  void floorAndShareAreFoundOnTheAverageOfManyTests() {
    Random random = new Random(20260101);
    double floor = 0;
    double share = 0;
    int tests = 300;
    for (int test = 0; test < tests; test++) {
      double[] values = new double[60];
      double[] variances = new double[60];
      int[] dof = new int[60];
      for (int k = 0; k < values.length; k++) {
        values[k] = 0.1 * (k + 1);
        double sigma = Math.hypot(0.02, 0.01 * values[k]);
        double[] runs = random.doubles(3, 0, 1).map(u -> Quantiles.normal(u) * sigma).toArray();
        double mean = Arrays.stream(runs).average().orElseThrow();
        variances[k] = Arrays.stream(runs).map(v -> (v - mean) * (v - mean)).sum() / 2;
        dof[k] = 2;
      }
      PooledScatter scatter = PooledScatter.fit(values, variances, dof);
      floor += scatter.floorVariance() / tests;
      share += scatter.shareVariance() / tests;
      assertThat(scatter.degreesOfFreedom()).isBetween(20.0, 140.0);
    }
    assertThat(Math.sqrt(floor)).isCloseTo(0.02, within(0.0015));
    assertThat(Math.sqrt(share)).isCloseTo(0.01, within(0.0007));
  }

  @Test
  void singleRunsGiveNoScatter() {
    assertThat(PooledScatter.fit(new double[] {1}, new double[] {0}, new int[] {0}))
        .isEqualTo(new PooledScatter(0, 0, 0));
  }
}
