package org.flexbound.sparse;

import java.util.Arrays;

/**
 * The lowest eigenpairs of {@code K phi = lambda M phi} with the evidence for them. Immutable.
 */
public final class EigenPairs {
  /** Why the search ended. */
  public enum Outcome {
    /** All pairs asked for were found, and the inertia of {@code K - s M} just above them counts no other. */
    COMPLETE,
    /** The matrices have fewer finite eigenvalues than were asked for; all of them are here. */
    FEWER_EXIST,
    /** The basis reached its largest size before all pairs had settled; see the residuals. */
    BASIS_FULL,
    /** The pairs settled, but the inertia counts more eigenvalues below the highest than are here. */
    SOME_MISSED
  }

  private final int size;
  private final double[] values;
  private final double[] vectors;
  private final double[] residuals;
  private final double orthogonality;
  private final double shift;
  private final int countedBelow;
  private final double countedAt;
  private final int operatorCalls;
  private final Outcome outcome;

  EigenPairs(int size, double[] values, double[] vectors, double[] residuals, double orthogonality, double shift, int countedBelow,
      double countedAt, int operatorCalls, Outcome outcome) {
    this.size = size;
    this.values = values;
    this.vectors = vectors;
    this.residuals = residuals;
    this.orthogonality = orthogonality;
    this.shift = shift;
    this.countedBelow = countedBelow;
    this.countedAt = countedAt;
    this.operatorCalls = operatorCalls;
    this.outcome = outcome;
  }

  /** Number of pairs. */
  public int count() {
    return values.length;
  }

  /** Length of a vector. */
  public int size() {
    return size;
  }

  /** The eigenvalues, ascending (a copy). */
  public double[] values() {
    return values.clone();
  }

  /** The eigenvectors, size × count, column-major, {@code phiᵀ M phi = 1}, the entry of largest size positive (a copy). */
  public double[] vectors() {
    return vectors.clone();
  }

  /** The eigenvector of one pair (a copy). */
  public double[] vector(int pair) {
    if (pair < 0 || pair >= values.length) {
      throw new IllegalArgumentException("pair " + pair + " of " + values.length);
    }
    return Arrays.copyOfRange(vectors, pair * size, (pair + 1) * size);
  }

  /**
   * For each pair the size of {@code K phi - lambda M phi} over that of {@code (|lambda| + |shift|) M phi}, both weighed by the inverse
   * square root of the diagonal of K (so that forces and moments can be added) (a copy).
   */
  public double[] residuals() {
    return residuals.clone();
  }

  /** Largest entry of {@code |Phiᵀ M Phi - I|}. */
  public double orthogonality() {
    return orthogonality;
  }

  /** The shift at which the spectrum was inverted. */
  public double shift() {
    return shift;
  }

  /** Number of eigenvalues below {@link #countedAt}, by the inertia of {@code K - countedAt M}. */
  public int countedBelow() {
    return countedBelow;
  }

  /**
   * The point just above the highest eigenvalue found up to which all were counted; infinite if no count was needed; not a number if every
   * point tried met an eigenvalue of a leading part of the matrices, so that nothing could be counted and a complete outcome rests on the
   * settled pairs alone.
   */
  public double countedAt() {
    return countedAt;
  }

  /** Number of vectors the inverse was applied to. */
  public int operatorCalls() {
    return operatorCalls;
  }

  /** Why the search ended. */
  public Outcome outcome() {
    return outcome;
  }
}
