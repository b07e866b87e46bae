package org.flexbound.flexibility;

import java.util.Map;
import java.util.TreeMap;

/** A linear combination of absolute coefficients: Σ weight · absolute[index]; few of them take part. */
final class Combination {
  private final int[] index;
  private final double[] weight;

  private Combination(int[] index, double[] weight) {
    this.index = index;
    this.weight = weight;
  }

  /** Adds up combinations, each with a factor. */
  static final class Sum {
    private final Map<Integer, Double> weights = new TreeMap<>();

    Sum add(Combination part, double factor) {
      for (int k = 0; k < part.index.length; k++) {
        weights.merge(part.index[k], factor * part.weight[k], Double::sum);
      }
      return this;
    }

    Sum add(int index, double weight) {
      weights.merge(index, weight, Double::sum);
      return this;
    }

    Combination made() {
      return new Combination(
          weights.keySet().stream().mapToInt(Integer::intValue).toArray(),
          weights.values().stream().mapToDouble(Double::doubleValue).toArray());
    }
  }

  int size() {
    return index.length;
  }

  int index(int k) {
    return index[k];
  }

  double weight(int k) {
    return weight[k];
  }
}
