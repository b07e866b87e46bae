package org.flexbound.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class KinkTest {
  private static final double[] UP_AND_DOWN = new double[40];
  private static final int[] BRANCHES = new int[40];

  static {
    for (int k = 0; k < 40; k++) {
      UP_AND_DOWN[k] = k < 20 ? k + 1 : 40 - k;
      BRANCHES[k] = k / 20;
    }
  }

  private static double[] readings(double change, double place, double noise, Random random) {
    double[] y = new double[UP_AND_DOWN.length];
    Arrays.setAll(y, k -> 2 * UP_AND_DOWN[k] + 3 * BRANCHES[k] + change * Math.max(0, UP_AND_DOWN[k] - place) + noise * random.nextGaussian());
    return y;
  }

  @Test
  void aGapThatClosesIsFoundAtItsLoad() {
    Kink kink = Kink.search(UP_AND_DOWN, readings(-0.5, 8, 0.05, new Random(1)), BRANCHES);
    assertThat(kink.probability()).isLessThan(1e-6);
    assertThat(kink.place()).isCloseTo(8, within(0.6));
    assertThat(kink.change()).isCloseTo(-0.5, within(0.03));
    // from 1 to 20 with the kink at 8: 0.5 · 12 · 7 / 19
    assertThat(kink.departure()).isCloseTo(-0.5 * 12 * 7 / 19, within(0.15));
  }

  @Test
  void straightLinesRaiseNoMoreAlarmsThanStated() {
    Random random = new Random(3);
    int alarms = 0;
    int tests = 2000;
    for (int test = 0; test < tests; test++) {
      alarms += Kink.search(UP_AND_DOWN, readings(0, 8, 1, random), BRANCHES).probability() < 0.05 ? 1 : 0;
    }
    // an upper bound, so not many fewer and no more than 5 %; three standard errors are 1.5 %
    assertThat((double) alarms / tests).isBetween(0.015, 0.065);
  }

  @Test
  void tooFewLevelsTellNothing() {
    double[] x = {1, 2, 3, 4, 5};
    assertThat(Kink.search(x, new double[] {1, 2, 3, 5, 9}, new int[5]).probability()).isEqualTo(1);
  }
}
