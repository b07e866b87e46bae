package org.flexbound.reduce;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.flexbound.setup.SlopeFit;
import org.flexbound.statistics.GroupedLine;
import org.junit.jupiter.api.Test;

class SlopeFitterTest {
  private static final int STEPS = 24;

  private static SlopeFitter.Fit fit(double ofLoad, double ofMotion, Random random, SlopeFit how) {
    double[] x = new double[STEPS];
    double[] y = new double[STEPS];
    int[] branch = new int[STEPS];
    for (int k = 0; k < STEPS; k++) {
      branch[k] = k / 12;
      double load = 100 + 10 * (k < 12 ? k : 23 - k);
      x[k] = load + ofLoad * random.nextGaussian();
      y[k] = 2 * load + branch[k] + ofMotion * random.nextGaussian();
    }
    double[] varianceX = new double[STEPS];
    double[] varianceY = new double[STEPS];
    Arrays.fill(varianceX, ofLoad * ofLoad);
    Arrays.fill(varianceY, ofMotion * ofMotion);
    return new SlopeFitter(x, y, branch, varianceX, varianceY, GroupedLine.fit(x, y, branch)).fit(how);
  }

  private static double mean(double ofLoad, double ofMotion, SlopeFit how) {
    Random random = new Random(6);
    double sum = 0;
    int tests = 2000;
    for (int test = 0; test < tests; test++) {
      sum += fit(ofLoad, ofMotion, random, how).slope() / tests;
    }
    return sum;
  }

  @Test
  void aLoadWithRandomErrorFlattensOrdinarySlopesAndNotThoseInBothVariables() {
    // twelve loads ten apart spread by 14 300 about their mean; errors of 12 add 11 · 144: the slope is flattened by a tenth
    assertThat(mean(12, 3, SlopeFit.ORDINARY)).isCloseTo(2 * 14_300 / (14_300.0 + 11 * 144), within(0.03));
    assertThat(mean(12, 3, SlopeFit.BOTH_VARIABLES)).isCloseTo(2, within(0.02));
  }

  @Test
  void theProgramGoesOverToBothVariablesWhereTheLoadMatters() {
    assertThat(fit(12, 3, new Random(1), SlopeFit.AUTOMATIC).how()).isEqualTo(SlopeFit.BOTH_VARIABLES);
    assertThat(fit(0.01, 3, new Random(1), SlopeFit.AUTOMATIC).how()).isEqualTo(SlopeFit.ORDINARY);
  }

  @Test
  void standardErrorsInBothVariablesAreThoseOfTheScatter() {
    Random random = new Random(9);
    double squares = 0;
    double expected = 0;
    int tests = 2000;
    for (int test = 0; test < tests; test++) {
      SlopeFitter.Fit fit = fit(6, 3, random, SlopeFit.BOTH_VARIABLES);
      squares += (fit.slope() - 2) * (fit.slope() - 2) / tests;
      expected += fit.standardError() * fit.standardError() / tests;
    }
    // never narrowed below the stated variances, so a little wider than the scatter
    assertThat(expected / squares).isBetween(0.9, 1.3);
  }
}
