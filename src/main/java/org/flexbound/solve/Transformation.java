package org.flexbound.solve;

import java.util.Map;
import java.util.NavigableMap;

/** All freedoms u in terms of the unknowns q and the imposed gaps g: u = T q + T_g g. */
final class Transformation {
  private final int freedoms;
  private final int unknowns;
  private final int gaps;

  /** By freedom: where its terms begin. */
  private final int[] starts;

  /** Unknowns, or number of unknowns + gap. */
  private final int[] terms;

  private final double[] coefficients;

  /** The point of every unknown. */
  private final int[] group;

  /** The freedom of every unknown. */
  private final int[] freedomOf;

  Transformation(
      int freedoms, int gaps, Map<Integer, NavigableMap<Integer, Double>> eliminated) {
    this.freedoms = freedoms;
    this.gaps = gaps;
    int[] number = new int[freedoms];
    int count = 0;
    for (int f = 0; f < freedoms; f++) {
      number[f] = eliminated.containsKey(f) ? -1 : count++;
    }
    unknowns = count;
    group = new int[count];
    freedomOf = new int[count];
    starts = new int[freedoms + 1];
    int total = 0;
    for (int f = 0; f < freedoms; f++) {
      NavigableMap<Integer, Double> expression = eliminated.get(f);
      total += expression == null ? 1 : expression.size();
      starts[f + 1] = total;
    }
    terms = new int[total];
    coefficients = new double[total];
    int groups = -1;
    int lastPoint = -1;
    for (int f = 0; f < freedoms; f++) {
      NavigableMap<Integer, Double> expression = eliminated.get(f);
      if (expression == null) {
        if (f / 6 != lastPoint) {
          lastPoint = f / 6;
          groups++;
        }
        group[number[f]] = groups;
        freedomOf[number[f]] = f;
        terms[starts[f]] = number[f];
        coefficients[starts[f]] = 1;
        continue;
      }
      int at = starts[f];
      for (Map.Entry<Integer, Double> term : expression.entrySet()) {
        int key = term.getKey();
        terms[at] = key < freedoms ? number[key] : unknowns + key - freedoms;
        coefficients[at++] = term.getValue();
      }
    }
  }

  int unknowns() {
    return unknowns;
  }

  int gaps() {
    return gaps;
  }

  int freedoms() {
    return freedoms;
  }

  /** The group (point) of every unknown; not copied. */
  int[] group() {
    return group;
  }

  int freedomOf(int unknown) {
    return freedomOf[unknown];
  }

  int start(int freedom) {
    return starts[freedom];
  }

  int term(int at) {
    return terms[at];
  }

  double coefficient(int at) {
    return coefficients[at];
  }

  /** Whether a freedom is held, or is an unknown itself. */
  boolean isPlain(int freedom) {
    int count = starts[freedom + 1] - starts[freedom];
    return count == 0
        || (count == 1
            && coefficients[starts[freedom]] == 1
            && terms[starts[freedom]] < unknowns);
  }

  /** The unknown that a plain freedom is; -1 for one that is held. */
  int unknown(int freedom) {
    return starts[freedom] == starts[freedom + 1] ? -1 : terms[starts[freedom]];
  }

  /** result += Tᵀ forces: forces at the freedoms become forces at the unknowns. */
  void reduce(double[] forces, int from, double[] result, int at) {
    for (int f = 0; f < freedoms; f++) {
      double force = forces[from + f];
      if (force != 0) {
        for (int t = starts[f]; t < starts[f + 1]; t++) {
          if (terms[t] < unknowns) {
            result[at + terms[t]] += coefficients[t] * force;
          }
        }
      }
    }
  }

  /** T_gᵀ forces of one gap. */
  double reduceToGap(double[] forces, int from, int gap) {
    double sum = 0;
    for (int f = 0; f < freedoms; f++) {
      for (int t = starts[f]; t < starts[f + 1]; t++) {
        if (terms[t] == unknowns + gap) {
          sum += coefficients[t] * forces[from + f];
        }
      }
    }
    return sum;
  }

  /** motions = T q. */
  void expand(double[] q, int from, double[] motions, int at) {
    for (int f = 0; f < freedoms; f++) {
      double sum = 0;
      for (int t = starts[f]; t < starts[f + 1]; t++) {
        if (terms[t] < unknowns) {
          sum += coefficients[t] * q[from + terms[t]];
        }
      }
      motions[at + f] = sum;
    }
  }

  /** motions += T_g e of one gap. */
  void addGap(int gap, double[] motions, int at) {
    for (int f = 0; f < freedoms; f++) {
      for (int t = starts[f]; t < starts[f + 1]; t++) {
        if (terms[t] == unknowns + gap) {
          motions[at + f] += coefficients[t];
        }
      }
    }
  }
}
