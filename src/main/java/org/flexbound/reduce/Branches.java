package org.flexbound.reduce;

import java.util.Arrays;

/**
 * Parts a sequence of loads into branches at its turning points, and into cycles.
 *
 * <p>A turning point counts only where the load then goes back by more than {@link #TURN} of its
 * range, so that noise and small corrections of the jack make no branches. A new cycle begins where
 * the load leaves zero again after a peak; where it is pulled and pushed, only on the side on which
 * it first left zero, so that both halves belong to one cycle.
 */
final class Branches {
  /** Share of the range by which the load must go back for a turning point. */
  private static final double TURN = 0.05;

  /** Share of the peak below which the load counts as none. */
  private static final double NONE = 0.05;

  private final int[] branch;
  private final int[] cycle;
  private final boolean[] rising;

  private Branches(int[] branch, int[] cycle, boolean[] rising) {
    this.branch = branch;
    this.cycle = cycle;
    this.rising = rising;
  }

  static Branches of(double[] load) {
    int n = load.length;
    double low = Arrays.stream(load).min().orElse(0);
    double high = Arrays.stream(load).max().orElse(0);
    double back = TURN * (high - low);
    double peak = Math.max(Math.abs(low), Math.abs(high));
    int[] branch = new int[n];
    boolean[] rising = new boolean[n];
    int current = 0;
    int direction = 0;
    int extreme = 0;
    int start = 0;
    for (int k = 1; k < n; k++) {
      if (direction == 0) {
        if (Math.abs(load[k] - load[extreme]) > back) {
          direction = load[k] > load[extreme] ? 1 : -1;
          extreme = k;
        }
      } else if ((load[k] - load[extreme]) * direction >= 0) {
        extreme = k;
      } else if ((load[extreme] - load[k]) * direction > back) {
        Arrays.fill(branch, start, extreme + 1, current);
        current++;
        start = extreme + 1;
        direction = -direction;
        extreme = k;
      }
    }
    Arrays.fill(branch, start, n, current);
    for (int k = 0; k < n; k++) {
      rising[k] = isRising(load, branch, k);
    }
    return new Branches(branch, cycles(load, peak), rising);
  }

  /** Whether the magnitude of the load grows along the branch of a step. */
  private static boolean isRising(double[] load, int[] branch, int k) {
    int first = k;
    int last = k;
    while (first > 0 && branch[first - 1] == branch[k]) {
      first--;
    }
    while (last < branch.length - 1 && branch[last + 1] == branch[k]) {
      last++;
    }
    if (first > 0) {
      first--;
    }
    return load[k] >= 0 ? load[last] >= load[first] : load[last] <= load[first];
  }

  private static int[] cycles(double[] load, double peak) {
    int[] cycle = new int[load.length];
    int current = 1;
    boolean loaded = false;
    boolean returned = false;
    double firstSide = 0;
    boolean bothSides =
        Arrays.stream(load).anyMatch(value -> value > 0.5 * peak)
            && Arrays.stream(load).anyMatch(value -> value < -0.5 * peak);
    for (int k = 0; k < load.length; k++) {
      double magnitude = Math.abs(load[k]);
      if (magnitude > NONE * peak) {
        firstSide = firstSide == 0 ? Math.signum(load[k]) : firstSide;
        if (returned) {
          current += !bothSides || Math.signum(load[k]) == firstSide ? 1 : 0;
          returned = false;
        }
        loaded |= magnitude > 0.5 * peak;
      } else if (loaded) {
        returned = true;
        loaded = false;
      }
      cycle[k] = current;
    }
    return cycle;
  }

  int branch(int step) {
    return branch[step];
  }

  int cycle(int step) {
    return cycle[step];
  }

  boolean rising(int step) {
    return rising[step];
  }

  int cycles() {
    return Arrays.stream(cycle).max().orElse(0);
  }
}
