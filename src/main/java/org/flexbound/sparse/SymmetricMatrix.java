package org.flexbound.sparse;

import java.util.Arrays;

/**
 * A symmetric matrix of which the lower triangle is kept: values on a {@link SparsePattern}. Immutable; a new set of values on the same
 * pattern is a new matrix that shares the pattern.
 */
public final class SymmetricMatrix {
  private final SparsePattern pattern;
  private final double[] values;

  /** Takes the values over without copying. */
  SymmetricMatrix(SparsePattern pattern, double[] values) {
    this.pattern = pattern;
    this.values = values;
  }

  /**
   * A matrix from its values.
   *
   * @param values one for each entry of the pattern, in its order (copied)
   * @throws IllegalArgumentException if the number of values is not that of the pattern's entries
   */
  public static SymmetricMatrix of(SparsePattern pattern, double[] values) {
    if (values.length != pattern.entryCount()) {
      throw new IllegalArgumentException(values.length + " values for " + pattern.entryCount() + " entries");
    }
    return new SymmetricMatrix(pattern, values.clone());
  }

  /**
   * A matrix from all entries of a dense one.
   *
   * @param dense square, row by row; only its lower triangle is read, zeros off the diagonal are left out
   */
  public static SymmetricMatrix ofDense(double[][] dense) {
    int n = dense.length;
    int[] starts = new int[n + 1];
    int count = 0;
    for (int j = 0; j < n; j++) {
      for (int i = j; i < n; i++) {
        count += i == j || dense[i][j] != 0 ? 1 : 0;
      }
      starts[j + 1] = count;
    }
    int[] rows = new int[count];
    double[] values = new double[count];
    int p = 0;
    for (int j = 0; j < n; j++) {
      for (int i = j; i < n; i++) {
        if (i == j || dense[i][j] != 0) {
          rows[p] = i;
          values[p++] = dense[i][j];
        }
      }
    }
    return new SymmetricMatrix(new SparsePattern(starts, rows), values);
  }

  /** Number of rows, and of columns. */
  public int size() {
    return pattern.size();
  }

  /** The pattern the values lie on. */
  public SparsePattern pattern() {
    return pattern;
  }

  /** A copy of the values, in the order of the pattern's entries. */
  public double[] values() {
    return values.clone();
  }

  double[] entries() {
    return values;
  }

  /** The entry at (row, column), zero where the pattern holds none. */
  public double get(int row, int column) {
    int p = pattern.position(row, column);
    return p < 0 ? 0 : values[p];
  }

  /** The diagonal entries. */
  public double[] diagonal() {
    double[] d = new double[size()];
    for (int j = 0; j < d.length; j++) {
      d[j] = values[pattern.starts()[j]];
    }
    return d;
  }

  /**
   * {@code this + factor · other}, on the pattern that holds both (the same pattern object if they share it).
   *
   * @throws IllegalArgumentException if the sizes differ
   */
  public SymmetricMatrix plus(double factor, SymmetricMatrix other) {
    SparsePattern union = pattern.union(other.pattern);
    double[] sum = new double[union.entryCount()];
    scatter(union, 1, sum);
    other.scatter(union, factor, sum);
    return new SymmetricMatrix(union, sum);
  }

  /**
   * The same matrix on a pattern that holds this one's, the added entries zero.
   *
   * @throws IllegalArgumentException if the pattern lacks an entry of this matrix
   */
  public SymmetricMatrix on(SparsePattern wider) {
    if (wider.equals(pattern)) {
      return new SymmetricMatrix(wider, values);
    }
    double[] moved = new double[wider.entryCount()];
    scatter(wider, 1, moved);
    return new SymmetricMatrix(wider, moved);
  }

  private void scatter(SparsePattern target, double factor, double[] sum) {
    if (target.size() != size()) {
      throw new IllegalArgumentException("sizes differ: " + target.size() + " and " + size());
    }
    int[] from = pattern.starts();
    int[] rows = pattern.rowIndices();
    int[] to = target.rowIndices();
    for (int j = 0; j < size(); j++) {
      int q = target.starts()[j];
      int end = target.starts()[j + 1];
      for (int p = from[j]; p < from[j + 1]; p++) {
        while (q < end && to[q] < rows[p]) {
          q++;
        }
        if (q == end || to[q] != rows[p]) {
          throw new IllegalArgumentException("entry (" + rows[p] + ", " + j + ") is not in the pattern");
        }
        sum[q] += factor * values[p];
      }
    }
  }

  /**
   * {@code y = A x} for several columns.
   *
   * @param x size × columns, column-major
   * @param y size × columns, column-major; overwritten
   * @param columns number of columns
   */
  public void multiply(double[] x, double[] y, int columns) {
    int n = size();
    if (x.length < (long) n * columns || y.length < (long) n * columns) {
      throw new IllegalArgumentException("needs " + n + " × " + columns + " numbers, has " + x.length + " and " + y.length);
    }
    int[] starts = pattern.starts();
    int[] rows = pattern.rowIndices();
    Arrays.fill(y, 0, n * columns, 0);
    for (int c = 0; c < columns; c++) {
      int at = c * n;
      for (int j = 0; j < n; j++) {
        double xj = x[at + j];
        double sum = values[starts[j]] * xj;
        for (int p = starts[j] + 1; p < starts[j + 1]; p++) {
          int i = at + rows[p];
          y[i] = Math.fma(values[p], xj, y[i]);
          sum = Math.fma(values[p], x[i], sum);
        }
        y[at + j] += sum;
      }
    }
  }

  @Override
  public boolean equals(Object o) {
    return o instanceof SymmetricMatrix m && pattern.equals(m.pattern) && Arrays.equals(values, m.values);
  }

  @Override
  public int hashCode() {
    return 31 * pattern.hashCode() + Arrays.hashCode(values);
  }

  @Override
  public String toString() {
    return "SymmetricMatrix[size " + size() + ", " + pattern.entryCount() + " entries in the lower triangle]";
  }
}
