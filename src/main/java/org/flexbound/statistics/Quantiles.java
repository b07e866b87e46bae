package org.flexbound.statistics;

import org.apache.commons.statistics.distribution.ChiSquaredDistribution;
import org.apache.commons.statistics.distribution.FDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.TDistribution;

/** Quantiles and probabilities of the usual distributions, from a kept library. */
public final class Quantiles {
  private static final NormalDistribution NORMAL = NormalDistribution.of(0, 1);

  /** From so many degrees of freedom on, Student's t is the normal to all digits that matter. */
  private static final double MANY = 1e7;

  private Quantiles() {}

  /**
   * Standard normal quantile.
   *
   * @param probability from 0 to 1
   * @return z with P(Z ≤ z) = probability
   */
  public static double normal(double probability) {
    return NORMAL.inverseCumulativeProbability(probability);
  }

  /**
   * Standard normal probability.
   *
   * @param z any number
   * @return P(Z ≤ z)
   */
  public static double normalProbability(double z) {
    return NORMAL.cumulativeProbability(z);
  }

  /**
   * Quantile of Student's t.
   *
   * @param probability from 0 to 1
   * @param degreesOfFreedom above 0; infinite gives the normal
   * @return t with P(T ≤ t) = probability
   */
  public static double studentT(double probability, double degreesOfFreedom) {
    return degreesOfFreedom > MANY
        ? normal(probability)
        : TDistribution.of(degreesOfFreedom).inverseCumulativeProbability(probability);
  }

  /**
   * Probability of Student's t.
   *
   * @param t any number
   * @param degreesOfFreedom above 0; infinite gives the normal
   * @return P(T ≤ t)
   */
  public static double studentTProbability(double t, double degreesOfFreedom) {
    return degreesOfFreedom > MANY
        ? normalProbability(t)
        : TDistribution.of(degreesOfFreedom).cumulativeProbability(t);
  }

  /**
   * Quantile of χ².
   *
   * @param probability from 0 to 1
   * @param degreesOfFreedom above 0
   * @return x with P(X ≤ x) = probability
   */
  public static double chiSquared(double probability, double degreesOfFreedom) {
    return ChiSquaredDistribution.of(degreesOfFreedom).inverseCumulativeProbability(probability);
  }

  /**
   * Upper tail of χ².
   *
   * @param x not negative
   * @param degreesOfFreedom above 0
   * @return P(X &gt; x)
   */
  public static double chiSquaredTail(double x, double degreesOfFreedom) {
    return ChiSquaredDistribution.of(degreesOfFreedom).survivalProbability(x);
  }

  /**
   * Quantile of F.
   *
   * @param probability from 0 to 1
   * @param numerator degrees of freedom above the line
   * @param denominator degrees of freedom below it; infinite gives χ²/numerator
   * @return x with P(X ≤ x) = probability
   */
  public static double f(double probability, double numerator, double denominator) {
    return denominator > MANY
        ? chiSquared(probability, numerator) / numerator
        : FDistribution.of(numerator, denominator).inverseCumulativeProbability(probability);
  }

  /**
   * Upper tail of F.
   *
   * @param x not negative
   * @param numerator degrees of freedom above the line
   * @param denominator degrees of freedom below it; infinite gives χ²/numerator
   * @return P(X &gt; x)
   */
  public static double fTail(double x, double numerator, double denominator) {
    return denominator > MANY
        ? chiSquaredTail(x * numerator, numerator)
        : FDistribution.of(numerator, denominator).survivalProbability(x);
  }

  /**
   * The level of a single test such that {@code tests} independent ones keep the joint level (Šidák
   * 1967, J. Am. Stat. Assoc. 62:626).
   *
   * @param jointLevel e.g. 0.05
   * @param tests how many, at least 1
   * @return 1 − (1 − jointLevel)^(1/tests)
   */
  public static double sidak(double jointLevel, int tests) {
    return -Math.expm1(Math.log1p(-jointLevel) / tests);
  }

  /**
   * The limit on |t| of one of several tests, such that all together raise a false alarm as seldom
   * as one normal test would with its own limit.
   *
   * @param single the limit on |z| of one test alone with a known uncertainty, e.g. 3
   * @param tests how many tests, at least 1
   * @param degreesOfFreedom of the estimated uncertainty; infinite where it is known
   * @return the two-sided limit
   */
  public static double manyStudentT(double single, int tests, double degreesOfFreedom) {
    double level = sidak(2 * normalProbability(-single), tests);
    return -studentT(level / 2, degreesOfFreedom);
  }
}
