package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Several sparse columns, such as the loads of load cases. A row may stand more than once in a column; its values are then added. Immutable.
 */
public final class SparseColumns {
  private final int size;
  private final int[] starts;
  private final int[] rows;
  private final double[] values;

  /**
   * Columns from their entries: column c has the entries {@code starts[c] .. starts[c + 1] - 1} of rows and values.
   *
   * @param size length of every column
   * @param starts columns + 1 positions, ascending from 0 (copied, as the other arrays)
   * @param rows row of every entry, from 0 to size - 1
   * @param values value of every entry
   * @throws IllegalArgumentException if the arrays are not of that form
   */
  public SparseColumns(int size, int[] starts, int[] rows, double[] values) {
    this.size = size;
    this.starts = starts.clone();
    this.rows = rows.clone();
    this.values = values.clone();
    if (starts.length == 0 || starts[0] != 0 || starts[starts.length - 1] != rows.length || rows.length != values.length) {
      throw new IllegalArgumentException("column starts must run from 0 to the number of rows, equal to that of values");
    }
    for (int c = 1; c < starts.length; c++) {
      if (starts[c] < starts[c - 1]) {
        throw new IllegalArgumentException("column starts must ascend");
      }
    }
    for (int row : rows) {
      if (row < 0 || row >= size) {
        throw new IllegalArgumentException("row " + row + " is not from 0 to " + (size - 1));
      }
    }
  }

  /** Columns of the unit matrix: a one at each of the given rows, one column for each. */
  public static SparseColumns units(int size, int... rows) {
    int[] starts = new int[rows.length + 1];
    for (int c = 0; c < starts.length; c++) {
      starts[c] = c;
    }
    double[] ones = new double[rows.length];
    Arrays.fill(ones, 1);
    return new SparseColumns(size, starts, rows, ones);
  }

  /** Number of columns. */
  public int columnCount() {
    return starts.length - 1;
  }

  /** Length of every column. */
  public int size() {
    return size;
  }

  int[] columnStarts() {
    return starts;
  }

  int[] rowIndices() {
    return rows;
  }

  double[] entries() {
    return values;
  }

  /** The columns as a dense array, size × columns, column-major. */
  public double[] dense() {
    double[] x = new double[Math.multiplyExact(size, columnCount())];
    for (int c = 0; c < columnCount(); c++) {
      for (int p = starts[c]; p < starts[c + 1]; p++) {
        x[c * size + rows[p]] += values[p];
      }
    }
    return x;
  }

  @Override
  public boolean equals(Object o) {
    return o instanceof SparseColumns s && size == s.size && Arrays.equals(starts, s.starts) && Arrays.equals(rows, s.rows)
        && Arrays.equals(values, s.values);
  }

  @Override
  public int hashCode() {
    return 31 * (31 * Arrays.hashCode(starts) + Arrays.hashCode(rows)) + Arrays.hashCode(values);
  }

  @Override
  public String toString() {
    return "SparseColumns[" + size + " × " + columnCount() + ", " + rows.length + " entries]";
  }
}
