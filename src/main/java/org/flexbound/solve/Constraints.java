package org.flexbound.solve;

import java.util.HashMap;
import java.util.Map;
import java.util.NavigableMap;
import java.util.TreeMap;
import java.util.TreeSet;

/**
 * Linear constraints on the freedoms of all points, eliminated one after another: each takes one
 * freedom out and says what it is in terms of those that are left, and of gaps that may be imposed
 * (numbered from the number of freedoms upwards). Chains resolve themselves, since every earlier
 * expression that uses a freedom is rewritten when the freedom goes.
 */
final class Constraints {
  /** Of the largest coefficient before elimination: what is left below this says nothing new. */
  private static final double NOTHING_NEW = 1e-9;

  /** Coefficients below this share of the largest are rounding. */
  private static final double ROUNDING = 1e-14;

  private final int freedoms;
  private final double length;
  private final Map<Integer, NavigableMap<Integer, Double>> eliminated = new HashMap<>();
  private final Map<Integer, TreeSet<Integer>> users = new HashMap<>();

  /**
   * No constraints yet.
   *
   * @param freedoms number of freedoms, six a point
   * @param length a length of the structure, by which rotations and translations are compared
   */
  Constraints(int freedoms, double length) {
    this.freedoms = freedoms;
    this.length = length;
  }

  /** A translation counts as it is, a rotation times the length. */
  private double weight(int freedom) {
    return freedom % 6 < 3 ? 1 : 1 / length;
  }

  /**
   * Adds the constraint Σ coefficient · freedom = 0.
   *
   * @param row coefficients by freedom (or gap)
   * @param preferred a freedom to take out where it serves as well as others; -1 for none
   * @return false where the constraint says nothing that is not said already
   */
  boolean add(Map<Integer, Double> row, int preferred) {
    NavigableMap<Integer, Double> left = new TreeMap<>();
    double before = 0;
    for (Map.Entry<Integer, Double> term : row.entrySet()) {
      int freedom = term.getKey();
      if (freedom < freedoms) {
        before = Math.max(before, Math.abs(term.getValue()) * weight(freedom));
      }
      NavigableMap<Integer, Double> known = eliminated.get(freedom);
      if (known == null) {
        left.merge(freedom, term.getValue(), Double::sum);
      } else {
        known.forEach((f, c) -> left.merge(f, c * term.getValue(), Double::sum));
      }
    }
    int pivot = -1;
    double largest = 0;
    for (Map.Entry<Integer, Double> term : left.entrySet()) {
      if (term.getKey() < freedoms) {
        double size = Math.abs(term.getValue()) * weight(term.getKey());
        if (size > largest * (1 + 1e-9)) {
          largest = size;
          pivot = term.getKey();
        }
      }
    }
    if (!(largest > NOTHING_NEW * before)) {
      return false;
    }
    if (preferred >= 0
        && Math.abs(left.getOrDefault(preferred, 0.0)) * weight(preferred) > 0.3 * largest) {
      pivot = preferred;
    }
    eliminate(left, pivot, largest);
    return true;
  }

  private void eliminate(NavigableMap<Integer, Double> row, int pivot, double largest) {
    double divisor = row.getOrDefault(pivot, 1.0);
    NavigableMap<Integer, Double> expression = new TreeMap<>();
    row.forEach(
        (freedom, coefficient) -> {
          boolean gap = freedom >= freedoms;
          if (freedom != pivot
              && (gap || Math.abs(coefficient) * weight(freedom) > ROUNDING * largest)) {
            expression.put(freedom, -coefficient / divisor);
          }
        });
    TreeSet<Integer> using = users.remove(pivot);
    if (using != null) {
      for (int user : using) {
        NavigableMap<Integer, Double> old = eliminated.getOrDefault(user, new TreeMap<>());
        double factor = old.getOrDefault(pivot, 0.0);
        old.remove(pivot);
        expression.forEach(
            (freedom, coefficient) -> {
              old.merge(freedom, factor * coefficient, Double::sum);
              users.computeIfAbsent(freedom, f -> new TreeSet<>()).add(user);
            });
      }
    }
    eliminated.put(pivot, expression);
    for (int freedom : expression.keySet()) {
      users.computeIfAbsent(freedom, f -> new TreeSet<>()).add(pivot);
    }
  }

  /**
   * What a combination of freedoms comes to in terms of imposed gaps, where the constraints leave
   * nothing else of it.
   *
   * @param row coefficients by freedom
   * @return coefficients by gap, numbered from 0
   */
  NavigableMap<Integer, Double> inGaps(Map<Integer, Double> row) {
    NavigableMap<Integer, Double> result = new TreeMap<>();
    row.forEach(
        (freedom, factor) -> {
          NavigableMap<Integer, Double> known = eliminated.get(freedom);
          if (known != null) {
            known
                .tailMap(freedoms, true)
                .forEach((gap, c) -> result.merge(gap - freedoms, c * factor, Double::sum));
          }
        });
    result.values().removeIf(c -> Math.abs(c) < NOTHING_NEW);
    return result;
  }

  /** Whether a freedom has been taken out. */
  boolean isEliminated(int freedom) {
    return eliminated.containsKey(freedom);
  }

  /** Holds a freedom, unless it is out already. */
  void hold(int freedom) {
    if (!eliminated.containsKey(freedom)) {
      add(Map.of(freedom, 1.0), freedom);
    }
  }

  /** What is left, as a map from unknowns and gaps to all freedoms. */
  Transformation transformation(int gaps) {
    return new Transformation(freedoms, gaps, eliminated);
  }
}
