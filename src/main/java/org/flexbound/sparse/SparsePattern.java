package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Where the lower triangle of a symmetric matrix may hold nonzero entries: by columns, rows ascending, every diagonal entry present.
 * Column {@code j} holds the positions {@code columnStarts[j] .. columnStarts[j + 1] - 1} of the row indices (and of the values of every
 * {@link SymmetricMatrix} on this pattern); its first row is {@code j} itself. Immutable.
 */
public final class SparsePattern {
  private final int[] columnStarts;
  private final int[] rows;

  /** Takes the arrays over without copying; they are known to be well formed. */
  SparsePattern(int[] columnStarts, int[] rows) {
    this.columnStarts = columnStarts;
    this.rows = rows;
  }

  /**
   * A pattern from its arrays.
   *
   * @param columnStarts size + 1 positions, ascending from 0
   * @param rows row indices, strictly ascending in each column, the first one the column itself
   * @return the pattern (arrays copied)
   * @throws IllegalArgumentException if the arrays are not of that form
   */
  public static SparsePattern of(int[] columnStarts, int[] rows) {
    int size = columnStarts.length - 1;
    if (size < 0 || columnStarts[0] != 0 || columnStarts[size] != rows.length) {
      throw new IllegalArgumentException("column starts must run from 0 to the number of rows given (" + rows.length + ")");
    }
    for (int j = 0; j < size; j++) {
      int from = columnStarts[j];
      int to = columnStarts[j + 1];
      if (to <= from || to > rows.length || rows[from] != j) {
        throw new IllegalArgumentException("column " + j + " must begin with its diagonal entry");
      }
      for (int p = from + 1; p < to; p++) {
        if (rows[p] <= rows[p - 1] || rows[p] >= size) {
          throw new IllegalArgumentException("rows of column " + j + " must ascend and stay below " + size);
        }
      }
    }
    return new SparsePattern(columnStarts.clone(), rows.clone());
  }

  /** Number of rows, and of columns. */
  public int size() {
    return columnStarts.length - 1;
  }

  /** Number of entries of the lower triangle, the diagonal included. */
  public int entryCount() {
    return rows.length;
  }

  /** A copy of the positions at which columns begin, size + 1 of them. */
  public int[] columnStarts() {
    return columnStarts.clone();
  }

  /** A copy of the row indices, column by column. */
  public int[] rows() {
    return rows.clone();
  }

  /**
   * The position of an entry among the values.
   *
   * @return the position of entry (row, column) or (column, row), whichever lies in the lower triangle; negative if it is not in the pattern
   */
  public int position(int row, int column) {
    int j = Math.min(row, column);
    int p = Arrays.binarySearch(rows, columnStarts[j], columnStarts[j + 1], Math.max(row, column));
    return p < 0 ? -1 : p;
  }

  int[] starts() {
    return columnStarts;
  }

  int[] rowIndices() {
    return rows;
  }

  /**
   * The pattern that holds the entries of both.
   *
   * @throws IllegalArgumentException if the sizes differ
   */
  public SparsePattern union(SparsePattern other) {
    if (equals(other)) {
      return this;
    }
    if (other.size() != size()) {
      throw new IllegalArgumentException("sizes differ: " + size() + " and " + other.size());
    }
    int[] starts = new int[size() + 1];
    int[] merged = new int[Math.addExact(rows.length, other.rows.length)];
    int count = 0;
    for (int j = 0; j < size(); j++) {
      int p = columnStarts[j];
      int q = other.columnStarts[j];
      while (p < columnStarts[j + 1] || q < other.columnStarts[j + 1]) {
        int a = p < columnStarts[j + 1] ? rows[p] : Integer.MAX_VALUE;
        int b = q < other.columnStarts[j + 1] ? other.rows[q] : Integer.MAX_VALUE;
        merged[count++] = Math.min(a, b);
        p += a <= b ? 1 : 0;
        q += b <= a ? 1 : 0;
      }
      starts[j + 1] = count;
    }
    return new SparsePattern(starts, Arrays.copyOf(merged, count));
  }

  @Override
  public boolean equals(Object o) {
    return this == o
        || (o instanceof SparsePattern p && Arrays.equals(columnStarts, p.columnStarts) && Arrays.equals(rows, p.rows));
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(columnStarts) + Arrays.hashCode(rows);
  }

  @Override
  public String toString() {
    return "SparsePattern[size " + size() + ", " + entryCount() + " entries in the lower triangle]";
  }
}
