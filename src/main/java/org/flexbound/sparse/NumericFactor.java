package org.flexbound.sparse;

import java.util.Arrays;

/** The factor of a matrix: solves for right-hand sides and tells the inertia. Immutable, may be used by several threads. */
public final class NumericFactor {
  private final SymbolicFactor symbolic;
  private final int[] rows;
  private final double[] lower;
  private final double[] pivots;

  private NumericFactor(SymbolicFactor symbolic, int[] rows, double[] lower, double[] pivots) {
    this.symbolic = symbolic;
    this.rows = rows;
    this.lower = lower;
    this.pivots = pivots;
  }

  static NumericFactor compute(SymbolicFactor s, SymmetricMatrix matrix, double[] scale, boolean definite, double limit) {
    int n = s.size();
    int count = Math.toIntExact(s.columnStarts[n]);
    int[] rows = new int[count];
    double[] lower = new double[count];
    double[] pivots = new double[n];
    double[] y = new double[n];
    int[] filled = new int[n];
    int[] stack = new int[n];
    int[] flag = new int[n];
    int[] path = new int[n];
    Arrays.fill(flag, -1);
    double[] a = matrix.entries();
    for (int k = 0; k < n; k++) {
      int top = n;
      flag[k] = k;
      for (int q = s.upperStarts[k]; q < s.upperStarts[k + 1]; q++) {
        int i = s.upperRows[q];
        y[i] += a[s.upperPlaces[q]];
        int length = 0;
        for (; flag[i] != k; i = s.parent[i]) {
          path[length++] = i;
          flag[i] = k;
        }
        while (length > 0) {
          stack[--top] = path[--length];
        }
      }
      double d = y[k];
      y[k] = 0;
      for (; top < n; top++) {
        int i = stack[top];
        double yi = y[i];
        y[i] = 0;
        int from = (int) s.columnStarts[i];
        int to = from + filled[i];
        for (int p = from; p < to; p++) {
          y[rows[p]] = Math.fma(-lower[p], yi, y[rows[p]]);
        }
        double l = yi / pivots[i];
        d = Math.fma(-l, yi, d);
        rows[to] = k;
        lower[to] = l;
        filled[i]++;
      }
      double reference = Math.abs(scale[s.order[k]]);
      double measured = definite ? d : Math.abs(d);
      if (!(measured > limit * reference) || Double.isInfinite(d)) {
        throw new PivotBreakdownException(s.order[k], d, scale[s.order[k]], limit);
      }
      pivots[k] = d;
    }
    return new NumericFactor(s, rows, lower, pivots);
  }

  /** Number of unknowns. */
  public int size() {
    return pivots.length;
  }

  /** The order and pattern this factor was made with. */
  public SymbolicFactor symbolic() {
    return symbolic;
  }

  /** Number of negative pivots: the number of negative eigenvalues of the matrix. */
  public int negativePivots() {
    int count = 0;
    for (double d : pivots) {
      count += d < 0 ? 1 : 0;
    }
    return count;
  }

  /**
   * Solves in place for several right-hand sides.
   *
   * @param rhs size × columns, column-major; becomes the solution
   * @param columns number of right-hand sides
   * @throws IllegalArgumentException if the array is too short
   */
  public void solve(double[] rhs, int columns) {
    int n = size();
    if (rhs.length < (long) n * columns) {
      throw new IllegalArgumentException("needs " + n + " × " + columns + " numbers, has " + rhs.length);
    }
    double[] x = new double[n];
    for (int c = 0; c < columns; c++) {
      for (int k = 0; k < n; k++) {
        x[k] = rhs[c * n + symbolic.order[k]];
      }
      for (int j = 0; j < n; j++) {
        double xj = x[j];
        for (long p = symbolic.columnStarts[j]; p < symbolic.columnStarts[j + 1]; p++) {
          x[rows[(int) p]] -= lower[(int) p] * xj;
        }
      }
      for (int j = n - 1; j >= 0; j--) {
        double sum = x[j] / pivots[j];
        for (long p = symbolic.columnStarts[j]; p < symbolic.columnStarts[j + 1]; p++) {
          sum -= lower[(int) p] * x[rows[(int) p]];
        }
        x[j] = sum;
      }
      for (int k = 0; k < n; k++) {
        rhs[c * n + symbolic.order[k]] = x[k];
      }
    }
  }

  /**
   * Solves for sparse right-hand sides and gives only the wanted rows of the solution.
   *
   * @param rhs the right-hand sides, each of the matrix's size
   * @param wanted rows of the solution that are wanted, in any order
   * @return wanted × columns, column-major
   * @throws IllegalArgumentException if the sizes differ or a wanted row does not exist
   */
  public double[] solve(SparseColumns rhs, int[] wanted) {
    if (rhs.size() != size()) {
      throw new IllegalArgumentException("right-hand sides have " + rhs.size() + " rows, the matrix " + size());
    }
    double[] x = rhs.dense();
    solve(x, rhs.columnCount());
    double[] chosen = new double[Math.multiplyExact(wanted.length, rhs.columnCount())];
    for (int c = 0; c < rhs.columnCount(); c++) {
      for (int w = 0; w < wanted.length; w++) {
        if (wanted[w] < 0 || wanted[w] >= size()) {
          throw new IllegalArgumentException("wanted row " + wanted[w] + " is not from 0 to " + (size() - 1));
        }
        chosen[c * wanted.length + w] = x[c * size() + wanted[w]];
      }
    }
    return chosen;
  }
}
