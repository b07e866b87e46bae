package org.flexbound.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class AssignmentTest {
  @Test
  void noOtherAssignmentIsCheaper() {
    SplittableRandom random = new SplittableRandom(3);
    for (int trial = 0; trial < 200; trial++) {
      int n = 1 + random.nextInt(6);
      double[][] cost = new double[n][n];
      for (double[] row : cost) {
        for (int j = 0; j < n; j++) {
          row[j] = random.nextInt(3) == 0 ? 0 : random.nextDouble(-1, 5);
        }
      }
      int[] found = Assignment.cheapest(cost);
      double total = 0;
      boolean[] used = new boolean[n];
      for (int i = 0; i < n; i++) {
        total += cost[i][found[i]];
        used[found[i]] = true;
      }
      assertThat(used).doesNotContain(false);
      assertThat(total).isCloseTo(least(cost, 0, new boolean[n]), within(1e-12));
    }
  }

  private static double least(double[][] cost, int row, boolean[] used) {
    if (row == cost.length) {
      return 0;
    }
    double best = Double.POSITIVE_INFINITY;
    for (int j = 0; j < used.length; j++) {
      if (!used[j]) {
        used[j] = true;
        best = Math.min(best, cost[row][j] + least(cost, row + 1, used));
        used[j] = false;
      }
    }
    return best;
  }
}
