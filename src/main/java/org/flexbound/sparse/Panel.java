package org.flexbound.sparse;

/**
 * Where the entries of a supernode's panel stand: the lower trapezoid of height × width numbers in blocks of {@link #BLOCK} columns. Block b
 * holds the rows from b·BLOCK to the end, column-major, so that little of the unused upper triangle is kept.
 */
final class Panel {
  /** Columns of a block. */
  static final int BLOCK = 48;

  private Panel() {}

  /** Where row 0 of a column would stand (the first row kept is that of the block's first column). */
  static int column(int column, int height) {
    int block = column / BLOCK;
    int first = block * BLOCK;
    return first * height - BLOCK * BLOCK / 2 * block * (block - 1) + (column - first) * (height - first) - first;
  }

  /** Distance from a column to the next in the same block. */
  static int stride(int column, int height) {
    return height - column / BLOCK * BLOCK;
  }

  /** Numbers of a panel. */
  static long size(int width, int height) {
    long whole = width / BLOCK;
    long first = whole * BLOCK;
    return first * height - BLOCK * BLOCK / 2 * whole * (whole - 1) + (width - first) * (height - first);
  }
}
