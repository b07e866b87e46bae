package org.flexbound.flexibility;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.statistics.Quantiles;

/**
 * A bound that the absolute coefficients of every elastic structure keep: a direct coefficient is
 * above zero, and a_ij² ≤ a_ii a_jj (both are leading minors of a positive definite matrix: Horn
 * &amp; Johnson, Matrix Analysis, 2nd ed., 7.1).
 *
 * @param name the coefficient that is held against the bound, gauge and load
 * @param direct true for a direct coefficient against zero; false for a cross coefficient
 * @param gauge the coefficient's gauge (of a pattern, its first)
 * @param load the coefficient's load
 * @param ratio for a direct coefficient its value, SI; for a cross coefficient |a_ij|/√(a_ii a_jj),
 *     which should not pass one
 * @param z how far on the wrong side, in standard uncertainties (of the value; of the ratio's
 *     logarithm); negative where the bound is kept; empty where no uncertainty is known
 * @param limit what z may be, all bounds allowed for
 */
public record Bound(
    String name,
    boolean direct,
    int gauge,
    int load,
    double ratio,
    OptionalDouble z,
    double limit) {
  /** Without any uncertainty, a ratio that passes one by less than this is one. */
  private static final double EQUAL = 1e-9;

  /**
   * Whether the bound is broken by more than chance explains.
   *
   * @return true where it is
   */
  public boolean broken() {
    if (z.isPresent()) {
      return z.getAsDouble() > limit;
    }
    return direct ? ratio < 0 : ratio > 1 + EQUAL;
  }

  /** All bounds that can be tried. */
  static List<Bound> of(List<CollocatedPoint> points, AbsoluteMeans means, double single) {
    List<CollocatedPoint> measured =
        points.stream().filter(p -> p.under(p.load(), means).isPresent()).toList();
    int n = measured.size();
    int tests = Math.max(1, n * n);
    List<Bound> bounds = new ArrayList<>();
    for (CollocatedPoint point : measured) {
      Combination direct = direct(point, means);
      double value = means.value(direct);
      double u = means.uncertainty(direct);
      bounds.add(
          new Bound(
              point.name(point.load(), means),
              true,
              point.gauges().get(0),
              point.load(),
              value,
              u > 0 ? OptionalDouble.of(-value / u) : OptionalDouble.empty(),
              limit(direct, means, tests, single)));
    }
    for (CollocatedPoint a : measured) {
      for (CollocatedPoint b : measured) {
        if (a.load() != b.load()) {
          cross(a, b, means, tests, single).ifPresent(bounds::add);
        }
      }
    }
    return bounds;
  }

  private static Combination direct(CollocatedPoint point, AbsoluteMeans means) {
    return point.under(point.load(), means).orElseThrow();
  }

  private static double limit(
      Combination combination, AbsoluteMeans means, int tests, double single) {
    return Quantiles.manyStudentT(single, tests, means.degreesOfFreedom(combination));
  }

  /** The gauge of one point under the load of another; nothing where it has no sound sign. */
  private static Optional<Bound> cross(
      CollocatedPoint a, CollocatedPoint b, AbsoluteMeans means, int tests, double single) {
    Optional<Combination> found = a.under(b.load(), means);
    Combination own = direct(a, means);
    Combination other = direct(b, means);
    double aa = means.value(own);
    double bb = means.value(other);
    double u = found.map(means::uncertainty).orElse(0.0);
    double ab = found.map(means::value).orElse(0.0);
    if (found.isEmpty()
        || !(aa > 3 * means.uncertainty(own))
        || !(bb > 3 * means.uncertainty(other))
        || !(Math.abs(ab) > 3 * u)) {
      return Optional.empty();
    }
    double ratio = Math.abs(ab) / Math.sqrt(aa * bb);
    Combination logarithm =
        new Combination.Sum()
            .add(found.get(), 1 / ab)
            .add(own, -0.5 / aa)
            .add(other, -0.5 / bb)
            .made();
    double ofLogarithm = means.uncertainty(logarithm);
    return Optional.of(
        new Bound(
            a.name(b.load(), means),
            false,
            a.gauges().get(0),
            b.load(),
            ratio,
            ofLogarithm > 0
                ? OptionalDouble.of(Math.log(ratio) / ofLogarithm)
                : OptionalDouble.empty(),
            limit(logarithm, means, tests, single)));
  }
}
