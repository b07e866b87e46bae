package org.flexbound.sparse;

/**
 * How matrices are analysed and factorized.
 *
 * @param ordering how the order of elimination is chosen
 * @param threads number of threads, at least one; the result does not depend on it
 * @param pivotLimit the least ratio of a pivot to its own original diagonal entry that is accepted
 */
public record FactorSettings(Ordering ordering, int threads, double pivotLimit) {
  /**
   * Rounding leaves a pivot that should be zero at some units of the fifteenth digit of its diagonal entry, and more where long levers meet
   * rotations. Raising the limit refuses soft supports; lowering it lets mechanisms pass as very soft. {@link NumericFactor#leastPivotRatio}
   * tells how near a factor came to it.
   */
  public static final double DEFAULT_PIVOT_LIMIT = 1e-12;

  /** Checks the values. */
  public FactorSettings {
    if (threads < 1) {
      throw new IllegalArgumentException("at least one thread is needed, not " + threads);
    }
    if (!(pivotLimit >= 0 && pivotLimit < 1)) {
      throw new IllegalArgumentException("the pivot limit must lie from 0 to 1, not " + pivotLimit);
    }
  }

  /** One thread, the order with the least estimated work. */
  public static FactorSettings defaults() {
    return new FactorSettings(Ordering.leastWork(), 1, DEFAULT_PIVOT_LIMIT);
  }

  /** The same with another ordering. */
  public FactorSettings withOrdering(Ordering other) {
    return new FactorSettings(other, threads, pivotLimit);
  }

  /** The same with another number of threads. */
  public FactorSettings withThreads(int count) {
    return new FactorSettings(ordering, count, pivotLimit);
  }

  /** The same with another limit. */
  public FactorSettings withPivotLimit(double limit) {
    return new FactorSettings(ordering, threads, limit);
  }
}
