package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.List;

/**
 * Tells held loads from the ramps between them, where a logger went on recording while the load moved and no label says which rows belong to a
 * step. A group of rows is part of a ramp where its load moves at more than half the run's mean rate (a held load moves by much less, and a ramp,
 * having less than all the time, by more), or where it has less than a fifth of the rows of a usual held load (a group too short for a rate). Where
 * loads were read by hand, a few rows each, all are held.
 *
 * @param held the steps to fit, in order
 * @param ramps the groups of rows that were left out
 * @param everHeld false where the load never stood still: then every group is among the held
 */
record HeldSteps(List<StepGrouping.RawStep> held, List<StepGrouping.RawStep> ramps, boolean everHeld) {
  /** Share of the mean rate above which a load is on its way. */
  private static final double MOVING = 0.5;

  /** Share of the usual number of rows of a held load below which a group is passed through. */
  private static final double SHORT = 0.2;

  /** With fewer rows than this at a usual load the readings were taken by hand, each at a held load. */
  private static final int BY_HAND = 5;

  /** A group needs so many rows for a rate of its own. */
  private static final int FOR_RATE = 3;

  /** More loads than this in one branch are no steps that anybody held (common practice is 5 to 20). */
  private static final int MOST_STEPS = 30;

  /** Share of the peak load below which the first and the last group are zero readings, however short. */
  private static final double UNLOADED = 0.02;

  /** A line through fewer held loads than this cannot be judged: the load was held at its ends alone, or turned there. */
  private static final int FEWEST = 3;

  HeldSteps {
    held = List.copyOf(held);
    ramps = List.copyOf(ramps);
  }

  /**
   * Tells.
   *
   * @param groups rows in sequence at about one load
   * @param varies for each load column whether it was varied in this run
   */
  static HeldSteps of(List<StepGrouping.RawStep> groups, boolean[] varies) {
    double[] rates = new double[varies.length];
    double branches = 0;
    double rows = groups.stream().mapToDouble(group -> group.readings).sum();
    for (int l = 0; l < varies.length; l++) {
      if (varies[l]) {
        double travel = travel(groups, l);
        rates[l] = travel / rows;
        branches = Math.max(branches, travel / range(groups, l));
      }
    }
    List<StepGrouping.RawStep> still = new ArrayList<>();
    double onTheWay = 0;
    for (StepGrouping.RawStep group : groups) {
      if (moves(group, varies, rates)) {
        onTheWay += group.readings;
      } else {
        still.add(group);
      }
    }
    int usual = usual(still);
    if (usual < BY_HAND) {
      boolean labelled = groups.stream().anyMatch(group -> !group.label.isEmpty());
      boolean held = labelled || (onTheWay <= rows / 2 && groups.size() <= MOST_STEPS * Math.max(1, branches));
      return new HeldSteps(groups, List.of(), held);
    }
    List<StepGrouping.RawStep> held = new ArrayList<>();
    List<StepGrouping.RawStep> ramps = new ArrayList<>();
    for (int k = 0; k < groups.size(); k++) {
      StepGrouping.RawStep group = groups.get(k);
      boolean zero = (k == 0 || k == groups.size() - 1) && unloaded(group, groups, varies);
      boolean passed = moves(group, varies, rates) || group.readings < SHORT * usual;
      (group.label.isEmpty() && passed && !zero ? ramps : held).add(group);
    }
    return levels(held, varies) < FEWEST ? new HeldSteps(groups, List.of(), false) : new HeldSteps(held, ramps, true);
  }

  private static double travel(List<StepGrouping.RawStep> groups, int load) {
    double travel = 0;
    for (int k = 1; k < groups.size(); k++) {
      travel += Math.abs(groups.get(k).load[load] - groups.get(k - 1).load[load]);
    }
    return travel;
  }

  private static double range(List<StepGrouping.RawStep> groups, int load) {
    double low = groups.stream().mapToDouble(group -> group.load[load]).min().orElse(0);
    double high = groups.stream().mapToDouble(group -> group.load[load]).max().orElse(0);
    return high - low;
  }

  private static boolean moves(StepGrouping.RawStep group, boolean[] varies, double[] rates) {
    if (group.readings < FOR_RATE) {
      return false;
    }
    for (int l = 0; l < varies.length; l++) {
      if (varies[l] && Math.abs(group.rate(l)) > MOVING * rates[l]) {
        return true;
      }
    }
    return false;
  }

  /** The number of rows of the group in which the middle row of all held ones lies. */
  private static int usual(List<StepGrouping.RawStep> still) {
    int[] sizes = still.stream().mapToInt(group -> group.readings).sorted().toArray();
    long all = 0;
    for (int size : sizes) {
      all += size;
    }
    long sum = 0;
    for (int size : sizes) {
      sum += size;
      if (2 * sum >= all) {
        return size;
      }
    }
    return 0;
  }

  /** How many different loads were held, by the load with most of them; those nearer than a fiftieth of its range are one. */
  private static int levels(List<StepGrouping.RawStep> held, boolean[] varies) {
    int most = 0;
    for (int l = 0; l < varies.length; l++) {
      int load = l;
      double[] sorted = held.stream().mapToDouble(group -> group.load[load]).sorted().toArray();
      double apart = UNLOADED * (sorted.length == 0 ? 0 : sorted[sorted.length - 1] - sorted[0]);
      double last = Double.NEGATIVE_INFINITY;
      int levels = 0;
      for (double value : sorted) {
        if (varies[l] && value - last > apart) {
          levels++;
          last = value;
        }
      }
      most = Math.max(most, levels);
    }
    return most;
  }

  private static boolean unloaded(StepGrouping.RawStep group, List<StepGrouping.RawStep> groups, boolean[] varies) {
    for (int l = 0; l < varies.length; l++) {
      int load = l;
      double peak = groups.stream().mapToDouble(other -> Math.abs(other.load[load])).max().orElse(0);
      if (varies[l] && Math.abs(group.load[l]) > UNLOADED * peak) {
        return false;
      }
    }
    return true;
  }
}
