package org.flexbound.sparse;

import java.util.Locale;

/**
 * The matrix cannot be factorized: a pivot is small against its own original diagonal entry (or not positive where the matrix should be
 * positive definite). The comparison is free of scale and units. The unknown named is the one at which the elimination broke down; what is
 * wrong may be any motion in which that unknown takes part.
 */
public final class PivotBreakdownException extends RuntimeException {
  private static final long serialVersionUID = 1;

  private final int unknown;
  private final double pivot;
  private final double diagonal;
  private final double limit;

  /**
   * A breakdown.
   *
   * @param unknown index of the unknown, in the numbering of the matrix
   * @param pivot what the elimination left of its diagonal entry
   * @param diagonal its original diagonal entry
   * @param limit the least ratio of pivot to diagonal that was accepted
   */
  public PivotBreakdownException(int unknown, double pivot, double diagonal, double limit) {
    super(String.format(Locale.ROOT, "pivot of unknown %d is %.6g, its original diagonal %.6g; at least %.3g of it was needed",
        unknown, pivot, diagonal, limit));
    this.unknown = unknown;
    this.pivot = pivot;
    this.diagonal = diagonal;
    this.limit = limit;
  }

  /** Index of the unknown, in the numbering of the matrix. */
  public int unknown() {
    return unknown;
  }

  /** What the elimination left of the diagonal entry. */
  public double pivot() {
    return pivot;
  }

  /** The original diagonal entry of the unknown. */
  public double diagonal() {
    return diagonal;
  }

  /** The least ratio of pivot to original diagonal that was accepted. */
  public double limit() {
    return limit;
  }
}
