package org.flexbound.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import org.flexbound.frame.Stiffness;
import org.flexbound.frame.StiffnessPath;

/** Gathers derivatives by single stiffnesses into those by paths, and into contributions. */
final class Derivatives {
  private final Source source;
  private final Slots slots;
  private final double[] stiffness;
  private final int gauges;
  private final int loads;

  /** Where derivatives come from. */
  interface Source {
    /** Tells the derivatives by the slots wanted, for ranges of gauges and loads. */
    void collect(
        boolean[] wanted,
        int gaugeFrom,
        int gaugeTo,
        int loadFrom,
        int loadTo,
        Sensitivity.Sink sink);
  }

  Derivatives(Source source, Slots slots, double[] stiffness, int gauges, int loads) {
    this.source = source;
    this.slots = slots;
    this.stiffness = stiffness;
    this.gauges = gauges;
    this.loads = loads;
  }

  /**
   * The derivative by one path.
   *
   * @param asSet the stiffness that the path has
   */
  double[][] by(StiffnessPath path, Derivative by, Stiffness asSet) {
    double[][] result = new double[gauges][loads];
    double[] ratio = new double[stiffness.length];
    boolean[] wanted = new boolean[ratio.length];
    for (Slots.Target target : slots.targets(path)) {
      wanted[target.slot()] = true;
      ratio[target.slot()] = target.ratio();
    }
    boolean material = path.group() == StiffnessPath.Group.MATERIALS;
    Derivative kindWanted = material ? Derivative.LOGARITHM : by;
    source.collect(
        wanted,
        0,
        gauges,
        0,
        loads,
        (slot, gauge, load, kind, value) -> {
          double converted = Sensitivity.convert(kind, value, kindWanted, stiffness[slot]);
          double factor =
              material
                  ? 1
                  : switch (by) {
                    case LOGARITHM -> 1;
                    case COMPLIANCE -> 1 / ratio[slot];
                    case STIFFNESS -> ratio[slot];
                  };
          result[gauge][load] += factor * converted;
        });
    if (material && by != Derivative.LOGARITHM) {
      double modulus = asSet.value();
      for (double[] row : result) {
        for (int l = 0; l < loads; l++) {
          row[l] = Sensitivity.convert(Derivative.LOGARITHM, row[l], by, modulus);
        }
      }
    }
    return result;
  }

  double[][][] byLogarithms(List<List<StiffnessPath>> groups) {
    double[][][] result = new double[groups.size()][gauges][loads];
    boolean[] wanted = new boolean[stiffness.length];
    int[][] of = new int[wanted.length][0];
    for (int k = 0; k < groups.size(); k++) {
      for (StiffnessPath path : groups.get(k)) {
        for (Slots.Target target : slots.targets(path)) {
          wanted[target.slot()] = true;
          int[] before = of[target.slot()];
          of[target.slot()] = Arrays.copyOf(before, before.length + 1);
          of[target.slot()][before.length] = k;
        }
      }
    }
    source.collect(
        wanted,
        0,
        gauges,
        0,
        loads,
        (slot, gauge, load, kind, value) -> {
          double converted =
              Sensitivity.convert(kind, value, Derivative.LOGARITHM, stiffness[slot]);
          for (int k : of[slot]) {
            result[k][gauge][load] += converted;
          }
        });
    return result;
  }

  List<PartContribution> contributions(int gauge, int load) {
    boolean[] all = new boolean[stiffness.length];
    Arrays.fill(all, true);
    double[] sums = new double[all.length];
    source.collect(
        all,
        gauge,
        gauge + 1,
        load,
        load + 1,
        (slot, g, l, kind, value) ->
            sums[slot] -=
                Sensitivity.convert(kind, value, Derivative.LOGARITHM, stiffness[slot]));
    List<PartContribution> result = new ArrayList<>();
    for (int slot = 0; slot < sums.length; slot++) {
      if (sums[slot] != 0) {
        result.add(new PartContribution(slots.part(slot), sums[slot]));
      }
    }
    result.sort((a, b) -> Integer.compare(rank(a), rank(b)));
    return Collections.unmodifiableList(result);
  }

  private static int rank(PartContribution contribution) {
    return switch (contribution.part().group()) {
      case MEMBERS, MATERIALS -> 0;
      case JOINTS -> 1;
      case CONNECTIONS -> 2;
      case SUPPORTS -> 3;
    };
  }
}
