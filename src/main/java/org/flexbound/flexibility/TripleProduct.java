package org.flexbound.flexibility;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.statistics.Quantiles;

/**
 * Three points i, j, k: a_ij a_jk a_ki = a_ik a_kj a_ji, whatever the gains are (a matrix that a
 * diagonal one can make symmetric: the cycle condition of Kolmogorov 1936, Math. Ann. 112:155). It
 * fails for a misplaced gauge, seating or non-linearity.
 *
 * @param points the loads of the three points
 * @param ratio a_ij a_jk a_ki / (a_ik a_kj a_ji), which should be one
 * @param z logarithm of the ratio over its standard uncertainty; empty where none is known or the
 *     ratio is negative
 * @param limit what |z| may be, all triples allowed for
 */
public record TripleProduct(
    List<String> points, double ratio, OptionalDouble z, double limit) {
  /** So many are kept, those furthest off first. */
  private static final int KEPT = 200;

  /** More triples than this are not tried: the joint test and the gain pattern stand for them. */
  private static final int TRIED = 20_000;

  /** Copies the list. */
  public TripleProduct {
    points = List.copyOf(points);
  }

  /**
   * Whether the products differ by more than chance explains.
   *
   * @return true where they do, or where their signs differ
   */
  public boolean broken() {
    return ratio < 0 || Math.abs(z.orElse(0)) > limit;
  }

  /** All that can be formed of one point a load, furthest off first. */
  static List<TripleProduct> of(
      List<CollocatedPoint> all, AbsoluteMeans means, double single) {
    List<CollocatedPoint> points = new ArrayList<>();
    for (CollocatedPoint point : all) {
      if (points.stream().noneMatch(p -> p.load() == point.load())) {
        points.add(point);
      }
    }
    int n = points.size();
    long many = (long) n * (n - 1) * (n - 2) / 6;
    List<TripleProduct> found = new ArrayList<>();
    if (many > TRIED) {
      return found;
    }
    // so many of them are independent
    int tests = Math.max(1, (n - 1) * (n - 2) / 2);
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        for (int k = j + 1; k < n; k++) {
          of(points, new int[] {i, j, k}, means, tests, single).ifPresent(found::add);
        }
      }
    }
    found.sort(
        Comparator.comparingDouble(
            (TripleProduct t) -> t.ratio() < 0 ? Double.NEGATIVE_INFINITY : -Math.abs(t.z().orElse(0))));
    return List.copyOf(found.subList(0, Math.min(KEPT, found.size())));
  }

  private static Optional<TripleProduct> of(
      List<CollocatedPoint> points, int[] three, AbsoluteMeans means, int tests, double single) {
    Combination.Sum sum = new Combination.Sum();
    double logarithm = 0;
    boolean positive = true;
    for (int k = 0; k < 3; k++) {
      CollocatedPoint a = points.get(three[k]);
      CollocatedPoint b = points.get(three[(k + 1) % 3]);
      Optional<Combination> there = a.under(b.load(), means);
      Optional<Combination> back = b.under(a.load(), means);
      if (there.isEmpty()
          || back.isEmpty()
          || !GainPattern.isClear(there.get(), means)
          || !GainPattern.isClear(back.get(), means)) {
        return Optional.empty();
      }
      double one = means.value(there.get());
      double two = means.value(back.get());
      sum.add(there.get(), 1 / one).add(back.get(), -1 / two);
      logarithm += Math.log(Math.abs(one / two));
      positive ^= one * two < 0;
    }
    Combination combination = sum.made();
    double u = means.uncertainty(combination);
    List<String> names = new ArrayList<>();
    for (int k : three) {
      names.add(points.get(k).loadName(means));
    }
    return Optional.of(
        new TripleProduct(
            names,
            (positive ? 1 : -1) * Math.exp(logarithm),
            positive && u > 0 ? OptionalDouble.of(logarithm / u) : OptionalDouble.empty(),
            Quantiles.manyStudentT(single, tests, means.degreesOfFreedom(combination))));
  }
}
