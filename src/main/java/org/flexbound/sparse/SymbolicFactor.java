package org.flexbound.sparse;

import java.util.Arrays;

/**
 * The order of elimination and the pattern of the factor of every matrix on one {@link SparsePattern}: made once, reused for each new set of
 * values. Immutable, may be used by several threads.
 */
public final class SymbolicFactor {
  private final SparsePattern pattern;
  private final FactorSettings settings;
  /** order[k] is the unknown eliminated k-th. */
  final int[] order;
  final int[] parent;
  final long[] columnStarts;
  /** Upper triangle of the permuted matrix by columns: rows and the position of each value. */
  final int[] upperStarts;
  final int[] upperRows;
  final int[] upperPlaces;

  private SymbolicFactor(SparsePattern pattern, FactorSettings settings, int[] order) {
    this.pattern = pattern;
    this.settings = settings;
    this.order = order;
    int n = order.length;
    int[] at = Trees.inverse(order);
    int[] cs = pattern.starts();
    int[] rs = pattern.rowIndices();
    upperStarts = new int[n + 1];
    for (int j = 0; j < n; j++) {
      for (int p = cs[j]; p < cs[j + 1]; p++) {
        upperStarts[Math.max(at[j], at[rs[p]]) + 1]++;
      }
    }
    for (int j = 0; j < n; j++) {
      upperStarts[j + 1] += upperStarts[j];
    }
    int[] next = upperStarts.clone();
    upperRows = new int[rs.length];
    upperPlaces = new int[rs.length];
    for (int j = 0; j < n; j++) {
      for (int p = cs[j]; p < cs[j + 1]; p++) {
        int q = next[Math.max(at[j], at[rs[p]])]++;
        upperRows[q] = Math.min(at[j], at[rs[p]]);
        upperPlaces[q] = p;
      }
    }
    parent = new int[n];
    int[] flag = new int[n];
    int[] counts = new int[n];
    Arrays.fill(parent, -1);
    for (int k = 0; k < n; k++) {
      flag[k] = k;
      for (int q = upperStarts[k]; q < upperStarts[k + 1]; q++) {
        for (int i = upperRows[q]; flag[i] != k; i = parent[i]) {
          if (parent[i] < 0) {
            parent[i] = k;
          }
          counts[i]++;
          flag[i] = k;
        }
      }
    }
    columnStarts = new long[n + 1];
    for (int j = 0; j < n; j++) {
      columnStarts[j + 1] = columnStarts[j] + counts[j];
    }
  }

  /**
   * Analyses a pattern, every unknown by itself.
   *
   * @param pattern the pattern of the matrices to be factorized
   */
  public static SymbolicFactor analyze(SparsePattern pattern) {
    int[] alone = new int[pattern.size()];
    for (int i = 0; i < alone.length; i++) {
      alone[i] = i;
    }
    return analyze(pattern, alone, FactorSettings.defaults());
  }

  /**
   * Analyses a pattern whose unknowns belong to groups.
   *
   * @param pattern the pattern of the matrices to be factorized
   * @param group the group (node) of every unknown, any numbers from 0 to size - 1; a group's unknowns are coupled to much the same others,
   *     and ordering the groups is quicker and often better than ordering the unknowns
   * @param settings how
   * @throws IllegalArgumentException if there is not one group number for each unknown, from 0 to size - 1
   */
  public static SymbolicFactor analyze(SparsePattern pattern, int[] group, FactorSettings settings) {
    int n = pattern.size();
    if (group.length != n) {
      throw new IllegalArgumentException(group.length + " group numbers for " + n + " unknowns");
    }
    int[] number = new int[n];
    Arrays.fill(number, -1);
    int[] dense = new int[n];
    int groups = 0;
    for (int i = 0; i < n; i++) {
      if (group[i] < 0 || group[i] >= n) {
        throw new IllegalArgumentException("group " + group[i] + " of unknown " + i + " is not from 0 to " + (n - 1));
      }
      if (number[group[i]] < 0) {
        number[group[i]] = groups++;
      }
      dense[i] = number[group[i]];
    }
    int[] groupOrder = settings.ordering().order(Graph.of(pattern, dense, groups));
    int[] rank = Trees.inverse(groupOrder);
    int[] starts = new int[groups + 1];
    for (int i = 0; i < n; i++) {
      starts[rank[dense[i]] + 1]++;
    }
    for (int g = 0; g < groups; g++) {
      starts[g + 1] += starts[g];
    }
    int[] order = new int[n];
    for (int i = 0; i < n; i++) {
      order[starts[rank[dense[i]]]++] = i;
    }
    return new SymbolicFactor(pattern, settings, order);
  }

  /** Number of unknowns. */
  public int size() {
    return order.length;
  }

  /** The pattern that was analysed. */
  public SparsePattern pattern() {
    return pattern;
  }

  /** The order of elimination: the unknown eliminated first, second and so on (a copy). */
  public int[] order() {
    return order.clone();
  }

  /** Nonzeros of the factor's lower triangle, the diagonal included. */
  public long nonzeros() {
    return columnStarts[order.length] + order.length;
  }

  /**
   * Factorizes a positive definite matrix.
   *
   * @param matrix values on the analysed pattern
   * @throws PivotBreakdownException if a pivot is not positive, or small against its own original diagonal entry
   * @throws IllegalArgumentException if the matrix has another pattern
   */
  public NumericFactor cholesky(SymmetricMatrix matrix) {
    return NumericFactor.compute(this, checked(matrix), matrix.diagonal(), true, settings.pivotLimit());
  }

  /**
   * Factorizes an indefinite matrix as L D Lᵀ with diagonal D, without exchanging pivots. The result's number of negative pivots is that
   * of the matrix's negative eigenvalues (Sylvester's law of inertia).
   *
   * @param matrix values on the analysed pattern
   * @throws PivotBreakdownException if a pivot is small against its own original diagonal entry
   * @throws IllegalArgumentException if the matrix has another pattern
   */
  public NumericFactor indefinite(SymmetricMatrix matrix) {
    return NumericFactor.compute(this, checked(matrix), matrix.diagonal(), false, settings.pivotLimit());
  }

  /**
   * Factorizes {@code K − shift · M}; pivots are judged against {@code |Kᵢᵢ| + |shift · Mᵢᵢ|}. A breakdown means that the shift meets an
   * eigenvalue (of the pencil, or of a leading part of it): try another shift nearby.
   *
   * @param k first matrix, its entries within the analysed pattern
   * @param shift the shift
   * @param m second matrix, its entries within the analysed pattern
   * @throws PivotBreakdownException if a pivot is small
   * @throws IllegalArgumentException if a matrix has an entry outside the analysed pattern
   */
  public NumericFactor shifted(SymmetricMatrix k, double shift, SymmetricMatrix m) {
    double[] scale = k.diagonal();
    double[] mass = m.diagonal();
    for (int i = 0; i < scale.length; i++) {
      scale[i] = Math.abs(scale[i]) + Math.abs(shift * mass[i]);
    }
    SymmetricMatrix sum = k.on(pattern).plus(-shift, m.on(pattern));
    return NumericFactor.compute(this, sum, scale, false, settings.pivotLimit());
  }

  private SymmetricMatrix checked(SymmetricMatrix matrix) {
    if (!matrix.pattern().equals(pattern)) {
      throw new IllegalArgumentException("the matrix has another pattern than the one analysed");
    }
    return matrix;
  }
}
