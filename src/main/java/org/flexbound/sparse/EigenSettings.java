package org.flexbound.sparse;

import java.util.OptionalDouble;

/**
 * How eigenpairs are sought.
 *
 * @param tolerance largest accepted error bound of an eigenvalue's shifted inverse, relative to itself
 * @param shift where the spectrum is inverted; lowered by itself until no eigenvalue lies below it. Empty: zero if the first matrix is
 *     positive definite, else a little below zero
 * @param blockSize number of vectors the operator is applied to at once; multiple eigenvalues are found soonest if none is repeated more
 *     often than this
 * @param largestBasis at most so many vectors are kept at once (never fewer than the pairs asked for need)
 * @param seed of the start vectors
 */
public record EigenSettings(double tolerance, OptionalDouble shift, int blockSize, int largestBasis, long seed) {
  /** Checks the values. */
  public EigenSettings {
    if (!(tolerance > 0 && tolerance < 1)) {
      throw new IllegalArgumentException("the tolerance must lie between 0 and 1, not " + tolerance);
    }
    if (blockSize < 1) {
      throw new IllegalArgumentException("the block size must be at least 1, not " + blockSize);
    }
    if (largestBasis < 1) {
      throw new IllegalArgumentException("the largest basis must be at least 1, not " + largestBasis);
    }
  }

  /** Bounds of 1e-10, eight vectors at once, at most 600 kept. */
  public static EigenSettings defaults() {
    return new EigenSettings(1e-10, OptionalDouble.empty(), 8, 600, 20_240_601);
  }

  /** The same with a given shift. */
  public EigenSettings withShift(double value) {
    return new EigenSettings(tolerance, OptionalDouble.of(value), blockSize, largestBasis, seed);
  }

  /** The same with another tolerance. */
  public EigenSettings withTolerance(double value) {
    return new EigenSettings(value, shift, blockSize, largestBasis, seed);
  }

  /** The same with another block size. */
  public EigenSettings withBlockSize(int size) {
    return new EigenSettings(tolerance, shift, size, largestBasis, seed);
  }

  /** The same with another largest basis. */
  public EigenSettings withLargestBasis(int size) {
    return new EigenSettings(tolerance, shift, blockSize, size, seed);
  }
}
